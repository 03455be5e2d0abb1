import type { Chain, PortRef } from '@coaxwain/shelf'
import type { ShelfView } from '../shelf-view'

/** Rings that aerial leads may form: a kept aerial makes one or two, a house with loops a few more. */
const MOST_RINGS = 5

/**
 * Whether signals on the air could run round a chain in so many ways that following all of them would not
 * end in time. What runs on other wires is followed once, however it is joined.
 */
export function isTangled({ links }: Chain, view: ShelfView): boolean {
  const onAir = links.filter((l) => takesRf(l.from, view) && takesRf(l.to, view))
  const units = new Set(onAir.flatMap((l) => [l.from.unit, l.to.unit]))
  return onAir.length - units.size >= MOST_RINGS
}

const takesRf = ({ unit, port }: PortRef, view: ShelfView): boolean =>
  view.port(unit, port)?.circuits.some((c) => c.circuit === 'rf') ?? false
