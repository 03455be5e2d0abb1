import type { DeviceModel, Port } from '@coaxwain/models'
import type { UnitPortInput } from '../drawing/layout/drawing-input'
import { ringBand } from '../drawing/layout/plugs'

/** Sockets of a device made ready for drawing. Those on captive leads come last on the back. */
export function portInputs(device: DeviceModel, used: ReadonlySet<string>): UnitPortInput[] {
  const headings = new Map(device.groups.map((g) => [g.key, g.label]))
  const lastRow = Math.max(
    0,
    ...device.ports.filter((p) => p.at.face === 'back').map((p) => p.at.row),
  )
  const lastColumn = Math.max(-1, ...device.ports.map((p) => p.at.column))
  const shown = device.ports.filter((p) => !p.retired || used.has(p.key))
  let leads = 0
  return shown.map((port: Port): UnitPortInput => {
    const onLead = port.at.face === 'lead' || port.mount === 'lead'
    if (onLead) leads++
    return {
      key: port.key,
      label: port.label,
      connector: port.connector,
      captive: onLead,
      ring: ringBand(port),
      face: port.at.face === 'front' || port.at.face === 'side' ? port.at.face : 'back',
      row: onLead ? lastRow : port.at.row,
      column: onLead ? lastColumn + leads : port.at.column,
      heading: (port.group && headings.get(port.group)) ?? null,
      used: used.has(port.key),
    }
  })
}

/** A television's back is moulded; everything else is a plate. */
export const isMoulded = (device: DeviceModel): boolean => device.kind === 'television'
