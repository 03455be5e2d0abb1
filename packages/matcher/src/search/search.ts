import { LIMITS } from '@coaxwain/shelf'
import { SOUND_RANK, TIER, type Sound } from '@coaxwain/signal'
import type { Forks } from '../join/fork'
import type { JoinTable } from '../join/join'
import type { Face } from '../compile/face'
import type { Core } from '../compile/signal'
import { assign } from './assign'
import type { Expander } from './expand'
import type { Finisher, IsWanted } from './finish'
import { Front, type Finds } from './front'
import { leftBy, noWorseCost, plus, type Finished, type Label } from './label'
import { bestScore } from './measure'
import type { Move } from './moves'
import { Outlooks, type Outlook } from './outlook'
import { Queue } from './queue'
import { scarcePieces, takesNoMore, usedOf, type Scarcity, type Used } from './scarce'
import type { MovesFrom, StateGraph } from './states'
import { wiringOf } from './wiring'

export interface SearchSpace {
  readonly starts: readonly Label[]
  readonly states: StateGraph
  /** Moves into boxes. */
  readonly moves: MovesFrom
  /** Works the moves out of one state out in slices. */
  readonly prepareMoves: (face: Face, core: Core) => Generator<void>
  /** Moves into the display. */
  readonly ends: MovesFrom
  /** With those that others beat. */
  readonly allEnds: MovesFrom
  readonly joins: JoinTable
  /** Null where no sound shares a lead with a picture that goes elsewhere. */
  readonly forks: Forks | null
  readonly expander: Expander
  readonly finisher: Finisher
  readonly outsideSpeakers: boolean
  /** Sorts of units of which a chain may want more than there are; their use is kept in the label. */
  readonly scarceUnits: ReadonlySet<string>
  /** Chains that need more than so many purchases are not followed. */
  readonly mostBought: number
  /** Labels to expand at most. */
  readonly budget: number
}

/** Moves that are made from one label in one slice. */
const MOVES_AT_ONCE = 8

interface Rival {
  readonly label: Label
  readonly used: Used
}

/**
 * Label-setting, the chains with the fewest boxes and pieces first. A label is dropped when another of the
 * same signal at the same face, with its sound in the same place, is no worse on any axis; and when the best
 * it could still become is already matched by a finished chain.
 */
export class Search {
  private readonly queue = new Queue<Label>()
  private readonly kept = new Map<string, readonly Rival[]>()
  private readonly beaten = new WeakSet<Label>()
  private readonly outlooks: Outlooks
  private readonly course: Generator<void>
  done = false
  work = 0
  cut = false
  /** Sorts of which chains that were dropped wanted more than there are. */
  readonly short = { variants: new Set<string>(), pieces: new Set<number>() }

  constructor(
    private readonly space: SearchSpace,
    private readonly finds: Finds = new Front(),
  ) {
    this.outlooks = new Outlooks(space.starts, space)
    this.course = this.run()
  }

  /** Goes on for so many steps: a state explored, or a label expanded. */
  step(steps: number): void {
    for (let n = 0; n < steps && !this.done; n++) this.done = this.course.next().done === true
  }

  best(): readonly Finished[] {
    return this.finds.all()
  }

  private *run(): Generator<void> {
    yield* this.outlooks.explore()
    for (const start of this.space.starts) {
      for (const label of this.space.expander.withAerial(null, start)) this.add(label)
    }
    for (let label = this.queue.take(); label; label = this.queue.take()) {
      const ahead = this.beaten.has(label) ? null : this.outlookOf(label)
      if (!ahead || this.isHopeless(label, ahead)) continue
      if (this.work >= this.space.budget) {
        this.cut = true
        return
      }
      this.work++
      yield* this.expand(label)
      yield
    }
  }

  private outlookOf(label: Label): Outlook | null {
    return this.outlooks.at(label.way.from!.face, label.sig.core)
  }

  /** Goes on in slices from one label. */
  private *expand(label: Label): Generator<void> {
    const { ends, moves, prepareMoves, finisher, expander } = this.space
    const { face } = label.way.from!
    const { core } = label.sig
    const isWanted: IsWanted = (...axes) => !this.finds.matches(...axes)
    for (const move of ends(face, core)) {
      for (const found of finisher.finish(label, move, isWanted)) {
        if (this.goesRound(found)) this.finds.add(found)
      }
    }
    if (label.depth >= LIMITS.boxesInLeg) return
    yield* prepareMoves(face, core)
    let made = 0
    for (const move of moves(face, core)) {
      if (!this.isWorthwhile(label, move)) continue
      if (++made % MOVES_AT_ONCE === 0) yield
      for (const entry of expander.entries(label, move)) {
        for (const next of expander.leave(label, move, entry)) this.add(next)
      }
    }
  }

  /** A move can still lead to something that no finished chain matches, whatever becomes of the sound. */
  private isWorthwhile(label: Label, move: Move): boolean {
    const { way, leaving } = move
    const ahead = leaving && way.from && this.outlooks.at(way.from.face, leaving.core)
    if (!ahead || label.depth + 1 + ahead.units > LIMITS.boxesInLeg) return false
    const { sig } = label
    const tier = Math.min(TIER[sig.poorest], TIER[leaving.poorest], ahead.tier)
    const mhz = Math.min(sig.lumaMhz, leaving.lumaMhz, ahead.lumaMhz)
    const sound = Math.min(SOUND_RANK[soundStillThere(label)], ahead.sound)
    return !this.finds.matches(bestScore(tier, mhz), sound, plus(plus(label, move), ahead))
  }

  /** A finished chain is already as good as the best that this one could become. */
  private isHopeless(label: Label, ahead: Outlook): boolean {
    const { sig } = label
    return this.finds.matches(
      bestScore(Math.min(TIER[sig.poorest], ahead.tier), Math.min(sig.lumaMhz, ahead.lumaMhz)),
      Math.min(SOUND_RANK[soundStillThere(label)], ahead.sound),
      plus(label, ahead),
    )
  }

  /** Once it is known what is scarce, a chain must find a unit and a piece for everything that it uses. */
  private goesRound(finished: Finished): boolean {
    const { joins, scarceUnits } = this.space
    if (!joins.hasScarce && scarceUnits.size === 0) return true
    const stockOf = (piece: number): number => joins.drawer.pieces[piece]?.stock ?? 0
    const result = assign(wiringOf(finished), stockOf, scarceUnits)
    if ('unitOf' in result) return true
    for (const id of result.short.variants) this.short.variants.add(id)
    for (const piece of result.short.pieces) this.short.pieces.add(piece)
    return false
  }

  private add(label: Label): void {
    const ahead = this.outlookOf(label)
    if (!ahead || label.depth + ahead.units > LIMITS.boxesInLeg) return
    if (label.bought + ahead.bought > this.space.mostBought) return
    if (this.isHopeless(label, ahead) || this.overdrawn(label)) return
    const own: Rival = { label, used: usedOf(label, this.space) }
    const { forks } = this.space
    const key = placeOf(label)
    const rivals = this.kept.get(key)
    if (!rivals) {
      this.kept.set(key, [own])
    } else {
      if (rivals.some((r) => noWorse(r, own, forks))) return
      for (const { label: worse } of rivals.filter((r) => noWorse(own, r, forks)))
        this.beaten.add(worse)
      this.kept.set(key, [...rivals.filter((r) => !this.beaten.has(r.label)), own])
    }
    this.queue.put(label, ...this.finds.order(plus(label, ahead)))
  }

  /** Takes more of a scarce sort of piece than the drawer holds. */
  private overdrawn(label: Label): boolean {
    const { joins } = this.space
    if (!joins.hasScarce) return false
    const { pieces } = joins.drawer
    return [...scarcePieces(label)].some(([piece, n]) => n > (pieces[piece]?.stock ?? 0))
  }
}

/** What decides where a chain can still lead: what leaves it, where its sound is, what is left of scarce sorts. */
export function stateOf(label: Label, space: Scarcity): string {
  const used = [...usedOf(label, space).uses].map(([key, { count }]) => `${key} x${count}`)
  return `${placeOf(label)} ${used.sort().join()}`
}

/** What decides where a chain can still lead, but for what is scarce: what leaves it, and where its sound is. */
function placeOf(label: Label): string {
  const { sound, sig } = label
  const where =
    sound.kind === 'none' ? '' : sound.at === label ? 'here' : `${sound.at.way.from!.face.id}`
  return `${label.way.from!.face.id} ${sig.core.id} ${sig.shape} ${where} ${aerialOf(label)}`
}

/** An aerial that is received has done its duty; one that goes on beside the picture has not. */
const aerialOf = ({ aerial }: Label): string =>
  aerial === null ? '' : aerial.fn.tunedBy === undefined ? 'aerial' : 'received'

export const soundStillThere = (label: Label): Sound =>
  label.sound.kind === 'waits' ? label.sound.sound : label.sig.sound

/** Costs no more, and the picture and the sound have been through nothing worse. */
const noWorse = (
  { label: a, used }: Rival,
  { label: b, used: other }: Rival,
  forks: Forks | null,
): boolean =>
  noWorseCost(a, b) &&
  takesNoMore(used, other) &&
  TIER[a.sig.poorest] >= TIER[b.sig.poorest] &&
  a.sig.lumaMhz >= b.sig.lumaMhz &&
  Number(a.sig.direct) >= Number(b.sig.direct) &&
  SOUND_RANK[soundStillThere(a)] >= SOUND_RANK[soundStillThere(b)] &&
  (a.pieces < b.pieces || mayShare(a, forks) || !mayShare(b, forks))

/**
 * The sound may still be led over the leads on which the picture has left the unit where it waits; leads of
 * its own are a piece more.
 */
function mayShare(label: Label, forks: Forks | null): boolean {
  const { sound } = label
  const left = sound.kind === 'waits' ? leftBy(sound.at, label) : null
  return left !== null && forks?.mayShare(left.join) === true
}
