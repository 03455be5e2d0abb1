import type { Circuit } from '@coaxwain/signal'

/** What the form's words for pictures are made of. */
export const PICTURE_CIRCUITS: Readonly<Record<string, readonly Circuit[]>> = {
  composite: ['cvbs'],
  's-video': ['y', 'c'],
  luma: ['y'],
  chroma: ['c'],
  'ypbpr-y': ['y'],
  'ypbpr-pb': ['pb'],
  'ypbpr-pr': ['pr'],
  'rgb-r': ['r'],
  'rgb-g': ['g'],
  'rgb-b': ['b'],
  'rgb-cs': ['r', 'g', 'b', 'csync'],
  'rgb-hv': ['r', 'g', 'b', 'hsync', 'vsync'],
  'rgb-sog': ['r', 'g', 'b'],
  sync: ['csync'],
  rgbi: ['ttl-r', 'ttl-g', 'ttl-b', 'ttl-i', 'hsync', 'vsync'],
  'mono-ttl': ['ttl-mono', 'hsync', 'vsync'],
  hdmi: ['tmds'],
  dvi: ['tmds'],
  rf: ['rf'],
}

/** The question part of a case, as its form describes it. Unknown fields are ignored. */
export type When = Readonly<Record<string, readonly string[]>>

/**
 * A fact that may depend on controls: stated alone, with its `when`, or as a list of such statements. The form
 * names these entries without saying how each is spelt, so that they are read by `stated`.
 */
export type Stated = unknown

/** One statement of such a fact. */
export interface Statement {
  readonly value: unknown
  readonly when: When | undefined
}

const NOT_THE_FACT = ['when', 'note', 'words']

/** Every statement of a fact, however it is spelt: `x`, `{x, when}`, or a list of either. */
export function stated(fact: Stated): Statement[] {
  if (fact === undefined || fact === null) return []
  if (Array.isArray(fact)) return fact.flatMap((one: unknown) => stated(one))
  if (typeof fact !== 'object') return [{ value: fact, when: undefined }]
  const { when, ...rest } = fact as Record<string, unknown> & { when?: When }
  const [value] = Object.entries(rest)
    .filter(([key]) => !NOT_THE_FACT.includes(key))
    .map(([, v]) => v)
  return [{ value, when }]
}

export interface CaseMode {
  scan: string
  colour: string
  signals?: string[]
  when?: When
  needs?: string[]
  converts?: boolean
}

export interface CaseRf {
  plan: string
  channels: string[]
  system: string
  colour: string[]
  sideband: string
  levelDbmv?: number
  sound?: string
  control?: string
  always?: boolean
  variants?: (Partial<CaseRf> & { when: When })[]
}

export interface CaseTuner {
  plans: string[]
  systems: string[]
  colours: string[]
  scans: string[]
  digital: string[]
  control?: string
  variants?: (Partial<CaseTuner> & { when: When })[]
}

export interface CasePort {
  id: string
  label: string
  dir: 'in' | 'out' | 'both'
  connector: string
  mount: 'chassis' | 'lead'
  signals: string[]
  works?: boolean
  when?: When
  modes?: CaseMode[]
  ohm?: number
  rf?: CaseRf
  tuner?: CaseTuner
  volts?: (string | { volt: string; when?: When })[]
  load?: Stated
  loops?: string
  tracks?: Stated
  taken?: boolean | string
  hdcp?: boolean
  recorderInputAgc?: boolean
  dcVolts?: number
  shape?: Stated
  syncFrom?: Stated
}

export interface CaseControl {
  name: string
  class: string
  choices?: string[]
  range?: Record<string, unknown>
  way?: string
  now?: Record<string, number>
  aim?: Record<string, number>
  movedBy?: Record<string, string>
}

export interface CaseDoes {
  from: string
  to: string
  how?: 'loop' | 'tuned'
  when?: When
}

export interface CaseUnit {
  id?: string
  kind?: string
  what: string
  ports: CasePort[]
  settings?: CaseControl[]
  does?: CaseDoes[]
  powered?: boolean
  content?: { protection?: string[] | string; scans?: string[]; tracks?: unknown; wanted?: unknown }
  needs?: string[] | string
  sound?: string
  deflection?: { lineKhz: [number, number][]; fieldHz: number[] }
  aspect?: string
  shape?: Stated
  syncFrom?: Stated
  loops?: unknown
  tube?: { view?: string; lineKhz?: unknown }
  fieldStore?: boolean
  scanConversion?: boolean
  recorderInputAgc?: boolean
  hdcp?: boolean
  liveChassis?: boolean
  lossDb?: number
  gainDb?: number
  leaks?: { from: string; to: string; db: number }[]
  reverseDb?: number
  needsDc?: Stated
  dcOut?: Stated
  dcPass?: Stated
  triggersOn?: string
  combFilter?: boolean
  mains?: string
}

export interface CasePiece {
  id: string
  kind: 'lead' | 'adapter'
  what: string
  ends: [string, string]
  cores?: number
  carries?: string[]
  wired?: string[]
  volts?: (string | { volt: string })[]
  joins?: string[]
  gives?: string
  terminates?: unknown
  lossDb?: number
}

export interface CaseQuestion {
  id: string
  source: CaseUnit
  display: CaseUnit
  shelf: (CaseUnit | CasePiece)[]
  environment: {
    antennaUsed: boolean
    offAir: { channel: string; kind: 'analogue' | 'digital'; levelDbmv?: number }[]
  }
  aim?: string
}

export const isPiece = (item: CaseUnit | CasePiece): item is CasePiece => 'ends' in item

export type PieceUse = string | { id: string; first: string }

export interface CaseHop {
  from: string
  by: PieceUse[]
  to: string
  signal: string
}

export interface CasePath {
  purpose: string
  hops: CaseHop[]
  joins?: string
}

export interface CaseSetting {
  on: string
  set: string
  to: string
  class?: string
}

export interface CaseQuality {
  picture: 'colour' | 'monochrome' | 'none'
  form: string
  sound: 'stereo' | 'mono' | 'mono-one-channel-lost' | 'none'
}

export interface CaseWarning {
  code?: string
  words: string
}

export interface CaseMissing {
  code: string
  words: string
  item: CaseUnit | CasePiece
}

export interface CaseAnswer {
  paths: CasePath[]
  settings: CaseSetting[]
  quality: CaseQuality
  missing?: CaseMissing[]
  warnings?: CaseWarning[]
  claims?: string[]
  below?: string
}

export interface HookupAnswer {
  id: string
  possible: 'yes' | 'with-purchase' | 'no'
  answers?: CaseAnswer[]
  verdict?: string
  reasons?: { code: string; words: string; facts: string[] }[]
  warnings?: CaseWarning[]
  claims?: string[]
  fallback?: { words: string; paths?: CasePath[]; quality: CaseQuality }
}

export interface MustNot {
  code: string
  item?: string
  port?: string
  on?: string
  to?: string
  setting?: string
  warning?: string
  claim?: string
}

export interface Expected {
  possible: 'yes' | 'with-purchase' | 'no'
  best?: CasePath[]
  settings?: (CaseSetting & { oneOf?: string[]; need: 'must' | 'should' })[]
  missing?: { code: string; words: string; item?: CaseUnit | CasePiece }[]
  quality: CaseQuality
  warnings?: { code: string; words: string }[]
  mustNot?: MustNot[]
}

export interface HookupCase extends CaseQuestion {
  expected: Expected
  confidence?: 'high' | 'medium' | 'low'
}

export interface CaseFile {
  form: string
  hookupCases?: HookupCase[]
  channelCases?: { id: string }[]
  levelCases?: { id: string }[]
}
