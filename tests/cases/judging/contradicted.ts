import { isPiece, type CasePort, type CaseTuner, type CaseUnit } from '../form'
import type { Bench } from './bench'

/** What the facts of a case say against a warning; a warning that they contradict fails. */
type Contradiction = (facts: Facts) => boolean

/** The facts of one question, laid out flat. */
class Facts {
  readonly units: readonly CaseUnit[]
  readonly ports: readonly CasePort[]
  readonly connectors: readonly string[]

  constructor(readonly bench: Bench) {
    const { question } = bench
    const pieces = question.shelf.filter(isPiece)
    this.units = [...bench.units.values()]
    this.ports = this.units.flatMap((u) => u.ports)
    this.connectors = [...this.ports.map((p) => p.connector), ...pieces.flatMap((p) => p.ends)]
  }

  has(signal: string): boolean {
    return this.ports.some((p) => p.signals.includes(signal))
  }

  tuners(): CaseTuner[] {
    return this.ports.flatMap((p) => (p.tuner ? [p.tuner] : []))
  }

  systems(): Set<string> {
    return new Set([
      ...this.tuners().flatMap((t) => t.systems),
      ...this.ports.flatMap((p) => (p.rf ? [p.rf.system] : [])),
    ])
  }

  colours(): Set<string> {
    return new Set([
      ...this.ports.flatMap((p) => (p.modes ?? []).map((m) => m.colour)),
      ...this.tuners().flatMap((t) => t.colours),
      ...this.ports.flatMap((p) => p.rf?.colour ?? []),
    ])
  }

  scans(): Set<string> {
    return new Set([
      ...this.ports.flatMap((p) => (p.modes ?? []).map((m) => m.scan)),
      ...this.tuners().flatMap((t) => t.scans),
    ])
  }

  protected(): readonly string[] {
    return [this.bench.question.source.content?.protection ?? []].flat()
  }
}

const noRf: Contradiction = (f) => !f.has('rf')

const CONTRADICTIONS: Readonly<Record<string, Contradiction>> = {
  'W-BROKEN-SOCKET': (f) => f.ports.every((p) => p.works !== false),
  'W-HDCP': (f) => !f.has('hdmi') && !f.has('dvi'),
  'W-AGC': (f) =>
    !f.protected().includes('analogue-agc') &&
    f.units.every((u) => !u.recorderInputAgc && u.ports.every((p) => !p.recorderInputAgc)),
  'W-LIGHT-GUN': (f) => ![f.bench.question.source.needs ?? []].flat().includes('light-gun'),
  'W-TWO-TRACKS': (f) =>
    f.bench.question.source.content?.tracks === undefined &&
    f.ports.every((p) => p.tracks === undefined),
  'W-DC-ON-COAX': (f) =>
    f.ports.every((p) => !p.dcVolts) &&
    f.units.every(
      (u) => !u.needsDc && !u.dcOut && !u.dcPass && !/volt|dc/i.test(u.triggersOn ?? ''),
    ),
  'W-DIGITAL-TUNER': (f) =>
    f.tuners().every((t) => t.systems.length > 0) &&
    f.ports.every((p) => p.rf?.system !== 'digital'),
  'W-VISION-POLARITY': (f) => !f.systems().has('L') && !f.systems().has('A'),
  'W-LIVE-CHASSIS': (f) => f.units.every((u) => !/crt|tube|monitor/.test(u.kind ?? '')),
  'W-SOUND-OFFSET': (f) => f.systems().size < 2,
  'W-COLOUR-LOST': (f) => f.colours().size < 2,
  'W-NO-LOCK': (f) => f.scans().size < 2,
  'W-SCAN': (f) => f.scans().size < 2,
  'W-PROGRESSIVE': (f) => f.scans().size < 2,
  'W-IMPEDANCE': (f) =>
    f.ports.every((p) => p.ohm !== 300) &&
    !f.connectors.some((c) => ['screws', 'spades', 'bare'].includes(c)),
  'W-SWITCHING-VOLTAGE': (f) => !f.connectors.some((c) => /^(scart|jp21)-/.test(c)),
  'W-BAND': noRf,
  'W-COCHANNEL': noRf,
  'W-ADJACENT': noRf,
  'W-DSB': noRf,
  'W-BUZZ': noRf,
  'W-CATV': noRf,
}

/** Warnings of an answer that the facts of its case contradict. */
export function contradicted(bench: Bench, codes: readonly string[]): string[] {
  const facts = new Facts(bench)
  return [...new Set(codes)]
    .filter((code) => CONTRADICTIONS[code]?.(facts))
    .map((code) => `the facts contradict ${code}`)
}
