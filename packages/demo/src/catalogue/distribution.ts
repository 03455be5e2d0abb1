import {
  dcPack,
  device,
  mainsAny,
  packSocket,
  passes,
  rfEither,
  rfIn,
  rfOut,
  trim,
} from '@coaxwain/models/build'

/** Losses and isolations are the usual ones of parts of the kind (published pages; common practice). */
export const DISTRIBUTION = {
  'corbray-sp-2': device({
    maker: 'Corbray',
    name: 'SP-2',
    kind: 'splitter',
    market: 'any',
    aliases: ['SP2', 'two-way splitter'],
    year: 1998,
    back: [
      [
        rfIn('in', 'IN', 'f-socket'),
        rfOut('out-1', 'OUT 1', 'f-socket'),
        rfOut('out-2', 'OUT 2', 'f-socket'),
      ],
    ],
    functions: [
      passes('split', 'splits', 'in', {
        to: ['out-1', 'out-2'],
        label: 'Splits in two',
        gainDb: -3.5,
      }),
    ],
    leaks: [{ from: 'out-1', to: 'out-2', db: 22 }],
    weightGrams: 60,
  }),

  'corbray-sp-2e': device({
    maker: 'Corbray',
    name: 'SP-2E',
    kind: 'splitter',
    market: 'any',
    aliases: ['SP2E', 'two-way splitter, 9.52 mm'],
    year: 1999,
    back: [
      [
        rfIn('in', 'IN', 'iec-socket'),
        rfOut('out-1', 'OUT 1', 'iec-plug'),
        rfOut('out-2', 'OUT 2', 'iec-plug'),
      ],
    ],
    functions: [
      passes('split', 'splits', 'in', {
        to: ['out-1', 'out-2'],
        label: 'Splits in two',
        gainDb: -4,
      }),
    ],
    leaks: [{ from: 'out-1', to: 'out-2', db: 20 }],
    weightGrams: 60,
  }),

  'corbray-cb-2': device({
    maker: 'Corbray',
    name: 'CB-2',
    kind: 'combiner',
    market: 'any',
    aliases: ['CB2', 'two-way combiner'],
    year: 1994,
    back: [
      [
        rfIn('in-1', 'IN 1', 'f-socket'),
        rfIn('in-2', 'IN 2', 'f-socket'),
        rfOut('out', 'OUT', 'f-socket'),
      ],
    ],
    functions: (['1', '2'] as const).map((n) =>
      passes(`combine-${n}`, 'combines', `in-${n}`, {
        to: ['out'],
        label: `Adds IN ${n}`,
        gainDb: -3.5,
      }),
    ),
    leaks: [
      { from: 'in-1', to: 'in-2', db: 24 },
      { from: 'in-2', to: 'in-1', db: 24 },
    ],
    weightGrams: 60,
  }),

  'corbray-dx-1': device({
    maker: 'Corbray',
    name: 'DX-1',
    kind: 'diplexer',
    market: 'any',
    aliases: ['DX1', 'VHF/UHF diplexer'],
    year: 1996,
    back: [
      [
        rfEither('vhf', 'VHF', 'f-socket'),
        rfEither('uhf', 'UHF', 'f-socket'),
        rfEither('line', 'LINE', 'f-socket'),
      ],
    ],
    functions: (['vhf', 'uhf'] as const).flatMap((band) => [
      passes(`${band}-to-line`, 'combines', `${band}-in`, {
        to: ['line-out'],
        label: `Adds ${band.toUpperCase()}`,
        gainDb: -0.8,
      }),
      passes(`line-to-${band}`, 'filters', 'line-in', {
        to: [`${band}-out`],
        label: `Takes ${band.toUpperCase()} out`,
        gainDb: -0.8,
      }),
    ]),
    leaks: [
      { from: 'vhf', to: 'uhf', db: 25 },
      { from: 'uhf', to: 'vhf', db: 25 },
    ],
    weightGrams: 70,
  }),

  /** A diplexer with two 75/300 transformers behind it, on flat leads with lugs. */
  'pellmere-bs-3': device({
    maker: 'Pellmere',
    name: 'BS-3',
    kind: 'diplexer',
    market: '525-m',
    aliases: ['BS3', 'band separator'],
    year: 1983,
    back: [
      [
        rfIn('in', '75 Ω IN', 'f-socket'),
        rfOut('uhf', 'UHF', 'spades', { mount: 'lead' }),
        rfOut('vhf', 'VHF', 'spades', { mount: 'lead' }),
      ],
    ],
    functions: (['vhf', 'uhf'] as const).map((band) =>
      passes(`to-${band}`, 'filters', 'in', {
        to: [band],
        label: `Takes ${band.toUpperCase()} out`,
        gainDb: -1.5,
      }),
    ),
    weightGrams: 80,
  }),

  'corbray-am-12': device({
    maker: 'Corbray',
    name: 'AM-12',
    kind: 'amplifier',
    market: 'any',
    aliases: ['AM12', 'aerial amplifier', 'antenna amplifier'],
    year: 1997,
    factSource: 'manual',
    back: [[rfIn('in', 'IN', 'f-socket'), rfOut('out', 'OUT', 'f-socket'), packSocket('15 V')]],
    controls: [trim('gain', 'GAIN', 'other')],
    functions: [
      passes('amplify', 'amplifies', 'in', {
        to: ['out'],
        label: 'Amplifies',
        power: 'on',
        gainDb: 12,
      }),
    ],
    leaks: [{ from: 'out', to: 'in', db: 25 }],
    pack: dcPack(15, 150),
    weightGrams: 280,
  }),

  'corbray-am-4': device({
    maker: 'Corbray',
    name: 'AM-4',
    kind: 'amplifier',
    market: 'any',
    aliases: ['AM4', 'four-way house amplifier'],
    year: 1999,
    back: [
      [
        rfIn('in', 'IN', 'f-socket'),
        ...(['1', '2', '3', '4'] as const).map((n) => rfOut(`out-${n}`, `OUT ${n}`, 'f-socket')),
      ],
    ],
    functions: [
      passes('amplify', 'amplifies', 'in', {
        to: ['out-1', 'out-2', 'out-3', 'out-4'],
        label: 'Feeds four',
        power: 'on',
        gainDb: 8,
      }),
    ],
    leaks: [{ from: 'out-1', to: 'in', db: 28 }],
    mains: mainsAny(5),
    weightGrams: 450,
  }),

  'corbray-va-20': device({
    maker: 'Corbray',
    name: 'VA-20',
    kind: 'other',
    market: 'any',
    aliases: ['VA20', 'variable pad'],
    year: 1992,
    back: [[rfIn('in', 'IN', 'f-socket'), rfOut('out', 'OUT', 'f-socket')]],
    controls: [trim('loss', '0-20 dB', 'other')],
    functions: [
      passes('weaken', 'attenuates', 'in', { to: ['out'], label: 'Takes level away', gainDb: -10 }),
    ],
    weightGrams: 40,
  }),

  'corbray-ft-1': device({
    maker: 'Corbray',
    name: 'FT-1',
    kind: 'other',
    market: 'any',
    aliases: ['FT1', 'FM radio trap'],
    year: 1993,
    back: [[rfIn('in', 'IN', 'f-socket'), rfOut('out', 'OUT', 'f-socket')]],
    functions: [
      passes('trap', 'filters', 'in', { to: ['out'], label: 'Keeps 88-108 MHz out', gainDb: -0.6 }),
    ],
    weightGrams: 40,
  }),

  'corbray-mt-1': device({
    maker: 'Corbray',
    name: 'MT-1',
    kind: 'other',
    market: '525-m',
    aliases: ['MT1', 'matching box for the mast'],
    year: 1986,
    back: [[rfIn('in', '300 Ω', 'screws'), rfOut('out', '75 Ω', 'f-socket')]],
    functions: [
      passes('match', 'transforms-impedance', 'in', {
        to: ['out'],
        label: 'Matches 300 Ω to 75 Ω',
        gainDb: -0.8,
      }),
    ],
    weightGrams: 90,
  }),
}
