import { isSoundCircuit, TIER, SOUND_RANK, type Sound } from '@coaxwain/signal'
import { doubtOf, formState, functionState, LIMITS, mayLend } from '@coaxwain/shelf'
import type { Hookup, Leg, Question, SeenPicture, Snapshot, Uid } from '@coaxwain/shelf'
import { POWER_KEY, POWER_STATES, type DeviceModel, type Key } from '@coaxwain/models'
import { checkAerial } from './aerial'
import { Ears, soundOf, type Pair } from './ears'
import { finding, type Finding } from './finding'
import type { Bench } from './flow'
import { checkLinks } from './links'
import { Positions, ShelfView } from './shelf-view'
import { fromDisplay, walkPicture } from './walk'

export interface Checked {
  /** Nothing is wrong. */
  readonly ok: boolean
  readonly findings: readonly Finding[]
  readonly picture: SeenPicture | null
  readonly sound: Sound
}

/**
 * Judges a hookup from first principles: plugs, wires, directions, states, positions, what every function
 * makes of what arrives, and whether the hookup claims just that. Knows nothing of how it was found.
 */
export function checkHookup(snapshot: Snapshot, question: Question, hookup: Hookup): Checked {
  const view = new ShelfView(snapshot)
  const bench: Bench = { hookup, view, positions: new Positions(hookup), found: [] }
  const ears = new Ears(bench, question)
  const picture = hookup.legs.find((l) => l.purpose === 'picture')
  bench.found.push(
    ...checkUnits(bench, question),
    ...checkLinks(hookup, view),
    ...checkSettings(bench),
    ...checkLineEnds(bench),
    ...checkLegs(hookup),
  )
  const walked = walkPicture(bench, question, picture?.stops ?? [], ears)
  const sound = hear(bench, question, picture, ears, walked.embedded)
  bench.found.push(
    ...checkHarm(bench),
    ...checkAerial(bench, question),
    ...checkClaims(bench, question, walked.picture, sound),
  )
  const findings = distinct(bench.found)
  return { ok: findings.length === 0, findings, picture: walked.picture, sound }
}

function distinct(found: readonly Finding[]): Finding[] {
  const seen = new Set<string>()
  return found.filter((f) => {
    const key = JSON.stringify(f)
    return !seen.has(key) && seen.add(key)
  })
}

const allUnits = (hookup: Hookup): Uid[] => [
  ...new Set(hookup.legs.flatMap((l) => l.stops.map((s) => s.unit))),
]

function checkUnits({ hookup, view }: Bench, question: Question): Finding[] {
  const ends = [question.source.unit, question.display.unit]
  const found = allUnits(hookup).flatMap((uid): Finding[] => {
    const unit = view.unit(uid)
    if (!unit || !view.device(uid)) return [finding('unit-unknown', { unit: uid })]
    if (ends.includes(uid)) return []
    if (question.avoid.includes(uid)) return [finding('unit-avoided', { unit: uid })]
    return mayLend(unit) ? [] : [finding('unit-not-lent', { unit: uid })]
  })
  for (const leg of hookup.legs) {
    const uids = leg.stops.map((s) => s.unit)
    if (new Set(uids).size < uids.length) found.push(finding('unit-twice', { leg: leg.purpose }))
    if (uids.length - 2 > LIMITS.boxesInLeg)
      found.push(finding('too-many-boxes', { leg: leg.purpose }))
  }
  return found
}

function checkSettings({ hookup, view }: Bench): Finding[] {
  return hookup.settings.flatMap((s): Finding[] => {
    const at = { unit: s.unit, control: s.control }
    const device = view.device(s.unit)
    if (device && s.control === POWER_KEY) {
      const known = (POWER_STATES as readonly string[]).includes(s.position)
      return known ? [] : [finding('position-unknown', at)]
    }
    const control = device?.controls.find((c) => c.key === s.control)
    if (!device || !control) return [finding('control-unknown', at)]
    if (control.kind !== 'positions' && control.kind !== 'auto') return []
    if (!control.positions.some((p) => p.key === s.position))
      return [finding('position-unknown', at)]
    if (control.kind === 'auto' && !isMoved(hookup, s.unit, control, s.position)) {
      return [finding('automatic-not-moved', at)]
    }
    return outOfReach(view, s.unit, device, s.control, s.position)
      ? [finding('out-of-reach', at)]
      : []
  })
}

/** A control that only the missing remote moves stands where it was left. */
function outOfReach(
  view: ShelfView,
  uid: Uid,
  device: DeviceModel,
  key: Key,
  position: string,
): boolean {
  const unit = view.unit(uid)
  const control = device.controls.find((c) => c.key === key)
  const needsRemote =
    device.remote === 'needed' && (control?.access === 'remote' || control?.access === 'menu')
  return needsRemote && unit?.remotePresent === false && unit.stands[key] !== position
}

type Auto = Extract<DeviceModel['controls'][number], { kind: 'auto' }>

/** The cause of an automatic position is there, or all other causes are absent. */
function isMoved(hookup: Hookup, unit: Uid, control: Auto, position: string): boolean {
  const fed = (port: Key): boolean =>
    hookup.links.some((l) => l.to.unit === unit && l.to.port === port)
  const plugged = (port: Key): boolean =>
    fed(port) || hookup.links.some((l) => l.from.unit === unit && l.from.port === port)
  const acts = (cause: Auto['positions'][number]['cause']): boolean => {
    switch (cause.kind) {
      case 'signal-at':
      case 'voltage-at':
        return fed(cause.port)
      case 'plug-in':
        return plugged(cause.port)
      case 'powered':
        return true
      case 'otherwise':
        return !control.positions.some((p) => p.cause.kind !== 'otherwise' && acts(p.cause))
    }
  }
  return control.positions.some((p) => p.key === position && acts(p.cause))
}

/** An input with a 75-ohm switch ends its line here, so the switch must stand so. */
function checkLineEnds({ hookup, view, positions }: Bench): Finding[] {
  return hookup.links.flatMap((l): Finding[] => {
    const load = view.port(l.to.unit, l.to.port)?.load
    if (load?.kind !== 'switch' || l.circuits.every((c) => isSoundCircuit(c.from))) return []
    return positions.of(l.to.unit, load.control) === load.position75
      ? []
      : [finding('line-not-ended', { unit: l.to.unit, port: l.to.port })]
  })
}

/** Every link belongs to a leg, and joins units that its legs pass. */
function checkLegs(hookup: Hookup): Finding[] {
  const used = new Set(hookup.legs.flatMap((l) => l.links))
  const strange = [...used].some((i) => hookup.links[i] === undefined)
  const units = new Set(allUnits(hookup))
  const outside = hookup.links.some((l) => !units.has(l.from.unit) || !units.has(l.to.unit))
  const loose = hookup.links.some((_, i) => !used.has(i))
  return strange || outside || loose ? [finding('legs-and-links-differ')] : []
}

/** Rule 0: a socket that is joined to a live chassis harms whoever touches what is plugged in. */
function checkHarm({ hookup, view }: Bench): Finding[] {
  const ends = hookup.links.flatMap((l) => [l.from, l.to])
  return ends.flatMap((end): Finding[] => {
    const chassis = view.device(end.unit)?.chassis
    const port = view.port(end.unit, end.port)
    if (!port || chassis === 'isolated' || port.isolated !== 'no') return []
    return chassis === 'live' || port.origin === 'added'
      ? [finding('live-socket', { unit: end.unit, port: end.port })]
      : []
  })
}

function hear(
  bench: Bench,
  question: Question,
  picture: Leg | undefined,
  ears: Ears,
  embedded: Pair,
): Sound {
  const from = bench.hookup.sound.from
  const end = picture?.stops.at(-1)
  if (from === null || !end) return 'none'
  const device = bench.view.device(from)
  if (!device) return 'none'
  if (from === question.display.unit) {
    const fn = bench.view.fn(end.unit, end.function)
    if (!fn) return 'none'
    const entered = ears.enters(end.unit, fn)
    void embedded
    return fromDisplay(device, entered)
  }
  const speaks = device.functions.filter((f) => f.kind === 'makes-sound')
  const heard = speaks.map((fn) => ears.enters(from, fn))
  return (
    heard.map((pair) => soundOf(pair)).sort((a, b) => SOUND_RANK[b] - SOUND_RANK[a])[0] ?? 'none'
  )
}

function checkClaims(
  bench: Bench,
  question: Question,
  seen: SeenPicture | null,
  sound: Sound,
): Finding[] {
  const { hookup } = bench
  const found: Finding[] = []
  const claim = hookup.picture
  const same =
    seen !== null &&
    seen.colour === claim.colour &&
    TIER[seen.quality] === TIER[claim.quality] &&
    Math.abs(seen.lumaMhz - claim.lumaMhz) < 0.001 &&
    JSON.stringify([...seen.degradations].sort()) === JSON.stringify([...claim.degradations].sort())
  if (!same) found.push(finding('claims-picture', { quality: seen?.quality ?? 'none' }))
  if (sound !== hookup.sound.sound) found.push(finding('claims-sound', { sound }))
  const effort = effortOf(bench, question)
  if (effort.boxes !== hookup.axes.boxes || effort.pieces !== hookup.axes.pieces) {
    found.push(finding('claims-effort', effort))
  }
  const doubt = doubtIn(bench, question)
  if (doubt === null) found.push(finding('socket-dead'))
  else if (doubt !== hookup.axes.doubt) found.push(finding('claims-doubt', { doubt }))
  return found
}

const isPowered = (d: DeviceModel): boolean =>
  d.mains !== undefined || d.pack !== undefined || d.functions.some((f) => f.power !== 'none')

function effortOf({ hookup, view }: Bench, question: Question): { boxes: number; pieces: number } {
  const aerial = hookup.legs.find((l) => l.purpose === 'aerial')?.stops[0]?.unit
  const between = allUnits(hookup)
    .filter((u) => u !== aerial)
    .filter((u) => u !== question.source.unit && u !== question.display.unit)
  const devices = between.flatMap((u) => view.device(u) ?? [])
  const copies = new Set(hookup.links.flatMap((l) => l.pieces.map((p) => `${p.model} ${p.copy}`)))
  return {
    boxes: devices.filter(isPowered).length,
    pieces: copies.size + devices.filter((d) => !isPowered(d)).length,
  }
}

/** What nobody has tried, or knows to come and go, on every socket and function that is used. */
function doubtIn(bench: Bench, question: Question): number | null {
  const { hookup, view } = bench
  const sockets = new Map<string, { unit: Uid; jack: Key; port: Key }>()
  const functions = new Map<string, { unit: Uid; fn: Key }>()
  const unknown = new Set<string>()
  const lean = (unit: Uid, jackKey: Key | null, only: ((port: Key) => boolean) | null): void => {
    const jack = jackKey === null ? null : view.jack(unit, jackKey)
    for (const contact of jack?.contacts ?? []) {
      if (only && !only(contact.port)) continue
      sockets.set(`${unit} ${jackKey} ${contact.port}`, {
        unit,
        jack: jackKey!,
        port: contact.port,
      })
      if (
        view.device(unit)?.chassis !== 'isolated' &&
        view.port(unit, contact.port)?.isolated === 'unknown'
      ) {
        unknown.add(`chassis ${unit}`)
      }
    }
  }
  for (const leg of hookup.legs) {
    for (const stop of leg.stops) {
      functions.set(`${stop.unit} ${stop.function}`, { unit: stop.unit, fn: stop.function })
      const touched = (side: 'from' | 'to') => (port: Key) =>
        hookup.links.some(
          (l) =>
            l[side].unit === stop.unit &&
            l[side].port === port &&
            l.circuits.some((c) => isSoundCircuit(c.from)),
        )
      lean(stop.unit, stop.in, leg.purpose === 'sound' ? touched('to') : null)
      lean(stop.unit, stop.out, leg.purpose === 'sound' ? touched('from') : null)
      if (leg.purpose === 'picture' && question.material.protection === 'hdcp') {
        const jack = stop.in === null ? null : view.jack(stop.unit, stop.in)
        const digital = jack?.form === 'hdmi' || jack?.form === 'dvi'
        if (digital && view.fn(stop.unit, stop.function)?.hdcp === undefined)
          unknown.add(`hdcp ${stop.unit}`)
      }
    }
  }
  const states = [
    ...[...sockets.values()].map((s) => ({
      unit: s.unit,
      state: formState(view.unit(s.unit)!, s.jack, s.port),
    })),
    ...[...functions.values()].map((f) => ({
      unit: f.unit,
      state: functionState(view.unit(f.unit)!, f.fn),
    })),
  ]
  let sum = unknown.size + dcUnknown(bench)
  for (const { unit, state } of states) {
    const doubt = doubtOf(view.unit(unit)!, state)
    if (doubt === null) return null
    sum += doubt
  }
  return sum
}

/** Joins by which a voltage comes up a cable to an input of which nobody knows whether it stands it. */
function dcUnknown({ hookup, view }: Bench): number {
  const pairs = new Set<string>()
  for (const l of hookup.links) {
    const from = view.port(l.from.unit, l.from.port)
    const to = view.port(l.to.unit, l.to.port)
    const blocked = l.pieces.some((p) => view.piece(p.model)?.blocksDc)
    const unknown = to?.standsDc === undefined || to.standsDc === 'unknown'
    if (
      (from?.suppliesDcVolts ?? 0) !== 0 &&
      !blocked &&
      unknown &&
      to?.needsDcVolts === undefined
    ) {
      pairs.add(`${l.from.unit} ${l.to.unit}`)
    }
  }
  return pairs.size
}
