import {
  THREE_FOUR,
  carrier,
  channelSwitch,
  compositeOut,
  dcPack,
  device,
  gives,
  group,
  mains230,
  miniJackOut,
  monoOut,
  packSocket,
  picture,
  plays,
  rfOut,
  scart,
  sounds,
} from '@coaxwain/models/build'

/** Consoles leave out the half line that would interlace their fields (common practice, no source). */
const GAME_525 = [picture('262p60', 'ntsc-m')]
const GAME_625 = [picture('312p50', 'pal')]

export const CONSOLES = {
  'varnhope-gx': device({
    maker: 'Varnhope',
    name: 'GX',
    kind: 'console',
    market: '525-m',
    aliases: ['Varnhope Games'],
    year: 1981,
    back: [
      [
        rfOut('rf-lead', 'RF', 'phono-plug', { mount: 'lead', note: 'Fixed lead, 2 m.' }),
        miniJackOut('ear', 'EAR', 'mono', 'headphone'),
        packSocket('9 V'),
      ],
    ],
    controls: [channelSwitch(THREE_FOUR)],
    functions: [
      plays('cartridge', 'Plays cartridges', [
        gives('rf-lead', GAME_525, { sound: 'mono', rf: [carrier('M', { levelDbmv: 5 })] }),
        sounds('ear', 'mono'),
      ]),
    ],
    pack: dcPack(9, 500),
    weightGrams: 1300,
  }),

  'oakhithe-gs-16-m': device({
    maker: 'Oakhithe',
    name: 'GS-16',
    kind: 'console',
    market: '525-m',
    aliases: ['GS16'],
    year: 1991,
    back: [
      [
        group('AV OUT', compositeOut('video-out', 'VIDEO'), monoOut('sound-out', 'AUDIO')),
        rfOut('rf-out', 'RF', 'phono-socket'),
        packSocket('10 V'),
      ],
    ],
    controls: [channelSwitch(THREE_FOUR)],
    functions: [
      plays('cartridge', 'Plays cartridges', [
        gives('video-out', GAME_525),
        sounds('sound-out', 'mono'),
        gives('rf-out', GAME_525, { sound: 'mono', rf: [carrier('M', { levelDbmv: 6 })] }),
      ]),
    ],
    pack: dcPack(10, 850, 'centre-negative'),
    weightGrams: 1200,
  }),

  'oakhithe-gs-16-i': device({
    maker: 'Oakhithe',
    name: 'GS-16',
    kind: 'console',
    market: '625-i',
    aliases: ['GS16'],
    year: 1992,
    back: [
      [
        scart('av', 'AV OUT', { gives: ['composite', 'rgb', 'sound'] }),
        rfOut('rf-out', 'RF', 'iec-plug'),
        packSocket('10 V'),
      ],
    ],
    functions: [
      plays('cartridge', 'Plays cartridges', [
        gives('av-composite-out', GAME_625, { volts: ['av-select'] }),
        gives('av-rgb-out', [picture('312p50', 'rgb')], { volts: ['av-select', 'rgb-select'] }),
        sounds('av-sound-out', 'stereo'),
        gives('rf-out', GAME_625, {
          sound: 'mono',
          rf: [carrier('I', { levelDbmv: 7, fixed: { plan: 'uk-uhf', names: '36' } })],
        }),
      ]),
    ],
    pack: dcPack(10, 850, 'centre-negative'),
    weightGrams: 1200,
  }),

  'brindlow-tg-2': device({
    maker: 'Brindlow',
    name: 'TG-2',
    kind: 'console',
    market: '625-bg',
    aliases: ['TG2', 'bat and ball'],
    year: 1978,
    factSource: 'guess',
    back: [[rfOut('rf-lead', 'RF', 'iec-plug', { mount: 'lead', note: 'Fixed lead, 2.5 m.' })]],
    functions: [
      plays('game', 'Plays its built-in games', [
        gives('rf-lead', [picture('312p50', 'mono')], {
          rf: [
            carrier('G', {
              levelDbmv: 6,
              sound: 'none',
              fixed: { plan: 'ccir-west-europe', names: '36' },
            }),
          ],
        }),
      ]),
    ],
    mains: mains230(6),
    weightGrams: 900,
  }),
}
