import {
  ANYTHING,
  SAME,
  at,
  automatic,
  compositeIn,
  compositeOut,
  device,
  gives,
  group,
  inputChoice,
  mainsAny,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  turns,
  voltageAt,
} from '@coaxwain/models/build'

const THREE_INPUTS = ['1', '2', '3'] as const
const TWO_INPUTS = ['1', '2'] as const

const lineInput = (n: string) =>
  group(
    `IN ${n}`,
    compositeIn(`in-${n}`, 'VIDEO', { load: { kind: 'high' } }),
    stereoIn(`sound-${n}`),
  )

/** Selectors of line-level pictures with their sound, and the box that feeds several. */
export const SELECTORS = {
  'hollin-sb-4': device({
    maker: 'Hollin',
    name: 'SB-4',
    kind: 'selector',
    market: 'any',
    aliases: ['SB4', 'three-way selector'],
    year: 1992,
    back: [
      [
        ...THREE_INPUTS.map(lineInput),
        group('OUT', compositeOut('out', 'VIDEO'), stereoOut('sound-out')),
      ],
    ],
    controls: [inputChoice(THREE_INPUTS, { access: 'back', look: 'slide' })],
    functions: THREE_INPUTS.map((n) =>
      turns(`select-${n}`, 'selects', `in-${n}`, {
        gives: [gives('out', SAME), sounds('sound-out', 'same')],
        label: `Takes IN ${n}`,
        sound: `sound-${n}`,
        while: at('input', n),
        power: 'none',
      }),
    ),
    weightGrams: 380,
  }),

  'hollin-es-2': device({
    maker: 'Hollin',
    name: 'ES-2',
    kind: 'selector',
    market: '625-bg',
    aliases: ['ES2', 'automatic 21-pin selector'],
    year: 2001,
    back: [
      [
        ...TWO_INPUTS.map((n) =>
          scart(`in-${n}`, `IN ${n}`, { takes: ['composite', 'rgb', 'sound'] }),
        ),
        scart('out', 'OUT', { gives: ['composite', 'rgb', 'sound'] }),
      ],
    ],
    controls: [
      automatic('input', 'INPUT', [
        ['1', '1', voltageAt('in-1')],
        ['2', '2', voltageAt('in-2')],
      ]),
    ],
    functions: TWO_INPUTS.flatMap((n) => [
      turns(`select-${n}`, 'selects', `in-${n}-composite-in`, {
        gives: [
          gives('out-composite-out', SAME, { volts: ['av-select'] }),
          sounds('out-sound-out', 'same'),
        ],
        label: `Takes IN ${n}`,
        sound: `in-${n}-sound-in`,
        while: at('input', n),
        power: 'none',
        accepts: [{ scans: 'any', colours: 'any', volts: ['av-select'] }],
      }),
      turns(`select-${n}-rgb`, 'selects', `in-${n}-rgb-in`, {
        gives: [
          gives('out-rgb-out', SAME, { volts: ['av-select', 'rgb-select'] }),
          sounds('out-sound-out', 'same'),
        ],
        label: `Takes RGB on IN ${n}`,
        sound: `in-${n}-sound-in`,
        while: at('input', n),
        power: 'none',
        accepts: [{ scans: 'any', colours: 'any', volts: ['av-select', 'rgb-select'] }],
      }),
    ]),
    weightGrams: 240,
  }),

  'hollin-da-4': device({
    maker: 'Hollin',
    name: 'DA-4',
    kind: 'distribution-amplifier',
    market: 'any',
    aliases: ['DA4', 'one in, three out'],
    year: 1990,
    back: [
      [
        group('IN', compositeIn('in', 'VIDEO'), stereoIn('sound-in')),
        group('OUT 1', compositeOut('out-1', 'VIDEO'), stereoOut('sound-1')),
      ],
      [
        group('OUT 2', compositeOut('out-2', 'VIDEO'), stereoOut('sound-2')),
        group('OUT 3', compositeOut('out-3', 'VIDEO'), stereoOut('sound-3')),
      ],
    ],
    functions: [
      turns('spread', 'amplifies', 'in', {
        gives: THREE_INPUTS.flatMap((n) => [gives(`out-${n}`, SAME), sounds(`sound-${n}`, 'same')]),
        label: 'Feeds three',
        sound: 'sound-in',
        accepts: ANYTHING,
      }),
    ],
    mains: mainsAny(6),
    weightGrams: 700,
  }),
}
