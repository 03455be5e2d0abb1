import type { Arrangement, Question, Snapshot, Use } from '@coaxwain/shelf'
import { benchOf, type Bench } from './bench'
import { checkBench } from './check-hookup'
import type { Finding } from './finding'
import { checkPlugging } from './plugging'

/** What is wrong with uses together, beside what is wrong with one of them. */
export type ArrangementFinding =
  | (Finding & { readonly use: number | null })
  | {
      readonly code: 'links-left-out' | 'positions-clash'
      readonly use: number | null
      readonly details: Readonly<Record<string, string>>
    }

export interface CheckedArrangement {
  readonly ok: boolean
  readonly findings: readonly ArrangementFinding[]
}

/**
 * Judges uses that are wired at once: each as {@link checkHookup} does, with what the others have plugged in
 * place; then all plugs together. `questions` are those of the uses, in their order. `atOnce`: the uses run
 * at the same time, so that a control can stand in one position only.
 */
export function checkArrangement(
  snapshot: Snapshot,
  questions: readonly Question[],
  arrangement: Arrangement,
  atOnce: boolean,
): CheckedArrangement {
  const { uses, links } = arrangement
  const findings = [
    ...uses.flatMap((use, i) =>
      checkUse(benchOf(snapshot, questions[i]!, use.hookup), arrangement).map((f) => ({
        ...f,
        use: i,
      })),
    ),
    ...checkTogether(snapshot, questions[0]!, arrangement),
    ...leftOut(uses, links),
    ...(atOnce ? clashes(uses) : []),
  ]
  return { ok: findings.length === 0, findings }
}

function checkUse(bench: Bench, { links, uses }: Arrangement): readonly Finding[] {
  const ends = uses.flatMap((u) => u.hookup.ends ?? [])
  return checkBench({ ...bench, beside: { links, ends } }).findings
}

/** No socket holds two plugs and no piece is used twice, over all uses. */
function checkTogether(
  snapshot: Snapshot,
  question: Question,
  { uses, links }: Arrangement,
): ArrangementFinding[] {
  const [first] = uses
  if (!first) return []
  const ends = distinct(uses.flatMap((u) => u.hookup.ends ?? []))
  const bench = benchOf(snapshot, question, { ...first.hookup, links, ends })
  return checkPlugging(bench).map((f) => ({ ...f, use: null }))
}

const distinct = <T>(things: readonly T[]): T[] => [
  ...new Map(things.map((t) => [JSON.stringify(t), t])).values(),
]

/** What is plugged for a use is among what is plugged. */
function leftOut(uses: readonly Use[], links: Arrangement['links']): ArrangementFinding[] {
  const plugged = new Set(links.map((l) => JSON.stringify(l)))
  return uses.flatMap(({ hookup }, use) =>
    hookup.links
      .filter((l) => !plugged.has(JSON.stringify(l)))
      .map((l) => ({ code: 'links-left-out' as const, use, details: { unit: l.from.unit } })),
  )
}

/** Uses at the same time want a control in one position. */
function clashes(uses: readonly Use[]): ArrangementFinding[] {
  const stands = new Map<string, string>()
  return uses.flatMap(({ hookup }, use) =>
    hookup.settings.flatMap(({ unit, control, position }) => {
      const at = `${unit} ${control}`
      const before = stands.get(at) ?? position
      stands.set(at, before)
      return before === position
        ? []
        : [{ code: 'positions-clash' as const, use, details: { unit, control } }]
    }),
  )
}
