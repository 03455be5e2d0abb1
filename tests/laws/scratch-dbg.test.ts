import { checkChain } from '@coaxwain/checker'
import { DEMO, snapshotOf } from '@coaxwain/demo'
import { findHookups } from '@coaxwain/matcher'
import {
  chainOf,
  fitted,
  type Chain,
  type ChainChecked,
  type Question,
  type Snapshot,
} from '@coaxwain/shelf'
import { SOUND_RANK, TIER } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'

/** One in so many pairs of a source and a display of the demonstration. */
const ONE_IN = 40
const MOST_ANSWERS = 3

const hash = (text: string): number =>
  [...text].reduce((sum, c) => (sum * 31 + c.charCodeAt(0)) >>> 0, 7)

const question = (source: string, playing: string, display: string): Question => ({
  format: 1,
  source: { unit: source, playing },
  material: { protection: 'none' },
  display: { unit: display },
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
})

function questionsOf(snapshot: Snapshot): Question[] {
  const devices = snapshot.units.flatMap((unit) => {
    const model = snapshot.models[unit.model]
    return model?.type === 'device'
      ? [{ uid: unit.uid, functions: fitted(model, unit.modifications).functions }]
      : []
  })
  return devices.flatMap((source) => {
    const playing = source.functions.find((f) => f.kind === 'plays')
    if (!playing) return []
    return devices
      .filter((d) => d !== source && d.functions.some((f) => f.kind === 'shows'))
      .filter((d) => hash(source.uid + d.uid) % ONE_IN === 0)
      .map((d) => question(source.uid, playing.key, d.uid))
  })
}

/** Sockets and leads, without a word on plugs, copies and switches. */
const forgetful = (chain: Chain): Chain => ({
  ...chain,
  settings: [],
  links: chain.links.map((l) => ({ ...l, pieces: l.pieces.map(({ model }) => ({ model })) })),
})

const faultsOf = ({ links, units, whole }: ChainChecked): string[] =>
  [...[...links, ...units].flatMap((x) => x.findings), ...whole]
    .filter((f) => f.weight === 'wrong' || f.weight === 'harm')
    .map((f) => f.code)

describe('an answer of the demonstration, entered by hand', () => {
  const answers = DEMO.collections.flatMap(({ key }) => {
    const snapshot = snapshotOf(DEMO, key)
    return questionsOf(snapshot).flatMap((asked) =>
      findHookups(snapshot, asked)
        .hookups.slice(0, MOST_ANSWERS)
        .map((hookup) => ({ snapshot, asked, hookup })),
    )
  })

  it('is there often enough to say something', () => {
    expect(answers.length).toBeGreaterThan(10)
  })

  it('is right, and shows and sounds as the answer says', () => {
    for (const { snapshot, asked, hookup } of answers) {
      const checked = checkChain(snapshot, asked, chainOf(hookup))
      DBG(checked, hookup, snapshot)
      expect(faultsOf(checked)).toEqual([])
      expect(checked.picture).toEqual(hookup.picture)
      expect(checked.sound.sound).toBe(hookup.sound.sound)
    }
  })

  it('is no worse when plugs and switches are left out', () => {
    for (const { snapshot, asked, hookup } of answers) {
      const checked = checkChain(snapshot, asked, forgetful(chainOf(hookup)))
      DBG(checked, hookup, snapshot)
      expect(faultsOf(checked)).toEqual([])
      expect(TIER[checked.picture?.quality ?? 'none']).toBeGreaterThanOrEqual(
        TIER[hookup.picture.quality],
      )
      expect(SOUND_RANK[checked.sound.sound]).toBeGreaterThanOrEqual(SOUND_RANK[hookup.sound.sound])
    }
  })
})

function DBG(c: any, h: any, s: any) { if (c.sound.sound !== h.sound.sound || c.picture?.quality !== h.picture.quality || JSON.stringify(c.picture) !== JSON.stringify(h.picture)) console.log('DBG', JSON.stringify([c.picture, h.picture, c.sound, h.sound, h.links.map((l:any)=>[l.from.unit, l.from.port,l.pieces.map((p:any)=>s.models[p.model].name+':'+p.copy+':'+p.inPlug),l.to.unit,l.to.port,l.circuits]), c.hookup.links.map((l:any)=>[l.pieces.map((p:any)=>p.copy+':'+p.inPlug),l.circuits]), h.settings.map((x:any)=>[x.control,x.position]), c.hookup.settings.map((x:any)=>[x.control,x.position])])) }
