import { describe, expect, it } from 'vitest'
import { createSearch } from './search'

const MODELS = [
  { maker: 'Tarnbeck', name: 'DP-62', aliases: ['DP 62 silver'], kind: 'disc player' },
  { maker: 'Tarnbeck', name: 'LD-8', aliases: [], kind: 'large-disc player' },
  { maker: 'Pellmere', name: 'VM-2', aliases: [], kind: 'modulator', place: 'Loft, crate 3' },
  { maker: 'Quillmark', name: 'VR-90', aliases: ['VR90N'], kind: 'tape recorder' },
  { maker: 'Ostrel', name: '14-C', aliases: [], kind: 'television', place: 'Front room' },
]

const names = (query: string): string[] => createSearch(MODELS)(query).map((m) => m.name)

describe('search', () => {
  it('gives everything for an empty query', () => {
    expect(names(' ')).toHaveLength(MODELS.length)
  })

  it('finds a type number without its hyphen', () => {
    expect(names('dp62')[0]).toBe('DP-62')
  })

  it('finds a misspelt maker', () => {
    expect(names('Tarnbek')).toEqual(expect.arrayContaining(['DP-62', 'LD-8']))
    expect(names('pelmere')[0]).toBe('VM-2')
  })

  it('finds swapped letters', () => {
    expect(names('quilmrak')[0]).toBe('VR-90')
  })

  it('finds by kind and by other names', () => {
    expect(names('modulater')[0]).toBe('VM-2')
    expect(names('vr90n')[0]).toBe('VR-90')
  })

  it('finds by place', () => {
    expect(names('loft crate')[0]).toBe('VM-2')
  })

  it('narrows with every further word', () => {
    expect(names('tarnbeck ld')).toEqual(['LD-8'])
  })

  it('finds nothing for words that are near to nothing', () => {
    expect(names('zzqx')).toEqual([])
  })
})
