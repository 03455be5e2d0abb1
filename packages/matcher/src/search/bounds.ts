import { FORM_MHZ, RF_SYSTEMS, SOUND_RANK, TIER, type PictureForm } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import { priceOf } from '../compile/variant'
import type { Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import { fromLoudspeakers } from './measure'
import type { SearchSpace } from './search'

const PICTURE = { picture: true, sound: false }

/** What a chain that ends at an output still has to pay at least, and the best it can still become. */
export interface Outlook {
  /** Further units before the display. */
  readonly units: number
  readonly boxes: number
  readonly pieces: number
  readonly bought: number
  readonly doubt: number
  readonly tier: number
  readonly lumaMhz: number
  readonly sound: number
}

/** Composite of the 625-line systems keeps 5 MHz (ITU-R BT.470). */
const WIDEST_COMPOSITE_MHZ = 5

function mhzInto(way: Way): number {
  const form = way.into?.face.form ?? null
  if (form === null) return 0
  if (form === 'composite') return WIDEST_COMPOSITE_MHZ
  if (form !== 'rf') return FORM_MHZ[form]
  const systems = way.fn.accepts.flatMap((row) => row.systems ?? [])
  return systems.length === 0
    ? Infinity
    : Math.max(...systems.map((system) => RF_SYSTEMS[system].videoMhz))
}

const tierOf = (form: PictureForm | null): number => (form === null ? 0 : TIER[form])

const soundInto = (way: Way, speakers: readonly Way[]): number => {
  const display = way.variant.device.display
  if (!display) return 0
  const own = way.soundFrom === null ? 'none' : fromLoudspeakers('stereo', display)
  return Math.max(SOUND_RANK[own], way.soundFrom === null && speakers.length > 0 ? 3 : 0)
}

const best = (a: Outlook, b: Outlook): Outlook => ({
  units: Math.min(a.units, b.units),
  boxes: Math.min(a.boxes, b.boxes),
  pieces: Math.min(a.pieces, b.pieces),
  bought: Math.min(a.bought, b.bought),
  doubt: Math.min(a.doubt, b.doubt),
  tier: Math.max(a.tier, b.tier),
  lumaMhz: Math.max(a.lumaMhz, b.lumaMhz),
  sound: Math.max(a.sound, b.sound),
})

const same = (a: Outlook, b: Outlook): boolean =>
  (Object.keys(a) as (keyof Outlook)[]).every((key) => a[key] === b[key])

/** The outlook before a join, from the one after it. */
function across(joins: JoinTable, out: Face, into: Face, after: Outlook): Outlook | null {
  const ways = joins.between(out, into, PICTURE)
  if (ways.length === 0) return null
  return {
    ...after,
    pieces: after.pieces + Math.min(...ways.map((j) => j.pieces)),
    bought: after.bought + Math.min(...ways.map((j) => j.bought)),
    tier: Math.min(after.tier, tierOf(out.form)),
  }
}

/** The outlook before a box, from the one at its output. */
const before = (way: Way, after: Outlook): Outlook => ({
  units: after.units + 1,
  boxes: after.boxes + (way.variant.powered ? 1 : 0),
  pieces: after.pieces + (way.variant.powered ? 0 : 1),
  bought: after.bought + priceOf(way.variant),
  doubt: after.doubt,
  tier: Math.min(after.tier, tierOf(way.into?.face.form ?? null)),
  lumaMhz: Math.min(after.lumaMhz, mhzInto(way)),
  sound: after.sound,
})

/**
 * What lies at least between each output face and the display, by plugs and circuits alone; every axis by
 * itself, so that it never promises too little. Faces from which the display cannot be reached are missing.
 */
export function outlooks(
  space: Pick<SearchSpace, 'ends' | 'starts' | 'joins' | 'boxes' | 'speakers'>,
): ReadonlyMap<number, Outlook> {
  const { joins } = space
  const outs = new Map<number, Face>()
  for (const way of [...space.boxes, ...space.starts.map((s) => s.way)]) {
    if (way.from) outs.set(way.from.face.id, way.from.face)
  }
  const into = new Map<number, { face: Face; outlook: Outlook }>()
  const note = (face: Face, outlook: Outlook): boolean => {
    const known = into.get(face.id)
    const improved = known ? best(known.outlook, outlook) : outlook
    if (known && same(known.outlook, improved)) return false
    into.set(face.id, { face, outlook: improved })
    return true
  }
  for (const way of space.ends) {
    if (!way.into) continue
    note(way.into.face, {
      units: 0,
      boxes: 0,
      pieces: 0,
      bought: 0,
      doubt: way.offers[0]?.doubt ?? 0,
      tier: tierOf(way.into.face.form),
      lumaMhz: mhzInto(way),
      sound: soundInto(way, space.speakers),
    })
  }
  const found = new Map<number, Outlook>()
  for (let changed = true; changed;) {
    changed = false
    for (const out of outs.values()) {
      for (const { face, outlook } of into.values()) {
        const here = across(joins, out, face, outlook)
        if (!here) continue
        const known = found.get(out.id)
        found.set(out.id, known ? best(known, here) : here)
      }
    }
    for (const way of space.boxes) {
      const after = way.from && found.get(way.from.face.id)
      if (after && way.into && note(way.into.face, before(way, after))) changed = true
    }
  }
  return found
}
