import { jackOf, type DeviceModel, type Give, type Key, type ModelFunction } from '@coaxwain/models'
import {
  channelsIn,
  isEncoded,
  type Colour,
  type PictureForm,
  type RfSystemId,
  type ScanId,
} from '@coaxwain/signal'
import type { Chance } from '../../support/chance'
import { BOXES, type Named } from './parts'

/** What a device does on a way that was drawn. */
export interface Drawn {
  readonly device: Named<DeviceModel>
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly give: Give | null
}

/** A picture, as roughly as is needed to draw a way that often works. */
export interface Rough {
  readonly form: PictureForm
  readonly scan: ScanId
  readonly colour: Colour
  readonly system: RfSystemId | null
  readonly visionMhz: readonly number[]
}

const formOf = (model: DeviceModel, key: Key): PictureForm => jackOf(model, key).form as PictureForm

/** A picture that a source may give, of the forms that are wanted where any are. */
export function drawSource(
  chance: Chance,
  device: Named<DeviceModel>,
  isWanted: (form: PictureForm) => boolean = () => true,
): { drawn: Drawn; picture: Rough } | null {
  const { model } = device
  const options = model.functions
    .filter((fn) => fn.kind === 'plays')
    .flatMap((fn) =>
      fn.gives
        .filter((give) => give.picture && isWanted(formOf(model, give.jack)))
        .map((give) => ({ fn, give })),
    )
  const option = chance.pickIfAny(options)
  const row = option && chance.pickIfAny(option.give.picture ?? [])
  if (!option || !row || row.scan === 'same' || row.colour === 'same') return null
  const shown = { form: formOf(model, option.give.jack), scan: row.scan, colour: row.colour }
  const picture = { ...shown, ...carrierOf(model, option.give) }
  return { drawn: { device, fn: option.fn, in: null, give: option.give }, picture }
}

function carrierOf(model: DeviceModel, give: Give): Pick<Rough, 'system' | 'visionMhz'> {
  const [rf] = give.rf ?? []
  if (!rf) return { system: null, visionMhz: [] }
  const { channel } = rf
  const control =
    'control' in channel ? model.controls.find((c) => c.key === channel.control) : null
  const part =
    'part' in channel ? channel.part : control?.kind === 'channel' ? control.carriers.part : null
  const channels = part ? channelsIn(part) : []
  return { system: rf.system, visionMhz: channels.flatMap((c) => c.visionMhz ?? []) }
}

/** A function of a device with one of its picture inputs. */
interface Entry {
  readonly device: Named<DeviceModel>
  readonly fn: ModelFunction
  readonly key: Key
}

const entriesOf = (device: Named<DeviceModel>): Entry[] =>
  device.model.functions.flatMap((fn) =>
    [...fn.needs, ...(fn.oneOf ?? [])].map((key) => ({ device, fn, key })),
  )

/** Every way into a box, by the form that it takes. */
const WAYS_IN = new Map<PictureForm, Entry[]>()
for (const entry of BOXES.flatMap(entriesOf)) {
  const form = formOf(entry.device.model, entry.key)
  WAYS_IN.set(form, [...(WAYS_IN.get(form) ?? []), entry])
}

/** Functions of a device that would roughly take a picture. */
export const takersIn = (device: Named<DeviceModel>, picture: Rough): Drawn[] =>
  entriesOf(device).flatMap((entry) => takersBy(entry, picture))

function takersBy({ device, fn, key }: Entry, picture: Rough): Drawn[] {
  const { model } = device
  if (formOf(model, key) !== picture.form || !takes(model, fn, picture)) return []
  const gives = fn.gives.filter((g) => g.picture)
  const drawn = { device, fn, in: key }
  return gives.length === 0 ? [{ ...drawn, give: null }] : gives.map((give) => ({ ...drawn, give }))
}

function takes(model: DeviceModel, fn: ModelFunction, { scan, colour, ...rf }: Rough): boolean {
  const isKnown = fn.accepts.some(
    (row) =>
      (row.scans === 'any' || row.scans.includes(scan)) &&
      (row.colours === 'any' || row.colours.includes(colour) || isEncoded(colour)) &&
      (fn.tunedBy === undefined ||
        (rf.system !== null && row.systems?.includes(rf.system) === true)),
  )
  return isKnown && (fn.tunedBy === undefined || reaches(model, fn.tunedBy, rf.visionMhz))
}

function reaches(model: DeviceModel, key: Key, visionMhz: readonly number[]): boolean {
  const control = model.controls.find((c) => c.key === key)
  return (
    control?.kind === 'tuned-to' &&
    control.reaches.some(({ part }) =>
      channelsIn(part).some((c) => c.visionMhz !== null && visionMhz.includes(c.visionMhz)),
    )
  )
}

function after(chance: Chance, { device, give }: Drawn, picture: Rough): Rough {
  const row = chance.pickIfAny(give?.picture ?? []) ?? { scan: 'same', colour: 'same' }
  return {
    form: formOf(device.model, give!.jack),
    scan: row.scan === 'same' ? picture.scan : row.scan,
    colour: row.colour === 'same' ? picture.colour : row.colour,
    ...(give?.rf
      ? carrierOf(device.model, give)
      : { system: picture.system, visionMhz: picture.visionMhz }),
  }
}

/** A way of so many boxes on from a picture, and what leaves the last of them; null where it ends before. */
export function drawBoxes(
  chance: Chance,
  count: number,
  start: Rough,
): { drawn: Drawn[]; picture: Rough } | null {
  const drawn: Drawn[] = []
  let picture = start
  while (drawn.length < count) {
    const open = WAYS_IN.get(picture.form) ?? []
    const free = open.filter((entry) => drawn.every((d) => d.device !== entry.device))
    const takers = free.flatMap((entry) => takersBy(entry, picture)).filter((t) => t.give !== null)
    const next = chance.pickIfAny(takers)
    if (!next) return null
    drawn.push(next)
    picture = after(chance, next, picture)
  }
  return { drawn, picture }
}
