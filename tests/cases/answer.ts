import { partUid, type Parts } from '@coaxwain/matcher'
import type { Answer, Hookup, Link, Purchase } from '@coaxwain/shelf'
import { isSoundCircuit, type Circuit, type Quality } from '@coaxwain/signal'
import { sentence } from '@coaxwain/wording'
import {
  isPiece,
  PICTURE_CIRCUITS,
  type CaseAnswer,
  type CaseHop,
  type CasePiece,
  type CasePath,
  type CasePort,
  type CaseQuestion,
  type CaseSetting,
  type CaseUnit,
  type CaseWarning,
  type HookupAnswer,
} from './form'
import { asUsed, pieceInCaseForm, unitInCaseForm } from './parts-form'
import { caseChannel, channelsOfPlan, controlKey, DISPLAY, SOURCE, THROUGH } from './translate'

/** The product's answer in the words of the case form. */
export function toCaseAnswer(question: CaseQuestion, answer: Answer, parts: Parts): HookupAnswer {
  const [best] = answer.hookups
  const possible = verdictOf(best, answer.purchases, parts)
  const answers = answersOf(question, answer, { possible, parts })
  return {
    id: question.id,
    possible,
    answers,
    ...(answers.length > 1
      ? { verdict: 'it comes first by what works fully, is tested, and looks best' }
      : {}),
    reasons: answer.obstacles.map((o) => ({
      code: WARNING_OF[`obstacle.${o.code}`] ?? o.code,
      words: say(`obstacle.${o.code}`, o.details),
      facts: [say(`obstacle.${o.code}`, o.details)],
    })),
    warnings: onceEach([
      ...answer.obstacles
        .filter((o) => !best || !saidOfSettings(best, o.code))
        .map((o) => warning(`obstacle.${o.code}`, o.details)),
      ...(possible === 'with-purchase' && best ? shortcomings(best) : []),
    ]).filter((w) => w.code !== undefined),
    claims: [],
  }
}

function answersOf(
  question: CaseQuestion,
  { hookups, purchases }: Answer,
  { possible, parts }: { possible: HookupAnswer['possible']; parts: Parts },
): CaseAnswer[] {
  const hasWhole = hookups[0] !== undefined && isWhole(hookups[0])
  switch (possible) {
    case 'no':
      return []
    case 'with-purchase':
      return purchases.map((p, i) => ({ ...boughtAnswer(question, p, parts), ...below(i) }))
    case 'yes':
      // Once something works in full, what is seen in grey only is no answer to the question.
      return hookups
        .filter((h) => !hasWhole || isWhole(h))
        .slice(0, 3)
        .map((h, i) => ({ ...oneAnswer(question, h), ...below(i) }))
  }
}

const below = (rank: number): Pick<CaseAnswer, 'below'> =>
  rank > 0 ? { below: 'it is second best by the order in which answers are ranked' } : {}

/**
 * Half of the sound counts as a yes where the rest is wanting for an adapter, and as a purchase where it is
 * wanting for a lead: the form leaves that open.
 */
function verdictOf(
  best: Hookup | undefined,
  purchases: readonly Purchase[],
  parts: Parts,
): HookupAnswer['possible'] {
  const [purchase] = purchases
  if (!best) return purchase ? 'with-purchase' : 'no'
  if (!isWhole(best)) return purchase ? 'with-purchase' : 'yes'
  const half = best.sound.sound === 'half'
  const buysLead = purchase?.parts.some((key) => {
    const part = parts[key]
    return part?.type === 'piece' && part.kind === 'lead'
  })
  return half && buysLead ? 'with-purchase' : 'yes'
}

/** Ids of parts as the answer names them. */
const boughtId = (key: string): string => `buy-${key}`

/** The question with the things bought on its shelf, so that their sockets and controls are known. */
function withBought(question: CaseQuestion, purchase: Purchase, parts: Parts): CaseQuestion {
  const items = [...new Set(purchase.parts)].flatMap((key) => itemOf(key, parts) ?? [])
  return { ...question, shelf: [...question.shelf, ...items] }
}

function itemOf(key: string, parts: Parts): CaseUnit | CasePiece | null {
  const model = parts[key]
  if (!model) return null
  return model.type === 'piece'
    ? pieceInCaseForm(boughtId(key), model)
    : unitInCaseForm(boughtId(key), model)
}

/**
 * Several pieces of one sort are bought one by one, each under an id of its own. A box is described by what it
 * is bought for.
 */
function boughtAnswer(question: CaseQuestion, purchase: Purchase, parts: Parts): CaseAnswer {
  const hookup = numbered(purchase.hookup)
  const answer = oneAnswer(withBought(question, purchase, parts), hookup)
  const counts = new Map<string, number>()
  const missing = purchase.parts.flatMap((key) => {
    const item = itemOf(key, parts)
    if (!item) return []
    const nth = (counts.get(key) ?? 0) + 1
    counts.set(key, nth)
    const id = nth === 1 ? boughtId(key) : `${boughtId(key)}-${nth}`
    const used = isPiece(item) ? item : asUsed(item, answer, picturesAt(question, hookup, id))
    return [{ code: key, words: item.what, item: { ...used, id } }]
  })
  const dropped = missing.flatMap(({ item }) => (isPiece(item) ? [] : [item]))
  return {
    ...answer,
    settings: answer.settings.filter((s) => {
      const item = dropped.find((d) => d.id === s.on)
      return !item || item.settings?.some((c) => c.name === s.set)
    }),
    missing,
  }
}

/** The picture that comes into a box and the one that leaves it, and all that the source may play. */
function picturesAt(question: CaseQuestion, hookup: Hookup, unit: string) {
  const stops = hookup.legs.find((l) => l.purpose === 'picture')?.stops ?? []
  const at = stops.findIndex((s) => s.unit === unit)
  const played = question.source.ports.flatMap((p) => (p.modes ?? []).map((m) => m.scan))
  return { arriving: stops[at - 1]?.picture ?? null, leaving: stops[at]?.picture ?? null, played }
}

/** Ids of parts in the words of the form, and copies of a bought piece after the first under ids of their own. */
function numbered(hookup: Hookup): Hookup {
  const renamed = JSON.parse(
    JSON.stringify(hookup).replaceAll(`"${partUid('')}`, `"${boughtId('')}`),
  ) as Hookup
  return {
    ...renamed,
    links: renamed.links.map((l) => ({
      ...l,
      pieces: l.pieces.map((p) =>
        p.model.startsWith(boughtId('')) && p.copy > 1
          ? { ...p, model: `${p.model}-${p.copy}` }
          : p,
      ),
    })),
  }
}

/** Colour where both have it, and sound where both have it. */
const isWhole = (h: Hookup): boolean =>
  !h.picture.degradations.includes('monochrome') &&
  h.picture.quality !== 'luma-only' &&
  !h.cautions.some((c) => c.code === 'silent')

/** A rate that another position would give is said with the positions of the answer. */
const saidOfSettings = (h: Hookup, obstacle: string): boolean =>
  obstacle === 'line-rate' &&
  h.cautions.some((c) => c.code === 'scan-too-fast' || c.code === 'other-lines')

/** What is lost where nothing is bought. */
const LOSSES = ['luma-only', 'colour-not-decoded', 'sound-half', 'squeezed']

const shortcomings = (h: Hookup): CaseWarning[] =>
  h.cautions
    .filter((c) => LOSSES.includes(c.code))
    .map((c) => warning(`caution.${c.code}`, c.details))

/** Of warnings with one code the first. */
function onceEach(warnings: readonly CaseWarning[]): CaseWarning[] {
  const seen = new Set<string>()
  return warnings.filter((w) => w.code === undefined || (!seen.has(w.code) && seen.add(w.code)))
}

const say = (code: string, details: Readonly<Record<string, string | number>>): string =>
  sentence(code, details, 'en-GB')

/** Cautions and reasons of the product by the codes of the form, where one fits. */
const WARNING_OF: Readonly<Record<string, string>> = {
  'caution.chassis-live': 'W-LIVE-CHASSIS',
  'caution.chassis-may-be-live': 'W-LIVE-CHASSIS',
  'caution.added-socket': 'W-LIVE-CHASSIS',
  'caution.check-chassis': 'W-LIVE-CHASSIS',
  'caution.check-dc': 'W-DC-ON-COAX',
  'caution.mains-differs': 'W-MAINS',
  'caution.recorder-input': 'W-AGC',
  'caution.handshake-unknown': 'W-HDCP',
  'caution.luma-only': 'W-Y-ONLY',
  'caution.colour-not-decoded': 'W-COLOUR-LOST',
  'caution.squeezed': 'W-ASPECT',
  'caution.sound-half': 'W-SOUND-HALF',
  'caution.sound-folded': 'W-SOUND-MONO',
  'caution.scan-too-fast': 'W-PROGRESSIVE',
  'caution.channel-on-air': 'W-COCHANNEL',
  'caution.channel-may-be-used': 'W-COCHANNEL',
  'caution.air-or-cable': 'W-CATV',
  'caution.moves-itself': 'W-AUTO-SWITCH',
  'caution.direction-switch': 'W-DIRECTION',
  'caution.both-plugs': 'W-SOUND-HALF',
  'caution.no-loudspeaker': 'W-NO-SOUND-PATH',
  'caution.sound-apart': 'W-NO-SOUND-PATH',
  'caution.wide-picture': 'W-ASPECT',
  'caution.few-lines': 'W-240P',
  'caution.delay': 'W-LAG',
  'caution.interlaced-only': 'W-240P',
  'caution.cross-colour': 'W-CROSSCOLOUR',
  'caution.sync-needed': 'W-SYNC',
  'caution.sixty-fields': 'W-NO-LOCK',
  'caution.white-buzz': 'W-BUZZ',
  'caution.one-load': 'W-LEVEL',
  'caution.handshake-needed': 'W-HDCP',
  'caution.channel-stays-free': 'W-COCHANNEL',
  'caution.neighbour-channel': 'W-ADJACENT',
  'caution.idle-carrier': 'W-COCHANNEL',
  'caution.idle-sideband': 'W-DSB',
  'caution.band-switch': 'W-BAND',
  'caution.aerial-to-box': 'W-ORDER',
  'caution.sound-carrier-socket': 'W-LOOKALIKE',
  'caution.shared-socket': 'W-LOOKALIKE',
  'caution.check-isolation': 'W-RADIATE',
  'caution.radiation-limit': 'W-RADIATE',
  'caution.level-lost': 'W-LEVEL-LOW',
  'caution.level-high': 'W-OVERLOAD',
  'caution.socket-dead': 'W-BROKEN-SOCKET',
  'caution.double-dead': 'W-BROKEN-SOCKET',
  'caution.matching-needed': 'W-IMPEDANCE',
  'caution.own-wiring': 'W-PINOUT',
  'caution.channel-socket': 'W-LOOKALIKE',
  'caution.digital-socket': 'W-LOOKALIKE',
  'caution.repeats-aerial': 'W-LOOKALIKE',
  'caution.other-socket': 'W-LOOKALIKE',
  'caution.tell-shape': 'W-ASPECT',
  'caution.dc-on-lead': 'W-DC-ON-COAX',
  'caution.dc-to-aerial': 'W-DC-ON-COAX',
  'caution.two-programmes': 'W-TWO-TRACKS',
  'caution.gun-needs-tube': 'W-LIGHT-GUN',
  'caution.splitter-radiates': 'W-RADIATE',
  'caution.channel-taken': 'W-COCHANNEL',
  'caution.in-fm-band': 'W-COCHANNEL',
  'caution.aerial-first': 'W-ORDER',
  'caution.box-waits': 'W-AUTO-SWITCH',
  'caution.standard-grey': 'W-COLOUR-LOST',
  'caution.standard-hiss': 'W-SOUND-OFFSET',
  'caution.standard-negative': 'W-VISION-POLARITY',
  'caution.sync-kind': 'W-SYNC',
  'caution.hum-loop': 'W-GROUND-LOOP',
  'caution.volts-by-lead': 'W-SWITCHING-VOLTAGE',
  'caution.other-lines': 'W-SCAN',
  'caution.other-fields': 'W-NO-LOCK',
  'caution.other-colour': 'W-COLOUR-LOST',
  'caution.turn-hold': 'W-NO-LOCK',
  'caution.set-level': 'W-LEVEL',
  'caution.sync-wire': 'W-SYNC',
  'caution.no-loudspeaker-here': 'W-NO-SOUND-PATH',
  'caution.last-ends-line': 'W-TERMINATE',
  'caution.line-open': 'W-TERMINATE',
  'obstacle.line-not-ended': 'W-TERMINATE',
  'caution.channel-below': 'W-DSB',
  'caution.choose-by-hand': 'W-SWITCHING-VOLTAGE',
  'caution.less-detail': 'W-DROPPED-RES',
  'obstacle.added-socket': 'W-LIVE-CHASSIS',
  'obstacle.japanese-21-pin': 'W-PINOUT',
  'obstacle.line-rate': 'W-SCAN',
  'obstacle.field-rate': 'W-NO-LOCK',
  'obstacle.digital-only': 'W-DIGITAL-TUNER',
  'obstacle.band': 'W-BAND',
  'obstacle.socket-dead': 'W-BROKEN-SOCKET',
  'obstacle.one-way': 'W-DIRECTION',
  'obstacle.wrong-circuits': 'W-PINOUT',
  'obstacle.wires-missing': 'W-PINOUT',
  'obstacle.no-handshake': 'W-HDCP',
  'obstacle.level-control': 'W-AGC',
  'obstacle.colour': 'W-COLOUR-LOST',
  'obstacle.sound-spacing': 'W-SOUND-OFFSET',
  'obstacle.luma-only': 'W-Y-ONLY',
  'obstacle.switching-voltage': 'W-SWITCHING-VOLTAGE',
  'obstacle.vision-polarity': 'W-VISION-POLARITY',
  'obstacle.not-a-channel': 'W-LOOKALIKE',
  'obstacle.light-gun': 'W-LIGHT-GUN',
  'obstacle.whip-only': 'W-RADIATE',
}

/** More warnings than these on one answer are as good as none. */
const MOST_WARNINGS = 6

/** Told on every screen, but no warning in the sense of the form. */
const UNSAID = [
  'never-to-aerial',
  'pack-centre-positive',
  'pack-centre-negative',
  'pack-ac',
  'pack-dc',
  'silent',
]

function warning(code: string, details: Readonly<Record<string, string | number>>): CaseWarning {
  const known = WARNING_OF[code]
  return { ...(known ? { code: known } : {}), words: say(code, details) }
}

function oneAnswer(question: CaseQuestion, hookup: Hookup): CaseAnswer {
  const cautions = hookup.cautions.filter((c) => !UNSAID.includes(c.code))
  return {
    paths: withTerminators(pathsOf(question, hookup), hookup),
    settings: hookup.settings.map((s) => settingOf(question, hookup, s)),
    quality: {
      picture: hookup.picture.colour ? 'colour' : 'monochrome',
      form: formName(hookup.picture.quality),
      sound: hookup.sound.sound === 'half' ? 'mono-one-channel-lost' : hookup.sound.sound,
    },
    missing: [],
    warnings: onceEach(cautions.map((c) => warning(`caution.${c.code}`, c.details))).slice(
      0,
      MOST_WARNINGS,
    ),
  }
}

function formName(quality: Quality): string {
  switch (quality) {
    case 'rgbs':
    case 'rgsb':
    case 'rgbhv':
      return 'rgb'
    case 'hdmi':
    case 'dvi':
      return 'digital'
    case 'ttl-mono':
      return 'rgbi'
    default:
      return quality
  }
}

// ---------------------------------------------------------------- settings

function settingOf(
  question: CaseQuestion,
  hookup: Hookup,
  s: Hookup['settings'][number],
): CaseSetting {
  const unit = unitOf(question, s.unit)
  const control = unit?.settings?.find((c) => controlKey(c.name) === s.control)
  return {
    on: s.unit,
    set: control?.name ?? s.control,
    ...(control ? { class: control.class } : {}),
    to: positionOf(hookup, s, unit),
  }
}

function positionOf(
  hookup: Hookup,
  s: Hookup['settings'][number],
  unit: CaseUnit | undefined,
): string {
  const control = unit?.settings?.find((c) => controlKey(c.name) === s.control)
  if (s.why === 'tunes-to') {
    const sender = senderTo(hookup, s)
    return sender === null ? caseName(plansOf(unit, s.control), s.position) : `as ${sender}`
  }
  if (s.why === 'picks-channel') return caseName(plansOf(unit, s.control), s.position)
  if (control?.class === 'trim') return s.position === 'by-eye' ? 'by eye' : s.position
  return s.position
}

/** The unit that a tuner follows: one that is set to the same carrier, else the one before it. */
function senderTo(hookup: Hookup, s: Hookup['settings'][number]): string | null {
  const sender = hookup.settings.find(
    (o) => o.why === 'picks-channel' && o.visionMhz === s.visionMhz,
  )
  return sender?.unit ?? carrierFrom(hookup, s.unit)
}

/** The plans in which a control of a unit counts its channels. */
const plansOf = (unit: CaseUnit | undefined, control: string): readonly string[] =>
  (unit?.ports ?? []).flatMap(({ rf, tuner }) => [
    ...(rf && rf.control === control ? [rf.plan] : []),
    ...(tuner && tuner.control === control ? tuner.plans : []),
  ])

/** Channel names of the product carry the letters of their plan where the case's own have none. */
function caseName(plans: readonly string[], name: string): string {
  const own = plans.flatMap((plan) =>
    channelsOfPlan(plan).filter((c) => caseChannel(plan, c.name).name === name),
  )
  return own[0]?.name ?? name
}

/** The unit whose fixed carrier a tuner receives: the last before it that makes a channel. */
function carrierFrom(hookup: Hookup, tuner: string): string | null {
  const stops = hookup.legs[0]?.stops ?? []
  const before = stops.slice(
    0,
    stops.findIndex((s) => s.unit === tuner),
  )
  const isMade = (at: number): boolean => {
    const arrives = before[at - 1]?.picture?.carrier
    const leaves = before[at]?.picture?.carrier
    return Boolean(leaves) && leaves?.visionMhz !== arrives?.visionMhz
  }
  return before.findLast((_, at) => isMade(at))?.unit ?? before.at(-1)?.unit ?? null
}

const unitOf = (question: CaseQuestion, id: string): CaseUnit | undefined =>
  id === SOURCE
    ? question.source
    : id === DISPLAY
      ? question.display
      : (question.shelf.find((s) => s.id === id) as CaseUnit | undefined)

// ---------------------------------------------------------------- paths

const portOf = (question: CaseQuestion, unit: string, port: string): CasePort | undefined =>
  unitOf(question, unit)?.ports.find((p) => p.id === port)

/** One connection in the words of the form: a link, and one of the signals that it carries. */
interface Lane {
  readonly link: Link
  readonly signal: string
}

/** What a link carries of a picture: one signal that both ports name and that covers all, else one for each wire. */
function lanesOf(question: CaseQuestion, link: Link): Lane[] {
  const circuits = link.circuits.map((c) => c.from).filter((c) => !isSoundCircuit(c))
  const from = portOf(question, link.from.unit, link.from.port)?.signals ?? []
  const to = portOf(question, link.to.unit, link.to.port)?.signals ?? []
  const covers = from.filter((s) => circuits.every((c) => PICTURE_CIRCUITS[s]?.includes(c)))
  const whole = covers.find((s) => to.includes(s))
  const parts = from.filter(
    (s) => to.includes(s) && circuits.some((c) => PICTURE_CIRCUITS[s]?.includes(c)),
  )
  const wires = from.filter((s) => circuits.some((c) => PICTURE_CIRCUITS[s]?.includes(c)))
  const named = [covers.slice(0, 1), wires].find((found) => found.length > 0)
  const signals = whole ? [whole] : parts.length > 0 ? parts : (named ?? ['composite'])
  return signals.map((signal) => ({ link, signal }))
}

function hop({ link, signal }: Lane): CaseHop {
  return {
    from: `${link.from.unit}:${link.from.port}`,
    by: link.pieces.map((p) => p.model),
    to: `${link.to.unit}:${link.to.port}`,
    signal,
  }
}

function pathsOf(question: CaseQuestion, hookup: Hookup): CasePath[] {
  const picture = hookup.legs.find((l) => l.purpose === 'picture')
  if (!picture) return []
  const steps = picture.stops.slice(1).map((stop, i) => {
    const from = picture.stops[i]!.unit
    return picture.links
      .map((l) => hookup.links[l]!)
      .filter((l) => l.from.unit === from && l.to.unit === stop.unit)
      .filter((l) => l.circuits.some((c) => !isSoundCircuit(c.from)))
      .flatMap((l) => lanesOf(question, l))
  })
  const main = steps.map((lanes) => hop(lanes[0]!))
  const beside = steps.flatMap((lanes, i) =>
    lanes.slice(1).map((lane): CasePath => {
      const after = steps
        .slice(i + 1)
        .map((next) => hop(next.find((l) => l.signal === lane.signal) ?? next[0]!))
      return {
        purpose: `picture-${lane.signal}`,
        hops: [...main.slice(0, i), hop(lane), ...after],
      }
    }),
  )
  return [
    { purpose: 'picture', hops: main },
    ...offAirPaths(hookup),
    ...beside,
    ...soundPaths(
      hookup,
      main,
      picture.stops.map((s) => s.unit),
    ),
  ]
}

/** Terminators that sit between a lead and an input come last in their connection. */
const withTerminators = (paths: readonly CasePath[], { ends }: Hookup): CasePath[] =>
  paths.map((path) => ({
    ...path,
    hops: path.hops.map((h) => ({
      ...h,
      by: [
        ...h.by,
        ...(ends ?? []).flatMap((e) => (`${e.unit}:${e.port}` === h.to + THROUGH ? e.model : [])),
      ],
    })),
  }))

/** From the aerial to where it is received. */
function offAirPaths(hookup: Hookup): CasePath[] {
  return hookup.legs
    .filter((l) => l.purpose === 'aerial')
    .map((leg) => ({
      purpose: 'off-air',
      hops: leg.stops.slice(1).flatMap((stop, i) =>
        leg.links
          .map((l) => hookup.links[l]!)
          .filter((l) => l.from.unit === leg.stops[i]!.unit && l.to.unit === stop.unit)
          .slice(0, 1)
          .map((link) => hop({ link, signal: 'rf' })),
      ),
    }))
}

const PURPOSES: Partial<Record<Circuit, string>> = {
  'audio-l': 'sound-left',
  'audio-r': 'sound-right',
  'audio-mono': 'sound',
}

/** Sound wire by wire: from the source, or from where it leaves the picture, to where it is heard or joins. */
function soundPaths(
  hookup: Hookup,
  main: readonly CaseHop[],
  stops: readonly string[],
): CasePath[] {
  const wires = hookup.links.flatMap((link) =>
    link.circuits.filter((c) => isSoundCircuit(c.from)).map((c) => ({ link, circuit: c.from })),
  )
  const goesOn = (unit: string) => wires.some((w) => w.link.from.unit === unit)
  const ends = wires.filter((w) => !goesOn(w.link.to.unit))
  const before = (wire: (typeof wires)[number]): CaseHop[] => {
    const own = hop({ link: wire.link, signal: wire.circuit })
    const fed = wires.filter((w) => w.link.to.unit === wire.link.from.unit)
    const same = fed.find((w) => w.circuit === wire.circuit) ?? fed[0]
    if (same) return [...before(same), own]
    const at = stops.indexOf(wire.link.from.unit)
    return [...main.slice(0, Math.max(0, at)), own]
  }
  return ends.map((wire): CasePath => {
    const ending = wire.link.to.unit
    const joins = ending !== DISPLAY && stops.includes(ending)
    return {
      purpose: PURPOSES[wire.circuit] ?? 'sound',
      hops: before(wire),
      ...(joins ? { joins: 'picture' } : {}),
    }
  })
}
