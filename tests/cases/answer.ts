import { partUid, type Parts } from '@coaxwain/matcher'
import type { Answer, Hookup, Link, Purchase } from '@coaxwain/shelf'
import { isSoundCircuit, type Circuit, type Quality } from '@coaxwain/signal'
import { sentence } from '@coaxwain/wording'
import type {
  CaseAnswer,
  CaseControl,
  CaseHop,
  CasePiece,
  CasePath,
  CasePort,
  CaseQuestion,
  CaseSetting,
  CaseUnit,
  CaseWarning,
  HookupAnswer,
} from './form'
import { pieceInCaseForm, unitInCaseForm } from './parts-form'
import { controlKey, DISPLAY, SOURCE } from './translate'

/** The product's answer in the words of the case form. */
export function toCaseAnswer(question: CaseQuestion, answer: Answer, parts: Parts): HookupAnswer {
  const [best] = answer.hookups
  const possible = verdictOf(best, answer.purchases)
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
    warnings: answer.obstacles.map((o) => warning(`obstacle.${o.code}`, o.details)),
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
 * Half of the sound counts as a yes where one adapter would bring the rest, and as a purchase where more is
 * missing: the form leaves that open.
 */
function verdictOf(
  best: Hookup | undefined,
  purchases: readonly Purchase[],
): HookupAnswer['possible'] {
  const [purchase] = purchases
  if (!best) return purchase ? 'with-purchase' : 'no'
  if (!isWhole(best)) return purchase ? 'with-purchase' : 'yes'
  const half = best.sound.sound === 'half'
  return half && purchase && purchase.parts.length > 1 ? 'with-purchase' : 'yes'
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

/** Several pieces of one sort are bought one by one, each under an id of its own. */
function boughtAnswer(question: CaseQuestion, purchase: Purchase, parts: Parts): CaseAnswer {
  const counts = new Map<string, number>()
  const missing = purchase.parts.flatMap((key) => {
    const item = itemOf(key, parts)
    if (!item) return []
    const nth = (counts.get(key) ?? 0) + 1
    counts.set(key, nth)
    const id = nth === 1 ? boughtId(key) : `${boughtId(key)}-${nth}`
    return [{ code: key, words: item.what, item: { ...item, id } }]
  })
  return {
    ...oneAnswer(withBought(question, purchase, parts), numbered(purchase.hookup)),
    missing,
  }
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
  'obstacle.no-handshake': 'W-HDCP',
  'obstacle.level-control': 'W-AGC',
  'obstacle.colour': 'W-COLOUR-LOST',
  'obstacle.sound-spacing': 'W-SOUND-OFFSET',
  'obstacle.luma-only': 'W-Y-ONLY',
  'obstacle.switching-voltage': 'W-SWITCHING-VOLTAGE',
  'obstacle.vision-polarity': 'W-VISION-POLARITY',
  'obstacle.not-a-channel': 'W-LOOKALIKE',
  'obstacle.light-gun': 'W-LIGHT-GUN',
}

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
  const seen = new Set<string>()
  return {
    paths: pathsOf(question, hookup),
    settings: hookup.settings.map((s) => settingOf(question, hookup, s)),
    quality: {
      picture: hookup.picture.colour ? 'colour' : 'monochrome',
      form: formName(hookup.picture.quality),
      sound: hookup.sound.sound === 'half' ? 'mono-one-channel-lost' : hookup.sound.sound,
    },
    missing: [],
    warnings: cautions
      .map((c) => warning(`caution.${c.code}`, c.details))
      .filter((w) => w.code === undefined || (!seen.has(w.code) && seen.add(w.code))),
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
  const control = unitOf(question, s.unit)?.settings?.find((c) => controlKey(c.name) === s.control)
  return {
    on: s.unit,
    set: control?.name ?? s.control,
    ...(control ? { class: control.class } : {}),
    to: positionOf(hookup, s, control),
  }
}

function positionOf(
  hookup: Hookup,
  s: Hookup['settings'][number],
  control: CaseControl | undefined,
): string {
  if (s.why === 'tunes-to') {
    const sender = senderTo(hookup, s)
    return sender === null ? s.position : `as ${sender}`
  }
  if (control?.class === 'trim') return s.position === 'by-eye' ? 'by eye' : s.position
  return s.why === 'picks-channel' ? caseChannel(control, s.position) : s.position
}

/** The unit that a tuner follows: one that is set to the same carrier, else the one before it. */
function senderTo(hookup: Hookup, s: Hookup['settings'][number]): string | null {
  const sender = hookup.settings.find(
    (o) => o.why === 'picks-channel' && o.visionMhz === s.visionMhz,
  )
  return sender?.unit ?? carrierFrom(hookup, s.unit)
}

/** Channel names of the product carry the letters of their plan where the case's own have none. */
const caseChannel = (control: CaseControl | undefined, name: string): string =>
  control?.choices?.includes(name)
    ? name
    : (control?.choices?.find((c) => name.endsWith(c)) ?? name)

/** The unit whose fixed carrier a tuner receives. */
function carrierFrom(hookup: Hookup, tuner: string): string | null {
  const stops = hookup.legs[0]?.stops ?? []
  const at = stops.findIndex((s) => s.unit === tuner)
  return stops[at - 1]?.unit ?? null
}

const unitOf = (question: CaseQuestion, id: string): CaseUnit | undefined =>
  id === SOURCE
    ? question.source
    : id === DISPLAY
      ? question.display
      : (question.shelf.find((s) => s.id === id) as CaseUnit | undefined)

// ---------------------------------------------------------------- paths

const CIRCUITS: Readonly<Record<string, readonly Circuit[]>> = {
  composite: ['cvbs'],
  's-video': ['y', 'c'],
  luma: ['y'],
  chroma: ['c'],
  'ypbpr-y': ['y'],
  'ypbpr-pb': ['pb'],
  'ypbpr-pr': ['pr'],
  'rgb-r': ['r'],
  'rgb-g': ['g'],
  'rgb-b': ['b'],
  'rgb-cs': ['r', 'g', 'b', 'csync'],
  'rgb-hv': ['r', 'g', 'b', 'hsync', 'vsync'],
  'rgb-sog': ['r', 'g', 'b'],
  sync: ['csync'],
  rgbi: ['ttl-r', 'ttl-g', 'ttl-b', 'ttl-i', 'hsync', 'vsync'],
  'mono-ttl': ['ttl-mono', 'hsync', 'vsync'],
  hdmi: ['tmds'],
  dvi: ['tmds'],
  rf: ['rf'],
}

const portOf = (question: CaseQuestion, unit: string, port: string): CasePort | undefined =>
  unitOf(question, unit)?.ports.find((p) => p.id === port)

/** The name of what a link carries: the signal of the giving port that covers its picture circuits. */
function pictureSignal(question: CaseQuestion, link: Link): string {
  const circuits = link.circuits.map((c) => c.from).filter((c) => !isSoundCircuit(c))
  const from = portOf(question, link.from.unit, link.from.port)?.signals ?? []
  const to = portOf(question, link.to.unit, link.to.port)?.signals ?? []
  const covers = from.filter((s) => circuits.every((c) => CIRCUITS[s]?.includes(c)))
  return covers.find((s) => to.includes(s)) ?? covers[0] ?? 'composite'
}

function hop(link: Link, signal: string): CaseHop {
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
  })
  const main = steps.map((links) => hop(links[0]!, pictureSignal(question, links[0]!)))
  const lanes = steps.flatMap((links, i) =>
    links.slice(1).map((link): CasePath => {
      const circuit = link.circuits[0]!.from
      const after = steps.slice(i + 1).map((next) => {
        const same = next.find((l) => l.circuits[0]!.from === circuit) ?? next[0]!
        return hop(same, pictureSignal(question, same))
      })
      return {
        purpose: `picture-${circuit}`,
        hops: [...main.slice(0, i), hop(link, pictureSignal(question, link)), ...after],
      }
    }),
  )
  return [
    { purpose: 'picture', hops: main },
    ...offAirPaths(hookup),
    ...lanes,
    ...soundPaths(
      hookup,
      main,
      picture.stops.map((s) => s.unit),
    ),
  ]
}

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
          .map((l) => hop(l, 'rf')),
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
    const own = hop(wire.link, wire.circuit)
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
