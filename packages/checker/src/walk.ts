import { jackOf, type DeviceModel, type ModelFunction } from '@coaxwain/models'
import type { Degradation, Question, SeenPicture, Stop, Uid } from '@coaxwain/shelf'
import { followsField, followsLine, poorer, type PictureForm, type Sound } from '@coaxwain/signal'
import { pairOf, soundOf, type Ears, type Pair } from './ears'
import { finding } from './finding'
import { giveOut, pictureInto, played, settled, take, voltsAt, type Bench } from './flow'
import { claimedWave, type Wave } from './wave'

export interface Walked {
  readonly picture: SeenPicture | null
  /** Sound inside the picture signal that the display hears. */
  readonly embedded: Pair
}

const NOTHING: Walked = { picture: null, embedded: pairOf('none') }

/** Follows the picture from stop to stop and says where it stops coming. */
export function walkPicture(
  bench: Bench,
  question: Question,
  stops: readonly Stop[],
  ears: Ears,
): Walked {
  const [first, ...rest] = stops
  if (!first?.picture || first.unit !== question.source.unit) return NOTHING
  let wave = begin(bench, question, first)
  const colourful = wave?.colour !== 'mono'
  for (const [i, stop] of rest.entries()) {
    if (!wave) return NOTHING
    const last = i === rest.length - 1
    const device = bench.view.device(stop.unit)
    const fn = bench.view.fn(stop.unit, stop.function)
    if (!device || !fn) {
      bench.found.push(finding('function-unknown', { unit: stop.unit, function: stop.function }))
      return NOTHING
    }
    const entered = enter(bench, question, stop, device, fn, wave)
    if (!entered) return NOTHING
    const heard = entered.taken.heard ? pairOf(wave.riding) : pairOf('none')
    ears.riding.set(stop.unit, { fn: fn.key, pair: heard })
    if (last) return finish(bench, question, stop, device, wave, entered, colourful, heard)
    wave = leave(bench, stop, fn, wave, entered, ears)
  }
  return NOTHING
}

function begin(bench: Bench, question: Question, stop: Stop): Wave | null {
  const fn = bench.view.fn(stop.unit, question.source.playing)
  const give = fn?.gives.find((g) => g.jack === stop.out)
  if (!fn || !give || !stop.picture) {
    bench.found.push(finding('function-unknown', { unit: stop.unit, function: stop.function }))
    return null
  }
  const wave = played(bench, stop.unit, fn, give, question.material, claimedWave(stop.picture))
  if (!wave) bench.found.push(finding('output-not-given', { unit: stop.unit, jack: give.jack }))
  return wave
}

interface Entered {
  readonly taken: NonNullable<ReturnType<typeof take>>
  readonly lumaOnly: boolean
  readonly form: PictureForm
}

function enter(
  bench: Bench,
  question: Question,
  stop: Stop,
  device: DeviceModel,
  fn: ModelFunction,
  wave: Wave,
): Entered | null {
  const at = { unit: stop.unit, function: fn.key }
  const jack = stop.in === null ? undefined : device.jacks.find((j) => j.key === stop.in)
  const listed = jack && [...fn.needs, ...(fn.oneOf ?? [])].includes(jack.key)
  if (!jack || !listed) {
    bench.found.push(finding('input-not-fed', at))
    return null
  }
  if (!settled(bench, stop.unit, fn.while)) bench.found.push(finding('function-not-acting', at))
  if (question.material.protection === 'agc-pulses' && fn.inputAgc)
    bench.found.push(finding('protection', at))
  const digital = jack.form === 'hdmi' || jack.form === 'dvi'
  if (question.material.protection === 'hdcp' && digital && fn.hdcp === false) {
    bench.found.push(finding('protection', at))
  }
  const input = pictureInto(bench, stop.unit, jack, wave)
  if (!input) {
    bench.found.push(finding('input-not-fed', at))
    return null
  }
  const taken = take(bench, stop.unit, fn, jack, input, voltsAt(bench, stop.unit, jack, wave.volts))
  if (!taken) {
    bench.found.push(finding('not-taken', { ...at, scan: wave.scan, colour: wave.colour }))
    return null
  }
  return { taken, lumaOnly: input.lumaOnly, form: jack.form as PictureForm }
}

function leave(
  bench: Bench,
  stop: Stop,
  fn: ModelFunction,
  wave: Wave,
  entered: Entered,
  ears: Ears,
): Wave | null {
  const give = fn.gives.find((g) => g.jack === stop.out)
  if (!give) {
    bench.found.push(finding('output-not-given', { unit: stop.unit, jack: stop.out ?? '' }))
    return null
  }
  const riding: Sound = soundOf(ears.enters(stop.unit, fn))
  return giveOut(bench, stop.unit, fn, give, {
    wave,
    taken: entered.taken,
    lumaOnly: entered.lumaOnly,
    riding,
    claimed: stop.picture ? claimedWave(stop.picture) : null,
  })
}

function finish(
  bench: Bench,
  question: Question,
  stop: Stop,
  device: DeviceModel,
  wave: Wave,
  { taken, lumaOnly, form }: Entered,
  colourful: boolean,
  embedded: Pair,
): Walked {
  const display = device.display
  if (!display || stop.unit !== question.display.unit) {
    bench.found.push(finding('function-unknown', { unit: stop.unit, function: stop.function }))
    return NOTHING
  }
  if (!followsLine(display.deflection, wave.scan))
    bench.found.push(finding('line-rate', { scan: wave.scan }))
  if (!followsField(display.deflection, wave.scan))
    bench.found.push(finding('field-rate', { scan: wave.scan }))
  const gun =
    wave.direct &&
    display.directView &&
    display.screen !== 'flat' &&
    !display.storesFields &&
    !display.convertsScan
  if (question.demands.aim === 'light-gun' && !gun)
    bench.found.push(finding('light-gun', { unit: stop.unit }))
  const monoTube = display.screen === 'tube-mono'
  const degradations: Degradation[] = []
  if (!taken.colour && colourful && !monoTube) degradations.push('monochrome')
  if (taken.reducedHeight) degradations.push('reduced-height')
  if (wave.shape === 'squeezed' && display.shape === '4:3') degradations.push('squeezed')
  return {
    picture: {
      colour: taken.colour && !monoTube,
      quality: poorer(lumaOnly ? 'luma-only' : wave.poorest, form),
      lumaMhz: wave.lumaMhz,
      degradations,
    },
    embedded,
  }
}

/** Sound from the display's own loudspeakers: one loudspeaker adds what both ways bring. */
export function fromDisplay(device: DeviceModel, pair: Pair): Sound {
  const sound = soundOf(pair)
  if (device.display?.loudspeakers === 'none' || !device.display) return 'none'
  return device.display.loudspeakers === 'mono' && sound === 'stereo' ? 'mono' : sound
}

export const unitsOf = (stops: readonly Stop[]): Uid[] => stops.map((s) => s.unit)
export { jackOf }
