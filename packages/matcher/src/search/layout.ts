import type { Question, Uid } from '@coaxwain/shelf'
import { TIER, type Channel, type Quality } from '@coaxwain/signal'
import type { CompiledShelf, Offering, Present, Supply } from '../compile/shelf'
import type { Variant } from '../compile/variant'
import { isUsable, type Way } from '../compile/way'
import type { Drawer } from '../join/drawer'
import type { BestThereIs } from './finish'
import type { Label } from './label'
import { bestOf, startLabels } from './start'

/** What every answer to one question has in common. */
export interface Frame {
  readonly question: Question
  readonly source: Variant
  readonly display: Variant
  readonly drawer: Drawer
  /** What else is on the shelf. */
  readonly shelf: readonly Variant[]
  /** Boxes on the shelf whose own carrier is on whenever they are. */
  readonly idle: readonly { readonly variant: Variant; readonly channels: readonly Channel[] }[]
  readonly best: BestThereIs
}

/** One question laid out: where chains begin and end, and what may lie between. */
export interface Layout {
  readonly frame: Frame
  readonly starts: readonly Way[]
  readonly ends: readonly Way[]
  /** With those that would harm somebody or are dead, which are reasons. */
  readonly allEnds: readonly Way[]
  readonly present: Present
  readonly labels: readonly Label[]
  readonly speakers: readonly Way[]
  readonly supply: Supply
}

/** Ways of everything that is present. */
export const waysIn = (present: Present, pick: (offering: Offering) => readonly Way[]): Way[] =>
  [...present.rest, ...present.own].flatMap(pick)

/** Where the chains of a question begin and end, and what may lie between. */
export function layOut(
  shelf: CompiledShelf,
  question: Question,
  endOf: CompiledShelf['end'] = (uid) => shelf.end(uid),
): Layout {
  const source = endOf(question.source.unit)
  const display = endOf(question.display.unit)
  const leftOut = new Set<Uid>([...question.avoid, question.source.unit, question.display.unit])
  const present = shelf.present(leftOut)
  const starts = source.ways.filter((w) => w.fn.key === question.source.playing && isUsable(w))
  const allEnds = display.ways.filter(
    (w) =>
      w.fn.kind === 'shows' && w.in !== null && (question.display.input ?? w.fn.key) === w.fn.key,
  )
  const ends = allEnds.filter(isUsable)
  const speakers = waysIn(present, (o) => o.sounds).filter((w) => w.soundTo === null)
  const supply = shelf.supply(question)
  const played = bestOf(starts, question.material)
  const ownSpeakers = display.variant.device.display?.loudspeakers !== 'none'
  const frame: Frame = {
    question,
    shelf: [...present.rest, ...present.own].map((o) => o.variant),
    source: source.variant,
    display: display.variant,
    drawer: supply.drawer,
    idle: [...present.rest, ...present.own]
      .filter((o) => o.idle.length > 0)
      .map((o) => ({ variant: o.variant, channels: o.idle })),
    best: {
      source: played.quality,
      display: bestShown(ends),
      sound: played.sound && (ownSpeakers || speakers.length > 0),
    },
  }
  const labels = startLabels(starts, question.material, shelf.cores)
  return { frame, starts, ends, allEnds, present, labels, speakers, supply }
}

const bestShown = (ends: readonly Way[]): Quality =>
  ends.reduce<Quality>((best, way) => {
    const form = way.into?.face.form ?? 'none'
    return TIER[form] > TIER[best] ? form : best
  }, 'none')
