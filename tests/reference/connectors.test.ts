import { cores, DEFLECTION_60, piece, through } from '@coaxwain/models/build'
import {
  CONNECTORS,
  familyOf,
  fits,
  FORM_CIRCUITS,
  isSingle,
  mates,
  SOCKET_IDS,
  SOCKETS,
  type AnalogueCarrier,
  type Circuit,
  type Connector,
  type Form,
  type PlanPart,
  type Sound,
  type SocketFact,
  type SocketId,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { aerialSet, lead, monitor, player, sender, type Sockets } from './bench/devices'
import { ask, backwards, type World } from './bench/world'
import { numbersIn, readTable, type CsvRow } from './csv'

/** Each row with its source in the last columns but one. */
const rows = readTable('connectors')

const isKnown = (id: string | undefined): id is SocketId => SOCKET_IDS.some((known) => known === id)

const known = rows.flatMap((row): [SocketId, CsvRow, SocketFact][] => {
  const id = row['id']
  return isKnown(id) ? [[id, row, SOCKETS[id]]] : []
})

const plain = (source: string): string => source.replaceAll(', no source', '')

it('every row of the published table is a socket that is known', () => {
  expect(known.map(([id]) => id)).toEqual(rows.map((r) => r['id']))
  expect([...SOCKET_IDS].sort()).toEqual(known.map(([id]) => id).sort())
})

describe.each(known)('%s', (_id, row, fact) => {
  it('has the source, the standard and the impedance of the table', () => {
    expect(plain(fact.source)).toBe(row['source'])
    expect(fact.confidence).toBe(row['confidence'])
    expect(fact.standard ?? 'none').toBe((row['standard'] ?? '').replace(/ \(.*$/u, ''))
    const [first = ''] = (row['nominal_impedance_ohm'] ?? '').split('(')
    expect([...fact.impedanceOhm].sort()).toEqual(numbersIn(first).sort())
  })

  it('has as many contacts as the table says', () => {
    expect([...fact.contacts]).toEqual(numbersIn((row['contacts'] ?? '').replaceAll('-', ' ')))
  })
})

// ---------------------------------------------------------------- mating

/** How the table writes what a socket or plug goes together with. */
const FAMILIES: readonly (readonly [RegExp, readonly string[]])[] = [
  [/any RCA/u, ['phono']],
  [/BNC/u, ['bnc']],
  [/^F$/u, ['f']],
  [/9\.52 mm/u, ['iec']],
  [/spade lugs/u, ['spades', 'bare']],
  [/stripped coax/u, ['stripped']],
  [/twin-screw/u, ['screws']],
  [/4-pin mini-DIN/u, ['svideo4']],
  [/4-pin S-Video plug fits/u, ['minidin7', 'svideo4']],
  [/only its own lead/u, ['multi']],
  [/DIN 5/u, ['din5']],
  [/DIN 6/u, ['din6']],
  [/same angle only/u, ['din8']],
  [/physically identical to SCART/u, ['jp21']],
  [/^SCART$/u, ['scart']],
  [/D-terminal/u, ['dterm']],
  [/DE-15/u, ['hd15']],
  [/DE-9/u, ['de9']],
  [/3\.5 mm/u, ['jack35']],
  [/F05/u, ['optical']],
  [/HDMI/u, ['hdmi']],
]

function familiesSaid(text: string): readonly string[] {
  const found = FAMILIES.find(([pattern]) => pattern.test(text))
  if (!found) throw new Error(`the table says ${text}, which is not understood`)
  return found[1]
}

const mating = known.filter(([, , fact]) => fact.leads.length > 0)

describe.each(mating)('%s mates', (id, row, fact) => {
  const own = id === 'twin-spade' ? 'spades' : (fact.takes ?? fact.gives)!
  const partners = CONNECTORS.filter((c) => mates(own, c))

  it('with what the table says, and with nothing else', () => {
    expect([...new Set(partners.map(familyOf))].sort()).toEqual(
      [...familiesSaid(row['mates_with'] ?? '')].sort(),
    )
  })

  it('the same way forwards and backwards', () => {
    for (const c of CONNECTORS) expect(mates(own, c)).toBe(mates(c, own))
    expect(partners.length).toBeGreaterThan(0)
  })

  it('never with its own kind', () => {
    expect(mates(own, own)).toBe(false)
    expect(fact.leads.filter((plug) => mates(plug, plug))).toEqual([])
  })

  it('by every lead that is made for it', () => {
    const sides = [fact.takes, fact.gives].filter((c) => c !== null)
    for (const plug of fact.leads) expect(sides.some((side) => mates(plug, side))).toBe(true)
  })
})

describe('mating of a foreign plug', () => {
  // EIAJ TTC-0003, from memory: the body of SCART, other pins.
  it('is none where it goes in and is wired otherwise', () => {
    for (const [plug, socket] of [
      ['jp21-plug', 'scart-socket'],
      ['scart-plug', 'jp21-socket'],
    ] as const) {
      expect([fits(plug, socket), fits(socket, plug)]).toEqual([true, true])
      expect([mates(plug, socket), mates(socket, plug)]).toEqual([false, false])
    }
  })

  it('goes one way: the 7-pin plug does not go into a 4-pin socket', () => {
    expect(fits('svideo4-plug', 'minidin7-socket')).toBe(true)
    expect(fits('minidin7-plug', 'svideo4-socket')).toBe(false)
  })

  it('is impossible between any other two families', () => {
    const foreign = CONNECTORS.flatMap((a) =>
      CONNECTORS.filter((b) => fits(a, b) && familyOf(a) !== familyOf(b)).map((b) =>
        [familyOf(a), familyOf(b)].sort().join(' '),
      ),
    )
    expect([...new Set(foreign)].sort()).toEqual([
      'bare screws',
      'clamp stripped',
      'jp21 scart',
      'minidin7 svideo4',
      'screws spades',
    ])
  })
})

// ---------------------------------------------------------------- direction, by the engine

/** Forms that a socket can carry whole, tried in this order. */
const FORMS: readonly Form[] = [
  'composite',
  's-video',
  'component',
  'rgbs',
  'rgsb',
  'rgbhv',
  'rgbi',
  'hdmi',
  'rf',
  'sound',
  'digital-sound',
]

const SYNC: readonly Circuit[] = ['csync', 'cvbs']

const carriesForm = (fact: SocketFact, form: Form): boolean =>
  FORM_CIRCUITS[form].every(
    (c) =>
      fact.carries.includes(c) || (c === 'csync' && SYNC.some((s) => fact.carries.includes(s))),
  ) && !(form === 'rgsb' && SYNC.some((s) => fact.carries.includes(s)))

/** Mono where there is one sound wire only. */
const soundOf = (fact: SocketFact): readonly Circuit[] | null => {
  if (fact.carries.includes('audio-l') && fact.carries.includes('audio-r')) {
    return ['audio-l', 'audio-r']
  }
  const single = fact.carries.find((c) => c.startsWith('audio-'))
  return single ? [single === 'audio-l' ? 'audio-mono' : single] : null
}

/** A colour that the form carries as it is. */
const colourOf = (form: Form) =>
  form === 'component'
    ? 'ypbpr'
    : form.startsWith('rgb') || form === 'rgsb'
      ? form === 'rgbi'
        ? 'rgbi'
        : 'rgb'
      : form === 'hdmi'
        ? 'digital'
        : 'ntsc-m'

const SCREEN = {
  deflection: DEFLECTION_60,
  colours: ['ntsc-m', 'ypbpr', 'rgb', 'rgbi', 'digital'],
} as const

const BESIDE: Sockets = { connector: 'bnc-socket', form: 'composite' }
const BESIDE_LEAD = lead('bnc-plug', 'bnc-plug')

function leadFor(fact: SocketFact, circuits: readonly Circuit[]) {
  const [first] = fact.leads
  const last = fact.leads.at(-1)
  if (!first || !last) throw new Error('no lead')
  const single = isSingle(first)
  const [a, b] = fact.takes === fact.gives ? [first, first] : [first, last]
  const plugs = (c: Connector) => (single ? circuits.map(() => c) : [c])
  return piece({
    name: 'Lead',
    kind: 'lead',
    a: plugs(a),
    b: plugs(b),
    wires: single ? cores(circuits.length) : through(circuits),
  })
}

interface Tried {
  readonly form: Form
  readonly circuits: readonly Circuit[]
}

function triedOn(fact: SocketFact): Tried[] {
  const pictures = FORMS.filter((f) => f !== 'sound' && carriesForm(fact, f)).map((form) => ({
    form,
    circuits: FORM_CIRCUITS[form],
  }))
  const sound = soundOf(fact)
  return sound ? [...pictures, { form: 'sound' as const, circuits: sound }] : pictures
}

/** 300 ohm where the socket has no other. */
const ohmOf = (fact: SocketFact): number => fact.impedanceOhm[0] ?? 75

/** Digital sound is no part of the search. */
const directions = known.flatMap(([id, , fact]) =>
  fact.takes && fact.gives && fact.wiredAlike
    ? triedOn(fact)
        .filter(({ form }) => form !== 'digital-sound')
        .map((tried) => [id, tried.form, fact, tried] as const)
    : [],
)

/** One channel of two is half of the sound. */
const soundBy = (circuits: readonly Circuit[]): Sound =>
  circuits.length === 2 ? 'stereo' : circuits.includes('audio-r') ? 'half' : 'mono'

const CARRIER: AnalogueCarrier = {
  kind: 'analogue',
  system: 'M',
  scan: '525i60',
  colour: 'ntsc-m',
  visionMhz: 61.25,
  sound: 'mono',
}
const CHANNEL_3: PlanPart = { plan: 'us-broadcast', names: '3' }

/** A source and a set that have this socket, one giving and one taking, and the lead for it. */
function across(fact: SocketFact, { form, circuits }: Tried): World {
  const at = (side: 'gives' | 'takes'): Sockets => ({
    connector: fact[side] as Connector,
    form,
    circuits,
    ohm: ohmOf(fact),
  })
  const pieces = [leadFor(fact, circuits), BESIDE_LEAD]
  if (form === 'rf') {
    const [from, into] = (['gives', 'takes'] as const).map((side) => ({
      connector: fact[side] as Connector,
      ohm: ohmOf(fact),
    }))
    const set = {
      ...SCREEN,
      systems: ['M'] as const,
      digital: [],
      reaches: [CHANNEL_3],
      pullInMhz: 0.5,
    }
    return { source: sender(CARRIER, CHANNEL_3, from), display: aerialSet(set, into), pieces }
  }
  const picture = { scan: '525i60', colour: colourOf(form) } as const
  return form === 'sound'
    ? {
        source: player(picture, BESIDE, at('gives')),
        display: monitor(SCREEN, BESIDE, { sound: at('takes') }),
        pieces,
      }
    : { source: player(picture, at('gives')), display: monitor(SCREEN, at('takes')), pieces }
}

describe('by the engine', () => {
  it.each(directions)('%s carries %s from an output to an input', (...[, form, fact, tried]) => {
    const { answer, best, findings } = ask(across(fact, tried))
    expect([answer.verdict, findings]).toEqual(['yes', []])
    expect(best?.picture.colour).toBe(true)
    if (form === 'sound') {
      expect(best?.sound.sound).toBe(soundBy(tried.circuits))
    }
  })

  it.each(directions)('%s carries no %s from an input to an output', (...[, , fact, tried]) => {
    const { best, check } = ask(across(fact, tried))
    expect(best && check(backwards(best))).toContain('wrong-direction')
  })

  it.each(directions)('%s needs its lead for %s', (...[, form, fact, tried]) => {
    const { answer, best } = ask({ ...across(fact, tried), pieces: [BESIDE_LEAD] })
    if (form === 'sound') expect(best?.sound.sound).toBe('none')
    else if (fact.takes !== BESIDE.connector) expect(answer.verdict).toBe('none')
  })
})
