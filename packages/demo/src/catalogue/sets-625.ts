import {
  DEFLECTION_50,
  DEFLECTION_50_60,
  LINES_15K,
  LINES_525,
  PAL_60_SET,
  PAL_SET,
  at,
  compositeIn,
  dcPack,
  device,
  group,
  heardOn,
  inputChoice,
  mains230,
  miniJackOut,
  packSocket,
  rfIn,
  sVideoIn,
  scart,
  shows,
  sounds,
  stereoIn,
  trim,
  tube,
  tuner,
  turns,
  whip,
} from '@coaxwain/models/build'
import type { AcceptRow } from '@coaxwain/models'

const UHF_I = [{ plan: 'uk-uhf', names: '21..69' }] as const
const VHF_UHF_BG = [
  { plan: 'ccir-west-europe', names: 'E2..E4' },
  { plan: 'ccir-west-europe', names: 'E5..E12' },
  { plan: 'ccir-west-europe', names: '21..69' },
] as const

/** RGB is shown only while the source puts its voltage on the blanking pin (IEC 60933-1, pin 16). */
const RGB_21: readonly AcceptRow[] = [{ scans: LINES_15K, colours: ['rgb'], volts: ['rgb-select'] }]

/** A 50 Hz tube whose hold control reaches 60 Hz: steady, but not as high as it should be. */
const HELD_60: readonly AcceptRow[] = [
  ...PAL_SET,
  { scans: LINES_525, colours: ['pal-60'], outcome: 'reduced-height' },
]

const PORTABLE_BG = heardOn(PAL_SET, ['B', 'G'], ['I', 'D', 'K'])

export const SETS_625 = {
  'lindrake-ce-21': device({
    maker: 'Lindrake',
    name: 'CE-21',
    kind: 'television',
    market: '625-bg',
    aliases: ['CE21', 'colour television'],
    year: 1996,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial', 'ANTENNE', 'iec-socket'),
        scart('av-1', 'AV 1', { takes: ['composite', 'rgb', 'sound'] }),
        scart('av-2', 'AV 2', { takes: ['composite', 's-video', 'sound'] }),
      ],
    ],
    controls: [
      inputChoice({ tv: 'TV', 'av-1': 'AV 1', 'av-2': 'AV 2', 'av-2-s': 'AV 2 S' }),
      tuner('channel', 'PROGRAMME', 'search', { reaches: VHF_UHF_BG }),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: heardOn(PAL_60_SET, ['B', 'G'], ['I', 'D', 'K']),
        while: at('input', 'tv'),
        tunedBy: 'channel',
      }),
      shows('av-1-picture', 'Shows AV 1', 'av-1-composite-in', {
        accepts: PAL_60_SET,
        while: at('input', 'av-1'),
        sound: 'av-1-sound-in',
      }),
      shows('av-1-rgb-picture', 'Shows RGB on AV 1', 'av-1-rgb-in', {
        accepts: RGB_21,
        while: at('input', 'av-1'),
        sound: 'av-1-sound-in',
      }),
      shows('av-2-picture', 'Shows AV 2', 'av-2-composite-in', {
        accepts: PAL_60_SET,
        while: at('input', 'av-2'),
        sound: 'av-2-sound-in',
      }),
      shows('av-2-s-picture', 'Shows S-Video on AV 2', 'av-2-s-video-in', {
        accepts: PAL_60_SET,
        while: at('input', 'av-2-s'),
        sound: 'av-2-sound-in',
      }),
    ],
    remote: 'optional',
    mains: mains230(70),
    display: tube(DEFLECTION_50_60, 'stereo'),
    weightGrams: 22000,
  }),

  'fennock-s-25': device({
    maker: 'Fennock',
    name: 'S-25',
    kind: 'television',
    market: '625-i',
    aliases: ['S25', 'colour television'],
    year: 1998,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial', 'AERIAL', 'iec-socket'),
        scart('av', 'AV 1', { takes: ['composite', 'rgb', 'sound'] }),
      ],
    ],
    front: [
      [
        group(
          'AV 2',
          sVideoIn('s-video-in', 'S-VIDEO'),
          compositeIn('video-in', 'VIDEO'),
          stereoIn('sound-in', ['L/MONO', 'R']),
        ),
      ],
    ],
    controls: [
      inputChoice({ tv: 'TV', av: 'AV 1', 'av-2': 'AV 2', 's-video': 'AV 2 S' }),
      tuner('channel', 'PROGRAMME', 'search', { reaches: UHF_I }),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: heardOn(PAL_60_SET, ['I'], ['B', 'G']),
        while: at('input', 'tv'),
        tunedBy: 'channel',
      }),
      shows('av-picture', 'Shows AV 1', 'av-composite-in', {
        accepts: PAL_60_SET,
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
      shows('av-rgb-picture', 'Shows RGB on AV 1', 'av-rgb-in', {
        accepts: RGB_21,
        while: at('input', 'av'),
        sound: 'av-sound-in',
      }),
      shows('front-picture', 'Shows AV 2', 'video-in', {
        accepts: PAL_60_SET,
        while: at('input', 'av-2'),
        sound: 'sound-in',
        soundAbsent: 'left-on-both',
      }),
      shows('s-video-picture', 'Shows S-Video on AV 2', 's-video-in', {
        accepts: PAL_60_SET,
        while: at('input', 's-video'),
        sound: 'sound-in',
        soundAbsent: 'left-on-both',
      }),
    ],
    remote: 'optional',
    mains: mains230(95),
    display: tube(DEFLECTION_50_60, 'stereo'),
    weightGrams: 31000,
  }),

  'fennock-u-17': device({
    maker: 'Fennock',
    name: 'U-17',
    kind: 'television',
    market: '625-i',
    aliases: ['U17', 'colour television'],
    year: 1981,
    back: [[rfIn('aerial', 'AERIAL', 'iec-socket')]],
    controls: [
      tuner('channel', 'PRESET', 'presets', { reaches: UHF_I }),
      trim('v-hold', 'V HOLD', 'vertical-hold', 'back'),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: heardOn(HELD_60, ['I'], ['G']),
        tunedBy: 'channel',
      }),
    ],
    mains: mains230(85),
    display: tube(DEFLECTION_50_60, 'mono'),
    weightGrams: 18500,
  }),

  'quillmark-qb-5': device({
    maker: 'Quillmark',
    name: 'QB-5',
    kind: 'television',
    market: '625-bg',
    aliases: ['QB5', 'portable television'],
    year: 1987,
    back: [
      [
        whip('whip'),
        rfIn('aerial', 'EXT', 'iec-socket'),
        miniJackOut('earphone', 'EARPHONE', 'mono', 'headphone'),
        packSocket('12 V'),
      ],
    ],
    controls: [tuner('channel', 'TUNING', 'knob', { reaches: VHF_UHF_BG })],
    functions: [
      shows('aerial-picture', 'Shows EXT', 'aerial', { accepts: PORTABLE_BG, tunedBy: 'channel' }),
      shows('whip-picture', 'Shows the whip', 'whip', { accepts: PORTABLE_BG, tunedBy: 'channel' }),
      turns('earphone-sound', 'tunes', 'aerial', {
        label: 'Feeds the earphone',
        gives: [sounds('earphone', 'mono')],
        accepts: PORTABLE_BG,
        tunedBy: 'channel',
      }),
    ],
    mains: mains230(35),
    pack: dcPack(12, 2000),
    display: tube(DEFLECTION_50, 'mono'),
    weightGrams: 4800,
  }),
}
