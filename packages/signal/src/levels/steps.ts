import {
  db,
  splitterLoss,
  tapThroughLoss,
  type Db,
  type Dbmv,
  type Foot,
  type Mhz,
  type QuantityProblem,
} from '@coaxwain/quantities'
import { dbmv } from '@coaxwain/quantities'
import { ok, type Result } from '@coaxwain/result'
import { cableLoss } from './cable-loss'
import type { CableId } from './cables'

/** One thing on the way of a carrier. */
export type LevelStep =
  | { readonly kind: 'cable'; readonly cable: CableId; readonly length: Foot; readonly at: Mhz }
  /** `excess`: what a real one loses beyond sharing out the power. */
  | { readonly kind: 'splitter'; readonly outputs: number; readonly excess: Db }
  | { readonly kind: 'tap-through'; readonly tap: Db; readonly excess: Db }
  /** A pad, the tapped socket of a tap, a joint, anything that is marked with its loss. */
  | { readonly kind: 'loss'; readonly loss: Db }
  | { readonly kind: 'amplifier'; readonly gain: Db }

const withExcess = (ideal: Result<Db, QuantityProblem>, excess: Db): Result<Db, QuantityProblem> =>
  ideal.ok ? ok(db(ideal.value + excess)) : ideal

/** What a step takes away; an amplifier takes away less than nothing. */
export function stepLoss(step: LevelStep): Result<Db, QuantityProblem> {
  switch (step.kind) {
    case 'cable':
      return cableLoss(step.cable, step.at, step.length)
    case 'splitter':
      return withExcess(splitterLoss(step.outputs), step.excess)
    case 'tap-through':
      return withExcess(tapThroughLoss(step.tap), step.excess)
    case 'loss':
      return ok(step.loss)
    case 'amplifier':
      return ok(db(0 - step.gain))
  }
}

/** Level behind a row of steps: start less losses plus gains, all at one impedance. Source: sum of gains and losses. */
export function afterSteps(
  start: Dbmv,
  steps: readonly LevelStep[],
): Result<Dbmv, QuantityProblem> {
  let level = start
  for (const step of steps) {
    const loss = stepLoss(step)
    if (!loss.ok) return loss
    level = dbmv(level - loss.value)
  }
  return ok(level)
}
