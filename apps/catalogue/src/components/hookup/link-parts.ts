import type { PieceModel } from '@coaxwain/models'
import type { Link, PieceUse } from '@coaxwain/shelf'
import type { Circuit, Connector } from '@coaxwain/signal'
import type { Lookup } from '../../format/lookup'

/** A stretch of a link between two fixed things: two sockets, or a socket and an adapter. */
export interface LinkRun {
  readonly kind: 'run'
  readonly leads: readonly PieceUse[]
  readonly ends: readonly [Connector, Connector]
}

export interface LinkPiece {
  readonly kind: 'piece'
  readonly use: PieceUse
  readonly model: PieceModel
  /** Its own connectors, as met from the start of the link. */
  readonly ends: readonly [Connector, Connector]
}

export type LinkPart = LinkRun | LinkPiece

const missing: Connector = 'bare'

/** The connectors of a piece in the order in which a link goes through it. */
function endsOf(model: PieceModel, use: PieceUse): [Connector, Connector] {
  const [first, second] = use.wayRound === 'forward' ? [model.a, model.b] : [model.b, model.a]
  return [first[use.inPlug]?.connector ?? missing, second[use.outPlug]?.connector ?? missing]
}

/** Cuts a link into run, piece, run ... run. Leads make the runs; everything else hangs between. */
export function linkParts(link: Link, lookup: Lookup): LinkPart[] {
  const start = lookup.port(link.from.unit, link.from.port)?.connector ?? missing
  const end = lookup.port(link.to.unit, link.to.port)?.connector ?? missing
  const parts: LinkPart[] = []
  let leads: PieceUse[] = []
  let near: Connector = start
  let far: Connector | null = null
  const close = (next: Connector): void => {
    parts.push({ kind: 'run', leads, ends: [near, far ?? next] })
    leads = []
    far = null
  }
  for (const use of link.pieces) {
    const model = lookup.piece(use.model)
    if (!model) continue
    const ends = endsOf(model, use)
    if (model.kind === 'lead') {
      if (leads.length === 0) near = ends[0]
      leads.push(use)
      far = ends[1]
    } else {
      close(ends[0])
      parts.push({ kind: 'piece', use, model, ends })
      near = ends[1]
    }
  }
  close(end)
  return parts
}

export const circuitsOf = (link: Link): readonly Circuit[] => link.circuits.map((c) => c.from)
