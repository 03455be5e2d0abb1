import type { Hookup } from '@coaxwain/shelf'
import { TIER } from '@coaxwain/signal'

type Ranked = Pick<Hookup, 'worksFully' | 'axes'>

/**
 * The default order: works fully; no doubt; some sound, as nobody asks to see alone; picture; sound; nothing
 * to replug; fewer powered boxes; fewer pieces. Ties break by content, never by id or name.
 */
export function compareHookups(a: Ranked, b: Ranked): number {
  return (
    Number(b.worksFully) - Number(a.worksFully) ||
    Number(a.axes.doubt > 0) - Number(b.axes.doubt > 0) ||
    Number(b.axes.sound > 0) - Number(a.axes.sound > 0) ||
    b.axes.picture - a.axes.picture ||
    b.axes.sound - a.axes.sound ||
    a.axes.disturbance - b.axes.disturbance ||
    a.axes.boxes - b.axes.boxes ||
    a.axes.pieces - b.axes.pieces ||
    a.axes.doubt - b.axes.doubt
  )
}

/** A silent or half answer is left out when another of its picture tier has more sound. */
export function withSound(hookups: readonly Hookup[]): Hookup[] {
  const heard = new Set(
    hookups.filter((h) => h.axes.sound >= 2).map((h) => TIER[h.picture.quality]),
  )
  return hookups.filter((h) => h.axes.sound >= 2 || !heard.has(TIER[h.picture.quality]))
}

type Better = (a: Hookup, b: Hookup) => number

const AXES: readonly Better[] = [
  (a, b) => a.axes.doubt - b.axes.doubt,
  (a, b) => b.axes.picture - a.axes.picture,
  (a, b) => a.axes.boxes - b.axes.boxes || a.axes.pieces - b.axes.pieces,
  (a, b) => b.axes.sound - a.axes.sound,
]

/** The best of each axis first, then by order, so many at most. */
export function choose(
  hookups: readonly Hookup[],
  most: number,
): { shown: Hookup[]; more: number } {
  const ordered = [...hookups].sort(compareHookups)
  const full = ordered.filter((h) => h.worksFully)
  const pool = full.length > 0 ? full : ordered
  const firsts = AXES.flatMap((better) =>
    [...pool].sort((a, b) => better(a, b) || compareHookups(a, b)).slice(0, 1),
  )
  const [best] = ordered
  const shown = [...new Set([...(best ? [best] : []), ...firsts, ...ordered])].slice(0, most)
  return { shown: shown.sort(compareHookups), more: ordered.length - shown.length }
}
