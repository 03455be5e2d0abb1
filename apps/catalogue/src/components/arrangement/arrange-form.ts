import type { ArrangementQuestion } from '@coaxwain/shelf'
import type { FieldFaults } from '../../composables/use-form'
import { emptyAsk, fromQuestion, toQuestion, type AskForm } from '../hookup/ask-form'

export const WAYS = ['sources', 'displays'] as const
/** Which end there are several of. */
export type Way = (typeof WAYS)[number]

/** What is chosen on the page that asks for an arrangement. */
export interface ArrangeForm {
  way: Way
  /** Source and material of each. With several displays only the first counts. */
  sources: AskForm[]
  /** With several sources only the first counts. */
  displays: { unit: string }[]
  /** Only its demands count. */
  demands: AskForm
}

/** Fewer need no arrangement. */
export const FEWEST = 2

export const emptyArrange = (): ArrangeForm => ({
  way: 'sources',
  sources: [emptyAsk(), emptyAsk()],
  displays: [{ unit: '' }, { unit: '' }],
  demands: emptyAsk(),
})

export const sourcesIn = ({ way, sources }: ArrangeForm): AskForm[] =>
  way === 'sources' ? sources : sources.slice(0, 1)

export const displaysIn = ({ way, displays }: ArrangeForm): { unit: string }[] =>
  way === 'displays' ? displays : displays.slice(0, 1)

export function toArrangementQuestion(form: ArrangeForm): ArrangementQuestion {
  const { keepAerial: _, ...demands } = toQuestion(form.demands).demands
  return {
    format: 1,
    sources: sourcesIn(form).map((source) => {
      const asked = toQuestion(source)
      return { ...asked.source, material: asked.material }
    }),
    displays: displaysIn(form).map(({ unit }) => ({ unit })),
    demands,
    avoid: [],
    offAir: [],
    assumedLeads: [],
  }
}

export function fromArrangementQuestion(question: ArrangementQuestion): ArrangeForm {
  const { sources, displays, ...rest } = question
  const nowhere = { unit: '' }
  const asks = sources.map(({ material, ...source }) =>
    fromQuestion({ ...rest, source, material, display: nowhere }),
  )
  const fresh = emptyArrange()
  return {
    way: displays.length > 1 ? 'displays' : 'sources',
    sources: [...asks, ...fresh.sources.slice(asks.length)],
    displays: [...displays.map(({ unit }) => ({ unit })), ...fresh.displays.slice(displays.length)],
    demands: asks[0] ?? fresh.demands,
  }
}

/** What keeps the form from being asked, by the path of its field. */
export function arrangeFaults(form: ArrangeForm): FieldFaults {
  const fault = (path: string, code: string) => ({ path, code, details: {} })
  const list = <T>(items: readonly T[], path: string, same: (item: T) => string, empty: string) =>
    items.flatMap((item, i) => {
      if (same(item) === empty) return [fault(`${path}.${i}`, 'required')]
      return items.findIndex((other) => same(other) === same(item)) < i
        ? [fault(`${path}.${i}`, 'given-twice')]
        : []
    })
  return [
    ...list(
      sourcesIn(form),
      'sources',
      (s) => (s.source === '' ? '' : `${s.source} ${s.playing}`),
      '',
    ),
    ...list(displaysIn(form), 'displays', (d) => d.unit, ''),
  ]
}
