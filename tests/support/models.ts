import type { DeviceModel, PieceModel, Port } from '@coaxwain/models'

const port = (key: string, rest: Partial<Port> = {}): Port => ({
  key,
  label: key.toUpperCase(),
  connector: 'phono-socket',
  mount: 'chassis',
  circuits: [{ circuit: 'cvbs', dir: 'out' }],
  origin: 'factory',
  isolated: 'yes',
  at: { face: 'back', row: 0, column: 0 },
  ...rest,
})

/** A player with one picture and two sound sockets. */
export const player = (rest: Partial<DeviceModel> = {}): DeviceModel => ({
  format: 1,
  type: 'device',
  kind: 'disc-player',
  maker: 'Testmaker',
  name: 'PL-1',
  market: '525-m',
  aliases: ['Player One'],
  year: 1998,
  factSource: 'guess',
  groups: [],
  ports: [
    port('video'),
    port('left', { circuits: [{ circuit: 'audio-l', dir: 'out' }] }),
    port('right', { circuits: [{ circuit: 'audio-r', dir: 'out' }] }),
  ],
  jacks: [
    {
      key: 'composite',
      form: 'composite',
      dir: 'out',
      contacts: [{ circuit: 'cvbs', port: 'video' }],
    },
    {
      key: 'sound',
      form: 'sound',
      dir: 'out',
      contacts: [
        { circuit: 'audio-l', port: 'left' },
        { circuit: 'audio-r', port: 'right' },
      ],
    },
  ],
  controls: [],
  functions: [
    {
      key: 'plays',
      kind: 'plays',
      needs: [],
      accepts: [],
      gives: [
        { jack: 'composite', picture: [{ scan: '525i60', colour: 'ntsc-m' }] },
        { jack: 'sound', sound: 'stereo' },
      ],
      power: 'on',
    },
  ],
  leaks: [],
  chassis: 'isolated',
  remote: 'optional',
  ...rest,
})

/** A monitor with the sockets to match, and a switch for its line termination. */
export const monitor = (rest: Partial<DeviceModel> = {}): DeviceModel => ({
  ...player(),
  kind: 'monitor',
  name: 'MO-2',
  aliases: [],
  ports: [
    port('video-in', { circuits: [{ circuit: 'cvbs', dir: 'in' }] }),
    port('left-in', { circuits: [{ circuit: 'audio-l', dir: 'in' }] }),
    port('right-in', { circuits: [{ circuit: 'audio-r', dir: 'in' }] }),
  ],
  jacks: [
    {
      key: 'composite-in',
      form: 'composite',
      dir: 'in',
      contacts: [{ circuit: 'cvbs', port: 'video-in' }],
    },
    {
      key: 'sound-in',
      form: 'sound',
      dir: 'in',
      contacts: [
        { circuit: 'audio-l', port: 'left-in' },
        { circuit: 'audio-r', port: 'right-in' },
      ],
    },
  ],
  controls: [
    {
      key: 'input',
      label: 'INPUT',
      access: 'front',
      look: 'push',
      kind: 'positions',
      role: 'input',
      positions: [
        { key: 'a', label: 'A' },
        { key: 'b', label: 'B' },
      ],
    },
  ],
  functions: [
    {
      key: 'shows',
      kind: 'shows',
      needs: ['composite-in'],
      optional: [{ jack: 'sound-in', ifAbsent: 'silent' }],
      accepts: [{ scans: ['525i60'], colours: ['ntsc-m'], outcome: 'fine' }],
      gives: [],
      power: 'on',
    },
  ],
  display: {
    screen: 'tube-colour',
    deflection: { lineKhz: [[15.6, 15.8]], fieldHz: [[59, 61]], fixed: true },
    shape: '4:3',
    loudspeakers: 'stereo',
    storesFields: false,
    convertsScan: false,
    directView: true,
  },
  ...rest,
})

/** Puts out RF on UHF channels, chosen by a control. */
export const modulator = (rest: Partial<DeviceModel> = {}): DeviceModel => ({
  ...player(),
  kind: 'modulator',
  name: 'UM-3',
  aliases: [],
  ports: [
    port('video-in', { circuits: [{ circuit: 'cvbs', dir: 'in' }] }),
    port('rf-out', { connector: 'f-socket', circuits: [{ circuit: 'rf', dir: 'out' }] }),
  ],
  jacks: [
    {
      key: 'composite-in',
      form: 'composite',
      dir: 'in',
      contacts: [{ circuit: 'cvbs', port: 'video-in' }],
    },
    { key: 'rf', form: 'rf', dir: 'out', contacts: [{ circuit: 'rf', port: 'rf-out' }] },
  ],
  controls: [
    {
      key: 'channel',
      label: 'CHANNEL',
      access: 'back',
      look: 'knob',
      kind: 'channel',
      carriers: { kind: 'channels', part: { plan: 'us-broadcast', names: '14..20' } },
      toleranceMhz: 0.1,
    },
  ],
  functions: [
    {
      key: 'modulates',
      kind: 'modulates',
      needs: ['composite-in'],
      accepts: [{ scans: 'any', colours: 'any' }],
      gives: [
        {
          jack: 'rf',
          rf: [
            {
              channel: { control: 'channel' },
              system: 'M',
              colours: ['ntsc-m'],
              sideband: 'double',
              levelDbmv: 10,
              sound: 'mono',
            },
          ],
        },
      ],
      power: 'on',
    },
  ],
  ...rest,
})

/** A lead with one phono plug at each end. */
export const lead = (rest: Partial<PieceModel> = {}): PieceModel => ({
  format: 1,
  type: 'piece',
  kind: 'lead',
  maker: 'Testmaker',
  name: 'Phono lead',
  market: 'any',
  aliases: [],
  factSource: 'guess',
  a: [{ connector: 'phono-plug', colour: 'yellow' }],
  b: [{ connector: 'phono-plug', colour: 'yellow' }],
  wires: [{ a: { plug: 0, circuit: 'any' }, b: { plug: 0, circuit: 'any' }, way: 'both' }],
  lossDb: 0,
  mixes: false,
  suppliesVolts: [],
  blocksDc: false,
  ...rest,
})
