import type { HookupLabel } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import {
  doubtOf,
  fitted,
  mayLend,
  type Hookup,
  type Question,
  type Snapshot,
  type TestState,
  type Uid,
  type Unit,
} from '@coaxwain/shelf'
import { AppError, type FieldTrouble } from '../app-error'
import { fingerprint } from '../uid'

export type PartKind = 'port' | 'control' | 'function'

export interface UsedPart {
  readonly unit: Uid
  readonly part: PartKind
  readonly key: string
}

/** Every port, control and function that a hookup names, each once. */
export function usedParts(hookup: Hookup): UsedPart[] {
  const all: UsedPart[] = [
    ...hookup.links.flatMap(({ from, to }) =>
      [from, to].map((end) => ({ unit: end.unit, part: 'port' as const, key: end.port })),
    ),
    ...(hookup.ends ?? []).map((end) => ({ unit: end.unit, part: 'port' as const, key: end.port })),
    ...hookup.settings.map((s) => ({ unit: s.unit, part: 'control' as const, key: s.control })),
    ...hookup.legs.flatMap((leg) =>
      leg.stops.map((s) => ({ unit: s.unit, part: 'function' as const, key: s.function })),
    ),
  ]
  return [...new Map(all.map((p) => [`${p.unit} ${p.part} ${p.key}`, p])).values()]
}

/** The source, the display and every unit between. */
export const usedUnits = (question: Question, hookup: Hookup): Uid[] => [
  ...new Set([
    question.source.unit,
    question.display.unit,
    ...usedParts(hookup).map((p) => p.unit),
    ...(hookup.sound.from === null ? [] : [hookup.sound.from]),
  ]),
]

/** How many of each lead or adapter it takes; plugs of one copy are one piece. */
export function usedPieces(hookup: Hookup): Map<Uid, number> {
  const copies = new Map<Uid, Set<number>>()
  for (const piece of [...hookup.links.flatMap((l) => l.pieces), ...(hookup.ends ?? [])]) {
    copies.set(piece.model, (copies.get(piece.model) ?? new Set()).add(piece.copy))
  }
  return new Map([...copies].map(([model, found]) => [model, found.size]))
}

/** Descriptions are kept as long as they are used, and never change. */
const known = new WeakMap<Model, string>()

function modelFingerprint(model: Model | undefined): string | null {
  if (!model) return null
  const found = known.get(model) ?? fingerprint(model)
  known.set(model, found)
  return found
}

/** What a state means to a hookup: to have tried something and found it working changes nothing. */
function worth(unit: Unit, state: TestState): 'good' | 'doubtful' | 'none' {
  const doubt = doubtOf(unit, state)
  return doubt === null ? 'none' : doubt > 1 ? 'doubtful' : 'good'
}

/** What of a unit bears on a hookup: its model, what was done to it, and what is known of the parts used. */
export function unitFingerprint(snapshot: Snapshot, unit: Unit, hookup: Hookup): string {
  const parts = usedParts(hookup).filter((p) => p.unit === unit.uid)
  const used = (kind: PartKind): Set<string> =>
    new Set(parts.filter((p) => p.part === kind).map((p) => p.key))
  const [ports, functions] = [used('port'), used('function')]
  const untried = worth(unit, 'untested')
  const marks = [
    ...unit.forms
      .filter((f) => ports.has(f.port))
      .map((f) => [worth(unit, f.state), 'form', f.jack, f.port]),
    ...unit.functions
      .filter((f) => functions.has(f.function))
      .map((f) => [worth(unit, f.state), 'function', f.function]),
  ]
  return fingerprint({
    model: modelFingerprint(snapshot.models[unit.model]),
    modifications: unit.modifications,
    remotePresent: unit.remotePresent,
    untried,
    marks: marks
      .filter(([value]) => value !== untried)
      .map((mark) => mark.join(' '))
      .sort(),
  })
}

export const pieceFingerprint = (snapshot: Snapshot, model: Uid): string =>
  fingerprint(modelFingerprint(snapshot.models[model]))

/** Leads and adapters of one model that may be used today. */
const inTheDrawer = (snapshot: Snapshot, model: Uid): number =>
  snapshot.units
    .filter((u) => u.model === model && mayLend(u))
    .reduce((sum, u) => sum + u.quantity, 0)

export interface Bearing {
  readonly unit: Uid
  readonly fingerprint: string
}

export interface Standing {
  readonly label: HookupLabel
  readonly changedUnits: Uid[]
  readonly missingUnits: Uid[]
  readonly missingPieces: Uid[]
}

interface Saved {
  readonly question: Question
  readonly hookup: Hookup
  readonly units: readonly Bearing[]
  readonly pieces: readonly Bearing[]
}

/** Compares a saved hookup with today's shelf. */
export function standing(snapshot: Snapshot, saved: Saved): Standing {
  const here = new Map(snapshot.units.filter(mayLend).map((u) => [u.uid, u]))
  const missingUnits = saved.units.map((b) => b.unit).filter((uid) => !here.has(uid))
  const changedUnits = saved.units.flatMap((b) => {
    const unit = here.get(b.unit)
    return unit && unitFingerprint(snapshot, unit, saved.hookup) !== b.fingerprint ? [b.unit] : []
  })
  const assumed = new Set(saved.question.assumedLeads)
  const missingPieces = [...usedPieces(saved.hookup)]
    .filter(([model, copies]) => !assumed.has(model) && inTheDrawer(snapshot, model) < copies)
    .map(([model]) => model)
  const otherPieces = saved.pieces.some((b) => pieceFingerprint(snapshot, b.unit) !== b.fingerprint)
  const missing = missingUnits.length + missingPieces.length > 0
  const changed = changedUnits.length > 0 || otherPieces
  return {
    label: missing ? 'unit-missing' : changed ? 'changed' : 'still-right',
    changedUnits,
    missingUnits,
    missingPieces,
  }
}

const LISTS = { port: 'ports', control: 'controls', function: 'functions' } as const

function partFault(snapshot: Snapshot, used: UsedPart): FieldTrouble[] {
  const unit = snapshot.units.find((u) => u.uid === used.unit)
  const model = unit && snapshot.models[unit.model]
  if (!unit || model?.type !== 'device') {
    return [{ path: 'hookup', code: 'unknown-reference', details: { name: used.unit } }]
  }
  const isPower = used.part === 'control' && used.key === 'power'
  const there = fitted(model, unit.modifications)[LISTS[used.part]].some((p) => p.key === used.key)
  return isPower || there
    ? []
    : [{ path: 'hookup', code: `unknown-${used.part}`, details: { name: used.key } }]
}

/** Everything that a hookup names must be on this shelf. */
export function hookupMustFit(snapshot: Snapshot, hookup: Hookup): void {
  const errors = [
    ...usedParts(hookup).flatMap((p) => partFault(snapshot, p)),
    ...[...usedPieces(hookup).keys()].flatMap((model) =>
      snapshot.models[model]?.type === 'piece'
        ? []
        : [{ path: 'hookup.links', code: 'unknown-reference', details: { name: model } }],
    ),
    ...(hookup.sound.from === null || snapshot.units.some((u) => u.uid === hookup.sound.from)
      ? []
      : [
          {
            path: 'hookup.sound.from',
            code: 'unknown-reference',
            details: { name: hookup.sound.from },
          },
        ]),
    ...hookup.legs.flatMap((leg, i) =>
      leg.links.flatMap((link, j) =>
        hookup.links[link]
          ? []
          : [
              {
                path: `hookup.legs.${i}.links.${j}`,
                code: 'unknown-reference',
                details: { name: String(link) },
              },
            ],
      ),
    ),
  ]
  if (errors.length > 0) throw new AppError('unknown-reference', { errors })
}
