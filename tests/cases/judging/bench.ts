import {
  isPiece,
  type CaseAnswer,
  type CaseControl,
  type CaseHop,
  type CasePath,
  type CasePiece,
  type CasePort,
  type CaseQuestion,
  type CaseSetting,
  type CaseUnit,
  type PieceUse,
  type When,
} from '../form'

export const pieceId = (use: PieceUse): string => (typeof use === 'string' ? use : use.id)

export const isOffAir = (path: CasePath): boolean => path.purpose.startsWith('off-air')

/** The unit that a setting follows: "as UNIT". */
export const followed = (to: string): string | undefined => /^as (.+)$/.exec(to)?.[1]

export const unitOf = (ref: string): string => ref.split(':')[0] ?? ''
export const portName = (ref: string): string => ref.split(':')[1] ?? ''

/** How a name tells the kind of control, for settings that use names of their own. */
const KINDS: readonly (readonly [told: RegExp, classes: readonly string[]])[] = [
  [/tuned|tune to/i, ['tuned-to']],
  [/channel/i, ['channel', 'tuned-to']],
  [/input|source/i, ['input']],
  [/plan|air|cable/i, ['antenna-plan']],
  [/75|termin|load/i, ['termination']],
]

/** The things of a question and what an answer does with them. */
export class Bench {
  readonly units = new Map<string, CaseUnit>()
  readonly pieces = new Map<string, CasePiece>()
  readonly hops: readonly CaseHop[]

  constructor(
    readonly question: CaseQuestion,
    readonly answer: CaseAnswer,
  ) {
    this.units.set('source', question.source).set('display', question.display)
    const bought = (answer.missing ?? []).map((m) => m.item)
    for (const item of [...question.shelf, ...bought]) {
      if (isPiece(item)) this.pieces.set(item.id, item)
      else this.units.set(item.id ?? '', item)
    }
    this.hops = answer.paths.flatMap((p) => p.hops)
  }

  unit(id: string): CaseUnit | undefined {
    return this.units.get(id)
  }

  port(ref: string): CasePort | undefined {
    return this.unit(unitOf(ref))?.ports.find((p) => p.id === portName(ref))
  }

  /** Hops of every path but those of the aerial. */
  get watched(): readonly CaseHop[] {
    return this.answer.paths.filter((p) => !isOffAir(p)).flatMap((p) => p.hops)
  }

  /** Units in the chain from the source to the display and to what makes sound. */
  get chain(): readonly string[] {
    return [...new Set(this.watched.flatMap((h) => [unitOf(h.from), unitOf(h.to)]))]
  }

  /** The control that an answered setting means: by name, else by class, else by what the name tells. */
  meant({ on, set, class: named }: CaseSetting): CaseControl | undefined {
    const controls = this.unit(on)?.settings ?? []
    const byName = controls.find((c) => c.name === set)
    if (byName) return byName
    for (const wanted of [named, set]) {
      const alike = controls.filter((c) => c.class === wanted)
      if (alike.length === 1) return alike[0]
    }
    const [, classes] = KINDS.find(([told]) => told.test(set)) ?? []
    return classes?.flatMap((k) => controls.filter((c) => c.class === k))[0]
  }

  settingsFor(unit: string, control: string): readonly CaseSetting[] {
    return this.answer.settings.filter((s) => s.on === unit && this.meant(s)?.name === control)
  }

  /** The choice that an answered position means; an input also by the port that it opens. */
  choice(unit: string, control: CaseControl, to: string): string | undefined {
    if (control.choices?.includes(to)) return to
    if (control.class !== 'input') return control.choices ? undefined : to
    const named = this.unit(unit)?.ports.find((p) => p.id === to || p.label === to)
    return named?.when?.[control.name]?.[0]
  }
}

/** Where controls stand while the source is watched: as the answer says, and in one of the ways it leaves open. */
export class Stand {
  constructor(
    private readonly bench: Bench,
    private readonly open: ReadonlyMap<string, string>,
  ) {}

  /** The position of a control; undefined where nothing is known of it. */
  at(unit: string, control: string): string | undefined {
    const known = this.bench.unit(unit)?.settings?.find((c) => c.name === control)
    const [given] = this.bench.settingsFor(unit, control)
    if (known?.class === 'auto') return this.moved(unit, known)
    if (given && known) return this.bench.choice(unit, known, given.to)
    return this.open.get(`${unit} ${control}`)
  }

  holds(unit: string, when: When | undefined): boolean {
    return Object.entries(when ?? {}).every(([control, positions]) => {
      const at = this.at(unit, control)
      return at !== undefined && positions.includes(at)
    })
  }

  /** What moves an automatic control while the source is watched, read from its words. */
  private moved(unit: string, control: CaseControl): string | undefined {
    const causes = Object.entries(control.movedBy ?? {})
    const caused = causes.find(([, words]) => this.isCaused(unit, words))
    return (caused ?? causes.find(([, words]) => /otherwise|else|rest/i.test(words)))?.[0]
  }

  private isCaused(unit: string, words: string): boolean {
    const port = this.bench
      .unit(unit)
      ?.ports.find((p) => new RegExp(`\\b${p.id}\\b`, 'i').test(words))
    if (!port) return false
    const ref = `${unit}:${port.id}`
    const fed = this.bench.watched.filter((h) => h.to === ref)
    if (!/volt|direct|\bdc\b/i.test(words)) return fed.length > 0
    return fed.some((h) => (this.bench.port(h.from)?.dcVolts ?? 0) !== 0)
  }
}

/** More ways of standing than this are not tried. */
const MOST_STANDS = 2048

const whensOf = (unit: CaseUnit): When[] => {
  const found: When[] = []
  const look = (thing: unknown): void => {
    if (thing === null || typeof thing !== 'object') return
    const { when } = thing as { when?: When }
    if (when) found.push(when)
    for (const inner of Object.values(thing)) look(inner)
  }
  look({ ...unit, settings: undefined })
  return found
}

/** Every way in which the controls may stand that an answer leaves open, where something depends on them. */
export function standsOf(bench: Bench): Stand[] {
  let ways: Map<string, string>[] = [new Map()]
  for (const id of bench.chain) {
    const unit = bench.unit(id)
    if (!unit) continue
    const matters = new Set(whensOf(unit).flatMap((w) => Object.keys(w)))
    for (const control of unit.settings ?? []) {
      const answered = bench.settingsFor(id, control.name).length > 0
      if (answered || control.class === 'auto' || !matters.has(control.name)) continue
      const choices = control.choices ?? []
      if (choices.length === 0 || ways.length * choices.length > MOST_STANDS) continue
      ways = ways.flatMap((w) => choices.map((c) => new Map([...w, [`${id} ${control.name}`, c]])))
    }
  }
  return ways.map((open) => new Stand(bench, open))
}
