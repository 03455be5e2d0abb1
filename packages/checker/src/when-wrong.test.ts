import { describe, expect, it } from 'vitest'
import { laid, modulated, straight } from './test-rig'
import { whenWrong } from './when-wrong'

describe('what is seen when something is set otherwise', () => {
  const wrongs = whenWrong(...laid(modulated()))

  it('is snow and silence where tuner and modulator stand on different channels', () => {
    const snowy = wrongs.filter((w) => w.sees === 'snow').map((w) => `${w.unit} ${w.hears}`)
    expect(snowy.sort()).toEqual(['modulator silent', 'set silent'])
  })

  it('is nothing where a box that needs power is off', () => {
    const off = wrongs.filter((w) => w.control === 'power')
    expect(off).toEqual([
      {
        unit: 'modulator',
        control: 'power',
        position: 'unplugged',
        sees: 'nothing',
        hears: 'silent',
      },
    ])
  })

  it('leaves out what changes nothing', () => {
    expect(whenWrong(...laid(straight()))).toEqual([])
  })
})
