import { ACCESSES, SHAPES } from '@coaxwain/models'
import {
  AIMS,
  DEGRADATIONS,
  LEG_PURPOSES,
  SETTING_REASONS,
  type Answer,
  type Hookup,
  type OffAir,
  type Question,
} from '@coaxwain/shelf'
import {
  CIRCUITS,
  COLOURS,
  DIGITAL_SYSTEMS,
  PICTURE_FORMS,
  PLAN_IDS,
  PROTECTIONS,
  QUALITIES,
  RF_SYSTEM_IDS,
  SCAN_IDS,
  SOUNDS,
} from '@coaxwain/signal'
import { z } from 'zod'
import { planPart } from './model-document'
import type { Holds, Same } from './same'
import { key, line, uid } from './text'

const offAirChannel = z.strictObject({
  plan: z.enum(PLAN_IDS),
  channel: line(20),
  kind: z.enum(['analogue', 'digital']),
  levelDbmv: z.number().min(-80).max(100).optional(),
})

export const questionDocument = z.strictObject({
  format: z.literal(1),
  source: z.strictObject({ unit: uid, playing: key }),
  material: z.strictObject({
    scan: z.enum(SCAN_IDS).optional(),
    colour: z.enum(COLOURS).optional(),
    shape: z.enum(SHAPES).optional(),
    protection: z.enum(PROTECTIONS),
    sound: z.enum(SOUNDS).optional(),
    twoProgrammes: z.boolean().optional(),
  }),
  display: z.strictObject({ unit: uid, input: key.optional() }),
  demands: z.strictObject({
    colour: z.boolean().optional(),
    stereo: z.boolean().optional(),
    keepAerial: z.boolean().optional(),
    aim: z.enum(AIMS).optional(),
  }),
  avoid: z.array(uid).max(1000),
  offAir: z.array(offAirChannel).max(200),
  assumedLeads: z.array(uid).max(1000),
})

/** A unit or a model of the shelf; in what one could buy also an ordinary part, by its key. */
const thing = z.string().regex(/^([A-Za-z0-9_-]{22}|part:[A-Za-z0-9._-]{1,60})$/)

const portRef = z.strictObject({ unit: thing, port: key })

export const linkDocument = z.strictObject({
  from: portRef,
  pieces: z
    .array(
      z.strictObject({
        model: thing,
        copy: z.int().min(0).max(1000),
        wayRound: z.enum(['forward', 'reverse']),
        inPlug: z.int().min(0).max(40),
        outPlug: z.int().min(0).max(40),
      }),
    )
    .max(20),
  to: portRef,
  circuits: z.array(z.strictObject({ from: z.enum(CIRCUITS), to: z.enum(CIRCUITS) })).max(30),
})

const carrier = z.strictObject({
  part: planPart,
  visionMhz: z.number(),
  channel: line(20),
  system: z.enum(RF_SYSTEM_IDS),
  digital: z.enum(DIGITAL_SYSTEMS).nullable(),
  sideband: z.enum(['vestigial', 'double']),
  levelDbmv: z.number(),
  sound: z.enum(SOUNDS),
})

const picture = z.strictObject({
  form: z.enum(PICTURE_FORMS),
  scan: z.enum(SCAN_IDS),
  colour: z.enum(COLOURS),
  poorest: z.enum(QUALITIES),
  lumaMhz: z.number(),
  protection: z.enum(PROTECTIONS),
  shape: z.enum(SHAPES),
  direct: z.boolean(),
  delayMs: z.number(),
  carrier: carrier.nullable(),
})

const leg = z.strictObject({
  purpose: z.enum(LEG_PURPOSES),
  stops: z
    .array(
      z.strictObject({
        unit: thing,
        function: key,
        in: key.nullable(),
        out: key.nullable(),
        picture: picture.nullable(),
        sound: z.enum(SOUNDS),
      }),
    )
    .max(40),
  links: z.array(z.int().min(0).max(200)).max(60),
})

const setting = z.strictObject({
  unit: thing,
  control: key,
  position: line(80),
  orElse: z.array(line(80)).max(200),
  plan: z.enum(PLAN_IDS).optional(),
  visionMhz: z.number().optional(),
  access: z.enum(ACCESSES),
  why: z.enum(SETTING_REASONS),
  must: z.boolean(),
})

const details = z.record(
  z.string().regex(/^[A-Za-z][A-Za-z0-9]{0,39}$/),
  z.union([line(400), z.number()]),
)
const code = z
  .string()
  .max(80)
  .regex(/^[a-z0-9][a-z0-9.:-]*$/)

const caution = z.strictObject({ code, details })

const hookupDocument = z.strictObject({
  legs: z.array(leg).max(20),
  links: z.array(linkDocument).max(200),
  ends: z
    .array(z.strictObject({ unit: thing, port: key, model: thing, copy: z.int().min(0).max(1000) }))
    .max(40)
    .optional(),
  settings: z.array(setting).max(200),
  picture: z.strictObject({
    colour: z.boolean(),
    quality: z.enum(QUALITIES),
    lumaMhz: z.number(),
    degradations: z.array(z.enum(DEGRADATIONS)).max(10),
  }),
  sound: z.strictObject({ sound: z.enum(SOUNDS), from: thing.nullable() }),
  worksFully: z.boolean(),
  cautions: z.array(caution).max(100),
  axes: z.strictObject({
    picture: z.number(),
    sound: z.number(),
    boxes: z.number(),
    pieces: z.number(),
    doubt: z.number(),
    disturbance: z.number(),
  }),
})

const answerDocument = z.strictObject({
  format: z.literal(1),
  verdict: z.enum(['yes', 'none']),
  complete: z.boolean(),
  work: z.number(),
  hookups: z.array(hookupDocument),
  moreCount: z.number(),
  obstacles: z.array(
    z.strictObject({ code, details, harmful: z.boolean(), lookalike: z.boolean() }),
  ),
  purchases: z.array(
    z.strictObject({
      parts: z.array(line(80)),
      hookup: hookupDocument,
      brings: z.array(caution),
      doesNot: z.array(caution),
    }),
  ),
})

export type QuestionAgrees = [
  Holds<Same<z.infer<typeof offAirChannel>, OffAir>>,
  Holds<Same<z.infer<typeof questionDocument>, Question>>,
  Holds<Same<z.infer<typeof hookupDocument>, Hookup>>,
  Holds<Same<z.infer<typeof answerDocument>, Answer>>,
]

export const offAir: z.ZodType<OffAir> = offAirChannel
export const question: z.ZodType<Question> = questionDocument
export const hookup: z.ZodType<Hookup> = hookupDocument
export const answer: z.ZodType<Answer> = answerDocument
