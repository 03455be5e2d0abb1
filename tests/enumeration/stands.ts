import {
  POWER_KEY,
  POWER_STATES,
  type AcceptRow,
  type Carriers,
  type Condition,
  type Control,
  type Give,
  type Key,
  type ModelFunction,
  type TunedControl,
} from '@coaxwain/models'
import type { Setting } from '@coaxwain/shelf'
import { channelsIn, type Channel, type PlanId } from '@coaxwain/signal'
import { jackIn, portIn, type Bench, type Box } from './bench'

/** Where every control of a unit that matters stands; the power among them where something asks for it. */
export type Positions = ReadonlyMap<Key, string>

/** What a unit does at one stop, as far as controls decide it. */
export interface Doing {
  readonly box: Box
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly give: Give | null
}

/** Conditions that must hold, or the stop does nothing. */
const musts = ({ fn, give }: Doing): Condition[] => [fn.while ?? [], give?.while ?? []]

/** Conditions that may hold: each decides what the stop makes of a picture or of the sound. */
const mays = ({ box, fn, give }: Doing): Condition[] => [
  ...bandsOf(box, fn.tunedBy).map((reach) => reach.while ?? []),
  ...fn.accepts.map((row: AcceptRow) => row.while ?? []),
  ...(give?.picture ?? []).map((row) => row.while ?? []),
  ...(give?.rf ?? []).map((row) => row.while ?? []),
  ...fn.gives
    .filter((g) => g.sound !== undefined && jackIn(box, g.jack).form === 'sound')
    .map((g) => g.while ?? []),
  ...(fn.optional ?? []).map((o) => o.while ?? []),
]

function bandsOf({ device }: Box, key: Key | undefined): TunedControl['reaches'] {
  const control = device.controls.find((c) => c.key === key)
  return control?.kind === 'tuned-to' ? control.reaches : []
}

/** Switches beside the sockets by which the picture comes in. */
const lineEnds = ({ box, in: input }: Doing): Key[] =>
  (input === null ? [] : jackIn(box, input).contacts).flatMap(({ port }) => {
    const load = portIn(box, port).load
    return load?.kind === 'switch' ? [load.control] : []
  })

/** Every way in which the controls that matter to a stop can stand, but for those in which it does nothing. */
export function standsOf(doing: Doing): Positions[] {
  const must = musts(doing).flat()
  const controls = new Set([
    ...[...must, ...mays(doing).flat()].map((c) => c.control),
    ...lineEnds(doing),
  ])
  let stands: Map<Key, string>[] = [new Map()]
  for (const control of controls) {
    const wanted = must.filter((c) => c.control === control)
    const open = positionsOf(doing.box, control).filter((p) =>
      wanted.every((c) => c.in.includes(p)),
    )
    const left = wanted.length === 0 && mayBeStuck(doing.box) ? stands : []
    stands = [...left, ...stands.flatMap((s) => open.map((p) => new Map([...s, [control, p]])))]
  }
  return stands
}

/** Without its remote a device may have controls that stand nobody knows where. */
const mayBeStuck = ({ device, unit }: Box): boolean =>
  device.remote === 'needed' && !unit.remotePresent

function positionsOf({ device }: Box, key: Key): readonly string[] {
  if (key === POWER_KEY) return POWER_STATES
  const control = device.controls.find((c) => c.key === key)
  return control?.kind === 'positions' || control?.kind === 'auto'
    ? control.positions.map((p) => p.key)
    : []
}

export const holdsIn = (condition: Condition | undefined, stand: Positions): boolean =>
  (condition ?? []).every((c) => c.in.includes(stand.get(c.control) ?? ''))

/** A setting as a hookup states it. */
export function settingOf(
  { unit, device }: Box,
  key: Key,
  position: string,
  plan?: PlanId,
): Setting {
  const control: Control | undefined = device.controls.find((c) => c.key === key)
  return {
    unit: unit.uid,
    control: key,
    position,
    orElse: [],
    ...(plan ? { plan } : {}),
    access: control?.access ?? 'front',
    why: 'opens-way',
    must: true,
  }
}

export const settingsOf = (box: Box, stand: Positions): Setting[] =>
  [...stand].map(([key, position]) => settingOf(box, key, position))

// ---------------------------------------------------------------- channels

/** A carrier that a stop puts out, and the setting that chooses it where there is a choice. */
export interface Sent {
  readonly visionMhz: number
  readonly settings: readonly Setting[]
}

/** Tuners that run through a band without steps can stop between channels. */
const isStepless = (control: TunedControl): boolean =>
  control.way !== 'numbers' && control.way !== 'turret'

const catches = (control: TunedControl, channel: Channel, visionMhz: number): boolean =>
  channel.visionMhz !== null &&
  (Math.abs(channel.visionMhz - visionMhz) <= control.pullInMhz ||
    (isStepless(control) && visionMhz >= channel.lowerMhz && visionMhz <= channel.upperMhz))

/** One tuning for each band, or position of a band switch, in which a carrier is caught. */
export function tuningsOf(box: Box, key: Key, visionMhz: number): Setting[] {
  const control = box.device.controls.find((c) => c.key === key)
  if (control?.kind !== 'tuned-to') return []
  return control.reaches.flatMap(({ part }) => {
    const caught = channelsIn(part).find((c) => catches(control, c, visionMhz))
    return caught ? [settingOf(box, key, caught.name, part.plan)] : []
  })
}

/** The channels that a stop may put out; of those that the same tuners catch in the same bands only one. */
export function sentBy(bench: Bench, box: Box, give: Give, stand: Positions): Sent[] {
  const row = (give.rf ?? []).find((r) => holdsIn(r.while, stand))
  if (!row) return []
  if ('part' in row.channel) {
    const [only] = channelsIn(row.channel.part)
    return only && only.visionMhz !== null ? [{ visionMhz: only.visionMhz, settings: [] }] : []
  }
  const key = row.channel.control
  const control = box.device.controls.find((c) => c.key === key)
  if (control?.kind !== 'channel') return []
  const { carriers } = control
  const sorts = new Map<string, Sent>()
  for (const { name, visionMhz } of channelsIn(carriers.part)) {
    if (visionMhz === null || !isOffered(carriers, visionMhz)) continue
    const sort = caughtBy(bench, visionMhz)
    const settings = [settingOf(box, key, name, carriers.part.plan)]
    if (!sorts.has(sort)) sorts.set(sort, { visionMhz, settings })
  }
  return [...sorts.values()]
}

const isOffered = (carriers: Carriers, visionMhz: number): boolean =>
  carriers.kind === 'channels' || (visionMhz >= carriers.lowMhz && visionMhz <= carriers.highMhz)

/** Which tuners of the bench catch a carrier, band by band. */
function caughtBy({ boxes, display }: Bench, visionMhz: number): string {
  return [...boxes, display]
    .flatMap(({ device }) => device.controls.filter((c) => c.kind === 'tuned-to'))
    .map((control) =>
      control.reaches
        .map(({ part }) => (channelsIn(part).some((c) => catches(control, c, visionMhz)) ? 1 : 0))
        .join(''),
    )
    .join()
}
