import type { CableKind } from './cables'
import type { FaceControl, FacePort } from './face-input'
import type { SymbolKey } from './symbols'

/**
 * A hookup made ready for drawing: words chosen, marks chosen, order chosen. The layout needs nothing else,
 * and knows nothing of models, units or languages.
 */
export interface DrawingInput {
  readonly units: readonly UnitInput[]
  readonly cables: readonly CableInput[]
}

export interface UnitPortInput extends FacePort {
  readonly face: 'back' | 'front' | 'side'
}

export interface UnitControlInput extends FaceControl {
  readonly face: 'back' | 'front'
}

/** A line of a menu, or of what the remote sets. */
export interface ScreenLine {
  readonly name: string
  readonly value: string
  readonly number: number | null
}

export interface UnitInput {
  readonly key: string
  readonly title: string
  readonly subtitle: string
  readonly ports: readonly UnitPortInput[]
  readonly controls: readonly UnitControlInput[]
  readonly screen: { readonly caption: string; readonly lines: readonly ScreenLine[] } | null
  readonly captions: Readonly<Record<'back' | 'front' | 'side', string>>
  readonly moulded: boolean
  /** A tag across the panel's lower edge, under the power socket. */
  readonly pack: { readonly port: string; readonly text: string } | null
  readonly carried: { readonly lead: string; readonly text: string } | null
}

export interface CableEnd {
  readonly unit: string
  readonly port: string
}

/** A stretch of lead: how it looks, its letter, the steps that plug it. */
export interface RunInput {
  readonly kind: 'run'
  readonly look: CableKind
  readonly tag: string
  /** Of the steps that plug it. */
  readonly numbers: readonly number[]
  /** The lead itself: runs of one lead share the key. Null where a captive plug goes straight in. */
  readonly lead: { readonly key: string; readonly name: string } | null
}

export const SIGNS = ['transformer', 'pad', 'joint', 'mix'] as const
export type Sign = (typeof SIGNS)[number]

/** Something that hangs in the cable. Cables through one piece share its key. */
export interface PieceInput {
  readonly kind: 'piece'
  readonly key: string
  readonly name: string
  readonly ends: readonly [SymbolKey, SymbolKey]
  readonly sign: Sign
}

export interface CableInput {
  readonly key: string
  readonly from: CableEnd
  readonly to: CableEnd
  /** Run, piece, run, piece ... run. */
  readonly parts: readonly (RunInput | PieceInput)[]
}

export interface LayoutOptions {
  /** Width of the sheet in pixels; Infinity where the drawing may scroll. */
  readonly width: number
  /** Front above back and menu above panel, as on the printed sheet. */
  readonly stacked: boolean
  /** Numbers near both ends of a long lane, for windows that show only a part. */
  readonly repeat: boolean
  /** Never anything but full panels on one line. */
  readonly scrolls: boolean
  /** Start from compact panels. */
  readonly compact: boolean
}
