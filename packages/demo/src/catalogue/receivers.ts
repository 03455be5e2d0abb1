import {
  NTSC_LINE,
  SAME,
  THREE_FOUR,
  airCable,
  airCableTuner,
  at,
  carrier,
  channelSwitch,
  choice,
  compositeOut,
  dcPack,
  device,
  digitalOnly,
  gives,
  group,
  hdmiOut,
  heardOn,
  mains120,
  mainsAny,
  opticalOut,
  packSocket,
  passes,
  picture,
  plays,
  rfIn,
  rfOut,
  scart,
  shaped,
  sounds,
  stereoOut,
  tuner,
  turns,
  whenOff,
} from '@coaxwain/models/build'

const programme525 = [
  gives('video-out', shaped('525i60', 'ntsc-m')),
  sounds('sound-out', 'stereo'),
  gives('to-tv', shaped('525i60', 'ntsc-m'), {
    sound: 'mono',
    rf: [carrier('M', { levelDbmv: 6 })],
  }),
]

const programme625 = [
  gives('tv-composite-out', [picture('625i50', 'pal')], {
    volts: ['av-select'],
    while: at('av-form', 'composite'),
  }),
  gives('tv-rgb-out', [picture('625i50', 'rgb')], {
    volts: ['av-select', 'rgb-select'],
    while: at('av-form', 'rgb'),
  }),
  sounds('tv-sound-out', 'stereo'),
  gives('rec-composite-out', [picture('625i50', 'pal')]),
  sounds('rec-sound-out', 'stereo'),
  gives('hdmi-out', [picture('625p50', 'digital')], { sound: 'stereo' }),
]

/** Boxes that receive, and one that fetches its programmes elsewhere. */
export const RECEIVERS = {
  'selvane-cb-3': device({
    maker: 'Selvane',
    name: 'CB-3',
    kind: 'converter-box',
    market: '525-m',
    aliases: ['CB3', 'digital converter'],
    year: 2008,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial-in', 'ANT IN', 'f-socket'),
        rfOut('to-tv', 'TO TV', 'f-socket'),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        packSocket('5 V'),
      ],
    ],
    controls: [
      channelSwitch(THREE_FOUR),
      choice('tv-shape', 'Picture', 'shape', {
        positions: { wide: 'FULL', letterbox: 'LETTERBOX', 'pan-scan': 'CROP' },
        access: 'menu',
        reset: 'letterbox',
      }),
      tuner('tuned-to', 'Channel search', 'search', {
        reaches: [{ plan: 'us-broadcast', names: '2..69' }],
        access: 'menu',
      }),
    ],
    functions: [
      plays('programme', 'Shows digital programmes', programme525),
      turns('receive', 'tunes', 'aerial-in', {
        gives: programme525,
        label: 'Receives digital programmes',
        accepts: digitalOnly(['atsc']),
        tunedBy: 'tuned-to',
      }),
      passes('aerial-loop', 'loop-through', 'aerial-in', {
        to: ['to-tv'],
        label: 'Passes the aerial on',
        while: whenOff(),
        gainDb: -1,
      }),
    ],
    leaks: [{ from: 'to-tv', to: 'aerial-in', db: 64 }],
    remote: 'needed',
    pack: dcPack(5, 1500),
    weightGrams: 420,
  }),

  'jorvane-tc-5': device({
    maker: 'Jorvane',
    name: 'TC-5',
    kind: 'converter-box',
    market: '625-bg',
    aliases: ['TC5', 'digital converter'],
    year: 2007,
    back: [
      [
        group(
          'AERIAL',
          rfIn('aerial-in', 'IN', 'iec-socket'),
          rfOut('aerial-out', 'OUT', 'iec-plug'),
        ),
        scart('tv', 'TV', { gives: ['composite', 'rgb', 'sound'] }),
        scart('rec', 'REC', { gives: ['composite', 'sound'] }),
        hdmiOut('hdmi-out', 'HDMI'),
      ],
    ],
    controls: [
      choice('av-form', 'TV socket', 'mode', {
        positions: { composite: 'VIDEO', rgb: 'RGB' },
        access: 'menu',
        reset: 'composite',
      }),
      tuner('tuned-to', 'Channel search', 'search', {
        reaches: [{ plan: 'ccir-west-europe', names: '21..69' }],
        access: 'menu',
      }),
    ],
    functions: [
      plays('programme', 'Shows digital programmes', programme625),
      turns('receive', 'tunes', 'aerial-in', {
        gives: programme625,
        label: 'Receives digital programmes',
        accepts: digitalOnly(['dvb-t']),
        tunedBy: 'tuned-to',
      }),
      passes('aerial-loop', 'loop-through', 'aerial-in', {
        to: ['aerial-out'],
        label: 'Passes the aerial on',
        power: 'standby',
      }),
    ],
    remote: 'needed',
    mains: mainsAny(12),
    weightGrams: 900,
  }),

  'lindrake-q1': device({
    maker: 'Lindrake',
    name: 'Q1',
    kind: 'streamer',
    market: 'any',
    aliases: ['Q-1', 'media player'],
    year: 2014,
    back: [[hdmiOut('hdmi-out', 'HDMI'), opticalOut('optical'), packSocket('5 V')]],
    controls: [
      choice('resolution', 'Resolution', 'scan', {
        positions: { '525p60': '480p', '750p60': '720p', '1125p60': '1080p' },
        access: 'menu',
        reset: '1125p60',
      }),
    ],
    functions: [
      plays('film', 'Plays films', [
        gives(
          'hdmi-out',
          (['525p60', '750p60', '1125p60'] as const).map((scan) => ({
            ...picture(scan, 'digital', at('resolution', scan)),
            converts: true,
          })),
          { sound: 'stereo' },
        ),
        sounds('optical', 'stereo'),
      ]),
    ],
    remote: 'needed',
    pack: dcPack(5, 2000),
    weightGrams: 180,
  }),

  'pellmere-td-1': device({
    maker: 'Pellmere',
    name: 'TD-1',
    kind: 'tuner',
    market: '525-m',
    aliases: ['TD1', 'cable tuner'],
    year: 1988,
    back: [
      [
        rfIn('cable-in', 'CABLE IN', 'f-socket'),
        rfOut('to-tv', 'TO TV', 'f-socket'),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
      ],
    ],
    controls: [
      channelSwitch(THREE_FOUR),
      airCable({ access: 'back', look: 'slide' }),
      airCableTuner('tuned-to'),
    ],
    functions: [
      turns('receive', 'tunes', 'cable-in', {
        gives: [gives('video-out', SAME), sounds('sound-out', 'mono')],
        label: 'Receives programmes',
        accepts: heardOn(NTSC_LINE, ['M']),
        tunedBy: 'tuned-to',
      }),
      turns('to-channel', 'remodulates', 'cable-in', {
        gives: [gives('to-tv', SAME, { sound: 'mono', rf: [carrier('M', { levelDbmv: 7 })] })],
        label: 'Puts a programme on its own channel',
        accepts: heardOn(NTSC_LINE, ['M']),
        tunedBy: 'tuned-to',
      }),
    ],
    leaks: [{ from: 'to-tv', to: 'cable-in', db: 63 }],
    remote: 'optional',
    mains: mains120(10),
    weightGrams: 1600,
  }),
}
