import type { Point } from './boxes'

const BEND = 10

const f = (v: number): string => String(Math.round(v * 100) / 100)

/** Drops points that repeat or lie on a straight line between their neighbours. */
export function corners(points: readonly Point[]): Point[] {
  const kept: Point[] = []
  for (const p of points) {
    const last = kept.at(-1)
    if (last && Math.abs(last.x - p.x) < 0.01 && Math.abs(last.y - p.y) < 0.01) continue
    const before = kept.at(-2)
    const straight =
      before &&
      last &&
      ((before.x === last.x && last.x === p.x) || (before.y === last.y && last.y === p.y))
    if (straight) kept.pop()
    kept.push(p)
  }
  return kept
}

/** A line through right-angled points with its corners rounded. */
export function roundedPath(points: readonly Point[], bend = BEND): string {
  const at = corners(points)
  const [first] = at
  if (!first) return ''
  let d = `M${f(first.x)} ${f(first.y)}`
  for (let i = 1; i < at.length; i++) {
    const p = at[i] as Point
    const before = at[i - 1] as Point
    const next = at[i + 1]
    if (!next) {
      d += `L${f(p.x)} ${f(p.y)}`
      continue
    }
    const into = Math.hypot(p.x - before.x, p.y - before.y)
    const out = Math.hypot(next.x - p.x, next.y - p.y)
    const r = Math.min(bend, into / 2, out / 2)
    const ax = p.x - ((p.x - before.x) / into) * r
    const ay = p.y - ((p.y - before.y) / into) * r
    const bx = p.x + ((next.x - p.x) / out) * r
    const by = p.y + ((next.y - p.y) / out) * r
    d += `L${f(ax)} ${f(ay)}Q${f(p.x)} ${f(p.y)} ${f(bx)} ${f(by)}`
  }
  return d
}
