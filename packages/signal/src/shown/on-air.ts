import { nearestChannel, type PlanPart } from '../plans/index'
import type { Sound } from '../signals'
import {
  RF_SYSTEMS,
  samePolarity,
  sameSoundSpacing,
  type DigitalSystem,
  type RfSystemId,
} from '../systems'
import { follow, type Picture, type Screen } from './followed'
import type { Shown, SoundHeard } from './shown'
import type { Why } from './why'

/** What arrives at an aerial socket: an analogue carrier, or a digital multiplex. */
export type OnAir = AnalogueCarrier | DigitalCarrier

export interface AnalogueCarrier extends Picture {
  readonly kind: 'analogue'
  readonly system: RfSystemId
  readonly visionMhz: number
  /** What rides on it; a consumer modulator fed with two channels sends one. */
  readonly sound: Sound
}

export interface DigitalCarrier {
  readonly kind: 'digital'
  readonly digital: DigitalSystem
}

/** A set as its aerial socket sees it. */
export interface Receiver extends Screen {
  readonly systems: readonly RfSystemId[]
  readonly digital: readonly DigitalSystem[]
  readonly reaches: readonly PlanPart[]
  /** How far off a carrier may lie from its channel. */
  readonly pullInMhz: number
}

const nothing = (why: Why, sound: SoundHeard = 'none'): Shown => ({
  picture: 'nothing',
  colour: 'none',
  sound,
  harms: false,
  why: [why],
})

/** What a set shows of what comes down its aerial lead. */
export function shownOnAir(sent: OnAir, set: Receiver): Shown {
  if (sent.kind === 'digital') return digital(sent, set)
  if (set.systems.length === 0) return nothing('digital-only-tuner')
  const caught = catches(sent, set)
  if (caught === 'no') return nothing('out-of-reach')
  const shown = analogue(sent, set)
  return caught === 'by-an-edge' && shown.picture === 'steady' ? atTheEdge(shown) : shown
}

/** A picture out of a multiplex is the set's own; here it matters only whether there is one. */
const digital = (sent: DigitalCarrier, set: Receiver): Shown =>
  set.digital.includes(sent.digital)
    ? { picture: 'steady', colour: 'right', sound: 'heard', harms: false, why: ['same-system'] }
    : { ...nothing('digital-carrier', 'hiss'), picture: 'noise' }

/** A carrier that lies no farther off than this is still seen, badly (common practice, no source). */
const EDGE_MHZ = 1.5

function catches(sent: AnalogueCarrier, set: Receiver): 'yes' | 'by-an-edge' | 'no' {
  const off = Math.min(
    ...set.reaches.map((part) => nearestChannel(part, sent.visionMhz)?.offMhz ?? Infinity),
  )
  if (off <= set.pullInMhz) return 'yes'
  return off <= EDGE_MHZ ? 'by-an-edge' : 'no'
}

const atTheEdge = (shown: Shown): Shown => ({
  ...shown,
  picture: 'edge-of-lock',
  colour: 'may-drop',
  sound: 'may-buzz',
  why: ['off-frequency'],
})

function analogue(sent: AnalogueCarrier, set: Receiver): Shown {
  const seen = set.systems.filter((s) => samePolarity(s, sent.system))
  if (seen.length === 0) return upsideDown(sent, set)
  const heard = soundOf(sent, seen)
  const followed = follow(sent, set)
  return { ...followed, sound: heard.sound, why: [...followed.why, ...heard.why] }
}

/** Sync is looked for at the wrong end of the carrier. An AM detector hears FM as a buzz, FM hears no AM. */
const upsideDown = (sent: AnalogueCarrier, set: Receiver): Shown => ({
  picture: 'negative',
  colour: 'none',
  sound:
    RF_SYSTEMS[sent.system].soundModulation === 'FM' &&
    set.systems.every((s) => RF_SYSTEMS[s].soundModulation === 'AM')
      ? 'buzz'
      : 'none',
  harms: false,
  why: ['other-polarity', 'other-sound-modulation'],
})

function soundOf(
  { system, sound }: AnalogueCarrier,
  listed: readonly RfSystemId[],
): { readonly sound: SoundHeard; readonly why: readonly Why[] } {
  if (!listed.some((s) => sameSoundSpacing(s, system))) {
    return { sound: 'none', why: ['other-sound-spacing'] }
  }
  if (sound === 'none' || sound === 'half') return { sound: 'none', why: [] }
  return sound === 'mono' ? { sound: 'mono', why: ['mono-modulator'] } : { sound: 'heard', why: [] }
}
