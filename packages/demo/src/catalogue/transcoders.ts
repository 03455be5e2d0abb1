import {
  LINES_15K,
  LINES_525,
  NTSC,
  SAME,
  SIXTY_443,
  componentOut,
  compositeIn,
  compositeOut,
  dcPack,
  device,
  gives,
  group,
  packSocket,
  plainColour,
  sVideoOut,
  scart,
  sounds,
  stereoOut,
  turns,
} from '@coaxwain/models/build'

/** Boxes that change the form or the colour of a picture and leave its lines alone. */
export const TRANSCODERS = {
  'hollin-ct-4': device({
    maker: 'Hollin',
    name: 'CT-4',
    kind: 'transcoder',
    market: '525-m',
    aliases: ['CT4', 'colour transcoder'],
    year: 2000,
    back: [[compositeIn('video-in', 'IN'), compositeOut('video-out', 'OUT'), packSocket('9 V')]],
    functions: [
      turns('recolour', 'converts-colour', 'video-in', {
        gives: [gives('video-out', [{ scan: 'same', colour: 'ntsc-m' }])],
        label: 'Moves 4.43 MHz colour to 3.58 MHz',
        accepts: [{ scans: LINES_525, colours: SIXTY_443 }],
        separator: 'notch',
      }),
    ],
    pack: dcPack(9, 300),
    weightGrams: 250,
  }),

  'hollin-rc-2': device({
    maker: 'Hollin',
    name: 'RC-2',
    kind: 'transcoder',
    market: 'any',
    aliases: ['RC2', 'RGB to component'],
    year: 2004,
    factSource: 'manual',
    back: [
      [
        scart('rgb', 'RGB IN', { takes: ['rgb', 'sound'] }),
        group('COMPONENT OUT', componentOut('component')),
        group('AUDIO OUT', stereoOut('sound-out')),
        packSocket('9 V'),
      ],
    ],
    functions: [
      turns('matrix', 'converts-form', 'rgb-rgb-in', {
        gives: [
          gives('component', [{ scan: 'same', colour: 'ypbpr' }]),
          sounds('sound-out', 'same'),
        ],
        label: 'Turns RGB into component',
        sound: 'rgb-sound-in',
        accepts: plainColour('rgb', LINES_15K),
      }),
    ],
    pack: dcPack(9, 200),
    weightGrams: 220,
  }),

  'hollin-yc-1': device({
    maker: 'Hollin',
    name: 'YC-1',
    kind: 'transcoder',
    market: '525-m',
    aliases: ['YC1', 'S-Video separator'],
    year: 1999,
    back: [
      [
        compositeIn('video-in', 'VIDEO IN'),
        sVideoOut('s-video-out', 'S-VIDEO OUT'),
        packSocket('9 V'),
      ],
    ],
    functions: [
      turns('separate', 'converts-form', 'video-in', {
        gives: [gives('s-video-out', SAME)],
        label: 'Separates luma and colour',
        accepts: [{ scans: LINES_525, colours: NTSC }],
        separator: 'comb',
      }),
    ],
    pack: dcPack(9, 250),
    weightGrams: 230,
  }),
}
