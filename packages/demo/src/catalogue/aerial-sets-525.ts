import {
  DEFLECTION_60,
  LINES_525,
  MONO_SET,
  NTSC_SET,
  OTHERWISE,
  airCable,
  airCableTuner,
  at,
  automatic,
  dcPack,
  device,
  group,
  heardOn,
  mains120,
  packSocket,
  pluggedInto,
  rfIn,
  shows,
  trim,
  tube,
  tuner,
  whip,
} from '@coaxwain/models/build'

const VHF = { plan: 'us-broadcast', names: '2..13' } as const
const UHF = { plan: 'us-broadcast', names: '14..83' } as const

/** Two knobs: a turret with a place for each VHF channel, and a free-running one for UHF. */
const knobs = [
  tuner('vhf-knob', 'VHF', 'turret', { reaches: [VHF] }),
  tuner('uhf-knob', 'UHF', 'knob', { reaches: [UHF] }),
  trim('fine', 'FINE', 'fine-tuning'),
]

const onKnobs = (rows: Parameters<typeof heardOn>[0]) =>
  (['vhf', 'uhf'] as const).map((band) =>
    shows(`${band}-picture`, `Shows ${band.toUpperCase()}`, band, {
      accepts: heardOn(rows, ['M']),
      tunedBy: `${band}-knob`,
    }),
  )

/** Sets with nothing but an aerial input. */
export const AERIAL_SETS_525 = {
  'ostrel-14-c': device({
    maker: 'Ostrel',
    name: '14-C',
    kind: 'television',
    market: '525-m',
    aliases: ['14C', 'portable colour television'],
    year: 1974,
    back: [
      [
        group(
          '300 Ω AERIAL',
          rfIn('uhf', 'UHF', 'screws', { isolated: 'unknown' }),
          rfIn('vhf', 'VHF', 'screws', { isolated: 'unknown' }),
        ),
      ],
    ],
    controls: knobs,
    functions: onKnobs(NTSC_SET),
    chassis: 'unknown',
    mains: mains120(95),
    display: tube(DEFLECTION_60, 'mono'),
    weightGrams: 17500,
  }),

  'ostrel-19-l': device({
    maker: 'Ostrel',
    name: '19-L',
    kind: 'television',
    market: '525-m',
    aliases: ['19L', 'colour television'],
    year: 1979,
    factSource: 'manual',
    back: [
      [
        group(
          'AERIAL',
          rfIn('vhf', 'VHF 75 Ω', 'f-socket', { note: 'Isolated from the chassis by the maker.' }),
          rfIn('uhf', 'UHF 300 Ω', 'screws', { note: 'Isolated from the chassis by the maker.' }),
        ),
      ],
    ],
    controls: knobs,
    functions: onKnobs(NTSC_SET),
    chassis: 'live',
    mains: mains120(120),
    display: tube(DEFLECTION_60, 'mono'),
    weightGrams: 26000,
  }),

  'ostrel-9-m': device({
    maker: 'Ostrel',
    name: '9-M',
    kind: 'television',
    market: '525-m',
    aliases: ['9M', 'portable monochrome television'],
    year: 1972,
    back: [
      [
        whip('whip', 'AERIAL'),
        group('300 Ω', rfIn('uhf', 'UHF', 'screws'), rfIn('vhf', 'VHF', 'screws')),
        packSocket('12 V'),
      ],
    ],
    controls: [...knobs, trim('v-hold', 'V HOLD', 'vertical-hold', 'back')],
    functions: [
      ...onKnobs(MONO_SET(LINES_525)),
      shows('whip-picture', 'Shows the whip', 'whip', {
        accepts: heardOn(MONO_SET(LINES_525), ['M']),
        tunedBy: 'vhf-knob',
      }),
    ],
    mains: mains120(30),
    pack: dcPack(12, 1500),
    display: tube(DEFLECTION_60, 'mono', 'tube-mono'),
    weightGrams: 5600,
  }),

  'selvane-13-r': device({
    maker: 'Selvane',
    name: '13-R',
    kind: 'television',
    market: '525-m',
    aliases: ['13R', 'colour television'],
    year: 1990,
    back: [[rfIn('aerial', 'VHF/UHF', 'f-socket')]],
    controls: [airCable(), airCableTuner('channel')],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: heardOn(NTSC_SET, ['M']),
        tunedBy: 'channel',
      }),
    ],
    remote: 'optional',
    mains: mains120(60),
    display: tube(DEFLECTION_60, 'mono'),
    weightGrams: 11000,
  }),

  'belloway-pv-9': device({
    maker: 'Belloway',
    name: 'PV-9',
    kind: 'television',
    market: '525-m',
    aliases: ['PV9', 'pocket television'],
    year: 1996,
    side: [[whip('whip'), rfIn('ext-aerial', 'EXT ANT', 'jack35-socket'), packSocket('6 V')]],
    controls: [
      automatic('aerial-switch', 'EXT ANT', [
        ['outside', 'EXT ANT', pluggedInto('ext-aerial')],
        ['whip', 'whip', OTHERWISE],
      ]),
      tuner('channel', 'TUNING', 'search', {
        reaches: [VHF, { plan: 'us-broadcast', names: '14..69' }],
      }),
    ],
    functions: [
      shows('outside-picture', 'Shows EXT ANT', 'ext-aerial', {
        accepts: heardOn(NTSC_SET, ['M']),
        while: at('aerial-switch', 'outside'),
        tunedBy: 'channel',
      }),
      shows('whip-picture', 'Shows the whip', 'whip', {
        accepts: heardOn(NTSC_SET, ['M']),
        while: at('aerial-switch', 'whip'),
        tunedBy: 'channel',
      }),
    ],
    pack: dcPack(6, 500),
    display: { ...tube(DEFLECTION_60, 'mono', 'flat'), directView: false },
    weightGrams: 290,
  }),
}
