import type { Control, DeviceModel, Port } from '@coaxwain/models'
import { mayLend, type Snapshot, type Uid } from '@coaxwain/shelf'
import { channelsIn, mates, type Connector } from '@coaxwain/signal'
import { formTitles } from '../../format/form-titles'
import { fullName, type Lookup } from '../../format/lookup'
import { createSearch, type Searchable } from '../../format/search'
import type { Speak } from '../../format/words'
import { standValue } from './check-form'

export interface Choice {
  readonly value: string
  readonly label: string
}

export interface UnitChoice extends Searchable, Choice {
  readonly note: string
}

/** Every device of the shelf that may be wired, by name. */
export function unitChoices(snapshot: Snapshot, lookup: Lookup, say: Speak): UnitChoice[] {
  return snapshot.units
    .filter(mayLend)
    .flatMap((unit): UnitChoice[] => {
      const device = lookup.device(unit.uid)
      if (!device) return []
      const kind = say(`kind.${device.kind}`)
      return [
        {
          maker: device.maker,
          name: device.name,
          aliases: device.aliases,
          kind,
          place: unit.place,
          value: unit.uid,
          label: fullName(device),
          note: unit.place === null ? kind : say('ask.joined', { first: kind, second: unit.place }),
        },
      ]
    })
    .sort((a, b) => a.label.localeCompare(b.label) || a.note.localeCompare(b.note))
}

export const searchUnits = (choices: readonly UnitChoice[]) => createSearch(choices)

/** Sockets of a device, those first that go the way of the link. */
export function portChoices(
  device: DeviceModel | undefined,
  dir: 'in' | 'out',
  say: Speak,
): Choice[] {
  if (!device) return []
  const titles = formTitles(device, say)
  const along = (port: Port): boolean =>
    port.circuits.some((c) => c.dir === dir || c.dir === 'either')
  return device.ports
    .filter((p) => !p.retired && p.circuits.some((c) => c.circuit !== 'dc'))
    .map((port) => ({ port, first: along(port) }))
    .sort((a, b) => Number(b.first) - Number(a.first))
    .map(({ port }) => ({ value: port.key, label: portLabel(port, device, titles, say) }))
}

function portLabel(
  port: Port,
  device: DeviceModel,
  titles: ReadonlyMap<string, string>,
  say: Speak,
): string {
  const jacks = device.jacks.filter((j) => j.contacts.some((c) => c.port === port.key))
  const forms = jacks.map((j) => say(`check.form-${j.dir}`, { form: titles.get(j.key) ?? '' }))
  return forms.length === 0
    ? say('check.port-plain', {
        label: port.label,
        connector: say(`connector.${port.connector}`),
      })
    : say('check.port', { label: port.label, forms: [...new Set(forms)].join(', ') })
}

/** Leads and adapters in the drawer: those that go into the open end first, with how many there are. */
export function pieceChoices(
  snapshot: Snapshot,
  lookup: Lookup,
  open: Connector | null,
  say: Speak,
): Choice[] {
  const counts = new Map<Uid, number>()
  for (const unit of snapshot.units.filter(mayLend)) {
    if (lookup.piece(unit.model))
      counts.set(unit.model, (counts.get(unit.model) ?? 0) + unit.quantity)
  }
  return [...counts]
    .flatMap(([model, count]) => {
      const piece = lookup.piece(model)
      if (!piece || piece.kind === 'terminator') return []
      const fits =
        open !== null && [...piece.a, ...piece.b].some((plug) => mates(plug.connector, open))
      const label = say('check.piece', { name: piece.name, count })
      return [{ value: model, label, rank: fits ? 0 : 1 }]
    })
    .sort((a, b) => a.rank - b.rank || a.label.localeCompare(b.label))
    .map(({ value, label }) => ({ value, label }))
}

/** Where a control can stand. */
export function standChoices(control: Control, say: Speak): Choice[] {
  switch (control.kind) {
    case 'positions':
      return control.positions.map((p) => ({ value: p.key, label: p.label }))
    case 'channel':
      return channelsIn(control.carriers.part).map((c) => ({ value: c.name, label: c.name }))
    case 'tuned-to': {
      const plans = [...new Set(control.reaches.map((r) => r.part.plan))]
      const all = control.reaches.flatMap(({ part }) =>
        channelsIn(part).map((c) => ({
          value: standValue({ position: c.name, plan: part.plan }),
          label:
            plans.length > 1
              ? say('check.channel-of', { channel: c.name, plan: say(`plan.${part.plan}`) })
              : c.name,
        })),
      )
      return [...new Map(all.map((c) => [c.value, c])).values()]
    }
    default:
      return []
  }
}
