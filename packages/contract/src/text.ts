import { z } from 'zod'

/** Control characters other than TAB and LF; the C1 set too. */
// eslint-disable-next-line no-control-regex -- it is there to find them
const CONTROL = /[\u0000-\u0008\u000b-\u001f\u007f-\u009f]/
/** Half of a surrogate pair cannot be stored as text. */
const HALF_CHARACTER = /\p{Surrogate}/u
const LINE_BREAK_OR_TAB = /[\t\n]/

const clean = (max: number) =>
  z
    .string()
    .normalize('NFC')
    .max(max)
    .refine((s) => !CONTROL.test(s) && !HALF_CHARACTER.test(s), {
      params: { code: 'control-character' },
    })

/** A text of several lines; may be empty. */
export const prose = (max: number) => clean(max)

/** A text of one line; may be empty. */
export const line = (max: number) =>
  clean(max).refine((s) => !LINE_BREAK_OR_TAB.test(s), { params: { code: 'several-lines' } })

/** A text of one line with something in it. */
export const name = (max: number) =>
  line(max).refine((s) => /\S/.test(s), { params: { code: 'blank' } })

/** Outward id: 128 random bits in base64url. */
export const uid = z.string().regex(/^[A-Za-z0-9_-]{22}$/)

const FORBIDDEN_KEYS: readonly string[] = ['__proto__', 'constructor', 'prototype']

/** Name of a port, jack, control, function or position within a model. */
export const key = z
  .string()
  .min(1)
  .max(60)
  .regex(/^[A-Za-z0-9][A-Za-z0-9._:-]*$/)
  .refine((s) => !FORBIDDEN_KEYS.includes(s), { params: { code: 'bad-format' } })

/** A day of the calendar, without a time zone. */
export const plainDate = z.iso.date()

/** An instant in UTC with milliseconds. */
export const instant = z.iso.datetime({ precision: 3 })

/** Grows by one with each change; its quoted form is the ETag. */
export const version = z.int().min(1)

/** A number that came in a query string. */
export const queryNumber = (schema: z.ZodNumber) =>
  z
    .string()
    .regex(/^-?\d{1,9}(\.\d{1,6})?$/)
    .transform(Number)
    .pipe(schema)

export const queryFlag = z.enum(['true', 'false']).transform((v) => v === 'true')
