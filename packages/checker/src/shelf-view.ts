import type { DeviceModel, Jack, Key, ModelFunction, PieceModel, Port } from '@coaxwain/models'
import { fitted } from '@coaxwain/shelf'
import type { Hookup, Snapshot, Uid, Unit } from '@coaxwain/shelf'

/** Looks things up without ever throwing: a hookup under check may name what is not there. */
export class ShelfView {
  private readonly units: ReadonlyMap<Uid, Unit>
  private readonly devices = new Map<Uid, DeviceModel | null>()

  constructor(readonly snapshot: Snapshot) {
    this.units = new Map(snapshot.units.map((u) => [u.uid, u]))
  }

  unit(uid: Uid): Unit | null {
    return this.units.get(uid) ?? null
  }

  device(uid: Uid): DeviceModel | null {
    const known = this.devices.get(uid)
    if (known !== undefined) return known
    const unit = this.unit(uid)
    const model = unit ? this.snapshot.models[unit.model] : undefined
    const device = unit && model?.type === 'device' ? fitted(model, unit.modifications) : null
    this.devices.set(uid, device)
    return device
  }

  piece(model: Uid): PieceModel | null {
    const found = this.snapshot.models[model]
    return found?.type === 'piece' ? found : null
  }

  port(uid: Uid, key: Key): Port | null {
    return this.device(uid)?.ports.find((p) => p.key === key) ?? null
  }

  jack(uid: Uid, key: Key): Jack | null {
    return this.device(uid)?.jacks.find((j) => j.key === key) ?? null
  }

  fn(uid: Uid, key: Key): ModelFunction | null {
    return this.device(uid)?.functions.find((f) => f.key === key) ?? null
  }
}

/** Where each control of each unit stands by the settings of a hookup. */
export class Positions {
  private readonly set = new Map<string, string>()

  constructor(hookup: Pick<Hookup, 'settings'>) {
    for (const s of hookup.settings) this.set.set(`${s.unit} ${s.control}`, s.position)
  }

  of(unit: Uid, control: Key): string | null {
    return this.set.get(`${unit} ${control}`) ?? null
  }
}
