import type { Label } from './boxes'
import { textWidth } from './text-width'

export interface WantedName {
  readonly text: string
  /** Where its middle would best stand. */
  readonly x: number
}

const GAP = 14
const LINE = 16
const FURTHEST = 70

/**
 * Puts names on a line without overlap, each as near as can be to its place; what would be pushed too far
 * goes one line lower.
 */
export function placeNames(
  wanted: readonly WantedName[],
  y: number,
  width: number,
): { labels: Label[]; lines: number } {
  let left = [...wanted].sort((a, b) => a.x - b.x)
  const labels: Label[] = []
  let line = 0
  while (left.length > 0 && line < 6) {
    const last = line === 5
    const { kept, dropped } = onOneLine(left, width, last)
    labels.push(...kept.map((k) => label(k.text, k.x, y + line * LINE)))
    left = dropped
    line++
  }
  return { labels, lines: line }
}

const label = (text: string, x: number, y: number): Label => ({
  text,
  x,
  y,
  anchor: 'middle',
  size: 12,
  weight: 400,
  tone: 'ink2',
})

/** Drops the one pushed furthest until all that remain stand near their place. */
function onOneLine(
  wanted: readonly WantedName[],
  width: number,
  keepAll: boolean,
): { kept: WantedName[]; dropped: WantedName[] } {
  let kept = [...wanted]
  const dropped: WantedName[] = []
  for (;;) {
    const placed = settle(kept, width)
    const pushed = placed.map((p, i) => Math.abs(p.x - (kept[i]?.x ?? 0)))
    const worst = Math.max(...pushed)
    if (worst <= FURTHEST || keepAll || kept.length === 1) return { kept: placed, dropped }
    const at = pushed.indexOf(worst)
    dropped.push(...kept.slice(at, at + 1))
    kept = kept.filter((_, i) => i !== at)
  }
}

/** Groups that touch share their displacement: each group stands at the mean of what its members want. */
function settle(wanted: readonly WantedName[], width: number): WantedName[] {
  interface Group {
    from: number
    offsets: number[]
    x: number
    w: number
  }
  const widths = wanted.map((n) => textWidth(n.text, 12, 400))
  const groups: Group[] = []
  const fit = (g: Group): void => {
    const mean =
      g.offsets.reduce((sum, off, i) => sum + (wanted[g.from + i]?.x ?? 0) - off, 0) /
      g.offsets.length
    g.x = Math.min(Math.max(mean, 0), Math.max(0, width - g.w))
  }
  wanted.forEach((_, i) => {
    const w = widths[i] ?? 0
    const group: Group = { from: i, offsets: [w / 2], x: 0, w }
    fit(group)
    groups.push(group)
    while (groups.length > 1) {
      const b = groups[groups.length - 1] as Group
      const a = groups[groups.length - 2] as Group
      if (a.x + a.w + GAP <= b.x) break
      a.offsets.push(...b.offsets.map((off) => off + a.w + GAP))
      a.w += GAP + b.w
      groups.pop()
      fit(a)
    }
  })
  return groups.flatMap((g) =>
    g.offsets.map((off, i) => ({ text: wanted[g.from + i]?.text ?? '', x: g.x + off })),
  )
}
