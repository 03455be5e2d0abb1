import type { ProofObstacle, Signal, Unit } from '@coaxwain/shelf'
import type { Present, Supply } from '../compile/shelf'
import { outOfReach, type Variant } from '../compile/variant'
import { isUsable, type Way } from '../compile/way'
import type { Label } from '../search/label'

/** Where chains may begin and end, and what of the unit they may pass. */
export interface Field {
  readonly present: Present
  readonly supply: Supply
  readonly starts: readonly Label[]
  readonly shows: readonly Way[]
  readonly speakers: readonly Way[]
  readonly own: {
    readonly plays: readonly Way[]
    readonly into: readonly Way[]
    readonly sounds: readonly Way[]
  }
}

/** What is known of a unit when the search has ended. */
interface Ended {
  readonly variant: Variant
  readonly unit: Unit
  readonly ways: readonly Way[]
  readonly sounds: readonly Way[]
  readonly field: Field
  /** Ways into the unit that something came in by. */
  readonly entered: ReadonlySet<Way>
}

export const leansOn = (way: Way, signal: Signal): boolean =>
  'function' in signal
    ? way.functions.includes(signal.function)
    : way.leans.contacts.some((c) => c.jack === signal.jack && c.port === signal.port)

/** Why nothing tries a signal. */
export function obstacleTo(signal: Signal, ended: Ended): ProofObstacle {
  const ways = [...ended.ways, ...ended.sounds].filter((w) => leansOn(w, signal))
  const usable = ways.filter(isUsable)
  if (usable.length === 0) return ways.some((w) => w.harm) ? 'would-harm' : 'no-way-inside'
  if (ended.field.supply.drawer.total === 0) return 'no-tried-lead'
  const code = missing(ended, usable)
  const isThere = code === 'nothing-arrives' || code === 'nothing-shows'
  return isThere && isStuck(ended) ? 'out-of-reach' : code
}

/** Only a remote control that is not here reaches a control, and nobody has noted where it stands. */
const isStuck = ({ variant: { device }, unit }: Ended): boolean =>
  device.controls.some((c) => outOfReach(device, c, unit) && unit.stands[c.key] === undefined)

/** What lacks on the one side or the other of the unit. */
function missing({ field, entered }: Ended, ways: readonly Way[]): ProofObstacle {
  const plays = ways.some((w) => field.own.plays.includes(w))
  const shows = ways.every((w) => w.into !== null && w.from === null)
  if (!plays && field.starts.length === 0) return 'no-tried-source'
  if (!shows && field.shows.length === 0) return 'no-tried-display'
  const isReached = plays || ways.some((w) => entered.has(w))
  return isReached && !shows ? 'nothing-shows' : 'nothing-arrives'
}
