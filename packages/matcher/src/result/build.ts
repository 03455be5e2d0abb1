import type { Key } from '@coaxwain/models'
import type { Hookup, Leg, OffAir, Stop, Uid, Unit } from '@coaxwain/shelf'
import { isSoundCircuit, type PictureSignal } from '@coaxwain/signal'
import type { Core } from '../compile/signal'
import type { Way } from '../compile/way'
import { worksFully } from '../search/finish'
import { pathOf, type Finished, type Label, type SoundRoute } from '../search/label'
import { cautionsOf } from './cautions/index'
import { channelControl, chooseChannel, type ChosenChannel } from './channels'
import { LinkMaker } from './links'
import { settingsOf, type Placing } from './settings'
import type { BuildInput, PathStop } from './stops'

/** Puts a finished chain into the form that everybody reads: legs, links, settings, cautions. */
export function buildHookup(input: BuildInput): Hookup {
  const { found } = input.solved
  const stops = placeStops(input)
  const made = new LinkMaker(input.frame.drawer)
  const legs = makeLegs(input, stops, made)
  const full = worksFully(found, input.frame.best)
  const draft: Omit<Hookup, 'cautions'> = {
    legs,
    links: made.links,
    ...(made.ends.length > 0 ? { ends: made.ends } : {}),
    settings: [...stops, ...alonePlacings(input)].flatMap(settingsOf),
    picture: found.picture,
    sound: { sound: found.sound, from: speaker(input) },
    worksFully: full,
    axes: found.axes,
  }
  return { ...draft, cautions: cautionsOf({ hookup: draft, stops, input }) }
}

function speaker({ solved, frame }: BuildInput): Uid | null {
  if (solved.found.sound === 'none') return null
  const outside = solved.found.speakers
  return outside
    ? (solved.units.get(outside.way)?.uid ?? null)
    : (frame.display.units[0]?.uid ?? null)
}

const unitFor = ({ solved, frame }: BuildInput, way: Way): Unit => {
  const end = [frame.source, frame.display].find((v) => v === way.variant)
  const unit = end ? end.units[0] : solved.units.get(way)
  if (!unit) throw new Error(`no unit was picked for ${way.fn.key}`)
  return unit
}

/** The carrier sets on the way, narrowed by whoever receives them, each with its channel. */
function channelsOnPath(path: readonly Label[], found: Finished, offAir: readonly OffAir[]) {
  const sent = new Map<Label, ChosenChannel>()
  const received = new Map<Label | 'end', ChosenChannel>()
  let maker: Label | null = null
  const receive = (at: Label | 'end', core: Core): void => {
    if (!maker || !core.carrier) return
    const chosen = chooseChannel(core.carrier, offAir)
    sent.set(maker, chosen)
    received.set(at, chosen)
    maker = null
  }
  for (const label of path) {
    if (label.way.fn.tunedBy !== undefined && label.step) receive(label, label.step.taken.core)
    if ((label.way.out?.rf ?? []).length > 0) maker = label
  }
  receive('end', found.step.taken.core)
  return { sent, received }
}

function placeStops(input: BuildInput): PathStop[] {
  const { found } = input.solved
  const path = pathOf(found.last)
  const { sent, received } = channelsOnPath(path, found, input.offAir)
  const narrowScreen = input.frame.display.device.display?.shape === '4:3'
  const boxes = path.map((label): PathStop => {
    const channel = sent.get(label)
    return {
      unit: unitFor(input, label.way),
      variant: label.way.variant,
      way: label.way,
      stand: label.stand,
      receives: received.get(label) ?? null,
      sends: channel
        ? { channel, control: channelControl(label.way.variant, label.way.out?.rf ?? []) }
        : null,
      narrowScreen: narrowScreen && label.prev === null,
      sig: label.sig,
    }
  })
  const end: PathStop = {
    unit: unitFor(input, found.end),
    variant: found.end.variant,
    way: found.end,
    stand: found.stand,
    receives: received.get('end') ?? null,
    sends: null,
    narrowScreen: false,
    sig: { ...found.last.sig, core: found.step.taken.core },
  }
  return [...boxes, end]
}

const routesOf = (found: Finished): SoundRoute[] =>
  [
    ...pathOf(found.last).map((l) => l.step?.soundRoute ?? null),
    found.step.soundRoute,
    found.speakers?.route ?? null,
  ].filter((r) => r !== null)

/** Boxes that handle sound alone, and loudspeakers, are set like any other unit. */
function alonePlacings(input: BuildInput): Placing[] {
  const { found } = input.solved
  const ways = routesOf(found).flatMap((r) => (r.via ? [r.via] : []))
  return [...ways, ...(found.speakers ? [found.speakers.way] : [])].map((way) => ({
    unit: unitFor(input, way),
    variant: way.variant,
    way,
    stand: way.stand,
    receives: null,
    sends: null,
    narrowScreen: false,
  }))
}

function makeLegs(input: BuildInput, stops: readonly PathStop[], made: LinkMaker): Leg[] {
  const { found } = input.solved
  const path = pathOf(found.last)
  const steps = [...path.slice(1).map((l) => l.step!), found.step]
  const pictureLinks: number[] = []
  const soundLinks: number[] = []
  steps.forEach((step, i) => {
    const [from, to] = [stops[i] as PathStop, stops[i + 1] as PathStop]
    const added = made.add(
      step.join,
      { unit: from.unit.uid, placed: from.way.from! },
      { unit: to.unit.uid, placed: to.way.into! },
    )
    for (const link of added) {
      const circuits = made.links[link]!.circuits
      if (circuits.some((c) => !isSoundCircuit(c.from))) pictureLinks.push(link)
      if (circuits.some((c) => isSoundCircuit(c.from))) soundLinks.push(link)
    }
    step.terminators.forEach((piece, nth) =>
      made.end(piece, { unit: to.unit.uid, port: to.way.terminate[nth]! }),
    )
    if (step.soundRoute)
      soundLinks.push(...addRoute(input, made, step.soundRoute, [waitingAt(path, stops, i), to]))
  })
  if (found.speakers) {
    const from = waitingAt(path, stops, path.length - 1)
    soundLinks.push(...addRoute(input, made, found.speakers.route, [from, speakersStop(input)]))
  }
  const picture: Leg = { purpose: 'picture', stops: stops.map(stopOf(input)), links: pictureLinks }
  const sound: Leg[] =
    soundLinks.length === 0
      ? []
      : [{ purpose: 'sound', stops: soundStops(input, stops), links: soundLinks }]
  return [picture, ...sound, ...aerialLeg(input, stops, made, pictureLinks)]
}

/** From the aerial through boxes of its own to where it joins, and on with the picture. */
function aerialLeg(
  input: BuildInput,
  stops: readonly PathStop[],
  made: LinkMaker,
  pictureLinks: readonly number[],
): Leg[] {
  const use = input.solved.found.aerial
  if (!use) return []
  const last = stops.length - 1
  const joint = stops.findIndex(
    (s, i) => s.way === use.at || (i === last && s.way.id === use.at.id),
  )
  const at = stops[joint]
  if (!at) return []
  const { ways, joins } = use.route
  const own = ways.map((way) => ({ way, unit: unitFor(input, way) }))
  const links = joins.flatMap((join, i) => {
    const from = own[i]!
    const next = own[i + 1]
    const to = next
      ? { unit: next.unit.uid, placed: next.way.into! }
      : { unit: at.unit.uid, placed: use.into }
    return made.add(join, { unit: from.unit.uid, placed: from.way.from! }, to)
  })
  const after = use.fn.tunedBy === undefined ? stops.slice(joint + 1) : []
  const shared = pictureLinks.filter((i) => {
    const link = made.links[i]!
    return after.some((s) => s.unit.uid === link.to.unit) && link.from.unit !== link.to.unit
  })
  const stop = (unit: Unit, fn: Key, into: Key | null, out: Key | null): Stop => ({
    unit: unit.uid,
    function: fn,
    in: into,
    out,
    picture: null,
    sound: 'none',
  })
  return [
    {
      purpose: 'aerial',
      stops: [
        ...own.map(({ way, unit }) => stop(unit, way.fn.key, way.in, way.out?.jack ?? null)),
        stop(
          at.unit,
          use.fn.key,
          use.in,
          use.fn.tunedBy === undefined ? (at.way.out?.jack ?? null) : null,
        ),
        ...after.map((s) => stop(s.unit, s.way.fn.key, s.way.in, s.way.out?.jack ?? null)),
      ],
      links: [...links, ...shared],
    },
  ]
}

interface RouteEnd {
  readonly unit: Unit
  readonly way: Way
}

/** Where the sound waited before the step after `index`. */
function waitingAt(path: readonly Label[], stops: readonly PathStop[], index: number): RouteEnd {
  const label = path[index] as Label
  const at = label.sound.kind === 'waits' ? path.indexOf(label.sound.at) : index
  return stops[at] as PathStop
}

function speakersStop(input: BuildInput): RouteEnd {
  const way = input.solved.found.speakers!.way
  return { way, unit: unitFor(input, way) }
}

function addRoute(
  input: BuildInput,
  made: LinkMaker,
  route: SoundRoute,
  [from, to]: readonly [RouteEnd, RouteEnd],
): number[] {
  const [first, second] = route.joins
  const start = { unit: from.unit.uid, placed: from.way.from! }
  const end = { unit: to.unit.uid, placed: to.way.into! }
  if (!route.via || !second) return made.add(first!, start, end)
  const unit = unitFor(input, route.via).uid
  return [
    ...made.add(first!, start, { unit, placed: route.via.into! }),
    ...made.add(second, { unit, placed: route.via.from! }, end),
  ]
}

const stopOf =
  (input: BuildInput) =>
  (stop: PathStop, i: number, all: readonly PathStop[]): Stop => ({
    unit: stop.unit.uid,
    function: stop.way.fn.key,
    in: stop.way.in,
    out: stop.way.out?.jack ?? null,
    picture: pictureAt(stop, all, i),
    sound: i === all.length - 1 ? input.solved.found.sound : soundLeaving(input, i),
  })

function soundLeaving({ solved }: BuildInput, index: number): Stop['sound'] {
  const label = pathOf(solved.found.last)[index] as Label
  if (label.sound.kind === 'waits') return label.sound.sound
  return label.sig.sound
}

/** The signal with the channel that was chosen for it. */
function pictureAt(stop: PathStop, all: readonly PathStop[], index: number): PictureSignal {
  const { core, sound, ...been } = stop.sig
  const chosen = [...all.slice(0, index + 1)].reverse().find((s) => s.sends)?.sends?.channel ?? null
  return {
    form: core.form,
    scan: core.scan,
    colour: core.colour,
    protection: core.protection,
    ...been,
    carrier:
      core.carrier && chosen
        ? {
            part: core.carrier.part,
            visionMhz: chosen.visionMhz,
            channel: chosen.name,
            system: core.carrier.system,
            digital: core.carrier.digital,
            sideband: core.carrier.sideband,
            levelDbmv: sendLevel(all, index),
            sound,
          }
        : null,
  }
}

/** Level of the carrier where it was made; losses on the way are the house's business. */
function sendLevel(all: readonly PathStop[], index: number): number {
  const maker = [...all.slice(0, index + 1)].reverse().find((s) => s.sends)
  return maker?.way.out?.rf?.[0]?.levelDbmv ?? 0
}

/** Units that the sound passes, in order, each with what it does there. */
function soundStops(input: BuildInput, stops: readonly PathStop[]): Stop[] {
  const passes = (key: Key | null): boolean => key !== null
  const own = stops
    .filter((s) => s.way.soundFrom !== null || s.way.soundTo !== null)
    .map((s): Stop => ({
      unit: s.unit.uid,
      function: s.way.functions[s.way.functions.length - 1] as Key,
      in: jackKey(s.way.soundFrom),
      out: jackKey(s.way.soundTo),
      picture: null,
      sound: soundLeaving(input, Math.min(stops.indexOf(s), stops.length - 2)),
    }))
    .filter((s) => passes(s.in) || passes(s.out))
  const alone = alonePlacings(input).map((p): Stop => ({
    unit: p.unit.uid,
    function: p.way.fn.key,
    in: jackKey(p.way.soundFrom),
    out: jackKey(p.way.soundTo),
    picture: null,
    sound: input.solved.found.sound,
  }))
  return [...own, ...alone]
}

const jackKey = (place: Way['soundFrom']): Key | null =>
  place === null || place === 'picture' ? null : place.jack
