import { describe, expect, it } from 'vitest'
import { arrivalAt } from './arrival'
import type { Circuit } from './circuits'

const wires = (...pairs: [Circuit, Circuit][]) => new Map(pairs)

// Rows c41-c50 of the compatibility table; common practice, no source, unless noted.
describe('what an input makes of the circuits that arrive', () => {
  it('takes composite on a composite input', () => {
    expect(arrivalAt('composite', wires(['cvbs', 'cvbs']))).toEqual({ kind: 'whole' })
  })

  it('shows luma alone in a composite input as a steady grey picture', () => {
    expect(arrivalAt('composite', wires(['cvbs', 'y']))).toEqual({ kind: 'luma-only', from: 'y' })
  })

  it.each(['pb', 'pr', 'c', 'rf', 'audio-l'] as const)(
    'shows nothing of %s in a composite input',
    (circuit) => {
      expect(arrivalAt('composite', wires(['cvbs', circuit]))).toEqual({ kind: 'nothing' })
    },
  )

  it('shows composite in the luma contact of S-Video in grey', () => {
    expect(arrivalAt('s-video', wires(['y', 'cvbs']))).toEqual({ kind: 'luma-only', from: 'cvbs' })
  })

  // Derived from the BT.601 matrix (coefficients from memory).
  it('turns greys magenta where RGB goes into component sockets, and does not lock', () => {
    expect(arrivalAt('component', wires(['y', 'g'], ['pb', 'b'], ['pr', 'r']))).toEqual({
      kind: 'wrong-colours',
      cast: 'magenta',
      locks: false,
    })
  })

  it('turns greys green where component goes into RGB sockets', () => {
    expect(arrivalAt('rgsb', wires(['g', 'y'], ['b', 'pb'], ['r', 'pr']))).toMatchObject({
      cast: 'green',
    })
  })

  // Two published SCART pin tables: RGB takes its sync from the composite pin.
  it('takes the sync of RGB from composite video', () => {
    expect(arrivalAt('rgbs', wires(['r', 'r'], ['g', 'g'], ['b', 'b'], ['csync', 'cvbs']))).toEqual(
      { kind: 'whole' },
    )
  })

  it('shows nothing of RGB without sync', () => {
    expect(arrivalAt('rgbs', wires(['r', 'r'], ['g', 'g'], ['b', 'b']))).toEqual({
      kind: 'nothing',
    })
  })
})
