import { describe, expect, test } from 'vitest'
import { arrangementToQuery, queryToArrangement } from '../../format/arrangement-query'
import { emptyAsk } from '../hookup/ask-form'
import {
  arrangeFaults,
  emptyArrange,
  fromArrangementQuestion,
  toArrangementQuestion,
  type ArrangeForm,
} from './arrange-form'

const uid = (letter: string): string => letter.repeat(22)

const source = (letter: string, playing = 'tape') => ({
  ...emptyAsk(),
  source: uid(letter),
  playing,
})

const filled = (rest: Partial<ArrangeForm> = {}): ArrangeForm => ({
  ...emptyArrange(),
  sources: [
    { ...source('a', 'tape.one'), standard: '625i50 pal', wide: true },
    { ...source('b'), protection: 'agc-pulses' },
  ],
  displays: [{ unit: uid('s') }, { unit: uid('t') }],
  demands: { ...emptyAsk(), colour: true, aim: 'low-delay' },
  ...rest,
})

describe.each(['sources', 'displays'] as const)('several %s', (way) => {
  const question = toArrangementQuestion(filled({ way }))

  test('leave the other end single', () => {
    const { sources, displays } = question
    expect([sources.length, displays.length]).toEqual(way === 'sources' ? [2, 1] : [1, 2])
  })

  test('come back from the address as they went in', () => {
    expect(queryToArrangement(arrangementToQuery(question))).toEqual(question)
  })

  test('come back into the form, which asks the same', () => {
    expect(toArrangementQuestion(fromArrangementQuestion(question))).toEqual(question)
  })
})

test('one of each is the beginning of an arrangement, and leaves room for another', () => {
  const single = filled({ sources: [source('a')] })
  const question = toArrangementQuestion(single)
  expect(queryToArrangement(arrangementToQuery(question))).toEqual(question)
  const form = fromArrangementQuestion(question)
  expect([form.way, form.sources.map((s) => s.source)]).toEqual(['sources', [uid('a'), '']])
})

describe('an address', () => {
  const query = arrangementToQuery(toArrangementQuestion(filled()))

  test.each([
    ['several of both', { display: [uid('s'), uid('t')] }],
    ['no display', { display: [] }],
    ['something that is no id', { source: ['short~tape'] }],
    ['five of one end', { source: ['a', 'b', 'c', 'd', 'e'].map((l) => `${uid(l)}~tape`) }],
  ])('with %s holds no question', (_, rest) => {
    expect(queryToArrangement({ ...query, ...rest })).toBeNull()
  })
})

describe('the form', () => {
  const at = (form: ArrangeForm): string[] => arrangeFaults(form).map((f) => `${f.path} ${f.code}`)

  test('names every end that is not chosen, of those that count', () => {
    expect(at(emptyArrange())).toEqual([
      'sources.0 required',
      'sources.1 required',
      'displays.0 required',
    ])
  })

  test('takes a recorder for two uses, but not twice for one', () => {
    const both = [source('a', 'tape'), source('a', 'tuner')]
    expect(at(filled({ sources: both }))).toEqual([])
    expect(at(filled({ sources: [source('a'), source('a')] }))).toEqual(['sources.1 given-twice'])
  })

  test('takes no set twice', () => {
    const twice = [{ unit: uid('s') }, { unit: uid('s') }]
    expect(at(filled({ way: 'displays', displays: twice }))).toEqual(['displays.1 given-twice'])
  })
})
