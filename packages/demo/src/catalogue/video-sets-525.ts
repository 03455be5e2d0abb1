import {
  DEFLECTION_60,
  LINES_525,
  NTSC_SET,
  OTHERWISE,
  airCable,
  airCableTuner,
  at,
  automatic,
  componentIn,
  compositeIn,
  device,
  digitalOnly,
  every,
  group,
  hdmiIn,
  heardOn,
  inputChoice,
  mains120,
  monoIn,
  plainColour,
  pluggedInto,
  rfIn,
  sVideoIn,
  shows,
  stereoIn,
  tube,
  tuner,
} from '@coaxwain/models/build'

/** A composite picture on a socket where an S-Video plug takes over by itself. */
const sVideoSwitch = automatic('s-video-switch', 'S-VIDEO', [
  ['s-video', 'S-VIDEO', pluggedInto('s-video-in')],
  ['composite', 'VIDEO', OTHERWISE],
])

const videoOne = [
  shows('composite-picture', 'Shows VIDEO 1', 'video-1', {
    accepts: NTSC_SET,
    while: every(at('input', 'video-1'), at('s-video-switch', 'composite')),
    sound: 'sound-1',
    soundAbsent: 'left-on-both',
    separator: 'comb',
  }),
  shows('s-video-picture', 'Shows S-VIDEO', 's-video-in', {
    accepts: NTSC_SET,
    while: every(at('input', 'video-1'), at('s-video-switch', 's-video')),
    sound: 'sound-1',
    soundAbsent: 'left-on-both',
  }),
]

const aerialPicture = shows('aerial-picture', 'Shows the aerial', 'aerial', {
  accepts: heardOn(NTSC_SET, ['M']),
  while: at('input', 'tv'),
  tunedBy: 'channel',
})

/** Sets with video inputs. */
export const VIDEO_SETS_525 = {
  'quillmark-ct-20': device({
    maker: 'Quillmark',
    name: 'CT-20',
    kind: 'television',
    market: '525-m',
    aliases: ['CT20', 'colour television'],
    year: 1997,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial', 'VHF/UHF', 'f-socket'),
        group(
          'VIDEO 1',
          sVideoIn('s-video-in', 'S-VIDEO'),
          compositeIn('video-1', 'VIDEO'),
          stereoIn('sound-1', ['L/MONO', 'R']),
        ),
      ],
    ],
    front: [[group('VIDEO 2', compositeIn('video-2', 'VIDEO'), monoIn('sound-2', 'AUDIO'))]],
    controls: [
      inputChoice({ tv: 'TV', 'video-1': 'VIDEO 1', 'video-2': 'VIDEO 2' }),
      sVideoSwitch,
      airCable(),
      airCableTuner('channel'),
    ],
    functions: [
      aerialPicture,
      ...videoOne,
      shows('front-picture', 'Shows VIDEO 2', 'video-2', {
        accepts: NTSC_SET,
        while: at('input', 'video-2'),
        sound: 'sound-2',
        separator: 'comb',
      }),
    ],
    remote: 'optional',
    mains: mains120(75),
    display: tube(DEFLECTION_60, 'stereo'),
    weightGrams: 20500,
  }),

  'quillmark-ct-27': device({
    maker: 'Quillmark',
    name: 'CT-27',
    kind: 'television',
    market: '525-m',
    aliases: ['CT27', 'colour television'],
    year: 2001,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial', 'VHF/UHF', 'f-socket'),
        group(
          'VIDEO 1',
          sVideoIn('s-video-in', 'S-VIDEO'),
          compositeIn('video-1', 'VIDEO'),
          stereoIn('sound-1', ['L/MONO', 'R']),
        ),
      ],
      [group('COMPONENT', componentIn('component'), stereoIn('sound-component'))],
    ],
    controls: [
      inputChoice({ tv: 'TV', 'video-1': 'VIDEO 1', component: 'COMPONENT' }),
      sVideoSwitch,
      airCable(),
      airCableTuner('channel'),
    ],
    functions: [
      aerialPicture,
      ...videoOne,
      shows('component-picture', 'Shows COMPONENT', 'component', {
        accepts: plainColour('ypbpr', LINES_525),
        while: at('input', 'component'),
        sound: 'sound-component',
      }),
    ],
    remote: 'optional',
    mains: mains120(110),
    display: tube(DEFLECTION_60, 'stereo'),
    weightGrams: 38000,
  }),

  'lindrake-fp-32': device({
    maker: 'Lindrake',
    name: 'FP-32',
    kind: 'television',
    market: '525-m',
    aliases: ['FP32', 'flat television'],
    year: 2015,
    back: [
      [
        rfIn('aerial', 'ANT/CABLE', 'f-socket'),
        group('AV', compositeIn('video-in', 'VIDEO'), stereoIn('sound-in')),
        group('COMPONENT', componentIn('component')),
        hdmiIn('hdmi-1', 'HDMI 1'),
        hdmiIn('hdmi-2', 'HDMI 2'),
      ],
    ],
    controls: [
      inputChoice(
        { tv: 'TV', av: 'AV', component: 'COMPONENT', 'hdmi-1': 'HDMI 1', 'hdmi-2': 'HDMI 2' },
        { access: 'remote' },
      ),
      tuner('channel', 'Channel scan', 'search', {
        reaches: [
          { plan: 'us-broadcast', names: '2..69' },
          { plan: 'us-cable-std', names: '2..99' },
        ],
        access: 'menu',
      }),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: digitalOnly(['atsc', 'qam']),
        while: at('input', 'tv'),
        tunedBy: 'channel',
        storesFields: true,
      }),
      shows('composite-picture', 'Shows AV', 'video-in', {
        accepts: [{ scans: ['525i60'], colours: ['ntsc-m', 'ntsc-j'] }],
        while: at('input', 'av'),
        sound: 'sound-in',
        separator: 'comb',
        storesFields: true,
        delayMs: 60,
      }),
      shows('component-picture', 'Shows COMPONENT', 'component', {
        accepts: plainColour('ypbpr', ['525i60', '525p60', '750p60', '1125i60']),
        while: at('input', 'component'),
        sound: 'sound-in',
        storesFields: true,
        delayMs: 60,
      }),
      ...(['hdmi-1', 'hdmi-2'] as const).map((input) =>
        shows(`${input}-picture`, `Shows ${input.toUpperCase().replace('-', ' ')}`, input, {
          accepts: plainColour('digital', ['525p60', '750p60', '1125i60', '1125p60']),
          while: at('input', input),
          hdcp: true,
          storesFields: true,
          delayMs: 40,
        }),
      ),
    ],
    remote: 'needed',
    mains: mains120(60),
    display: {
      screen: 'flat',
      deflection: {
        lineKhz: [
          [15.625, 15.734],
          [31.4, 31.5],
          [33.7, 33.8],
          [44.9, 45.1],
          [67.4, 67.6],
        ],
        fieldHz: [[59, 61]],
        fixed: false,
      },
      shape: '16:9',
      loudspeakers: 'stereo',
      storesFields: true,
      convertsScan: true,
      directView: false,
    },
    weightGrams: 6200,
  }),
}
