import type { Question, Snapshot, Unit } from '@coaxwain/shelf'
import type { Chance } from '../../support/chance'

/** Questions about any source of a shelf and any display, each pair once; with sound or without. */
export function* drawQuestions(
  { units, models }: Snapshot,
  chance: Chance,
  sound: 'as-recorded' | 'none',
): Generator<Question> {
  const devices = units.flatMap((unit) => {
    const model = models[unit.model]
    return model?.type === 'device' ? [{ unit, model }] : []
  })
  const sources = devices.flatMap(({ unit, model }) =>
    model.functions.filter((f) => f.kind === 'plays').map((f) => ({ unit, playing: f.key })),
  )
  const displays = devices.filter(({ model }) => model.display !== undefined).map((d) => d.unit)
  const asked = new Set<string>()
  while (sources.length > 0 && displays.length > 0) {
    const { unit, playing } = chance.pick(sources)
    const display: Unit = chance.pick(displays)
    const name = `${unit.uid} ${playing} ${display.uid}`
    if (unit === display || asked.has(name)) continue
    asked.add(name)
    yield {
      format: 1,
      source: { unit: unit.uid, playing },
      material: { protection: 'none', ...(sound === 'none' ? { sound } : {}) },
      display: { unit: display.uid },
      demands: {},
      avoid: [],
      offAir: [],
      assumedLeads: [],
    }
  }
}
