import type { Hearing, Sight, WhenWrong } from '@coaxwain/checker'
import { POWER_KEY } from '@coaxwain/models'
import type { Hookup, Setting } from '@coaxwain/shelf'
import type { Lookup } from '../../format/lookup'
import type { Speak } from '../../format/words'
import { positionLabel } from './control-spec'

/** What a person notices, with everything that is worth looking at then. */
export interface WrongRow {
  readonly key: string
  readonly sees: string
  readonly checks: readonly string[]
}

type Noticed =
  { readonly sight: Exclude<Sight, 'same'> } | { readonly hearing: Exclude<Hearing, 'same'> }

/** The worst first: whoever sees nothing looks here before anybody who sees it a little soft. */
const ORDER: readonly Noticed[] = [
  { sight: 'nothing' },
  { sight: 'snow' },
  { sight: 'torn' },
  { sight: 'rolling' },
  { sight: 'too-bright' },
  { sight: 'grey' },
  { sight: 'less-height' },
  { sight: 'squeezed' },
  { sight: 'softer' },
  { hearing: 'silent' },
  { hearing: 'less' },
]

/** A fault of the picture is what one notices; the sound counts where the picture is as it should be. */
const isOf = (noticed: Noticed, wrong: WhenWrong): boolean =>
  'sight' in noticed
    ? wrong.sees === noticed.sight
    : wrong.sees === 'same' && wrong.hears === noticed.hearing

/** Groups what was worked out by what is noticed; a control stands once in a group. */
export function wrongRows(
  wrongs: readonly WhenWrong[],
  hookup: Hookup,
  lookup: Lookup,
  say: Speak,
): WrongRow[] {
  return ORDER.flatMap((noticed): WrongRow[] => {
    const checks = wrongs
      .filter((wrong) => isOf(noticed, wrong))
      .flatMap((wrong) => checkWords(wrong, hookup, lookup, say))
    if (checks.length === 0) return []
    const [key, sees] =
      'sight' in noticed
        ? [noticed.sight, say(`wrong.sight.${noticed.sight}`)]
        : [noticed.hearing, say(`wrong.hearing.${noticed.hearing}`)]
    return [{ key, sees, checks: [...new Set(checks)] }]
  })
}

function checkWords(wrong: WhenWrong, hookup: Hookup, lookup: Lookup, say: Speak): string[] {
  const device = lookup.device(wrong.unit)
  if (!device) return []
  if (wrong.control === POWER_KEY) return [say('wrong.power', { unit: device.name })]
  const right = hookup.settings.find((s) => s.unit === wrong.unit && s.control === wrong.control)
  const control = device.controls.find((c) => c.key === wrong.control)
  if (!right || !control) return []
  const words = {
    unit: device.name,
    control: control.label,
    position: positionLabel(control, right.position, say),
  }
  return [say(isTuning(right) ? 'wrong.tuned' : 'wrong.check', words)]
}

const isTuning = ({ why }: Setting): boolean => why === 'tunes-to' || why === 'picks-channel'
