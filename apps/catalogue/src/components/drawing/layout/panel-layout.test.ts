import { describe, expect, it } from 'vitest'
import { randomDrawing } from '../../../fixtures/random-drawings'
import { overlaps } from './boxes'
import { layoutPanel, panelWords, type PanelInput } from './panel-layout'

const panels = (seed: number): PanelInput[] =>
  randomDrawing(seed, 3).units.map(({ ports, controls, captions, moulded }) => ({
    ports,
    controls,
    captions,
    moulded,
  }))

describe('layout of a panel', () => {
  it('keeps words and numbers clear of one another', () => {
    const found: string[] = []
    for (let seed = 1; seed <= 120; seed++) {
      for (const panel of panels(seed)) {
        const words = panelWords(layoutPanel(panel, 704, true))
        words.forEach((a, i) =>
          words
            .slice(i + 1)
            .filter((b) => overlaps(a.box, b.box, -0.5))
            .forEach((b) => found.push(`${seed}: ${a.what} / ${b.what}`)),
        )
      }
    }
    expect(found).toEqual([])
  })

  it('puts a face that does not fit beside the others under them', () => {
    const [panel] = panels(4)
    if (!panel) throw new Error('no panel')
    const front = { ...panel.ports[0]!, key: 'front', face: 'front' as const }
    const layout = layoutPanel({ ...panel, ports: [...panel.ports, front] }, 100, true)
    expect(new Set(layout.faces.map((f) => f.y)).size).toBe(layout.faces.length)
  })
})
