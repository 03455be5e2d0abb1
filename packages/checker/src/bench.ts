import type {
  Condition,
  ControlStands,
  DeviceModel,
  Jack,
  Key,
  ModelFunction,
} from '@coaxwain/models'
import { POWER_KEY } from '@coaxwain/models'
import type { Hookup, LineEnd, Link, Question, Snapshot, Uid } from '@coaxwain/shelf'
import { finding, type Finding, type FindingCode } from './finding'
import { Positions, ShelfView } from './shelf-view'

/** A hookup under check: what was asked, what the shelf holds, and what has been found wrong so far. */
export interface Bench {
  readonly question: Question
  readonly hookup: Hookup
  readonly view: ShelfView
  readonly positions: Positions
  readonly found: Finding[]
  /** What is plugged for other uses at the same time. */
  readonly beside?: { readonly links: readonly Link[]; readonly ends: readonly LineEnd[] }
}

export const benchOf = (
  snapshot: Snapshot,
  question: Question,
  hookup: Hookup,
  view: ShelfView = new ShelfView(snapshot),
): Bench => ({
  question,
  hookup,
  view,
  positions: new Positions(hookup),
  found: [],
})

/** Every unit that a leg passes, once. */
export const unitsIn = (hookup: Hookup): Uid[] => [
  ...new Set(hookup.legs.flatMap((l) => l.stops.map((s) => s.unit))),
]

/** Whether a jack is an input that a function must have: one of its needs, or of those that do instead. */
export const takesAt = (fn: ModelFunction, jack: Key | null): boolean =>
  jack !== null && [...fn.needs, ...(fn.oneOf ?? [])].includes(jack)

/** The power states in which a function acts. */
const powerFor = ({ power }: ModelFunction): Condition => {
  if (power === 'none') return []
  return [{ control: POWER_KEY, in: power === 'on' ? ['on'] : ['on', 'standby'] }]
}

/** One unit on the bench at work: a function of it, under the positions that the hookup sets. */
export class Stage {
  constructor(
    readonly bench: Bench,
    readonly unit: Uid,
    readonly device: DeviceModel,
    readonly fn: ModelFunction,
  ) {}

  /** The stage of a function that a hookup names, or null where there is no such thing. */
  static of(bench: Bench, unit: Uid, fn: Key): Stage | null {
    const device = bench.view.device(unit)
    const found = device?.functions.find((f) => f.key === fn)
    return device && found ? new Stage(bench, unit, device, found) : null
  }

  report(code: FindingCode, details: Finding['details'] = {}): void {
    this.bench.found.push(finding(code, { unit: this.unit, ...details }))
  }

  jack(key: Key | null): Jack | null {
    return this.device.jacks.find((j) => j.key === key) ?? null
  }

  /** Whether the function acts as its unit stands, power included; only asks. */
  acts(): boolean {
    return this.holds(this.fn.while) && this.holds(powerFor(this.fn))
  }

  /** Whether the function acts; a control that is left open, and should not be, is reported. */
  isSetToAct(): boolean {
    return this.settles(this.fn.while) && this.settles(powerFor(this.fn))
  }

  /** Whether a condition holds; only asks, and leaves no finding behind. */
  holds(condition: Condition | undefined): boolean {
    return (condition ?? []).every((c) => this.stand(c) === 'as-wanted')
  }

  /** Whether a condition holds; a control that the hookup leaves open, and should not, is reported. */
  settles(condition: Condition | undefined): boolean {
    const first = (condition ?? []).find((c) => this.stand(c) !== 'as-wanted')
    if (first && this.stand(first) === 'open') {
      this.report('position-left-open', { control: first.control })
    }
    return first === undefined
  }

  /** A control that the hookup leaves open may stand anywhere, so every one of its positions must do. */
  private stand({ control: key, in: wanted }: ControlStands): 'as-wanted' | 'otherwise' | 'open' {
    const at = this.bench.positions.of(this.unit, key) ?? (key === POWER_KEY ? 'on' : null)
    if (at !== null) return wanted.includes(at) ? 'as-wanted' : 'otherwise'
    const control = this.device.controls.find((c) => c.key === key)
    if (control?.kind !== 'positions' && control?.kind !== 'auto') return 'otherwise'
    return control.positions.every((p) => wanted.includes(p.key)) ? 'as-wanted' : 'open'
  }
}
