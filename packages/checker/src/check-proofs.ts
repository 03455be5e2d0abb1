import { formState, functionState, nameOf, triesBothSides } from '@coaxwain/shelf'
import type { Hookup, Proof, ProveQuestion, Signal, Snapshot, Uid, Unit } from '@coaxwain/shelf'
import { benchOf, type Bench } from './bench'
import { checkBench } from './check-hookup'
import { functionsIn, socketsIn } from './doubt'
import type { Finding } from './finding'

/** What is wrong with a chain as a test, beside what is wrong with it as a hookup. */
export type ProofFinding =
  | Finding
  | {
      readonly code:
        'untried-beside' | 'not-on-trial' | 'lead-untried' | 'nothing-heard' | 'sides-added'
      readonly details: Readonly<Record<string, string>>
    }

export interface CheckedProofs {
  readonly ok: boolean
  /** For each of the chains, in their order. */
  readonly findings: readonly (readonly ProofFinding[])[]
}

/**
 * Judges chains that are to try a unit, in their order: each as {@link checkHookup} does; all that it leans on
 * is known to work but for what it says it tries; and it does lean on that. What one tries counts as known for
 * those after it. Knows nothing of how they were found.
 */
export function checkProofs(
  snapshot: Snapshot,
  question: ProveQuestion,
  proofs: readonly Proof[],
): CheckedProofs {
  const onBench = { ...snapshot, units: snapshot.units.map((u) => asTried(u, question)) }
  const known = new Set<string>()
  const findings = proofs.map((proof) => {
    const bench = benchOf(onBench, proof.question, proof.hookup)
    const found = [...checkBench(bench).findings, ...checkTrial(bench, question.unit, proof, known)]
    for (const signal of [...proof.seen, ...proof.heard]) known.add(nameOf(signal))
    return found
  })
  return { ok: findings.every((f) => f.length === 0), findings }
}

/** A unit is tried whatever is said of it as a whole, and one signal whatever has been noted of it. */
function asTried(unit: Unit, { unit: uid, signal }: ProveQuestion): Unit {
  if (unit.uid !== uid) return unit
  const isOther = (s: Signal): boolean => signal === undefined || nameOf(s) !== nameOf(signal)
  return {
    ...unit,
    working: 'untested',
    forms: unit.forms.filter(isOther),
    functions: unit.functions.filter(isOther),
  }
}

function checkTrial(
  bench: Bench,
  uid: Uid,
  { hookup, seen, heard }: Proof,
  known: ReadonlySet<string>,
): ProofFinding[] {
  const tried = new Set([...seen, ...heard].map(nameOf))
  const untried = untriedIn(bench)
  const isOwn = ({ unit, name }: Untried): boolean =>
    unit === uid && (tried.has(name) || known.has(name))
  const own = new Set(untried.filter((u) => u.unit === uid).map((u) => u.name))
  return [
    ...untried
      .filter((u) => !isOwn(u))
      .map(({ unit, name }) => ({ code: 'untried-beside' as const, details: { unit, name } })),
    ...[...tried]
      .filter((name) => !own.has(name) || known.has(name))
      .map((name) => ({ code: 'not-on-trial' as const, details: { name } })),
    ...leadsUntried(bench, hookup),
    ...(heard.length > 0 && hookup.sound.sound === 'none'
      ? [{ code: 'nothing-heard' as const, details: {} }]
      : []),
    ...(triesBothSides(heard) && hookup.sound.sound === 'mono'
      ? [{ code: 'sides-added' as const, details: {} }]
      : []),
  ]
}

interface Untried {
  readonly unit: Uid
  readonly name: string
}

/** All that a hookup leans on and that is not known to work. */
function untriedIn(bench: Bench): Untried[] {
  const { view } = bench
  const sockets = socketsIn(bench).map(({ unit: uid, jack, port }) => {
    const unit = view.unit(uid)
    const state = unit ? formState(unit, jack, port) : 'untested'
    return { unit: uid, name: nameOf({ jack, port }), state }
  })
  const functions = functionsIn(bench).map(({ unit: uid, fn }) => {
    const unit = view.unit(uid)
    const state = unit ? functionState(unit, fn) : 'untested'
    return { unit: uid, name: nameOf({ function: fn }), state }
  })
  return [...sockets, ...functions].filter(({ state }) => state !== 'works')
}

/** More copies of a piece than there are of which it is known that they work. */
function leadsUntried({ view }: Bench, { links, ends }: Hookup): ProofFinding[] {
  const copies = new Map<Uid, Set<number>>()
  for (const { model, copy } of [...links.flatMap((l) => l.pieces), ...(ends ?? [])])
    copies.set(model, (copies.get(model) ?? new Set()).add(copy))
  return [...copies].flatMap(([model, used]) => {
    const good = view.snapshot.units
      .filter((u) => u.model === model && u.working === 'works')
      .reduce((sum, u) => sum + u.quantity, 0)
    return used.size > good ? [{ code: 'lead-untried' as const, details: { piece: model } }] : []
  })
}
