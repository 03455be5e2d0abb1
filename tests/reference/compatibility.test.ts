import {
  COLOUR_SYSTEMS,
  heardOnWires,
  isEncoded,
  RF_SYSTEMS,
  SCANS,
  severityOf,
  shownOnAir,
  shownOnWires,
  WHY_SOURCES,
  type Severity,
  type Shown,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { aerialSet, lead, monitor, player, recorder, sender } from './bench/devices'
import { ask, type Asked } from './bench/world'
import { ON_AIR, type AirCase } from './compatibility/on-air'
import { ON_WIRES, PROTECTED, type WireCase } from './compatibility/on-wires'
import { colourSaid, picturesSaid, soundsSaid } from './compatibility/words'
import { readTable } from './csv'

/** Each row with its source in the last column; most are common practice or ITU-R BT.470. */
const rows = readTable('tv-compatibility')

const SOUND_ONLY: Readonly<Record<string, Shown>> = {
  c51: soundShown(heardOnWires('audio-l', 'line', 'turntable')),
  c52: soundShown(heardOnWires('spdif', 'line', 'line')),
}

function soundShown(heard: ReturnType<typeof heardOnWires>): Shown {
  return { picture: 'steady', colour: 'right', ...heard }
}

/** An aerial signal on a phono, which goes into a video socket as well. */
const RF_INTO_VIDEO: Shown = shownOnWires(
  {
    scan: '525i60',
    colour: 'ntsc-m',
    protection: 'none',
    arrives: new Map([['cvbs', 'rf']]),
  },
  PROTECTED.screen,
)

const derived = (id: string): readonly Shown[] => [
  ...(ON_AIR[id] ?? []).map(({ sent, set }) => shownOnAir(sent, set)),
  ...(ON_WIRES[id] ?? []).map(({ sent, input }) => shownOnWires(sent, input)),
  ...(id === PROTECTED.id ? [shownOnWires(PROTECTED.sent, PROTECTED.input)] : []),
  ...(id === 'c53' ? [RF_INTO_VIDEO] : []),
  ...(SOUND_ONLY[id] ? [SOUND_ONLY[id]] : []),
]

/** Where the facts of what is sent come from. */
function factsOf(id: string): string[] {
  const sent = [...(ON_AIR[id] ?? []), ...(ON_WIRES[id] ?? [])].map((c) => c.sent)
  return sent.flatMap((s) => [
    ...('scan' in s ? [SCANS[s.scan].source] : []),
    ...('colour' in s && isEncoded(s.colour) ? [COLOUR_SYSTEMS[s.colour].source] : []),
    ...('system' in s ? [RF_SYSTEMS[s.system].source] : []),
  ])
}

const distinct = <T>(values: readonly T[]): T[] => [...new Set(values)].sort()

/** `rolls or no colour` is two. */
const severitiesSaid = (text: string): string[] => distinct(text.split(' or '))

describe.each(rows.map((r) => [r['id'] ?? '', r] as const))('row %s', (id, row) => {
  const shown = derived(id)

  it(`${row['path']}: ${row['fed_signal']} into ${row['set_or_input']}`, () => {
    expect(shown.length).toBeGreaterThan(0)
    expect(distinct(shown.map(severityOf))).toEqual(severitiesSaid(row['severity'] ?? ''))
  })

  it('shows the picture that the table says', () => {
    const said = picturesSaid(row['picture'] ?? '')
    if (said) expect(distinct(shown.map((s) => s.picture))).toEqual([...said].sort())
    else expect(shown.every((s) => s.picture === 'steady')).toBe(true)
  })

  it('shows the colour and gives the sound that the table says', () => {
    const colour = colourSaid(row['colour'] ?? '')
    const sounds = soundsSaid(row['sound'] ?? '')
    if (colour) expect(distinct(shown.map((s) => s.colour))).toEqual([colour])
    if (sounds) expect(shown.filter((s) => !sounds.includes(s.sound))).toEqual([])
    expect(colour ?? sounds ?? picturesSaid(row['picture'] ?? '')).not.toBeNull()
  })

  it('rests on what the table names as its source', () => {
    const named = (row['source'] ?? '').split('; ').map((s) => s.replace(/^channel.*/u, 'channel'))
    const rests = [...shown.flatMap((s) => s.why.map((w) => WHY_SOURCES[w])), ...factsOf(id)]
    expect(named.filter((n) => rests.some((r) => r.includes(n)))).not.toEqual([])
  })
})

// ---------------------------------------------------------------- by the engine, end to end

/** What the engine must answer where a set would show this. */
function judge(severity: Severity, { answer, best, findings }: Asked, sound: boolean): void {
  expect(findings).toEqual([])
  expect(answer.complete).toBe(true)
  const hopeless = ['rolls', 'unusable', 'degraded'].includes(severity)
  expect(answer.verdict).toBe(hopeless ? 'none' : 'yes')
  if (!best) return
  expect(best.picture.colour).toBe(!severity.includes('no colour'))
  if (!sound) return
  expect(best.sound.sound).toBe(
    severity.includes('no sound') ? 'none' : severity === 'no stereo' ? 'mono' : 'stereo',
  )
}

const asked = <C extends { readonly notAsked?: string }>(
  table: Readonly<Record<string, readonly C[]>>,
): (readonly [string, C])[] =>
  Object.entries(table).flatMap(([id, cases]) =>
    cases.flatMap((c, i) => (c.notAsked === undefined ? [[`${id}.${i}`, c] as const] : [])),
  )

const COAX = lead('f-plug', 'f-plug')

describe('the engine, by the aerial lead', () => {
  it.each(asked<AirCase>(ON_AIR))('%s', (_, { sent, set, part }) => {
    if (sent.kind !== 'analogue') throw new Error('not an analogue carrier')
    const world = { source: sender(sent, part), display: aerialSet(set), pieces: [COAX] }
    judge(severityOf(shownOnAir(sent, set)), ask(world), true)
  })
})

describe('the engine, by video wires', () => {
  it.each(asked<WireCase>(ON_WIRES))('%s', (_, { sent, input, from, into, pieces }) => {
    const world = { source: player(sent, from), display: monitor(input, into), pieces }
    judge(severityOf(shownOnWires(sent, input)), ask(world), false)
  })

  it.each([
    [true, 'none'],
    [false, 'yes'],
  ] as const)(
    'c37: a protected disc through a box with a level control: %s',
    (control, verdict) => {
      const { answer, findings } = ask({
        source: player(PROTECTED.sent, { connector: 'bnc-socket', form: 'composite' }),
        display: monitor(PROTECTED.screen, { connector: 'phono-socket', form: 'composite' }),
        boxes: [recorder(control)],
        pieces: [lead('bnc-plug', 'bnc-plug'), lead('phono-plug', 'phono-plug')],
        material: { protection: 'agc-pulses' },
      })
      expect([answer.verdict, findings]).toEqual([verdict, []])
    },
  )

  it('c52: digital sound in a line input is no sound', () => {
    const { best, findings } = ask({
      source: player(
        PROTECTED.sent,
        { connector: 'phono-socket', form: 'composite' },
        { connector: 'phono-socket', form: 'digital-sound' },
      ),
      display: monitor(
        PROTECTED.screen,
        { connector: 'phono-socket', form: 'composite' },
        { sound: { connector: 'phono-socket', form: 'sound' } },
      ),
      pieces: [lead('phono-plug', 'phono-plug')],
    })
    expect([best?.sound.sound, findings]).toEqual(['none', []])
  })

  it('c53: an aerial signal on a phono makes no picture in a video socket', () => {
    const [carrier] = ON_AIR['c01'] ?? []
    if (carrier?.sent.kind !== 'analogue') throw new Error('not an analogue carrier')
    const { answer } = ask({
      source: sender(carrier.sent, carrier.part, { connector: 'phono-socket', ohm: 75 }),
      display: monitor(PROTECTED.screen, { connector: 'phono-socket', form: 'composite' }),
      pieces: [lead('phono-plug', 'phono-plug')],
    })
    expect(answer.verdict).toBe('none')
  })
})
