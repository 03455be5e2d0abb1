import type { CaseControl, CaseUnit, When } from './form'

/** Every condition that something of a unit depends on. */
function whensIn(thing: unknown): When[] {
  if (thing === null || typeof thing !== 'object') return []
  const { when } = thing as { when?: When }
  return [...(when ? [when] : []), ...Object.values(thing).flatMap(whensIn)]
}

/** The positions of each control that conditions name. */
function positionsNamed(unit: CaseUnit): Map<string, string[]> {
  const named = new Map<string, string[]>()
  for (const when of whensIn({ ...unit, settings: undefined })) {
    for (const [control, positions] of Object.entries(when))
      named.set(control, [...new Set([...(named.get(control) ?? []), ...positions])])
  }
  return named
}

/** A unit with a control for everything that names one, also where its list has forgotten it. */
export function withImplied(unit: CaseUnit): CaseUnit {
  const implied = new Map<string, CaseControl>()
  for (const [name, choices] of positionsNamed(unit))
    implied.set(name, { name, class: 'other', choices })
  for (const { rf, tuner } of unit.ports) {
    if (rf?.control !== undefined)
      implied.set(rf.control, { name: rf.control, class: 'channel', choices: rf.channels })
    if (tuner?.control !== undefined)
      implied.set(tuner.control, { name: tuner.control, class: 'tuned-to' })
  }
  const listed = unit.settings ?? []
  const missing = [...implied.values()].filter((c) => !listed.some((l) => l.name === c.name))
  return missing.length === 0 ? unit : { ...unit, settings: [...listed, ...missing] }
}
