import { CONNECTORS } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { CABLE_KINDS, CABLE_LOOKS, cableKind, tagOf } from './cables'
import { STATE_SHAPES } from './states'
import { SYMBOL_KEYS, symbolLine, symbolOf, SYMBOLS, type TonedShape } from './symbols'

const circles = (shapes: readonly TonedShape[]) =>
  shapes.flatMap((s) => (s.tag === 'circle' ? [[s.r, s.tone]] : []))

describe('marks of sockets', () => {
  it('exist for every connector there is', () => {
    expect(CONNECTORS.map(symbolOf).filter((key) => !SYMBOL_KEYS.includes(key))).toEqual([])
  })

  it('differ from one another', () => {
    expect(new Set(SYMBOL_KEYS.map((k) => JSON.stringify(SYMBOLS[k]))).size).toBe(
      SYMBOL_KEYS.length,
    )
  })

  it('draw a phono as a coloured ring of 9, a core of 5.25 and a dot', () => {
    expect(circles(SYMBOLS.phono)).toEqual([
      [9, 'plug'],
      [5.25, 'ground'],
      [1.9, 'ink'],
    ])
  })

  it('tell an aerial socket from an aerial plug by its hub and its broken ring', () => {
    expect(circles(SYMBOLS['iec-socket'])).toEqual([
      [9, 'ground'],
      [6.4, 'line'],
      [2.4, 'line'],
    ])
    expect(circles(SYMBOLS['iec-plug'])).toEqual([
      [9, 'ground'],
      [5.4, 'line'],
      [2.4, 'ink'],
    ])
    expect(SYMBOLS['iec-plug'][0]?.dash).toBeDefined()
  })

  it('give a line of the same weight on screen at every size', () => {
    expect([20, 24, 32, 72].map(symbolLine)).toEqual([1.4, 1.4, 1.5, 2.25])
  })
})

describe('cables', () => {
  it('are told apart by line and letter when their colours are taken away', () => {
    const plain = CABLE_KINDS.map((k) => {
      const { tag, line, lines, dash, rungs } = CABLE_LOOKS[k]
      return JSON.stringify({ tag, line, lines, dash, rungs })
    })
    expect(new Set(plain).size).toBe(CABLE_KINDS.length)
  })

  it('are called by what they carry and what their ends are', () => {
    expect(cableKind(['cvbs'], ['phono-plug', 'phono-plug'])).toBe('v')
    expect(cableKind(['rf'], ['f-plug', 'f-plug'])).toBe('75')
    expect(cableKind(['rf'], ['spades', 'screws'])).toBe('300')
    expect(cableKind(['y', 'c'], ['svideo4-plug', 'svideo4-plug'])).toBe('s')
    expect(cableKind(['cvbs', 'audio-l', 'audio-r'], ['scart-plug', 'scart-plug'])).toBe('21')
    expect(cableKind(['cvbs'], ['scart-plug', 'phono-plug'])).toBe('v')
    expect(cableKind(['tmds'], ['hdmi-plug', 'hdmi-plug'])).toBe('h')
    expect(tagOf('l', ['audio-mono'])).toBe('M')
  })
})

describe('states', () => {
  it('have four outlines of their own', () => {
    const outlines = Object.values(STATE_SHAPES).map((s) => JSON.stringify(s))
    expect(new Set(outlines).size).toBe(4)
  })
})
