import { POWER_KEY, type Control, type DeviceModel, type Key } from '@coaxwain/models'
import type { Hookup, Question, SeenPicture, Setting, Snapshot, Uid } from '@coaxwain/shelf'
import { channelsIn, SOUND_RANK, TIER } from '@coaxwain/signal'
import { unitsIn } from './bench'
import { checkHookup, type Checked } from './check-hookup'
import { ShelfView } from './shelf-view'

/** What a person notices when one thing is not as the hookup says. */
export const SIGHTS = [
  'same',
  'nothing',
  'snow',
  'rolling',
  'torn',
  'grey',
  'too-bright',
  'less-height',
  'squeezed',
  'softer',
] as const
export type Sight = (typeof SIGHTS)[number]

export const HEARINGS = ['same', 'less', 'silent'] as const
export type Hearing = (typeof HEARINGS)[number]

/** One control in another position, or one box off, and what is then seen and heard. */
export interface WhenWrong {
  readonly unit: Uid
  readonly control: Key
  readonly position: string
  readonly sees: Sight
  readonly hears: Hearing
}

/**
 * Every control that the hookup sets in each other position, and every box on the way off, run through the
 * check: what is seen and heard then. What changes nothing is left out.
 */
export function whenWrong(snapshot: Snapshot, question: Question, hookup: Hookup): WhenWrong[] {
  const right = checkHookup(snapshot, question, hookup)
  const view = new ShelfView(snapshot)
  const ends = [question.source.unit, question.display.unit]
  return unitsIn(hookup)
    .flatMap((unit) => {
      const device = view.device(unit)
      if (!device) return []
      const off = ends.includes(unit) || !needsPower(device) ? [] : [switchedOff(unit, hookup)]
      return [...off, ...hookup.settings.flatMap((s) => turned(s, unit, device))]
    })
    .map((setting): WhenWrong => {
      const wrong = checkHookup(snapshot, question, withSetting(hookup, setting))
      const { unit, control, position } = setting
      return { unit, control, position, sees: sight(wrong, right), hears: hearing(wrong, right) }
    })
    .filter(({ sees, hears }) => sees !== 'same' || hears !== 'same')
}

const needsPower = (device: DeviceModel): boolean =>
  device.functions.some((f) => f.power !== 'none')

function switchedOff(unit: Uid, hookup: Hookup): Setting {
  const known = hookup.settings.find((s) => s.unit === unit && s.control === POWER_KEY)
  const plain = { unit, control: POWER_KEY, orElse: [], access: 'front', why: 'powers' } as const
  return { ...(known ?? { ...plain, must: true }), position: 'unplugged' }
}

/**
 * A setting that must be as it is, turned to every other position that would not do as well. Another channel
 * would do at both ends only, so here it is wrong.
 */
function turned(setting: Setting, unit: Uid, device: DeviceModel): Setting[] {
  const control = device.controls.find((c) => c.key === setting.control)
  if (setting.unit !== unit || !setting.must || !control) return []
  const alsoFine = control.kind === 'positions' ? setting.orElse : []
  return otherwise(control, setting)
    .filter((p) => p !== setting.position && !alsoFine.includes(p))
    .map((position) => ({ ...setting, position }))
}

function otherwise(control: Control, { position, plan }: Setting): string[] {
  switch (control.kind) {
    case 'positions':
      return control.positions.map((p) => p.key)
    case 'channel':
      return nextTo(
        position,
        channelsIn(control.carriers.part).map((c) => c.name),
      )
    case 'tuned-to':
      return nextTo(
        position,
        control.reaches
          .filter((r) => r.part.plan === plan)
          .flatMap((r) => channelsIn(r.part).map((c) => c.name)),
      )
    case 'auto':
    case 'trim':
      return []
  }
}

/** One other channel stands for all of them. */
function nextTo(position: string, names: readonly string[]): string[] {
  const at = names.indexOf(position)
  return [names[at + 1] ?? names[at - 1]].filter((name) => name !== undefined)
}

const withSetting = (hookup: Hookup, changed: Setting): Hookup => ({
  ...hookup,
  settings: [
    ...hookup.settings.filter((s) => s.unit !== changed.unit || s.control !== changed.control),
    changed,
  ],
})

function sight(wrong: Checked, right: Checked): Sight {
  const codes = new Set(wrong.findings.map((f) => f.code))
  if (!wrong.picture) return codes.has('not-tuned') ? 'snow' : 'nothing'
  if (codes.has('line-rate')) return 'torn'
  if (codes.has('field-rate')) return 'rolling'
  if (codes.has('line-not-ended')) return 'too-bright'
  return right.picture ? compared(wrong.picture, right.picture) : 'same'
}

function compared(wrong: SeenPicture, right: SeenPicture): Sight {
  const worse = (degradation: SeenPicture['degradations'][number]): boolean =>
    wrong.degradations.includes(degradation) && !right.degradations.includes(degradation)
  if ((right.colour && !wrong.colour) || worse('monochrome')) return 'grey'
  if (worse('reduced-height')) return 'less-height'
  if (worse('squeezed')) return 'squeezed'
  const tiers = TIER[wrong.quality] - TIER[right.quality]
  return tiers < 0 || (tiers === 0 && wrong.lumaMhz < right.lumaMhz) ? 'softer' : 'same'
}

function hearing({ sound }: Checked, right: Checked): Hearing {
  if (SOUND_RANK[sound] >= SOUND_RANK[right.sound]) return 'same'
  return sound === 'none' ? 'silent' : 'less'
}
