import {
  LINES_15K,
  NTSC_LINE,
  SAME,
  THREE_FOUR,
  at,
  carrier,
  channelSwitch,
  choice,
  compositeIn,
  dcPack,
  device,
  gives,
  group,
  mains120,
  monoIn,
  packSocket,
  passes,
  rfIn,
  rfOut,
  stereoIn,
  trim,
  turns,
  whenOff,
} from '@coaxwain/models/build'

/** Small boxes let less through than their channel would (common practice, no source). */
const SMALL_MHZ = 3.4

export const MODULATORS = {
  'pellmere-vm-2': device({
    maker: 'Pellmere',
    name: 'VM-2',
    kind: 'modulator',
    market: '525-m',
    aliases: ['VM2'],
    year: 1998,
    factSource: 'manual',
    back: [
      [
        packSocket('12 V'),
        group(
          'IN',
          compositeIn('video-in', 'VIDEO', {
            load: { kind: 'switch', control: 'termination', position75: '75-ohm' },
          }),
          stereoIn('sound-in'),
        ),
        rfIn('ant-in', 'ANT IN', 'f-socket'),
        rfOut('to-tv', 'TO TV', 'f-socket'),
      ],
    ],
    controls: [
      channelSwitch(THREE_FOUR),
      choice('termination', 'VIDEO IN', 'termination', {
        positions: { '75-ohm': '75 Ω', high: 'HIGH' },
        access: 'back',
      }),
    ],
    functions: [
      turns('modulator', 'modulates', 'video-in', {
        gives: [gives('to-tv', SAME, { sound: 'same', rf: [carrier('M', { levelDbmv: 6 })] })],
        label: 'Modulates',
        sound: 'sound-in',
        accepts: NTSC_LINE,
        bandwidthMhz: SMALL_MHZ,
      }),
      passes('aerial-loop', 'loop-through', 'ant-in', {
        to: ['to-tv'],
        label: 'Passes the aerial on',
        while: whenOff(),
        gainDb: -1,
      }),
    ],
    leaks: [{ from: 'to-tv', to: 'ant-in', db: 62 }],
    pack: dcPack(12, 200),
    weightGrams: 310,
  }),

  'varnhope-rm-1': device({
    maker: 'Varnhope',
    name: 'RM-1',
    kind: 'modulator',
    market: '525-m',
    aliases: ['RM1'],
    year: 1994,
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), monoIn('sound-in', 'AUDIO')),
        rfOut('rf-lead', 'TO TV', 'f-plug', { mount: 'lead', note: 'Fixed lead, 1 m.' }),
      ],
    ],
    controls: [channelSwitch(THREE_FOUR, { toleranceMhz: 0.25 })],
    functions: [
      turns('modulator', 'modulates', 'video-in', {
        gives: [gives('rf-lead', SAME, { sound: 'same', rf: [carrier('M', { levelDbmv: 4 })] })],
        label: 'Modulates',
        sound: 'sound-in',
        accepts: NTSC_LINE,
        bandwidthMhz: SMALL_MHZ,
      }),
    ],
    pack: { current: 'dc', volts: 9, milliamps: 100, plug: 'fixed lead' },
    weightGrams: 150,
  }),

  'corbray-hm-60': device({
    maker: 'Corbray',
    name: 'HM-60',
    kind: 'modulator',
    market: '525-m',
    aliases: ['HM60', 'head-end modulator'],
    year: 1991,
    factSource: 'manual',
    back: [
      [
        group(
          'IN',
          compositeIn('video-in', 'VIDEO', { connector: 'f-socket' }),
          monoIn('sound-in', 'AUDIO', { connector: 'f-socket' }),
        ),
        rfOut('rf-out', 'RF OUT', 'f-socket'),
      ],
    ],
    controls: [
      channelSwitch(
        { plan: 'us-cable-std', names: '2..36' },
        { label: 'CHANNEL', where: { access: 'front', look: 'knob' }, toleranceMhz: 0.01 },
      ),
      trim('video-level', 'VIDEO LEVEL', 'video-level'),
      trim('sound-level', 'AUDIO LEVEL', 'sound-level'),
    ],
    functions: [
      turns('modulator', 'modulates', 'video-in', {
        gives: [
          gives('rf-out', SAME, {
            sound: 'same',
            rf: [carrier('M', { levelDbmv: 15.5, sideband: 'vestigial' })],
          }),
        ],
        label: 'Modulates',
        sound: 'sound-in',
        accepts: NTSC_LINE,
        bandwidthMhz: 4.2,
      }),
    ],
    mains: mains120(18),
    weightGrams: 2100,
  }),

  'fennock-um-3': device({
    maker: 'Fennock',
    name: 'UM-3',
    kind: 'modulator',
    market: '625-i',
    aliases: ['UM3', 'UHF modulator'],
    year: 1999,
    back: [
      [
        group('IN', compositeIn('video-in', 'VIDEO'), stereoIn('sound-in')),
        group('AERIAL', rfIn('aerial-in', 'IN', 'iec-socket'), rfOut('rf-out', 'OUT', 'iec-plug')),
        packSocket('9 V'),
      ],
    ],
    controls: [
      channelSwitch(
        { plan: 'uk-uhf', names: '21..69' },
        { label: 'CHANNEL', where: { access: 'front', look: 'push' } },
      ),
      choice('standard', 'SOUND', 'standard', {
        positions: { i: '6.0', g: '5.5' },
        access: 'back',
      }),
    ],
    functions: [
      turns('modulator', 'modulates', 'video-in', {
        gives: [
          gives('rf-out', SAME, {
            sound: 'same',
            rf: [
              carrier('I', { levelDbmv: 9, always: true, while: at('standard', 'i') }),
              carrier('G', { levelDbmv: 9, always: true, while: at('standard', 'g') }),
            ],
          }),
        ],
        label: 'Modulates',
        sound: 'sound-in',
        accepts: [{ scans: LINES_15K, colours: ['pal', 'secam', 'pal-60', 'ntsc-443', 'mono'] }],
      }),
      passes('aerial-loop', 'loop-through', 'aerial-in', {
        to: ['rf-out'],
        label: 'Passes the aerial on',
        gainDb: -4,
      }),
    ],
    leaks: [{ from: 'rf-out', to: 'aerial-in', db: 50 }],
    pack: dcPack(9, 300),
    weightGrams: 260,
  }),
}
