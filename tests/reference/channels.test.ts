import { channelsOf, findChannel, PLAN_IDS, type Channel, type PlanId } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { readTable, type CsvRow } from './csv'

/** The published tables, row by row, each with its source in the last columns but one. */
const rows = readTable('channels')

const mhz = (text: string | undefined): number | null => (text ? Number(text) : null)

const ours = (r: CsvRow): Channel | null => findChannel(r['plan'] as PlanId, r['channel'] ?? '')

const wrong = (agrees: (channel: Channel, row: CsvRow) => boolean): string[] =>
  rows
    .filter((row) => {
      const channel = ours(row)
      return channel === null || !agrees(channel, row)
    })
    .map((r) => `${r['plan']} ${r['channel']}`)

const near = (found: number | null, published: number | null): boolean =>
  found === null || published === null ? found === published : Math.abs(found - published) <= 0.0006

describe('channel plans', () => {
  it('hold every row of the published tables and no other', () => {
    const published = rows.map((r) => `${r['plan']} ${r['channel']}`).sort()
    const found = PLAN_IDS.filter((p) => p !== 'uk-405')
      .flatMap((p) => channelsOf(p).map((c) => `${p} ${c.name}`))
      .sort()
    expect(found).toEqual(published)
  })

  it('agree with every frequency to 0.6 kHz', () => {
    expect(
      wrong(
        (c, r) =>
          near(c.lowerMhz, mhz(r['lower_mhz'])) &&
          near(c.upperMhz, mhz(r['upper_mhz'])) &&
          near(c.visionMhz, mhz(r['vision_mhz'])) &&
          near(c.soundMhz, mhz(r['sound_mhz'])),
      ),
    ).toEqual([])
  })

  it('agree in system and band, in what is still used off air, and name the same source', () => {
    expect(
      wrong(
        (c, r) =>
          c.system === r['system'] &&
          c.band === r['band'] &&
          c.allocated === r['still_allocated'] &&
          c.source === r['source'],
      ),
    ).toEqual([])
  })

  it('stand by what makes a row unsure', () => {
    const words = {
      two: 'two independent sources agree',
      one: 'one source',
      regulation: 'sources conflict; value follows the regulation',
      memory: 'from memory',
    }
    expect(wrong((c, r) => words[c.confidence] === r['confidence'])).toEqual([])
  })
})
