import { checkHookup } from '@coaxwain/checker'
import {
  arcsOf,
  compileShelf,
  createSearch,
  type ArcMap,
  type CompiledShelf,
} from '@coaxwain/matcher'
import type { Answer, Hookup, Question, Snapshot } from '@coaxwain/shelf'
import { Chance } from '../../support/chance'
import { askDatabase } from './database'
import { buildGraph, cheapestPath } from './graph'
import { drawQuestions } from './questions'
import { drawShelf, type ShelfSize } from './shelves'
import { canReach, sweepMapOf } from './sweep'
import { ratio, timed, timesOf, type Times } from './times'

const SEED = 20_260_401
const SIZES: readonly ShelfSize[] = [50, 500].flatMap((models) =>
  [100, 1000, 10_000].map((units) => ({ units, models })),
)
/** Each shelf is asked so many questions, sound and all. */
const QUESTIONS = 200
/** The peers are asked for pictures only, until so many of their answers are right. */
const COMPARED = 300
/** A chain counts as long with so many boxes between source and display. */
const LONG = 3
/** How often a question may turn out too short, or a peer's answer wrong, before we give up. */
const MOST_TRIED = 20_000
const ASKED_OF_DATABASE = 12

/** How far it has got; the figures alone go to the standard output. */
const say = (what: string): void => {
  process.stderr.write(`${what}\n`)
}

export async function measureHookups(): Promise<unknown> {
  const shelves = SIZES.map((size) => measureShelf(size))
  return {
    seed: SEED,
    shelves: shelves.map((s) => s.report),
    tenThousandOverOneThousand: [50, 500].map((models) => ({
      models,
      ratio: medianOf(shelves, models, 10_000) / medianOf(shelves, models, 1000),
    })),
    peers: await compare({ units: 500, models: 250 }),
  }
}

type Measured = ReturnType<typeof measureShelf>

const medianOf = (shelves: readonly Measured[], models: number, units: number): number =>
  shelves.find((s) => s.report.models === models && s.report.units === units)!.report.question
    .medianMs

function ask(shelf: CompiledShelf, question: Question): Answer {
  const search = createSearch(shelf, question)
  while (!search.done) search.step(1000)
  return search.best()
}

function measureShelf(size: ShelfSize) {
  say(`${size.units} units over ${size.models} models`)
  const chance = new Chance(SEED + size.units * 7 + size.models)
  const snapshot = drawShelf(size, chance)
  const questions = take(drawQuestions(snapshot, chance, 'as-recorded'), QUESTIONS)
  const compiled = timed(() => {
    const shelf = compileShelf(snapshot)
    for (const _ of shelf.compile());
    return shelf
  })
  const first = questions.map((question) => timed(() => ask(compiled.value, question)))
  const runs = questions.map((question) => timed(() => ask(compiled.value, question)))
  const answers = runs.map((r) => r.value)
  return {
    report: {
      ...size,
      compileMs: Math.round(compiled.ms),
      firstAsked: timesOf(first.map((r) => r.ms)),
      question: timesOf(runs.map((r) => r.ms)),
      yes: answers.filter((a) => a.verdict === 'yes').length,
      incomplete: answers.filter((a) => !a.complete).length,
    },
  }
}

function take<T>(from: Iterable<T>, most: number): T[] {
  const taken: T[] = []
  for (const one of from) {
    taken.push(one)
    if (taken.length >= most) break
  }
  return taken
}

interface Compared {
  readonly boxes: number
  readonly oursMs: number
  readonly unitGraph: GraphRun
  readonly sortGraph: GraphRun
  readonly sweepMs: number
}

interface GraphRun {
  readonly buildMs: number
  readonly pathMs: number
  readonly path: readonly number[] | null
}

function askGraph(map: ArcMap): GraphRun {
  const built = timed(() => buildGraph(map))
  const path = timed(() => cheapestPath(built.value))
  return { buildMs: built.ms, pathMs: path.ms, path: path.value }
}

const boxesOf = (hookup: Hookup): number => hookup.legs[0]!.stops.length - 2

/** One question put to everybody; the reason where the library's answer is wrong. */
function compareOne(
  { shelf, snapshot }: { shelf: CompiledShelf; snapshot: Snapshot },
  question: Question,
): Compared | string {
  const ours = timed(() => ask(shelf, question))
  const units = arcsOf(shelf, question, 'units')
  const unitGraph = askGraph(units)
  const hookup = unitGraph.path && units.hookup(unitGraph.path)
  if (!hookup) return unitGraph.path ? 'lacks a unit, a piece or a position' : 'no path'
  const { findings } = checkHookup(snapshot, question, hookup)
  if (findings.length > 0) return findings[0]!.code
  const lists = sweepMapOf(units)
  return {
    boxes: boxesOf(hookup),
    oursMs: ours.ms,
    unitGraph,
    sortGraph: askGraph(arcsOf(shelf, question, 'sorts')),
    sweepMs: timed(() => canReach(lists)).ms,
  }
}

/** What is kept of the comparison: chains by their length, and the first maps of each. */
class Kept {
  readonly long: Compared[] = []
  readonly short: Compared[] = []
  readonly maps: ArcMap[] = []

  get isFull(): boolean {
    return [this.long, this.short].every((list) => list.length >= COMPARED / 2)
  }

  wants(boxes: number): boolean {
    return this.listOf(boxes).length < COMPARED / 2
  }

  add(found: Compared, map: () => ArcMap): void {
    if (!this.wants(found.boxes)) return
    const list = this.listOf(found.boxes)
    if (list.length < ASKED_OF_DATABASE / 2) this.maps.push(map())
    list.push(found)
    if (list.length % 25 === 0)
      say(`${this.short.length} short and ${this.long.length} long chains compared`)
  }

  private listOf(boxes: number): Compared[] {
    return boxes >= LONG ? this.long : this.short
  }
}

/** Half of what is compared has long chains. */
async function compare(size: ShelfSize) {
  const chance = new Chance(SEED)
  const snapshot = drawShelf(size, chance)
  const shelf = compileShelf(snapshot)
  const kept = new Kept()
  const wrong: Record<string, number> = {}
  let tried = 0
  for (const question of drawQuestions(snapshot, chance, 'none')) {
    if (kept.isFull || tried++ >= MOST_TRIED) break
    // Asked once before it is timed, as on any shelf but for the very first question.
    const [best] = ask(shelf, question).hookups
    if (!best || !kept.wants(boxesOf(best))) continue
    const found = compareOne({ shelf, snapshot }, question)
    if (typeof found === 'string') wrong[found] = (wrong[found] ?? 0) + 1
    else kept.add(found, () => arcsOf(shelf, question, 'units'))
  }
  const compared = [...kept.short, ...kept.long]
  const ours = compared.map((c) => c.oursMs)
  const database = await askDatabase(kept.maps)
  return {
    ...size,
    tried,
    compared: compared.length,
    withLongChains: kept.long.length,
    wrongAnswersOfGraph: wrong,
    ours: timesOf(ours),
    /** A node for each unit and picture that leaves it, as one would build it from a list of units. */
    graphOfUnits: graphReport(
      ours,
      compared.map((c) => c.unitGraph),
    ),
    /** The same after our own putting together of units that do the same. */
    graphOfSorts: graphReport(
      ours,
      compared.map((c) => c.sortGraph),
    ),
    database: {
      ...timesOf(database.map((d) => d.ms)),
      stopped: database.filter((d) => d.stopped).length,
    },
    booleanSweep: peer(
      ours,
      compared.map((c) => c.sweepMs),
    ),
  }
}

const graphReport = (ours: readonly number[], runs: readonly GraphRun[]) => ({
  withBuilding: peer(
    ours,
    runs.map((r) => r.buildMs + r.pathMs),
  ),
  pathAlone: peer(
    ours,
    runs.map((r) => r.pathMs),
  ),
})

/** Over one: ours is sooner by so many times. */
const peer = (ours: readonly number[], theirs: readonly number[]): Times & { ratio: number } => ({
  ...timesOf(theirs),
  ratio: ratio(ours, theirs),
})
