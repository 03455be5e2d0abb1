import { describe, expect, it } from 'vitest'
import { format } from './format'
import { MESSAGES, sentence } from './index'
import { LOCALES } from './locale'
import { WORDS } from './words'

describe('filling a message', () => {
  it('puts details in and leaves them alone', () => {
    expect(format('{name} is here', { name: '{name} [aerial]' }, 'en-GB')).toBe(
      '{name} [aerial] is here',
    )
  })

  it('chooses between one and many', () => {
    expect(format('{n|# socket|# sockets}', { n: 1 }, 'en-GB')).toBe('1 socket')
    expect(format('{n|# socket|# sockets}', { n: 1208 }, 'en-GB')).toBe('1,208 sockets')
  })

  it('uses the word of the language in the shape asked for', () => {
    expect(format('[Aerial] and [leads]', {}, 'en-US')).toBe('Antenna and cables')
    expect(format('[Aerial] and [leads]', {}, 'en-GB')).toBe('Aerial and leads')
  })

  it('names what a code stands for', () => {
    const text = sentence(
      'obstacle.colour',
      { from: 'A', to: 'B', colour: 'secam', listed: 'pal, ntsc-443' },
      'en-US',
    )
    expect(text).toContain('gives SECAM color; the B decodes PAL, NTSC 4.43.')
  })

  it('writes a true minus sign', () => {
    expect(format('{level} dBmV', { level: -7.5 }, 'en-GB')).toBe('\u22127.5 dBmV')
  })
})

describe('messages', () => {
  it('have every bracketed word in the table of words', () => {
    const words = Object.values(MESSAGES).flatMap((m) =>
      [...m.matchAll(/\[([A-Za-z]+)\]/g)].map((x) => x[1]!),
    )
    const unknown = words.filter((w) => !(w.charAt(0).toLowerCase() + w.slice(1) in WORDS))
    expect(unknown).toEqual([])
  })

  it('write no word of the one English in the other', () => {
    const british = new RegExp(
      `\\b(${Object.values(WORDS)
        .map((w) => w['en-GB'])
        .join('|')})\\b`,
      'i',
    )
    const bare = Object.values(MESSAGES).filter((m) =>
      british.test(m.replace(/\[[A-Za-z]+\]|\{[^}]*\}/g, '')),
    )
    expect(bare).toEqual([])
  })

  it('have no bracket left in any language', () => {
    const left = LOCALES.flatMap((l) =>
      Object.keys(MESSAGES).filter((c) => /\[[A-Za-z]+\]/.test(sentence(c, {}, l))),
    )
    expect(left).toEqual([])
  })

  it('give an unknown code the general sentence', () => {
    expect(sentence('no-such-code', {}, 'en-GB')).toContain('no-such-code')
  })
})
