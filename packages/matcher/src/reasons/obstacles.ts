import type { Obstacle } from '@coaxwain/shelf'
import { fits, mates } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import type { Expander } from '../search/expand'
import type { Label } from '../search/label'
import { breaksAt, gunBreaks, obstacle, type Ends } from './breaks'

export interface ReasonTools {
  readonly joins: JoinTable
  readonly expander: Expander
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

const PICTURE = { picture: true, sound: false }

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
  const direct = starts.flatMap((label) => ends.map((end) => attempt(label, end, tools)))
  const throughBox = starts.flatMap((label) =>
    tools.boxes.flatMap((box) => throughOne(label, box, ends, tools)),
  )
  const backwards = tools.whole
    ? []
    : starts.flatMap((label) => tools.boxes.flatMap((box) => turnedRound(label, box, ends, tools)))
  const all = [...direct, ...throughBox, ...backwards].filter(
    (a): a is Attempt => a !== null && a.broken.length > 0 && rulesOf(a).length <= MOST_BROKEN,
  )
  const { best } = tools
  if (all.length === 0 && !best)
    return distinct(starts.flatMap((l) => ends.flatMap((e) => apart(l, e))))
  const worth = best
    ? all.filter((a) => easier(a, best) && looksRight(a))
    : all.sort(
        (a, b) => a.broken.length - b.broken.length || a.boxes - b.boxes || a.pieces - b.pieces,
      )
  const found = worth.flatMap((a) => a.broken).filter((o) => !best || o.code !== 'no-lead')
  const told = best ? found.map((o) => ({ ...o, lookalike: true })) : found
  const harmFirst = [...told.filter((o) => o.harmful), ...told.filter((o) => !o.harmful)]
  return distinct(harmFirst, best !== null).slice(0, best ? MOST_BESIDE : MOST_REASONS)
}

/** Nothing at hand can even be plugged together: the forms differ, and perhaps the rates as well. */
function apart(label: Label, end: Way): Obstacle[] {
  const ends = endsOf(label.way, end)
  const rates = ratesAt(end, label, ends)
  const forms = { from: label.sig.form, to: end.into?.face.form ?? '' }
  return [...rates, obstacle('no-common-form', { ...ends, fromForm: forms.from, toForm: forms.to })]
}

const RATES = ['line-rate', 'field-rate']

const ratesAt = (end: Way, label: Label, ends: Ends): Obstacle[] =>
  breaksAt(end, label.sig, ends).filter((o) => RATES.includes(o.code))

/** One rule stands in the way; a lead that is not at hand is no rule. */
const looksRight = (a: Attempt): boolean => {
  const rules = rulesOf(a)
  return rules.length === 1 && (rules.length === a.broken.length || a.boxes === 0)
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
  const ends = endsOf(label.way, way)
  const cost = { boxes: label.boxes, pieces: label.pieces }
  if (wrongWiring(out, into)) {
    const flags = { harmful: true, lookalike: true }
    return { ...cost, broken: [obstacle('japanese-21-pin', { ...ends }, flags)] }
  }
  const [join] = tools.joins.between(out, into, PICTURE)
  if (!join && out.form !== into.form) {
    if (!tools.joins.wrongWires(out, into)) return null
    const forms = { fromForm: out.form ?? '', toForm: into.form ?? '' }
    return {
      ...cost,
      broken: [
        obstacle('wrong-circuits', { ...ends, ...forms }, { lookalike: true }),
        ...ratesAt(way, label, ends),
      ],
    }
  }
  const noLead = join ? [] : [obstacle('no-lead', { ...ends, form: out.form ?? '' })]
  const grey =
    join?.picture === 'luma-only'
      ? [obstacle('luma-only', { ...ends }, { lookalike: true })]
      : breaksAt(way, label.sig, ends).filter(
          (o) => !RATES.includes(o.code) || !tools.joined(out, into),
        )
  const gun = tools.lightGun && way.fn.kind === 'shows' ? gunBreaks(way.variant.device, ends) : []
  const dead = way.dead ? [obstacle('socket-dead', { ...ends, port: way.dead.label })] : []
  const harm = way.harm
    ? [obstacle('added-socket', { ...ends, port: way.harm.label }, { harmful: true })]
    : []
  return {
    ...cost,
    pieces: cost.pieces + (join?.pieces ?? 1),
    broken: [...dead, ...harm, ...noLead, ...grey, ...gun],
  }
}

/** A plug that goes in and is wired differently inside. */
const wrongWiring = (out: Face, into: Face): boolean =>
  out.ports.some((a) =>
    into.ports.some((b) => fits(a.connector, b.connector) && !mates(a.connector, b.connector)),
  )

/** A passive box that is made for the other direction. */
function turnedRound(
  label: Label,
  box: Way,
  ends: readonly Way[],
  tools: ReasonTools,
): (Attempt | null)[] {
  if (box.fn.power !== 'none' || !label.way.from || !box.from || !box.into) return []
  const { from, into } = box
  if (tools.joins.between(label.way.from.face, from.face, PICTURE).length === 0) return []
  return ends.map((end) => {
    if (!end.into || tools.joins.between(into.face, end.into.face, PICTURE).length === 0)
      return null
    const details = { ...endsOf(label.way, end), to: box.variant.device.name }
    const grey = into.face.form === 's-video' && label.sig.form === 'composite'
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

/** Into a box, breaking a rule there or not, and out of it into the display. */
function throughOne(
  label: Label,
  box: Way,
  ends: readonly Way[],
  tools: ReasonTools,
): (Attempt | null)[] {
  const first = attempt(label, box, tools)
  if (!first || rulesOf(first).length > MOST_BROKEN) return []
  if (first.broken.length === 0) {
    const made: Label[] = []
    for (const entry of tools.expander.entries(label, box)) {
      tools.expander.leave(label, box, entry, (l) => made.push(l))
    }
    return made.flatMap((l) => ends.map((end) => attempt(l, end, tools)))
  }
  // Whether the display would take what comes out cannot be known; that it fails here is the reason.
  const leadsOn = ends.some(
    (end) =>
      box.from && end.into && tools.joins.between(box.from.face, end.into.face, PICTURE).length > 0,
  )
  const powered = box.variant.powered ? 1 : 0
  return leadsOn
    ? [{ ...first, boxes: first.boxes + powered, pieces: first.pieces + 2 - powered }]
    : []
}
