import type { NewUnit, UnitChange, UnitDetail } from '@coaxwain/contract'
import type { HoldingState, WorkingState } from '@coaxwain/shelf'

/** A unit as it is typed in. */
export interface UnitForm {
  model: string
  label: string
  serial: string
  note: string
  quantity: string
  working: WorkingState | ''
  holding: HoldingState | ''
  place: string
  newPlace: string
  remotePresent: boolean
}

export const emptyUnit = (): UnitForm => ({
  model: '',
  label: '',
  serial: '',
  note: '',
  quantity: '1',
  working: 'untested',
  holding: 'kept',
  place: '',
  newPlace: '',
  remotePresent: true,
})

export const fromUnit = (unit: UnitDetail): UnitForm => ({
  model: unit.model.uid,
  label: unit.label,
  serial: unit.serial,
  note: unit.note,
  quantity: String(unit.quantity),
  working: unit.working,
  holding: unit.holding,
  place: unit.place ?? '',
  newPlace: '',
  remotePresent: unit.remotePresent,
})

/** A quantity that is no number is left for the server to refuse, with its reason. */
export const toUnitChange = (form: UnitForm, counts: boolean): UnitChange => ({
  label: form.label.trim(),
  serial: form.serial.trim(),
  note: form.note.trim(),
  working: form.working || 'untested',
  holding: form.holding || 'kept',
  place: form.place === '' ? null : form.place,
  remotePresent: form.remotePresent,
  ...(counts ? { quantity: Number(form.quantity) } : {}),
})

export const toNewUnit = (form: UnitForm, uid: string, counts: boolean): NewUnit => ({
  uid,
  model: form.model,
  ...toUnitChange(form, counts),
})
