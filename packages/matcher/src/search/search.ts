import { LIMITS } from '@coaxwain/shelf'
import { SOUND_RANK, TIER, type Sound } from '@coaxwain/signal'
import type { JoinTable } from '../join/join'
import { assign } from './assign'
import type { Expander } from './expand'
import type { Finisher, IsWanted } from './finish'
import { Front } from './front'
import { noWorseCost, plus, type Finished, type Label } from './label'
import { bestScore } from './measure'
import type { Move } from './moves'
import { Outlooks, type Outlook } from './outlook'
import { Queue } from './queue'
import type { MovesFrom, StateGraph } from './states'
import { wiringOf } from './wiring'

export interface SearchSpace {
  readonly starts: readonly Label[]
  readonly states: StateGraph
  /** Moves into boxes. */
  readonly moves: MovesFrom
  /** Moves into the display. */
  readonly ends: MovesFrom
  /** With those that others beat. */
  readonly allEnds: MovesFrom
  readonly joins: JoinTable
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

/**
 * Label-setting, the chains with the fewest boxes and pieces first. A label is dropped when another of the
 * same signal at the same face, with its sound in the same place, is no worse on any axis; and when the best
 * it could still become is already matched by a finished chain.
 */
export class Search {
  private readonly queue = new Queue<Label>()
  private readonly kept = new Map<string, Label[]>()
  private readonly beaten = new WeakSet<Label>()
  private readonly front = new Front()
  private readonly outlooks: Outlooks
  private readonly course: Generator<void>
  done = false
  work = 0
  cut = false
  /** Sorts of which chains that were dropped wanted more than there are. */
  readonly short = { variants: new Set<string>(), pieces: new Set<number>() }

  constructor(private readonly space: SearchSpace) {
    this.outlooks = new Outlooks(space.starts, space)
    this.course = this.run()
  }

  /** Goes on for so many steps: a state explored, or a label expanded. */
  step(steps: number): void {
    for (let n = 0; n < steps && !this.done; n++) this.done = this.course.next().done === true
  }

  best(): readonly Finished[] {
    return this.front.all()
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
      this.expand(label)
      yield
    }
  }

  private outlookOf(label: Label): Outlook | null {
    return this.outlooks.at(label.way.from!.face, label.sig.core)
  }

  private expand(label: Label): void {
    const { ends, moves, finisher, expander } = this.space
    const { face } = label.way.from!
    const { core } = label.sig
    const isWanted: IsWanted = (...axes) => !this.front.matches(...axes)
    for (const move of ends(face, core)) {
      for (const found of finisher.finish(label, move, isWanted)) {
        if (this.goesRound(found)) this.front.add(found)
      }
    }
    if (label.depth >= LIMITS.boxesInLeg) return
    for (const move of moves(face, core)) {
      if (!this.isWorthwhile(label, move)) continue
      for (const entry of expander.entries(label, move)) {
        for (const made of expander.leave(label, move, entry)) this.add(made)
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
    return !this.front.matches(bestScore(tier, mhz), sound, plus(plus(label, move), ahead))
  }

  /** A finished chain is already as good as the best that this one could become. */
  private isHopeless(label: Label, ahead: Outlook): boolean {
    const { sig } = label
    return this.front.matches(
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
    const key = this.keyOf(label)
    const rivals = this.kept.get(key)
    if (!rivals) {
      this.kept.set(key, [label])
    } else {
      if (rivals.some((r) => noWorse(r, label))) return
      for (let i = rivals.length - 1; i >= 0; i--) {
        if (noWorse(label, rivals[i] as Label)) this.beaten.add(...(rivals.splice(i, 1) as [Label]))
      }
      rivals.push(label)
    }
    this.queue.put(label, label.boxes + ahead.boxes, label.pieces + ahead.pieces)
  }

  private keyOf(label: Label): string {
    const { sound, sig } = label
    const where =
      sound.kind === 'none' ? '' : sound.at === label ? 'here' : `${sound.at.way.from!.face.id}`
    return `${label.way.from!.face.id} ${sig.core.id} ${sig.shape} ${where} ${label.aerial ? 'aerial' : ''} ${this.scarce(label)}`
  }

  /** Takes more of a scarce sort of piece than the drawer holds. */
  private overdrawn(label: Label): boolean {
    const { joins } = this.space
    if (!joins.hasScarce) return false
    const { pieces } = joins.drawer
    return [...scarcePieces(label)].some(([piece, n]) => n > (pieces[piece]?.stock ?? 0))
  }

  /** Units and pieces of scarce sorts that the chain has taken so far. */
  private scarce(label: Label): string {
    const { scarceUnits, joins } = this.space
    if (scarceUnits.size === 0 && !joins.hasScarce) return ''
    const units: string[] = []
    for (let at: Label | null = label; at; at = at.prev) {
      if (scarceUnits.has(at.way.variant.id)) units.push(`${at.way.variant.id}:${at.way.id}`)
    }
    const pieces = [...scarcePieces(label)].map(([piece, n]) => `#${piece}x${n}`)
    return [...units, ...pieces].sort().join()
  }
}

function scarcePieces(label: Label): Map<number, number> {
  const used = new Map<number, number>()
  const note = (piece: number, n: number): void => void used.set(piece, (used.get(piece) ?? 0) + n)
  for (let at: Label = label; at.prev && at.step; at = at.prev) {
    const { join, soundRoute, terminators } = at.step
    for (const { scarce } of [join, ...(soundRoute?.joins ?? [])])
      for (const [piece, n] of scarce) note(piece, n)
    for (const piece of terminators) note(piece, 1)
  }
  return used
}

export const soundStillThere = (label: Label): Sound =>
  label.sound.kind === 'waits' ? label.sound.sound : label.sig.sound

/** Costs no more, and the picture and the sound have been through nothing worse. */
const noWorse = (a: Label, b: Label): boolean =>
  noWorseCost(a, b) &&
  TIER[a.sig.poorest] >= TIER[b.sig.poorest] &&
  a.sig.lumaMhz >= b.sig.lumaMhz &&
  Number(a.sig.direct) >= Number(b.sig.direct) &&
  SOUND_RANK[soundStillThere(a)] >= SOUND_RANK[soundStillThere(b)]
