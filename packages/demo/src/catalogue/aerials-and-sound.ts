import {
  at,
  device,
  group,
  inputChoice,
  mainsAny,
  monoOut,
  opticalIn,
  receives,
  rfOut,
  sounds,
  stereoIn,
  stereoOut,
  turns,
} from '@coaxwain/models/build'

export const AERIALS = {
  'pellmere-ra-2': device({
    maker: 'Pellmere',
    name: 'RA-2',
    kind: 'aerial',
    market: '525-m',
    aliases: ['RA2', 'indoor aerial', 'indoor antenna'],
    year: 1978,
    back: [[rfOut('out', '300 Ω', 'spades', { mount: 'lead', note: 'Flat lead, 1.2 m.' })]],
    functions: [receives('receive', 'out')],
    weightGrams: 420,
  }),

  'corbray-ry-10': device({
    maker: 'Corbray',
    name: 'RY-10',
    kind: 'aerial',
    market: '525-m',
    aliases: ['RY10', 'roof aerial', 'roof antenna'],
    year: 1995,
    back: [[rfOut('out', '75 Ω', 'f-plug', { mount: 'lead', note: 'Downlead, 18 m.' })]],
    functions: [receives('receive', 'out')],
    weightGrams: 2600,
  }),

  'fennock-ua-18': device({
    maker: 'Fennock',
    name: 'UA-18',
    kind: 'aerial',
    market: '625-i',
    aliases: ['UA18', 'roof aerial'],
    year: 2001,
    back: [[rfOut('out', '75 Ω', 'iec-plug', { mount: 'lead', note: 'Downlead, 12 m.' })]],
    functions: [receives('receive', 'out')],
    weightGrams: 1500,
  }),
}

export const SOUND = {
  'belloway-ls-2': device({
    maker: 'Belloway',
    name: 'LS-2',
    kind: 'loudspeakers',
    market: 'any',
    aliases: ['LS2', 'powered loudspeakers'],
    year: 2003,
    back: [[group('LINE', stereoIn('line', ['L/MONO', 'R'])), opticalIn('optical')]],
    controls: [inputChoice({ line: 'LINE', optical: 'OPTICAL' }, { access: 'front' })],
    functions: [
      turns('line-sound', 'makes-sound', 'line', {
        gives: [],
        label: 'Plays LINE',
        while: at('input', 'line'),
      }),
      turns('optical-sound', 'makes-sound', 'optical', {
        gives: [],
        label: 'Plays OPTICAL',
        while: at('input', 'optical'),
      }),
    ],
    mains: mainsAny(30),
    weightGrams: 4200,
  }),

  'belloway-mx-1': device({
    maker: 'Belloway',
    name: 'MX-1',
    kind: 'sound-box',
    market: 'any',
    aliases: ['MX1', 'two-to-one sound mixer'],
    year: 1990,
    back: [[group('IN', stereoIn('in')), group('OUT', stereoOut('loop')), monoOut('mono', 'MONO')]],
    functions: [
      turns('mix', 'mixes-sound', 'in', {
        gives: [sounds('loop', 'same'), sounds('mono', 'mono')],
        label: 'Adds left and right',
        power: 'none',
      }),
    ],
    weightGrams: 210,
  }),
}
