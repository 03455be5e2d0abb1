import type { DeviceModel } from '@coaxwain/models'
import {
  at,
  componentIn,
  componentOut,
  compositeIn,
  compositeOut,
  gives,
  LINES_15K,
  plainColour,
  SAME,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  sVideoOut,
  turns,
} from '@coaxwain/models/build'
import { ANY_ENCODED, box, madeAnew, outStandard } from './box'

/** Between colour standards, and between analogue forms of a picture. */
export const STANDARD_BOXES = {
  'standards-converter': box({
    name: 'standards converter',
    kind: 'standards-converter',
    back: [[compositeIn('video-in', 'IN'), compositeOut('video-out', 'OUT')]],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'video-in', {
        gives: [gives('video-out', madeAnew())],
        accepts: ANY_ENCODED,
        storesFields: true,
        delayMs: 40,
      }),
    ],
  }),
  'colour-transcoder': box({
    name: 'colour transcoder',
    kind: 'transcoder',
    back: [[compositeIn('video-in', 'IN'), compositeOut('video-out', 'OUT')]],
    controls: [outStandard],
    functions: [
      turns('recolour', 'converts-colour', 'video-in', {
        gives: [
          gives('video-out', [
            { scan: 'same', colour: 'ntsc-m', while: at('standard', 'ntsc') },
            { scan: 'same', colour: 'pal', while: at('standard', 'pal') },
          ]),
        ],
        accepts: ANY_ENCODED,
        separator: 'notch',
      }),
    ],
  }),
  'comb-filter': box({
    name: 'comb-filter box, composite to S-Video',
    kind: 'transcoder',
    back: [[compositeIn('video-in', 'VIDEO IN'), sVideoOut('s-video-out', 'S-VIDEO OUT')]],
    functions: [
      turns('separate', 'converts-form', 'video-in', {
        gives: [gives('s-video-out', SAME)],
        accepts: ANY_ENCODED,
        separator: 'comb',
      }),
    ],
  }),
  'rgb-encoder': box({
    name: 'RGB encoder, 21-pin to composite',
    kind: 'transcoder',
    back: [
      [
        scart('rgb', 'RGB IN', { takes: ['rgb', 'sound'] }),
        scart('av', 'AV OUT', { gives: ['composite', 'sound'] }),
        compositeOut('video-out', 'VIDEO'),
        sVideoOut('s-video-out', 'S-VIDEO'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('encode', 'converts-form', 'rgb-rgb-in', {
        sound: 'rgb-sound-in',
        gives: [
          ...(['av-composite-out', 'video-out', 's-video-out'] as const).map((jack) =>
            gives(jack, [
              { scan: 'same', colour: 'ntsc-m', while: at('standard', 'ntsc') },
              { scan: 'same', colour: 'pal', while: at('standard', 'pal') },
            ]),
          ),
          sounds('av-sound-out', 'same'),
          sounds('sound-out', 'same'),
        ],
        accepts: plainColour('rgb', LINES_15K),
      }),
    ],
  }),
  'rgb-to-component': box({
    name: 'RGB to component transcoder',
    kind: 'transcoder',
    back: [
      [
        scart('rgb', 'RGB IN', { takes: ['rgb', 'sound'] }),
        componentOut('component'),
        stereoOut('sound-out'),
      ],
    ],
    functions: [
      turns('transcode', 'converts-form', 'rgb-rgb-in', {
        sound: 'rgb-sound-in',
        gives: [
          gives('component', [{ scan: 'same', colour: 'ypbpr' }]),
          sounds('sound-out', 'same'),
        ],
        accepts: plainColour('rgb', LINES_15K),
      }),
    ],
  }),
  'component-to-rgb': box({
    name: 'component to RGB transcoder',
    kind: 'transcoder',
    back: [
      [
        componentIn('component'),
        stereoIn('sound-in'),
        scart('rgb', 'RGB OUT', { gives: ['rgb', 'sound'] }),
      ],
    ],
    functions: [
      turns('transcode', 'converts-form', 'component', {
        sound: 'sound-in',
        gives: [
          gives('rgb-rgb-out', [{ scan: 'same', colour: 'rgb' }], {
            volts: ['av-select', 'rgb-select'],
          }),
          sounds('rgb-sound-out', 'same'),
        ],
        accepts: plainColour('ypbpr', LINES_15K),
      }),
    ],
  }),
} satisfies Record<string, DeviceModel>
