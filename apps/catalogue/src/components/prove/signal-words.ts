import { nameOf, type Signal } from '@coaxwain/shelf'
import type { EvidenceRow } from '../../format/evidence-rows'
import type { Speak } from '../../format/words'

/** Where the words for a unit's signals come from. */
export interface SignalNames {
  readonly rows: readonly EvidenceRow[]
  readonly portLabels: ReadonlyMap<string, string>
}

const isOf = (row: EvidenceRow, signal: Signal): boolean =>
  'function' in signal ? row.function === signal.function : row.jack === signal.jack

/** Signals by the rows that they belong to; a form of which only some sockets are meant says which. */
export function signalWords(
  signals: readonly Signal[],
  { rows, portLabels }: SignalNames,
  say: Speak,
): { readonly key: string; readonly words: string }[] {
  return rows.flatMap((row) => {
    const own = signals.filter((s) => isOf(row, s))
    const [first] = own
    if (!first) return []
    const ports = own.flatMap((s) => ('function' in s ? [] : [s.port]))
    if (ports.length === row.ports.length) return [{ key: nameOf(first), words: row.title }]
    const sockets = ports.map((p) => portLabels.get(p) ?? p).join(', ')
    return [{ key: nameOf(first), words: say('prove.thing', { title: row.title, sockets }) }]
  })
}
