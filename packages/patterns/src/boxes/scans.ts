import type { DeviceModel } from '@coaxwain/models'
import {
  at,
  choice,
  componentOut,
  compositeIn,
  compositeOut,
  gives,
  hd15In,
  hd15Out,
  LINES_15K,
  picture,
  plainColour,
  scart,
  sounds,
  stereoOut,
  sVideoIn,
  sVideoOut,
  ttlIn,
  turns,
} from '@coaxwain/models/build'
import type { ScanId } from '@coaxwain/signal'
import { ANY_ENCODED, box, madeAnew, outStandard } from './box'

const COMPUTER: readonly ScanId[] = ['525p60', 'vga-31k-60', 'vga-31k-70']

/** Between television and computer monitors. */
export const SCAN_BOXES = {
  'scan-converter': box({
    name: 'scan converter, computer to television',
    kind: 'scan-converter',
    back: [
      [
        hd15In('computer-in', 'COMPUTER IN'),
        compositeOut('video-out', 'VIDEO'),
        sVideoOut('s-video-out', 'S-VIDEO'),
        componentOut('component'),
        hd15Out('rgb-out', 'RGB'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'computer-in', {
        gives: [
          gives('video-out', madeAnew()),
          gives('s-video-out', madeAnew()),
          gives('component', madeAnew('ypbpr')),
          gives('rgb-out', madeAnew('rgb')),
        ],
        accepts: plainColour('rgb', COMPUTER),
        storesFields: true,
        delayMs: 34,
      }),
    ],
  }),
  'scan-doubler': box({
    name: 'scan doubler, 21-pin to computer monitor',
    kind: 'scan-converter',
    back: [
      [
        scart('rgb', 'RGB IN', { takes: ['rgb', 'sound'] }),
        hd15Out('monitor-out', 'MONITOR'),
        stereoOut('sound-out'),
      ],
    ],
    functions: [
      turns('double', 'converts-scan', 'rgb-rgb-in', {
        sound: 'rgb-sound-in',
        gives: [
          gives('monitor-out', [{ ...picture('525p60', 'rgb'), converts: true }]),
          sounds('sound-out', 'same'),
        ],
        accepts: plainColour('rgb', LINES_15K),
        storesFields: true,
      }),
    ],
  }),
  'video-to-monitor': box({
    name: 'video to computer-monitor box',
    kind: 'scan-converter',
    back: [
      [
        compositeIn('video-in', 'VIDEO'),
        sVideoIn('s-video-in', 'S-VIDEO'),
        hd15Out('monitor-out', 'MONITOR'),
      ],
    ],
    controls: [
      choice('input', 'INPUT', 'input', {
        positions: { video: 'VIDEO', 's-video': 'S-VIDEO' },
        access: 'front',
      }),
    ],
    functions: (['video', 's-video'] as const).map((input) =>
      turns(`show-${input}`, 'converts-scan', `${input}-in`, {
        while: at('input', input),
        gives: [gives('monitor-out', [{ ...picture('525p60', 'rgb'), converts: true }])],
        accepts: ANY_ENCODED,
        storesFields: true,
        delayMs: 34,
      }),
    ),
  }),
  'ttl-to-monitor': box({
    name: 'digital RGB to computer-monitor box',
    kind: 'scan-converter',
    back: [[ttlIn('ttl-in', 'DIGITAL RGB IN'), hd15Out('monitor-out', 'MONITOR')]],
    functions: [
      turns('convert', 'converts-scan', 'ttl-in', {
        gives: [gives('monitor-out', [{ ...picture('525p60', 'rgb'), converts: true }])],
        accepts: plainColour('rgbi', ['cga-15k7', '262p60', 'ega-21k8']),
        storesFields: true,
        delayMs: 17,
      }),
    ],
  }),
  'ttl-converter': box({
    name: 'digital RGB to television box',
    kind: 'transcoder',
    back: [
      [
        ttlIn('ttl-in', 'DIGITAL RGB IN'),
        scart('rgb', 'RGB OUT', { gives: ['rgb'] }),
        compositeOut('video-out', 'VIDEO'),
      ],
    ],
    functions: [
      turns('convert', 'converts-form', 'ttl-in', {
        gives: [
          gives('rgb-rgb-out', [picture('262p60', 'rgb')], { volts: ['av-select', 'rgb-select'] }),
          gives('video-out', [picture('262p60', 'ntsc-m')]),
        ],
        accepts: plainColour('rgbi', ['cga-15k7', '262p60']),
      }),
    ],
  }),
} satisfies Record<string, DeviceModel>
