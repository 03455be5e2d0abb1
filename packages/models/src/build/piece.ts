import type { PieceModel, Plug, PlugColour, Wire } from '../model'
import type { Circuit, Connector } from '@coaxwain/signal'

/** A plug, or plug and colour. */
type Written = Connector | readonly [Connector, PlugColour]

const plugOf = (written: Written): Plug =>
  typeof written === 'string'
    ? { connector: written }
    : { connector: written[0], colour: written[1] }

export interface PieceDraft extends Partial<
  Pick<
    PieceModel,
    | 'aliases'
    | 'meantFor'
    | 'lossDb'
    | 'impedanceOhm'
    | 'mixes'
    | 'suppliesVolts'
    | 'blocksDc'
    | 'lengthMm'
  >
> {
  readonly name: string
  readonly kind: PieceModel['kind']
  readonly a: readonly Written[]
  readonly b: readonly Written[]
  readonly wires: readonly Wire[]
}

/** Nobody asks who made a lead. */
const MAKER = 'Unbranded'

export const piece = (draft: PieceDraft): PieceModel => ({
  format: 1,
  type: 'piece',
  maker: MAKER,
  market: 'any',
  factSource: 'panel-photo',
  aliases: [],
  lossDb: 0,
  mixes: false,
  suppliesVolts: [],
  blocksDc: false,
  ...draft,
  a: draft.a.map(plugOf),
  b: draft.b.map(plugOf),
})

type End = Circuit | 'any'

/** A wire from one plug to another. */
export const wire = (
  a: readonly [plug: number, circuit: End],
  b: readonly [plug: number, circuit: End],
  way: Wire['way'] = 'both',
): Wire => ({ a: { plug: a[0], circuit: a[1] }, b: { plug: b[0], circuit: b[1] }, way })

/** So many cores side by side, each carrying whatever comes. */
export const cores = (count: number): readonly Wire[] =>
  Array.from({ length: count }, (_, i) => wire([i, 'any'], [i, 'any']))

/** Circuits between two multi-way plugs, contact for contact. */
export const through = (circuits: readonly Circuit[]): readonly Wire[] =>
  circuits.map((c) => wire([0, c], [0, c]))
