import type {
  Access,
  ControlRole,
  DeviceKind,
  DeviceModel,
  FactSource,
  Market,
  Model,
  TrimQuantity,
  TuningWay,
} from '@coaxwain/models'
import type { Circuit, Connector, Form, PlanId } from '@coaxwain/signal'

/** What a socket is for, in the words of a person at the back of a device. */
export const USES = [
  'composite',
  'sound-left',
  'sound-right',
  'sound-mono',
  'sound-both',
  's-video',
  'component-y',
  'component-pb',
  'component-pr',
  'rf',
  'av-21',
  'rgb-21',
  'rgbhv',
  'hdmi',
  'digital-sound',
  'power',
] as const

export type Use = (typeof USES)[number]

interface UseFacts {
  readonly circuits: readonly Circuit[]
  /** Whole forms that one socket of this use carries; others are put together from several. */
  readonly forms: readonly { readonly form: Form; readonly circuits: readonly Circuit[] }[]
  readonly connectors: readonly Connector[]
}

const SOUND_PAIR = { form: 'sound', circuits: ['audio-l', 'audio-r'] } as const
const COMPOSITE = { form: 'composite', circuits: ['cvbs'] } as const

export const USE_FACTS: Readonly<Record<Use, UseFacts>> = {
  composite: {
    circuits: ['cvbs'],
    forms: [COMPOSITE],
    connectors: ['phono-socket', 'bnc-socket', 'f-socket', 'phono-plug', 'jack35-socket'],
  },
  'sound-left': {
    circuits: ['audio-l'],
    forms: [],
    connectors: ['phono-socket', 'phono-plug', 'f-socket'],
  },
  'sound-right': {
    circuits: ['audio-r'],
    forms: [],
    connectors: ['phono-socket', 'phono-plug', 'f-socket'],
  },
  'sound-mono': {
    circuits: ['audio-mono'],
    forms: [{ form: 'sound', circuits: ['audio-mono'] }],
    connectors: ['phono-socket', 'jack35-socket', 'phono-plug', 'f-socket'],
  },
  'sound-both': {
    circuits: ['audio-l', 'audio-r'],
    forms: [SOUND_PAIR],
    connectors: ['jack35-socket', 'din5-socket'],
  },
  's-video': {
    circuits: ['y', 'c'],
    forms: [{ form: 's-video', circuits: ['y', 'c'] }],
    connectors: ['svideo4-socket', 'minidin7-socket'],
  },
  'component-y': { circuits: ['y'], forms: [], connectors: ['phono-socket', 'bnc-socket'] },
  'component-pb': { circuits: ['pb'], forms: [], connectors: ['phono-socket', 'bnc-socket'] },
  'component-pr': { circuits: ['pr'], forms: [], connectors: ['phono-socket', 'bnc-socket'] },
  rf: {
    circuits: ['rf'],
    forms: [{ form: 'rf', circuits: ['rf'] }],
    connectors: [
      'f-socket',
      'iec-socket',
      'iec-plug',
      'screws',
      'clamp',
      'phono-socket',
      'jack35-socket',
      'f-plug',
      'whip',
    ],
  },
  'av-21': {
    circuits: ['cvbs', 'audio-l', 'audio-r'],
    forms: [COMPOSITE, SOUND_PAIR],
    connectors: ['scart-socket'],
  },
  'rgb-21': {
    circuits: ['cvbs', 'audio-l', 'audio-r', 'r', 'g', 'b'],
    forms: [COMPOSITE, SOUND_PAIR, { form: 'rgbs', circuits: ['r', 'g', 'b', 'cvbs'] }],
    connectors: ['scart-socket'],
  },
  rgbhv: {
    circuits: ['r', 'g', 'b', 'hsync', 'vsync'],
    forms: [{ form: 'rgbhv', circuits: ['r', 'g', 'b', 'hsync', 'vsync'] }],
    connectors: ['hd15-socket'],
  },
  hdmi: {
    circuits: ['tmds'],
    forms: [{ form: 'hdmi', circuits: ['tmds'] }],
    connectors: ['hdmi-socket'],
  },
  'digital-sound': {
    circuits: ['spdif'],
    forms: [{ form: 'digital-sound', circuits: ['spdif'] }],
    connectors: ['optical-socket', 'phono-socket'],
  },
  power: { circuits: ['dc'], forms: [], connectors: ['dc-socket'] },
}

export interface SocketForm {
  key: string
  label: string
  use: Use | ''
  connector: Connector | ''
  dir: 'in' | 'out'
  /** The bracketed name that it stands under; empty for none. */
  heading: string
  face: 'back' | 'front' | 'side'
  /** From the top, counted from 1, as typed. */
  row: string
}

export const CONTROL_FORM_KINDS = ['positions', 'channel', 'tuned-to', 'trim'] as const

export interface ControlForm {
  key: string
  label: string
  kind: (typeof CONTROL_FORM_KINDS)[number]
  access: Access
  role: ControlRole
  /** Names of its positions, with commas between. */
  positions: string
  plan: PlanId
  /** Channels of the plan, such as `3,4` or `2..13`. */
  channels: string
  way: TuningWay
  quantity: TrimQuantity
}

export const DOES_KINDS = ['plays', 'modulates', 'shows', 'loop-through'] as const
export type DoesKind = (typeof DOES_KINDS)[number]

export interface DoesForm {
  key: string
  kind: DoesKind
  label: string
  /** Keys of forms over sockets; see `deriveJacks`. */
  input: string
  sound: string
  outputs: string[]
  /** The control that chooses its channel, or tunes it. */
  channel: string
  /** Acts only while this control stands at that position. */
  whileControl: string
  whilePosition: string
}

/** Markets whose standards this form knows how to fill in. */
export const FORM_MARKETS = [
  '525-m',
  '525-japan',
  '625-bg',
  '625-i',
  '625-dk',
] as const satisfies readonly Market[]
export type FormMarket = (typeof FORM_MARKETS)[number]

export interface ModelForm {
  maker: string
  name: string
  kind: DeviceKind | ''
  market: FormMarket
  year: string
  aliases: string
  factSource: FactSource
  chassis: DeviceModel['chassis']
  remote: DeviceModel['remote']
  screen: 'tube-colour' | 'tube-mono'
  loudspeakers: 'none' | 'mono' | 'stereo'
  packVolts: string
  packMilliamps: string
  packPolarity: 'centre-positive' | 'centre-negative' | ''
  sockets: SocketForm[]
  controls: ControlForm[]
  does: DoesForm[]
}

export const emptyModel = (): ModelForm => ({
  maker: '',
  name: '',
  kind: '',
  market: '525-m',
  year: '',
  aliases: '',
  factSource: 'panel-photo',
  chassis: 'isolated',
  remote: 'none',
  screen: 'tube-colour',
  loudspeakers: 'mono',
  packVolts: '',
  packMilliamps: '',
  packPolarity: '',
  sockets: [],
  controls: [],
  does: [],
})

/** Keys are made once and never used again within a model. */
export function freshKey(prefix: string, taken: readonly { readonly key: string }[]): string {
  const numbers = taken.map((t) => Number(t.key.slice(prefix.length + 1)) || 0)
  return `${prefix}-${Math.max(0, ...numbers) + 1}`
}

/** A new socket starts like the one before it: rows of sockets are alike. */
export function nextSocket(sockets: readonly SocketForm[]): SocketForm {
  const last = sockets.at(-1)
  return {
    key: freshKey('socket', sockets),
    label: '',
    use: '',
    connector: last?.connector ?? '',
    dir: last?.dir ?? 'out',
    heading: last?.heading ?? '',
    face: last?.face ?? 'back',
    row: last?.row ?? '1',
  }
}

export const nextControl = (controls: readonly ControlForm[]): ControlForm => ({
  key: freshKey('control', controls),
  label: '',
  kind: 'positions',
  access: 'back',
  role: 'other',
  positions: '',
  plan: 'us-broadcast',
  channels: '3,4',
  way: 'numbers',
  quantity: 'fine-tuning',
})

export const nextDoes = (does: readonly DoesForm[], kind: DoesKind): DoesForm => ({
  key: freshKey('does', does),
  kind,
  label: '',
  input: '',
  sound: '',
  outputs: [],
  channel: '',
  whileControl: '',
  whilePosition: '',
})

/** The names of a model that exists; everything else of it stays as it is described. */
export const fromNames = (model: Model): ModelForm => ({
  ...emptyModel(),
  maker: model.maker,
  name: model.name,
  aliases: model.aliases.join(', '),
  year: model.year === undefined ? '' : String(model.year),
  factSource: model.factSource,
})
