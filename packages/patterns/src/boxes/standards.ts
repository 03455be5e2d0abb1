import type { DeviceModel } from '@coaxwain/models'
import {
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
  sVideoIn,
  sVideoOut,
  turns,
} from '@coaxwain/models/build'
import {
  ANY_ENCODED,
  box,
  convertedTo,
  ENCODED,
  everyStandard,
  inOwnRaster,
  recoloured,
} from './box'

/** Between colour standards, and between analogue forms of a picture. */
export const STANDARD_BOXES = {
  'standards-converter': box({
    name: 'standards converter',
    kind: 'standards-converter',
    back: [[compositeIn('video-in', 'IN'), compositeOut('video-out', 'OUT')]],
    controls: [everyStandard],
    functions: [
      turns('convert', 'converts-scan', 'video-in', {
        gives: [gives('video-out', convertedTo)],
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
    controls: [everyStandard],
    functions: [
      turns('recolour', 'converts-colour', 'video-in', {
        gives: [gives('video-out', recoloured)],
        accepts: inOwnRaster(ENCODED),
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
    controls: [everyStandard],
    functions: [
      turns('encode', 'converts-form', 'rgb-rgb-in', {
        sound: 'rgb-sound-in',
        gives: [
          ...(['av-composite-out', 'video-out', 's-video-out'] as const).map((jack) =>
            gives(jack, recoloured),
          ),
          sounds('av-sound-out', 'same'),
          sounds('sound-out', 'same'),
        ],
        accepts: inOwnRaster(['rgb']),
      }),
    ],
  }),
  'component-encoder': box({
    name: 'component encoder, to composite and S-Video',
    kind: 'transcoder',
    back: [
      [
        componentIn('component'),
        stereoIn('sound-in'),
        compositeOut('video-out', 'VIDEO'),
        sVideoOut('s-video-out', 'S-VIDEO'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [everyStandard],
    functions: [
      turns('encode', 'converts-form', 'component', {
        sound: 'sound-in',
        gives: [
          gives('video-out', recoloured),
          gives('s-video-out', recoloured),
          sounds('sound-out', 'same'),
        ],
        accepts: inOwnRaster(['ypbpr']),
      }),
    ],
  }),
  'yc-adder': box({
    name: 'S-Video to composite adapter, adds both parts',
    kind: 'transcoder',
    pack: undefined,
    back: [
      [
        sVideoIn('s-video-in', 'S-VIDEO'),
        compositeOut('video-out', 'VIDEO', { connector: 'phono-plug', mount: 'lead' }),
      ],
    ],
    functions: [
      turns('add', 'converts-form', 's-video-in', {
        gives: [gives('video-out', SAME)],
        accepts: ANY_ENCODED,
        separator: 'capacitor',
        power: 'none',
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
