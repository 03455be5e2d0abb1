import type { DeviceModel } from '@coaxwain/models'
import {
  componentIn,
  componentOut,
  compositeIn,
  compositeOut,
  gives,
  hd15In,
  hd15Out,
  hdmiIn,
  hdmiOut,
  LINES_15K,
  picture,
  plainColour,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  sVideoIn,
  turns,
} from '@coaxwain/models/build'
import type { ScanId } from '@coaxwain/signal'
import { ANY_ENCODED, box, madeAnew, outStandard } from './box'

const HD: readonly ScanId[] = ['525p60', '625p50', '750p60', '1125i60', '1125p60']

/** To and from digital sockets. */
export const DIGITAL_BOXES = {
  'hdmi-down': box({
    name: 'HDMI to composite converter that completes the handshake',
    kind: 'scan-converter',
    back: [
      [hdmiIn('hdmi-in', 'HDMI IN'), compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')],
    ],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'hdmi-in', {
        gives: [gives('video-out', madeAnew()), sounds('sound-out', 'same')],
        accepts: plainColour('digital', HD),
        hdcp: true,
        storesFields: true,
        delayMs: 34,
      }),
    ],
  }),
  'hdmi-to-component': box({
    name: 'HDMI to component converter that completes the handshake',
    kind: 'scan-converter',
    back: [[hdmiIn('hdmi-in', 'HDMI IN'), componentOut('component'), stereoOut('sound-out')]],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'hdmi-in', {
        gives: [gives('component', madeAnew('ypbpr')), sounds('sound-out', 'same')],
        accepts: plainColour('digital', HD),
        hdcp: true,
        storesFields: true,
        delayMs: 34,
      }),
    ],
  }),
  'hdmi-to-monitor': box({
    name: 'HDMI to computer-monitor converter that completes the handshake',
    kind: 'scan-converter',
    back: [
      [hdmiIn('hdmi-in', 'HDMI IN'), hd15Out('monitor-out', 'MONITOR'), stereoOut('sound-out')],
    ],
    functions: [
      turns('convert', 'converts-form', 'hdmi-in', {
        gives: [gives('monitor-out', [picture('525p60', 'rgb')]), sounds('sound-out', 'same')],
        accepts: plainColour('digital', HD),
        hdcp: true,
      }),
    ],
  }),
  'monitor-to-hdmi': box({
    name: 'computer picture to HDMI converter',
    kind: 'scan-converter',
    back: [
      [hd15In('computer-in', 'COMPUTER IN'), stereoIn('sound-in'), hdmiOut('hdmi-out', 'HDMI OUT')],
    ],
    functions: [
      turns('convert', 'converts-form', 'computer-in', {
        sound: 'sound-in',
        gives: [
          gives('hdmi-out', [{ ...picture('750p60', 'digital'), converts: true }], {
            sound: 'same',
          }),
        ],
        accepts: plainColour('rgb', ['525p60', 'vga-31k-60', 'vga-31k-70']),
      }),
    ],
  }),
  'video-to-hdmi': box({
    name: 'composite and S-Video to HDMI converter',
    kind: 'scan-converter',
    back: [
      [
        compositeIn('video-in', 'VIDEO'),
        sVideoIn('s-video-in', 'S-VIDEO'),
        stereoIn('sound-in'),
        hdmiOut('hdmi-out', 'HDMI OUT'),
      ],
    ],
    functions: (['video-in', 's-video-in'] as const).map((input) =>
      turns(`up-${input}`, 'converts-scan', input, {
        sound: 'sound-in',
        gives: [
          gives('hdmi-out', [{ ...picture('750p60', 'digital'), converts: true }], {
            sound: 'same',
          }),
        ],
        accepts: ANY_ENCODED,
        storesFields: true,
        delayMs: 50,
      }),
    ),
  }),
  'component-to-hdmi': box({
    name: 'component to HDMI converter',
    kind: 'scan-converter',
    back: [[componentIn('component'), stereoIn('sound-in'), hdmiOut('hdmi-out', 'HDMI OUT')]],
    functions: [
      turns('up', 'converts-scan', 'component', {
        sound: 'sound-in',
        gives: [
          gives('hdmi-out', [{ ...picture('750p60', 'digital'), converts: true }], {
            sound: 'same',
          }),
        ],
        accepts: plainColour('ypbpr', [...LINES_15K, '525p60', '625p50']),
        storesFields: true,
        delayMs: 50,
      }),
    ],
  }),
  'rgb-to-hdmi': box({
    name: '21-pin to HDMI converter',
    kind: 'scan-converter',
    back: [
      [
        scart('av', 'AV IN', { takes: ['composite', 'rgb', 'sound'] }),
        hdmiOut('hdmi-out', 'HDMI OUT'),
      ],
    ],
    functions: (['av-rgb-in', 'av-composite-in'] as const).map((input) =>
      turns(`up-${input}`, 'converts-scan', input, {
        sound: 'av-sound-in',
        gives: [
          gives('hdmi-out', [{ ...picture('750p60', 'digital'), converts: true }], {
            sound: 'same',
          }),
        ],
        accepts: input === 'av-rgb-in' ? plainColour('rgb', LINES_15K) : ANY_ENCODED,
        storesFields: true,
        delayMs: 50,
      }),
    ),
  }),
} satisfies Record<string, DeviceModel>
