import { compileShelf, createSearch, type SearchOptions } from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import { fitted, type Answer, type Question } from '@coaxwain/shelf'
import { MESSAGES } from '@coaxwain/wording'
import { describe, expect, it } from 'vitest'
import { DEMO, snapshotOf, type DemoCollection } from './index'

/** What is asked beside the two ends; units by their running numbers. */
interface Asked extends Partial<Pick<Question, 'demands' | 'offAir'>> {
  readonly material?: Partial<Question['material']>
  readonly input?: string
  readonly avoid?: readonly number[]
  /** With what can be bought. */
  readonly shopping?: boolean
}

/** Source, display, what is asked, and the rules that bite: obstacles with a `!`, cautions without. */
type Row = readonly [source: number, display: number, asked: Asked, bites: string]

const ALDER_LANE: readonly Row[] = [
  [116, 110, {}, '!out-of-reach !colour !field-rate !sound-spacing'],
  [119, 107, {}, 'sound-apart sound-folded socket-dead never-to-aerial channel-taken'],
  [126, 109, {}, 'few-lines delay'],
  [127, 107, {}, 'moves-itself pack-centre-negative'],
  [128, 102, {}, 'chassis-may-be-live check-chassis pack-ac'],
  [130, 102, {}, '!line-rate !no-common-form'],
  [135, 101, {}, 'repeats-aerial'],
  [135, 115, { demands: { keepAerial: true } }, 'hum-loop'],
  [142, 103, {}, 'double-dead level-high'],
  [
    142,
    103,
    {},
    '!added-socket added-socket chassis-live last-ends-line both-plugs pack-dc pack-centre-positive',
  ],
]

const MARRAM_ROW: readonly Row[] = [
  [8, 1, { material: { protection: 'agc-pulses' } }, '!level-control'],
  [8, 1, {}, 'recorder-input squeezed tell-shape idle-carrier idle-sideband'],
  [8, 3, { material: { scan: '525i60' } }, 'sixty-fields'],
  [12, 5, {}, '!whip-only'],
  [14, 3, {}, 'channel-socket box-waits silent'],
  [9, 3, { avoid: [55] }, '!wires-missing'],
  [15, 6, {}, 'no-loudspeaker'],
  [17, 1, {}, 'less-detail wide-picture'],
]

/** Units that would stand in for the bench modulator: recorders, and the two other modulators. */
const OTHER_MODULATORS = [24, 25, 50, 61, 88, 89, 90, 97]
const ANALOGUE_36 = [{ plan: 'uk-uhf', channel: '36', kind: 'analogue' }] as const

const SALLOW_YARD: readonly Row[] = [
  // sets, monitors and players of the shop
  [20, 10, {}, 'sync-needed shared-socket'],
  [20, 13, {}, 'sync-wire other-colour'],
  [22, 1, { avoid: OTHER_MODULATORS }, 'sound-half white-buzz one-load set-level'],
  [22, 3, { material: { twoProgrammes: true } }, 'two-programmes'],
  [22, 4, { input: 'av-picture' }, '!socket-dead !no-lead'],
  [22, 11, {}, '!out-of-reach'],
  [22, 14, {}, '!line-not-ended'],
  [26, 3, {}, 'own-wiring'],
  [26, 5, {}, '!switching-voltage'],
  [27, 5, {}, 'cross-colour direction-switch choose-by-hand'],
  [29, 3, {}, 'interlaced-only'],
  [30, 3, { material: { protection: 'hdcp' } }, '!no-handshake handshake-needed'],
  [30, 3, { material: { protection: 'hdcp' }, avoid: [64] }, 'handshake-unknown'],
  [31, 3, { demands: { aim: 'light-gun' } }, 'gun-needs-tube'],
  [31, 10, {}, '!scan !digital-only !luma-only luma-only'],
  [31, 10, { demands: { aim: 'light-gun' } }, '!light-gun !one-way !wrong-circuits'],
  [35, 13, {}, '!line-rate other-lines'],
  [35, 14, {}, 'other-fields turn-hold line-open'],
  [36, 12, {}, 'no-loudspeaker-here'],
  // with an aerial that is to be kept
  [24, 10, { demands: { keepAerial: true }, offAir: ANALOGUE_36 }, 'aerial-first'],
  [28, 3, { demands: { keepAerial: true }, avoid: [73] }, 'dc-to-aerial aerial-to-box'],
  [
    33,
    1,
    { demands: { keepAerial: true } },
    'radiation-limit check-isolation channel-stays-free channel-below splitter-radiates level-lost',
  ],
  // from other countries
  [20, 41, { material: { scan: '525i60' } }, 'volts-by-lead reduced-height'],
  [20, 84, {}, 'standard-negative'],
  [37, 3, {}, 'mains-differs colour-not-decoded sound-carrier-socket'],
  [38, 3, {}, 'digital-socket scan-too-fast'],
  [42, 1, {}, '!vision-polarity !sound-spacing'],
  [42, 40, { input: 'aerial-picture' }, 'standard-grey standard-hiss band-switch channel-on-air'],
  [43, 8, {}, 'neighbour-channel dc-on-lead check-dc'],
  [44, 45, {}, 'in-fm-band air-or-cable'],
  [44, 47, {}, '!japanese-21-pin !added-socket !band'],
  [49, 48, { shopping: true, avoid: [62] }, 'matching-needed channel-may-be-used'],
]

const ROWS: Readonly<Record<string, readonly Row[]>> = {
  'alder-lane': ALDER_LANE,
  'marram-row': MARRAM_ROW,
  'sallow-yard': SALLOW_YARD,
}

/** Rules on which no shelf of sound models can run aground, each with the reason. */
const NEVER: Readonly<Record<string, string>> = {
  '!not-a-channel':
    'A tuner takes the form RF alone, and an RF output without a carrier starts no picture: what goes into a tuner by a plug that fits and is no channel is told before, as other circuits.',
  'other-socket':
    'It needs a socket on a player without picture and sound that takes a plug of the set, such as one for tape data, and no invented model has one.',
  'sync-kind':
    'It needs one socket that takes RGB with this sync or with that, as a switch stands, and no invented monitor has one.',
  '!not-taken':
    'It needs a plain colour in the form of another, such as colour differences on a socket for RGB; every invented model gives each form the colour that belongs to it, and no unit was changed so.',
}

const codesUnder = (prefix: string, mark: string): string[] =>
  Object.keys(MESSAGES)
    .filter((code) => code.startsWith(prefix) && !code.endsWith('.more'))
    .map((code) => mark + code.slice(prefix.length))

const EVERY_RULE = [...codesUnder('obstacle.', '!'), ...codesUnder('caution.', '')]

function uidOf(collection: DemoCollection, number: number): string {
  const unit = collection.units.find((u) => u.number === number)
  if (!unit) throw new Error(`no unit ${number} in ${collection.key}`)
  return unit.uid
}

function questionOf(collection: DemoCollection, [source, display, asked]: Row): Question {
  const from = collection.units.find((u) => u.number === source)
  const model = from && DEMO.models[from.model]
  const playing =
    model?.type === 'device'
      ? fitted(model, from?.modifications ?? []).functions.find((f) => f.kind === 'plays')
      : undefined
  if (!playing) throw new Error(`unit ${source} of ${collection.key} plays nothing`)
  return {
    format: 1,
    source: { unit: uidOf(collection, source), playing: playing.key },
    material: { protection: 'none', ...asked.material },
    display: { unit: uidOf(collection, display), input: asked.input },
    demands: asked.demands ?? {},
    avoid: (asked.avoid ?? []).map((n) => uidOf(collection, n)),
    offAir: asked.offAir ?? collection.offAir,
    assumedLeads: [],
  }
}

/** Every rule of which an answer speaks, also where something would have to be bought. */
function rulesIn({ hookups, obstacles, purchases }: Answer): Set<string> {
  const all = [...hookups, ...purchases.map((p) => p.hookup)]
  return new Set([
    ...obstacles.map((o) => `!${o.code}`),
    ...all.flatMap((h) => h.cautions.map((c) => c.code)),
  ])
}

describe.each(DEMO.collections)('questions in $name', (collection) => {
  const shelf = compileShelf(snapshotOf(DEMO, collection.key))

  it.each(ROWS[collection.key] ?? [])('%i to %i, %j: %s', (...row) => {
    const options: SearchOptions = row[2].shopping ? { parts: ORDINARY_PARTS } : {}
    const search = createSearch(shelf, questionOf(collection, row), options)
    while (!search.done) search.step(1000)
    const found = rulesIn(search.best())
    expect(row[3].split(' ').filter((rule) => !found.has(rule))).toEqual([])
  })
})

describe('every rule that has a sentence', () => {
  const bitten = new Set(
    Object.values(ROWS).flatMap((rows) => rows.flatMap((row) => row[3].split(' '))),
  )

  it('has a question on which it bites, or a reason why it cannot', () => {
    expect(EVERY_RULE.length).toBeGreaterThan(90)
    expect(EVERY_RULE.filter((rule) => !bitten.has(rule) && !(rule in NEVER))).toEqual([])
  })

  it('is known under the name that a question gives it', () => {
    expect([...bitten].filter((rule) => !EVERY_RULE.includes(rule))).toEqual([])
  })

  it('is excused only while no question meets it', () => {
    expect(Object.keys(NEVER).filter((r) => bitten.has(r) || !EVERY_RULE.includes(r))).toEqual([])
  })
})
