import type { HookupStep } from '@coaxwain/shelf'
import type { LinkPart } from './link-parts'

/**
 * Plugging points of each run of a link, counted from its first port. A run with k leads has k + 1 of them,
 * and every piece lies between the last of one run and the first of the next.
 */
function pointsOfRuns(parts: readonly LinkPart[]): number[][] {
  let point = 0
  return parts.flatMap((part) => {
    if (part.kind === 'piece') return []
    const points = Array.from({ length: part.leads.length + 1 }, () => point++)
    return [points]
  })
}

/** The segment of a link, as steps count them, in which a point is plugged. */
const segmentOf = (point: number): number => Math.max(0, point - 1)

/** Numbers of the steps that plug each run of a link; none stands on two runs that follow each other. */
export function runNumbers(
  steps: readonly HookupStep[],
  link: number,
  parts: readonly LinkPart[],
): number[][] {
  let shown: readonly number[] = []
  return pointsOfRuns(parts).map((points) => {
    const numbers = points.flatMap((point) =>
      steps
        .filter((s) => s.segments.some((g) => g.link === link && g.index === segmentOf(point)))
        .map((s) => s.number),
    )
    const all = [...new Set(numbers)]
    const fresh = all.filter((n) => !shown.includes(n))
    const own = fresh.length > 0 ? fresh : all
    shown = all
    return own
  })
}

export const settingNumber = (steps: readonly HookupStep[], setting: number): number | null =>
  steps.find((s) => s.settings.includes(setting))?.number ?? null
