import type { Connector } from '@coaxwain/signal'
import type { GlyphSpec } from './controls'

/** A socket of one face, in words and marks already chosen. */
export interface FacePort {
  readonly key: string
  readonly label: string
  readonly connector: Connector
  readonly captive: boolean
  /** Token of the ring's colour, where it has one. */
  readonly ring: string | null
  readonly row: number
  readonly column: number
  readonly heading: string | null
  readonly used: boolean
}

export interface FaceControl {
  readonly key: string
  readonly spec: GlyphSpec
  /** Number of the step that sets it. */
  readonly number: number | null
}

export interface FaceInput {
  readonly ports: readonly FacePort[]
  readonly controls: readonly FaceControl[]
  /** FRONT, BACK: only where a unit shows more than one face. */
  readonly caption: string | null
  /** Of a moulded set: rounder corners. */
  readonly moulded: boolean
  /** Lines of vents where there is room for them. */
  readonly vented: boolean
  readonly compact: boolean
  readonly minHeight: number
  readonly minWidth: number
  /** Controls in a row above the sockets instead of beside them, to save width. */
  readonly controlsAbove: boolean
  /** Room for a numbered callout under each socket. */
  readonly callouts: boolean
  /** All sockets in full ink, as on a model's page, where none is singled out. */
  readonly plain: boolean
}
