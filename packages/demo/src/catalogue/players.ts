import {
  THREE_FOUR,
  at,
  carrier,
  channelSwitch,
  choice,
  coaxialSoundOut,
  componentOut,
  compositeOut,
  device,
  gives,
  group,
  mains120,
  mains230,
  opticalOut,
  passes,
  picture,
  plays,
  rfIn,
  rfOut,
  sVideoOut,
  scart,
  shaped,
  sounds,
  stereoOut,
  whenOff,
} from '@coaxwain/models/build'

const shapeMenu = choice('tv-shape', 'TV shape', 'shape', {
  positions: { wide: '16:9', letterbox: '4:3 letterbox', 'pan-scan': '4:3 pan and scan' },
  access: 'menu',
  reset: 'wide',
})

/** Discs of both rasters on a 625-line player: 60 Hz ones leave with their colour on 4.43 MHz. */
const encoded625 = [...shaped('625i50', 'pal'), ...shaped('525i60', 'pal-60')]
const rgb625 = [...shaped('625i50', 'rgb'), ...shaped('525i60', 'rgb')]

export const PLAYERS = {
  'tarnbeck-dp-62': device({
    maker: 'Tarnbeck',
    name: 'DP-62',
    kind: 'disc-player',
    market: '525-m',
    aliases: ['DP62', 'DP-62S'],
    year: 2002,
    factSource: 'manual',
    back: [
      [
        group('DIGITAL OUT', opticalOut('optical'), coaxialSoundOut('coaxial')),
        group(
          'COMPONENT OUT',
          componentOut('component', {
            label: 'interlaced',
            also: { key: 'component-progressive', label: 'progressive' },
          }),
        ),
      ],
      [
        group('AUDIO OUT', stereoOut('sound-out')),
        group('VIDEO OUT', compositeOut('video-out', 'VIDEO'), sVideoOut('s-video-out', 'S-VIDEO')),
      ],
    ],
    controls: [
      shapeMenu,
      choice('progressive', 'Progressive', 'scan', {
        positions: ['off', 'on'],
        access: 'menu',
        reset: 'off',
      }),
      choice('digital-sound', 'Digital sound', 'mode', {
        positions: { 'two-channels': 'two channels', bitstream: 'bitstream' },
        access: 'menu',
        reset: 'bitstream',
      }),
    ],
    functions: [
      plays('disc', 'Plays discs', [
        gives('video-out', shaped('525i60', 'ntsc-m')),
        gives('s-video-out', shaped('525i60', 'ntsc-m')),
        gives('component', shaped('525i60', 'ypbpr'), { while: at('progressive', 'off') }),
        gives('component-progressive', shaped('525p60', 'ypbpr'), {
          while: at('progressive', 'on'),
        }),
        sounds('sound-out', 'stereo'),
        sounds('optical', 'stereo', at('digital-sound', 'two-channels')),
        sounds('coaxial', 'stereo', at('digital-sound', 'two-channels')),
      ]),
    ],
    remote: 'needed',
    mains: mains120(14),
    weightGrams: 2600,
  }),

  'selvane-dp-7': device({
    maker: 'Selvane',
    name: 'DP-7',
    kind: 'disc-player',
    market: '525-m',
    aliases: ['DP7'],
    year: 2006,
    back: [[group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out'))]],
    controls: [shapeMenu],
    functions: [
      plays('disc', 'Plays discs', [
        gives('video-out', shaped('525i60', 'ntsc-m')),
        sounds('sound-out', 'stereo'),
      ]),
    ],
    remote: 'needed',
    mains: mains120(9),
    weightGrams: 1400,
  }),

  'tarnbeck-ld-8': device({
    maker: 'Tarnbeck',
    name: 'LD-8',
    kind: 'disc-player',
    market: '525-m',
    aliases: ['LD8', 'large-disc player'],
    year: 1989,
    factSource: 'manual',
    back: [
      [
        group('VIDEO OUT', compositeOut('video-out', 'VIDEO'), sVideoOut('s-video-out', 'S-VIDEO')),
        group('AUDIO OUT', stereoOut('sound-out')),
        opticalOut('optical', 'DIGITAL'),
        rfOut('rf-out', 'RF OUT', 'f-socket'),
      ],
    ],
    controls: [channelSwitch(THREE_FOUR)],
    functions: [
      plays(
        'disc',
        'Plays large discs',
        [
          gives('video-out', [picture('525i60', 'ntsc-m')]),
          gives('s-video-out', [picture('525i60', 'ntsc-m')]),
          sounds('sound-out', 'stereo'),
          sounds('optical', 'stereo'),
          gives('rf-out', [picture('525i60', 'ntsc-m')], {
            sound: 'mono',
            rf: [carrier('M', { levelDbmv: 6 })],
          }),
        ],
        { bandwidthMhz: 5.3 },
      ),
    ],
    remote: 'optional',
    mains: mains120(45),
    weightGrams: 9800,
  }),

  'brindlow-cx-1': device({
    maker: 'Brindlow',
    name: 'CX-1',
    kind: 'disc-player',
    market: '525-m',
    aliases: ['needle-disc player'],
    year: 1982,
    back: [
      [group('AERIAL', rfIn('ant-in', 'ANT IN', 'f-socket'), rfOut('to-tv', 'TO TV', 'f-socket'))],
    ],
    controls: [channelSwitch(THREE_FOUR)],
    functions: [
      plays(
        'disc',
        'Plays needle discs',
        [
          gives('to-tv', [picture('525i60', 'ntsc-m')], {
            sound: 'mono',
            rf: [carrier('M', { levelDbmv: 5 })],
          }),
        ],
        { bandwidthMhz: 3 },
      ),
      passes('aerial-loop', 'loop-through', 'ant-in', { to: ['to-tv'], while: whenOff() }),
    ],
    leaks: [{ from: 'to-tv', to: 'ant-in', db: 61 }],
    mains: mains120(35),
    weightGrams: 7400,
  }),

  'fennock-dv-410': device({
    maker: 'Fennock',
    name: 'DV-410',
    kind: 'disc-player',
    market: '625-i',
    aliases: ['DV410'],
    year: 2003,
    factSource: 'manual',
    back: [
      [
        scart('av', 'AV OUT', { gives: ['composite', 'rgb', 'sound'] }),
        group('VIDEO OUT', compositeOut('video-out', 'VIDEO'), sVideoOut('s-video-out', 'S-VIDEO')),
        group('AUDIO OUT', stereoOut('sound-out')),
        opticalOut('optical'),
      ],
    ],
    controls: [
      shapeMenu,
      choice('av-form', 'AV OUT', 'mode', {
        positions: { composite: 'VIDEO', rgb: 'RGB' },
        access: 'menu',
        reset: 'composite',
      }),
    ],
    functions: [
      plays('disc', 'Plays discs', [
        gives('av-composite-out', encoded625, {
          volts: ['av-select'],
          while: at('av-form', 'composite'),
        }),
        gives('av-rgb-out', rgb625, {
          volts: ['av-select', 'rgb-select'],
          while: at('av-form', 'rgb'),
        }),
        sounds('av-sound-out', 'stereo'),
        gives('video-out', encoded625),
        gives('s-video-out', encoded625),
        sounds('sound-out', 'stereo'),
        sounds('optical', 'stereo'),
      ]),
    ],
    remote: 'needed',
    mains: mains230(15),
    weightGrams: 2400,
  }),

  'fennock-dv-200': device({
    maker: 'Fennock',
    name: 'DV-200',
    kind: 'disc-player',
    market: '625-i',
    aliases: ['DV200'],
    year: 2005,
    back: [
      [
        scart('av', 'AV OUT', { gives: ['composite', 'sound'] }),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
      ],
    ],
    controls: [shapeMenu],
    functions: [
      plays('disc', 'Plays discs', [
        gives('av-composite-out', encoded625, { volts: ['av-select'] }),
        sounds('av-sound-out', 'stereo'),
        gives('video-out', encoded625),
        sounds('sound-out', 'stereo'),
      ]),
    ],
    remote: 'needed',
    mains: mains230(10),
    weightGrams: 1500,
  }),
}
