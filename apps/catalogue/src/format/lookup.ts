import type { DeviceModel, Model, PieceModel, Port } from '@coaxwain/models'
import { fitted, type Snapshot, type Uid, type Unit } from '@coaxwain/shelf'

/** Units and models of a snapshot by their ids. */
export interface Lookup {
  readonly unit: (uid: Uid) => Unit | undefined
  readonly model: (uid: Uid) => Model | undefined
  /** A unit's model with what was added to this very unit; undefined for pieces and strangers. */
  readonly device: (unit: Uid) => DeviceModel | undefined
  readonly piece: (model: Uid) => PieceModel | undefined
  readonly port: (unit: Uid, port: string) => Port | undefined
}

export function createLookup(snapshot: Snapshot): Lookup {
  const units = new Map(snapshot.units.map((u) => [u.uid, u]))
  const devices = new Map<Uid, DeviceModel>()
  const device = (uid: Uid): DeviceModel | undefined => {
    const known = devices.get(uid)
    if (known) return known
    const unit = units.get(uid)
    const model = unit && snapshot.models[unit.model]
    if (!unit || model?.type !== 'device') return undefined
    const made = fitted(model, unit.modifications)
    devices.set(uid, made)
    return made
  }
  return {
    unit: (uid) => units.get(uid),
    model: (uid) => snapshot.models[uid],
    device,
    piece: (uid) => {
      const model = snapshot.models[uid]
      return model?.type === 'piece' ? model : undefined
    },
    port: (unit, port) => device(unit)?.ports.find((p) => p.key === port),
  }
}

/** Maker and type as one name; generic pieces have no maker worth saying. */
export const fullName = (model: Pick<Model, 'maker' | 'name' | 'type'>): string =>
  model.type === 'piece' ? model.name : `${model.maker} ${model.name}`
