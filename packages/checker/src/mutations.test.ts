import {
  at,
  automatic,
  choice,
  cores,
  OTHERWISE,
  piece,
  pluggedInto,
  wire,
} from '@coaxwain/models/build'
import type { Hookup } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import type { FindingCode } from './finding'
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

type LooseHookup = Loose<Hookup>

/** A hookup that is right on its shelf, and one change to the hookup alone that must not pass. */
interface Mutation {
  readonly name: string
  readonly rig: () => Rig
  readonly mutate: (hookup: LooseHookup) => void
  readonly code: FindingCode
}

const loose = <T>(facts: T): Loose<T> => structuredClone(facts)

const prepared = (rig: () => Rig, prepare: (rig: Rig) => void) => (): Rig => {
  const made = rig()
  prepare(made)
  return made
}

const stop = (unit: string, fn: string) => ({
  ...{ unit, function: fn, in: null, out: null, picture: null },
  sound: 'none' as const,
})

const setting = (unit: string, control: string, position: string) => ({
  ...{ unit, control, position, orElse: [], must: true },
  access: 'front' as const,
  why: 'opens-way' as const,
})

const settingOf = (hookup: LooseHookup, control: string) =>
  hookup.settings.find((s) => s.control === control)!

// ---------------------------------------------------------------- what else stands on the shelf

/** A port like another, under a name of its own. */
function addPort(rig: Rig, unit: string, [like, key]: readonly [string, string]) {
  const port = { ...loose(portIn(rig, unit, like)), key }
  deviceIn(rig, unit).ports.push(port)
  return port
}

/** A second line input of the set, which does what the first does. */
function addLine(rig: Rig) {
  const set = deviceIn(rig, 'set')
  const port = addPort(rig, 'set', ['video-in', 'video-2'])
  const jack = loose(set.jacks.find((j) => j.key === 'video-in')!)
  set.jacks.push({ ...jack, key: 'video-2', contacts: [{ circuit: 'cvbs', port: 'video-2' }] })
  const fn = { ...loose(functionIn(rig, 'set', 'line')), key: 'line-2', needs: ['video-2'] }
  set.functions.push(fn)
  const form = { jack: 'video-2', port: 'video-2', state: 'works' as 'works' | 'dead' }
  const state = { function: 'line-2', state: 'works' as 'works' | 'dead' }
  unitIn(rig, 'set').forms.push(form)
  unitIn(rig, 'set').functions.push(state)
  return { port, fn, form, state }
}

function toLine2(hookup: LooseHookup): void {
  hookup.links[0]!.to.port = 'video-2'
  for (const leg of hookup.legs) {
    const end = leg.stops.find((s) => s.unit === 'set')!
    end.function = 'line-2'
    if (leg.purpose === 'picture') end.in = 'video-2'
  }
}

const secondLine = (spoil: (line: ReturnType<typeof addLine>, rig: Rig) => void) =>
  prepared(straight, (rig) => spoil(addLine(rig), rig))

/** A second modulator of the same model. */
const secondModulator = (spoil: (rig: Rig) => void) =>
  prepared(modulated, (rig) => {
    const unit = tried('modulator-2', rig.models['modulator'] as never)
    rig.units.push(loose({ ...unit, model: 'modulator' }))
    spoil(rig)
  })

function byModulator2(hookup: LooseHookup): void {
  const rename = (place: { unit: string }): void => {
    if (place.unit === 'modulator') place.unit = 'modulator-2'
  }
  hookup.legs.flatMap((l) => l.stops).forEach(rename)
  hookup.links.flatMap((l) => [l.from, l.to]).forEach(rename)
  hookup.settings.forEach(rename)
}

/** A set whose line input needs its switch, which stands right. */
const switched = prepared(straight, (rig) => {
  const positions = ['line', 'tv']
  deviceIn(rig, 'set').controls.push(
    loose(choice('input', 'INPUT', 'input', { positions, access: 'front' })),
  )
  functionIn(rig, 'set', 'line').while = loose(at('input', 'line'))
  rig.hookup.settings.push(setting('set', 'input', 'line'))
})

/** A line that is ended by a switch, which stands right for the rig. */
const ended = (rig: () => Rig, unit: string, position: string) =>
  prepared(rig, (made) => {
    const positions = ['75', 'high']
    deviceIn(made, unit).controls.push(
      loose(choice('end', '75 Ω', 'termination', { positions, access: 'back' })),
    )
    portIn(made, unit, 'video-in').load = { kind: 'switch', control: 'end', position75: '75' }
    made.hookup.settings.push(setting(unit, 'end', position))
  })

const withPiece = (rig: () => Rig, uid: string, made: ReturnType<typeof piece>) =>
  prepared(rig, (r) => {
    r.models[uid] = loose(made)
    r.units.push(loose(tried(uid, made, 5)))
  })

const lead = (name: string, more: Partial<Parameters<typeof piece>[0]> = {}) =>
  piece({
    ...{ name, kind: 'lead', a: ['phono-plug'], b: ['phono-plug'], wires: cores(1) },
    ...more,
  })

const row = (
  name: string,
  code: FindingCode,
  mutate: Mutation['mutate'],
  rig: () => Rig = straight,
): Mutation => ({ name, code, mutate, rig })

// ---------------------------------------------------------------- the mutations

const UNITS: readonly Mutation[] = [
  row('passes a unit that nobody has', 'unit-unknown', (h) =>
    h.legs[1]!.stops.push(stop('nobody', 'nothing')),
  ),
  row('passes a unit twice', 'unit-twice', (h) => h.legs[1]!.stops.push(stop('player', 'play'))),
  row(
    'goes by a unit that is to be left alone',
    'unit-avoided',
    byModulator2,
    secondModulator((rig) => rig.question.avoid.push('modulator-2')),
  ),
  row(
    'goes by a unit that is sold',
    'unit-not-lent',
    byModulator2,
    secondModulator((rig) => void (unitIn(rig, 'modulator-2').holding = 'sold')),
  ),
  row(
    'goes round by seven boxes',
    'too-many-boxes',
    (h) => {
      for (let i = 1; i <= 7; i++) h.legs[1]!.stops.push(stop(`box-${i}`, 'play'))
    },
    prepared(straight, (rig) => {
      for (let i = 1; i <= 7; i++) {
        rig.models[`box-${i}`] = loose(rig.models['player']!)
        rig.units.push(loose(tried(`box-${i}`, rig.models['player'] as never)))
      }
      rig.units.filter((u) => u.uid.startsWith('box-')).forEach((u) => (u.model = u.uid))
    }),
  ),
  row('has a link that no leg claims', 'legs-and-links-differ', (h) => (h.legs[0]!.links = [])),
]

const PIECES: readonly Mutation[] = [
  row('takes a lead of a sort that nobody knows', 'piece-unknown', (h) => {
    h.links[0]!.pieces[0]!.model = 'nothing'
  }),
  row(
    'takes two leads where there is one',
    'piece-short',
    (h) => (h.links[1]!.pieces[0]!.copy = 2),
    prepared(straight, (rig) => void (unitIn(rig, 'phonos').quantity = 1)),
  ),
  row('puts two plugs into one socket', 'port-taken-twice', (h) => {
    h.links[2]!.from.port = 'sound-out-l'
    h.links[2]!.circuits[0]!.from = 'audio-l'
  }),
  row('puts one plug into two sockets', 'plug-taken-twice', (h) => {
    h.links[2]!.pieces = [use('phonos', 1)]
  }),
  row('puts an F plug into a phono socket', 'plugs-do-not-mate', (h) => {
    h.links[0]!.pieces = [use('coax')]
  }),
  row('does without a lead', 'needs-a-lead', (h) => (h.links[0]!.pieces = [])),
  row('strings up five pieces', 'too-many-pieces', (h) =>
    h.links[0]!.pieces.push(...[1, 2, 3, 4].map((copy) => use('collar', 0, copy))),
  ),
  row('strings up three leads', 'too-many-leads', (h) =>
    h.links[0]!.pieces.push(use('extension', 0, 1), use('extension', 0, 2)),
  ),
  row('leaves a lead by another core', 'wire-missing', (h) => {
    h.links[0]!.pieces[0]!.outPlug = 1
  }),
  row(
    'takes a lead for sound to carry a picture',
    'not-meant-for',
    (h) => (h.links[0]!.pieces = [use('thin')]),
    withPiece(straight, 'thin', lead('thin', { meantFor: ['audio-l', 'audio-r'] })),
  ),
  row(
    'meets 75 ohm with 300',
    'impedance',
    (h) => (h.links[3]!.pieces = [use('balun')]),
    withPiece(
      modulated,
      'balun',
      lead('balun', { a: ['f-plug'], b: ['f-plug'], impedanceOhm: [75, 300] }),
    ),
  ),
  row(
    'joins two outputs in a piece that does not mix',
    'wires-joined',
    (h) => {
      for (const [i, link] of h.links.slice(1).entries()) {
        link.pieces.push({ ...use('y'), inPlug: i })
        link.to.port = 'sound-in-l'
        link.circuits[0]!.to = 'audio-mono'
      }
    },
    prepared(straight, (rig) => void (pieceIn(rig, 'y').mixes = false)),
  ),
  row('ends a line that is ended', 'terminator-misplaced', (h) => {
    h.ends = [{ unit: 'set', port: 'aerial-in', model: 'phonos', copy: 2 }]
  }),
]

const SOCKETS: readonly Mutation[] = [
  row('names a socket that is not there', 'port-unknown', (h) => {
    h.links[2]!.to.port = 'nowhere'
  }),
  row(
    'uses a socket that is no longer offered',
    'port-retired',
    toLine2,
    secondLine(({ port }) => void (port.retired = true)),
  ),
  row(
    'uses a socket that is dead',
    'socket-dead',
    toLine2,
    secondLine(({ form }) => void (form.state = 'dead')),
  ),
  row('carries luma where there is none', 'circuit-not-on-port', (h) => {
    h.links[0]!.circuits = [{ from: 'y', to: 'y' }]
  }),
  row('runs from an input to an output', 'wrong-direction', (h) => {
    const [link] = h.links
    ;[link!.from, link!.to] = [link!.to, link!.from]
  }),
  row(
    'plugs a Japanese lead into SCART',
    'japanese-wiring',
    (h) => {
      h.links[0]!.to.port = 'scart'
      h.links[0]!.pieces = [use('japanese')]
    },
    prepared(
      withPiece(
        straight,
        'japanese',
        lead('japanese', { b: ['jp21-plug'], wires: [wire([0, 'any'], [0, 'cvbs'])] }),
      ),
      (rig) => void (addPort(rig, 'set', ['video-in', 'scart']).connector = 'scart-socket'),
    ),
  ),
  row(
    'uses a socket that is joined to a live chassis',
    'live-socket',
    (h) => (h.links[0]!.to.port = 'bare'),
    prepared(straight, (rig) => {
      addPort(rig, 'set', ['video-in', 'bare']).isolated = 'no'
      deviceIn(rig, 'set').chassis = 'live'
    }),
  ),
  row(
    'leads loudspeaker terminals into a line input',
    'loudspeaker-into-line',
    (h) => (h.links[1]!.from.port = 'speaker'),
    prepared(straight, (rig) => {
      addPort(rig, 'player', ['sound-out-l', 'speaker']).circuits[0]!.level = 'loudspeaker'
    }),
  ),
  row(
    'sends a voltage into an input that does not stand it',
    'dc-not-stood',
    (h) => (h.links[0]!.from.port = 'feeding'),
    prepared(straight, (rig) => {
      addPort(rig, 'player', ['video-out', 'feeding']).suppliesDcVolts = 5
      portIn(rig, 'set', 'video-in').standsDc = 'no'
    }),
  ),
  row(
    'uses an input that waits for a voltage',
    'dc-missing',
    (h) => (h.links[0]!.to.port = 'fed'),
    prepared(straight, (rig) => {
      addPort(rig, 'set', ['video-in', 'fed']).needsDcVolts = 5
    }),
  ),
]

const FUNCTIONS: readonly Mutation[] = [
  row(
    'uses a function that is dead',
    'function-dead',
    toLine2,
    secondLine(({ state }) => void (state.state = 'dead')),
  ),
  row('uses a function that is not there', 'function-unknown', (h) => {
    h.legs[0]!.stops[1]!.function = 'nothing'
  }),
  row('carries no circuit', 'input-not-fed', (h) => (h.links[0]!.circuits = [])),
  row('leaves the source in standby', 'output-not-given', (h) =>
    h.settings.push(setting('player', 'power', 'standby')),
  ),
  row(
    'shows it by an input that takes 625 lines alone',
    'not-taken',
    toLine2,
    secondLine(({ fn }) => void (fn.accepts = [{ scans: ['625i50'], colours: 'any' }])),
  ),
  row(
    'leads protected pictures through a level control',
    'protection',
    toLine2,
    secondLine(({ fn }, rig) => {
      fn.inputAgc = true
      rig.question.material.protection = 'agc-pulses'
    }),
  ),
  row(
    'ends at another input than was asked for',
    'demand-missed',
    toLine2,
    secondLine((_, rig) => void (rig.question.display.input = 'line')),
  ),
  row(
    'modulates 525 lines by a 405-line system',
    'system-does-not-carry',
    (h) => (h.legs[0]!.stops[1]!.function = 'modulate-a'),
    prepared(modulated, (rig) => {
      const fn = { ...loose(functionIn(rig, 'modulator', 'modulate')), key: 'modulate-a' }
      fn.gives[0]!.rf![0]!.system = 'A'
      deviceIn(rig, 'modulator').functions.push(fn)
      unitIn(rig, 'modulator').functions.push({ function: 'modulate-a', state: 'works' })
    }),
  ),
]

const CONTROLS: readonly Mutation[] = [
  row(
    'stands the switch of the input elsewhere',
    'function-not-acting',
    (h) => (settingOf(h, 'input').position = 'tv'),
    switched,
  ),
  row('leaves the switch open', 'position-left-open', (h) => (h.settings = []), switched),
  row(
    'names a position that is not there',
    'position-unknown',
    (h) => (settingOf(h, 'input').position = 'nowhere'),
    switched,
  ),
  row('turns a control that is not there', 'control-unknown', (h) =>
    h.settings.push(setting('set', 'nothing', 'on')),
  ),
  row(
    'states a switch that moves by a plug which is not in',
    'automatic-not-moved',
    (h) => h.settings.push(setting('set', 'front-first', 'front')),
    prepared(straight, (rig) => {
      const positions = [
        ['front', 'FRONT', pluggedInto('aerial-in')],
        ['back', 'BACK', OTHERWISE],
      ] as const
      deviceIn(rig, 'set').controls.push(loose(automatic('front-first', 'AUTO', [...positions])))
    }),
  ),
  row(
    'sets by a remote that is lost',
    'out-of-reach',
    (h) => h.settings.push(setting('set', 'mode', 'tv')),
    prepared(straight, (rig) => {
      const positions = ['line', 'tv']
      deviceIn(rig, 'set').controls.push(
        loose(choice('mode', 'MODE', 'mode', { positions, access: 'remote' })),
      )
      deviceIn(rig, 'set').remote = 'needed'
      unitIn(rig, 'set').remotePresent = false
    }),
  ),
  row(
    'tunes to another channel',
    'not-tuned',
    (h) => (settingOf(h, 'tuned-to').position = '4'),
    modulated,
  ),
  row(
    'sends on a channel that is not offered',
    'channel-not-offered',
    (h) => (settingOf(h, 'channel').position = '5'),
    modulated,
  ),
  row(
    'leaves a line open',
    'line-not-ended',
    (h) => (settingOf(h, 'end').position = 'high'),
    ended(straight, 'set', '75'),
  ),
  row(
    'ends a line at two places',
    'line-ended-twice',
    (h) => (settingOf(h, 'end').position = '75'),
    ended(looped, 'loop', 'high'),
  ),
]

const CLAIMS: readonly Mutation[] = [
  row('claims S-Video', 'claims-picture', (h) => (h.picture.quality = 's-video')),
  row('claims mono where it is stereo', 'claims-sound', (h) => (h.sound.sound = 'mono')),
  row('claims another lead', 'claims-effort', (h) => (h.axes.pieces = 2)),
  row('claims a doubt that there is not', 'claims-doubt', (h) => (h.axes.doubt = 1)),
  row('forgets the aerial', 'aerial-not-kept', (h) => void h.legs.pop(), withAerial),
]

const MUTATIONS = [...UNITS, ...PIECES, ...SOCKETS, ...FUNCTIONS, ...CONTROLS, ...CLAIMS]

describe('a hookup that is right but for one change', () => {
  it.each(MUTATIONS)('$name: $code', ({ rig, mutate, code }) => {
    const built = rig()
    expect(codes(built)).toEqual([])
    mutate(built.hookup)
    expect(codes(built)).toContain(code)
  })

  it('is tried in 30 ways or more, each with a code of its own', () => {
    expect(new Set(MUTATIONS.map((m) => m.code)).size).toBe(MUTATIONS.length)
    expect(MUTATIONS.length).toBeGreaterThanOrEqual(30)
  })
})
