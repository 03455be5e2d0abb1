import { portOf, type DeviceModel, type Jack, type Key, type Knowledge } from '@coaxwain/models'
import {
  contactOf,
  familyOf,
  type Circuit,
  type Connector,
  type PictureForm,
  type SoundLevel,
  type SwitchVolt,
} from '@coaxwain/signal'

/** One port as the far end of a lead meets it. */
export interface FacePort {
  readonly connector: Connector
  readonly mount: 'chassis' | 'lead'
  readonly ohm: number
  readonly suppliesDc: boolean
  readonly standsDc: Knowledge
  readonly needsDc: boolean
}

export interface FaceContact {
  readonly circuit: Circuit
  readonly port: number
  /** The contact of the connector that the circuit uses. */
  readonly contact: string
  readonly level: SoundLevel
}

/**
 * What a unit shows of itself at one place of a chain: the ports of a picture jack, of a sound jack, or of
 * both. Jacks of different models with equal faces can be linked in the same ways.
 */
export interface Face {
  readonly id: number
  readonly ports: readonly FacePort[]
  readonly form: PictureForm | null
  readonly picture: readonly FaceContact[]
  readonly sound: readonly FaceContact[]
  /** Switching voltages put out along with the picture. */
  readonly volts: readonly SwitchVolt[]
}

/** A face together with the keys of its ports in the model that it was taken from. */
export interface Placed {
  readonly face: Face
  readonly ports: readonly Key[]
}

/** Loose wires are twin lead, everything else is coax, unless the port says otherwise (common practice, no source). */
const usualOhm = (connector: Connector): number =>
  ['screws', 'spades', 'bare'].includes(familyOf(connector)) ? 300 : 75

export interface FaceParts {
  readonly picture: Jack | null
  /** A sound jack, and which of its contacts are used. */
  readonly sound: { readonly jack: Jack; readonly circuits: readonly Circuit[] } | null
  readonly volts: readonly SwitchVolt[]
}

/** Gives equal faces one id, so that what can be linked is worked out once. */
export class FaceTable {
  private readonly known = new Map<string, Face>()

  place(device: DeviceModel, parts: FaceParts): Placed {
    const keys: Key[] = []
    const contacts = (jack: Jack, circuits: readonly Circuit[] | null): FaceContact[] =>
      jack.contacts
        .filter((c) => circuits === null || circuits.includes(c.circuit))
        .map(({ circuit, port: key }) => {
          const port = portOf(device, key)
          if (!keys.includes(key)) keys.push(key)
          return {
            circuit,
            port: keys.indexOf(key),
            contact: contactOf(port.connector, circuit),
            level: port.circuits.find((c) => c.circuit === circuit)?.level ?? 'line',
          }
        })
    const picture = parts.picture ? contacts(parts.picture, null) : []
    const sound = parts.sound ? contacts(parts.sound.jack, parts.sound.circuits) : []
    const ports = keys.map((key): FacePort => {
      const port = portOf(device, key)
      return {
        connector: port.connector,
        mount: port.mount,
        ohm: port.impedanceOhm ?? usualOhm(port.connector),
        suppliesDc: port.suppliesDcVolts !== undefined && port.suppliesDcVolts !== 0,
        standsDc: port.standsDc ?? 'unknown',
        needsDc: port.needsDcVolts !== undefined,
      }
    })
    const form = parts.picture ? (parts.picture.form as PictureForm) : null
    return { face: this.intern({ ports, form, picture, sound, volts: parts.volts }), ports: keys }
  }

  private intern(face: Omit<Face, 'id'>): Face {
    const key = JSON.stringify(face)
    const found = this.known.get(key)
    if (found) return found
    const made = { id: this.known.size, ...face }
    this.known.set(key, made)
    return made
  }

  get size(): number {
    return this.known.size
  }
}
