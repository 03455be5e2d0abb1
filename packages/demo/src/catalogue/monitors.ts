import {
  DEFLECTION_50_60,
  LINES_15K,
  LINES_525,
  LINES_625,
  MONO_SET,
  NTSC,
  SAME,
  SIXTY_443,
  at,
  bayonetsIn,
  choice,
  compositeIn,
  compositeOut,
  device,
  gives,
  hd15In,
  inputChoice,
  mains120,
  mainsAny,
  plainColour,
  scart,
  shows,
  ttlIn,
  tube,
  turns,
} from '@coaxwain/models/build'
import type { AcceptRow } from '@coaxwain/models'

/** Encoded pictures of both rasters, with the subcarriers that a studio monitor knows. */
const EVERY_COLOUR: readonly AcceptRow[] = [
  { scans: LINES_525, colours: [...NTSC, ...SIXTY_443, 'mono'] },
  { scans: LINES_625, colours: ['pal', 'secam', 'mono'] },
  ...MONO_SET(LINES_15K),
]

export const MONITORS = {
  'jorvane-m-21': device({
    maker: 'Jorvane',
    name: 'M-21',
    kind: 'monitor',
    market: 'any',
    aliases: ['M21', 'studio monitor'],
    year: 1997,
    factSource: 'manual',
    back: [
      [
        bayonetsIn({ 'g-y': 'G/Y', 'b-pb': 'B/PB', 'r-pr': 'R/PR', sync: 'SYNC', video: 'VIDEO' }, [
          {
            key: 'component',
            form: 'component',
            takes: { 'g-y': 'y', 'b-pb': 'pb', 'r-pr': 'pr' },
          },
          {
            key: 'rgb',
            form: 'rgbs',
            takes: { 'r-pr': 'r', 'g-y': 'g', 'b-pb': 'b', sync: 'csync' },
          },
          { key: 'composite', form: 'composite', takes: { video: 'cvbs' } },
        ]),
        hd15In('hd15', 'RGB HV'),
        scart('av', 'AV', { takes: ['composite', 'rgb', 'sound'] }),
      ],
    ],
    controls: [
      inputChoice({ component: 'YPBPR', rgb: 'RGB', video: 'VIDEO', hd15: 'RGB HV', av: 'AV' }),
    ],
    functions: [
      shows('component-picture', 'Shows component', 'component', {
        accepts: plainColour('ypbpr', LINES_15K),
        while: at('input', 'component'),
      }),
      shows('rgb-picture', 'Shows RGB', 'rgb', {
        accepts: plainColour('rgb', LINES_15K),
        while: at('input', 'rgb'),
      }),
      shows('composite-picture', 'Shows VIDEO', 'composite', {
        accepts: EVERY_COLOUR,
        while: at('input', 'video'),
        separator: 'comb',
      }),
      shows('hd15-picture', 'Shows RGB HV', 'hd15', {
        accepts: plainColour('rgb', LINES_15K),
        while: at('input', 'hd15'),
      }),
      shows('av-picture', 'Shows AV', 'av-composite-in', {
        accepts: EVERY_COLOUR,
        while: at('input', 'av'),
        sound: 'av-sound-in',
        separator: 'comb',
      }),
      shows('av-rgb-picture', 'Shows RGB on AV', 'av-rgb-in', {
        accepts: plainColour('rgb', LINES_15K),
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
    ],
    mains: mainsAny(110),
    display: tube(DEFLECTION_50_60, 'mono'),
    weightGrams: 28000,
  }),

  /** Its line stage runs at the rate that it is given, and may be harmed by another (common practice, no source). */
  'jorvane-mt-12': device({
    maker: 'Jorvane',
    name: 'MT-12',
    kind: 'monitor',
    market: '525-m',
    aliases: ['MT12', 'computer monitor'],
    year: 1985,
    back: [[ttlIn('rgbi-in', 'RGB')]],
    functions: [
      shows('rgbi-picture', 'Shows RGB', 'rgbi-in', { accepts: plainColour('rgbi', ['cga-15k7']) }),
    ],
    mains: mains120(55),
    display: {
      ...tube(DEFLECTION_50_60, 'none'),
      deflection: { lineKhz: [[15.7, 15.75]], fieldHz: [[59, 61]], fixed: true },
    },
    weightGrams: 9800,
  }),

  'jorvane-mv-14': device({
    maker: 'Jorvane',
    name: 'MV-14',
    kind: 'monitor',
    market: 'any',
    aliases: ['MV14', 'computer monitor'],
    year: 1992,
    back: [[hd15In('hd15-in', 'RGB')]],
    functions: [
      shows('rgb-picture', 'Shows RGB', 'hd15-in', {
        accepts: plainColour('rgb', ['vga-31k-60', 'vga-31k-70', '525p60']),
      }),
    ],
    mains: mainsAny(75),
    display: {
      ...tube(DEFLECTION_50_60, 'none'),
      deflection: { lineKhz: [[31.4, 31.5]], fieldHz: [[59, 71]], fixed: true },
    },
    weightGrams: 11500,
  }),

  'hollin-pm-9': device({
    maker: 'Hollin',
    name: 'PM-9',
    kind: 'monitor',
    market: 'any',
    aliases: ['PM9', 'picture monitor'],
    year: 1980,
    back: [
      [
        compositeIn('video-in', 'VIDEO IN', {
          connector: 'bnc-socket',
          load: { kind: 'switch', control: 'termination', position75: '75-ohm' },
          loopsTo: 'video-loop',
        }),
        compositeOut('video-loop', 'VIDEO OUT', { connector: 'bnc-socket' }),
      ],
    ],
    controls: [
      choice('termination', '75 Ω', 'termination', {
        positions: { '75-ohm': '75 Ω', high: 'HI-Z' },
        access: 'back',
      }),
    ],
    functions: [
      shows('composite-picture', 'Shows VIDEO', 'video-in', { accepts: MONO_SET(LINES_15K) }),
      turns('loop', 'loop-through', 'video-in', {
        gives: [gives('video-loop', SAME)],
        label: 'Passes the picture on',
        while: at('termination', 'high'),
        power: 'none',
      }),
    ],
    mains: mainsAny(35),
    display: tube(DEFLECTION_50_60, 'none', 'tube-mono'),
    weightGrams: 6900,
  }),
}
