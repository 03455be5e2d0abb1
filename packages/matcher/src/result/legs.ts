import type { Key } from '@coaxwain/models'
import type { Leg, Link, Stop, Unit } from '@coaxwain/shelf'
import { isSoundCircuit, type PictureSignal } from '@coaxwain/signal'
import { soundEnd, type Way } from '../compile/way'
import { stepsOf } from '../search/assign'
import { pathOf } from '../search/label'
import { jointOf, type EdgeEnd } from '../search/wiring'
import type { LinkMaker } from './links'
import { placeAlone, unitFor, type BuildInput, type PathStop } from './stops'

/** Plugs everything in, and says which units and links serve the picture, the sound and the aerial. */
export function makeLegs(input: BuildInput, stops: readonly PathStop[], made: LinkMaker): Leg[] {
  const { wiring } = input
  const at = ({ node, placed }: EdgeEnd) => ({ unit: unitFor(input, node).uid, placed })
  const plugged = wiring.edges.flatMap(({ from, to, join, of }) =>
    made.add(join, at(from), at(to)).map((link) => ({ link, of, ...carried(made.links[link]!) })),
  )
  const linksOf = (serves: (p: (typeof plugged)[number]) => boolean): number[] =>
    plugged.filter(serves).map((p) => p.link)
  const pictureLinks = linksOf((p) => p.of !== 'aerial' && p.picture)
  const soundLinks = linksOf((p) => p.of !== 'aerial' && p.sound)
  const aerialLinks = linksOf((p) => p.of === 'aerial')
  endLines(input, stops, made)
  return [
    { purpose: 'picture', stops: stops.map(stopOf(input)), links: pictureLinks },
    ...(soundLinks.length > 0
      ? [{ purpose: 'sound' as const, stops: soundStops(input, stops), links: soundLinks }]
      : []),
    ...aerialLeg(input, stops, [...aerialLinks, ...sharedLinks(input, stops, pictureLinks, made)]),
  ]
}

const carried = ({ circuits }: Link): { picture: boolean; sound: boolean } => ({
  picture: circuits.some((c) => !isSoundCircuit(c.from)),
  sound: circuits.some((c) => isSoundCircuit(c.from)),
})

/** Terminators on loop sockets into which nothing is plugged. */
function endLines({ wiring }: BuildInput, stops: readonly PathStop[], made: LinkMaker): void {
  stepsOf(wiring.found).forEach(({ terminators }, i) => {
    const { unit, way } = stops[i + 1]!
    terminators.forEach((piece, nth) =>
      made.end(piece, { unit: unit.uid, port: way.terminate[nth]! }),
    )
  })
}

/** Units after the joint, where the aerial goes on together with the picture. */
function afterJoint({ wiring }: BuildInput, stops: readonly PathStop[]): readonly PathStop[] {
  const { found, chain } = wiring
  const joint = jointOf(found, chain)
  if (!joint || found.aerial?.fn.tunedBy !== undefined) return []
  return stops.slice(chain.indexOf(joint) + 1)
}

function sharedLinks(
  input: BuildInput,
  stops: readonly PathStop[],
  pictureLinks: readonly number[],
  made: LinkMaker,
): number[] {
  const after = afterJoint(input, stops)
  return pictureLinks.filter((i) => {
    const link = made.links[i]!
    return after.some((s) => s.unit.uid === link.to.unit) && link.from.unit !== link.to.unit
  })
}

const plainStop = (unit: Unit, fn: Key, into: Key | null, out: Key | null): Stop => ({
  unit: unit.uid,
  function: fn,
  in: into,
  out,
  picture: null,
  sound: 'none',
})

const throughStop = (unit: Unit, way: Way): Stop =>
  plainStop(unit, way.fn.key, way.in, way.out?.jack ?? null)

/** From the aerial through boxes of its own to where it joins, and on with the picture. */
function aerialLeg(input: BuildInput, stops: readonly PathStop[], links: readonly number[]): Leg[] {
  const { found, chain, aerial } = input.wiring
  const use = found.aerial
  const joint = jointOf(found, chain)
  if (!use || !joint) return []
  const out = use.fn.tunedBy === undefined ? (joint.way.out?.jack ?? null) : null
  return [
    {
      purpose: 'aerial',
      stops: [
        ...aerial.map((node) => throughStop(unitFor(input, node), node.way)),
        plainStop(unitFor(input, joint), use.fn.key, use.in, out),
        ...afterJoint(input, stops).map((s) => throughStop(s.unit, s.way)),
      ],
      links,
    },
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
    sound: i === all.length - 1 ? input.wiring.found.sound : soundLeaving(input, i),
  })

function soundLeaving({ wiring }: BuildInput, index: number): Stop['sound'] {
  const label = pathOf(wiring.found.last)[index]!
  return label.sound.kind === 'waits' ? label.sound.sound : label.sig.sound
}

/** The signal with the channel that was chosen for it. */
function pictureAt(stop: PathStop, all: readonly PathStop[], index: number): PictureSignal {
  const { core, sound, ...been } = stop.sig
  const { form, scan, colour, protection, carrier } = core
  const maker = all.slice(0, index + 1).findLast((s) => s.sends)
  const chosen = maker?.sends?.channel
  const plain = { form, scan, colour, protection, ...been }
  if (!carrier || !chosen) return { ...plain, carrier: null }
  const { part, system, digital, sideband } = carrier
  return {
    ...plain,
    carrier: {
      part,
      visionMhz: chosen.visionMhz,
      channel: chosen.name,
      system,
      digital,
      sideband,
      // Where it was made; losses on the way are the house's business.
      levelDbmv: maker.way.out?.rf?.[0]?.levelDbmv ?? 0,
      sound,
    },
  }
}

/** Units that the sound passes, in order, each with what it does there. */
function soundStops(input: BuildInput, stops: readonly PathStop[]): Stop[] {
  const own = stops.map((s, i): Stop => ({
    unit: s.unit.uid,
    function: s.way.functions.at(-1)!,
    in: jackKey(s.way.soundFrom),
    out: jackKey(s.way.soundTo),
    picture: null,
    sound: soundLeaving(input, Math.min(i, stops.length - 2)),
  }))
  const alone = placeAlone(input).map((p): Stop => ({
    unit: p.unit.uid,
    function: p.way.fn.key,
    in: jackKey(p.way.soundFrom),
    out: jackKey(p.way.soundTo),
    picture: null,
    sound: input.wiring.found.sound,
  }))
  return [...own.filter((s) => s.in !== null || s.out !== null), ...alone]
}

const jackKey = (place: Way['soundFrom']): Key | null => soundEnd(place)?.jack ?? null
