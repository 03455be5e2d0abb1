import type { DeviceModel, DisplayFacts, Jack, ModelFunction } from '@coaxwain/models'
import type { Degradation, SeenPicture, Stop } from '@coaxwain/shelf'
import {
  followsField,
  followsLine,
  poorer,
  type PictureForm,
  type Protection,
  type Sound,
} from '@coaxwain/signal'
import { Stage, takesAt, type Bench } from './bench'
import { soundOf, type Ears, type Pair } from './ears'
import { finding, type Finding } from './finding'
import { giveOut, played } from './giving'
import { pictureInto, take, type PictureIn, type TakenIn } from './taking'
import { claimedWave, type Wave } from './wave'

/** Follows the picture from stop to stop, and says what is seen or where it stops coming. */
export function walkPicture(bench: Bench, stops: readonly Stop[], ears: Ears): SeenPicture | null {
  const [first, ...rest] = stops
  if (!first?.picture || first.unit !== bench.question.source.unit) return null
  const sent = begin(bench, first)
  let wave = sent
  for (const [i, stop] of rest.entries()) {
    const entered = wave && enter(bench, stop, wave)
    if (!entered) return null
    const { riding } = entered.input.wave
    ears.hearsPicture(entered.stage, entered.taken.heard ? riding : 'none')
    if (i === rest.length - 1) return seen(entered, sent?.colour !== 'mono')
    wave = leave(entered, stop, ears)
  }
  return null
}

const unknownAt = ({ unit, function: fn }: Stop): Finding =>
  finding('function-unknown', { unit, function: fn })

function begin(bench: Bench, stop: Stop): Wave | null {
  const stage = Stage.of(bench, stop.unit, bench.question.source.playing)
  const give = stage?.fn.gives.find((g) => g.jack === stop.out)
  if (!stage || !give || !stop.picture) {
    bench.found.push(unknownAt(stop))
    return null
  }
  const wave = played(stage, give, claimedWave(stop.picture))
  if (!wave) stage.report('output-not-given', { jack: give.jack })
  return wave
}

/** A picture inside a unit: as it came, and what the function there makes of it. */
interface Entered {
  readonly stage: Stage
  readonly input: PictureIn
  readonly taken: TakenIn
}

function enter(bench: Bench, stop: Stop, wave: Wave): Entered | null {
  const stage = Stage.of(bench, stop.unit, stop.function)
  if (!stage) {
    bench.found.push(unknownAt(stop))
    return null
  }
  const { fn } = stage
  const at = { function: fn.key }
  const jack = takesAt(fn, stop.in) ? stage.jack(stop.in) : null
  const acts = stage.isSetToAct()
  if (!acts) stage.report('function-not-acting', at)
  if (jack && isStopped(bench.question.material.protection, fn, jack)) {
    stage.report('protection', at)
  }
  const input = acts && jack ? pictureInto(stage, jack, wave) : null
  if (!input) {
    if (acts) stage.report('input-not-fed', at)
    return null
  }
  const taken = take(stage, input)
  return taken && { stage, input, taken }
}

/** Pulses upset a recorder's level control; a digital input must complete the handshake. */
function isStopped(protection: Protection, fn: ModelFunction, jack: Jack): boolean {
  const digital = jack.form === 'hdmi' || jack.form === 'dvi'
  return (
    (protection === 'agc-pulses' && fn.inputAgc === true) ||
    (protection === 'hdcp' && digital && fn.hdcp === false)
  )
}

function leave({ stage, input, taken }: Entered, stop: Stop, ears: Ears): Wave | null {
  const give = stage.fn.gives.find((g) => g.jack === stop.out)
  if (!give) {
    stage.report('output-not-given', { jack: stop.out ?? '' })
    return null
  }
  return giveOut(stage, give, {
    wave: input.wave,
    lumaOnly: input.lumaOnly,
    taken,
    riding: soundOf(ears.enters(stage)),
    claimed: stop.picture && claimedWave(stop.picture),
  })
}

/** What the display shows; `colourful` where the source sent colour, so that its loss counts. */
function seen({ stage, input, taken }: Entered, colourful: boolean): SeenPicture | null {
  const { display } = stage.device
  const { wave, lumaOnly, jack } = input
  const shows = stage.fn.kind === 'shows' && stage.unit === stage.bench.question.display.unit
  if (!display || !shows) {
    stage.report('function-unknown', { function: stage.fn.key })
    return null
  }
  checkScreen(stage, display, wave)
  const monoTube = display.screen === 'tube-mono'
  const degradations: Degradation[] = []
  if (!taken.colour && colourful && !monoTube) degradations.push('monochrome')
  if (taken.reducedHeight) degradations.push('reduced-height')
  if (wave.shape === 'squeezed' && display.shape === '4:3') degradations.push('squeezed')
  return {
    colour: taken.colour && !monoTube,
    quality: poorer(lumaOnly ? 'luma-only' : wave.poorest, jack.form as PictureForm),
    lumaMhz: wave.lumaMhz,
    degradations,
  }
}

function checkScreen(stage: Stage, display: DisplayFacts, { scan, direct }: Wave): void {
  if (!followsLine(display.deflection, scan)) stage.report('line-rate', { scan })
  if (!followsField(display.deflection, scan)) stage.report('field-rate', { scan })
  const gun =
    direct &&
    display.directView &&
    display.screen !== 'flat' &&
    !display.storesFields &&
    !display.convertsScan
  if (stage.bench.question.demands.aim === 'light-gun' && !gun) stage.report('light-gun')
}

/** Sound from the display's own loudspeakers: one loudspeaker adds what both ways bring. */
export function fromDisplay({ display }: DeviceModel, pair: Pair): Sound {
  const sound = soundOf(pair)
  if (!display || display.loudspeakers === 'none') return 'none'
  return display.loudspeakers === 'mono' && sound === 'stereo' ? 'mono' : sound
}
