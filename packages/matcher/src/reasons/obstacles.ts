import { portOf, type PieceModel, type Plug } from '@coaxwain/models'
import type { Obstacle } from '@coaxwain/shelf'
import { familyOf, fits, isSingle, mates, type Connector } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Way } from '../compile/way'
import { PICTURE, type Join, type JoinTable } from '../join/join'
import type { Expander } from '../search/expand'
import type { Label } from '../search/label'
import type { MovesFrom } from '../search/states'
import { breaksAt, gunBreaks, obstacle, type Ends } from './breaks'

export interface ReasonTools {
  readonly joins: JoinTable
  readonly expander: Expander
  readonly moves: MovesFrom
  /** Ways through boxes. */
  readonly boxes: readonly Way[]
  readonly lightGun: boolean
  /** Some answer works in full, so that second-best ways need no explaining. */
  readonly whole: boolean
  /** An answer joins these two: a rate that is too fast there is a matter of settings. */
  readonly joined: (out: Face, into: Face) => boolean
  /** Powered boxes and pieces of the easiest answer; null when there is none. */
  readonly best: { readonly boxes: number; readonly pieces: number } | null
}

/** At most so many reasons are given, nearest first. */
const MOST_REASONS = 6
/** Beside an answer, what looks easier and is not. */
const MOST_BESIDE = 3
/** A way that is not taken may break so many rules and still be worth a word. */
const MOST_BROKEN = 2

interface Attempt {
  readonly broken: readonly Obstacle[]
  readonly boxes: number
  readonly pieces: number
}

const endsOf = (from: Way, to: Way): Ends => ({
  from: from.variant.device.name,
  to: to.variant.device.name,
})

/**
 * What stands in the way: every wiring of no box or one that breaks at most two rules. With an answer at hand
 * only those are worth a word that look easier than it; harmful ones come first in any case.
 */
export function obstaclesBetween(
  starts: readonly Label[],
  ends: readonly Way[],
  tools: ReasonTools,
): Obstacle[] {
  const pictures = onePerPicture(starts)
  const boxes = onePerWay(leadingOn(tools, ends))
  const passive = tools.whole ? [] : onePerWay(tools.boxes.filter((b) => b.fn.power === 'none'))
  const tried = pictures.flatMap((label) => [
    ...ends.map((end) => attempt(label, end, tools)),
    ...throughEach(label, boxes, ends, tools),
    ...passive.flatMap((box) => turnedRound(label, box, ends, tools)),
  ])
  const broken = tried.filter(
    (a): a is Attempt => a !== null && a.broken.length > 0 && rulesOf(a).length <= MOST_BROKEN,
  )
  if (tools.best) return beside(broken, tools.best)
  const gun = tools.lightGun ? gunSeesNothing(pictures, ends) : []
  if (broken.length === 0)
    return distinct([...gun, ...pictures.flatMap((l) => ends.flatMap((e) => apart(l, e)))])
  const nearest = [...broken].sort(
    (a, b) => a.broken.length - b.broken.length || a.boxes - b.boxes || a.pieces - b.pieces,
  )
  const found = harmFirst([...gun, ...nearest.flatMap((a) => a.broken)])
  return distinct(found).slice(0, MOST_REASONS)
}

/** Without an answer a light gun has none either: whatever brings the picture here draws it anew. */
const gunSeesNothing = (pictures: readonly Label[], ends: readonly Way[]): Obstacle[] => {
  const [label] = pictures
  const [end] = ends
  return label && end ? [obstacle('light-gun', { ...endsOf(label.way, end) })] : []
}

/** What looks easier than the answer and is not. */
function beside(broken: readonly Attempt[], best: NonNullable<ReasonTools['best']>): Obstacle[] {
  const found = broken
    .filter((a) => easier(a, best) && looksRight(a))
    .flatMap((a) => a.broken)
    .filter((o) => o.code !== 'no-lead')
    .map((o) => ({ ...o, lookalike: true }))
  return distinct(harmFirst(found), true).slice(0, MOST_BESIDE)
}

const harmFirst = (all: readonly Obstacle[]): Obstacle[] => [
  ...all.filter((o) => o.harmful),
  ...all.filter((o) => !o.harmful),
]

/** What becomes of the sound is no reason, so that each picture of each socket is tried once. */
const onePerPicture = (starts: readonly Label[]): Label[] => [
  ...new Map(starts.map((l) => [`${l.way.out?.jack} ${l.sig.core.id}`, l])).values(),
]

/** Each picture through each box once. */
const onePerWay = (ways: readonly Way[]): Way[] => [
  ...new Map(ways.map((w) => [`${w.variant.id} ${w.fn.key} ${w.in} ${w.out?.jack}`, w])).values(),
]

/** Boxes of which something plugs into the display, and that are not more effort than the answer. */
function leadingOn({ boxes, joins, best }: ReasonTools, ends: readonly Way[]): Way[] {
  const known = new Map<Face, boolean>()
  const plugs = (out: Face): boolean =>
    ends.some(
      ({ into }) =>
        into !== null &&
        (joins.between(out, into.face, PICTURE).length > 0 ||
          wrongWiring(out, into.face) ||
          joins.wrongWires(out, into.face)),
    )
  return boxes.filter(({ from, variant }) => {
    if (!from || (best && best.boxes === 0 && variant.powered)) return false
    const leadsOn = known.get(from.face) ?? plugs(from.face)
    known.set(from.face, leadsOn)
    return leadsOn
  })
}

/** Nothing at hand can even be plugged together: the forms differ, and perhaps the rates as well. */
function apart(label: Label, end: Way): Obstacle[] {
  const ends = endsOf(label.way, end)
  const rates = ratesAt(end, label, ends)
  const forms = { from: label.sig.core.form, to: end.into?.face.form ?? '' }
  return [...rates, obstacle('no-common-form', { ...ends, fromForm: forms.from, toForm: forms.to })]
}

const RATES = ['line-rate', 'field-rate']

const ratesAt = (end: Way, label: Label, ends: Ends): Obstacle[] =>
  breaksAt(end, label.sig.core, ends).filter((o) => RATES.includes(o.code))

/** One rule stands in the way; a lead that is not at hand is no rule, nor the rate of a plug that is wrong anyhow. */
const looksRight = (a: Attempt): boolean => {
  const rules = rulesOf(a)
  const wrong = rules.some((o) => o.code === 'wrong-circuits')
  const left = rules.filter((o) => !wrong || !RATES.includes(o.code))
  return left.length === 1 && (rules.length === a.broken.length || a.boxes === 0)
}

const rulesOf = ({ broken }: Attempt): Obstacle[] => broken.filter((o) => o.code !== 'no-lead')

const easier = (a: Attempt, best: { boxes: number; pieces: number }): boolean =>
  a.boxes < best.boxes || (a.boxes === best.boxes && a.pieces <= best.pieces)

/** Each reason once for each unit in which it bites; beside an answer, each sort of reason once. */
function distinct(obstacles: readonly Obstacle[], bySort = false): Obstacle[] {
  const seen = new Set<string>()
  return obstacles.filter((o) => {
    const key = bySort ? o.code : `${o.code} ${o.details.to ?? ''}`
    return !seen.has(key) && seen.add(key)
  })
}

/** What breaks when one output goes into one input; null when nothing joins them and they have no form in common. */
function attempt(label: Label, way: Way, tools: ReasonTools): Attempt | null {
  const out = label.way.from?.face
  const into = way.into?.face
  if (!out || !into) return null
  const [join] = tools.joins.between(out, into, PICTURE)
  const isOther = !join && out.form !== into.form
  if (isOther && (takesBesides(way, out) || !misfits(out, into, tools))) return null
  const wrong = wrongPlug(label, way, join, tools)
  if (wrong) return { boxes: label.boxes, pieces: label.pieces, broken: wrong }
  const broken = [
    ...socketBreaks(way, endsOf(label.way, way)),
    ...leadBreaks(label, way, join, tools),
    ...endBreaks(way, endsOf(label.way, way), tools),
    ...signalBreaks(label, way, join, tools),
  ]
  return { boxes: label.boxes, pieces: label.pieces + (join?.pieces ?? 1), broken }
}

function leadBreaks(
  label: Label,
  way: Way,
  join: Join | undefined,
  tools: ReasonTools,
): Obstacle[] {
  if (join) return []
  const ends = endsOf(label.way, way)
  const { form } = label.way.from!.face
  if (way.into?.face.ports.some((p) => p.connector === 'whip'))
    return [obstacle('whip-only', { ...ends })]
  return tools.joins.drawer.owned.pieces.some(({ piece }) => isThin(piece, label.way, way))
    ? [obstacle('wires-missing', { ...ends, form: form ?? '' }, { lookalike: true })]
    : [obstacle('no-lead', { ...ends, form: form ?? '' })]
}

/** A lead of several wires that plugs into both, and has not those that are wanted. */
const isThin = ({ a, b }: PieceModel, { from }: Way, { into }: Way): boolean => {
  const meets = (plugs: readonly Plug[], face: Face | undefined): boolean =>
    plugs.some(
      ({ connector }) =>
        !isSingle(connector) && face?.ports.some((p) => mates(connector, p.connector)),
    )
  return (
    (meets(a, from?.face) && meets(b, into?.face)) || (meets(b, from?.face) && meets(a, into?.face))
  )
}

/** The same socket takes this form as well, so that nothing is wrong with the plug. */
const takesBesides = ({ variant, into }: Way, out: Face): boolean =>
  variant.device.jacks.some(
    (j) =>
      j.dir === 'in' &&
      j.form === out.form &&
      j.contacts.some((c) => into?.ports.includes(c.port) === true),
  )

const misfits = (out: Face, into: Face, tools: ReasonTools): boolean =>
  wrongWiring(out, into) || wrongWires(out, into, tools)

/** Wires that somebody might lay because the plugs fit: straight, or by a lead with the same plug at each end. */
const wrongWires = (out: Face, into: Face, { joins, best }: ReasonTools): boolean =>
  joins.wrongWires(out, into) ||
  (best === null &&
    out.ports.some(({ connector }) => {
      const family = familyOf(connector)
      return (
        !isSingle(connector) &&
        into.ports.some((b) => familyOf(b.connector) === family) &&
        joins.drawer.owned.pieces.some(({ piece }) =>
          [piece.a, piece.b].every((end) => end.length === 1 && isOf(end[0]?.connector, family)),
        )
      )
    }))

const isOf = (connector: Connector | undefined, family: string): boolean =>
  connector !== undefined && familyOf(connector) === family

/** What a plug that goes in and is wired differently inside does; null where there is none. */
function wrongPlug(
  label: Label,
  way: Way,
  join: Join | undefined,
  tools: ReasonTools,
): Obstacle[] | null {
  const out = label.way.from!.face
  const into = way.into!.face
  const ends = endsOf(label.way, way)
  if (wrongWiring(out, into))
    return [obstacle('japanese-21-pin', { ...ends }, { harmful: true, lookalike: true })]
  if (join || out.form === into.form || !wrongWires(out, into, tools)) return null
  const forms = { fromForm: out.form ?? '', toForm: into.form ?? '' }
  const wrong = obstacle('wrong-circuits', { ...ends, ...forms }, { lookalike: true })
  return [wrong, ...ratesAt(way, label, ends)]
}

/** A line that nothing at hand ends. */
function endBreaks({ terminate, variant }: Way, ends: Ends, { joins }: ReasonTools): Obstacle[] {
  return terminate
    .map((key) => portOf(variant.device, key))
    .filter((port) => joins.drawer.terminatorFor(port.connector) === null)
    .map((port) => obstacle('line-not-ended', { ...ends, port: port.label }))
}

/** A socket that is dead, or that would harm somebody. */
function socketBreaks({ dead, harm }: Way, ends: Ends): Obstacle[] {
  return [
    ...(dead ? [obstacle('socket-dead', { ...ends, port: dead.label })] : []),
    ...(harm ? [obstacle('added-socket', { ...ends, port: harm.label }, { harmful: true })] : []),
  ]
}

function signalBreaks(
  label: Label,
  way: Way,
  join: Join | undefined,
  tools: ReasonTools,
): Obstacle[] {
  const ends = endsOf(label.way, way)
  const gun = tools.lightGun && way.fn.kind === 'shows' ? gunBreaks(way.variant.device, ends) : []
  if (join?.picture === 'luma-only')
    return [
      obstacle('luma-only', { ...ends }, { lookalike: true }),
      ...ratesAt(way, label, ends),
      ...gun,
    ]
  const joined = tools.joined(label.way.from!.face, way.into!.face)
  const breaks = breaksAt(way, label.sig.core, ends, voltsBetween(label, way, tools))
  return [...breaks.filter((o) => !joined || !RATES.includes(o.code)), ...gun]
}

/** Switching voltages that arrive whichever lead is taken; without a lead at hand those that are given. */
function voltsBetween({ way: { from } }: Label, { into }: Way, { joins }: ReasonTools) {
  const [first, ...others] = joins.between(from!.face, into!.face, PICTURE)
  if (!first) return from!.face.volts
  return first.volts.filter((v) => others.every((o) => o.volts.includes(v)))
}

/** A plug that goes in and is wired differently inside. */
const wrongWiring = (out: Face, into: Face): boolean =>
  out.ports.some((a) =>
    into.ports.some((b) => fits(a.connector, b.connector) && !mates(a.connector, b.connector)),
  )

/** Another way through the same box goes in where this one comes out, as through a splitter. */
const worksBothWays = ({ variant, from }: Way, boxes: readonly Way[]): boolean =>
  boxes.some(
    (w) => w.variant === variant && w.into?.ports.some((p) => from?.ports.includes(p)) === true,
  )

/** A passive box that is made for the other direction. */
function turnedRound(
  label: Label,
  box: Way,
  ends: readonly Way[],
  tools: ReasonTools,
): (Attempt | null)[] {
  if (!label.way.from || !box.from || !box.into || worksBothWays(box, tools.boxes)) return []
  const { from, into } = box
  if (tools.joins.between(label.way.from.face, from.face, PICTURE).length === 0) return []
  return ends.map((end) => {
    if (!end.into || tools.joins.between(into.face, end.into.face, PICTURE).length === 0)
      return null
    const details = { ...endsOf(label.way, end), to: box.variant.device.name }
    const grey = into.face.form === 's-video' && label.sig.core.form === 'composite'
    return {
      boxes: label.boxes,
      pieces: label.pieces + 1,
      broken: [
        obstacle('one-way', details, { lookalike: true }),
        ...(grey
          ? [obstacle('luma-only', { ...endsOf(label.way, end) }, { lookalike: true })]
          : []),
      ],
    }
  })
}

/** Into each box, breaking a rule there or not, and out of it into the display. */
function throughEach(
  label: Label,
  boxes: readonly Way[],
  ends: readonly Way[],
  tools: ReasonTools,
): (Attempt | null)[] {
  const { expander, moves } = tools
  const into = new Map<Way, Label[]>()
  const passed = (box: Way): readonly Label[] => {
    if (into.size === 0)
      for (const move of moves(label.way.from!.face, label.sig.core)) {
        const made = expander
          .entries(label, move)
          .flatMap((entry) => expander.leave(label, move, entry))
        into.set(move.way, [...(into.get(move.way) ?? []), ...made])
      }
    return into.get(box) ?? []
  }
  return boxes.flatMap((box) => {
    const first = attempt(label, box, tools)
    if (!first || rulesOf(first).length > MOST_BROKEN) return []
    if (first.broken.length === 0)
      return passed(box).flatMap((l) => ends.map((end) => attempt(l, end, tools)))
    // Whether the display would take what comes out cannot be known; that it fails here is the reason.
    const powered = box.variant.powered ? 1 : 0
    return [{ ...first, boxes: first.boxes + powered, pieces: first.pieces + 2 - powered }]
  })
}
