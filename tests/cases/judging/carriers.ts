import { findChannel, leastMargin, type Occupant, type RfSystemId } from '@coaxwain/signal'
import { stated, type CaseHop, type CasePort, type CaseRf, type CaseUnit } from '../form'
import { airPlan, caseChannel } from '../translate'
import { isOffAir, portName, unitOf, type Bench, type Stand } from './bench'

/** 0.346 sqrt(75) microvolts at an aerial terminal: 47 CFR 15.115(c)(1). */
const LIMIT_DBMV = -50.47

/** Level of a station where none is stated. */
const STATION_DBMV = 6

/** Up to so much short of a limit is borderline. */
const BORDERLINE_DB = -3

export const isAerial = (unit: CaseUnit | undefined): boolean =>
  unit !== undefined &&
  unit.ports.length > 0 &&
  unit.ports.every((p) => p.dir === 'out' && p.signals.includes('rf') && !p.rf)

/** A carrier at a port: about to go into the unit, or just come out of it. It is not thrown back by what it meets. */
interface Place {
  readonly ref: string
  readonly going: 'in' | 'out'
  readonly dbmv: number
}

/** Every way on, meant or not: along a lead, or through a box. */
function onward({ ref, going, dbmv }: Place, bench: Bench): Place[] {
  const id = unitOf(ref)
  const unit = bench.unit(id)
  if (going === 'out')
    return bench.hops
      .filter((h) => h.signal === 'rf')
      .flatMap((h) => (h.from === ref ? [h.to] : h.to === ref ? [h.from] : []))
      .map((to) => ({ ref: to, going: 'in', dbmv }))
  if (!unit || id === 'display') return []
  return unit.ports
    .filter((p) => p.signals.includes('rf') && p.id !== portName(ref))
    .map((p) => ({
      ref: `${id}:${p.id}`,
      going: 'out',
      dbmv: dbmv + gainBetween(unit, portName(ref), p.id),
    }))
}

/** Forwards as stated; otherwise by the isolation, which is none where nobody has stated it. */
function gainBetween(unit: CaseUnit, from: string, to: string): number {
  const passes = (unit.does ?? []).some((d) => d.from === from && d.to === to && d.how !== 'tuned')
  if (passes) return (unit.gainDb ?? 0) - (unit.lossDb ?? 0)
  return -(unit.leaks?.find((l) => l.from === from && l.to === to)?.db ?? 0)
}

/** Below this nothing matters any more. */
const NOTHING_DBMV = -200

/** The most that gets from an output to any aerial, in dBmV; -Infinity where nothing does. */
function atAerials(start: string, dbmv: number, bench: Bench): number {
  const best = new Map<string, number>()
  const own = inside({ ref: start, going: 'in', dbmv }, bench)
  const queue: Place[] = [{ ref: start, going: 'out', dbmv }, ...own]
  let most = -Infinity
  for (let at = queue.shift(); at !== undefined; at = queue.shift()) {
    const key = `${at.ref} ${at.going}`
    if (at.dbmv < NOTHING_DBMV || at.dbmv <= (best.get(key) ?? -Infinity)) continue
    best.set(key, at.dbmv)
    const unit = bench.unit(unitOf(at.ref))
    if (at.going === 'in' && isAerial(unit)) most = Math.max(most, at.dbmv - (unit?.reverseDb ?? 0))
    queue.push(...onward(at, bench))
  }
  return most
}

/** A unit's own channel also gets back to its aerial input. */
const inside = (at: Place, bench: Bench): Place[] => onward(at, bench)

const ownOutputs = (bench: Bench): string[] => [
  ...new Set(
    bench.hops
      .filter((h) => h.signal === 'rf' && bench.port(h.from)?.rf !== undefined)
      .map((h) => h.from),
  ),
]

/** RF outputs in use of which too much gets up to an aerial. */
export const radiation = (bench: Bench): string[] =>
  ownOutputs(bench).flatMap((ref) => {
    const level = bench.port(ref)?.rf?.levelDbmv ?? 0
    const up = atAerials(ref, level, bench)
    return up > LIMIT_DBMV ? [`${ref} reaches the aerial with ${up.toFixed(1)} dBmV`] : []
  })

/** An aerial that is in use must lead to the display, or to a tuner for digital stations. */
export function aerialKept(bench: Bench): string[] {
  if (!bench.question.environment.antennaUsed) return []
  const led = bench.answer.paths.filter(isOffAir).filter(({ hops }) => {
    const end = bench.port(hops.at(-1)?.to ?? '')
    const ends =
      unitOf(hops.at(-1)?.to ?? '') === 'display' || (end?.tuner?.digital ?? []).length > 0
    return isAerial(bench.unit(unitOf(hops[0]?.from ?? ''))) && ends
  })
  return led.length > 0 ? [] : ['the aerial leads nowhere']
}

function stations(bench: Bench): { occupant: Occupant; name: string }[] {
  const plan = airPlan(bench.question)
  return bench.question.environment.offAir.flatMap((s) => {
    const { plan: own, name } = caseChannel(plan, s.channel)
    const channel = findChannel(own, name)
    if (!channel) return []
    const analogue = s.kind === 'analogue'
    return [
      {
        name: s.channel,
        occupant: {
          lowerMhz: channel.lowerMhz,
          upperMhz: channel.upperMhz,
          visionMhz: analogue ? channel.visionMhz : null,
          system: analogue && channel.system !== 'DVB-T' ? channel.system : null,
          sideband: 'vestigial',
          levelDbmv: s.levelDbmv ?? STATION_DBMV,
        },
      },
    ]
  })
}

function occupantOf(rf: CaseRf, channel: string): Occupant | null {
  const { plan, name } = caseChannel(rf.plan, channel)
  const found = findChannel(plan, name)
  return found
    ? {
        lowerMhz: found.lowerMhz,
        upperMhz: found.upperMhz,
        visionMhz: found.visionMhz,
        system: rf.system as RfSystemId,
        sideband: rf.sideband === 'dsb' ? 'double' : 'vestigial',
        levelDbmv: rf.levelDbmv ?? STATION_DBMV,
      }
    : null
}

/** Whether a path is open as the controls stand. */
function isOpen(hops: readonly CaseHop[], bench: Bench, stand: Stand): boolean {
  const holdsAt = (ref: string): boolean => stand.holds(unitOf(ref), bench.port(ref)?.when)
  return hops.every((h, i) => {
    const before = hops[i - 1]
    const through =
      !before ||
      (bench.unit(unitOf(h.from))?.does ?? []).some(
        (d) =>
          d.from === portName(before.to) &&
          d.to === portName(h.from) &&
          d.how !== 'tuned' &&
          stand.holds(unitOf(h.from), d.when),
      )
    return through && holdsAt(h.from) && holdsAt(h.to)
  })
}

/** Carriers and stations that share a lead must not spoil each other; kept apart, only the same channel counts. */
export function channelClashes(bench: Bench, stand: Stand): string[] {
  const air = bench.answer.paths.filter(isOffAir)
  const airHops = air.flatMap((p) => p.hops)
  const open = air.filter((p) => isOpen(p.hops, bench, stand)).flatMap((p) => p.hops)
  const runs = stations(bench)
  return ownOutputs(bench).flatMap((ref) => {
    const port = bench.port(ref) as CasePort
    const rf = port.rf as CaseRf
    const channel = rf.control ? bench.settingsFor(unitOf(ref), rf.control)[0]?.to : rf.channels[0]
    const own = channel === undefined ? null : occupantOf(rf, channel)
    if (!own) return []
    const after = bench.watched.filter((h) => h.signal === 'rf').map((h) => h.to)
    const shares = (hops: readonly CaseHop[]): boolean => hops.some((h) => after.includes(h.to))
    if (shares(open))
      return runs
        .filter((s) => leastMargin(s.occupant, own) < BORDERLINE_DB)
        .map((s) => `${ref} on ${channel} clashes with the station on ${s.name}`)
    if (!shares(airHops) && bench.question.environment.offAir.length === 0) return []
    const onSame = runs.find((s) => Math.abs(s.occupant.lowerMhz - own.lowerMhz) < 0.05)
    const free = rf.channels.some((c) => {
      const other = occupantOf(rf, c)
      return other && runs.every((s) => Math.abs(s.occupant.lowerMhz - other.lowerMhz) >= 0.05)
    })
    return onSame && free && shares(airHops) ? [`${ref} is on the channel of a station`] : []
  })
}

/** Two private carriers on one lead, also an idle one that is always on, must not spoil each other. */
export function privateClashes(bench: Bench): string[] {
  const carriers = bench.chain.flatMap((id) =>
    (bench.unit(id)?.ports ?? []).flatMap((p) => {
      const rf = p.rf
      const used = bench.hops.some((h) => h.from === `${id}:${p.id}`)
      if (!rf || !used) return []
      const played = id === 'source' || rf.always === true
      const channel = rf.control ? bench.settingsFor(id, rf.control)[0]?.to : rf.channels[0]
      const own = channel === undefined ? null : occupantOf(rf, channel)
      return played && own ? [{ id, own }] : []
    }),
  )
  const [first, second] = carriers
  if (!first || !second || first.id === second.id) return []
  return leastMargin(first.own, second.own) < BORDERLINE_DB
    ? [`${first.id} and ${second.id} spoil each other`]
    : []
}

/** Whoever wants a supply on the cable gets it, and nobody else does. */
export function supplies(bench: Bench): string[] {
  return [...bench.units].flatMap(([id, unit]) => {
    if (stated(unit.needsDc).length === 0 || unit.needsDc === false) return []
    const uses = bench.hops.filter((h) => unitOf(h.from) === id)
    return uses.length === 0 || uses.some((h) => isSupplied(h.to, bench, 0))
      ? []
      : [`${id} gets no supply`]
  })
}

function isSupplied(ref: string, bench: Bench, depth: number): boolean {
  const unit = bench.unit(unitOf(ref))
  const port = bench.port(ref)
  const outs = stated(unit?.dcOut).map((s) => s.value)
  if (outs.includes(portName(ref)) || outs.includes(true) || (port?.dcVolts ?? 0) !== 0) return true
  if (depth > 4 || stated(unit?.dcPass).length === 0) return false
  return bench.hops
    .filter((h) => unitOf(h.from) === unitOf(ref))
    .some((h) => isSupplied(h.to, bench, depth + 1))
}
