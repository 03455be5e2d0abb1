import {
  ACCESSES,
  CONTROL_LOOKS,
  CONTROL_ROLES,
  DEVICE_KINDS,
  FACT_SOURCES,
  FUNCTION_KINDS,
  KNOWLEDGE,
  MARKETS,
  OUTCOMES,
  PIECE_KINDS,
  PLUG_COLOURS,
  PORT_FACES,
  SCREENS,
  SHAPES,
  SOUND_GIVES,
  TRIM_QUANTITIES,
  TUNING_WAYS,
  type DeviceModel,
  type Model,
  type ModelFunction,
  type PieceModel,
  type Port,
  type Jack,
} from '@coaxwain/models'
import {
  CIRCUITS,
  COLOURS,
  CONNECTORS,
  DIGITAL_SYSTEMS,
  DIRECTIONS,
  FORMS,
  PLAN_IDS,
  RF_SYSTEM_IDS,
  SCAN_IDS,
  SOUND_LEVELS,
  SWITCH_VOLTS,
} from '@coaxwain/signal'
import { z } from 'zod'
import type { Holds, Same } from './same'
import { key, line, name, prose } from './text'

const circuit = z.enum(CIRCUITS)
const connector = z.enum(CONNECTORS)
const volts = z.array(z.enum(SWITCH_VOLTS)).max(2)
const label = line(80)

/** Wide enough for anything that was ever sold, narrow enough to stop a slip of the finger. */
const finite = (low: number, high: number) => z.number().min(low).max(high)
const whole = (low: number, high: number) => z.int().min(low).max(high)
const mhz = finite(0, 3000)
const dbmv = finite(-80, 100)

/** Spans such as `14..69` are counted out, so their ends stay as short as the names of any plan. */
const channelNames = z
  .string()
  .min(1)
  .max(400)
  .regex(/^[A-Za-z0-9+/*'(), .-]+$/)
  .refine((names) => !/\d{4}/.test(names), { params: { code: 'bad-format' } })

export const planPart = z.strictObject({
  plan: z.enum(PLAN_IDS),
  names: channelNames.optional(),
})

const condition = z
  .array(z.strictObject({ control: key, in: z.array(key).min(1).max(100) }))
  .max(20)

const load = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.enum(['75', 'high', 'ends-itself', 'unknown']) }),
  z.strictObject({ kind: z.literal('switch'), control: key, position75: key }),
])

const portDocument = z.strictObject({
  key,
  label,
  connector,
  mount: z.enum(['chassis', 'lead']),
  circuits: z
    .array(
      z.strictObject({
        circuit,
        dir: z.enum(DIRECTIONS),
        level: z.enum(SOUND_LEVELS).optional(),
      }),
    )
    .max(30),
  group: key.optional(),
  impedanceOhm: finite(1, 100_000).optional(),
  load: load.optional(),
  loopsTo: key.optional(),
  ring: z.enum(PLUG_COLOURS).optional(),
  origin: z.enum(['factory', 'added']),
  isolated: z.enum(KNOWLEDGE),
  suppliesDcVolts: finite(-100, 100).optional(),
  needsDcVolts: finite(-100, 100).optional(),
  standsDc: z.enum(KNOWLEDGE).optional(),
  at: z.strictObject({
    face: z.enum(PORT_FACES),
    row: whole(0, 40),
    column: whole(0, 100),
  }),
  note: prose(1000).optional(),
  retired: z.boolean().optional(),
})

const jackDocument = z.strictObject({
  key,
  form: z.enum(FORMS),
  dir: z.enum(['in', 'out']),
  contacts: z
    .array(z.strictObject({ circuit, port: key }))
    .min(1)
    .max(30),
  label: label.optional(),
})

const controlBase = {
  key,
  label,
  access: z.enum(ACCESSES),
  look: z.enum(CONTROL_LOOKS),
  forgets: z.boolean().optional(),
}

const position = { key, label }

const carriers = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('channels'), part: planPart }),
  z.strictObject({
    kind: z.literal('span'),
    lowMhz: mhz,
    highMhz: mhz,
    stepMhz: finite(0.0001, 100).nullable(),
    part: planPart,
  }),
])

const autoCause = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.enum(['signal-at', 'voltage-at', 'plug-in']), port: key }),
  z.strictObject({ kind: z.literal('powered') }),
  z.strictObject({ kind: z.literal('otherwise') }),
])

const control = z.discriminatedUnion('kind', [
  z.strictObject({
    ...controlBase,
    kind: z.literal('positions'),
    role: z.enum(CONTROL_ROLES),
    positions: z.array(z.strictObject(position)).min(1).max(100),
    reset: key.optional(),
  }),
  z.strictObject({
    ...controlBase,
    kind: z.literal('channel'),
    carriers,
    toleranceMhz: finite(0, 20),
  }),
  z.strictObject({
    ...controlBase,
    kind: z.literal('tuned-to'),
    way: z.enum(TUNING_WAYS),
    reaches: z
      .array(z.strictObject({ part: planPart, while: condition.optional() }))
      .min(1)
      .max(40),
    pullInMhz: finite(0, 20),
  }),
  z.strictObject({
    ...controlBase,
    kind: z.literal('trim'),
    quantity: z.enum(TRIM_QUANTITIES),
    stands: finite(-10_000, 10_000).optional(),
    aim: finite(-10_000, 10_000).optional(),
  }),
  z.strictObject({
    ...controlBase,
    kind: z.literal('auto'),
    positions: z
      .array(z.strictObject({ ...position, cause: autoCause }))
      .min(1)
      .max(100),
  }),
])

const acceptRow = z.strictObject({
  jacks: z.array(key).max(100).optional(),
  scans: z.union([z.literal('any'), z.array(z.enum(SCAN_IDS)).max(40)]),
  colours: z.union([z.literal('any'), z.array(z.enum(COLOURS)).max(40)]),
  systems: z.array(z.enum(RF_SYSTEM_IDS)).max(20).optional(),
  digital: z.array(z.enum(DIGITAL_SYSTEMS)).max(10).optional(),
  while: condition.optional(),
  volts: volts.optional(),
  outcome: z.enum(OUTCOMES).optional(),
})

const pictureGive = z.strictObject({
  scan: z.enum([...SCAN_IDS, 'same']),
  colour: z.enum([...COLOURS, 'same']),
  while: condition.optional(),
  converts: z.boolean().optional(),
  shape: z.enum(SHAPES).optional(),
})

const rfGive = z.strictObject({
  channel: z.union([z.strictObject({ control: key }), z.strictObject({ part: planPart })]),
  system: z.enum(RF_SYSTEM_IDS),
  colours: z.array(z.enum(COLOURS)).max(20),
  sideband: z.enum(['vestigial', 'double']),
  levelDbmv: dbmv,
  sound: z.enum(['none', 'mono', 'stereo']),
  always: z.boolean().optional(),
  while: condition.optional(),
})

const give = z.strictObject({
  jack: key,
  while: condition.optional(),
  picture: z.array(pictureGive).max(60).optional(),
  sound: z.enum(SOUND_GIVES).optional(),
  rf: z.array(rfGive).max(60).optional(),
  volts: volts.optional(),
})

const functionDocument = z.strictObject({
  key,
  kind: z.enum(FUNCTION_KINDS),
  label: label.optional(),
  while: condition.optional(),
  needs: z.array(key).max(60),
  oneOf: z.array(key).max(60).optional(),
  optional: z
    .array(
      z.strictObject({
        jack: key,
        ifAbsent: z.enum(['silent', 'left-on-both', 'free-running']),
        while: condition.optional(),
      }),
    )
    .max(60)
    .optional(),
  accepts: z.array(acceptRow).max(100),
  gives: z.array(give).max(100),
  tunedBy: key.optional(),
  power: z.enum(['on', 'standby', 'none']),
  bandwidthMhz: finite(0, 1000).optional(),
  gainDb: finite(-120, 120).optional(),
  delayMs: finite(0, 60_000).optional(),
  inputAgc: z.boolean().optional(),
  hdcp: z.boolean().optional(),
  storesFields: z.boolean().optional(),
  separator: z.enum(['comb', 'notch', 'capacitor']).optional(),
})

const span = z.tuple([finite(0, 1000), finite(0, 1000)])

const modelBase = {
  format: z.literal(1),
  maker: name(80),
  name: name(80),
  market: z.enum(MARKETS),
  aliases: z.array(name(80)).max(40),
  year: whole(1900, 2100).optional(),
  factSource: z.enum(FACT_SOURCES),
}

const device = z.strictObject({
  ...modelBase,
  type: z.literal('device'),
  kind: z.enum(DEVICE_KINDS),
  groups: z.array(z.strictObject({ key, label })).max(60),
  ports: z.array(portDocument).max(200),
  jacks: z.array(jackDocument).max(300),
  controls: z.array(control).max(100),
  functions: z.array(functionDocument).max(100),
  leaks: z.array(z.strictObject({ from: key, to: key, db: finite(-200, 200) })).max(100),
  chassis: z.enum(['isolated', 'live', 'unknown']),
  mains: z
    .strictObject({
      volts: z.tuple([finite(1, 1000), finite(1, 1000)]),
      hz: z.array(finite(1, 500)).max(4),
      watts: finite(0, 10_000).optional(),
    })
    .optional(),
  pack: z
    .strictObject({
      current: z.enum(['ac', 'dc']),
      volts: finite(0, 1000),
      milliamps: finite(0, 100_000),
      polarity: z.enum(['centre-positive', 'centre-negative']).optional(),
      plug: line(80).optional(),
    })
    .optional(),
  remote: z.enum(['none', 'optional', 'needed']),
  display: z
    .strictObject({
      screen: z.enum(SCREENS),
      deflection: z.strictObject({
        lineKhz: z.array(span).min(1).max(20),
        fieldHz: z.array(span).min(1).max(20),
        fixed: z.boolean(),
      }),
      shape: z.enum(['4:3', '16:9']),
      loudspeakers: z.enum(['none', 'mono', 'stereo']),
      storesFields: z.boolean(),
      convertsScan: z.boolean(),
      directView: z.boolean(),
    })
    .optional(),
  weightGrams: finite(0, 1_000_000).optional(),
})

const plug = z.strictObject({ connector, colour: z.enum(PLUG_COLOURS).optional() })
const wireEnd = z.strictObject({ plug: whole(0, 40), circuit: z.enum([...CIRCUITS, 'any']) })

const piece = z.strictObject({
  ...modelBase,
  type: z.literal('piece'),
  kind: z.enum(PIECE_KINDS),
  a: z.array(plug).max(40),
  b: z.array(plug).max(40),
  wires: z
    .array(z.strictObject({ a: wireEnd, b: wireEnd, way: z.enum(['both', 'a-to-b', 'b-to-a']) }))
    .max(200),
  meantFor: z.array(circuit).max(30).optional(),
  lossDb: finite(-10, 200),
  impedanceOhm: z.tuple([finite(1, 100_000), finite(1, 100_000)]).optional(),
  mixes: z.boolean(),
  suppliesVolts: volts,
  blocksDc: z.boolean(),
  lengthMm: finite(0, 1_000_000).optional(),
})

/** The schemas and the domain types say the same, in both directions. */
export type ModelDocumentAgrees = [
  Holds<Same<z.infer<typeof device>, DeviceModel>>,
  Holds<Same<z.infer<typeof piece>, PieceModel>>,
  Holds<Same<z.infer<typeof portDocument>, Port>>,
  Holds<Same<z.infer<typeof jackDocument>, Jack>>,
  Holds<Same<z.infer<typeof functionDocument>, ModelFunction>>,
]

export const port: z.ZodType<Port> = portDocument
export const jack: z.ZodType<Jack> = jackDocument
export const modelFunction: z.ZodType<ModelFunction> = functionDocument
export const deviceModel: z.ZodType<DeviceModel> = device

/** A whole description as it is stored, one revision at a time. */
export const modelDocument: z.ZodType<Model> = z.discriminatedUnion('type', [device, piece])
