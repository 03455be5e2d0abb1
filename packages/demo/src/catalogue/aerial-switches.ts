import {
  OTHERWISE,
  at,
  automatic,
  choice,
  device,
  passes,
  rfIn,
  rfOut,
  signalAt,
} from '@coaxwain/models/build'

/** Switches between the aerial and a box of one's own. */
export const AERIAL_SWITCHES = {
  /** 80 dB is what a switch must keep between its two inputs from 54 to 216 MHz: 47 CFR 15.115(h). */
  'hollin-ab-1': device({
    maker: 'Hollin',
    name: 'AB-1',
    kind: 'rf-switch',
    market: 'any',
    aliases: ['AB1', 'two-way aerial switch', 'two-way antenna switch'],
    year: 1995,
    factSource: 'manual',
    back: [
      [rfIn('a', 'A', 'f-socket'), rfIn('b', 'B', 'f-socket'), rfOut('out', 'OUT', 'f-socket')],
    ],
    controls: [
      choice('switch', 'A/B', 'input', {
        positions: { a: 'A', b: 'B' },
        access: 'front',
        look: 'slide',
      }),
    ],
    functions: (['a', 'b'] as const).map((side) =>
      passes(`select-${side}`, 'selects', side, {
        to: ['out'],
        label: `Takes ${side.toUpperCase()}`,
        while: at('switch', side),
        gainDb: -0.7,
      }),
    ),
    leaks: [
      { from: 'a', to: 'b', db: 80 },
      { from: 'b', to: 'a', db: 80 },
    ],
    weightGrams: 120,
  }),

  'pellmere-gs-1': device({
    maker: 'Pellmere',
    name: 'GS-1',
    kind: 'rf-switch',
    market: '525-m',
    aliases: ['GS1', 'TV/GAME switch'],
    year: 1982,
    back: [
      [
        rfIn('game', 'GAME', 'phono-socket'),
        rfIn('antenna', '300 Ω ANT', 'screws'),
        rfOut('tv', 'TO TV', 'spades', { mount: 'lead' }),
      ],
    ],
    controls: [
      choice('switch', 'TV/GAME', 'input', {
        positions: { tv: 'TV', game: 'GAME' },
        access: 'front',
        look: 'slide',
      }),
    ],
    functions: [
      passes('select-game', 'selects', 'game', {
        to: ['tv'],
        label: 'Takes GAME',
        while: at('switch', 'game'),
        gainDb: -1,
      }),
      passes('select-antenna', 'selects', 'antenna', {
        to: ['tv'],
        label: 'Takes the aerial',
        while: at('switch', 'tv'),
        gainDb: -1,
      }),
    ],
    leaks: [{ from: 'game', to: 'antenna', db: 62 }],
    weightGrams: 110,
  }),

  'pellmere-as-1': device({
    maker: 'Pellmere',
    name: 'AS-1',
    kind: 'rf-switch',
    market: '525-m',
    aliases: ['AS1', 'automatic game switch'],
    year: 1989,
    back: [
      [
        rfIn('game', 'GAME', 'phono-socket'),
        rfIn('antenna', 'ANT', 'f-socket'),
        rfOut('tv', 'TO TV', 'f-plug', { mount: 'lead' }),
      ],
    ],
    controls: [
      automatic('way', 'AUTO', [
        ['game', 'GAME', signalAt('game')],
        ['antenna', 'ANT', OTHERWISE],
      ]),
    ],
    functions: [
      passes('select-game', 'selects', 'game', {
        to: ['tv'],
        label: 'Takes GAME',
        while: at('way', 'game'),
        gainDb: -2,
      }),
      passes('select-antenna', 'selects', 'antenna', {
        to: ['tv'],
        label: 'Takes the aerial',
        while: at('way', 'antenna'),
        gainDb: -2,
      }),
    ],
    leaks: [{ from: 'game', to: 'antenna', db: 60 }],
    weightGrams: 90,
  }),
}
