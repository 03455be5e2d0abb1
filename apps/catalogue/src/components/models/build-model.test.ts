import { checkModel } from '@coaxwain/models'
import { deviceModel } from '@coaxwain/contract'
import { describe, expect, it } from 'vitest'
import { buildModel } from './build-model'
import { deriveJacks } from './derive-jacks'
import { modelFaults } from './model-faults'
import {
  emptyModel,
  freshKey,
  nextControl,
  nextDoes,
  nextSocket,
  type ModelForm,
  type SocketForm,
} from './model-form'

const socket = (
  key: string,
  use: SocketForm['use'],
  rest: Partial<SocketForm> = {},
): SocketForm => ({
  ...nextSocket([]),
  key,
  label: key.toUpperCase(),
  use,
  connector: 'phono-socket',
  ...rest,
})

const player = (): ModelForm => ({
  ...emptyModel(),
  maker: 'Maker',
  name: 'P-1',
  kind: 'disc-player',
  sockets: [
    socket('v', 'composite', { heading: 'OUT' }),
    socket('l', 'sound-left', { heading: 'OUT' }),
    socket('r', 'sound-right', { heading: 'OUT' }),
  ],
  does: [{ ...nextDoes([], 'plays'), label: 'Plays discs', outputs: ['v', 'sound-l'] }],
})

const modulator = (): ModelForm => ({
  ...emptyModel(),
  maker: 'Maker',
  name: 'M-1',
  kind: 'modulator',
  packVolts: '12',
  packMilliamps: '200',
  sockets: [
    socket('v', 'composite', { dir: 'in' }),
    socket('a', 'sound-mono', { dir: 'in' }),
    socket('tv', 'rf', { dir: 'out', connector: 'f-socket' }),
  ],
  controls: [{ ...nextControl([]), key: 'ch', label: 'CH', kind: 'channel' }],
  does: [
    {
      ...nextDoes([], 'modulates'),
      label: 'Modulates',
      input: 'v',
      sound: 'a',
      outputs: ['tv'],
      channel: 'ch',
    },
  ],
})

const television = (): ModelForm => ({
  ...emptyModel(),
  maker: 'Maker',
  name: 'T-1',
  kind: 'television',
  market: '625-i',
  sockets: [socket('ant', 'rf', { dir: 'in', connector: 'iec-socket' })],
  controls: [
    {
      ...nextControl([]),
      key: 'tune',
      label: 'TUNE',
      kind: 'tuned-to',
      plan: 'uk-uhf',
      channels: '21..68',
    },
  ],
  does: [{ ...nextDoes([], 'shows'), label: 'Shows the aerial', input: 'ant', channel: 'tune' }],
})

describe('deriving forms from sockets', () => {
  it('pairs left and right under one heading', () => {
    const jacks = deriveJacks(player().sockets)
    expect(jacks.map((j) => [j.key, j.form])).toEqual([
      ['v', 'composite'],
      ['sound-l', 'sound'],
    ])
    expect(jacks[1]?.contacts.map((c) => c.port)).toEqual(['l', 'r'])
  })

  it('keeps sockets of different headings apart', () => {
    const jacks = deriveJacks([
      socket('l', 'sound-left', { heading: 'A' }),
      socket('r', 'sound-right', { heading: 'B' }),
    ])
    expect(jacks.map((j) => j.contacts.length)).toEqual([1, 1])
  })

  it('needs all three sockets for component', () => {
    const three = [
      socket('y', 'component-y'),
      socket('b', 'component-pb'),
      socket('r', 'component-pr'),
    ]
    expect(deriveJacks(three).map((j) => j.form)).toEqual(['component'])
    expect(deriveJacks(three.slice(0, 2))).toEqual([])
  })

  it('takes several forms from a 21-pin socket', () => {
    const jacks = deriveJacks([socket('av', 'rgb-21', { connector: 'scart-socket' })])
    expect(jacks.map((j) => j.form)).toEqual(['composite', 'sound', 'rgbs'])
  })
})

describe.each([
  ['a disc player', player],
  ['a modulator', modulator],
  ['a television', television],
])('the description of %s', (_, make) => {
  it('holds together and is what the contract takes', () => {
    const model = buildModel(make())
    expect(checkModel(model)).toEqual([])
    expect(deviceModel.safeParse(JSON.parse(JSON.stringify(model))).error?.issues ?? []).toEqual([])
    expect(modelFaults(make(), model)).toEqual([])
  })
})

describe('faults of a form', () => {
  const faultsOf = (form: ModelForm) =>
    modelFaults(form, buildModel(form)).map((f) => `${f.path} ${f.code}`)

  it('name every gap at its field', () => {
    expect(faultsOf({ ...emptyModel(), sockets: [nextSocket([])] })).toEqual([
      'maker required',
      'name required',
      'kind required',
      'ports.0.label required',
      'ports.0.circuits required',
      'ports.0.connector required',
    ])
  })

  it('name a year that is no number', () => {
    expect(faultsOf({ ...player(), year: 'about 1990' })).toEqual(['year wrong-type'])
  })

  it('name a channel that is not in the plan', () => {
    const form = modulator()
    form.controls[0] = { ...form.controls[0]!, channels: '999' }
    expect(faultsOf(form)).toEqual(['controls.0.carriers unknown-channel'])
  })

  it('name a form whose socket has been taken away', () => {
    const form = player()
    form.sockets = form.sockets.slice(1)
    expect(faultsOf(form)).toEqual(['functions.0.gives.0.jack unknown-jack'])
  })
})

describe('keys', () => {
  it('are never given twice, even after something was taken away', () => {
    expect(freshKey('socket', [{ key: 'socket-1' }, { key: 'socket-3' }])).toBe('socket-4')
  })
})
