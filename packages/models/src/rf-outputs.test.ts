import { expect, test } from 'vitest'
import type { DeviceModel } from './model'
import { rfOutputs } from './rf-outputs'

const carriers = (names: string): DeviceModel =>
  ({
    type: 'device',
    controls: [
      {
        key: 'channel',
        kind: 'channel',
        carriers: { kind: 'channels', part: { plan: 'us-broadcast', names } },
      },
    ],
    functions: [
      {
        key: 'modulates',
        gives: [{ jack: 'rf', rf: [{ channel: { control: 'channel' }, system: 'M' }] }],
      },
    ],
  }) as unknown as DeviceModel

/** Edges by 47 CFR 73.603: channel 3 is 60-66 MHz, 4 is 66-72, 5 begins at 76, 14 is 470-476. */
test('neighbouring channels are one stretch, and a gap stays a gap', () => {
  const found = rfOutputs(carriers('3,4,5,14'))
  expect(found.map((o) => [o.lowMhz, o.highMhz])).toEqual([
    [60, 72],
    [76, 82],
    [470, 476],
  ])
  expect(found[0]).toMatchObject({ function: 'modulates', jack: 'rf', system: 'M' })
})

test('a device without carriers of its own puts out none', () => {
  expect(rfOutputs({ ...carriers('3'), functions: [] })).toEqual([])
})
