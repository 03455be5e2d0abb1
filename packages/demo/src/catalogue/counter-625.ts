import {
  type Fitting,
  SAME,
  at,
  choice,
  componentOut,
  compositeOut,
  dcPack,
  device,
  gives,
  group,
  hdmiIn,
  hdmiOut,
  jack,
  onPort,
  one,
  packSocket,
  picture,
  plainColour,
  plays,
  port,
  sVideoIn,
  sVideoOut,
  scart,
  sounds,
  stereoOut,
  turns,
} from '@coaxwain/models/build'

/** Four contacts in a 3.5 mm socket, in an order of the maker's own. */
const fourContacts: Fitting = {
  ports: [
    port('av', 'A/V', [one('cvbs', 'out'), one('audio-l', 'out'), one('audio-r', 'out')], {
      connector: 'jack35-socket',
    }),
  ],
  jacks: [
    jack('av-video', 'composite', 'out', onPort('av', ['cvbs'])),
    jack('av-sound', 'sound', 'out', onPort('av', ['audio-l', 'audio-r'])),
  ],
}

const tape = [
  gives('av-video', [picture('625i50', 'pal')]),
  gives('s-video-out', [picture('625i50', 'pal')]),
  sounds('av-sound', 'stereo'),
]

/** A 21-pin block with phonos that lead in or out, by a slide. */
const eitherWay: Fitting = {
  ports: [
    port('video', 'VIDEO', [one('cvbs', 'either')], { connector: 'phono-socket' }),
    port('left', 'L', [one('audio-l', 'either')], { connector: 'phono-socket' }),
    port('right', 'R', [one('audio-r', 'either')], { connector: 'phono-socket' }),
  ],
  jacks: (['in', 'out'] as const).flatMap((dir) => [
    jack(`video-${dir}`, 'composite', dir, onPort('video', ['cvbs'])),
    jack(`sound-${dir}`, 'sound', dir, [
      { circuit: 'audio-l', port: 'left' },
      { circuit: 'audio-r', port: 'right' },
    ]),
  ]),
}

/** Sources and small boxes that come over the counter in a 625-line country. */
export const COUNTER_625 = {
  'brindlow-hc-20': device({
    maker: 'Brindlow',
    name: 'HC-20',
    kind: 'camera',
    market: '625-i',
    aliases: ['HC20', 'camera recorder'],
    year: 2001,
    side: [[fourContacts, sVideoOut('s-video-out', 'S-VIDEO'), packSocket('8.4 V')]],
    functions: [plays('tape', 'Plays tapes', tape, { bandwidthMhz: 5 })],
    pack: dcPack(8.4, 1500),
    weightGrams: 720,
  }),

  'varnhope-hx': device({
    maker: 'Varnhope',
    name: 'HX',
    kind: 'console',
    market: 'any',
    aliases: ['Varnhope HX'],
    year: 2012,
    back: [[hdmiOut('hdmi-out', 'HDMI'), packSocket('12 V')]],
    functions: [
      plays('game', 'Plays games', [
        gives('hdmi-out', [picture('750p60', 'digital')], { sound: 'stereo' }),
      ]),
    ],
    pack: dcPack(12, 5000),
    weightGrams: 2100,
  }),

  /** A nameless sort of box: nothing is known of the handshake. */
  'pellmere-hv-1': device({
    maker: 'Pellmere',
    name: 'HV-1',
    kind: 'scan-converter',
    market: 'any',
    aliases: ['HV1', 'HDMI to composite'],
    year: 2015,
    back: [
      [
        hdmiIn('hdmi-in', 'HDMI'),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        packSocket('5 V'),
      ],
    ],
    controls: [
      choice('standard', 'NTSC/PAL', 'standard', {
        positions: { ntsc: 'NTSC', pal: 'PAL' },
        access: 'back',
      }),
    ],
    functions: [
      turns('convert', 'converts-scan', 'hdmi-in', {
        gives: [
          gives('video-out', [
            { ...picture('525i60', 'ntsc-m', at('standard', 'ntsc')), converts: true },
            { ...picture('625i50', 'pal', at('standard', 'pal')), converts: true },
          ]),
          sounds('sound-out', 'same'),
        ],
        label: 'Makes composite of HDMI',
        accepts: plainColour('digital', ['525p60', '625p50', '750p60', '1125i60', '1125p60']),
        storesFields: true,
        delayMs: 50,
      }),
    ],
    pack: dcPack(5, 1000),
    weightGrams: 70,
  }),

  /** Its book says that protected programmes stay black. */
  'corbray-ha-3': device({
    maker: 'Corbray',
    name: 'HA-3',
    kind: 'transcoder',
    market: 'any',
    aliases: ['HA3', 'HDMI to component'],
    year: 2010,
    factSource: 'manual',
    back: [
      [
        hdmiIn('hdmi-in', 'HDMI'),
        group('OUT', componentOut('component'), stereoOut('sound-out')),
        packSocket('5 V'),
      ],
    ],
    functions: [
      turns('convert', 'converts-form', 'hdmi-in', {
        gives: [
          gives('component', [{ scan: 'same', colour: 'ypbpr' }]),
          sounds('sound-out', 'same'),
        ],
        label: 'Turns HDMI into component',
        accepts: plainColour('digital', ['525p60', '625p50', '750p60', '1125i60']),
        hdcp: false,
      }),
    ],
    pack: dcPack(5, 1000),
    weightGrams: 110,
  }),

  'hollin-sx-1': device({
    maker: 'Hollin',
    name: 'SX-1',
    kind: 'selector',
    market: 'any',
    aliases: ['SX1', '21-pin block with a slide'],
    year: 1999,
    back: [
      [
        scart('tv', 'TV', { takes: ['composite', 'sound'], gives: ['composite', 'sound'] }),
        eitherWay,
      ],
    ],
    controls: [
      choice('way', 'IN/OUT', 'direction', { positions: { in: 'IN', out: 'OUT' }, access: 'back' }),
    ],
    functions: [
      turns('lead-in', 'selects', 'video-in', {
        gives: [gives('tv-composite-out', SAME), sounds('tv-sound-out', 'same')],
        label: 'Leads the phonos to the 21-pin socket',
        sound: 'sound-in',
        while: at('way', 'in'),
        power: 'none',
      }),
      turns('lead-out', 'selects', 'tv-composite-in', {
        gives: [gives('video-out', SAME), sounds('sound-out', 'same')],
        label: 'Leads the 21-pin socket to the phonos',
        sound: 'tv-sound-in',
        while: at('way', 'out'),
        power: 'none',
      }),
    ],
    weightGrams: 90,
  }),

  'hollin-yc-2': device({
    maker: 'Hollin',
    name: 'YC-2',
    kind: 'transcoder',
    market: 'any',
    aliases: ['YC2', 'S-Video joiner'],
    year: 1997,
    back: [[sVideoIn('s-video-in', 'S-VIDEO IN'), compositeOut('video-out', 'VIDEO OUT')]],
    functions: [
      turns('join', 'converts-form', 's-video-in', {
        gives: [gives('video-out', SAME)],
        label: 'Adds the colour to the luma',
        power: 'none',
        separator: 'capacitor',
      }),
    ],
    weightGrams: 30,
  }),
}
