import type { Condition, DeviceModel, Model } from '@coaxwain/models'
import type { Hookup, Snapshot } from '@coaxwain/shelf'
import { enumerate } from './enumerate'
import type { Shelf } from './shelves/draft-shelf'
import { CONFLICT } from './shelves/mutate'
import { sharedPieces } from './shelves/pieces'
import type { Asked } from './shrink'
import { noWorse, vectorOf, withoutSilent } from './vectors'

/** What small shelves must have often enough, and the least share of it. */
export const QUOTAS = {
  yes: 0.3,
  no: 0.3,
  rf: 0.25,
  'split sound': 0.2,
  'two units of a model': 0.1,
  'last lead': 0.1,
  'control conflict': 0.1,
  'shared lead': 0.04,
} as const

export type Trait = keyof typeof QUOTAS

/** What can be said of a shelf by all the hookups that it gives. */
export function traitsOf(shelf: Shelf, hookups: readonly Hookup[]): Trait[] {
  const traits: Readonly<Record<Trait, boolean>> = {
    yes: hookups.length > 0,
    no: hookups.length === 0,
    rf: hookups.some(isByRf) || (hookups.length === 0 && asksForRf(shelf)),
    'split sound': hookups.some((h) => h.legs.some((leg) => leg.purpose === 'sound')),
    'two units of a model': hasTwins(shelf.snapshot),
    'last lead': shelf.recipe === 'last lead' && gainsBy(shelf, hookups, withOneMore),
    'shared lead': hookups.some((h) => sharedPieces(h.links).length > 0),
    'control conflict': shelf.recipe === 'conflict' && gainsBy(shelf, hookups, withoutConflict),
  }
  return (Object.keys(traits) as Trait[]).filter((trait) => traits[trait])
}

const isByRf = ({ links }: Hookup): boolean =>
  links.some((link) => link.circuits.some((c) => c.from === 'rf'))

/** The set has nothing but an aerial socket. */
function asksForRf({ snapshot, question }: Asked): boolean {
  const unit = snapshot.units.find((u) => u.uid === question.display.unit)
  const model = unit && snapshot.models[unit.model]
  if (model?.type !== 'device') return false
  const taken = model.functions.filter((f) => f.kind === 'shows').flatMap((f) => f.needs)
  return model.jacks.filter((j) => taken.includes(j.key)).every((j) => j.form === 'rf')
}

function hasTwins({ models, units }: Snapshot): boolean {
  const devices = units.map((u) => u.model).filter((uid) => models[uid]?.type === 'device')
  return new Set(devices).size < devices.length
}

/** On a shelf that is easier in one way there is something that nothing here matches. */
function gainsBy(
  { snapshot, question }: Asked,
  hookups: readonly Hookup[],
  ease: (snapshot: Snapshot) => Snapshot,
): boolean {
  const easier = withoutSilent(enumerate(ease(snapshot), question)).map(vectorOf)
  const here = hookups.map(vectorOf)
  return easier.some((vector) => !here.some((own) => noWorse(own, vector)))
}

/** One more of every lead and adapter: what is gained is what the last one decides. */
const withOneMore = (snapshot: Snapshot): Snapshot => ({
  ...snapshot,
  units: snapshot.units.map((u) =>
    snapshot.models[u.model]?.type === 'piece' ? { ...u, quantity: u.quantity + 1 } : u,
  ),
})

/** As somebody sees it who forgets that the switch stands in one place at a time. */
const withoutConflict = (snapshot: Snapshot): Snapshot => ({
  ...snapshot,
  models: Object.fromEntries(
    Object.entries(snapshot.models).map(([uid, model]): [string, Model] => [
      uid,
      model.type === 'device' ? withoutSwitch(model) : model,
    ]),
  ),
})

const withoutSwitch = (device: DeviceModel): DeviceModel =>
  JSON.parse(
    JSON.stringify(device, (key, value: unknown) =>
      key === 'while'
        ? (value as Condition | undefined)?.filter((c) => c.control !== CONFLICT)
        : value,
    ),
  ) as DeviceModel
