import type { DeviceModel, PieceModel, Port } from '@coaxwain/models'
import { portBadges, type TestState, type Unit } from '@coaxwain/shelf'
import { ringBand } from '../components/drawing/layout/plugs'
import { symbolOf, type SymbolKey } from '../components/drawing/layout/symbols'

/** One mark of a unit's face in a list. */
export interface StripMark {
  readonly key: string
  readonly symbol: SymbolKey
  readonly band: string | null
  readonly untested: boolean
  /** Stands on the corner only where something is wrong. */
  readonly badge: TestState | null
  /** A new group begins here. */
  readonly gap: boolean
}

const FACE_ORDER = ['back', 'lead', 'side', 'front'] as const

const inPanelOrder = (a: Port, b: Port): number =>
  FACE_ORDER.indexOf(a.at.face) - FACE_ORDER.indexOf(b.at.face) ||
  a.at.row - b.at.row ||
  a.at.column - b.at.column

/** The face of a device in panel order; silence means that it works. */
export function deviceStrip(device: DeviceModel, unit: Unit | null): StripMark[] {
  const badges = new Map(unit ? portBadges(unit, device).map((b) => [b.port, b]) : [])
  const ports = device.ports.filter((p) => !p.retired).sort(inPanelOrder)
  return ports.map((port, i): StripMark => {
    const before = ports[i - 1]
    const badge = badges.get(port.key)
    const state = badge && badge.of > 0 ? badge.state : null
    return {
      key: port.key,
      symbol:
        port.mount === 'lead' || port.at.face === 'lead' ? 'captive' : symbolOf(port.connector),
      band: state === 'untested' ? null : ringBand(port),
      untested: state === 'untested',
      badge: state === 'dead' || state === 'intermittent' ? state : null,
      gap: before !== undefined && isNewGroup(before, port),
    }
  })
}

const isNewGroup = (before: Port, port: Port): boolean =>
  before.at.face !== port.at.face || before.at.row !== port.at.row || before.group !== port.group

/** A lead or adapter: the plugs of one end, a gap, those of the other. */
export const pieceStrip = (piece: PieceModel): StripMark[] =>
  [piece.a, piece.b].flatMap((end, side) =>
    end.map((plug, i) => ({
      key: `${side} ${i}`,
      symbol: symbolOf(plug.connector),
      band: ringBand({ connector: plug.connector, ring: plug.colour, circuits: [] }),
      untested: false,
      badge: null,
      gap: side === 1 && i === 0,
    })),
  )
