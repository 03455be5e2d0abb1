import { DEMO, demoUid, modelUid } from '@coaxwain/demo'

export const ALDER_LANE = DEMO.collections.find((c) => c.key === 'alder-lane')?.uid ?? ''
export const MARRAM_ROW = DEMO.collections.find((c) => c.key === 'marram-row')?.uid ?? ''

/** Units of the demonstration that the journeys are about. */
export const UNITS = {
  player: demoUid('u-a-142'),
  modulator: demoUid('u-a-137'),
  set: demoUid('u-a-101'),
  changedSet: demoUid('u-a-103'),
  converter: demoUid('u-a-133'),
  pocketSet: demoUid('u-a-109'),
  computer: demoUid('u-a-130'),
  monitor: demoUid('u-a-112'),
  otherMonitor: demoUid('u-a-114'),
  console: demoUid('u-a-125'),
  bigSet: demoUid('u-a-108'),
} as const

export const MODEL = modelUid('tarnbeck-dp-62')

export const at = (collection: string, path: string): string => `/c/${collection}/${path}`

export const answerPath = (
  collection: string,
  source: string,
  playing: string,
  display: string,
): string => at(collection, `hookups/answer?source=${source}&playing=${playing}&display=${display}`)

export const EXAMPLE_ANSWER = answerPath(ALDER_LANE, UNITS.player, 'disc', UNITS.set)

/** Players with what they play, to sets: wired once for all of them. */
export const arrangementPath = (
  collection: string,
  sources: readonly (readonly [unit: string, playing: string])[],
  displays: readonly string[],
): string => {
  const query = new URLSearchParams([
    ...sources.map((source) => ['source', source.join('~')]),
    ...displays.map((display) => ['display', display]),
  ])
  return at(collection, `hookups/several/answer?${query}`)
}

export const EXAMPLE_ARRANGEMENT = arrangementPath(
  ALDER_LANE,
  [
    [UNITS.player, 'disc'],
    [UNITS.console, 'cartridge'],
  ],
  [UNITS.bigSet],
)

/** Every page of this release, by a name that a failing test can print. */
export const PAGES: Readonly<Record<string, string>> = {
  hookups: at(ALDER_LANE, 'hookups'),
  answer: EXAMPLE_ANSWER,
  'no answer': answerPath(ALDER_LANE, UNITS.computer, 'program', UNITS.monitor),
  'harmful wiring refused': answerPath(ALDER_LANE, UNITS.player, 'disc', UNITS.changedSet),
  'check a hookup': at(ALDER_LANE, 'hookups/check'),
  'several players or sets': at(ALDER_LANE, 'hookups/several'),
  arrangement: EXAMPLE_ARRANGEMENT,
  'no arrangement': arrangementPath(
    ALDER_LANE,
    [[UNITS.player, 'disc']],
    [UNITS.monitor, UNITS.otherMonitor],
  ),
  shelf: at(ALDER_LANE, 'shelf'),
  'leads drawer': at(ALDER_LANE, 'shelf?tab=leads'),
  places: at(ALDER_LANE, 'shelf?tab=places'),
  'empty shelf list': at(ALDER_LANE, 'shelf?q=nothing-is-called-this'),
  unit: at(ALDER_LANE, `shelf/${UNITS.player}`),
  'edit unit': at(ALDER_LANE, `shelf/${UNITS.player}/edit`),
  'add unit': at(ALDER_LANE, 'shelf/add'),
  models: at(ALDER_LANE, 'models'),
  model: at(ALDER_LANE, `models/${MODEL}`),
  'add model': at(ALDER_LANE, 'models/add'),
  help: '/help',
  'nothing here': '/no/such/page',
}

export const OPEN_PAGES: Readonly<Record<string, string>> = { 'sign in': '/sign-in' }
