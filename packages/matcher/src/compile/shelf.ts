import type { Question, Snapshot, Uid, Unit } from '@coaxwain/shelf'
import { channelsIn, type Channel } from '@coaxwain/signal'
import { compileDrawer, type Drawer } from '../join/drawer'
import { JoinTable } from '../join/join'
import { MoveTable } from '../search/moves'
import { StateGraph } from '../search/states'
import { carriersOf } from './carriers'
import { FaceTable } from './face'
import { CoreTable } from './signal'
import { compileVariants, variantKey, variantOf, type Variant } from './variant'
import { isUsable, type Way } from './way'
import { WayMaker } from './way-maker'

/** Everything that the units of one variant can do in the middle of a chain. */
export interface Offering {
  readonly variant: Variant
  /** Ways of a picture through the unit. */
  readonly boxes: readonly Way[]
  /** Ways of sound alone, through the unit or into loudspeakers. */
  readonly sounds: readonly Way[]
  readonly aerials: readonly Way[]
  /** Ways of a picture that begins in the unit, and of one that ends there. */
  readonly plays: readonly Way[]
  readonly shows: readonly Way[]
  /** Channels of a carrier that is on whenever the unit is. */
  readonly idle: readonly Channel[]
}

/** Leads and adapters, with all that can be done with them. */
export interface Supply {
  readonly drawer: Drawer
  readonly joins: JoinTable
  /** Moves into every box, whether or not it is left out of a question. */
  readonly moves: MoveTable
  /** Where they lead to, for every question at once. */
  readonly states: StateGraph
}

/** What of a shelf is there for one question. */
export interface Present {
  /** Variants of which some units are left out; what they offer without those is in `own`. */
  readonly touched: ReadonlySet<string>
  readonly own: readonly Offering[]
  readonly rest: readonly Offering[]
}

/** A shelf made ready for questions: all that does not depend on the question, worked out once. */
export class CompiledShelf {
  readonly cores = new CoreTable()
  readonly faces = new FaceTable()
  private readonly maker = new WayMaker(this.faces)
  private readonly variants: readonly Variant[]
  private readonly offerings: Offering[] = []
  private readonly without = new Map<string, Offering>()
  private readonly ends = new Map<Uid, { variant: Variant; ways: readonly Way[] }>()
  private readonly units: ReadonlyMap<Uid, Unit>
  private readonly supplies = new Map<string, Supply>()

  constructor(
    readonly snapshot: Snapshot,
    readonly bought: ReadonlySet<Uid> = new Set(),
  ) {
    this.units = new Map(snapshot.units.map((u) => [u.uid, u]))
    this.variants = compileVariants(snapshot, bought)
  }

  /** Goes on in slices; does nothing when it has been done before. */
  *compile(): Generator<void> {
    for (let i = this.offerings.length; i < this.variants.length; i = this.offerings.length) {
      this.offerings.push(this.offer(this.variants[i]!))
      yield
    }
  }

  /** A source or a display, and every way through it. Throws when there is no such unit, or when it is a lead. */
  end(uid: Uid): { readonly variant: Variant; readonly ways: readonly Way[] } {
    const known = this.ends.get(uid)
    if (known) return known
    const unit = this.units.get(uid)
    if (!unit) throw new Error(`no unit ${uid}`)
    const made = this.apart(unit)
    this.ends.set(uid, made)
    return made
  }

  /** A unit by itself, as it is said to be here and not on the shelf. Throws when it is a lead. */
  apart(unit: Unit): {
    readonly variant: Variant
    readonly ways: readonly Way[]
    readonly sounds: readonly Way[]
  } {
    const variant = variantOf(this.snapshot, unit)
    const { maker } = this
    return { variant, ways: maker.waysOf(variant), sounds: maker.soundWaysOf(variant) }
  }

  /** All offerings but for some units. */
  present(leftOut: ReadonlySet<Uid>): Present {
    const touched = new Set([...leftOut].flatMap((uid) => this.variantOf(uid) ?? []))
    const rest = this.offerings.filter((o) => !touched.has(o.variant.id))
    const cut = this.offerings.filter((o) => touched.has(o.variant.id))
    return { touched, rest, own: cut.flatMap((o) => this.reduced(o.variant, leftOut) ?? []) }
  }

  /** The leads and adapters for one question, what can be joined with them, and every move that this allows. */
  supply(question: Pick<Question, 'avoid' | 'assumedLeads'>): Supply {
    const avoided = question.avoid.filter((uid) => this.isPiece(uid)).sort()
    const assumed = [...question.assumedLeads].sort()
    const key = JSON.stringify([avoided, assumed])
    const known = this.supplies.get(key)
    if (known) return known
    const drawer = compileDrawer(this.snapshot, new Set(avoided), assumed, this.bought)
    const joins = new JoinTable(drawer, new Set())
    const boxes = this.offerings.flatMap((o) => o.boxes)
    const moves = new MoveTable(joins, boxes, this.cores, () => false)
    const states = new StateGraph(moves)
    const made = { drawer, joins, moves, states }
    this.supplies.set(key, made)
    return made
  }

  private isPiece(uid: Uid): boolean {
    const unit = this.units.get(uid)
    return unit !== undefined && this.snapshot.models[unit.model]?.type === 'piece'
  }

  private variantOf(uid: Uid): string | null {
    const unit = this.units.get(uid)
    const model = unit && this.snapshot.models[unit.model]
    return model?.type === 'device' ? variantKey(model, unit!) : null
  }

  private reduced(variant: Variant, leftOut: ReadonlySet<Uid>): Offering | null {
    const units = variant.units.filter((u) => !leftOut.has(u.uid))
    if (units.length === 0) return null
    const key = `${variant.id} ${units.map((u) => u.uid).join()}`
    const known = this.without.get(key)
    if (known) return known
    const made = this.offer({ ...variant, units })
    this.without.set(key, made)
    return made
  }

  private offer(variant: Variant): Offering {
    const ways = this.maker.waysOf(variant).filter(isUsable)
    return {
      variant,
      boxes: ways.filter((w) => w.in !== null && w.out !== null),
      sounds: this.maker.soundWaysOf(variant).filter(isUsable),
      aerials: ways.filter((w) => w.fn.kind === 'receives' && w.from !== null),
      plays: ways.filter((w) => w.fn.kind === 'plays' && w.from !== null),
      shows: ways.filter((w) => w.fn.kind === 'shows' && w.in !== null),
      idle: idleCarriers(variant),
    }
  }
}

/** The channels of a carrier that is always on, beside a loop that passes the aerial. */
function idleCarriers({ device }: Variant): Channel[] {
  const loops = device.functions.some(
    (f) => f.kind === 'loop-through' && (f.while ?? []).length === 0,
  )
  const always = device.functions
    .flatMap((f) => f.gives.flatMap((g) => g.rf ?? []))
    .find((r) => r.always)
  if (!loops || !always) return []
  const { part, names } = carriersOf(device, always)
  return channelsIn(part).filter((c) => names.includes(c.name))
}
