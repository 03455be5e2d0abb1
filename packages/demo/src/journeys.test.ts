import type { DeviceModel, Model, ModelFunction, Port } from '@coaxwain/models'
import { doubtOf, formState, functionState, mayLend, type Unit } from '@coaxwain/shelf'
import {
  channelsIn,
  followsLine,
  mates,
  SCANS,
  type Connector,
  type PlanPart,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { DEMO, demoUid, modelUid, type ModelSlug } from './index'

/** The facts that the five questions of the first tour rest on. What the matcher makes of them is its own affair. */

const shelf = (key: string): readonly Unit[] => {
  const found = DEMO.collections.find((c) => c.key === key)
  if (!found) throw new Error(`no collection ${key}`)
  return found.units
}

const modelFor = (unit: Unit): Model => DEMO.models[unit.model] as Model

function device(collection: string, slug: ModelSlug): { unit: Unit; model: DeviceModel } {
  const unit = shelf(collection).find((u) => u.model === modelUid(slug))
  if (!unit) throw new Error(`no ${slug} in ${collection}`)
  const model = modelFor(unit)
  if (model.type !== 'device') throw new Error(`${slug} is not a device`)
  return { unit, model }
}

const port = (model: DeviceModel, key: string): Port =>
  model.ports.find((p) => p.key === key) as Port

const fn = (model: DeviceModel, key: string): ModelFunction =>
  model.functions.find((f) => f.key === key) as ModelFunction

/** The connectors of a chain, each meeting the next: output, then both ends of each piece, then input. */
function meetsAll(from: Connector, pieces: readonly ModelSlug[], to: Connector): boolean {
  let open = from
  for (const slug of pieces) {
    const piece = DEMO.models[modelUid(slug)]
    if (piece?.type !== 'piece') throw new Error(`${slug} is not a piece`)
    const [a, b] = [piece.a[0]?.connector, piece.b[0]?.connector]
    if (a && b && mates(open, a)) open = b
    else if (a && b && mates(open, b)) open = a
    else return false
  }
  return mates(open, to)
}

const inDrawer = (collection: string, slugs: readonly ModelSlug[]): boolean =>
  slugs.every((s) => shelf(collection).some((u) => u.model === modelUid(s) && u.quantity > 0))

const visions = (parts: readonly PlanPart[]): (number | null)[] =>
  parts.flatMap((p) => channelsIn(p)).map((c) => c.visionMhz)

/** Vision carriers that a box offers by its channel control. */
function offers(model: DeviceModel): (number | null)[] {
  const control = model.controls.find((c) => c.kind === 'channel')
  if (!control) throw new Error(`${model.name} has no channel control`)
  return visions([control.carriers.part])
}

/** Vision carriers that a set reaches by a tuner. */
function reaches(model: DeviceModel, tuner: string): (number | null)[] {
  const control = model.controls.find((c) => c.key === tuner)
  if (control?.kind !== 'tuned-to') throw new Error(`${model.name} has no tuner ${tuner}`)
  return visions(control.reaches.map((r) => r.part))
}

describe('a disc player to a set with screws only', () => {
  const player = device('alder-lane', 'tarnbeck-dp-62')
  const box = device('alder-lane', 'pellmere-vm-2')
  const set = device('alder-lane', 'ostrel-14-c')

  it('finds nothing but screws at the set', () => {
    expect(set.model.ports.map((p) => p.connector)).toEqual(['screws', 'screws'])
  })

  it('goes through the modulator and a transformer, all of them at hand', () => {
    const links: [Port, ModelSlug[], Port][] = [
      [port(player.model, 'video-out'), ['phono-3'], port(box.model, 'video-in')],
      [port(box.model, 'to-tv'), ['f-lead', 'balun-to-screws'], port(set.model, 'vhf')],
    ]
    for (const [from, pieces, to] of links) {
      expect(inDrawer('alder-lane', pieces)).toBe(true)
      expect(meetsAll(from.connector, pieces, to.connector)).toBe(true)
    }
  })

  it('can be tuned on either place of the channel switch', () => {
    expect(offers(box.model)).toEqual([61.25, 67.25])
    expect(reaches(set.model, 'vhf-knob')).toEqual(expect.arrayContaining(offers(box.model)))
  })

  it('has a termination switch to name at the modulator', () => {
    expect(port(box.model, 'video-in').load).toEqual({
      kind: 'switch',
      control: 'termination',
      position75: '75-ohm',
    })
  })

  it('was tested all the way', () => {
    expect(formState(player.unit, 'video-out', 'video-out')).toBe('works')
    expect(functionState(box.unit, 'modulator')).toBe('works')
    expect(formState(box.unit, 'to-tv', 'to-tv')).toBe('works')
    expect(functionState(set.unit, 'vhf-picture')).toBe('works')
    expect(set.unit.modifications).toContainEqual({
      kind: 'aerial-isolator',
      state: 'tested-good',
      on: '2026-03-03',
    })
  })
})

describe('a recorder that stands in for a modulator', () => {
  const recorder = device('marram-row', 'fennock-rv-22')
  const player = device('marram-row', 'fennock-dv-200')
  const set = device('marram-row', 'fennock-u-17')

  it('is the way because no modulator works', () => {
    const boxes = shelf('marram-row').filter((u) => {
      const model = modelFor(u)
      return model.type === 'device' && model.kind === 'modulator'
    })
    expect(boxes.length).toBeGreaterThan(0)
    for (const box of boxes) {
      const state = functionState(box, 'modulator')
      expect(mayLend(box) && doubtOf(box, state) !== null).toBe(false)
    }
  })

  it('takes the player on its front sockets and meets the set by the aerial socket', () => {
    expect(inDrawer('marram-row', ['phono-3', 'aerial-fly'])).toBe(true)
    const video = [port(player.model, 'video-out'), port(recorder.model, 'line-video')] as const
    const aerial = [port(recorder.model, 'rf-out'), port(set.model, 'aerial')] as const
    expect(meetsAll(video[0].connector, ['phono-3'], video[1].connector)).toBe(true)
    expect(meetsAll(aerial[0].connector, ['aerial-fly'], aerial[1].connector)).toBe(true)
    expect(set.model.jacks.map((j) => j.form)).toEqual(['rf'])
  })

  it('puts a system I carrier where the set can be tuned', () => {
    const carriers = fn(recorder.model, 'line').gives.flatMap((g) => g.rf ?? [])
    expect(carriers.map((c) => c.system)).toEqual(['I'])
    expect(reaches(set.model, 'channel')).toEqual(expect.arrayContaining(offers(recorder.model)))
    expect(fn(set.model, 'aerial-picture').accepts[0]?.systems).toEqual(['I'])
  })

  it('has a level control that protected discs upset', () => {
    expect(fn(recorder.model, 'line').inputAgc).toBe(true)
  })
})

describe('a converter box to a pocket set', () => {
  const box = device('alder-lane', 'selvane-cb-3')
  const set = device('alder-lane', 'belloway-pv-9')

  it('goes by an F lead and the plug-on aerial adapter', () => {
    const pieces: ModelSlug[] = ['f-lead', 'f-to-jack']
    expect(inDrawer('alder-lane', pieces)).toBe(true)
    const [from, to] = [port(box.model, 'to-tv'), port(set.model, 'ext-aerial')]
    expect(meetsAll(from.connector, pieces, to.connector)).toBe(true)
    expect(reaches(set.model, 'channel')).toEqual(expect.arrayContaining(offers(box.model)))
  })

  it('does not need the whip, which is broken', () => {
    expect(formState(set.unit, 'whip', 'whip')).toBe('dead')
    expect(functionState(set.unit, 'outside-picture')).toBe('works')
  })
})

describe('a 31 kHz computer among 15 kHz sets', () => {
  const computer = device('alder-lane', 'mistrand-md-4')
  const given = computer.model.functions.flatMap((f) =>
    f.gives.flatMap((g) => g.picture ?? []).flatMap((p) => (p.scan === 'same' ? [] : [p.scan])),
  )

  it('gives nothing but 31 kHz', () => {
    expect(given.map((scan) => SCANS[scan].lineKhz)).toEqual([31.47, 31.47])
  })

  it('meets no display that follows it and works, and no box that takes it', () => {
    const takers = shelf('alder-lane').flatMap((unit) => {
      const model = modelFor(unit)
      if (model.type !== 'device') return []
      return model.functions
        .filter((f) => functionState(unit, f.key) !== 'dead' && takesAnalogueRgb(model, f))
        .filter((f) => f.accepts.some(({ scans }) => given.some((s) => scans.includes(s))))
        .map((f) => `${model.name} ${f.key}`)
    })
    expect(takers).toEqual([])
  })

  it('fits a monitor whose line rate is too low, so that the plug is no reason', () => {
    const monitor = device('alder-lane', 'jorvane-m-21').model
    const socket = port(monitor, 'hd15')
    const out = port(computer.model, 'monitor-out')
    expect(meetsAll(out.connector, ['hd15-lead'], socket.connector)).toBe(true)
    const { deflection } = monitor.display ?? {}
    expect(deflection && given.some((scan) => followsLine(deflection, scan))).toBe(false)
    expect(deflection?.fixed).toBe(false)
  })

  it('is helped in the other collection, by a box that makes lines anew', () => {
    const { unit, model } = device('marram-row', 'jorvane-pc-2')
    expect(functionState(unit, 'halve')).toBe('works')
    expect(fn(model, 'halve').accepts[0]?.scans).toEqual(given.slice().reverse())
  })
})

const takesAnalogueRgb = (model: DeviceModel, f: ModelFunction): boolean =>
  f.needs.some((key) => model.jacks.find((j) => j.key === key)?.form === 'rgbhv')

describe('sockets added to a live chassis', () => {
  const set = shelf('alder-lane').find((u) => u.uid === demoUid('u-a-103')) as Unit
  const model = modelFor(set) as DeviceModel
  const added = set.modifications.find((m) => m.kind === 'added')

  it('are not isolated, on a chassis that is live', () => {
    expect(model.chassis).toBe('live')
    expect(added?.ports.map((p) => [p.origin, p.isolated])).toEqual([
      ['added', 'no'],
      ['added', 'no'],
    ])
  })

  it('would take the obvious lead', () => {
    const player = device('alder-lane', 'tarnbeck-dp-62').model
    const socket = added?.ports[0]
    expect(
      socket && meetsAll(port(player, 'video-out').connector, ['phono-3'], socket.connector),
    ).toBe(true)
    expect(added?.functions[0]?.accepts[0]?.scans).toContain('525i60')
  })

  it('have a safe way beside them: the maker’s aerial socket, with its isolator tested', () => {
    const box = device('alder-lane', 'pellmere-vm-2').model
    expect(port(model, 'vhf').isolated).toBe('yes')
    expect(set.modifications.map((m) => m.kind)).toContain('aerial-isolator')
    expect(meetsAll(port(box, 'to-tv').connector, ['f-lead'], port(model, 'vhf').connector)).toBe(
      true,
    )
    expect(reaches(model, 'vhf-knob')).toEqual(expect.arrayContaining(offers(box)))
  })
})
