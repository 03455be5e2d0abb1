import {
  type Fitting,
  THREE_FOUR,
  at,
  carrier,
  channelSwitch,
  choice,
  compositeOut,
  dcPack,
  device,
  dinOut,
  gives,
  hd15Out,
  mains120,
  mainsAny,
  miniJackOut,
  monoOut,
  one,
  packSocket,
  picture,
  plays,
  port,
  rfOut,
  sVideoOut,
  sounds,
  ttlOut,
} from '@coaxwain/models/build'

/** Sound that is data: it is drawn and named, and offered to no hookup. */
const tapeSocket: Fitting = {
  ports: [port('tape', 'TAPE', [one('audio-mono', 'either')], { connector: 'jack35-socket' })],
  jacks: [],
}

export const COMPUTERS = {
  'mistrand-mc-8': device({
    maker: 'Mistrand',
    name: 'MC-8',
    kind: 'computer',
    market: '525-m',
    aliases: ['MC8', 'home computer'],
    year: 1983,
    back: [
      [
        dinOut('av', 'MONITOR', 'din5-socket', [
          { key: 'av-composite', form: 'composite', circuits: ['cvbs'] },
          { key: 'av-sound', form: 'sound', circuits: ['audio-mono'] },
        ]),
        rfOut('rf-out', 'TV', 'phono-socket'),
        tapeSocket,
        packSocket('9 V'),
      ],
    ],
    controls: [channelSwitch(THREE_FOUR)],
    functions: [
      plays('program', 'Runs programs', [
        gives('av-composite', [picture('262p60', 'ntsc-m')]),
        sounds('av-sound', 'mono'),
        gives('rf-out', [picture('262p60', 'ntsc-m')], {
          sound: 'mono',
          rf: [carrier('M', { levelDbmv: 5 })],
        }),
      ]),
    ],
    pack: { current: 'ac', volts: 9, milliamps: 1000, plug: '5.5 x 2.1 mm' },
    weightGrams: 1500,
  }),

  'mistrand-mc-16': device({
    maker: 'Mistrand',
    name: 'MC-16',
    kind: 'computer',
    market: '625-i',
    aliases: ['MC16', 'home computer'],
    year: 1986,
    factSource: 'manual',
    back: [
      [
        dinOut('rgb', 'RGB', 'din6-socket', [
          { key: 'rgb-out', form: 'rgbs', circuits: ['r', 'g', 'b', 'csync'] },
        ]),
        compositeOut('video-out', 'VIDEO'),
        rfOut('rf-out', 'UHF', 'phono-socket'),
        tapeSocket,
        packSocket('12 V'),
      ],
    ],
    functions: [
      plays('program', 'Runs programs', [
        gives('rgb-out', [picture('312p50', 'rgb')]),
        gives('video-out', [picture('312p50', 'pal')]),
        gives('rf-out', [picture('312p50', 'pal')], {
          sound: 'mono',
          rf: [carrier('I', { levelDbmv: 6, fixed: { plan: 'uk-uhf', names: '36' } })],
        }),
      ]),
    ],
    pack: dcPack(12, 1200),
    weightGrams: 1700,
  }),

  'mistrand-md-1': device({
    maker: 'Mistrand',
    name: 'MD-1',
    kind: 'computer',
    market: '525-m',
    aliases: ['MD1', 'desktop computer'],
    year: 1984,
    back: [[ttlOut('rgbi-out', 'RGB'), compositeOut('video-out', 'COMP')]],
    functions: [
      plays('program', 'Runs programs', [
        gives('rgbi-out', [picture('cga-15k7', 'rgbi')]),
        gives('video-out', [picture('262p60', 'ntsc-m')]),
      ]),
    ],
    mains: mains120(65),
    weightGrams: 11500,
  }),

  'mistrand-md-4': device({
    maker: 'Mistrand',
    name: 'MD-4',
    kind: 'computer',
    market: 'any',
    aliases: ['MD4', 'desktop computer'],
    year: 1992,
    factSource: 'manual',
    back: [
      [hd15Out('monitor-out', 'MONITOR'), miniJackOut('line-out', 'LINE OUT', 'stereo', 'line')],
    ],
    controls: [
      choice('screen-mode', 'Screen mode', 'scan', {
        positions: { text: 'text, 70 Hz', graphics: 'graphics, 60 Hz' },
        access: 'menu',
      }),
    ],
    functions: [
      plays('program', 'Runs programs', [
        gives('monitor-out', [
          picture('vga-31k-70', 'rgb', at('screen-mode', 'text')),
          picture('vga-31k-60', 'rgb', at('screen-mode', 'graphics')),
        ]),
        sounds('line-out', 'stereo'),
      ]),
    ],
    mains: mainsAny(120),
    weightGrams: 9000,
  }),

  'brindlow-hc-8': device({
    maker: 'Brindlow',
    name: 'HC-8',
    kind: 'camera',
    market: '525-m',
    aliases: ['HC8', 'camera recorder'],
    year: 1995,
    side: [
      [
        compositeOut('video-out', 'VIDEO'),
        sVideoOut('s-video-out', 'S-VIDEO'),
        monoOut('sound-out', 'AUDIO'),
        packSocket('7.5 V'),
      ],
    ],
    controls: [
      choice('way', 'CAMERA/TAPE', 'mode', {
        positions: { camera: 'CAMERA', tape: 'TAPE' },
        access: 'back',
      }),
    ],
    functions: (['tape', 'camera'] as const).map((way) =>
      plays(
        way,
        way === 'tape' ? 'Plays tapes' : 'Shows what it sees',
        [
          gives('video-out', [picture('525i60', 'ntsc-m')]),
          gives('s-video-out', [picture('525i60', 'ntsc-m')]),
          sounds('sound-out', 'mono'),
        ],
        { while: at('way', way), bandwidthMhz: 4.5 },
      ),
    ),
    pack: dcPack(7.5, 1500),
    weightGrams: 980,
  }),
}
