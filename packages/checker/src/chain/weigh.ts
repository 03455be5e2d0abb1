import type { DeviceModel, Key } from '@coaxwain/models'
import type { ChainFinding, FindingWeight } from '@coaxwain/shelf'
import type { ChainCode, Said } from './codes'
import type { FindingCode } from '../finding'
import type { Wired } from './wire'

/** What hurts people or things: rule 0. */
const HARMS: readonly (FindingCode | ChainCode)[] = [
  'live-socket',
  'japanese-wiring',
  'loudspeaker-into-line',
  'logic-level',
  'dc-not-stood',
  'line-rate',
  'radiates',
  'onto-the-aerial',
]

const CHOICES: readonly (FindingCode | ChainCode)[] = [
  'stands-unsaid',
  'plug-unsaid',
  'position-left-open',
]

const DOUBTS: readonly (FindingCode | ChainCode)[] = [
  'socket-untested',
  'socket-intermittent',
  'function-untested',
  'function-intermittent',
  'chassis-unknown',
  'dc-unknown',
  'grey-only',
  'sound-crossed',
  'silent',
]

const ORDER: readonly FindingWeight[] = ['harm', 'wrong', 'choice', 'doubt']

function weightOf(code: Said['code']): FindingWeight {
  if (HARMS.includes(code)) return 'harm'
  if (CHOICES.includes(code)) return 'choice'
  return DOUBTS.includes(code) ? 'doubt' : 'wrong'
}

/** Findings with their weight and the names that their sentences need, the worst first, each once. */
export function weigh(said: readonly Said[], wired: Wired): ChainFinding[] {
  const once = new Map<string, ChainFinding>()
  for (const { code, details } of said) {
    const finding = { code, details: named(details, wired), weight: weightOf(code) }
    const key = [code, details['unit'], details['port'], details['control'], details['circuit']]
    once.set(key.join(' '), once.get(key.join(' ')) ?? finding)
  }
  return [...once.values()].sort((a, b) => ORDER.indexOf(a.weight) - ORDER.indexOf(b.weight))
}

type Details = ChainFinding['details']

/** Keys become the names that stand on the thing itself; the keys of unit and control stay, to find it by. */
function named(details: Details, { view, hookup }: Wired): Details {
  const unit = String(details['unit'] ?? '')
  const device = view.device(unit)
  const piece = view.piece(String(details['piece'] ?? ''))
  const link = typeof details['link'] === 'number' ? hookup.links[details['link']] : undefined
  const lead = piece ?? view.piece(link?.pieces[0]?.model ?? '')
  return {
    ...details,
    ...(device ? { name: device.name, ...ofDevice(device, details) } : {}),
    ...(lead ? { lead: lead.name } : {}),
  }
}

function ofDevice(device: DeviceModel, details: Details): Details {
  const text = (key: string): Key => String(details[key] ?? '')
  const port = device.ports.find((p) => p.key === text('port'))
  const control = device.controls.find((c) => c.key === text('control'))
  const fn = device.functions.find((f) => f.key === text('function'))
  const label = (position: string): string =>
    (control?.kind === 'positions' || control?.kind === 'auto'
      ? control.positions.find((p) => p.key === position)?.label
      : undefined) ?? position
  return {
    ...(port ? { label: port.label } : {}),
    ...(control ? { switch: control.label } : {}),
    ...(fn ? { does: fn.kind } : {}),
    ...(details['position'] === undefined ? {} : { stands: label(text('position')) }),
    ...(details['wanted'] === undefined || !control
      ? {}
      : { should: text('wanted').split(' ').map(label).join(', ') }),
  }
}
