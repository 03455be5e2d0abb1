import { LIMITS, questionsOfUses } from '@coaxwain/shelf'
import type {
  Arrangement,
  ArrangementAnswer,
  ArrangementQuestion,
  Link,
  Question,
  Uid,
} from '@coaxwain/shelf'
import type { CompiledShelf } from '../compile/shelf'
import { buildHookup } from '../result/build'
import { PieceStock } from '../result/links'
import type { Cost, Finished } from '../search/label'
import { SOUND_RANK } from '@coaxwain/signal'
import { layOut, type Layout } from '../search/layout'
import { beginRound } from '../search/round'
import { Search, type SearchSpace } from '../search/search'
import { nodesOf, wiringOf, type Wiring } from '../search/wiring'
import { Bests, type Bound } from './bests'
import { allChains, type IsWorthwhile } from './chains'
import { Endings, type Known } from './endings'
import { leastTogether } from './footprint'
import { alone, merges, type Merged, type Timing } from './merge'
import type { Stepwise } from '../stepwise'

export type ArrangementSearch = Stepwise<ArrangementAnswer>

/** Wirings of the first uses that are tried with the next one. */
const MOST_KEPT = 200

const DEAREST: Cost = { boxes: Infinity, pieces: Infinity, doubt: Infinity, bought: 0 }

/** One use of the arrangement: where its chains run, and those that are known. */
interface Course {
  readonly question: Question
  readonly layout: Layout
  readonly space: Omit<SearchSpace, 'budget'>
  readonly chains: Wiring[]
  /** The best picture and sound that any chain of it has. */
  best: { picture: number; sound: number }
  /** The least of each cost that any chain of it has. */
  least: Cost
}

/**
 * A search for wirings that serve several uses with nothing plugged in or out between them. With two uses it
 * tries every chain of the one beside every chain of the other; with more it adds use by use to what it has
 * found so far, and says that this is not complete. Deterministic, as {@link createSearch} is.
 * Throws when the question names a unit that is not on the shelf, or a lead, or has several of both ends.
 */
export function createArrangementSearch(
  shelf: CompiledShelf,
  question: ArrangementQuestion,
  budget: number = LIMITS.budgetOfUses,
): ArrangementSearch {
  const search = new Arranging(shelf, questionsOf(question), timingOf(question), budget)
  return {
    step: (steps) => search.step(steps),
    get done() {
      return search.done
    },
    get work() {
      return search.work
    },
    best: () => search.best(),
  }
}

const timingOf = ({ displays }: ArrangementQuestion): Timing =>
  displays.length > 1 ? 'at-once' : 'in-turn'

/** One question for each pair of a source and a display. */
function questionsOf(question: ArrangementQuestion): Question[] {
  if (question.sources.length > 1 && question.displays.length > 1)
    throw new Error('several sources to several displays are several arrangements')
  return questionsOfUses(question)
}

class Arranging {
  private readonly course: Generator<void>
  private readonly bests = new Bests()
  private courses: Course[] = []
  private isHeard: (sound: number, best: number) => boolean = () => true
  /** Wirings of the uses so far, where more are to come. */
  private kept: Merged[] = []
  private cut = false
  work = 0
  done = false

  constructor(
    private readonly shelf: CompiledShelf,
    private readonly questions: readonly Question[],
    private readonly timing: Timing,
    private readonly budget: number,
  ) {
    for (const { source, display } of questions) {
      shelf.end(source.unit)
      shelf.end(display.unit)
    }
    this.course = this.run()
  }

  step(steps: number): void {
    for (let n = 0; n < steps && !this.done; n++) this.done = this.course.next().done === true
  }

  private *run(): Generator<void> {
    yield* this.shelf.compile()
    this.courses = this.questions.map((question) => this.lay(question))
    for (const course of this.courses) yield* this.solveAlone(course)
    if (this.courses.some((c) => c.chains.length === 0)) return
    yield* this.withSound(true)
    if (this.bests.all().length === 0) yield* this.withSound(false)
  }

  /** First with sound wherever there can be any; a silent use is only worth knowing where that fails. */
  private *withSound(wanted: boolean): Generator<void> {
    this.isHeard = (sound, best) => !wanted || sound >= Math.min(best, SOUND_RANK.mono)
    yield* this.fold()
    // A use without another is as good as the search for it alone has found it.
    if (this.courses.length > 1) yield* this.tryAll()
    for (const course of this.courses.slice(2)) yield* this.extend(course)
  }

  private lay(question: Question): Course {
    const layout = layOut(this.shelf, question)
    const none = { units: new Set<string>(), pieces: new Set<number>(), leadsApart: true }
    const { space } = beginRound(this.shelf, question, layout, none)
    return { question, layout, space, chains: [], best: { picture: 0, sound: 0 }, least: DEAREST }
  }

  /** Every use by itself: a good beginning, and the best that each can have. */
  private *solveAlone(course: Course): Generator<void> {
    const search = new Search({ ...course.space, budget: this.budget - this.work })
    while (!search.done) {
      search.step(1)
      yield
    }
    this.cut ||= search.cut
    for (const found of search.best()) {
      course.chains.push(wiringOf(found))
      course.best = {
        picture: Math.max(course.best.picture, found.axes.picture),
        sound: Math.max(course.best.sound, found.axes.sound),
      }
      course.least = {
        boxes: Math.min(course.least.boxes, found.axes.boxes),
        pieces: Math.min(course.least.pieces, found.axes.pieces),
        doubt: Math.min(course.least.doubt, found.axes.doubt),
        bought: 0,
      }
    }
  }

  /** Adds use by use to what is best so far. */
  private *fold(): Generator<void> {
    const [first, ...rest] = this.courses
    let merged = this.heard(first!).flatMap((w) => alone(w, this.drawer, this.timing) ?? [])
    for (const course of rest) {
      const grown = new Bests()
      const pairs = merged.flatMap((before) => this.heard(course).map((w) => [before, w] as const))
      for (const [before, wiring] of pairs) {
        for (const one of this.merge(before, wiring)) grown.add(one)
        yield
      }
      merged = [...grown.all()]
    }
    for (const one of merged) this.bests.add(one)
  }

  private heard({ chains, best }: Course): Wiring[] {
    return chains.filter((w) => this.isHeard(w.found.axes.sound, best.sound))
  }

  private get drawer() {
    return this.courses[0]!.layout.frame.drawer
  }

  private merge(before: Merged, wiring: Wiring): Merged[] {
    return merges(before, wiring, this.drawer, this.timing)
  }

  /** Every chain of the first use beside every chain of the second. */
  private *tryAll(): Generator<void> {
    const [first, second] = this.courses
    const streams = [this.stream(first!), this.stream(second!)] as const
    const known = [new Endings(), new Endings()] as const
    this.kept = []
    for (let open = true; open && !this.isSpent();) {
      const next = streams.map((s) => s.next())
      open = next.some(({ done }) => done !== true)
      yield* this.pair(0, next[0]?.value ?? null, known)
      yield* this.pair(1, next[1]?.value ?? null, known)
      yield
    }
  }

  /** Adds another use to what was found for those before it. */
  private *extend(course: Course): Generator<void> {
    const before = this.kept
    this.kept = []
    for (const found of this.stream(course)) {
      const added = found && wiringOf(found)
      for (const one of added ? before : []) {
        this.merge(one, added!).forEach((merged) => this.keep(merged))
        if (this.isSpent()) return
        yield
      }
      if (this.isSpent()) return
      yield
    }
  }

  private isSpent(): boolean {
    this.work++
    this.cut ||= this.work >= this.budget
    return this.cut
  }

  private keep(merged: Merged): void {
    if (merged.wirings.length === this.courses.length) this.bests.add(merged)
    else if (this.kept.length < MOST_KEPT) this.kept.push(merged)
  }

  private stream(course: Course): Generator<Finished | null, undefined> {
    const others = this.courses.filter((c) => c !== course)
    const free = this.endsAsBoxes(course, others)
    // A source or a display of its own also wants a lead of its own.
    const leads = free === 0 ? others.length : 0
    const least = (cost: keyof Cost): number => Math.max(...others.map((c) => c.least[cost]))
    const [boxes, pieces, doubt] = [least('boxes'), least('pieces'), least('doubt')]
    const isWorthwhile: IsWorthwhile = (picture, sound, cost) =>
      this.isHeard(sound, course.best.sound) &&
      this.bests.couldGain({
        pictures: [picture, ...others.map((c) => c.best.picture)],
        sounds: [sound, ...others.map((c) => c.best.sound)],
        cost: {
          boxes: Math.max(cost.boxes, boxes) - free,
          pieces: Math.max(cost.pieces + leads, pieces) - free,
          doubt: Math.max(cost.doubt, doubt),
          bought: 0,
        },
      })
    return allChains(course.space, isWorthwhile)
  }

  /** Ends of other uses that may serve here as boxes, and then cost nothing. */
  private endsAsBoxes({ layout }: Course, others: readonly Course[]): number {
    const offering = [...layout.present.rest, ...layout.present.own].filter(
      (o) => o.boxes.length > 0,
    )
    const ends = others.flatMap(({ question }) => [question.source.unit, question.display.unit])
    return [...new Set(ends)].filter((uid) =>
      offering.some((o) => o.variant.units.some((u) => u.uid === uid)),
    ).length
  }

  private *pair(
    side: 0 | 1,
    found: Finished | null,
    known: readonly [Endings, Endings],
  ): Generator<void> {
    if (!found) return
    const added = known[side].add(wiringOf(found))
    for (const beside of known[1 - side]!.besides(added)) {
      const [first, second] = side === 0 ? [added, beside] : [beside, added]
      if (!this.bests.couldGain(boundOf(first, second))) continue
      const before = alone(first.wiring, this.drawer, this.timing)
      if (!before) continue
      this.merge(before, second.wiring).forEach((merged) => this.keep(merged))
      if (this.isSpent()) return
      yield
    }
  }

  best(): ArrangementAnswer {
    const found = this.bests.all()
    return {
      format: 1,
      verdict: found.length > 0 ? 'yes' : 'none',
      complete: this.done && !this.cut && this.courses.length <= 2,
      work: this.work,
      arrangements: found.map((merged) => this.build(merged)),
    }
  }

  private build(merged: Merged): Arrangement {
    const pieces = new PieceStock(this.drawer)
    const { unitOf, standOf } = merged
    const hookups = merged.wirings.map((wiring, i) => {
      const { layout, question } = this.courses[i]!
      const { frame } = layout
      return buildHookup({ wiring, unitOf, frame, offAir: question.offAir, pieces, standOf })
    })
    const links = new Map(hookups.flatMap((h) => h.links).map((l) => [JSON.stringify(l), l]))
    const { boxes, pieces: count, doubt } = merged.cost
    return {
      uses: hookups.map((hookup, i) => ({
        source: this.questions[i]!.source.unit,
        display: this.questions[i]!.display.unit,
        hookup,
        off: this.timing === 'at-once' ? [] : leftOff(merged, i),
      })),
      links: [...links.values()] as Link[],
      axes: { boxes, pieces: count, doubt },
    }
  }
}

/** Units under power that other uses need and this one does not. */
function leftOff({ wirings, unitOf }: Merged, use: number): Uid[] {
  const unitsOf = (wiring: Wiring): Uid[] =>
    nodesOf(wiring)
      .filter((n) => n.way.variant.powered)
      .map((n) => unitOf.get(n)!.uid)
  const own = unitsOf(wirings[use]!)
  return [...new Set(wirings.flatMap(unitsOf))].filter((uid) => !own.includes(uid))
}

/** The best that two chains could be together. */
const boundOf = (first: Known, second: Known): Bound => ({
  pictures: [first.wiring.found.axes.picture, second.wiring.found.axes.picture],
  sounds: [first.wiring.found.axes.sound, second.wiring.found.axes.sound],
  cost: leastTogether(first.footprint, second.footprint),
})
