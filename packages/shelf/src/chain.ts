import type { Key } from '@coaxwain/models'
import type { PlanId, Sound } from '@coaxwain/signal'
import type { Hookup, LineEnd, PieceUse, PortRef, SeenPicture } from './hookup'
import type { Uid } from './unit'

/** A lead or adapter as a person names it; which one of several, and which of its plugs, may be left out. */
export interface ChainPiece {
  readonly model: Uid
  readonly copy?: number | undefined
  readonly wayRound?: PieceUse['wayRound'] | undefined
  readonly inPlug?: number | undefined
  readonly outPlug?: number | undefined
}

/** One connection that a person made, from socket to socket. */
export interface ChainLink {
  readonly from: PortRef
  readonly pieces: readonly ChainPiece[]
  readonly to: PortRef
}

/** Where a control stands, as far as a person says. */
export interface ChainSetting {
  readonly unit: Uid
  readonly control: Key
  /** A position's key, or a channel's name. */
  readonly position: string
  /** The plan that a channel counts in, where the control knows several. */
  readonly plan?: PlanId | undefined
}

/** What a person wired by hand. */
export interface Chain {
  readonly links: readonly ChainLink[]
  readonly ends?: readonly LineEnd[] | undefined
  readonly settings: readonly ChainSetting[]
}

export const CHAIN_VERDICTS = ['right', 'doubtful', 'wrong'] as const
export type ChainVerdict = (typeof CHAIN_VERDICTS)[number]

/** From worst to mildest: it harms, it does not work, a choice is open, nobody knows. */
export const FINDING_WEIGHTS = ['harm', 'wrong', 'choice', 'doubt'] as const
export type FindingWeight = (typeof FINDING_WEIGHTS)[number]

export interface ChainFinding {
  readonly code: string
  readonly details: Readonly<Record<string, string | number>>
  readonly weight: FindingWeight
}

/** What the check says of a chain: link by link, unit by unit, and of the whole. */
export interface ChainChecked {
  readonly verdict: ChainVerdict
  readonly links: readonly {
    readonly verdict: ChainVerdict
    readonly findings: readonly ChainFinding[]
  }[]
  readonly units: readonly {
    readonly unit: Uid
    readonly verdict: ChainVerdict
    readonly findings: readonly ChainFinding[]
  }[]
  readonly whole: readonly ChainFinding[]
  /** With every control that was left open set as it must be; null where no picture comes. */
  readonly picture: SeenPicture | null
  readonly sound: { readonly sound: Sound; readonly from: Uid | null }
  /** The chain as a hookup, with what was left out filled in. */
  readonly hookup: Hookup
}

/** A hookup as the chain that a person would enter to get it. */
export const chainOf = ({ links, ends, settings }: Hookup): Chain => ({
  links: links.map(({ from, pieces, to }) => ({ from, pieces, to })),
  ...(ends === undefined ? {} : { ends }),
  settings: settings.map(({ unit, control, position, plan }) => ({
    unit,
    control,
    position,
    ...(plan === undefined ? {} : { plan }),
  })),
})
