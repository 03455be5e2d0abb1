import type { Face } from '../compile/face'
import type { Way } from '../compile/way'
import type { SearchSpace } from './search'

const PICTURE = { picture: true, sound: false }

/**
 * How many further units at least lie between a face and the display, by plugs and circuits alone.
 * Faces from which the display cannot be reached are not in the map.
 */
export function reachEnd(
  space: Pick<SearchSpace, 'ends' | 'starts' | 'joins'>,
  boxes: ReadonlyMap<Face, readonly Way[]>,
): Map<number, number> {
  const outs = new Map<number, Face>()
  for (const way of [...[...boxes.values()].flat(), ...space.starts.map((s) => s.way)]) {
    if (way.from) outs.set(way.from.face.id, way.from.face)
  }
  const steps = new Map<number, number>()
  let reached = [...new Set(space.ends.flatMap((w) => (w.into ? [w.into.face] : [])))]
  for (let step = 0; reached.length > 0; step++) {
    const fresh = new Set<number>()
    for (const out of outs.values()) {
      if (steps.has(out.id)) continue
      if (reached.some((into) => space.joins.between(out, into, PICTURE).length > 0)) {
        steps.set(out.id, step)
        fresh.add(out.id)
      }
    }
    reached = [...boxes]
      .filter(([, ways]) => ways.some((w) => w.from !== null && fresh.has(w.from.face.id)))
      .map(([face]) => face)
  }
  return steps
}
