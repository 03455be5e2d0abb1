import type { Modification } from '@coaxwain/shelf'

interface AddedPart {
  readonly part: 'port' | 'jack' | 'function'
  readonly part_key: string
  readonly connector: string | null
  readonly form: string | null
  readonly dir: 'in' | 'out' | null
  readonly function_kind: string | null
}

const NOTHING = { connector: null, form: null, dir: null, function_kind: null }

/** What a modification adds to a unit, as one asks for it. */
export const addedParts = (m: Modification): AddedPart[] =>
  m.kind === 'added'
    ? [
        ...m.ports.map((p) => ({
          ...NOTHING,
          part: 'port' as const,
          part_key: p.key,
          connector: p.connector,
        })),
        ...m.jacks.map((j) => ({
          ...NOTHING,
          part: 'jack' as const,
          part_key: j.key,
          form: j.form,
          dir: j.dir,
        })),
        ...m.functions.map((f) => ({
          ...NOTHING,
          part: 'function' as const,
          part_key: f.key,
          function_kind: f.kind,
        })),
      ]
    : []
