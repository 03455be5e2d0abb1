import { LIMITS } from '@coaxwain/shelf'
import { SOUND_RANK, TIER, type Sound } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { SigTable } from '../compile/sig'
import type { Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import type { Aerials } from './aerial'
import { assign } from './assign'
import { outlooks, type Outlook } from './bounds'
import { Expander } from './expand'
import type { Finisher } from './finish'
import { Front } from './front'
import { noWorseCost, type Finished, type Label } from './label'
import { bestScore } from './measure'
import { SoundRoutes } from './sound-route'

export interface SearchSpace {
  readonly starts: readonly Label[]
  readonly boxes: readonly Way[]
  readonly ends: readonly Way[]
  readonly soundBoxes: readonly Way[]
  readonly speakers: readonly Way[]
  readonly joins: JoinTable
  readonly sigs: SigTable
  readonly finisher: Finisher
  /** Null when nobody asks for the aerial to be kept. */
  readonly aerials: Aerials | null
  /** Sorts of units of which a chain may want more than there are; their use is kept in the label. */
  readonly scarceUnits: ReadonlySet<string>
  /** Chains that need more than so many purchases are not followed. */
  readonly mostBought: number
}

/**
 * Label-setting by layers: every chain of so many units, then one unit more. A label is dropped when another
 * of the same signal at the same face, with its sound in the same place, costs no more on any axis; and when
 * the best it could still become is already matched by a finished chain.
 */
export class Search {
  private layer: Label[]
  private next: Label[] = []
  private index = 0
  private readonly kept = new Map<string, Label[]>()
  private readonly beaten = new WeakSet<Label>()
  private readonly front = new Front()
  readonly expander: Expander
  private readonly byFace: ReadonlyMap<Face, readonly Way[]>
  private readonly outlooks: ReadonlyMap<number, Outlook>
  work = 0
  cut = false

  constructor(
    private readonly space: SearchSpace,
    private readonly budget: number = LIMITS.budget,
  ) {
    const sounds = new SoundRoutes(space.joins, space.soundBoxes)
    this.expander = new Expander(space.joins, sounds, space.sigs, space.scarceUnits, space.aerials)
    space.finisher.use(sounds, this.expander)
    this.byFace = groupByFace(space.boxes)
    this.outlooks = outlooks(space)
    this.layer = []
    for (const start of space.starts) {
      for (const label of this.expander.withAerial(null, start)) this.add(label)
    }
    this.layer = this.next
    this.next = []
  }

  get done(): boolean {
    return this.layer.length === 0
  }

  /** Expands at most so many labels. */
  step(expansions: number): void {
    for (let n = 0; n < expansions && !this.done; n++) {
      if (this.work >= this.budget) {
        this.cut = true
        this.layer = []
        return
      }
      const label = this.layer[this.index++]
      if (label && !this.isBeaten(label)) {
        this.work++
        this.expand(label)
      }
      if (this.index >= this.layer.length) {
        this.layer = this.next
        this.next = []
        this.index = 0
      }
    }
  }

  best(): readonly Finished[] {
    return this.front.all()
  }

  private expand(label: Label): void {
    for (const end of this.space.ends) {
      for (const finished of this.space.finisher.finish(label, end)) {
        if (this.goesRound(finished)) this.front.add(finished)
      }
    }
    if (label.depth >= LIMITS.boxesInLeg) return
    const out = label.way.from?.face
    if (!out) return
    for (const [face, ways] of this.byFace) {
      if (this.space.joins.between(out, face, PICTURE).length === 0) continue
      for (const way of ways) {
        for (const entry of this.expander.entries(label, way)) {
          this.expander.leave(label, way, entry, (made) => this.add(made))
        }
      }
    }
  }

  /** Once it is known what is scarce, a chain must find a unit and a piece for everything that it uses. */
  private goesRound(finished: Finished): boolean {
    const { joins, scarceUnits } = this.space
    if (!joins.hasScarce && scarceUnits.size === 0) return true
    return (
      'units' in assign(finished, (piece) => joins.drawer.pieces[piece]?.stock ?? 0, scarceUnits)
    )
  }

  private add(label: Label): void {
    const outlook = this.outlooks.get(label.way.from!.face.id)
    if (!outlook || label.depth + outlook.units > LIMITS.boxesInLeg) return
    if (
      label.bought + outlook.bought > this.space.mostBought ||
      this.isHopeless(label) ||
      this.overdrawn(label)
    )
      return
    const key = this.keyOf(label)
    const rivals = this.kept.get(key)
    if (!rivals) {
      this.kept.set(key, [label])
    } else {
      if (rivals.some((r) => noWorseCost(r, label))) return
      for (let i = rivals.length - 1; i >= 0; i--) {
        if (noWorseCost(label, rivals[i] as Label)) {
          this.beaten.add(rivals[i] as Label)
          rivals.splice(i, 1)
        }
      }
      rivals.push(label)
    }
    this.next.push(label)
  }

  private isBeaten(label: Label): boolean {
    return this.beaten.has(label) || this.isHopeless(label)
  }

  /** A finished chain is already as good as the best that this one could become. */
  private isHopeless(label: Label): boolean {
    const { sig } = label
    const ahead = this.outlooks.get(label.way.from!.face.id)!
    return this.front.matches(
      bestScore(Math.min(TIER[sig.poorest], ahead.tier), Math.min(sig.lumaMhz, ahead.lumaMhz)),
      Math.min(SOUND_RANK[soundStillThere(label)], ahead.sound),
      label.boxes + ahead.boxes,
      label.pieces + ahead.pieces,
      label.doubt + ahead.doubt,
      label.bought + ahead.bought,
    )
  }

  private keyOf(label: Label): string {
    const { sound } = label
    const where =
      sound.kind === 'none'
        ? ''
        : sound.at === label
          ? `here ${sound.sound}`
          : `${sound.at.way.from!.face.id} ${sound.sound}`
    return `${label.way.from!.face.id} ${label.sig.id} ${where} ${label.aerial ? 'aerial' : ''} ${this.scarce(label)}`
  }

  /** Takes more of a scarce sort of piece than the drawer holds. */
  private overdrawn(label: Label): boolean {
    if (!this.space.joins.hasScarce) return false
    const used = new Map<number, number>()
    for (let at: Label | null = label; at; at = at.prev) {
      for (const join of [at.step?.join, ...(at.step?.soundRoute?.joins ?? [])]) {
        for (const [piece, n] of join?.scarce ?? []) used.set(piece, (used.get(piece) ?? 0) + n)
      }
    }
    const { pieces } = this.space.joins.drawer
    return [...used].some(([piece, n]) => n > (pieces[piece]?.stock ?? 0))
  }

  /** Units and pieces of scarce sorts that the chain has taken so far. */
  private scarce(label: Label): string {
    const { scarceUnits, joins } = this.space
    if (scarceUnits.size === 0 && !joins.hasScarce) return ''
    const used: string[] = []
    for (let at: Label | null = label; at; at = at.prev) {
      if (scarceUnits.has(at.way.variant.id)) used.push(`${at.way.variant.id}:${at.way.id}`)
      for (const join of [at.step?.join, ...(at.step?.soundRoute?.joins ?? [])]) {
        for (const [piece, n] of join?.scarce ?? []) used.push(`#${piece}x${n}`)
      }
    }
    return used.sort().join()
  }
}

const PICTURE = { picture: true, sound: false }

const soundStillThere = (label: Label): Sound =>
  label.sound.kind === 'waits' ? label.sound.sound : label.sig.sound

function groupByFace(ways: readonly Way[]): Map<Face, Way[]> {
  const groups = new Map<Face, Way[]>()
  for (const way of ways) {
    const face = way.into?.face
    if (!face) continue
    const group = groups.get(face)
    if (group) group.push(way)
    else groups.set(face, [way])
  }
  return groups
}
