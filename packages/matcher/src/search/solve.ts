import type { Obstacle, Question, Uid, Unit } from '@coaxwain/shelf'
import { TIER, type Channel, type Quality } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { CompiledShelf, Offering, Present, Supply } from '../compile/shelf'
import type { Core, CoreTable } from '../compile/signal'
import { outOfReach, type Variant } from '../compile/variant'
import { isUsable, type Way } from '../compile/way'
import type { Drawer } from '../join/drawer'
import { JoinTable } from '../join/join'
import { obstacle } from '../reasons/breaks'
import { obstaclesBetween } from '../reasons/obstacles'
import { Aerials } from './aerial'
import { assign } from './assign'
import { Expander } from './expand'
import { Finisher, worksFully } from './finish'
import { pathOf, type Finished, type Label } from './label'
import { MoveTable, movedBy, unbeaten, type Move } from './moves'
import type { MovesFrom } from './outlook'
import { Search } from './search'
import { SoundRoutes } from './sound-route'
import { bestOf, startLabels } from './start'

/** A purchase of more things than this is no answer. */
const MOST_BOUGHT = 12

/** How often the search may be run again because units or pieces ran short. */
const MOST_ROUNDS = 6

export interface Solved {
  readonly found: Finished
  readonly units: ReadonlyMap<Way, Unit>
}

/** What every answer to one question has in common. */
export interface Frame {
  readonly source: Variant
  readonly display: Variant
  readonly drawer: Drawer
  /** Boxes on the shelf whose own carrier is on whenever they are. */
  readonly idle: readonly { readonly variant: Variant; readonly channels: readonly Channel[] }[]
  readonly best: { readonly source: Quality; readonly display: Quality; readonly sound: boolean }
}

/** One question laid out: where chains begin and end, and what may lie between. */
interface Layout {
  readonly frame: Frame
  readonly starts: readonly Way[]
  readonly ends: readonly Way[]
  /** With those that would harm somebody or are dead, which are reasons. */
  readonly allEnds: readonly Way[]
  readonly present: Present
  readonly labels: readonly Label[]
  readonly speakers: readonly Way[]
  readonly supply: Supply
}

/** The parts of one round of searching. */
interface Round {
  readonly joins: JoinTable
  readonly moves: MovesFrom
  readonly expander: Expander
  readonly search: Search
}

const all = (present: Present, pick: (offering: Offering) => readonly Way[]): Way[] =>
  [...present.rest, ...present.own].flatMap(pick)

/** A search that can be run in slices, and again with exact counts where the shelf ran short. */
export class Solver {
  private readonly course: Generator<void>
  private readonly scarceUnits = new Set<string>()
  private readonly scarcePieces = new Set<number>()
  private layout: Layout | null = null
  private round: Round | null = null
  private spent = 0
  private cut = false
  private solved: readonly Solved[] | null = null
  done = false

  /** Throws when the question names a unit that is not on the shelf, or a lead. */
  constructor(
    private readonly shelf: CompiledShelf,
    private readonly question: Question,
    private readonly budget: number,
  ) {
    for (const end of [question.source, question.display]) shelf.end(end.unit)
    this.course = this.run()
  }

  /** Goes on for so many small steps. */
  step(steps: number): void {
    for (let n = 0; n < steps && !this.done; n++) this.done = this.course.next().done === true
  }

  /** Labels expanded so far. */
  get work(): number {
    return this.spent + (this.round?.search.work ?? 0)
  }

  get complete(): boolean {
    return this.done && !this.cut && this.round?.joins.capped !== true
  }

  get frame(): Frame {
    if (!this.layout) throw new Error('nothing has been laid out yet')
    return this.layout.frame
  }

  private *run(): Generator<void> {
    yield* this.shelf.compile()
    const layout = this.lay()
    this.layout = layout
    for (let round = 1; this.solved === null; round++) {
      this.round = this.begin(layout)
      const { search } = this.round
      while (!search.done) {
        search.step(1)
        yield
      }
      this.solved = this.settle(search, round)
      this.spent += this.solved ? 0 : search.work
    }
  }

  private lay(): Layout {
    const { shelf, question } = this
    const source = shelf.end(question.source.unit)
    const display = shelf.end(question.display.unit)
    const leftOut = new Set<Uid>([...question.avoid, question.source.unit, question.display.unit])
    const present = shelf.present(leftOut)
    const starts = source.ways.filter((w) => w.fn.key === question.source.playing && isUsable(w))
    const allEnds = display.ways.filter(
      (w) =>
        w.fn.kind === 'shows' && w.in !== null && (question.display.input ?? w.fn.key) === w.fn.key,
    )
    const ends = allEnds.filter(isUsable)
    const speakers = all(present, (o) => o.sounds).filter((w) => w.soundTo === null)
    const supply = shelf.supply(question)
    const played = bestOf(starts, question.material)
    const ownSpeakers = display.variant.device.display?.loudspeakers !== 'none'
    const frame: Frame = {
      source: source.variant,
      display: display.variant,
      drawer: supply.drawer,
      idle: [...present.rest, ...present.own]
        .filter((o) => o.idle.length > 0)
        .map((o) => ({ variant: o.variant, channels: o.idle })),
      best: {
        source: played.quality,
        display: bestShown(ends),
        sound: played.sound && (ownSpeakers || speakers.length > 0),
      },
    }
    const labels = startLabels(starts, question.material, shelf.cores)
    return { frame, starts, ends, allEnds, present, labels, speakers, supply }
  }

  private begin(layout: Layout): Round {
    const { present, speakers } = layout
    const { cores, faces } = this.shelf
    const { demands, offAir } = this.question
    const scarceUnits = new Set(this.scarceUnits)
    const joins =
      this.scarcePieces.size === 0
        ? layout.supply.joins
        : new JoinTable(layout.frame.drawer, new Set(this.scarcePieces))
    const boxes = all(present, (o) => o.boxes)
    const aerials =
      demands.keepAerial === true
        ? new Aerials(
            all(present, (o) => o.aerials),
            boxes,
            { joins, faces, offAir },
          )
        : null
    const soundBoxes = all(present, (o) => o.sounds).filter((w) => w.soundTo !== null)
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
    const search = new Search({
      starts: layout.labels,
      moves,
      ends: (face, core) => last.of(face, core).best.filter((m) => finisher.canEnd(m)),
      joins,
      expander,
      finisher,
      outsideSpeakers: speakers.length > 0,
      scarceUnits,
      mostBought: this.shelf.bought.size > 0 ? MOST_BOUGHT : 0,
      budget: this.budget - this.spent,
    })
    return { joins, moves, expander, search }
  }

  /** What is found, or null where something was used more often than it is there and another round may tell. */
  private settle(search: Search, round: number): readonly Solved[] | null {
    const solved: Solved[] = []
    let short = false
    for (const found of search.best()) {
      const result = this.assigned(found)
      if ('units' in result) {
        solved.push({ found, units: result.units })
        continue
      }
      short = true
      for (const id of result.short.variants) this.scarceUnits.add(id)
      for (const piece of result.short.pieces) this.scarcePieces.add(piece)
    }
    const last = !short || round >= MOST_ROUNDS || search.cut
    if (last) this.cut ||= short || search.cut
    return last ? solved : null
  }

  private assigned(found: Finished) {
    const { pieces } = this.frame.drawer
    return assign(found, (piece) => pieces[piece]?.stock ?? 0, this.scarceUnits)
  }

  /** The best so far, as far as units and pieces go round. */
  soFar(): readonly Solved[] {
    if (this.solved) return this.solved
    return (this.round?.search.best() ?? []).flatMap((found) => {
      const result = this.assigned(found)
      return 'units' in result ? [{ found, units: result.units }] : []
    })
  }

  /** Why the shelf does not do it, or what looks right and would harm. Only when done. */
  obstacles(): Obstacle[] {
    const { layout, round, solved } = this
    if (!layout || !round || !solved) return []
    const efforts = solved.map((s) => s.found.axes)
    const joined = new Set(solved.flatMap((s) => joinsOf(s.found)))
    const boxes = Math.min(...efforts.map((a) => a.boxes))
    const pieces = Math.min(...efforts.filter((a) => a.boxes === boxes).map((a) => a.pieces))
    const found = obstaclesBetween(layout.labels, layout.allEnds, {
      joins: round.joins,
      expander: round.expander,
      moves: round.moves,
      boxes: all(layout.present, (o) => o.boxes),
      lightGun: this.question.demands.aim === 'light-gun',
      joined: (out, into) => joined.has(`${out.id} ${into.id}`),
      best: efforts.length > 0 ? { boxes, pieces } : null,
      whole: solved.some((s) => worksFully(s.found, layout.frame.best)),
    })
    return efforts.length > 0 ? found : [...stuck(layout.frame), ...found]
  }
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

/** Controls of the two ends that nobody can move, and of which nobody has noted where they stand. */
function stuck({ source, display }: Frame): Obstacle[] {
  return [source, display].flatMap(({ device, units }) => {
    const [unit] = units
    const unknown = device.controls.filter(
      (c) => unit && outOfReach(device, c, unit) && unit.stands[c.key] === undefined,
    )
    return unknown.map((c) => obstacle('out-of-reach', { to: device.name, control: c.label }))
  })
}

/** The faces that a chain joins, as pairs. */
function joinsOf(found: Finished): string[] {
  const path = pathOf(found.last)
  const ways = [...path.map((l) => l.way), found.end]
  return path.map((l, i) => `${l.way.from?.face.id} ${ways[i + 1]?.into?.face.id}`)
}

const bestShown = (ends: readonly Way[]): Quality =>
  ends.reduce<Quality>((best, way) => {
    const form = way.into?.face.form ?? 'none'
    return TIER[form] > TIER[best] ? form : best
  }, 'none')
