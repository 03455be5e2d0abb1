import { LIMITS } from '@coaxwain/shelf'
import { SOUND_RANK, TIER } from '@coaxwain/signal'
import { plus, type Cost, type Finished, type Label } from '../search/label'
import { bestScore } from '../search/measure'
import { Outlooks, type Outlook } from '../search/outlook'
import { Queue } from '../search/queue'
import { soundStillThere, type SearchSpace } from '../search/search'

/** Whether a chain that may become so good at so much cost is still worth knowing. */
export type IsWorthwhile = (picture: number, sound: number, cost: Cost) => boolean

/**
 * Every chain from a source to a display, those with the fewest boxes and pieces first, one by one; null for a
 * step without one. Unlike the search for one answer it keeps what another chain beats: beside a second
 * chain it may be the better one.
 */
export function* allChains(
  space: Omit<SearchSpace, 'budget'>,
  isWorthwhile: IsWorthwhile,
): Generator<Finished | null, undefined> {
  const outlooks = new Outlooks(space.starts, space)
  for (const _ of outlooks.explore()) yield null
  const queue = new Queue<Label>()
  const put = (label: Label): void => {
    const ahead = outlooks.at(label.way.from!.face, label.sig.core)
    if (!ahead || label.depth + ahead.units > LIMITS.boxesInUse) return
    if (wanted(label, ahead, isWorthwhile))
      queue.put(label, label.boxes + ahead.boxes, label.pieces + ahead.pieces)
  }
  space.starts.forEach(put)
  for (let label = queue.take(); label; label = queue.take()) {
    const { face } = label.way.from!
    const { core } = label.sig
    for (const move of space.ends(face, core))
      yield* space.finisher.finish(label, move, isWorthwhile)
    const further = label.depth < LIMITS.boxesInUse ? space.moves(face, core) : []
    for (const move of further) {
      for (const entry of space.expander.entries(label, move))
        space.expander.leave(label, move, entry).forEach(put)
    }
    yield null
  }
}

function wanted(label: Label, ahead: Outlook, isWorthwhile: IsWorthwhile): boolean {
  const { sig } = label
  const tier = Math.min(TIER[sig.poorest], ahead.tier)
  const mhz = Math.min(sig.lumaMhz, ahead.lumaMhz)
  const sound = Math.min(SOUND_RANK[soundStillThere(label)], ahead.sound)
  return isWorthwhile(bestScore(tier, mhz), sound, plus(label, ahead))
}
