import type { Hookup } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { HOOKUP } from '../fixtures/disc-to-set'
import { pickAnswers } from './pick-answers'

const with_ = (axes: Partial<Hookup['axes']>, worksFully = true): Hookup => ({
  ...HOOKUP,
  worksFully,
  axes: { ...HOOKUP.axes, ...axes },
})

describe('picking the first three answers', () => {
  it('picks the best of each merit', () => {
    const picks = pickAnswers([
      with_({ doubt: 0, picture: 242, boxes: 2 }),
      with_({ doubt: 1, picture: 342, boxes: 2 }),
      with_({ doubt: 1, picture: 242, boxes: 1 }),
    ])
    expect(picks).toEqual([
      { index: 0, merits: ['tested'] },
      { index: 1, merits: ['picture'] },
      { index: 2, merits: ['boxes'] },
    ])
  })

  it('shows once what is best in several ways', () => {
    expect(pickAnswers([with_({}), with_({ doubt: 3, boxes: 4, picture: 100 })])).toEqual([
      { index: 0, merits: ['tested', 'picture', 'boxes'] },
    ])
  })

  it('prefers a full answer over a poorer one with fewer boxes', () => {
    const picks = pickAnswers([with_({ boxes: 2 }), with_({ boxes: 0 }, false)])
    expect(picks[0]).toEqual({ index: 0, merits: ['tested', 'picture', 'boxes'] })
  })

  it('picks nothing from nothing', () => {
    expect(pickAnswers([])).toEqual([])
  })
})
