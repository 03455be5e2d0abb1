import type { AcceptRow, DeviceModel, DisplayFacts, Jack, PieceModel } from '@coaxwain/models'
import {
  ANYTHING,
  cores,
  device,
  gives,
  one,
  piece,
  plays,
  port,
  rfIn,
  rfOut,
  shows,
  sounds,
  tuner,
  turns,
  type Fitting,
} from '@coaxwain/models/build'
import {
  COLOURS,
  FORM_CIRCUITS,
  isSingle,
  isSoundCircuit,
  type AnalogueCarrier,
  type Circuit,
  type Colour,
  type Connector,
  type Form,
  type PictureForm,
  type PlanPart,
  type Receiver,
  type ScanId,
  type Screen,
  type SwitchVolt,
} from '@coaxwain/signal'

/** What a bench device does not say of itself. */
const plain = (kind: DeviceModel['kind'], name: string) => ({
  maker: 'Bench',
  name,
  kind,
  market: 'any' as const,
})

// ---------------------------------------------------------------- sockets of one form

/** A form at one side of a device: all in one socket, or one socket to each circuit. */
export interface Sockets {
  readonly connector: Connector
  readonly form: Form
  /** Where they are not those of the form: composite as the sync of RGB, one sound instead of two. */
  readonly circuits?: readonly Circuit[]
  readonly ohm?: number
}

const circuitsOf = ({ form, circuits }: Sockets): readonly Circuit[] =>
  circuits ?? FORM_CIRCUITS[form]

const jackOver = (key: string, sockets: Sockets, dir: Jack['dir'], port?: string): Jack => ({
  key,
  form: sockets.form,
  dir,
  contacts: circuitsOf(sockets).map((circuit) => ({ circuit, port: port ?? `${key}-${circuit}` })),
})

interface SocketDraft {
  readonly key: string
  readonly circuits: readonly Circuit[]
  readonly dir: Jack['dir']
}

const socket = ({ connector, ohm = 75 }: Sockets, { key, circuits, dir }: SocketDraft) =>
  port(
    key,
    key.toUpperCase(),
    circuits.map((c) => one(c, dir)),
    {
      connector,
      impedanceOhm: ohm,
      ...(dir === 'in' && !circuits.every(isSoundCircuit) ? { load: { kind: '75' } } : {}),
      standsDc: 'yes',
    },
  )

/** A jack under a key, over one multi-way socket or as many single ones as it has circuits. */
export function fitting(key: string, sockets: Sockets, dir: Jack['dir']): Fitting {
  const circuits = circuitsOf(sockets)
  return isSingle(sockets.connector)
    ? {
        ports: circuits.map((c) => socket(sockets, { key: `${key}-${c}`, circuits: [c], dir })),
        jacks: [jackOver(key, sockets, dir)],
      }
    : {
        ports: [socket(sockets, { key, circuits, dir })],
        jacks: [jackOver(key, sockets, dir, key)],
      }
}

/** Picture and sound, in one multi-way socket where both have it; switching volts come along there. */
function panel(dir: Jack['dir'], picture: Sockets, sound?: Sockets): Fitting[] {
  const shared = sound?.connector === picture.connector && !isSingle(picture.connector)
  if (!sound || !shared) {
    return [fitting('picture', picture, dir), ...(sound ? [fitting('sound', sound, dir)] : [])]
  }
  const circuits = [...circuitsOf(picture), ...circuitsOf(sound)]
  return [
    {
      ports: [socket(picture, { key: 'av', circuits, dir })],
      jacks: [jackOver('picture', picture, dir, 'av'), jackOver('sound', sound, dir, 'av')],
    },
  ]
}

// ---------------------------------------------------------------- sources

export interface Plays {
  readonly scan: ScanId
  readonly colour: Colour
}

/** A box that plays one picture by one form; its sound has sockets of its own where it is to have any. */
export const player = ({ scan, colour }: Plays, out: Sockets, sound?: Sockets): DeviceModel =>
  device({
    ...plain('disc-player', 'Player'),
    back: [panel('out', out, sound)],
    functions: [
      plays('play', 'Plays', [
        gives('picture', [{ scan, colour }]),
        ...(sound
          ? [sounds('sound', circuitsOf(sound).includes('audio-mono') ? 'mono' : 'stereo')]
          : []),
      ]),
    ],
  })

/** Where a sender's aerial socket is, when it is no ordinary F socket. */
export interface AerialSocket {
  readonly connector: Connector
  readonly ohm: number
  readonly suppliesDc?: boolean
}

const F_SOCKET: AerialSocket = { connector: 'f-socket', ohm: 75 }

/** A box that puts one carrier out. */
export const sender = (
  sent: AnalogueCarrier,
  part: PlanPart,
  at: AerialSocket = F_SOCKET,
): DeviceModel =>
  device({
    ...plain('console', 'Sender'),
    back: [
      [
        rfOut('rf', 'RF', at.connector, {
          impedanceOhm: at.ohm,
          ...(at.suppliesDc ? { suppliesDcVolts: 12 } : {}),
        }),
      ],
    ],
    functions: [
      plays('play', 'Plays', [
        gives('rf', [{ scan: sent.scan, colour: sent.colour }], {
          sound: sent.sound === 'mono' ? 'mono' : 'stereo',
          rf: [
            {
              channel: { part },
              system: sent.system,
              colours: COLOURS,
              sideband: 'double',
              levelDbmv: 6,
              sound: sent.sound === 'mono' ? 'mono' : 'stereo',
            },
          ],
        }),
      ]),
    ],
  })

// ---------------------------------------------------------------- displays

const tube = (screen: Screen): DisplayFacts => ({
  screen: 'tube-colour',
  deflection: screen.deflection,
  shape: '4:3',
  loudspeakers: 'stereo',
  storesFields: false,
  convertsScan: false,
  directView: true,
})

/** In colour what the decoder knows, in grey whatever else the tube follows. */
const decoded = ({ colours }: Screen): readonly AcceptRow[] => [
  { scans: 'any', colours: [...colours, 'mono'] },
  { scans: 'any', colours: 'any', outcome: 'monochrome' },
]

/** Without a decoder only the own colours are taken. */
const undecoded = ({ colours }: Screen): readonly AcceptRow[] => [
  { scans: 'any', colours: [...colours] },
  { scans: 'any', colours: ['mono'] },
]

/** A set with an aerial socket and nothing else. */
export const aerialSet = (set: Receiver, at: AerialSocket = F_SOCKET): DeviceModel =>
  device({
    ...plain('television', 'Set'),
    back: [
      [
        rfIn('aerial', 'ANT', at.connector, {
          impedanceOhm: at.ohm,
          standsDc: at.suppliesDc === false ? 'no' : 'yes',
        }),
      ],
    ],
    controls: [
      { ...tuner('tuned', 'CH', 'numbers', { reaches: set.reaches }), pullInMhz: set.pullInMhz },
    ],
    functions: [
      shows('picture', 'Shows', 'aerial', {
        accepts: decoded(set).map((row) => ({
          ...row,
          systems: set.systems,
          digital: set.digital,
        })),
        tunedBy: 'tuned',
      }),
    ],
    display: tube(set),
  })

const DECODED: readonly PictureForm[] = ['composite', 's-video']

interface MonitorRest {
  readonly sound?: Sockets | undefined
  /** Voltages without which the input stays shut. */
  readonly volts?: readonly SwitchVolt[] | undefined
}

/** A monitor with one input, and sound sockets where it is to have any. */
export function monitor(
  screen: Screen,
  into: Sockets,
  { sound, volts }: MonitorRest = {},
): DeviceModel {
  const rows = DECODED.includes(into.form as PictureForm) ? decoded(screen) : undecoded(screen)
  return device({
    ...plain('monitor', 'Monitor'),
    back: [panel('in', into, sound)],
    functions: [
      shows('show', 'Shows', 'picture', {
        accepts: rows.map((row) => ({ ...row, volts })),
        sound: sound && 'sound',
      }),
    ],
    display: tube(screen),
  })
}

// ---------------------------------------------------------------- boxes between

/** Composite in by a bayonet, out by a phono, with or without a recorder's level control. */
export const recorder = (levelControl: boolean): DeviceModel =>
  device({
    ...plain('recorder', 'Recorder'),
    back: [
      [
        fitting('in', { connector: 'bnc-socket', form: 'composite' }, 'in'),
        fitting('out', { connector: 'phono-socket', form: 'composite' }, 'out'),
      ],
    ],
    functions: [
      turns('pass', 'selects', 'in', {
        accepts: ANYTHING,
        gives: [gives('out', [{ scan: 'same', colour: 'same' }])],
        inputAgc: levelControl,
      }),
    ],
  })

// ---------------------------------------------------------------- leads

/** One core with a plug at each end. */
export const lead = (a: Connector, b: Connector): PieceModel =>
  piece({ name: `Lead ${a} to ${b}`, kind: 'lead', a: [a], b: [b], wires: cores(1) })
