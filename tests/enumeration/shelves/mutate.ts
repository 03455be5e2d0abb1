import {
  checkModel,
  type Condition,
  type DeviceModel,
  type Give,
  type Model,
  type ModelFunction,
  type PieceModel,
  type PlugColour,
} from '@coaxwain/models'
import { choice, wire } from '@coaxwain/models/build'
import type { Circuit, Connector } from '@coaxwain/signal'
import type { Chance } from '../../support/chance'
import { loose, type Loose } from '../../support/loose'
import { prefixed, renamedDevice } from '../../support/rename'

/** One way of making a device another; does nothing where there is nothing of the kind. */
type Change = (device: Loose<DeviceModel>, chance: Chance) => void

const OTHER_CONNECTORS: Partial<Record<Connector, readonly Connector[]>> = {
  'phono-socket': ['bnc-socket', 'f-socket', 'phono-plug'],
  'f-socket': ['phono-socket', 'iec-socket', 'f-plug'],
  'bnc-socket': ['phono-socket'],
  'iec-socket': ['f-socket', 'iec-plug'],
  'iec-plug': ['iec-socket', 'f-socket'],
  screws: ['f-socket'],
}

/** A contact of a jack that is not there; what takes one channel or a whole mono sound goes with it. */
const dropContact: Change = (device, chance) => {
  const jack = chance.pickIfAny(device.jacks.filter((j) => j.contacts.length > 1))
  if (!jack) return
  const lost = chance.pick(jack.contacts)
  const isMono = ({ circuit }: typeof lost): boolean => ['audio-l', 'audio-mono'].includes(circuit)
  jack.contacts = jack.contacts.filter(
    (c) => c !== lost && !(isMono(lost) && isMono(c) && c.port === lost.port),
  )
}

const swapConnector: Change = (device, chance) => {
  const port = chance.pickIfAny(device.ports.filter((p) => OTHER_CONNECTORS[p.connector]))
  if (!port) return
  port.connector = chance.pick(OTHER_CONNECTORS[port.connector] ?? [])
  if (port.connector.startsWith('f-') && port.impedanceOhm !== undefined) port.impedanceOhm = 75
}

/** Every list of conditions in a device. */
const conditionsIn = (device: Loose<DeviceModel>): Loose<Condition>[] =>
  device.functions
    .flatMap((f) => [
      f.while,
      ...f.accepts.map((r) => r.while),
      ...f.gives.flatMap((g) => [
        g.while,
        ...(g.picture ?? []).map((r) => r.while),
        ...(g.rf ?? []).map((r) => r.while),
      ]),
    ])
    .filter((c) => c !== undefined && c.length > 0) as Loose<Condition>[]

const flipCondition: Change = (device, chance) => {
  const condition = chance.pickIfAny(conditionsIn(device))
  const stands = condition && chance.pick(condition)
  const control = device.controls.find((c) => c.key === stands?.control)
  if (!stands || (control?.kind !== 'positions' && control?.kind !== 'auto')) return
  stands.in = [chance.pick(control.positions).key]
}

const changeRow: Change = (device, chance) => {
  const row = chance.pickIfAny(device.functions.flatMap((f) => f.accepts))
  if (!row) return
  if (chance.isHit(0.5))
    row.scans = chance.pick([['525i60'], ['625i50'], ['262p60'], 'any'] as const)
  else row.colours = chance.pick([['ntsc-m'], ['pal'], ['secam'], 'any', ['rgb']] as const)
}

const changeGiven: Change = (device, chance) => {
  const row = chance.pickIfAny(
    device.functions.flatMap((f) => f.gives.flatMap((g) => g.picture ?? [])),
  )
  if (!row || row.scan === 'same') return
  if (chance.isHit(0.5)) row.scan = chance.pick(['525i60', '625i50', '262p60', '312p50'] as const)
  else row.colour = chance.pick(['ntsc-m', 'pal', 'pal-60', 'mono'] as const)
}

const addDc: Change = (device, chance) => {
  const port = chance.pickIfAny(
    device.ports.filter((p) => p.circuits.some((c) => c.circuit === 'rf')),
  )
  if (!port) return
  if (port.circuits.some((c) => c.dir === 'out')) port.suppliesDcVolts = 5
  else port.standsDc = chance.pick(['yes', 'no', 'unknown'] as const)
}

const lineSwitch: Change = (device, chance) => {
  const port = chance.pickIfAny(
    device.ports.filter(
      (p) => p.load?.kind === '75' && p.circuits.some((c) => c.circuit === 'cvbs'),
    ),
  )
  if (!port || device.controls.some((c) => c.key === 'line-end')) return
  const positions = { '75-ohm': '75 Ω', high: 'HIGH' }
  device.controls.push(
    loose(choice('line-end', '75 Ω', 'termination', { positions, access: 'back' })),
  )
  port.load = { kind: 'switch', control: 'line-end', position75: '75-ohm' }
}

const loseSpeakers: Change = (device) => {
  if (device.display) device.display.loudspeakers = 'none'
}

const stiffChassis: Change = (device, chance) => {
  device.chassis = chance.pick(['live', 'unknown'] as const)
  const port = chance.pickIfAny(device.ports)
  if (port) port.isolated = chance.pick(['no', 'unknown'] as const)
}

const CHANGES: readonly Change[] = [
  dropContact,
  swapConnector,
  swapConnector,
  flipCondition,
  changeRow,
  changeGiven,
  addDc,
  lineSwitch,
  loseSpeakers,
  stiffChassis,
]

const isSound = (model: Model): boolean => checkModel(model).length === 0

/** A device with one thing changed; as it was where the change left nothing that holds together. */
export function mutated(device: DeviceModel, chance: Chance): DeviceModel {
  const draft = loose(device)
  chance.pick(CHANGES)(draft, chance)
  const made = draft as DeviceModel
  return isSound(made) ? made : device
}

/** A lead with one of its wires cut. */
export function cut(piece: PieceModel, chance: Chance): PieceModel {
  if (piece.wires.length < 2) return piece
  const left = piece.wires.filter((_, i) => i !== 0 || !chance.isHit(0.5))
  return { ...piece, wires: left.length === piece.wires.length ? piece.wires.slice(0, -1) : left }
}

const TAILS: readonly (readonly [Circuit, PlugColour])[] = [
  ['cvbs', 'yellow'],
  ['audio-l', 'white'],
  ['audio-r', 'red'],
]

/** A lead with one multi-way plug at each end, with phono tails in place of the second; null where it has no sound. */
export function withTails(piece: PieceModel): PieceModel | null {
  const [a, b] = [piece.a, piece.b]
  const kept = TAILS.filter(([c]) => piece.wires.some((w) => w.a.circuit === c))
  if (a.length + b.length !== 2 || kept.length < TAILS.length) return null
  return {
    ...piece,
    kind: 'lead',
    b: kept.map(([, colour]) => ({ connector: 'phono-plug', colour })),
    wires: kept.map(([circuit], i) => wire([0, circuit], [i, 'any'])),
  }
}

/** A function has both a picture and a sound that come in or go out apart. */
export const isSplit = (fn: ModelFunction): boolean =>
  (fn.optional ?? []).length > 0 || (fn.gives.some((g) => g.picture) && soundsOf(fn).length > 0)

const soundsOf = ({ gives }: ModelFunction): readonly Give[] =>
  gives.filter((g) => g.sound && !g.picture)

/** The key of the switch that stands in the way. */
export const CONFLICT = 'conflict'

/** A switch that lets every function of a device have either the picture or the sound. */
export function withConflict(device: DeviceModel, chance: Chance): DeviceModel {
  const draft = loose(device)
  const positions = { one: '1', two: '2' }
  const access = chance.pick(['front', 'back'] as const)
  draft.controls.push(loose(choice(CONFLICT, 'MODE', 'mode', { positions, access })))
  for (const fn of draft.functions.filter((f) => isSplit(f as ModelFunction))) part(fn)
  const made = draft as DeviceModel
  return isSound(made) ? made : device
}

function part(fn: Loose<ModelFunction>): void {
  const stands = (position: string): Loose<Condition>[number] => ({
    control: CONFLICT,
    in: [position],
  })
  const pictures = fn.gives.filter((g) => g.picture)
  pictures.forEach((g) => (g.while = [...(g.while ?? []), stands('one')]))
  if (pictures.length === 0) fn.while = [...(fn.while ?? []), stands('one')]
  const sounds = fn.optional?.length ? fn.optional : fn.gives.filter((g) => g.sound && !g.picture)
  sounds.forEach((s) => (s.while = [...(s.while ?? []), stands('two')]))
}

/** Two devices in one case: everything of both, by other keys. */
export function inOneCase(a: DeviceModel, b: DeviceModel): DeviceModel {
  const [first, second] = [renamedDevice(a, prefixed('a-')), renamedDevice(b, prefixed('b-'))]
  return {
    ...first,
    kind: 'other',
    groups: [...first.groups, ...second.groups],
    ports: [...first.ports, ...second.ports],
    jacks: [...first.jacks, ...second.jacks],
    controls: [...first.controls, ...second.controls],
    functions: [...first.functions, ...second.functions],
    leaks: [...first.leaks, ...second.leaks],
    mains: first.mains ?? second.mains,
    pack: first.pack ?? second.pack,
    display: undefined,
  }
}
