import type { DeviceModel } from '@coaxwain/models'
import {
  at,
  carrier,
  channelSwitch,
  choice,
  compositeIn,
  compositeOut,
  digitalOnly,
  gives,
  heardOn,
  LINES_15K,
  LINES_525,
  LINES_625,
  mainsAny,
  passes,
  picture,
  rfIn,
  rfOut,
  SAME,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  THREE_FOUR,
  tuner,
  turns,
} from '@coaxwain/models/build'
import type { Connector, PlanPart, RfSystemId } from '@coaxwain/signal'
import { ANY_ENCODED, box, ENCODED } from './box'

const modulator = (
  name: string,
  part: PlanPart,
  systems: Readonly<Record<string, RfSystemId>>,
  connector: 'f-socket' | 'iec-plug',
): DeviceModel => {
  const keys = Object.keys(systems)
  const lines = Object.values(systems).includes('M') ? LINES_525 : LINES_625
  return box({
    name,
    kind: 'modulator',
    back: [
      [
        compositeIn('video-in', 'VIDEO IN'),
        stereoIn('sound-in'),
        rfOut('rf-out', 'TO TV', connector),
      ],
    ],
    controls: [
      channelSwitch(part),
      ...(keys.length > 1
        ? [choice('system', 'SYSTEM', 'standard', { positions: keys, access: 'back' })]
        : []),
    ],
    functions: [
      turns('modulate', 'modulates', 'video-in', {
        sound: 'sound-in',
        gives: [
          gives('rf-out', SAME, {
            rf: Object.entries(systems).map(([key, system]) =>
              carrier(system, {
                levelDbmv: 8,
                ...(keys.length > 1 ? { while: at('system', key) } : {}),
              }),
            ),
          }),
        ],
        accepts: [{ scans: lines, colours: ENCODED }],
      }),
    ],
  })
}

const UHF: PlanPart = { plan: 'ccir-west-europe', names: '21..69' }

/** Systems whose sound a multi-system tuner hears, each on a position of its own. */
const SOUND_SYSTEMS = { I: 'I', BG: 'G', DK: 'K', L: 'L', M: 'M' } as const

/** 47 CFR 15.115(h): 80 dB from 54 to 216 MHz, 60 dB to 550 MHz; the lower figure is taken. */
const SWITCH_DB = 60

const aerialSwitch = (name: string, into: Connector, out: Connector): DeviceModel =>
  box({
    name,
    kind: 'rf-switch',
    pack: undefined,
    back: [[rfIn('a', 'A', into), rfIn('b', 'B', into), rfOut('out', 'TO TV', out)]],
    controls: [
      choice('switch', 'A/B', 'input', { positions: { a: 'A', b: 'B' }, access: 'front' }),
    ],
    functions: (['a', 'b'] as const).map((side) =>
      passes(`select-${side}`, 'selects', side, {
        to: ['out'],
        while: at('switch', side),
        gainDb: -0.7,
      }),
    ),
    leaks: [
      { from: 'a', to: 'b', db: SWITCH_DB },
      { from: 'b', to: 'a', db: SWITCH_DB },
      { from: 'out', to: 'a', db: SWITCH_DB },
      { from: 'out', to: 'b', db: SWITCH_DB },
    ],
  })

/** On to channels and off them. */
export const RF_BOXES = {
  'modulator-3-4': modulator('modulator, channel 3 or 4', THREE_FOUR, { M: 'M' }, 'f-socket'),
  'modulator-uhf': modulator('UHF modulator', UHF, { I: 'I', G: 'G', K: 'K', L: 'L' }, 'iec-plug'),
  'modulator-uhf-us': modulator(
    'UHF modulator, American channels',
    { plan: 'us-broadcast', names: '14..69' },
    { M: 'M' },
    'f-socket',
  ),
  'modulator-jp': modulator(
    'modulator, Japanese channel 1 or 2',
    { plan: 'japan-broadcast', names: '1,2' },
    { M: 'M' },
    'f-socket',
  ),
  'modulator-vhf-eu': modulator(
    'VHF modulator, channel E3 or E4',
    { plan: 'ccir-west-europe', names: 'E3,E4' },
    { B: 'B' },
    'iec-plug',
  ),
  'modulator-vhf-au': modulator(
    'VHF modulator, channel 0 or 1',
    { plan: 'australia', names: '0,1' },
    { B: 'B' },
    'iec-plug',
  ),
  'multi-system-recorder': box({
    name: 'multi-system recorder',
    kind: 'recorder',
    pack: undefined,
    mains: mainsAny(30),
    back: [
      [
        rfIn('aerial-in', 'AERIAL', 'iec-socket'),
        rfOut('rf-out', 'RF OUT', 'iec-plug'),
        compositeOut('video-out', 'VIDEO OUT'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [
      channelSwitch(UHF),
      choice('system-in', 'SOUND SYSTEM IN', 'standard', {
        positions: Object.keys(SOUND_SYSTEMS),
        access: 'front',
      }),
      choice('system-out', 'SOUND SYSTEM OUT', 'standard', {
        positions: ['I', 'BG', 'DK'],
        access: 'back',
      }),
      tuner('tuned-to', 'TUNED TO', 'presets', {
        reaches: [
          { plan: 'ccir-west-europe' },
          { plan: 'uk-uhf' },
          { plan: 'us-broadcast', names: '2..69' },
          { plan: 'australia' },
          { plan: 'japan-broadcast' },
        ],
      }),
    ],
    functions: [
      turns('receive', 'tunes', 'aerial-in', {
        gives: [
          gives('video-out', SAME),
          sounds('sound-out', 'same'),
          gives('rf-out', SAME, {
            rf: (['I', 'BG', 'DK'] as const).map((key) =>
              carrier(SOUND_SYSTEMS[key], { levelDbmv: 8, while: at('system-out', key) }),
            ),
          }),
        ],
        accepts: Object.entries(SOUND_SYSTEMS).flatMap(([key, system]) =>
          heardOn([{ scans: LINES_15K, colours: ENCODED }], [system]).map((row) => ({
            ...row,
            while: at('system-in', key),
          })),
        ),
        tunedBy: 'tuned-to',
      }),
    ],
  }),
  'analogue-tuner': box({
    name: 'recorder with a cable tuner, used as a tuner',
    kind: 'tuner',
    back: [
      [
        rfIn('aerial-in', 'ANT IN', 'f-socket'),
        rfOut('rf-out', 'TO TV', 'f-socket'),
        compositeOut('video-out', 'VIDEO OUT'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [
      channelSwitch(THREE_FOUR),
      tuner('tuned-to', 'CHANNEL', 'numbers', {
        reaches: [
          { plan: 'us-broadcast', names: '2..69' },
          { plan: 'us-cable-std', names: '2..99' },
        ],
      }),
    ],
    functions: [
      turns('receive', 'tunes', 'aerial-in', {
        gives: [
          gives('video-out', SAME),
          sounds('sound-out', 'same'),
          gives('rf-out', SAME, { rf: [carrier('M', { levelDbmv: 8 })] }),
        ],
        accepts: heardOn([{ scans: LINES_525, colours: ENCODED }], ['M']),
        tunedBy: 'tuned-to',
      }),
    ],
  }),
  'digital-converter': box({
    name: 'converter box for digital stations',
    kind: 'converter-box',
    back: [
      [
        rfIn('aerial-in', 'ANTENNA IN', 'f-socket'),
        compositeOut('video-out', 'VIDEO OUT'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [
      tuner('tuned-to', 'STATION', 'search', {
        reaches: [{ plan: 'us-broadcast', names: '2..36' }],
      }),
    ],
    functions: [
      turns('receive', 'tunes', 'aerial-in', {
        gives: [gives('video-out', [picture('525i60', 'ntsc-m')]), sounds('sound-out', 'stereo')],
        accepts: digitalOnly(['atsc']),
        tunedBy: 'tuned-to',
      }),
    ],
  }),
  'dvb-t-receiver': box({
    name: 'receiver for digital stations, 21-pin',
    kind: 'converter-box',
    back: [
      [
        rfIn('aerial-in', 'AERIAL', 'iec-socket'),
        scart('av', 'TV', { gives: ['composite', 'rgb', 'sound'] }),
        compositeOut('video-out', 'VIDEO OUT'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [
      tuner('tuned-to', 'STATION', 'search', {
        reaches: [{ plan: 'uk-uhf' }, { plan: 'ccir-west-europe' }],
      }),
    ],
    functions: [
      turns('receive', 'tunes', 'aerial-in', {
        gives: [
          gives('av-composite-out', [picture('625i50', 'pal')], { volts: ['av-select'] }),
          gives('av-rgb-out', [picture('625i50', 'rgb')], { volts: ['av-select', 'rgb-select'] }),
          gives('video-out', [picture('625i50', 'pal')]),
          sounds('av-sound-out', 'stereo'),
          sounds('sound-out', 'stereo'),
        ],
        accepts: digitalOnly(['dvb-t']),
        tunedBy: 'tuned-to',
      }),
    ],
  }),
  'converter-405': box({
    name: '625 to 405 line standards converter with modulator',
    kind: 'standards-converter',
    back: [
      [
        compositeIn('video-in', 'VIDEO IN'),
        stereoIn('sound-in'),
        rfOut('rf-out', 'TO TV', 'iec-plug'),
      ],
    ],
    controls: [channelSwitch({ plan: 'uk-405', names: 'B1..B5' })],
    functions: [
      turns('convert', 'modulates', 'video-in', {
        sound: 'sound-in',
        gives: [
          gives('rf-out', [{ ...picture('405i50', 'mono'), converts: true }], {
            rf: [carrier('A', { levelDbmv: 6 })],
          }),
        ],
        accepts: ANY_ENCODED,
        storesFields: true,
        delayMs: 20,
      }),
    ],
  }),
  'aerial-switch': aerialSwitch('two-way aerial switch', 'f-socket', 'f-socket'),
  'aerial-switch-9-5': aerialSwitch('two-way 9.52 mm aerial switch', 'iec-socket', 'iec-plug'),
} satisfies Record<string, DeviceModel>
