import type { Jack, Key } from '../model'
import type { Circuit, Form } from '@coaxwain/signal'
import {
  jack,
  onPort,
  one,
  port,
  single,
  type Fitting,
  type PortOptions,
  type Socket,
} from './fittings'

/** Video lines are 75 ohm, and an ordinary input ends its line (IEC 60933-1; common practice, no source). */
const LINE: PortOptions = { impedanceOhm: 75 }
const ENDED: PortOptions = { ...LINE, load: { kind: '75' } }

type Sort = Omit<Socket, 'dir'>

const COMPOSITE: Sort = { connector: 'phono-socket', form: 'composite', circuits: ['cvbs'] }
const S_VIDEO: Sort = { connector: 'svideo4-socket', form: 's-video', circuits: ['y', 'c'] }
const HDMI: Sort = { connector: 'hdmi-socket', form: 'hdmi', circuits: ['tmds'] }
const HD15: Sort = {
  connector: 'hd15-socket',
  form: 'rgbhv',
  circuits: ['r', 'g', 'b', 'hsync', 'vsync'],
}
const TTL: Sort = {
  connector: 'de9-socket',
  form: 'rgbi',
  circuits: ['ttl-r', 'ttl-g', 'ttl-b', 'ttl-i', 'hsync', 'vsync'],
}

type Make = (key: Key, label: string, options?: PortOptions) => Fitting

const output =
  (sort: Sort, usual: PortOptions = {}): Make =>
  (key, label, options) =>
    single(key, label, { ...sort, dir: 'out' }, { ...usual, ...options })

const input =
  (sort: Sort, usual: PortOptions = {}): Make =>
  (key, label, options) =>
    single(key, label, { ...sort, dir: 'in' }, { ...usual, ...options })

export const compositeOut = output(COMPOSITE, LINE)
export const compositeIn = input(COMPOSITE, ENDED)
export const sVideoOut = output(S_VIDEO, LINE)
export const sVideoIn = input(S_VIDEO, ENDED)
export const hdmiOut = output(HDMI)
export const hdmiIn = input(HDMI)
export const hd15Out = output(HD15, LINE)
export const hd15In = input(HD15, ENDED)
export const ttlOut = output(TTL)
export const ttlIn = input(TTL)

interface ThreeWay {
  /** Told apart from further forms over the same three ports. */
  readonly label?: string | undefined
  readonly also?: { readonly key: Key; readonly label: string } | undefined
}

/** Three phonos: luma with sync, and two colour differences. Ports are `KEY-y`, `KEY-pb`, `KEY-pr`. */
function component(key: Key, dir: Jack['dir'], given: ThreeWay): Fitting {
  const circuits = ['y', 'pb', 'pr'] as const
  const usual = dir === 'in' ? ENDED : LINE
  const contacts = circuits.map((circuit) => ({ circuit, port: `${key}-${circuit}` }))
  const first = jack(key, 'component', dir, contacts)
  return {
    ports: circuits.map((circuit) =>
      port(`${key}-${circuit}`, circuit.toUpperCase(), [one(circuit, dir)], {
        connector: 'phono-socket',
        ...usual,
      }),
    ),
    jacks: given.also
      ? [
          { ...first, label: given.label },
          { ...first, ...given.also },
        ]
      : [first],
  }
}

export const componentOut = (key: Key, given: ThreeWay = {}): Fitting =>
  component(key, 'out', given)
export const componentIn = (key: Key): Fitting => component(key, 'in', {})

/** One form over some of the bayonet sockets of a monitor. */
export interface BayonetForm {
  readonly key: Key
  readonly form: Form
  /** The circuit that each socket takes, by the key of the socket. */
  readonly takes: Readonly<Record<Key, Circuit>>
}

/** Bayonet sockets in a row, named by key and label, whose meaning depends on the input chosen. */
export function bayonetsIn(
  sockets: Readonly<Record<Key, string>>,
  forms: readonly BayonetForm[],
): Fitting {
  return {
    ports: Object.entries(sockets).map(([key, label]) => {
      const circuits = new Set(forms.flatMap((f) => f.takes[key] ?? []))
      return port(
        key,
        label,
        [...circuits].map((c) => one(c, 'in')),
        { connector: 'bnc-socket', ...ENDED },
      )
    }),
    jacks: forms.map((f) =>
      jack(
        f.key,
        f.form,
        'in',
        Object.entries(f.takes).map(([socket, circuit]) => ({ circuit, port: socket })),
      ),
    ),
  }
}

interface RoundForm {
  readonly key: Key
  readonly form: Form
  readonly circuits: readonly Circuit[]
}

/** Round connectors of home computers: several forms over one socket. */
export function dinOut(
  key: Key,
  label: string,
  connector: 'din5-socket' | 'din6-socket',
  forms: readonly RoundForm[],
): Fitting {
  const circuits = [...new Set(forms.flatMap((f) => f.circuits))]
  return {
    ports: [
      port(
        key,
        label,
        circuits.map((c) => one(c, 'out')),
        { connector },
      ),
    ],
    jacks: forms.map((f) => jack(f.key, f.form, 'out', onPort(key, f.circuits))),
  }
}
