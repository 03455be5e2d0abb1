import type { Hookup, HookupStep } from '@coaxwain/shelf'
import type { Lookup } from '../../format/lookup'
import type { Speak } from '../../format/words'
import { positionLabel } from './control-spec'
import { settingKey } from './sheet-words'
import { settingNumber } from './step-plan'

export interface SettingRow {
  readonly key: string
  /** Tells this setting from any other, its position included. */
  readonly stands: string
  readonly number: number | null
  readonly name: string
  readonly why: string
  readonly value: string
  readonly where: string
}

/** Every control that must stand somewhere, in the order of the steps. */
export function settingRows(
  hookup: Hookup,
  steps: readonly HookupStep[],
  lookup: Lookup,
  say: Speak,
): SettingRow[] {
  const rows = hookup.settings.map((setting, i): SettingRow => {
    const device = lookup.device(setting.unit)
    const control = device?.controls.find((c) => c.key === setting.control)
    const label = (position: string): string => positionLabel(control, position, say)
    const others = setting.orElse.slice(0, 4).map(label)
    const why = say(`why.${setting.why}`)
    return {
      key: `${setting.unit} ${setting.control}`,
      stands: settingKey(setting),
      number: settingNumber(steps, i),
      name: say('answer.setting-name', {
        unit: device?.name ?? '',
        control: control?.label ?? setting.control,
      }),
      why:
        others.length > 0
          ? `${why}; ${say('answer.or-else', { positions: others.join(', ') })}`
          : why,
      value: label(setting.position),
      where: say(`access.${setting.access}`),
    }
  })
  return rows.sort((a, b) => (a.number ?? Infinity) - (b.number ?? Infinity))
}
