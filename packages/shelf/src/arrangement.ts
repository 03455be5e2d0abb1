import type { Key } from '@coaxwain/models'
import type { Demands, Hookup, Link, Material, OffAir, Question } from './hookup'
import type { Uid } from './unit'

/**
 * What a standing arrangement is for: several sources to one display, each watched at its own time, or one
 * source to several displays at once. Nothing is plugged in or out between its uses.
 */
export interface ArrangementQuestion {
  readonly format: 1
  readonly sources: readonly {
    readonly unit: Uid
    readonly playing: Key
    readonly material: Material
  }[]
  readonly displays: readonly { readonly unit: Uid; readonly input?: Key | undefined }[]
  readonly demands: Omit<Demands, 'keepAerial'>
  readonly avoid: readonly Uid[]
  readonly offAir: readonly OffAir[]
  readonly assumedLeads: readonly Uid[]
}

/** One question for each use, in the order in which an answer lists its uses. */
export function questionsOfUses(question: ArrangementQuestion): Question[] {
  const { sources, displays, ...rest } = question
  return sources.flatMap(({ material, ...source }) =>
    displays.map((display) => ({ ...rest, source, material, display })),
  )
}

/** One thing that an arrangement is for, with its own positions. */
export interface Use {
  readonly source: Uid
  readonly display: Uid
  readonly hookup: Hookup
  /** Units that are left off meanwhile. */
  readonly off: readonly Uid[]
}

export interface Arrangement {
  readonly uses: readonly Use[]
  /** Everything that is plugged, each link once. */
  readonly links: readonly Link[]
  readonly axes: {
    readonly boxes: number
    readonly pieces: number
    readonly doubt: number
  }
}

export interface ArrangementAnswer {
  readonly format: 1
  readonly verdict: 'yes' | 'none'
  /** Nothing better has been left out; false beyond two uses, or when a budget ran out. */
  readonly complete: boolean
  readonly work: number
  readonly arrangements: readonly Arrangement[]
}
