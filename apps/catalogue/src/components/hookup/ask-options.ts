import type { DeviceModel, Model } from '@coaxwain/models'
import type { Snapshot, Uid, Unit, WorkingState } from '@coaxwain/shelf'
import { fullName, type Lookup } from '../../format/lookup'
import { optionLine } from '../../format/option-line'
import { createSearch, type Searchable } from '../../format/search'
import type { Speak } from '../../format/words'

/** A choice of a search box: a unit of the shelf, or a model that no unit is of. */
export interface DeviceOption extends Searchable {
  readonly value: string
  readonly label: string
  readonly note: string
  readonly unit: Uid | null
  readonly model: Uid
  readonly device: DeviceModel
  readonly doubt: number
}

export type End = 'source' | 'display'

const SERVES: Readonly<Record<End, string>> = { source: 'plays', display: 'shows' }

export const servesAs = (device: DeviceModel, end: End): boolean =>
  device.functions.some((f) => f.kind === SERVES[end])

const isHere = (unit: Unit): boolean => unit.holding !== 'sold' && unit.holding !== 'gone'

/** What options say beside what the shelf itself knows. */
interface Wording {
  readonly numbers: ReadonlyMap<Uid, number>
  readonly say: Speak
}

/** Units that can stand at one end, by name; then models at that end of which there is no unit. */
export function deviceOptions(
  snapshot: Snapshot,
  lookup: Lookup,
  end: End,
  { numbers, say }: Wording,
): DeviceOption[] {
  const owned = new Set(snapshot.units.filter(isHere).map((u) => u.model))
  const units = snapshot.units.filter(isHere).flatMap((unit) => {
    const device = lookup.device(unit.uid)
    return device && servesAs(device, end) ? [ofUnit(unit, device, numbers.get(unit.uid), say)] : []
  })
  const models = Object.entries(snapshot.models).flatMap(([uid, model]) =>
    !owned.has(uid) && isDevice(model) && servesAs(model, end) ? [ofModel(uid, model, say)] : [],
  )
  return [...units.sort(byLabelAndTrust), ...models.sort(byLabelAndTrust)]
}

/** Of two of a kind the one that works comes first. */
const byLabelAndTrust = (a: DeviceOption, b: DeviceOption): number =>
  a.label.localeCompare(b.label) || a.doubt - b.doubt || a.note.localeCompare(b.note)

const DOUBT: Readonly<Record<WorkingState, number>> = {
  works: 0,
  untested: 1,
  faulty: 2,
  'parts-only': 3,
}

const isDevice = (model: Model): model is DeviceModel => model.type === 'device'

const base = (device: DeviceModel, say: Speak) => ({
  maker: device.maker,
  name: device.name,
  aliases: device.aliases,
  kind: say(`kind.${device.kind}`),
  label: fullName(device),
  device,
})

const ofUnit = (
  unit: Unit,
  device: DeviceModel,
  number: number | undefined,
  say: Speak,
): DeviceOption => ({
  ...base(device, say),
  value: unit.uid,
  unit: unit.uid,
  doubt: DOUBT[unit.working],
  model: unit.model,
  place: unit.place,
  note: optionLine(unit, say(`kind.${device.kind}`), { device, number }, say),
})

const ofModel = (uid: Uid, device: DeviceModel, say: Speak): DeviceOption => ({
  ...base(device, say),
  value: `model ${uid}`,
  unit: null,
  doubt: 0,
  model: uid,
  place: null,
  note: say('ask.not-on-shelf'),
})

/** Search over options; what is on the shelf comes before what is not. */
export function createOptionSearch(options: readonly DeviceOption[]) {
  const search = createSearch(options)
  return (query: string): DeviceOption[] => {
    const found = search(query)
    return [...found.filter((o) => o.unit !== null), ...found.filter((o) => o.unit === null)]
  }
}
