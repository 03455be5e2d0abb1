import type { Question } from '@coaxwain/shelf'
import type { Face } from '../compile/face'
import type { CompiledShelf, Present } from '../compile/shelf'
import type { Core, CoreTable } from '../compile/signal'
import type { Way } from '../compile/way'
import { forksOf } from '../join/fork'
import { JoinTable } from '../join/join'
import { Aerials } from './aerial'
import { Expander } from './expand'
import { Finisher } from './finish'
import { waysIn, type Layout } from './layout'
import { MoveTable, movedBy, unbeaten, type Move } from './moves'
import type { MovesFrom } from './states'
import type { SearchSpace } from './search'
import { SoundRoutes } from './sound-route'

/** A purchase of more things than this is no answer. */
const MOST_BOUGHT = 12

/** Sorts of units and pieces of which a chain may want more than there are. */
export interface Scarce {
  readonly units: ReadonlySet<string>
  readonly pieces: ReadonlySet<number>
  /** No lead serves more than one pair of units: for wiring that several uses have in common. */
  readonly leadsApart?: boolean
}

/** The parts of one round of searching. */
export interface Round {
  readonly joins: JoinTable
  readonly moves: MovesFrom
  readonly expander: Expander
  readonly space: Omit<SearchSpace, 'budget'>
  /** Null when nobody asks for the aerial to be kept. */
  readonly aerials: Aerials | null
}

/** Makes ready for a search in which what is scarce is counted exactly. */
export function beginRound(
  shelf: CompiledShelf,
  question: Pick<Question, 'demands' | 'offAir'>,
  layout: Pick<Layout, 'present' | 'speakers' | 'supply' | 'labels' | 'ends'>,
  scarce: Scarce,
): Round {
  const { present, speakers } = layout
  const { cores, faces } = shelf
  const { demands, offAir } = question
  const scarceUnits = new Set(scarce.units)
  const joins =
    scarce.pieces.size === 0
      ? layout.supply.joins
      : new JoinTable(layout.supply.drawer, new Set(scarce.pieces))
  const boxes = waysIn(present, (o) => o.boxes)
  const aerials =
    demands.keepAerial === true
      ? new Aerials({
          aerials: waysIn(present, (o) => o.aerials),
          boxes,
          joins,
          faces,
          offAir,
          scarceUnits,
        })
      : null
  const soundBoxes = waysIn(present, (o) => o.sounds).filter((w) => w.soundTo !== null)
  // Nobody goes to a shop to save a lead.
  const leadsApart = scarce.leadsApart === true || shelf.bought.size > 0
  const forks = leadsApart ? null : forksOf(joins)
  const sounds = new SoundRoutes(joins, soundBoxes, forks)
  const expander = new Expander({ sounds, cores, scarceUnits, aerials })
  const finisher = new Finisher({ demands, speakers, aerials, sounds, expander })
  const apart = (way: Way): boolean =>
    scarceUnits.has(way.variant.id) || (aerials !== null && hasRfInput(way))
  const special = aerials !== null || scarceUnits.size > 0 || joins.hasScarce
  const table = special ? new MoveTable(joins, boxes, cores, apart) : layout.supply.moves
  const moves = special ? bestOfTable(table) : withoutSome(table, layout.present, joins, cores)
  const last = new MoveTable(joins, layout.ends, cores, () => false)
  const space = {
    starts: layout.labels,
    states: layout.supply.states,
    moves,
    prepareMoves: (face: Face, core: Core) => table.prepare(face, core),
    ends: (face: Face, core: Core) => last.of(face, core).best.filter((m) => finisher.canEnd(m)),
    allEnds: (face: Face, core: Core) => last.all(face, core).filter((m) => finisher.canEnd(m)),
    joins,
    forks,
    expander,
    finisher,
    outsideSpeakers: speakers.length > 0,
    scarceUnits,
    mostBought: shelf.bought.size > 0 ? MOST_BOUGHT : 0,
  }
  return { joins, moves, expander, space, aerials }
}

/** An aerial may join there, or has to be passed on. */
const hasRfInput = ({ variant }: Way): boolean =>
  variant.device.jacks.some((j) => j.dir === 'in' && j.form === 'rf')

const bestOfTable =
  (table: MoveTable): MovesFrom =>
  (face, core) =>
    table.of(face, core).best

/** The moves of the whole shelf, but for the units that one question leaves out. */
function withoutSome(
  shared: MoveTable,
  { touched, own }: Present,
  joins: JoinTable,
  cores: CoreTable,
): MovesFrom {
  const remaining = own.flatMap((o) => o.boxes)
  const table = new MoveTable(joins, remaining, cores, () => false)
  const isTouched = (way: Way): boolean => touched.has(way.variant.id)
  const find = (face: Face, core: Core): readonly Move[] => {
    const { groups, best, bestOf } = shared.of(face, core)
    const hit = new Set([...touched].flatMap((id) => bestOf.get(id) ?? []))
    // What is not among the best is beaten by one that stays.
    if (hit.size === 0) return best
    const instead = table.of(face, core).groups
    return [...groups].flatMap(([key, group]) => {
      if (!hit.has(key)) return group.best
      const left = group.all.flatMap((m) => movedBy(m, isTouched) ?? [])
      return unbeaten([...left, ...(instead.get(key)?.all ?? [])])
    })
  }
  const known = new Map<number, readonly Move[]>()
  return (face, core) => {
    const key = face.id * MOST_CORES + core.id
    const moves = known.get(key) ?? find(face, core)
    known.set(key, moves)
    return moves
  }
}

/** More kinds of pictures than any shelf brings about. */
const MOST_CORES = 2 ** 24
