import type { Hookup, Uid } from '@coaxwain/shelf'

/** Units in the order in which they stand on the shelf line: signals run from left to right. */
export function unitOrder(hookup: Hookup): Uid[] {
  const met: Uid[] = []
  const note = (uid: Uid): void => {
    if (!met.includes(uid)) met.push(uid)
  }
  for (const purpose of ['picture', 'sound', 'aerial'] as const) {
    for (const leg of hookup.legs)
      if (leg.purpose === purpose) leg.stops.forEach((s) => note(s.unit))
  }
  for (const link of hookup.links) {
    note(link.from.unit)
    note(link.to.unit)
  }
  return topological(met, hookup)
}

/** Of the units that nothing left still feeds, the one met first comes next; a ring is broken at the first met. */
function topological(met: readonly Uid[], hookup: Hookup): Uid[] {
  const left = [...met]
  const ordered: Uid[] = []
  while (left.length > 0) {
    const fed = (uid: Uid): boolean =>
      hookup.links.some(
        (l) => l.to.unit === uid && l.from.unit !== uid && left.includes(l.from.unit),
      )
    const at = Math.max(
      0,
      left.findIndex((uid) => !fed(uid)),
    )
    ordered.push(...left.splice(at, 1))
  }
  return ordered
}
