import {
  controlOf,
  jackOf,
  together,
  type Condition,
  type DeviceModel,
  type Key,
  type Port,
} from '@coaxwain/models'
import type { Draft } from './way'

/** How the video lines that come in by a way are ended: each by one load of 75 ohm at its far end. */
export interface LineEnding {
  /** Positions of the switches that put a load on, or take it off where the line goes on. */
  readonly stand: Condition
  /** Loop sockets that want a terminator. */
  readonly terminate: readonly Key[]
  /** An input of high impedance without a loop: nothing there ends the line. */
  readonly open: boolean
}

const DIGITAL_OR_RF = ['rf', 'hdmi', 'dvi', 'sound']

const portsAt = (device: DeviceModel, key: Key): Port[] =>
  jackOf(device, key).contacts.flatMap(({ port }) => device.ports.filter((p) => p.key === port))

const NOTHING: LineEnding = { stand: [], terminate: [], open: false }

/** Null where a line would be ended twice, or a switch would have to stand on both sides. */
export function lineEnding(device: DeviceModel, draft: Draft): LineEnding | null {
  if (draft.in === null || DIGITAL_OR_RF.includes(jackOf(device, draft.in).form)) return NOTHING
  const outs = draft.out ? portsAt(device, draft.out.jack).map((p) => p.key) : []
  return portsAt(device, draft.in)
    .map((port) => {
      const goesOn = port.loopsTo !== undefined && outs.includes(port.loopsTo)
      return goesOn ? passedOn(device, port) : endedHere(port, draft)
    })
    .reduce(both, NOTHING)
}

function both(a: LineEnding | null, b: LineEnding | null): LineEnding | null {
  const stand = a && b && together(a.stand, b.stand)
  if (!stand) return null
  return { stand, terminate: [...a.terminate, ...b.terminate], open: a.open || b.open }
}

/** A line that goes on must have no load here; an input that ends itself lifts its own. */
function passedOn(device: DeviceModel, { load }: Port): LineEnding | null {
  if (load?.kind === '75') return null
  if (load?.kind !== 'switch') return NOTHING
  const control = controlOf(device, load.control)
  const off =
    control.kind === 'positions'
      ? control.positions.map((p) => p.key).filter((p) => p !== load.position75)
      : []
  return off.length > 0 ? { ...NOTHING, stand: [{ control: load.control, in: off }] } : null
}

function endedHere({ load, loopsTo }: Port, { fn }: Draft): LineEnding {
  if (load?.kind === 'switch')
    return { ...NOTHING, stand: [{ control: load.control, in: [load.position75] }] }
  // A passive box hands the line on to the next unit, which ends it.
  if (load?.kind !== 'high' || fn.power === 'none') return NOTHING
  return loopsTo === undefined ? { ...NOTHING, open: true } : { ...NOTHING, terminate: [loopsTo] }
}
