import { whenWrong, type WhenWrong } from '@coaxwain/checker'
import { describe, expect, it } from 'vitest'
import { HOOKUP, QUESTION, SNAPSHOT } from '../../fixtures/disc-to-set'
import { cutSnapshot } from '../../format/cut-snapshot'
import { createLookup } from '../../format/lookup'
import { sayIn } from '../../format/words'
import { wrongRows } from './wrong-rows'

const lookup = createLookup(SNAPSHOT)
const say = sayIn('en-GB')
const wrongs = whenWrong(SNAPSHOT, QUESTION, HOOKUP)

const setting = HOOKUP.settings[0]
const seen = (rest: Partial<WhenWrong>): WhenWrong => ({
  unit: setting?.unit ?? '',
  control: setting?.control ?? '',
  position: 'other',
  sees: 'same',
  hears: 'same',
  ...rest,
})

describe('what to do when something else is seen', () => {
  it('says a control once for each sight, however many of its positions lead there', () => {
    const twice = [seen({ sees: 'snow' }), seen({ sees: 'snow', position: 'third' })]
    const rows = wrongRows(twice, HOOKUP, lookup, say)
    expect(rows.map((r) => [r.key, r.checks.length])).toEqual([['snow', 1]])
  })

  it('goes by what is heard only where the picture is as it should be', () => {
    const rows = wrongRows(
      [seen({ hears: 'silent' }), seen({ sees: 'nothing', hears: 'silent' })],
      HOOKUP,
      lookup,
      say,
    )
    expect(rows.map((r) => r.key)).toEqual(['nothing', 'silent'])
  })

  it('leaves no word of the check unsaid', () => {
    const rows = wrongRows(wrongs, HOOKUP, lookup, say)
    expect(rows.length).toBeGreaterThan(1)
    expect(rows.map((r) => `${r.sees} ${r.checks.join(' ')}`).join(' ')).not.toMatch(/[{}]/)
  })
})

describe('the part of a shelf that a hookup rests on', () => {
  it('leads to the same findings as the whole shelf', () => {
    const cut = cutSnapshot(SNAPSHOT, HOOKUP, QUESTION)
    expect(whenWrong(cut, QUESTION, HOOKUP)).toEqual(wrongs)
  })

  it('holds no unit that the hookup does not use', () => {
    const stranger = { ...SNAPSHOT.units[0]!, uid: 'stranger00000000000000', model: 'none' }
    const more = { ...SNAPSHOT, units: [...SNAPSHOT.units, stranger] }
    expect(cutSnapshot(more, HOOKUP, QUESTION)).toEqual(cutSnapshot(SNAPSHOT, HOOKUP, QUESTION))
  })
})
