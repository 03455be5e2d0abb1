import type { HookupCheckReply } from '@coaxwain/contract'
import {
  fitted,
  type Chain,
  type ChainChecked,
  type PortRef,
  type Question,
  type Snapshot,
  type Uid,
} from '@coaxwain/shelf'
import { questionMustFit } from '../answers/service'
import { AppError, type FieldTrouble } from '../app-error'
import type { Scope } from '../http/call'
import type { SnapshotService } from '../snapshot/service'

/** Judges what a person wired by hand; its work is bounded by what a chain may hold. */
export type ChainChecker = (snapshot: Snapshot, question: Question, chain: Chain) => ChainChecked

export type HookupChecksService = ReturnType<typeof createHookupChecksService>

const trouble = (path: string, code: string, name: string): FieldTrouble => ({
  path: `chain.${path}`,
  code,
  details: { name },
})

const LISTS = { port: 'ports', control: 'controls' } as const

/** A unit that is not here, or one that has no such part. */
function partTrouble(
  snapshot: Snapshot,
  path: string,
  uid: Uid,
  part: { readonly kind: keyof typeof LISTS; readonly key: string },
): FieldTrouble[] {
  const unit = snapshot.units.find((u) => u.uid === uid)
  const model = unit && snapshot.models[unit.model]
  if (!unit || model?.type !== 'device') return [trouble(`${path}.unit`, 'unknown-reference', uid)]
  const known = fitted(model, unit.modifications)[LISTS[part.kind]].some((p) => p.key === part.key)
  const isPower = part.kind === 'control' && part.key === 'power'
  return known || isPower ? [] : [trouble(`${path}.${part.kind}`, `unknown-${part.kind}`, part.key)]
}

/** Everything that a chain names must be on this shelf. */
function chainMustFit(snapshot: Snapshot, { links, ends = [], settings }: Chain): void {
  const port = (path: string, { unit, port: key }: PortRef): FieldTrouble[] =>
    partTrouble(snapshot, path, unit, { kind: 'port', key })
  const piece = (path: string, model: Uid): FieldTrouble[] =>
    snapshot.models[model]?.type === 'piece' ? [] : [trouble(path, 'unknown-reference', model)]
  const errors = [
    ...links.flatMap((link, i) => [
      ...port(`links.${i}.from`, link.from),
      ...link.pieces.flatMap((p, j) => piece(`links.${i}.pieces.${j}.model`, p.model)),
      ...port(`links.${i}.to`, link.to),
    ]),
    ...ends.flatMap((end, i) => [
      ...port(`ends.${i}`, end),
      ...piece(`ends.${i}.model`, end.model),
    ]),
    ...settings.flatMap((s, i) =>
      partTrouble(snapshot, `settings.${i}`, s.unit, { kind: 'control', key: s.control }),
    ),
  ]
  if (errors.length > 0) throw new AppError('unknown-reference', { errors })
}

interface Needs {
  readonly snapshots: SnapshotService
  readonly checkChain: ChainChecker
}

export const createHookupChecksService = ({ snapshots, checkChain }: Needs) => ({
  async check(scope: Scope, question: Question, chain: Chain): Promise<HookupCheckReply> {
    const snapshot = await snapshots.read(scope)
    questionMustFit(snapshot, question)
    chainMustFit(snapshot, chain)
    return {
      question,
      checked: checkChain(snapshot, question, chain),
      shelfVersion: snapshot.shelfVersion,
      catalogueVersion: snapshot.catalogueVersion,
    }
  },
})
