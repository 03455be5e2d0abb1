import type { Question } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { uidOf } from '../fixtures/builders'
import { QUESTION } from '../fixtures/disc-to-set'
import { queryToQuestion, questionToQuery } from './question-query'

describe('question in an address', () => {
  it('comes back as it was', () => {
    const rich: Question = {
      ...QUESTION,
      material: { protection: 'agc-pulses', scan: '525i60', colour: 'ntsc-m', shape: 'squeezed' },
      display: { unit: uidOf('tv'), input: 'vhf' },
      demands: { aim: 'light-gun', colour: true, stereo: true, keepAerial: true },
      avoid: [uidOf('mod'), uidOf('x')],
    }
    expect(queryToQuestion(questionToQuery(QUESTION))).toEqual(QUESTION)
    expect(queryToQuestion(questionToQuery(rich))).toEqual(rich)
  })

  it('is none without a source, a display or what is played', () => {
    const { source: _, ...rest } = questionToQuery(QUESTION)
    expect(queryToQuestion(rest)).toBeNull()
    expect(queryToQuestion({ ...rest, source: 'not-an-id' })).toBeNull()
  })

  it('leaves out values that mean nothing', () => {
    const query = { ...questionToQuery(QUESTION), scan: '9999i', aim: 'fly', avoid: 'x.y' }
    expect(queryToQuestion(query)).toEqual(QUESTION)
  })
})
