import {
  isPiece,
  type CaseAnswer,
  type CaseMode,
  type CasePort,
  type CaseUnit,
  type Expected,
} from '../form'
import { portName, unitOf, type Bench } from './bench'
import { fieldHz, formOfSignal, isSound, lineKhz, type WordForm } from './facts'

type Deed = string

const differs = (a: number, b: number, by: number): boolean => Math.abs(a - b) > by

/** Of the modes of an output those that a box gives for one of its input: equal ones, else of the same scan, else any. */
function givenFor(mode: CaseMode, out: readonly CaseMode[]): readonly CaseMode[] {
  const same = out.filter((m) => m.scan === mode.scan)
  const equal = same.filter((m) => m.colour === mode.colour)
  return equal.length > 0 ? equal : same.length > 0 ? same : out
}

const ENCODED: readonly (WordForm | undefined)[] = ['composite', 's-video']

function conversions(from: CasePort, to: CasePort): Deed[] {
  return (from.modes ?? []).flatMap((mode) =>
    givenFor(mode, to.modes ?? []).flatMap((out) => [
      ...(differs(fieldHz(mode.scan), fieldHz(out.scan), 2) ? ['field-rate'] : []),
      ...(differs(lineKhz(mode.scan), lineKhz(out.scan), 0.2) ? ['line-rate'] : []),
      ...(mode.colour !== out.colour &&
      [from, to].every((p) => p.signals.some((s) => ENCODED.includes(formOfSignal(s))))
        ? ['colour']
        : []),
    ]),
  )
}

const formsAt = (port: CasePort): WordForm[] => port.signals.flatMap((s) => formOfSignal(s) ?? [])

/** Changes of form between two ports, by what both ends carry. */
function changes(from: CasePort, to: CasePort): Deed[] {
  const a = formsAt(from)
  const b = formsAt(to)
  if (a.length === 0 || b.length === 0 || a.some((f) => b.includes(f))) return []
  const is = (one: WordForm, other: WordForm): boolean => a.includes(one) && b.includes(other)
  return [
    ...(is('composite', 's-video') ? ['separate'] : []),
    ...(is('s-video', 'composite') ? ['add'] : []),
    ...(is('rgb', 'composite') || is('rgb', 's-video') ? ['encode'] : []),
    ...(is('rgb', 'component') ? ['rgb-to-component'] : []),
    ...(is('component', 'rgb') ? ['component-to-rgb'] : []),
    ...(a.includes('digital') ? ['from-digital'] : []),
    ...(b.includes('digital') ? ['to-digital'] : []),
  ]
}

/** The elementary things that a bought box does between the ports that are used. */
function deedsOf(unit: CaseUnit, isUsed: (port: string) => boolean): Deed[] {
  const port = (id: string): CasePort | undefined => unit.ports.find((p) => p.id === id)
  const edges = (unit.does ?? []).filter((d) => isUsed(d.from) && isUsed(d.to))
  const speaks = unit.ports.every((p) => p.dir === 'in' && p.signals.some(isSound))
  const deeds = edges.flatMap((d) => {
    const from = port(d.from)
    const to = port(d.to)
    if (!from || !to) return []
    return [
      ...conversions(from, to),
      ...changes(from, to),
      ...(from.tuner && d.how !== 'loop' ? ['tune'] : []),
      ...(to.rf && d.how !== 'loop' && from.signals.some((s) => formOfSignal(s) !== undefined)
        ? ['modulate']
        : []),
      ...(from.signals.includes('digital-audio') ? ['from-digital'] : []),
    ]
  })
  return [...deeds, ...(speaks ? ['give-sound'] : [])]
}

type Item = NonNullable<CaseAnswer['missing']>[number]['item']

function allDeeds(items: readonly Item[], isUsed: (ref: string) => boolean): string {
  const deeds = items.flatMap((item) =>
    isPiece(item)
      ? item.joins
        ? ['join-sounds']
        : []
      : deedsOf(item, (p) => isUsed(`${item.id}:${p}`)),
  )
  return [...new Set(deeds)].sort().join(', ')
}

/** Everything bought is used, and together does what the things missing do, or is called the same. */
export function bought(bench: Bench, expected: Expected): string[] {
  const missing = bench.answer.missing ?? []
  if (expected.possible !== 'with-purchase')
    return missing.length > 0 ? ['buys what is not needed'] : []
  const wanted = expected.missing ?? []
  const used = new Set(bench.hops.flatMap((h) => [h.from, h.to]))
  const pieces = new Set(
    bench.hops.flatMap((h) => h.by.map((b) => (typeof b === 'string' ? b : b.id))),
  )
  const idle = missing.filter(({ item }) =>
    isPiece(item)
      ? !pieces.has(item.id)
      : ![...used].some((ref) => unitOf(ref) === item.id && portName(ref) !== ''),
  )
  const codes = (list: readonly { code: string }[]): string =>
    [...new Set(list.map((m) => m.code))].sort().join()
  const best = new Set((expected.best ?? []).flatMap((p) => p.hops.flatMap((h) => [h.from, h.to])))
  const own = allDeeds(
    missing.map((m) => m.item),
    (ref) => used.has(ref),
  )
  const asked = allDeeds(
    wanted.flatMap((m) => m.item ?? []),
    (ref) => best.has(ref),
  )
  return [
    ...(missing.length === 0 ? ['buys nothing'] : []),
    ...idle.map((m) => `${m.item.id ?? m.code} is bought and not used`),
    ...(own === asked || codes(missing) === codes(wanted)
      ? []
      : [`what is bought does: ${own || 'nothing'}; missing is what does: ${asked || 'nothing'}`]),
  ]
}
