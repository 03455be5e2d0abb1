import { z } from 'zod'
import { name, uid, version } from './text'

/** A room, a shelf, a box; places stand inside places. */
export const place = z.strictObject({
  uid,
  name: name(80),
  parent: uid.nullable(),
  /** Names from the outermost place to this one. */
  path: z.array(z.string()),
  version,
  /** Units that stand in exactly this place. */
  units: z.int().min(0),
})
export type Place = z.infer<typeof place>

export const places = z.strictObject({ items: z.array(place) })

export const newPlace = z.strictObject({
  uid: uid.optional(),
  name: name(80),
  parent: uid.nullable().optional(),
})
export type NewPlace = z.infer<typeof newPlace>

/** An absent field stays; `parent: null` moves to the top. */
export const placeChange = z.strictObject({
  name: name(80).optional(),
  parent: uid.nullable().optional(),
})
export type PlaceChange = z.infer<typeof placeChange>
