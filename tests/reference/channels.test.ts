import { readFileSync } from 'node:fs'
import { channelsOf, PLAN_IDS, type PlanId } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'

/** The published tables, row by row, each with its source in the last columns but one. */
const rows = parse(readFileSync(new URL('./data/channels.csv', import.meta.url), 'utf8'))

function parse(text: string): Record<string, string>[] {
  const [head = [], ...lines] = text
    .trim()
    .split('\n')
    .map((line) =>
      [...line.matchAll(/("([^"]|"")*"|[^,]*)(,|$)/g)].map((m) =>
        (m[1] ?? '').replace(/^"|"$/g, ''),
      ),
    )
  return lines.map((cells) => Object.fromEntries(head.map((name, i) => [name, cells[i] ?? ''])))
}

const mhz = (text: string | undefined): number | null => (text ? Number(text) : null)

describe('channel plans', () => {
  it('hold every row of the published tables and no other', () => {
    const published = rows.map((r) => `${r.plan} ${r.channel}`).sort()
    const ours = PLAN_IDS.filter((p) => p !== 'uk-405')
      .flatMap((p) => channelsOf(p).map((c) => `${p} ${c.name}`))
      .sort()
    expect(ours).toEqual(published)
  })

  it('agree with every frequency to 0.6 kHz and name a source', () => {
    const wrong = rows.filter((r) => {
      const ours = channelsOf(r.plan as PlanId).find((c) => c.name === r.channel)
      if (!ours || ours.source !== r.source) return true
      const pairs = [
        [ours.lowerMhz, mhz(r.lower_mhz)],
        [ours.upperMhz, mhz(r.upper_mhz)],
        [ours.visionMhz, mhz(r.vision_mhz)],
        [ours.soundMhz, mhz(r.sound_mhz)],
      ] as const
      return pairs.some(
        ([a, b]) => (a === null) !== (b === null) || Math.abs((a ?? 0) - (b ?? 0)) > 0.0006,
      )
    })
    expect(wrong.map((r) => `${r.plan} ${r.channel}`)).toEqual([])
  })
})
