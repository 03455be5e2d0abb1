import { describe, expect, it } from 'vitest'
import * as fc from 'fast-check'
import { CONNECTORS, contactOf, fits, mates } from './connectors'

describe('mating', () => {
  it('is the same from both sides', () => {
    fc.assert(
      fc.property(fc.constantFrom(...CONNECTORS), fc.constantFrom(...CONNECTORS), (a, b) => {
        expect(mates(a, b)).toBe(mates(b, a))
        expect(fits(a, b)).toBe(fits(b, a))
      }),
    )
  })

  it('never joins two plugs or two sockets', () => {
    expect(mates('phono-plug', 'phono-plug')).toBe(false)
    expect(mates('f-socket', 'f-socket')).toBe(false)
  })

  it('lets spade lugs and bare wire under screws, and nothing else', () => {
    expect(CONNECTORS.filter((c) => mates('screws', c))).toEqual(['spades', 'bare'])
  })

  it('joins a whip to nothing', () => {
    expect(CONNECTORS.some((c) => fits('whip', c))).toBe(false)
  })

  // EIAJ TTC-0003, from memory: the same body with other pins.
  it('lets the Japanese 21-pin plug into a SCART socket without calling it a match', () => {
    expect(fits('jp21-plug', 'scart-socket')).toBe(true)
    expect(mates('jp21-plug', 'scart-socket')).toBe(false)
  })
})

describe('contacts', () => {
  it('puts everything on the one contact of a phono plug', () => {
    expect(contactOf('phono-plug', 'cvbs')).toBe(contactOf('phono-plug', 'pr'))
  })

  // Two published SCART pin tables: red and chroma share pin 15; composite, luma and sync pin 19 or 20.
  it('shares contacts of a 21-pin socket between red and chroma, and between composite and luma', () => {
    expect(contactOf('scart-socket', 'r')).toBe(contactOf('scart-plug', 'c'))
    expect(contactOf('scart-socket', 'cvbs')).toBe(contactOf('scart-plug', 'y'))
  })
})
