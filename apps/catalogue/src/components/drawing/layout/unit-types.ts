import type { Point } from './boxes'

/** A numbered setting, centred. */
export interface SquareMark extends Point {
  readonly number: number
}

export interface UnitStyle {
  readonly compact: boolean
  readonly stacked: boolean
}

/** Between the faces of one unit, and between a panel and its screen. */
export const FACE_GAP = 12
