import {
  LINES_15K,
  LINES_525,
  LINES_625,
  DEFLECTION_50_60,
  at,
  carrier,
  channelSwitch,
  choice,
  compositeOut,
  dcPack,
  device,
  gives,
  inputChoice,
  jack,
  mains230,
  monoOut,
  onPort,
  one,
  packSocket,
  picture,
  plays,
  port,
  rfIn,
  rfOut,
  scart,
  shows,
  sounds,
  tube,
  tuner,
} from '@coaxwain/models/build'
import type { AcceptRow, TunedControl } from '@coaxwain/models'
import type { Colour, PlanPart, RfSystemId } from '@coaxwain/signal'

const FRANCE_VHF: PlanPart = { plan: 'france', names: '5..10' }
const FRANCE_UHF: PlanPart = { plan: 'france', names: '21..69' }

/** The maker's book lists what each position of SYSTEM shows, and says nothing of other colours there. */
const SYSTEMS: Readonly<
  Record<string, { readonly heard: readonly RfSystemId[]; readonly colours: readonly Colour[] }>
> = {
  bg: { heard: ['B', 'G'], colours: ['pal', 'secam', 'mono'] },
  i: { heard: ['I'], colours: ['pal', 'mono'] },
  dk: { heard: ['D', 'K'], colours: ['pal', 'secam', 'mono'] },
  l: { heard: ['L'], colours: ['secam', 'mono'] },
}

const byBand = (vhf: readonly PlanPart[], uhf: readonly PlanPart[]): TunedControl['reaches'] => [
  ...vhf.map((part) => ({ part, while: at('band', 'vhf') })),
  ...uhf.map((part) => ({ part, while: at('band', 'uhf') })),
]

const SECAM_ONLY: readonly AcceptRow[] = [
  { scans: LINES_625, colours: ['secam', 'mono'] },
  { scans: LINES_625, colours: 'any', outcome: 'monochrome' },
]

/** Sets and sources that came to a system I country from elsewhere. */
export const VISITORS_625 = {
  'lindrake-ms-28': device({
    maker: 'Lindrake',
    name: 'MS-28',
    kind: 'television',
    market: '625-l',
    aliases: ['MS28', 'television for four systems'],
    year: 1995,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial', 'ANTENNE', 'iec-socket'),
        scart('av', 'AV', { takes: ['composite', 'rgb', 'sound'] }),
      ],
    ],
    controls: [
      inputChoice({ tv: 'TV', av: 'AV' }),
      choice('system', 'SYSTEM', 'standard', {
        positions: { bg: 'B/G', i: 'I', dk: 'D/K', l: 'L' },
        access: 'front',
      }),
      choice('band', 'BAND', 'other', { positions: { vhf: 'VHF', uhf: 'UHF' }, access: 'front' }),
      {
        ...tuner('channel', 'TUNING', 'knob', { reaches: [] }),
        reaches: byBand(
          [{ plan: 'ccir-west-europe', names: 'E5..E12' }, FRANCE_VHF],
          [{ plan: 'ccir-west-europe', names: '21..69' }],
        ),
      },
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: Object.entries(SYSTEMS).map(([key, { heard, colours }]) => ({
          scans: LINES_625,
          colours,
          systems: heard,
          while: at('system', key),
        })),
        while: at('input', 'tv'),
        tunedBy: 'channel',
      }),
      shows('av-picture', 'Shows AV', 'av-composite-in', {
        accepts: Object.entries(SYSTEMS).map(([key, { colours }]) => ({
          scans: LINES_625,
          colours,
          while: at('system', key),
        })),
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
      shows('av-rgb-picture', 'Shows RGB on AV', 'av-rgb-in', {
        accepts: [{ scans: LINES_15K, colours: ['rgb'], volts: ['rgb-select'] }],
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
    ],
    mains: mains230(105),
    display: tube(DEFLECTION_50_60, 'stereo'),
    weightGrams: 36000,
  }),

  /**
   * Positive vision and AM sound: nothing from across the water is seen on it by its aerial. Its hold reaches
   * 60 Hz, and then the picture does not fill the height.
   */
  'lindrake-cf-17': device({
    maker: 'Lindrake',
    name: 'CF-17',
    kind: 'television',
    market: '625-l',
    aliases: ['CF17', 'portable colour television'],
    year: 1984,
    back: [
      [
        rfIn('aerial', 'ANTENNE', 'iec-socket'),
        scart('av', 'PERITEL', { takes: ['composite', 'rgb', 'sound'] }),
      ],
    ],
    controls: [
      inputChoice({ tv: 'TV', av: 'AV' }),
      tuner('channel', 'ACCORD', 'presets', { reaches: [FRANCE_VHF, FRANCE_UHF] }),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: SECAM_ONLY.map((row) => ({ ...row, systems: ['L'] as const })),
        while: at('input', 'tv'),
        tunedBy: 'channel',
      }),
      shows('av-picture', 'Shows PERITEL', 'av-composite-in', {
        accepts: SECAM_ONLY,
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
      shows('av-rgb-picture', 'Shows RGB on PERITEL', 'av-rgb-in', {
        accepts: [
          { scans: LINES_625, colours: ['rgb'], volts: ['rgb-select'] },
          {
            scans: LINES_525,
            colours: ['rgb'],
            volts: ['rgb-select'],
            outcome: 'reduced-height',
          },
        ],
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
    ],
    mains: mains230(75),
    display: tube(DEFLECTION_50_60, 'mono'),
    weightGrams: 15000,
  }),

  /** Its 21-pin socket gives RGB without the voltage that switches a set to it. */
  'mistrand-mc-9': device({
    maker: 'Mistrand',
    name: 'MC-9',
    kind: 'computer',
    market: '625-l',
    aliases: ['MC9', 'home computer'],
    year: 1984,
    back: [
      [
        scart('rgb', 'PERITEL', { gives: ['rgb'] }),
        compositeOut('video-out', 'VIDEO'),
        monoOut('sound-out', 'SON'),
        rfOut('rf-out', 'UHF', 'iec-plug'),
        packSocket('9 V'),
      ],
    ],
    controls: [
      choice('system', 'SYSTEM', 'standard', { positions: { l: 'L', k: 'K' }, access: 'back' }),
    ],
    functions: [
      plays('program', 'Runs programs', [
        gives('rgb-rgb-out', [picture('312p50', 'rgb')]),
        gives('video-out', [picture('312p50', 'secam')]),
        sounds('sound-out', 'mono'),
        gives('rf-out', [picture('312p50', 'secam')], {
          sound: 'mono',
          rf: [
            carrier('L', {
              levelDbmv: 6,
              fixed: { plan: 'france', names: '36' },
              while: at('system', 'l'),
            }),
            carrier('K', {
              levelDbmv: 6,
              fixed: { plan: 'oirt-east-europe', names: '36' },
              while: at('system', 'k'),
            }),
          ],
        }),
      ]),
    ],
    pack: dcPack(9, 900, 'centre-negative'),
    weightGrams: 1500,
  }),

  /** Five volts on the aerial lead feed the maker's own switch at the set. */
  'varnhope-gx-au': device({
    maker: 'Varnhope',
    name: 'GX',
    kind: 'console',
    market: '625-australia',
    aliases: ['Varnhope Games'],
    year: 1983,
    back: [
      [
        rfOut('rf-out', 'RF', 'iec-plug', {
          suppliesDcVolts: 5,
          mount: 'lead',
          note: 'Fixed lead, 2 m.',
        }),
        packSocket('9 V'),
      ],
    ],
    controls: [channelSwitch({ plan: 'australia', names: '0,1' })],
    functions: [
      plays('cartridge', 'Plays cartridges', [
        gives('rf-out', [picture('312p50', 'pal')], {
          sound: 'mono',
          rf: [carrier('B', { levelDbmv: 6 })],
        }),
      ]),
    ],
    pack: dcPack(9, 600),
    weightGrams: 1300,
  }),

  /** A lead with the Japanese 21-pin plug is fixed to it: the body of a SCART plug with other pins. */
  'oakhithe-gs-8': device({
    maker: 'Oakhithe',
    name: 'GS-8',
    kind: 'console',
    market: '525-japan',
    aliases: ['GS8'],
    year: 1988,
    back: [
      [
        {
          ports: [
            port(
              'rgb-lead',
              'RGB',
              [...(['r', 'g', 'b', 'csync'] as const)].map((c) => one(c, 'out')),
              { connector: 'jp21-plug', mount: 'lead', note: 'Fixed lead, 1.8 m.' },
            ),
          ],
          jacks: [jack('rgb-out', 'rgbs', 'out', onPort('rgb-lead', ['r', 'g', 'b', 'csync']))],
        },
        rfOut('rf-out', 'RF', 'phono-socket'),
        packSocket('10 V'),
      ],
    ],
    controls: [channelSwitch({ plan: 'japan-broadcast', names: '1,2' })],
    functions: [
      plays('cartridge', 'Plays cartridges', [
        gives('rgb-out', [picture('262p60', 'rgb')]),
        gives('rf-out', [picture('262p60', 'ntsc-j')], {
          sound: 'mono',
          rf: [carrier('M', { levelDbmv: 5 })],
        }),
      ]),
    ],
    pack: dcPack(10, 850, 'centre-negative'),
    weightGrams: 1100,
  }),

  /** One computer for a television and for a monitor, by a switch at the back. */
  'mistrand-md-16': device({
    maker: 'Mistrand',
    name: 'MD-16',
    kind: 'computer',
    market: '625-i',
    aliases: ['MD16', 'desktop computer'],
    year: 1990,
    factSource: 'manual',
    back: [
      [
        {
          ports: [
            port(
              'monitor-out',
              'MONITOR',
              [...(['r', 'g', 'b', 'hsync', 'vsync'] as const)].map((c) => one(c, 'out')),
              { connector: 'hd15-socket', impedanceOhm: 75 },
            ),
          ],
          jacks: [
            jack(
              'rgb-out',
              'rgbhv',
              'out',
              onPort('monitor-out', ['r', 'g', 'b', 'hsync', 'vsync']),
            ),
          ],
        },
        compositeOut('video-out', 'VIDEO'),
        monoOut('sound-out', 'AUDIO'),
      ],
    ],
    controls: [
      choice('rate', 'RATE', 'scan', {
        positions: { 'tv-50': 'TV 50', 'tv-60': 'TV 60', monitor: 'MONITOR' },
        access: 'back',
      }),
    ],
    functions: [
      plays('program', 'Runs programs', [
        gives('rgb-out', [
          picture('vga-31k-60', 'rgb', at('rate', 'monitor')),
          picture('625i50', 'rgb', at('rate', 'tv-50')),
          picture('525i60', 'rgb', at('rate', 'tv-60')),
        ]),
        gives('video-out', [
          picture('312p50', 'pal', at('rate', 'tv-50')),
          picture('262p60', 'pal-60', at('rate', 'tv-60')),
        ]),
        sounds('sound-out', 'mono'),
      ]),
    ],
    mains: mains230(90),
    weightGrams: 8200,
  }),
}
