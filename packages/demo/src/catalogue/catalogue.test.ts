import {
  checkModel,
  DEVICE_KINDS,
  FUNCTION_KINDS,
  PIECE_KINDS,
  type DeviceModel,
  type ModelFunction,
  type PieceModel,
} from '@coaxwain/models'
import { channelsIn, familyOf, mates, type Connector } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { MODELS } from './index'

const models = Object.values(MODELS)
const devices = models.filter((m): m is DeviceModel => m.type === 'device')
const pieces = models.filter((m): m is PieceModel => m.type === 'piece')
const named = devices.map((d) => [`${d.maker} ${d.name}, ${d.market}`, d] as const)

/** Made up for this demonstration; a new one is added here after a look whether it exists. */
const INVENTED = [
  'Belloway',
  'Brindlow',
  'Corbray',
  'Fennock',
  'Hollin',
  'Jorvane',
  'Lindrake',
  'Mistrand',
  'Oakhithe',
  'Ostrel',
  'Pellmere',
  'Quillmark',
  'Selvane',
  'Tarnbeck',
  'Varnhope',
]

describe('the catalogue', () => {
  it('holds at least thirty device models and twenty-five leads and adapters', () => {
    expect(devices.length).toBeGreaterThanOrEqual(30)
    expect(pieces.length).toBeGreaterThanOrEqual(25)
  })

  it('has every kind of device, of piece and of function', () => {
    expect([...new Set(devices.map((d) => d.kind))].sort()).toEqual([...DEVICE_KINDS].sort())
    expect([...new Set(pieces.map((p) => p.kind))].sort()).toEqual([...PIECE_KINDS].sort())
    const functions = devices.flatMap((d) => d.functions.map((f) => f.kind))
    expect([...new Set(functions)].sort()).toEqual([...FUNCTION_KINDS].sort())
  })

  it('has sources and sets for three markets', () => {
    for (const market of ['525-m', '625-bg', '625-i'] as const) {
      const there = devices.filter((d) => d.market === market)
      expect(there.filter((d) => d.kind === 'television').length, market).toBeGreaterThan(0)
      expect(there.filter((d) => d.kind === 'recorder').length, market).toBeGreaterThan(0)
      expect(there.filter((d) => d.kind === 'console').length, market).toBeGreaterThan(0)
    }
  })

  it('has controls of all kinds', () => {
    const kinds = new Set(devices.flatMap((d) => d.controls.map((c) => c.kind)))
    expect([...kinds].sort()).toEqual(['auto', 'channel', 'positions', 'trim', 'tuned-to'])
  })

  it('names only makers that are invented', () => {
    expect([...new Set(devices.map((d) => d.maker))].sort()).toEqual(INVENTED)
  })

  it('tells variants of one type name apart by their market', () => {
    const names = named.map(([name]) => name)
    expect(new Set(names).size).toBe(names.length)
    expect(devices.filter((d) => d.name === 'GS-16').map((d) => d.market)).toEqual([
      '525-m',
      '625-i',
    ])
  })
})

describe.each(Object.entries(MODELS))('%s', (_uid, model) => {
  it('holds together', () => {
    expect(checkModel(model)).toEqual([])
  })
})

describe.each(named)('%s', (_name, model) => {
  it('uses every port that is not for power or tape in some jack, and every jack in some function', () => {
    const held = new Set(model.jacks.flatMap((j) => j.contacts.map((c) => c.port)))
    const loose = model.ports.filter((p) => !held.has(p.key)).map((p) => p.key)
    expect(loose.filter((key) => !['power-in', 'tape'].includes(key))).toEqual([])
    const used = new Set(
      model.functions.flatMap((f) => [
        ...f.needs,
        ...(f.optional ?? []).map((o) => o.jack),
        ...f.gives.map((g) => g.jack),
      ]),
    )
    expect(model.jacks.map((j) => j.key).filter((key) => !used.has(key))).toEqual([])
  })

  it('gives each output jack a picture or a sound that its form can carry', () => {
    for (const { fn, give, jack } of outputsOf(model)) {
      const sound = ['sound', 'digital-sound'].includes(jack?.form ?? '')
      expect(jack?.dir).toBe('out')
      expect(give.rf !== undefined, give.jack).toBe(jack?.form === 'rf' && makesCarrier(fn))
      if (fn.kind !== 'receives') {
        expect(sound ? give.sound : give.picture?.length, give.jack).toBeTruthy()
      }
    }
  })

  it('tunes every aerial picture by a control that reaches a carrier', () => {
    const tuned = model.functions.filter((f) => f.kind === 'tunes' || f.tunedBy !== undefined)
    for (const fn of tuned) {
      const control = model.controls.find((c) => c.key === fn.tunedBy)
      if (control?.kind !== 'tuned-to') throw new Error(`${fn.key} has no tuner`)
      expect(control.reaches.flatMap((r) => channelsIn(r.part)).length).toBeGreaterThan(1)
    }
    const rfSets = model.functions.filter(
      (f) => f.kind === 'shows' && model.jacks.find((j) => j.key === f.needs[0])?.form === 'rf',
    )
    expect(rfSets.filter((f) => f.tunedBy === undefined)).toEqual([])
  })

  it('puts every port in its own cell, counted from the top left of its face', () => {
    const cells = model.ports.map((p) => `${p.at.face} ${p.at.row} ${p.at.column}`)
    expect(new Set(cells).size).toBe(cells.length)
    for (const face of new Set(model.ports.map((p) => p.at.face))) {
      expect(cells).toContain(`${face} 0 0`)
    }
  })

  it('leaks only between ports that it has', () => {
    const ports = new Set(model.ports.map((p) => p.key))
    expect(model.leaks.flatMap((l) => [l.from, l.to]).filter((p) => !ports.has(p))).toEqual([])
  })

  it('can be plugged to something in the drawer, or has its own plug', () => {
    const nothing = model.ports.filter(
      (p) =>
        p.mount === 'chassis' &&
        !['whip', 'dc'].includes(familyOf(p.connector)) &&
        !plugs.some((c) => mates(c, p.connector)),
    )
    expect(nothing.map((p) => p.key)).toEqual([])
  })
})

const plugs: readonly Connector[] = pieces
  .filter((p) => p.kind !== 'terminator')
  .flatMap((p) => [...p.a, ...p.b].map((plug) => plug.connector))

const outputsOf = (model: DeviceModel) =>
  model.functions.flatMap((fn) =>
    fn.gives.map((give) => ({ fn, give, jack: model.jacks.find((j) => j.key === give.jack) })),
  )

const makesCarrier = (fn: ModelFunction): boolean =>
  ['plays', 'modulates', 'tunes', 'remodulates'].includes(fn.kind)

describe.each(pieces.map((p) => [p.name, p] as const))('%s', (_name, piece) => {
  it('uses every plug, and each wire runs between contacts that exist', () => {
    const ends = (side: 'a' | 'b') => [...new Set(piece.wires.map((w) => w[side].plug))].sort()
    if (piece.kind === 'terminator') {
      expect(piece.b).toEqual([])
      return
    }
    expect(ends('a')).toEqual(piece.a.map((_, i) => i))
    expect(ends('b')).toEqual(piece.b.map((_, i) => i))
  })
})
