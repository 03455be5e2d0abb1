import {
  type Fitting,
  DEFLECTION_50,
  LINES_15K,
  MONO_SET,
  NTSC,
  SAME,
  SIXTY_443,
  at,
  carrier,
  channelSwitch,
  compositeIn,
  compositeOut,
  dcPack,
  device,
  digitalOnly,
  gives,
  group,
  hdmiIn,
  inputChoice,
  jack,
  mains230,
  mainsAny,
  monoIn,
  onPort,
  one,
  packSocket,
  passes,
  picture,
  plainColour,
  plays,
  port,
  rfIn,
  rfOut,
  shows,
  sounds,
  stereoIn,
  stereoOut,
  trim,
  tube,
  tuner,
  turns,
} from '@coaxwain/models/build'

const LINE = { impedanceOhm: 75, load: { kind: '75' } } as const

/** One green phono for luma or for composite, as the input is chosen; blue and red beside it. */
const sharedComponent: Fitting = {
  ports: [
    port('y-video', 'Y/VIDEO', [one('y', 'in'), one('cvbs', 'in')], {
      connector: 'phono-socket',
      ring: 'green',
      ...LINE,
    }),
    port('pb', 'PB', [one('pb', 'in')], { connector: 'phono-socket', ...LINE }),
    port('pr', 'PR', [one('pr', 'in')], { connector: 'phono-socket', ...LINE }),
  ],
  jacks: [
    jack('component', 'component', 'in', [
      { circuit: 'y', port: 'y-video' },
      { circuit: 'pb', port: 'pb' },
      { circuit: 'pr', port: 'pr' },
    ]),
    jack('video-in', 'composite', 'in', onPort('y-video', ['cvbs'])),
  ],
}

/** Sets, a modulator and aerial parts of a repair bench in a 625-line country. */
export const BENCH_625 = {
  'lindrake-fp-40': device({
    maker: 'Lindrake',
    name: 'FP-40',
    kind: 'television',
    market: '625-i',
    aliases: ['FP40', 'flat television'],
    year: 2014,
    back: [
      [
        rfIn('aerial', 'AERIAL', 'iec-socket'),
        group('AV', sharedComponent, stereoIn('sound-in')),
        hdmiIn('hdmi', 'HDMI'),
      ],
    ],
    controls: [
      inputChoice(
        { tv: 'TV', av: 'AV', component: 'COMPONENT', hdmi: 'HDMI' },
        { access: 'remote' },
      ),
      tuner('channel', 'Channel scan', 'search', {
        reaches: [{ plan: 'uk-uhf', names: '21..69' }],
        access: 'menu',
      }),
    ],
    functions: [
      shows('aerial-picture', 'Shows the aerial', 'aerial', {
        accepts: digitalOnly(['dvb-t']),
        while: at('input', 'tv'),
        tunedBy: 'channel',
        storesFields: true,
      }),
      shows('composite-picture', 'Shows AV', 'video-in', {
        accepts: [
          { scans: ['625i50'], colours: ['pal', 'secam', 'mono'] },
          { scans: ['525i60'], colours: [...NTSC, ...SIXTY_443, 'mono'] },
        ],
        while: at('input', 'av'),
        sound: 'sound-in',
        storesFields: true,
        delayMs: 60,
      }),
      shows('component-picture', 'Shows COMPONENT', 'component', {
        accepts: plainColour('ypbpr', [...LINES_15K, '525p60', '625p50', '750p60', '1125i60']),
        while: at('input', 'component'),
        sound: 'sound-in',
        storesFields: true,
        delayMs: 60,
      }),
      shows('hdmi-picture', 'Shows HDMI', 'hdmi', {
        accepts: plainColour('digital', ['525p60', '625p50', '750p60', '1125i60', '1125p60']),
        while: at('input', 'hdmi'),
        hdcp: true,
        storesFields: true,
        delayMs: 40,
      }),
    ],
    remote: 'needed',
    mains: mainsAny(80),
    display: {
      screen: 'flat',
      deflection: { lineKhz: [[15.625, 67.6]], fieldHz: [[49, 61]], fixed: false },
      shape: '16:9',
      loudspeakers: 'stereo',
      storesFields: true,
      convertsScan: true,
      directView: false,
    },
    weightGrams: 8900,
  }),

  /** Made for a 525-line studio: its hold stands for 60 Hz, and 50 Hz is a turn of the knob away. */
  'hollin-pm-12': device({
    maker: 'Hollin',
    name: 'PM-12',
    kind: 'monitor',
    market: 'any',
    aliases: ['PM12', 'picture monitor'],
    year: 1976,
    factSource: 'measured',
    back: [
      [
        group(
          'A',
          compositeIn('a-in', 'IN', {
            connector: 'bnc-socket',
            load: { kind: 'high' },
            loopsTo: 'a-loop',
          }),
          compositeOut('a-loop', 'LOOP', { connector: 'bnc-socket' }),
        ),
        compositeIn('b-in', 'B', { load: { kind: 'high' } }),
      ],
    ],
    controls: [
      inputChoice({ a: 'A', b: 'B' }),
      { ...trim('v-hold', 'V HOLD', 'vertical-hold', 'back'), stands: 60, aim: 50 },
    ],
    functions: [
      ...(['a', 'b'] as const).map((key) =>
        shows(`${key}-picture`, `Shows ${key.toUpperCase()}`, `${key}-in`, {
          accepts: MONO_SET(LINES_15K),
          while: at('input', key),
        }),
      ),
      turns('loop', 'loop-through', 'a-in', {
        gives: [gives('a-loop', SAME)],
        label: 'Passes the picture on',
        power: 'none',
      }),
    ],
    mains: mains230(40),
    display: tube(DEFLECTION_50, 'none', 'tube-mono'),
    weightGrams: 8400,
  }),

  /** As it was measured on the bench: video turned up too far, sound a little low. */
  'corbray-hm-40': device({
    maker: 'Corbray',
    name: 'HM-40',
    kind: 'modulator',
    market: '625-i',
    aliases: ['HM40', 'bench modulator'],
    year: 1992,
    factSource: 'measured',
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), monoIn('sound-in', 'AUDIO')),
        group('AERIAL', rfIn('aerial-in', 'IN', 'iec-socket'), rfOut('rf-out', 'OUT', 'iec-plug')),
      ],
    ],
    controls: [
      channelSwitch(
        { plan: 'uk-uhf', names: '21..69' },
        { label: 'CHANNEL', where: { access: 'front', look: 'knob' } },
      ),
      { ...trim('video-level', 'VIDEO LEVEL', 'video-level'), stands: 95, aim: 80 },
      { ...trim('sound-level', 'SOUND LEVEL', 'sound-level'), stands: 35, aim: 50 },
    ],
    functions: [
      turns('modulator', 'modulates', 'video-in', {
        gives: [gives('rf-out', SAME, { sound: 'same', rf: [carrier('I', { levelDbmv: 6 })] })],
        label: 'Modulates',
        sound: 'sound-in',
        accepts: [{ scans: LINES_15K, colours: ['pal', 'secam', 'pal-60', 'ntsc-443', 'mono'] }],
      }),
      passes('aerial-loop', 'loop-through', 'aerial-in', {
        to: ['rf-out'],
        label: 'Joins the aerial to it',
        gainDb: -4,
      }),
    ],
    leaks: [{ from: 'rf-out', to: 'aerial-in', db: 66 }],
    mains: mains230(14),
    weightGrams: 1900,
  }),

  'selvane-tb-6': device({
    maker: 'Selvane',
    name: 'TB-6',
    kind: 'converter-box',
    market: '625-i',
    aliases: ['TB6', 'digital converter'],
    year: 2009,
    factSource: 'manual',
    back: [
      [
        rfIn('aerial-in', 'AERIAL 5 V', 'iec-socket', { suppliesDcVolts: 5 }),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        packSocket('12 V'),
      ],
    ],
    controls: [
      tuner('tuned-to', 'Channel search', 'search', {
        reaches: [{ plan: 'uk-uhf', names: '21..69' }],
        access: 'menu',
      }),
    ],
    functions: [
      plays('programme', 'Shows digital programmes', [
        gives('video-out', [picture('625i50', 'pal')]),
        sounds('sound-out', 'stereo'),
      ]),
      turns('receive', 'tunes', 'aerial-in', {
        gives: [gives('video-out', [picture('625i50', 'pal')]), sounds('sound-out', 'stereo')],
        label: 'Receives digital programmes',
        accepts: digitalOnly(['dvb-t']),
        tunedBy: 'tuned-to',
      }),
    ],
    remote: 'needed',
    pack: dcPack(12, 1000),
    weightGrams: 380,
  }),

  /** Its amplifier lives on five volts that come up the lead. */
  'fennock-ia-3': device({
    maker: 'Fennock',
    name: 'IA-3',
    kind: 'aerial',
    market: '625-i',
    aliases: ['IA3', 'indoor aerial with amplifier'],
    year: 2008,
    back: [
      [
        {
          ports: [
            {
              ...port('out', '75 Ω', [one('rf', 'out')], {
                connector: 'iec-plug',
                mount: 'lead',
                impedanceOhm: 75,
                note: 'Fixed lead, 1.5 m.',
              }),
              needsDcVolts: 5,
            },
          ],
          jacks: [jack('out', 'rf', 'out', onPort('out', ['rf']))],
        },
      ],
    ],
    functions: [
      {
        key: 'receive',
        kind: 'receives',
        needs: [],
        accepts: [],
        gives: [{ jack: 'out' }],
        power: 'none',
      },
    ],
    weightGrams: 240,
  }),

  /** Three resistors in a box: nobody has measured what one input hears of the other. */
  'corbray-rj-2': device({
    maker: 'Corbray',
    name: 'RJ-2',
    kind: 'combiner',
    market: 'any',
    aliases: ['RJ2', 'two-way joiner, 9.52 mm'],
    year: 1988,
    factSource: 'guess',
    back: [
      [
        rfIn('in-1', '1', 'iec-socket'),
        rfIn('in-2', '2', 'iec-socket'),
        rfOut('out', 'TV', 'iec-plug', { mount: 'lead', note: 'Fixed lead, 0.5 m.' }),
      ],
    ],
    functions: (['1', '2'] as const).map((n) =>
      passes(`join-${n}`, 'combines', `in-${n}`, {
        to: ['out'],
        label: `Adds ${n}`,
        gainDb: -6,
      }),
    ),
    weightGrams: 50,
  }),
}
