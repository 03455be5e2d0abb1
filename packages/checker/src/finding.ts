/** Everything that can be wrong with a hookup. Each rule has its own code. */
export const FINDINGS = [
  'unit-unknown',
  'unit-avoided',
  'unit-not-lent',
  'unit-twice',
  'piece-unknown',
  'piece-short',
  'port-unknown',
  'port-retired',
  'port-taken-twice',
  'plug-taken-twice',
  'plugs-do-not-mate',
  'needs-a-lead',
  'too-many-pieces',
  'too-many-leads',
  'too-many-boxes',
  'wire-missing',
  'not-meant-for',
  'circuit-not-on-port',
  'wrong-direction',
  'impedance',
  'wires-joined',
  'japanese-wiring',
  'live-socket',
  'loudspeaker-into-line',
  'dc-not-stood',
  'dc-missing',
  'socket-dead',
  'function-dead',
  'function-unknown',
  'function-not-acting',
  'control-unknown',
  'position-unknown',
  'position-left-open',
  'automatic-not-moved',
  'out-of-reach',
  'input-not-fed',
  'output-not-given',
  'not-taken',
  'not-tuned',
  'channel-not-offered',
  'system-does-not-carry',
  'protection',
  'line-rate',
  'field-rate',
  'light-gun',
  'demand-missed',
  'line-not-ended',
  'line-ended-twice',
  'terminator-misplaced',
  'claims-picture',
  'claims-sound',
  'claims-effort',
  'claims-doubt',
  'aerial-not-kept',
  'radiates',
  'legs-and-links-differ',
] as const

export type FindingCode = (typeof FINDINGS)[number]

/** One thing that is wrong, and where. */
export interface Finding {
  readonly code: FindingCode
  readonly details: Readonly<Record<string, string | number>>
}

export const finding = (code: FindingCode, details: Finding['details'] = {}): Finding => ({
  code,
  details,
})
