import type { DeviceModel, Load } from '@coaxwain/models'
import {
  choice,
  compositeIn,
  compositeOut,
  device,
  passes,
  shows,
  DEFLECTION_60,
  NTSC_SET,
  tube,
} from '@coaxwain/models/build'
import { expect, it } from 'vitest'
import { draftsOf } from './drafts'
import { lineEnding } from './line-end'

/** A monitor with a loop, whose input ends its line in one way or another. */
const monitor = (load: Load | undefined, loopsTo?: string): DeviceModel =>
  device({
    maker: 'Rig',
    name: 'monitor',
    kind: 'monitor',
    market: '525-m',
    display: tube(DEFLECTION_60, 'none'),
    back: [[compositeIn('in', 'IN', { load, loopsTo }), compositeOut('loop', 'LOOP')]],
    controls: [
      choice('end', '75 OHM', 'termination', { positions: ['on', 'off'], access: 'back' }),
    ],
    functions: [
      shows('shows', 'Shows', 'in', { accepts: NTSC_SET }),
      passes('loops', 'loop-through', 'in', { to: ['loop'] }),
    ],
  })

const SWITCH: Load = { kind: 'switch', control: 'end', position75: 'on' }

function endings(load: Load | undefined, loopsTo?: string) {
  const model = monitor(load, loopsTo)
  const [shown, looped] = model.functions.map((fn) => draftsOf(model, fn)[0]!)
  return { shown: lineEnding(model, shown!), looped: lineEnding(model, looped!) }
}

it('puts the switch on where the line ends, and off where it goes on', () => {
  const { shown, looped } = endings(SWITCH, 'loop')
  expect(shown?.stand).toEqual([{ control: 'end', in: ['on'] }])
  expect(looped?.stand).toEqual([{ control: 'end', in: ['off'] }])
})

it('asks for a terminator on the loop of an input of high impedance', () => {
  const { shown, looped } = endings({ kind: 'high' }, 'loop')
  expect(shown).toEqual({ stand: [], terminate: ['loop'], open: false })
  expect(looped).toEqual({ stand: [], terminate: [], open: false })
})

it('cannot end the line of such an input without a loop', () => {
  expect(endings({ kind: 'high' }).shown?.open).toBe(true)
})

it('passes nothing on past a load that cannot be lifted', () => {
  expect(endings({ kind: '75' }, 'loop').looped).toBeNull()
})

it('needs nothing where the input ends itself', () => {
  expect(endings({ kind: 'ends-itself' }, 'loop').looped?.stand).toEqual([])
})
