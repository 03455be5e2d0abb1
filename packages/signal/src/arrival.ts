import type { Circuit } from './circuits'
import { FORM_CIRCUITS, type PictureForm } from './forms'

/** What an input makes of the circuits that reach it. */
export type Arrival =
  /** Everything the form needs is there. */
  | { kind: 'whole' }
  /** A steady grey picture from the luma (or the composite signal) alone. */
  | { kind: 'luma-only'; from: 'y' | 'cvbs' }
  /** A picture with the wrong colours; `locks` tells whether it stands still. */
  | { kind: 'wrong-colours'; cast: 'green' | 'magenta'; locks: boolean }
  | { kind: 'nothing' }

const has = (circuits: ReadonlySet<Circuit>, ...wanted: Circuit[]): boolean =>
  wanted.every((c) => circuits.has(c))

/** Composite video and luma carry sync, and RGB inputs of 21-pin sockets take it from there (two published pin tables). */
const serves = (arrived: Circuit | undefined, wanted: Circuit): boolean =>
  arrived === wanted || (wanted === 'csync' && (arrived === 'cvbs' || arrived === 'y'))

/**
 * Derives, from the circuit that arrives at each contact of an input, what that input shows.
 * `arrives` maps each circuit the input expects to the circuit that is really there.
 * Sources: a luma signal with sync is a legal monochrome signal (rows c46, c48-c50 of the compatibility
 * table, common practice); greys turn green or magenta by the ITU-R BT.601 matrix (rows c41, c42).
 */
export function arrivalAt(form: PictureForm, arrives: ReadonlyMap<Circuit, Circuit>): Arrival {
  const expected = FORM_CIRCUITS[form]
  const right = new Set(expected.filter((c) => serves(arrives.get(c), c)))
  if (right.size === expected.length) return { kind: 'whole' }
  switch (form) {
    case 'composite':
      return steadyGrey(arrives.get('cvbs'))
    case 's-video':
      return steadyGrey(arrives.get('y'))
    case 'component':
      if (has(new Set(arrives.values()), 'r', 'g', 'b')) {
        return { kind: 'wrong-colours', cast: 'magenta', locks: false }
      }
      return steadyGrey(arrives.get('y'))
    case 'rgbs':
    case 'rgsb':
    case 'rgbhv':
      if (arrives.get('g') === 'y' && arrives.get('b') === 'pb') {
        return { kind: 'wrong-colours', cast: 'green', locks: form === 'rgsb' }
      }
      return { kind: 'nothing' }
    default:
      return { kind: 'nothing' }
  }
}

function steadyGrey(circuit: Circuit | undefined): Arrival {
  return circuit === 'y' || circuit === 'cvbs'
    ? { kind: 'luma-only', from: circuit }
    : { kind: 'nothing' }
}
