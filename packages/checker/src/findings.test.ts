import { automatic, choice, at, OTHERWISE, pluggedInto } from '@coaxwain/models/build'
import { describe, expect, it } from 'vitest'
import { RULES } from './check-hookup'
import { FINDINGS, type FindingCode } from './finding'
import { tried } from '@coaxwain/shelf/rig'
import {
  codes,
  deviceIn,
  functionIn,
  looped,
  modulated,
  pieceIn,
  portIn,
  straight,
  unitIn,
  use,
  withAerial,
  type Loose,
  type Rig,
} from './test-rig'

/** What makes a right hookup wrong in one way, and what cannot but be wrong along with it. */
interface Fault {
  readonly rig: () => Rig
  readonly spoil: (rig: Rig) => void
  readonly also: readonly FindingCode[]
}

const fault =
  (rig: () => Rig) =>
  (spoil: Fault['spoil'], ...also: readonly FindingCode[]): Fault => ({ rig, spoil, also })

const direct = fault(straight)
const byAir = fault(modulated)
const besideAerial = fault(withAerial)

const inputSwitch = () =>
  choice('input', 'INPUT', 'input', { positions: ['line', 'tv'], access: 'remote' })

/** Turns a switch of the set; without a position it stays where it happens to stand. */
function addInputSwitch(rig: Rig, position: string | null): void {
  deviceIn(rig, 'set').controls.push(loose(inputSwitch()))
  if (position !== null) setTo(rig, 'set', 'input', position)
}

function setTo(rig: Rig, unit: string, control: string, position: string): void {
  const setting = { unit, control, position, orElse: [] }
  rig.hookup.settings.push({ ...setting, access: 'front', why: 'opens-way', must: true })
}

const stop = (unit: string, fn: string) => ({
  unit,
  function: fn,
  in: null,
  out: null,
  picture: null,
  sound: 'none' as const,
})

const FAULTS: Readonly<Record<FindingCode, Fault>> = {
  'unit-unknown': direct((r) => r.hookup.legs[1]!.stops.push(stop('nobody', 'nothing'))),
  'unit-avoided': byAir((r) => r.question.avoid.push('modulator')),
  'unit-not-lent': byAir((r) => void (unitIn(r, 'modulator').holding = 'sold')),
  'unit-twice': direct((r) => r.hookup.legs[1]!.stops.push(stop('player', 'play'))),
  'piece-unknown': direct((r) => {
    r.hookup.links[2]!.pieces[0]!.model = 'nothing'
    r.question.assumedLeads.push('nothing')
  }),
  'piece-short': direct((r) => void (unitIn(r, 'phonos').quantity = 0)),
  'port-unknown': direct((r) => void (r.hookup.links[2]!.to.port = 'nowhere')),
  'port-retired': direct((r) => void (portIn(r, 'set', 'video-in').retired = true)),
  'port-taken-twice': direct((r) => {
    r.hookup.links[2]!.from.port = 'sound-out-l'
    r.hookup.links[2]!.circuits[0]!.from = 'audio-l'
  }),
  'plug-taken-twice': direct((r) => void (r.hookup.links[2]!.pieces = [use('phonos', 1)])),
  'plugs-do-not-mate': direct((r) => void (portIn(r, 'set', 'video-in').connector = 'bnc-socket')),
  'needs-a-lead': direct((r) => void (pieceIn(r, 'phonos').kind = 'adapter')),
  'too-many-pieces': direct((r) =>
    r.hookup.links[0]!.pieces.push(...[1, 2, 3, 4].map((copy) => use('collar', 0, copy))),
  ),
  'too-many-leads': direct((r) =>
    r.hookup.links[0]!.pieces.push(use('extension', 0, 1), use('extension', 0, 2)),
  ),
  'too-many-boxes': direct((r) => {
    for (let i = 1; i <= 7; i++) {
      const box = structuredClone(deviceIn(r, 'player'))
      r.models[`box-${i}`] = box
      r.units.push(loose(tried(`box-${i}`, box)))
      r.hookup.legs[1]!.stops.push(stop(`box-${i}`, 'play'))
    }
  }),
  'wire-missing': direct((r) => void pieceIn(r, 'phonos').wires.pop()),
  'not-meant-for': direct((r) => void (pieceIn(r, 'phonos').meantFor = ['cvbs'])),
  'circuit-not-on-port': direct((r) => void (portIn(r, 'set', 'video-in').circuits = [])),
  'wrong-direction': direct((r) => void (portIn(r, 'set', 'video-in').circuits[0]!.dir = 'out')),
  impedance: byAir((r) => void (portIn(r, 'set', 'aerial-in').impedanceOhm = 300)),
  'wires-joined': direct((r) => {
    joinSound(r)
    pieceIn(r, 'y').mixes = false
  }),
  'japanese-wiring': direct((r) => {
    portIn(r, 'set', 'video-in').connector = 'scart-socket'
    pieceIn(r, 'phonos').b[0]!.connector = 'jp21-plug'
    pieceIn(r, 'phonos').wires[0]!.b.circuit = 'cvbs'
  }),
  'live-socket': direct((r) => {
    deviceIn(r, 'set').chassis = 'live'
    portIn(r, 'set', 'video-in').isolated = 'no'
  }),
  'loudspeaker-into-line': direct(
    (r) => void (portIn(r, 'player', 'sound-out-l').circuits[0]!.level = 'loudspeaker'),
  ),
  'dc-not-stood': direct((r) => {
    portIn(r, 'player', 'video-out').suppliesDcVolts = 5
    portIn(r, 'set', 'video-in').standsDc = 'no'
  }),
  'dc-missing': direct((r) => void (portIn(r, 'set', 'video-in').needsDcVolts = 5)),
  'socket-dead': direct(
    (r) => void (unitIn(r, 'set').forms.find((f) => f.jack === 'video-in')!.state = 'dead'),
  ),
  'function-dead': direct(
    (r) => void (unitIn(r, 'set').functions.find((f) => f.function === 'line')!.state = 'dead'),
  ),
  'function-unknown': direct((r) => void (r.hookup.legs[0]!.stops[1]!.function = 'nothing')),
  'function-not-acting': direct((r) => {
    addInputSwitch(r, 'tv')
    functionIn(r, 'set', 'line').while = loose(at('input', 'line'))
  }),
  'control-unknown': direct((r) => setTo(r, 'set', 'nothing', 'on')),
  'position-unknown': direct((r) => addInputSwitch(r, 'nowhere')),
  'position-left-open': direct((r) => {
    addInputSwitch(r, null)
    functionIn(r, 'set', 'line').while = loose(at('input', 'line'))
  }, 'function-not-acting'),
  'automatic-not-moved': direct((r) => {
    const control = automatic('front-first', 'AUTO', [
      ['front', 'FRONT', pluggedInto('aerial-in')],
      ['back', 'BACK', OTHERWISE],
    ])
    deviceIn(r, 'set').controls.push(loose(control))
    setTo(r, 'set', 'front-first', 'front')
  }),
  'out-of-reach': direct((r) => {
    deviceIn(r, 'set').remote = 'needed'
    unitIn(r, 'set').remotePresent = false
    addInputSwitch(r, 'line')
  }),
  'input-not-fed': direct((r) => void (r.hookup.links[0]!.circuits = [])),
  'output-not-given': direct((r) => {
    functionIn(r, 'player', 'play').gives[0]!.while = loose(at('power', 'standby'))
  }),
  'not-taken': direct((r) => {
    functionIn(r, 'set', 'line').accepts = [{ scans: ['625i50'], colours: 'any' }]
  }),
  'not-tuned': byAir((r) => void (settingOf(r, 'tuned-to').position = '4')),
  'channel-not-offered': byAir((r) => void (settingOf(r, 'channel').position = '5')),
  'system-does-not-carry': byAir(
    (r) => void (functionIn(r, 'modulator', 'modulate').gives[0]!.rf![0]!.system = 'A'),
  ),
  protection: direct((r) => {
    r.question.material.protection = 'agc-pulses'
    functionIn(r, 'set', 'line').inputAgc = true
  }),
  'line-rate': direct((r) => void (deflection(r).lineKhz = [[31, 32]])),
  'field-rate': direct((r) => void (deflection(r).fieldHz = [[49, 51]])),
  'light-gun': direct((r) => {
    r.question.demands.aim = 'light-gun'
    deviceIn(r, 'set').display!.storesFields = true
  }),
  'demand-missed': direct((r) => void (r.question.display.input = 'another')),
  'line-not-ended': direct((r) => {
    addInputSwitch(r, 'tv')
    portIn(r, 'set', 'video-in').load = { kind: 'switch', control: 'input', position75: 'line' }
  }),
  'line-ended-twice': fault(looped)((r) => {
    portIn(r, 'loop', 'video-in').load = { kind: '75' }
  }),
  'terminator-misplaced': direct((r) => {
    r.hookup.ends = [{ unit: 'set', port: 'aerial-in', model: 'phonos', copy: 2 }]
  }),
  'claims-picture': direct((r) => void (r.hookup.picture.quality = 's-video')),
  'claims-sound': direct((r) => void (r.hookup.sound.sound = 'mono')),
  'claims-effort': direct((r) => void (r.hookup.axes.pieces = 2)),
  'claims-doubt': direct((r) => void (unitIn(r, 'set').functions = [])),
  'aerial-not-kept': direct((r) => void (r.question.demands.keepAerial = true)),
  radiates: besideAerial((r) => void (deviceIn(r, 'switch').leaks = [])),
  'legs-and-links-differ': direct((r) => void (r.hookup.legs[0]!.links = [])),
}

/** Facts of a model, open to change like the rest of the rig. */
const loose = <T>(facts: T): Loose<T> => structuredClone(facts)

const settingOf = (rig: Rig, control: string) =>
  rig.hookup.settings.find((s) => s.control === control)!

const deflection = (rig: Rig) => deviceIn(rig, 'set').display!.deflection

/** Both sound outputs by a Y adapter into the left input. */
function joinSound(rig: Rig): void {
  for (const [i, link] of rig.hookup.links.slice(1).entries()) {
    link.pieces.push({ ...use('y'), inPlug: i })
    link.to.port = 'sound-in-l'
    link.circuits[0]!.to = 'audio-mono'
  }
}

const isClaim = (code: FindingCode): boolean => code.startsWith('claims-')

describe('hookups that are right', () => {
  it.each([
    ['straight', straight],
    ['modulated', modulated],
    ['beside an aerial', withAerial],
  ] as const)('%s: nothing is found', (_, rig) => {
    expect(codes(rig())).toEqual([])
  })
})

/** Whether the code of a fault is found in what it spoils, and no other fault. */
function isFound(code: FindingCode, rules = RULES): boolean {
  const { rig, spoil, also } = FAULTS[code]
  const built = rig()
  spoil(built)
  const found = codes(built, rules).filter((c) => c === code || !isClaim(c))
  return [...found].sort().join() === [code, ...also].sort().join()
}

describe('a hookup that is wrong in one way', () => {
  it.each(FINDINGS)('%s is found, and no other fault', (code) => {
    const { rig, spoil, also } = FAULTS[code]
    const built = rig()
    spoil(built)
    const found = codes(built).filter((c) => c === code || !isClaim(c))
    expect(found.sort()).toEqual([code, ...also].sort())
  })
})

describe('a check with one rule left out', () => {
  it.each(FINDINGS)('without %s: just the faults that need it go unseen', (code) => {
    const rules = new Set(FINDINGS.filter((c) => c !== code))
    const unseen = FINDINGS.filter((c) => !isFound(c, rules))
    const needing = FINDINGS.filter((c) => c === code || FAULTS[c].also.includes(code))
    expect(unseen).toEqual(needing)
  })
})
