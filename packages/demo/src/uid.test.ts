import { describe, expect, it } from 'vitest'
import { demoUid } from './uid'

describe('demoUid', () => {
  it('fills a name up to 22 base64url characters', () => {
    expect(demoUid('m-ostrel-14-c')).toBe('m-ostrel-14-c________A')
  })

  it('gives the same id every time and another one for another name', () => {
    expect(demoUid('u-a-101')).toBe(demoUid('u-a-101'))
    expect(demoUid('u-a-101')).not.toBe(demoUid('u-a-102'))
  })

  it('leaves the four bits beyond 128 at zero', () => {
    // The value of the last character is a multiple of 16: A, Q, g or w.
    expect('AQgw').toContain(demoUid('x').at(-1))
  })

  it.each(['a-name-that-is-far-too-long', 'under_score', 'white space', ''])(
    'refuses the name "%s"',
    (name) => {
      expect(() => demoUid(name)).toThrow(`no uid for "${name}"`)
    },
  )
})
