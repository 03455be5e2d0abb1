import type { Caution, Hookup } from '@coaxwain/shelf'
import type { BuildInput, PathStop } from '../stops'

export interface CautionInput {
  readonly hookup: Omit<Hookup, 'cautions'>
  readonly stops: readonly PathStop[]
  readonly input: BuildInput
}

/** Looks at a finished hookup and says what a person must know about it. */
export type Rule = (c: CautionInput) => readonly Caution[]

export const caution = (code: string, details: Caution['details'] = {}): Caution => ({
  code,
  details,
})

export const display = ({ stops }: CautionInput): PathStop => stops.at(-1)!
export const source = ({ stops }: CautionInput): PathStop => stops[0]!
export const boxes = ({ stops }: CautionInput): readonly PathStop[] => stops.slice(1, -1)
export const named = (stop: PathStop): string => stop.variant.device.name
