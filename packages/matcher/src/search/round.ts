import type { Question } from '@coaxwain/shelf'
import type { Face } from '../compile/face'
import type { CompiledShelf, Present } from '../compile/shelf'
import type { Core, CoreTable } from '../compile/signal'
import type { Way } from '../compile/way'
import { JoinTable } from '../join/join'
import { Aerials } from './aerial'
import { Expander } from './expand'
import { Finisher } from './finish'
import { waysIn, type Layout } from './layout'
import { MoveTable, movedBy, unbeaten, type Move } from './moves'
import type { MovesFrom } from './outlook'
import type { SearchSpace } from './search'
import { SoundRoutes } from './sound-route'

/** A purchase of more things than this is no answer. */
const MOST_BOUGHT = 12

/** Sorts of units and pieces of which a chain may want more than there are. */
export interface Scarce {
  readonly units: ReadonlySet<string>
  readonly pieces: ReadonlySet<number>
}

/** The parts of one round of searching. */
export interface Round {
  readonly joins: JoinTable
  readonly moves: MovesFrom
  readonly expander: Expander
  readonly space: Omit<SearchSpace, 'budget'>
}

/** Makes ready for a search in which what is scarce is counted exactly. */
export function beginRound(
  shelf: CompiledShelf,
  question: Question,
  layout: Layout,
  scarce: Scarce,
): Round {
  const { present, speakers } = layout
  const { cores, faces } = shelf
  const { demands, offAir } = question
  const scarceUnits = new Set(scarce.units)
  const joins =
    scarce.pieces.size === 0
      ? layout.supply.joins
      : new JoinTable(layout.frame.drawer, new Set(scarce.pieces))
  const boxes = waysIn(present, (o) => o.boxes)
  const aerials =
    demands.keepAerial === true
      ? new Aerials(
          waysIn(present, (o) => o.aerials),
          boxes,
          { joins, faces, offAir },
        )
      : null
  const soundBoxes = waysIn(present, (o) => o.sounds).filter((w) => w.soundTo !== null)
  const sounds = new SoundRoutes(joins, soundBoxes)
  const expander = new Expander({ sounds, cores, scarceUnits, aerials })
  const finisher = new Finisher({ demands, speakers, aerials, sounds, expander })
  const apart = (way: Way): boolean => aerials !== null || scarceUnits.has(way.variant.id)
  const special = aerials !== null || scarceUnits.size > 0 || joins.hasScarce
  const table = new MoveTable(joins, boxes, cores, apart)
  const moves: MovesFrom = special
    ? (face, core) => table.of(face, core).best
    : withoutSome(layout.supply.moves, layout.present, joins, cores)
  const last = new MoveTable(joins, layout.ends, cores, () => false)
  const space = {
    starts: layout.labels,
    moves,
    ends: (face: Face, core: Core) => last.of(face, core).best.filter((m) => finisher.canEnd(m)),
    joins,
    expander,
    finisher,
    outsideSpeakers: speakers.length > 0,
    scarceUnits,
    mostBought: shelf.bought.size > 0 ? MOST_BOUGHT : 0,
  }
  return { joins, moves, expander, space }
}

/** The moves of the whole shelf, but for the units that one question leaves out. */
function withoutSome(
  shared: MoveTable,
  { touched, own }: Present,
  joins: JoinTable,
  cores: CoreTable,
): MovesFrom {
  const table = new MoveTable(
    joins,
    own.flatMap((o) => o.boxes),
    cores,
    () => false,
  )
  const known = new Map<string, readonly Move[]>()
  const find = (face: Face, core: Core): readonly Move[] => {
    const { all, best, variants } = shared.of(face, core)
    const added = table.of(face, core).best
    const hit = [...touched].some((id) => variants.has(id))
    if (!hit && added.length === 0) return best
    const isTouched = (way: Way): boolean => touched.has(way.variant.id)
    const left = hit ? all.flatMap((m) => movedBy(m, isTouched) ?? []) : best
    return unbeaten([...left, ...added], () => false)
  }
  return (face, core) => {
    const key = `${face.id} ${core.id}`
    const moves = known.get(key) ?? find(face, core)
    known.set(key, moves)
    return moves
  }
}
