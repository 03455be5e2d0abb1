import type { Obstacle, Question, Unit } from '@coaxwain/shelf'
import type { CompiledShelf } from '../compile/shelf'
import { outOfReach } from '../compile/variant'
import { obstacle } from '../reasons/breaks'
import { obstaclesBetween } from '../reasons/obstacles'
import { assign, type Shortage } from './assign'
import { worksFully } from './finish'
import { Front, type Finds } from './front'
import { pathOf, type Finished } from './label'
import { layOut, waysIn, type Frame, type Layout } from './layout'
import { beginRound, type Round } from './round'
import { Search } from './search'
import { wiringOf, type Node, type Wiring } from './wiring'

/** How often the search may be run again because units or pieces ran short. */
const MOST_ROUNDS = 6

export interface Solved {
  readonly wiring: Wiring
  readonly unitOf: ReadonlyMap<Node, Unit>
}

/** A search that can be run in slices, and again with exact counts where the shelf ran short. */
export class Solver {
  private readonly course: Generator<void>
  private readonly scarce = {
    units: new Set<string>(),
    pieces: new Set<number>(),
  }
  private layout: Layout | null = null
  private round: Round | null = null
  private search: Search | null = null
  private spent = 0
  private cut = false
  private solved: readonly Solved[] | null = null
  done = false

  /** Throws when the question names a unit that is not on the shelf, or a lead. */
  constructor(
    private readonly shelf: CompiledShelf,
    private readonly question: Question,
    private readonly budget: number,
    private readonly findsFor: (frame: Frame) => Finds = () => new Front(),
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
    return this.spent + (this.search?.work ?? 0)
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
    const { shelf, question } = this
    const layout = layOut(shelf, question)
    this.layout = layout
    for (let round = 1; this.solved === null; round++) {
      this.round = beginRound(shelf, question, layout, this.scarce)
      if (this.round.aerials) yield* this.round.aerials.prepare()
      const space = { ...this.round.space, budget: this.budget - this.spent }
      const search = new Search(space, this.findsFor(layout.frame))
      this.search = search
      while (!search.done) {
        search.step(1)
        yield
      }
      this.solved = this.settle(search, round)
      this.spent += this.solved ? 0 : search.work
    }
  }

  /** What is found, or null where something was used more often than it is there and another round may tell. */
  private settle(search: Search, round: number): readonly Solved[] | null {
    const solved: Solved[] = []
    let short = false
    for (const found of search.best()) {
      const wiring = wiringOf(found)
      const result = this.assigned(wiring)
      if ('unitOf' in result) {
        solved.push({ wiring, unitOf: result.unitOf })
        continue
      }
      this.note(result.short)
      short = true
    }
    // A chain that was dropped for want of a piece may have hidden another that would have gone round.
    if (this.note(search.short)) short = true
    const last = !short || round >= MOST_ROUNDS || search.cut
    if (last) this.cut ||= short || search.cut
    return last ? solved : null
  }

  /** Says whether anything of it was not known as scarce. */
  private note({ variants, pieces }: Shortage): boolean {
    const { scarce } = this
    const before = scarce.units.size + scarce.pieces.size
    for (const id of variants) scarce.units.add(id)
    for (const piece of pieces) scarce.pieces.add(piece)
    return scarce.units.size + scarce.pieces.size > before
  }

  private assigned(wiring: Wiring) {
    const { pieces } = this.frame.drawer
    return assign(wiring, (piece) => pieces[piece]?.stock ?? 0, this.scarce.units)
  }

  /** The best so far, as far as units and pieces go round. */
  soFar(): readonly Solved[] {
    if (this.solved) return this.solved
    return (this.search?.best() ?? []).flatMap((found) => {
      const wiring = wiringOf(found)
      const result = this.assigned(wiring)
      return 'unitOf' in result ? [{ wiring, unitOf: result.unitOf }] : []
    })
  }

  /** Why the shelf does not do it, or what looks right and would harm. Only when done. */
  obstacles(): Obstacle[] {
    const { layout, round, solved } = this
    if (!layout || !round || !solved) return []
    const efforts = solved.map((s) => s.wiring.found.axes)
    const joined = new Set(solved.flatMap((s) => joinsOf(s.wiring.found)))
    const boxes = Math.min(...efforts.map((a) => a.boxes))
    const pieces = Math.min(...efforts.filter((a) => a.boxes === boxes).map((a) => a.pieces))
    const found = obstaclesBetween(layout.labels, layout.allEnds, {
      joins: round.joins,
      expander: round.expander,
      moves: round.moves,
      boxes: waysIn(layout.present, (o) => o.boxes),
      lightGun: this.question.demands.aim === 'light-gun',
      joined: (out, into) => joined.has(`${out.id} ${into.id}`),
      best: efforts.length > 0 ? { boxes, pieces } : null,
      whole: solved.some((s) => worksFully(s.wiring.found, layout.frame.best)),
    })
    return efforts.length > 0 ? found : [...stuck(layout.frame), ...found]
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
