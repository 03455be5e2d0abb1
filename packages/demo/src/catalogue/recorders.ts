import {
  NTSC_LINE,
  PAL_LINE,
  THREE_FOUR,
  airCable,
  airCableTuner,
  carrier,
  channelScrew,
  channelSwitch,
  choice,
  compositeIn,
  compositeOut,
  device,
  group,
  heardOn,
  inputChoice,
  mains120,
  mains230,
  monoIn,
  monoOut,
  recorderFunctions,
  rfIn,
  rfOut,
  scart,
  stereoIn,
  stereoOut,
  tuner,
} from '@coaxwain/models/build'

const UHF_I = { plan: 'uk-uhf', names: '21..69' } as const

const vcrSwitch = choice('tv-vcr', 'TV/VCR', 'mode', {
  positions: { tv: 'TV', vcr: 'VCR' },
  access: 'front',
})

export const RECORDERS = {
  'quillmark-vr-90': device({
    maker: 'Quillmark',
    name: 'VR-90',
    kind: 'recorder',
    market: '525-m',
    aliases: ['VR90', 'hi-fi tape recorder'],
    year: 1993,
    factSource: 'manual',
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), stereoIn('sound-in')),
        group('OUT', compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')),
        rfIn('rf-in', 'RF IN', 'f-socket'),
        rfOut('rf-out', 'RF OUT', 'f-socket'),
      ],
    ],
    controls: [
      inputChoice({ tuner: 'TUNER', line: 'LINE' }),
      vcrSwitch,
      channelSwitch(THREE_FOUR),
      airCable(),
      airCableTuner('tuned-to'),
    ],
    functions: recorderFunctions({
      tape: { scan: '525i60', colour: 'ntsc-m', sound: 'stereo' },
      pictureOuts: ['video-out'],
      soundOuts: ['sound-out'],
      lines: [
        { key: 'line', label: 'Takes the line input', picture: 'video-in', sound: 'sound-in' },
      ],
      lineAccepts: NTSC_LINE,
      tunerAccepts: heardOn(NTSC_LINE, ['M']),
      rf: carrier('M', { levelDbmv: 7 }),
      rfKind: 'switched',
    }),
    leaks: [{ from: 'rf-out', to: 'rf-in', db: 62 }],
    remote: 'optional',
    mains: mains120(24),
    weightGrams: 5200,
  }),

  'quillmark-vr-70': device({
    maker: 'Quillmark',
    name: 'VR-70',
    kind: 'recorder',
    market: '525-m',
    aliases: ['VR70'],
    year: 1985,
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), monoIn('sound-in', 'AUDIO')),
        group('OUT', compositeOut('video-out', 'VIDEO'), monoOut('sound-out', 'AUDIO')),
        rfIn('rf-in', 'RF IN', 'f-socket'),
        rfOut('rf-out', 'RF OUT', 'f-socket'),
      ],
    ],
    controls: [
      inputChoice({ tuner: 'TUNER', line: 'LINE' }),
      choice('tv-vcr', 'OUTPUT', 'mode', { positions: { tv: 'TV', vcr: 'REC' }, access: 'back' }),
      channelSwitch(THREE_FOUR),
      tuner('tuned-to', 'PRESET', 'presets', {
        reaches: [{ plan: 'us-broadcast', names: '2..83' }],
      }),
    ],
    functions: recorderFunctions({
      tape: { scan: '525i60', colour: 'ntsc-m', sound: 'mono' },
      pictureOuts: ['video-out'],
      soundOuts: ['sound-out'],
      lines: [
        { key: 'line', label: 'Takes the line input', picture: 'video-in', sound: 'sound-in' },
      ],
      lineAccepts: NTSC_LINE,
      tunerAccepts: heardOn(NTSC_LINE, ['M']),
      rf: carrier('M', { levelDbmv: 6 }),
      rfKind: 'switched',
    }),
    leaks: [{ from: 'rf-out', to: 'rf-in', db: 60 }],
    mains: mains120(38),
    weightGrams: 9600,
  }),

  'fennock-rv-22': device({
    maker: 'Fennock',
    name: 'RV-22',
    kind: 'recorder',
    market: '625-i',
    aliases: ['RV22'],
    year: 1996,
    factSource: 'manual',
    back: [
      [
        group('AERIAL', rfIn('rf-in', 'IN', 'iec-socket'), rfOut('rf-out', 'RF OUT', 'iec-plug')),
        scart('av', 'AV', { takes: ['composite', 'sound'], gives: ['composite', 'sound'] }),
      ],
    ],
    front: [[group('LINE', compositeIn('line-video', 'VIDEO'), stereoIn('line-sound'))]],
    controls: [
      inputChoice({ tuner: 'TUNER', av: 'AV', line: 'LINE' }),
      channelSwitch(
        { plan: 'uk-uhf', names: '30..39' },
        { label: 'RF CHANNEL', where: { access: 'menu', look: 'menu' } },
      ),
      tuner('tuned-to', 'PRESET', 'presets', { reaches: [UHF_I] }),
    ],
    functions: recorderFunctions({
      tape: { scan: '625i50', colour: 'pal', sound: 'stereo' },
      pictureOuts: ['av-composite-out'],
      soundOuts: ['av-sound-out'],
      lines: [
        { key: 'line', label: 'Takes LINE', picture: 'line-video', sound: 'line-sound' },
        { key: 'av', label: 'Takes AV', picture: 'av-composite-in', sound: 'av-sound-in' },
      ],
      lineAccepts: PAL_LINE,
      tunerAccepts: heardOn(PAL_LINE, ['I'], ['G']),
      rf: carrier('I', { levelDbmv: 8 }),
      rfKind: 'added',
    }),
    leaks: [{ from: 'rf-out', to: 'rf-in', db: 45 }],
    remote: 'optional',
    mains: mains230(20),
    weightGrams: 4300,
  }),

  'lindrake-vx-5': device({
    maker: 'Lindrake',
    name: 'VX-5',
    kind: 'recorder',
    market: '625-bg',
    aliases: ['VX5'],
    year: 1994,
    back: [
      [
        group('ANTENNE', rfIn('rf-in', 'IN', 'iec-socket'), rfOut('rf-out', 'OUT', 'iec-plug')),
        scart('av-1', 'AV 1', { takes: ['composite', 'sound'], gives: ['composite', 'sound'] }),
        scart('av-2', 'AV 2', { takes: ['composite', 'sound'] }),
      ],
    ],
    controls: [
      inputChoice({ tuner: 'TUNER', 'av-1': 'AV 1', 'av-2': 'AV 2' }),
      channelScrew({ plan: 'ccir-west-europe', names: '30..40' }, 543.25, 623.25, 'CH 30-40'),
      tuner('tuned-to', 'PROGRAMME', 'search', {
        reaches: [
          { plan: 'ccir-west-europe', names: 'E2..E4' },
          { plan: 'ccir-west-europe', names: 'E5..E12' },
          { plan: 'ccir-west-europe', names: '21..69' },
        ],
      }),
    ],
    functions: recorderFunctions({
      tape: { scan: '625i50', colour: 'pal', sound: 'stereo' },
      pictureOuts: ['av-1-composite-out'],
      soundOuts: ['av-1-sound-out'],
      lines: [
        { key: 'av-1', label: 'Takes AV 1', picture: 'av-1-composite-in', sound: 'av-1-sound-in' },
        { key: 'av-2', label: 'Takes AV 2', picture: 'av-2-composite-in', sound: 'av-2-sound-in' },
      ],
      lineAccepts: PAL_LINE,
      tunerAccepts: heardOn(PAL_LINE, ['B', 'G'], ['I']),
      rf: carrier('G', { levelDbmv: 8 }),
      rfKind: 'added',
    }),
    leaks: [{ from: 'rf-out', to: 'rf-in', db: 45 }],
    remote: 'optional',
    mains: mains230(22),
    weightGrams: 4700,
  }),
}
