import { inputsOf, type Key } from '@coaxwain/models'
import type { Leg, Question, Stop, Uid } from '@coaxwain/shelf'
import type { ShelfView } from '../shelf-view'
import type { Laid } from './lay'

/** The way from an aerial along the links as far as it goes, at best into the display; null without an aerial. */
export function aerialLeg(
  laid: readonly Laid[],
  { display }: Question,
  view: ShelfView,
): Leg | null {
  const first = laid.find(({ link, way }) => isOnAir(way) && receives(link.from.unit, view))
  if (!first) return null
  const taken = way(first.link.from.unit, { laid, display: display.unit, used: [] })
  const stops = [first.link.from.unit, ...taken.map((i) => laid[i]!.link.to.unit)].map(
    (unit, i): Stop => stopAt(unit, laid[taken[i - 1] ?? -1], laid[taken[i] ?? -1], view),
  )
  return { purpose: 'aerial', stops, links: taken }
}

const isOnAir = (way: Laid['way']): boolean =>
  way?.pairs.some((p) => p.from === 'rf' && p.to === 'rf') ?? false

const receives = (unit: Uid, view: ShelfView): boolean =>
  view.device(unit)?.functions.some((f) => f.kind === 'receives') ?? false

interface Walk {
  readonly laid: readonly Laid[]
  readonly display: Uid
  readonly used: readonly Uid[]
}

/** Links from a unit to the display, or else the longest way there is. */
function way(unit: Uid, walk: Walk): number[] {
  if (unit === walk.display) return []
  const used = [...walk.used, unit]
  const ways = walk.laid
    .map((l, i) => ({ ...l, i }))
    .filter((l) => l.link.from.unit === unit && isOnAir(l.way) && !used.includes(l.link.to.unit))
    .map((l) => [l.i, ...way(l.link.to.unit, { ...walk, used })])
  const reach = (links: number[]): number =>
    links.length + (walk.laid[links.at(-1) ?? -1]?.link.to.unit === walk.display ? 100 : 0)
  return ways.sort((a, b) => reach(b) - reach(a))[0] ?? []
}

function stopAt(
  unit: Uid,
  before: Laid | undefined,
  after: Laid | undefined,
  view: ShelfView,
): Stop {
  const device = view.device(unit)
  const jackOf = (port: Key | undefined, dir: 'in' | 'out'): Key | null =>
    device?.jacks.find(
      (j) => j.form === 'rf' && j.dir === dir && j.contacts.some((c) => c.port === port),
    )?.key ?? null
  const [into, out] = [jackOf(before?.link.to.port, 'in'), jackOf(after?.link.from.port, 'out')]
  const fn = device?.functions.find(
    (f) =>
      (into === null || inputsOf(f).includes(into)) &&
      (out === null
        ? true
        : f.tunedBy !== undefined || f.gives.some((g) => g.jack === out && !g.rf)),
  )
  return { unit, function: fn?.key ?? '', in: into, out, picture: null, sound: 'none' }
}
