/** The question part of a case, as its form describes it. Unknown fields are ignored. */
export type When = Readonly<Record<string, readonly string[]>>

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
  volts?: { volt: string; when?: When }[]
  load?: unknown
  loops?: string
  tracks?: unknown
  taken?: boolean | string
  hdcp?: boolean
  recorderInputAgc?: boolean
  dcVolts?: number
  shape?: { shape: string; when?: When }[] | string
  syncFrom?: unknown
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
  content?: { protection?: string[]; scans?: string[]; tracks?: unknown }
  needs?: string[]
  sound?: string
  deflection?: { lineKhz: [number, number][]; fieldHz: number[] }
  aspect?: string
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
  needsDc?: unknown
  dcOut?: string[]
  triggersOn?: string
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
  volts?: string[]
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

export interface CaseHop {
  from: string
  by: (string | { id: string; first: string })[]
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

export interface CaseAnswer {
  paths: CasePath[]
  settings: CaseSetting[]
  quality: CaseQuality
  missing?: { code: string; words: string; item: CaseUnit | CasePiece }[]
  warnings?: CaseWarning[]
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

export interface Expected {
  possible: 'yes' | 'with-purchase' | 'no'
  best?: CasePath[]
  settings?: (CaseSetting & { oneOf?: string[]; need: 'must' | 'should' })[]
  missing?: { code: string; words: string; item?: CaseUnit | CasePiece }[]
  quality: CaseQuality
  warnings?: { code: string; words: string }[]
  mustNot?: {
    code: string
    item?: string
    port?: string
    on?: string
    to?: string
    setting?: string
    warning?: string
    claim?: string
  }[]
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
