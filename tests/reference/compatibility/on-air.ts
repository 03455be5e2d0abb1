import { DEFLECTION_50, DEFLECTION_60 } from '@coaxwain/models/build'
import {
  channelsIn,
  type AnalogueCarrier,
  type Colour,
  type DigitalSystem,
  type OnAir,
  type PlanPart,
  type Receiver,
  type RfSystemId,
  type ScanId,
} from '@coaxwain/signal'

/** One thing sent to one set. */
export interface AirCase {
  readonly sent: OnAir
  readonly set: Receiver
  /** Where the sender stands. */
  readonly part: PlanPart
  /** Why the engine is not asked: it has no such source. */
  readonly notAsked?: string
}

/** Where a carrier is put so that only what the row is about differs. */
const COMMON: PlanPart = { plan: 'ccir-west-europe', names: '36' }

const visionOf = (part: PlanPart): number => channelsIn(part)[0]?.visionMhz ?? 0

const sent = (
  system: RfSystemId,
  colour: Colour,
  part: PlanPart = COMMON,
  sound: AnalogueCarrier['sound'] = 'stereo',
): AnalogueCarrier => {
  const scan: ScanId = system === 'M' ? '525i60' : '625i50'
  return { kind: 'analogue', system, colour, scan, visionMhz: visionOf(part), sound }
}

const set = (
  systems: readonly RfSystemId[],
  colour: Colour,
  rest: Partial<Receiver> = {},
): Receiver => ({
  systems,
  digital: [],
  colours: [colour],
  deflection: systems.includes('M') ? DEFLECTION_60 : DEFLECTION_50,
  reaches: [COMMON],
  pullInMhz: 0.5,
  ...rest,
})

const M_NTSC = set(['M'], 'ntsc-m')
const BG_PAL = set(['B', 'G'], 'pal')
const I_PAL = set(['I'], 'pal')
const DK_PAL = set(['D', 'K'], 'pal')
const L_SECAM = set(['L'], 'secam')

/** Every carrier to every set. */
const each = (carriers: readonly AnalogueCarrier[], sets: readonly Receiver[]): AirCase[] =>
  carriers.flatMap((carrier) => sets.map((s) => ({ sent: carrier, set: s, part: COMMON })))

/** Channels of one plan to a tuner for another. */
const tuned = (plan: PlanPart['plan'], names: readonly string[], reaches: PlanPart): AirCase[] =>
  names.map((name) => {
    const part = { plan, names: name }
    return { sent: sent('M', 'ntsc-m', part), set: { ...M_NTSC, reaches: [reaches] }, part }
  })

const numbers = (first: number, last: number): string[] =>
  Array.from({ length: last - first + 1 }, (_, i) => String(first + i))

const DIAL_TO_69: PlanPart = { plan: 'us-broadcast', names: '2..69' }

const multiplex = (digital: DigitalSystem): AirCase => ({
  sent: { kind: 'digital', digital },
  set: M_NTSC,
  part: COMMON,
  notAsked: 'the engine knows digital carriers off air only',
})

/** Rows of the compatibility table about aerial sockets. */
export const ON_AIR: Readonly<Record<string, readonly AirCase[]>> = {
  c01: each([sent('M', 'ntsc-m')], [M_NTSC]),
  c02: each([sent('M', 'ntsc-j')], [M_NTSC]),
  c03: each([sent('M', 'ntsc-m')], [set(['M'], 'ntsc-j')]),
  c04: each([sent('M', 'pal-m')], [M_NTSC]),
  c05: each([sent('M', 'ntsc-m')], [set(['M'], 'pal-m')]),
  c06: each([sent('N', 'pal-n')], [M_NTSC]),
  c07: each([sent('M', 'ntsc-m')], [BG_PAL, I_PAL, DK_PAL]),
  c08: each([sent('B', 'pal'), sent('G', 'pal')], [M_NTSC]),
  c09: each([sent('B', 'pal'), sent('G', 'pal')], [I_PAL]),
  c10: each([sent('I', 'pal')], [BG_PAL]),
  c11: each([sent('B', 'pal'), sent('G', 'pal')], [DK_PAL]),
  c12: each([sent('D', 'pal'), sent('K', 'pal')], [I_PAL, BG_PAL]),
  c13: each([sent('D', 'secam'), sent('K', 'secam')], [BG_PAL]),
  c14: each([sent('L', 'secam')], [BG_PAL, I_PAL, DK_PAL, M_NTSC]),
  c15: each([sent('G', 'pal'), sent('I', 'pal'), sent('D', 'pal')], [L_SECAM]),
  c16: each([sent("L'", 'secam')], [L_SECAM]),
  c17: [
    ...each([sent('G', 'pal')], [set(['H'], 'pal')]),
    ...each([sent('H', 'pal')], [set(['G'], 'pal')]),
  ],
  c18: each([sent('B', 'pal')], [set(['G'], 'pal')]),
  c19: tuned('us-cable-hrc', ['2', '5', '6', '14', '23', '37'], {
    plan: 'us-cable-std',
    names: '2..125',
  }),
  c20: tuned('us-cable-std', numbers(14, 22), DIAL_TO_69),
  c21: [multiplex('atsc'), multiplex('dvb-t'), multiplex('isdb-t')],
  c22: each([sent('M', 'ntsc-m')], [set([], 'ntsc-m', { digital: ['atsc'] })]),
  c23: each([sent('M', 'ntsc-m', COMMON, 'mono')], [M_NTSC]),
  c24: tuned('us-broadcast', numbers(70, 83), DIAL_TO_69),
}
