import type { AcceptRow, DeviceModel, PictureGive } from '@coaxwain/models'
import {
  at,
  carrier,
  channelSwitch,
  choice,
  componentIn,
  componentOut,
  compositeIn,
  compositeOut,
  dcPack,
  device,
  digitalOnly,
  gives,
  hd15In,
  hd15Out,
  hdmiIn,
  hdmiOut,
  heardOn,
  LINES_15K,
  LINES_525,
  LINES_625,
  mainsAny,
  passes,
  picture,
  plainColour,
  rfIn,
  rfOut,
  SAME,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  sVideoIn,
  sVideoOut,
  THREE_FOUR,
  ttlIn,
  tuner,
  turns,
  type DeviceDraft,
} from '@coaxwain/models/build'
import type { Colour, PlanPart, RfSystemId, ScanId } from '@coaxwain/signal'

const box = (draft: Omit<DeviceDraft, 'maker' | 'market'>): DeviceModel =>
  device({ maker: 'ordinary part', market: 'any', pack: dcPack(9, 500), ...draft })

const ENCODED: readonly Colour[] = [
  'ntsc-m',
  'ntsc-j',
  'ntsc-443',
  'pal',
  'pal-60',
  'pal-m',
  'pal-n',
  'secam',
  'mono',
]

const anyEncoded: readonly AcceptRow[] = [{ scans: LINES_15K, colours: ENCODED }]

const outStandard = choice('standard', 'OUTPUT', 'standard', {
  positions: { ntsc: 'NTSC', pal: 'PAL' },
  access: 'back',
})

const madeAnew = (colour?: Colour): readonly PictureGive[] => [
  { ...picture('525i60', colour ?? 'ntsc-m', at('standard', 'ntsc')), converts: true },
  { ...picture('625i50', colour ?? 'pal', at('standard', 'pal')), converts: true },
]

const HD: readonly ScanId[] = ['525p60', '625p50', '750p60', '1125i60', '1125p60']
const COMPUTER: readonly ScanId[] = ['525p60', 'vga-31k-60', 'vga-31k-70']

/** Colour standards, fields and lines. */
const STANDARDS = {
  'standards-converter': box({
    name: 'standards converter',
    kind: 'standards-converter',
    back: [[compositeIn('video-in', 'IN'), compositeOut('video-out', 'OUT')]],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'video-in', {
        gives: [gives('video-out', madeAnew())],
        accepts: anyEncoded,
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
        accepts: anyEncoded,
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
        accepts: anyEncoded,
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

/** Lines and digital sockets. */
const SCANS_AND_DIGITAL = {
  'scan-converter': box({
    name: 'scan converter, computer to television',
    kind: 'scan-converter',
    back: [
      [
        hd15In('computer-in', 'COMPUTER IN'),
        compositeOut('video-out', 'VIDEO'),
        sVideoOut('s-video-out', 'S-VIDEO'),
        componentOut('component'),
      ],
    ],
    controls: [outStandard],
    functions: [
      turns('convert', 'converts-scan', 'computer-in', {
        gives: [
          gives('video-out', madeAnew()),
          gives('s-video-out', madeAnew()),
          gives('component', madeAnew('ypbpr')),
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
        accepts: anyEncoded,
        storesFields: true,
        delayMs: 34,
      }),
    ),
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
        accepts: anyEncoded,
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
        accepts: input === 'av-rgb-in' ? plainColour('rgb', LINES_15K) : anyEncoded,
        storesFields: true,
        delayMs: 50,
      }),
    ),
  }),
} satisfies Record<string, DeviceModel>

const modulator = (
  name: string,
  part: PlanPart,
  systems: Readonly<Record<string, RfSystemId>>,
  connector: 'f-socket' | 'iec-plug',
): DeviceModel => {
  const keys = Object.keys(systems)
  const lines = Object.values(systems).some((s) => s === 'M') ? LINES_525 : LINES_625
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
const SOUND_SYSTEMS = { I: 'I', BG: 'G', DK: 'K', M: 'M' } as const

/** Channels. */
const RF_BOXES = {
  'modulator-3-4': modulator('modulator, channel 3 or 4', THREE_FOUR, { M: 'M' }, 'f-socket'),
  'modulator-uhf': modulator('UHF modulator', UHF, { I: 'I', G: 'G' }, 'iec-plug'),
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
    name: 'tuner with line outputs, or a recorder used as one',
    kind: 'tuner',
    back: [
      [
        rfIn('aerial-in', 'ANT IN', 'f-socket'),
        compositeOut('video-out', 'VIDEO OUT'),
        stereoOut('sound-out'),
      ],
    ],
    controls: [
      tuner('tuned-to', 'CHANNEL', 'numbers', {
        reaches: [
          { plan: 'us-broadcast', names: '2..69' },
          { plan: 'us-cable-std', names: '2..99' },
        ],
      }),
    ],
    functions: [
      turns('receive', 'tunes', 'aerial-in', {
        gives: [gives('video-out', SAME), sounds('sound-out', 'same')],
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
  'aerial-switch': box({
    name: 'two-way aerial switch',
    kind: 'rf-switch',
    pack: undefined,
    back: [
      [rfIn('a', 'A', 'f-socket'), rfIn('b', 'B', 'f-socket'), rfOut('out', 'TO TV', 'f-socket')],
    ],
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
    // 47 CFR 15.115(h): 80 dB from 54 to 216 MHz, 60 dB to 550 MHz; the lower figure is taken.
    leaks: [
      { from: 'a', to: 'b', db: 60 },
      { from: 'b', to: 'a', db: 60 },
      { from: 'out', to: 'a', db: 60 },
      { from: 'out', to: 'b', db: 60 },
    ],
  }),
} satisfies Record<string, DeviceModel>

const PLUG = { connector: 'scart-plug', mount: 'lead' } as const

/** Blocks of wires only, between phonos and a 21-pin plug, each made for one direction. */
const BLOCKS = {
  '21-pin-in': box({
    name: '21-pin block, phono sockets in',
    kind: 'other',
    pack: undefined,
    back: [
      [
        compositeIn('video-in', 'VIDEO'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['composite', 'sound'] }, PLUG),
      ],
    ],
    functions: [
      turns('in', 'loop-through', 'video-in', {
        sound: 'sound-in',
        gives: [gives('plug-composite-out', SAME), sounds('plug-sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
  '21-pin-out': box({
    name: '21-pin block, phono sockets out',
    kind: 'other',
    pack: undefined,
    back: [
      [
        scart('plug', '21-pin plug', { takes: ['composite', 'sound'] }, PLUG),
        compositeOut('video-out', 'VIDEO'),
        stereoOut('sound-out'),
      ],
    ],
    functions: [
      turns('out', 'loop-through', 'plug-composite-in', {
        sound: 'plug-sound-in',
        gives: [gives('video-out', SAME), sounds('sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
} satisfies Record<string, DeviceModel>

/** Sound. */
const SOUND_BOXES = {
  loudspeakers: box({
    name: 'powered loudspeakers',
    kind: 'loudspeakers',
    back: [[stereoIn('line-in')]],
    functions: [turns('speak', 'makes-sound', 'line-in', {})],
  }),
} satisfies Record<string, DeviceModel>

/** Boxes that any shop of the trade has, or that turn up second-hand. */
export const BOXES = {
  ...STANDARDS,
  ...SCANS_AND_DIGITAL,
  ...RF_BOXES,
  ...BLOCKS,
  ...SOUND_BOXES,
} satisfies Record<string, DeviceModel>
