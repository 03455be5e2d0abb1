import type { Control } from '@coaxwain/models'
import {
  chainOf,
  type Chain,
  type ChainLink,
  type ChainPiece,
  type ChainSetting,
  type Hookup,
  type LineEnd,
  type Question,
} from '@coaxwain/shelf'
import type { PlanId } from '@coaxwain/signal'
import { emptyAsk, fromQuestion, type AskForm } from '../hookup/ask-form'

/** One link as it is being entered: any of it may still be empty. */
export interface LinkForm {
  id: number
  fromUnit: string
  fromPort: string
  pieces: ChainPiece[]
  toUnit: string
  toPort: string
}

/** What is entered on the page that checks a chain. */
export interface CheckForm {
  ask: AskForm
  links: LinkForm[]
  ends: LineEnd[]
  /** Where controls stand, by unit and control; an empty text says nothing. */
  stands: Record<string, string>
}

export const emptyCheck = (): CheckForm => ({ ask: emptyAsk(), links: [], ends: [], stands: {} })

export const standKey = (unit: string, control: string): string => `${unit} ${control}`

const SETTABLE: readonly Control['kind'][] = ['positions', 'channel', 'tuned-to']

/** Controls that a hand sets to a position that has a name. */
export const isSettable = (control: Control): boolean => SETTABLE.includes(control.kind)

/** A position with its plan where it has one, as one choice of a list. */
export const standValue = ({ position, plan }: Pick<ChainSetting, 'position' | 'plan'>): string =>
  plan === undefined ? position : `${plan} ${position}`

function toSetting(key: string, value: string, tuned: boolean): ChainSetting {
  const [unit = '', control = ''] = key.split(' ')
  if (!tuned) return { unit, control, position: value }
  const cut = value.indexOf(' ')
  return {
    unit,
    control,
    position: value.slice(cut + 1),
    plan: value.slice(0, cut) as PlanId,
  }
}

export const isWhole = (link: LinkForm): boolean =>
  [link.fromUnit, link.fromPort, link.toUnit, link.toPort].every((part) => part !== '')

/** The links that are entered in full; a tuner's positions are told apart from others by `isTuned`. */
export function toChain(
  form: CheckForm,
  isTuned: (unit: string, control: string) => boolean,
): Chain {
  const used = new Set(form.links.flatMap((l) => [l.fromUnit, l.toUnit]))
  return {
    links: form.links.filter(isWhole).map((l): ChainLink => ({
      from: { unit: l.fromUnit, port: l.fromPort },
      pieces: l.pieces.filter((p) => p.model !== ''),
      to: { unit: l.toUnit, port: l.toPort },
    })),
    ...(form.ends.length > 0 ? { ends: form.ends.filter((e) => used.has(e.unit)) } : {}),
    settings: Object.entries(form.stands)
      .filter(([key, value]) => value !== '' && used.has(key.split(' ')[0] ?? ''))
      .map(([key, value]) => {
        const [unit = '', control = ''] = key.split(' ')
        return toSetting(key, value, isTuned(unit, control))
      }),
  }
}

/** A hookup that is there, opened to be wired differently. */
export function fromHookup(
  question: Question,
  hookup: Hookup,
  controlOf: (unit: string, control: string) => Control | undefined,
): CheckForm {
  const { links, ends = [], settings } = chainOf(hookup)
  return {
    ask: fromQuestion(question),
    links: links.map((l, id) => ({
      id,
      fromUnit: l.from.unit,
      fromPort: l.from.port,
      pieces: [...l.pieces],
      toUnit: l.to.unit,
      toPort: l.to.port,
    })),
    ends: [...ends],
    stands: Object.fromEntries(
      settings.flatMap((s) => {
        const control = controlOf(s.unit, s.control)
        if (!control || !isSettable(control)) return []
        const value = control.kind === 'tuned-to' ? standValue(s) : s.position
        return [[standKey(s.unit, s.control), value]]
      }),
    ),
  }
}
