import type { DeviceModel, Key } from '@coaxwain/models'
import type { Modification } from './unit'

/** A device as it stands on the shelf: its model with everything that somebody did to this very unit. */
export const fitted = (device: DeviceModel, modifications: readonly Modification[]): DeviceModel =>
  modifications.reduce(apply, device)

function apply(d: DeviceModel, m: Modification): DeviceModel {
  switch (m.kind) {
    case 'added':
      return {
        ...d,
        ports: [...d.ports, ...m.ports],
        jacks: [...d.jacks, ...m.jacks],
        functions: [...d.functions, ...m.functions],
      }
    case 'bypassed':
      return { ...d, functions: d.functions.filter((f) => f.key !== m.function) }
    case 'aerial-isolator': {
      const isolated = m.state === 'tested-good' ? ('yes' as const) : ('no' as const)
      return { ...d, ports: d.ports.map((p) => (takesRf(d, p.key) ? { ...p, isolated } : p)) }
    }
  }
}

const takesRf = (d: DeviceModel, port: Key): boolean =>
  d.ports
    .find((p) => p.key === port)
    ?.circuits.some((c) => c.circuit === 'rf' && c.dir !== 'out') ?? false
