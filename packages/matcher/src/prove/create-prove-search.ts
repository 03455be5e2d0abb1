import { LIMITS, nameOf, triesBothSides } from '@coaxwain/shelf'
import type {
  Proof,
  ProofObstacle,
  ProveAnswer,
  ProveQuestion,
  Question,
  Signal,
  Uid,
  Unit,
} from '@coaxwain/shelf'
import { SOUND_RANK } from '@coaxwain/signal'
import type { CompiledShelf, Offering, Present } from '../compile/shelf'
import { isUsable, leastDoubt, type Way } from '../compile/way'
import { buildHookup } from '../result/build'
import { assign, type Shortage } from '../search/assign'
import { pathOf, type Cost, type Finished, type Label } from '../search/label'
import { layOut, waysIn } from '../search/layout'
import { MoveTable, type Move } from '../search/moves'
import { beginRound, type Round } from '../search/round'
import { startLabels } from '../search/start'
import { nodesOf, wiringOf, type Node, type Wiring } from '../search/wiring'
import { chooseChains } from './choose'
import { compareCosts, grow, onwards, type Lane } from './grow'
import { leansOn, obstacleTo, type Field } from './obstacle'
import {
  beyondOne,
  isByRightAlone,
  keyOf,
  onTrial,
  trialOf,
  untriedOf,
  withoutLeft,
  type Trial,
} from './trial'
import type { Stepwise } from '../stepwise'

export type ProveSearch = Stepwise<ProveAnswer>

/** How often the search may be run again because units or pieces ran short. */
const MOST_ROUNDS = 6

/** The best chain that tries something. */
interface Tested extends Trial {
  readonly wiring: Wiring
  readonly unitOf: ReadonlyMap<Node, Unit>
}

/**
 * A search for chains that try what nobody has tried of one unit, from a source to a display, with everything
 * else in them known to work: the fewest things on trial at once, then the fewest boxes, then the fewest pieces.
 * `shelf` is one made by {@link compileTried}.
 *
 * A picture and a sound may stand on trial in one chain, since the eye and the ear tell them apart; on one leg
 * two things do only where neither can be tried without the other, as a function and its only tried way out.
 * Left and right of one sound are one thing. What one chain has proved counts as known for those after it.
 *
 * Deterministic, as {@link createSearch} is. Throws when the question names a unit that is not on the shelf, or
 * a lead.
 */
export function createProveSearch(
  shelf: CompiledShelf,
  question: ProveQuestion,
  budget: number = LIMITS.budget,
): ProveSearch {
  const search = new Proving(shelf, question, budget)
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

class Proving {
  private readonly course: Generator<void>
  private readonly unit: Unit
  private readonly trial: ReturnType<CompiledShelf['apart']>
  /** Of all ways with one trial, the same object. */
  private readonly trials = new Map<string, Trial>()
  private readonly trialOfWay = new Map<Way, Trial | null>()
  private readonly tested = new Map<Trial, Tested>()
  /** Trials of which the best chain is known. */
  private readonly settled = new Set<Trial>()
  private readonly scarce = { units: new Set<string>(), pieces: new Set<number>() }
  /** Ways into the unit that something came in by. */
  private readonly entered = new Set<Way>()
  private field: Field | null = null
  private cut = false
  work = 0
  done = false

  constructor(
    private readonly shelf: CompiledShelf,
    private readonly question: ProveQuestion,
    private readonly budget: number,
  ) {
    const held = shelf.snapshot.units.find((u) => u.uid === question.unit)
    if (!held) throw new Error(`no unit ${question.unit}`)
    this.unit = onTrial(held, question.signal)
    const { variant, ways, sounds } = shelf.apart(this.unit)
    const lopsided = withoutLeft(variant.device, this.unit)
    const right = lopsided && shelf.apart(lopsided)
    this.trial = {
      variant,
      ways: [...ways, ...(right?.ways.filter(isByRightAlone) ?? [])],
      sounds: [...sounds, ...(right?.sounds.filter(isByRightAlone) ?? [])],
    }
    this.course = this.run()
  }

  step(steps: number): void {
    for (let n = 0; n < steps && !this.done; n++) this.done = this.course.next().done === true
  }

  private *run(): Generator<void> {
    yield* this.shelf.compile()
    this.field = this.layField()
    for (let round = 1, again = true; again; round++) {
      this.tested.clear()
      this.settled.clear()
      const before = this.scarce.units.size + this.scarce.pieces.size
      const stage = this.beginStage(this.field)
      for (const mostBoxes of BOXES_IN_TURN) {
        yield* this.through(this.field, stage, mostBoxes)
        yield* this.besides(this.field, mostBoxes)
        this.settle()
      }
      const short = this.scarce.units.size + this.scarce.pieces.size > before
      again = short && round < MOST_ROUNDS && !this.cut
      this.cut ||= short && !again
    }
  }

  /** No longer chain can be better than one without any doubt but what is on trial. */
  private settle(): void {
    for (const [trial, { wiring }] of this.tested) {
      const own = nodesOf(wiring).filter((n) => this.isOwn(n))
      const least = own.reduce((sum, { way }) => sum + leastDoubt(way), 0)
      if (wiring.found.axes.doubt === least) this.settled.add(trial)
    }
  }

  private layField(): Field {
    const { shelf, question, trial } = this
    const present = shelf.present(new Set([...question.avoid, question.unit]))
    const starts = waysIn(present, (o) => o.plays)
    const { signal } = question
    const isAsked = (way: Way): boolean => isUsable(way) && (!signal || leansOn(way, signal))
    const usable = trial.ways.filter(isAsked)
    return {
      present,
      supply: shelf.supply({ avoid: question.avoid, assumedLeads: [] }),
      starts: this.played(starts),
      shows: waysIn(present, (o) => o.shows),
      speakers: speakersIn(present),
      own: {
        plays: usable.filter((w) => w.fn.kind === 'plays' && w.from !== null),
        into: usable.filter((w) => w.into !== null && (w.from !== null || w.fn.kind === 'shows')),
        sounds: trial.sounds.filter(isAsked),
      },
    }
  }

  private played(ways: readonly Way[]): Label[] {
    return startLabels(ways, PLAIN, this.shelf.cores)
  }

  /** The unit as a source, in the middle, or as a display. */
  private *through(field: Field, { round, ends }: Stage, mostBoxes: number): Generator<void> {
    const { starts, own } = field
    const leaving: Lane<Trial>[] = this.played(own.plays).flatMap((label) => this.lane(label))
    const into = own.into.filter((way) => this.isOpen(this.trialOf(way)))
    if (into.length > 0)
      yield* this.grow(
        starts.map((label) => ({ label, purpose: null })),
        {
          round,
          mostBoxes,
          ends: this.tableOf(round, into),
          isWorthwhile: () => true,
          reach: ({ label }, move) => {
            this.entered.add(move.way)
            if (move.way.from === null)
              this.finish(round, { label, purpose: this.trialOf(move.way)! }, move)
            else leaving.push(...onwards(round, label, move).flatMap((made) => this.lane(made)))
          },
        },
      )
    yield* this.grow(leaving, {
      round,
      mostBoxes,
      ends,
      isWorthwhile: (purpose, cost) => this.couldBe(purpose, cost),
      reach: (lane, move) => this.finish(round, lane, move),
    })
  }

  /** The unit beside the picture: loudspeakers, and boxes that handle sound alone. */
  private *besides(field: Field, mostBoxes: number): Generator<void> {
    const { present, starts, speakers, own } = field
    const alike = new Map<Trial, Way[]>()
    for (const way of own.sounds) {
      const trial = this.trialOf(way)
      if (trial && this.isOpen(trial)) alike.set(trial, [...(alike.get(trial) ?? []), way])
    }
    for (const [trial, sounds] of alike) {
      const offering: Offering = { ...NOTHING, variant: this.trial.variant, sounds }
      const alone = { ...present, own: [...present.own, offering] }
      const spoken = sounds.filter((w) => w.soundTo === null)
      const heard = spoken.length > 0 ? spoken : speakers
      const { round, ends } = this.beginStage({ ...field, present: alone, speakers: heard })
      yield* this.grow(
        starts.map((label) => ({ label, purpose: trial })),
        {
          round,
          mostBoxes,
          ends,
          isWorthwhile: (purpose, cost) => this.couldBe(purpose, cost),
          reach: (lane, move) => this.finish(round, lane, move),
        },
      )
    }
  }

  private *grow<T>(...[starts, course]: Parameters<typeof grow<T>>): Generator<void> {
    for (const isLonger of grow(starts, course)) {
      if (isLonger) this.work++
      this.cut ||= this.work >= this.budget
      if (this.cut) return
      yield
    }
  }

  private beginStage({ present, supply, speakers, shows }: Field): Stage {
    const layout = { present, supply, speakers, labels: [], ends: [] }
    const round = beginRound(this.shelf, { demands: {}, offAir: [] }, layout, this.scarce)
    return { round, ends: this.tableOf(round, shows) }
  }

  /** Each way by itself, since alike ones may belong to different units or try different things. */
  private tableOf({ joins }: Round, ways: readonly Way[]): MoveTable {
    return new MoveTable(joins, ways, this.shelf.cores, () => true)
  }

  private trialOf(way: Way): Trial | null {
    const known = this.trialOfWay.get(way)
    if (known !== undefined) return known
    const made = trialOf(way, this.unit)
    const trial = made && (this.trials.get(keyOf(made)) ?? made)
    if (trial) this.trials.set(keyOf(trial), trial)
    this.trialOfWay.set(way, trial)
    return trial
  }

  private lane(label: Label): Lane<Trial>[] {
    const purpose = this.trialOf(label.way)
    return purpose && this.isOpen(purpose) ? [{ label, purpose }] : []
  }

  private isOpen(trial: Trial | null): boolean {
    return trial !== null && !this.settled.has(trial)
  }

  private couldBe(trial: Trial, cost: Cost): boolean {
    const known = this.tested.get(trial)
    return !known || compareCosts(cost, known.wiring.found.axes) <= 0
  }

  private finish(round: Round, { label, purpose }: Lane<Trial>, move: Move): void {
    const { finisher, joins, scarceUnits } = round.space
    if (!finisher.canEnd(move)) return
    const isWanted = (_picture: number, _sound: number, cost: Cost): boolean =>
      this.couldBe(purpose, cost)
    for (const found of finisher.finish(label, move, isWanted)) {
      if (!this.isBetter(purpose, found)) continue
      const wiring = wiringOf(found)
      if (!this.tells(purpose, wiring)) continue
      const others = nodesOf(wiring).filter((n) => !this.isOwn(n))
      const stockOf = (piece: number): number => joins.drawer.pieces[piece]?.stock ?? 0
      const result = assign(wiring, stockOf, scarceUnits, others)
      if ('short' in result) this.note(result.short)
      else {
        for (const own of nodesOf(wiring).filter((n) => this.isOwn(n)))
          result.unitOf.set(own, this.unit)
        this.tested.set(purpose, { ...purpose, wiring, unitOf: result.unitOf })
      }
    }
  }

  private isOwn({ way }: Node): boolean {
    return way.variant.id === this.trial.variant.id
  }

  /** A verdict can be read off it: all that it tries is in use, in colour where there is any, and heard. */
  private tells({ heard }: Trial, wiring: Wiring): boolean {
    const { found, chain } = wiring
    const display = chain.at(-1)!
    const greySet =
      this.isOwn(display) && display.way.variant.device.display?.screen === 'tube-mono'
    const grey = greySet || pathOf(found.last)[0]!.sig.core.colour === 'mono'
    const isUsed = nodesOf(wiring).some((n) => this.isOwn(n))
    const isHeard = triesBothSides(heard) ? found.sound === 'stereo' : found.sound !== 'none'
    return isUsed && (found.picture.colour || grey) && (heard.length === 0 || isHeard)
  }

  private isBetter(trial: Trial, found: Finished): boolean {
    const known = this.tested.get(trial)
    return !known || compareFound(found, known.wiring.found) < 0
  }

  private note({ variants, pieces }: Shortage): void {
    for (const id of variants) this.scarce.units.add(id)
    for (const piece of pieces) this.scarce.pieces.add(piece)
  }

  best(): ProveAnswer {
    const found = [...this.tested.values()].sort(
      (a, b) =>
        beyondOne(a, NONE) - beyondOne(b, NONE) || compareFound(a.wiring.found, b.wiring.found),
    )
    const { signal } = this.question
    const { chains, complete } = signal
      ? { chains: found.filter((c) => tries(c, signal)).slice(0, 1), complete: true }
      : chooseChains(found)
    const proofs = this.proofs(chains)
    const asked = signal ? [signal] : untriedOf(this.trial.variant.device, this.unit)
    return {
      format: 1,
      complete: this.done && !this.cut && complete,
      work: this.work,
      proofs,
      left: asked
        .filter((s) => !chains.some((c) => tries(c, s)))
        .map((s) => ({ signal: s, code: this.obstacle(s) })),
    }
  }

  private proofs(chains: readonly Tested[]): Proof[] {
    const known = new Set<string>()
    return chains.map((chain) => {
      const left = (signals: readonly Signal[]): Signal[] =>
        signals.filter((s) => !known.has(nameOf(s)))
      const [seen, heard] = [left(chain.seen), left(chain.heard)]
      const several = beyondOne(chain, known) > 0
      for (const s of [...seen, ...heard]) known.add(nameOf(s))
      return { ...this.built(chain), seen, heard, several }
    })
  }

  private built({ wiring, unitOf }: Tested): Pick<Proof, 'question' | 'hookup'> {
    const { chain } = wiring
    const [source, display] = [chain[0]!, chain.at(-1)!]
    const question: Question = {
      format: 1,
      source: { unit: unitOf.get(source)!.uid, playing: source.way.fn.key },
      material: PLAIN,
      display: { unit: unitOf.get(display)!.uid, input: display.way.fn.key },
      demands: { aim: 'prove' },
      avoid: this.question.avoid,
      offAir: [],
      assumedLeads: [],
    }
    const endOf = (uid: Uid) => (uid === this.unit.uid ? this.trial : this.shelf.end(uid))
    const { frame } = layOut(this.shelf, question, endOf)
    const part = new Set(nodesOf(wiring).map((n) => n.way.variant.device))
    // What else is on the shelf does not matter here, but for what is easily taken for a unit of the chain.
    const doubles = frame.shelf.filter((v) => part.has(v.device))
    const input = { wiring, unitOf, frame: { ...frame, shelf: doubles }, offAir: [] }
    return { question, hookup: buildHookup(input) }
  }

  private obstacle(signal: Signal): ProofObstacle {
    const { field, trial, unit, entered } = this
    if (!field || !this.done || this.cut) return 'not-known-yet'
    return obstacleTo(signal, { ...trial, unit, field, entered })
  }
}

/** What chains are grown with, and how they end. */
interface Stage {
  readonly round: Round
  readonly ends: MoveTable
}

/** Chains with few boxes are found first: most often they settle it, and they are there when time runs out. */
const BOXES_IN_TURN = [1, 3, Infinity] as const

const NONE: ReadonlySet<string> = new Set()

const NOTHING = { boxes: [], aerials: [], plays: [], shows: [], idle: [] } as const

/** Whatever the source plays by itself. */
const PLAIN = { protection: 'none' } as const

const speakersIn = (present: Present): Way[] =>
  waysIn(present, (o) => o.sounds).filter((w) => w.soundTo === null)

const tries = ({ seen, heard }: Trial, signal: Signal): boolean =>
  [...seen, ...heard].some((s) => nameOf(s) === nameOf(signal))

/** The shortest first; of equals the one with more to hear and to see. */
const compareFound = (a: Finished, b: Finished): number =>
  compareCosts(a.axes, b.axes) ||
  SOUND_RANK[b.sound] - SOUND_RANK[a.sound] ||
  b.axes.picture - a.axes.picture
