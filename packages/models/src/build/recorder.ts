import type { AcceptRow, Condition, Give, Key, ModelFunction, RfGive } from '../model'
import type { Colour, ScanId } from '@coaxwain/signal'
import { at } from './conditions'
import { gives, passes, picture, plays, SAME, sounds, turns } from './functions'

export interface RecorderLine {
  readonly key: Key
  readonly label: string
  readonly picture: Key
  readonly sound: Key
}

export interface RecorderParts {
  readonly tape: {
    readonly scan: ScanId
    readonly colour: Colour
    readonly sound: 'mono' | 'stereo'
  }
  readonly pictureOuts: readonly Key[]
  readonly soundOuts: readonly Key[]
  /** Each is chosen by the position of the control `input` that has its key; the tuner's is `tuner`. */
  readonly lines: readonly RecorderLine[]
  readonly lineAccepts: readonly AcceptRow[]
  readonly tunerAccepts: readonly AcceptRow[]
  readonly rf: RfGive
  /**
   * `switched`: the aerial socket gives either the aerial or the recorder, by the control `tv-vcr`.
   * `added`: the recorder's own carrier is joined to the aerial's at all times.
   */
  readonly rfKind: 'switched' | 'added'
}

/** Luma bandwidth of the home tape format (public format pages). */
const TAPE_MHZ = 3
/** What the level control and the modulator of a recorder let through (common practice, no source). */
const LINE_MHZ = 3.4

/** Tape, line, tuner and aerial loop of a recorder with `rf-in` and `rf-out`. */
export function recorderFunctions(parts: RecorderParts): readonly ModelFunction[] {
  const { tape } = parts
  const ownCarrier = parts.rfKind === 'switched' ? at('tv-vcr', 'vcr') : []
  const through = (sound: 'same' | 'mono' | 'stereo', recorded = false): Give[] => {
    const rows = recorded ? [picture(tape.scan, tape.colour)] : SAME
    return [
      ...parts.pictureOuts.map((jack) => gives(jack, rows)),
      ...parts.soundOuts.map((jack) => sounds(jack, sound)),
      gives('rf-out', rows, { sound, rf: [rfOf(parts)], while: conditionOf(ownCarrier) }),
    ]
  }
  return [
    plays('tape', 'Plays tapes', through(tape.sound, true), { bandwidthMhz: TAPE_MHZ }),
    ...parts.lines.map((line) =>
      turns(line.key, 'modulates', line.picture, {
        gives: through('same'),
        label: line.label,
        sound: line.sound,
        while: at('input', line.key),
        accepts: parts.lineAccepts,
        inputAgc: true,
        bandwidthMhz: LINE_MHZ,
      }),
    ),
    turns('tuner', 'tunes', 'rf-in', {
      gives: through(tape.sound),
      label: 'Receives programmes',
      while: at('input', 'tuner'),
      accepts: parts.tunerAccepts,
      tunedBy: 'tuned-to',
    }),
    passes('aerial-loop', 'loop-through', 'rf-in', {
      to: ['rf-out'],
      label: 'Passes the aerial on',
      while: parts.rfKind === 'switched' ? at('tv-vcr', 'tv') : undefined,
      power: 'standby',
    }),
  ]
}

const rfOf = (parts: RecorderParts): RfGive =>
  parts.rfKind === 'added' ? { ...parts.rf, always: true } : parts.rf

const conditionOf = (condition: Condition): Condition | undefined =>
  condition.length > 0 ? condition : undefined
