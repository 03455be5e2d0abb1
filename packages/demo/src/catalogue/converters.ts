import {
  LINES_525,
  LINES_625,
  NTSC,
  SIXTY_443,
  at,
  choice,
  compositeIn,
  compositeOut,
  dcPack,
  device,
  gives,
  group,
  hd15In,
  hd15Out,
  hdmiIn,
  inputChoice,
  packSocket,
  picture,
  plainColour,
  sVideoIn,
  sVideoOut,
  sounds,
  stereoIn,
  stereoOut,
  turns,
} from '@coaxwain/models/build'

const outStandard = choice('standard', 'NTSC/PAL', 'standard', {
  positions: { ntsc: 'NTSC', pal: 'PAL' },
  access: 'back',
})

const madeAnew = [
  { ...picture('525i60', 'ntsc-m', at('standard', 'ntsc')), converts: true },
  { ...picture('625i50', 'pal', at('standard', 'pal')), converts: true },
]

/** Boxes that make lines and fields anew. */
export const CONVERTERS = {
  'jorvane-ld-31': device({
    maker: 'Jorvane',
    name: 'LD-31',
    kind: 'scan-converter',
    market: '525-m',
    aliases: ['LD31', 'line doubler'],
    year: 1998,
    factSource: 'manual',
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), sVideoIn('s-video-in', 'S-VIDEO')),
        hd15Out('rgb-out', 'RGB OUT'),
        packSocket('12 V'),
      ],
    ],
    controls: [inputChoice({ video: 'VIDEO', 's-video': 'S-VIDEO' })],
    functions: (['video', 's-video'] as const).map((input) =>
      turns(`double-${input}`, 'converts-scan', `${input}-in`, {
        gives: [gives('rgb-out', [{ ...picture('525p60', 'rgb'), converts: true }])],
        label: 'Doubles the lines',
        while: at('input', input),
        accepts: [{ scans: ['525i60'], colours: NTSC }],
        separator: 'comb',
        storesFields: true,
        delayMs: 17,
      }),
    ),
    pack: dcPack(12, 800),
    weightGrams: 900,
  }),

  'jorvane-pc-2': device({
    maker: 'Jorvane',
    name: 'PC-2',
    kind: 'scan-converter',
    market: 'any',
    aliases: ['PC2', 'computer to television'],
    year: 1997,
    back: [
      [
        hd15In('pc-in', 'PC IN'),
        group('OUT', compositeOut('video-out', 'VIDEO'), sVideoOut('s-video-out', 'S-VIDEO')),
        packSocket('5 V'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('halve', 'converts-scan', 'pc-in', {
        gives: [gives('video-out', madeAnew), gives('s-video-out', madeAnew)],
        label: 'Makes television of a computer picture',
        accepts: plainColour('rgb', ['vga-31k-60', 'vga-31k-70']),
        storesFields: true,
        delayMs: 33,
      }),
    ],
    pack: dcPack(5, 1000),
    weightGrams: 400,
  }),

  'corbray-sc-10': device({
    maker: 'Corbray',
    name: 'SC-10',
    kind: 'standards-converter',
    market: 'any',
    aliases: ['SC10'],
    year: 1996,
    factSource: 'manual',
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), stereoIn('sound-in')),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        packSocket('12 V'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'video-in', {
        gives: [gives('video-out', madeAnew), sounds('sound-out', 'same')],
        label: 'Changes lines, fields and colour',
        sound: 'sound-in',
        accepts: [
          { scans: LINES_525, colours: [...NTSC, ...SIXTY_443, 'mono'] },
          { scans: LINES_625, colours: ['pal', 'secam', 'mono'] },
        ],
        bandwidthMhz: 4,
        storesFields: true,
        delayMs: 40,
      }),
    ],
    pack: dcPack(12, 1200),
    weightGrams: 1100,
  }),

  'lindrake-hc-1': device({
    maker: 'Lindrake',
    name: 'HC-1',
    kind: 'scan-converter',
    market: 'any',
    aliases: ['HC1', 'HDMI to composite'],
    year: 2013,
    back: [
      [
        hdmiIn('hdmi-in', 'HDMI'),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        packSocket('5 V'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'hdmi-in', {
        gives: [gives('video-out', madeAnew), sounds('sound-out', 'same')],
        label: 'Makes composite of HDMI',
        accepts: plainColour('digital', ['525p60', '625p50', '750p60', '1125i60', '1125p60']),
        hdcp: true,
        storesFields: true,
        delayMs: 40,
      }),
    ],
    pack: dcPack(5, 1000),
    weightGrams: 90,
  }),
}
