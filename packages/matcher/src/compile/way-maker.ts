import {
  controlOf,
  jackOf,
  together,
  type DeviceModel,
  type Give,
  type Key,
} from '@coaxwain/models'
import { isSingle } from '@coaxwain/signal'
import { draftsOf, isSoundOnly, soundDraftsOf } from './drafts'
import type { FaceTable, Placed } from './face'
import {
  causes,
  deadPort,
  harmOf,
  leansOf,
  offersOf,
  portsLeantOn,
  reachable,
  socketsClash,
} from './leans'
import { lineEnding, type LineEnding } from './line-end'
import type { Variant } from './variant'
import { soundEnd, type Draft, type SoundPlace, type Way } from './way'

/** Makes and numbers ways; one for the whole shelf. */
export class WayMaker {
  private made = 0
  private readonly takes = new Map<string, number>()
  private readonly leaves = new Map<string, number>()

  constructor(private readonly faces: FaceTable) {}

  /** Every way through a variant that its functions allow. */
  waysOf(variant: Variant): Way[] {
    const { device } = variant
    const drafts = device.functions.flatMap((fn) => draftsOf(device, fn))
    const ways = drafts.flatMap((draft) => this.make(variant, draft) ?? [])
    return ways.filter((way) => !rightInVain(way, ways))
  }

  /** Ways of a variant that handle sound alone. */
  soundWaysOf(variant: Variant): Way[] {
    const { device } = variant
    const functions = device.functions.filter((fn) => isSoundOnly(device, fn))
    const drafts = functions.flatMap((fn) => soundDraftsOf(device, fn))
    return drafts.flatMap((draft) => this.make(variant, draft) ?? [])
  }

  private make(variant: Variant, plain: Draft): Way | null {
    const ended = withLineEnds(variant.device, plain)
    return ended && this.offered(variant, ended)
  }

  private offered(variant: Variant, { draft, ending }: Ended): Way | null {
    const { device } = variant
    const moved = canBe(device, draft) ? causes(device, draft) : null
    if (!moved) return null
    const leans = leansOf(device, draft)
    const offers = offersOf(variant, leans)
    const dead = offers.length === 0 ? deadPort(variant, leans) : null
    if (offers.length === 0 && dead === null) return null
    const wired = withDc(device, moved.dcAt)
    return {
      ...draft,
      id: this.made++,
      takeId: numberOf(this.takes, takeContent(device, draft)),
      leaveId: numberOf(this.leaves, leaveContent(device, draft)),
      variant,
      lineStand: ending.stand,
      terminate: ending.terminate,
      openEnded: ending.open,
      leans,
      into: this.face(wired, draft.in, draft.soundFrom, []),
      from: this.face(wired, draft.out?.jack ?? null, draft.soundTo, draft.out?.volts ?? []),
      offers,
      harm: harmOf(device, draft),
      dead,
    }
  }

  private face(
    device: DeviceModel,
    picture: Key | null,
    sound: SoundPlace,
    volts: Give['volts'],
  ): Placed | null {
    const end = soundEnd(sound)
    if (picture === null && end === null) return null
    return this.faces.place(device, {
      picture: picture === null ? null : jackOf(device, picture),
      sound: end ? { jack: jackOf(device, end.jack), circuits: end.circuits } : null,
      volts: volts ?? [],
    })
  }
}

interface Ended {
  readonly draft: Draft
  readonly ending: LineEnding
}

/** The draft with the switches that end its lines. */
function withLineEnds(device: DeviceModel, draft: Draft): Ended | null {
  const ending = lineEnding(device, draft)
  const stand = ending && together(draft.stand, ending.stand)
  return stand && { draft: { ...draft, stand }, ending }
}

function numberOf(table: Map<string, number>, content: string): number {
  const known = table.get(content) ?? table.size
  table.set(content, known)
  return known
}

/** All that decides what an input makes of a signal. */
function takeContent(device: DeviceModel, { fn, in: input }: Draft): string {
  const byJack = fn.accepts.some((row) => row.jacks !== undefined)
  return JSON.stringify([
    fn.accepts,
    fn.tunedBy === undefined ? null : controlOf(device, fn.tunedBy),
    byJack ? input : null,
    input === null ? null : jackOf(device, input).form,
    fn.inputAgc,
    fn.hdcp,
  ])
}

/** All that decides what an output makes of a signal that has been taken. */
function leaveContent(device: DeviceModel, { fn, out }: Draft): string {
  if (!out) return ''
  const channels = (out.rf ?? []).map(({ channel }) =>
    'control' in channel ? controlOf(device, channel.control) : null,
  )
  const { form } = jackOf(device, out.jack)
  const { bandwidthMhz, storesFields, delayMs } = fn
  return JSON.stringify([form, out.picture, out.rf, channels, bandwidthMhz, storesFields, delayMs])
}

const canBe = (device: DeviceModel, draft: Draft): boolean =>
  !socketsClash(device, draft) &&
  !portsLeantOn(device, draft).some((p) => p.retired === true) &&
  reachable(device, draft.stand)

const isRight = (place: SoundPlace): boolean => {
  const end = soundEnd(place)
  return end?.circuits.length === 1 && end.circuits[0] === 'audio-r'
}

/** The right channel, and a whole mono sound, by the left one of their jack. */
const asLeft = (place: SoundPlace): string => {
  const end = soundEnd(place)
  if (!end) return String(place)
  const alone = end.circuits.length === 1
  return `${end.jack} ${alone ? 'audio-l' : end.circuits.join()}`
}

const sameButChannel = (left: SoundPlace, right: SoundPlace): boolean =>
  !isRight(left) && asLeft(left) === asLeft(right)

const sameButSound = (a: Way, b: Way): boolean =>
  a !== b && a.fn === b.fn && a.in === b.in && a.out === b.out

const plugsOf = (placed: Placed | null): string =>
  (placed?.face.ports ?? []).map((p) => `${p.connector} ${p.mount}`).join()

/** Left and right are contacts of one plug, which does not go elsewhere. */
const isMultiway = (placed: Placed | null): boolean =>
  (placed?.face.sound ?? []).some((c) => !isSingle(placed!.face.ports[c.port]!.connector))

const leastOf = (way: Way): number => way.offers[0]?.doubt ?? Infinity

/** The right channel alone is worth trying only where the left is worse off. */
function rightInVain(way: Way, ways: readonly Way[]): boolean {
  if (!isRight(way.soundFrom) && !isRight(way.soundTo)) return false
  if (isRight(way.soundFrom) && isMultiway(way.into)) return false
  if (isRight(way.soundTo) && isMultiway(way.from)) return false
  return ways.some(
    (other) =>
      sameButSound(other, way) &&
      sameButChannel(other.soundFrom, way.soundFrom) &&
      sameButChannel(other.soundTo, way.soundTo) &&
      plugsOf(other.into) === plugsOf(way.into) &&
      plugsOf(other.from) === plugsOf(way.from) &&
      leastOf(other) <= leastOf(way),
  )
}

/** Ports whose automatic switch waits for a voltage need it from their cable. */
function withDc(device: DeviceModel, ports: readonly Key[]): DeviceModel {
  if (ports.length === 0) return device
  return {
    ...device,
    ports: device.ports.map((p) => (ports.includes(p.key) ? { ...p, needsDcVolts: 5 } : p)),
  }
}
