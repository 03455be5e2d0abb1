import type { Hookup, Uid } from '@coaxwain/shelf'
import { worksFully } from '../search/finish'
import { cautionsOf } from './cautions/index'
import { makeLegs } from './legs'
import { LinkMaker, PieceStock } from './links'
import { settingsOf } from './settings'
import { placeAlone, placeStops, unitFor, type BuildInput } from './stops'

/** Puts a finished chain into the form that everybody reads: legs, links, settings, cautions. */
export function buildHookup(input: BuildInput): Hookup {
  const { found } = input.wiring
  const stops = placeStops(input)
  const made = new LinkMaker(input.pieces ?? new PieceStock(input.frame.drawer))
  const legs = makeLegs(input, stops, made)
  const draft: Omit<Hookup, 'cautions'> = {
    legs,
    links: made.links,
    ...(made.ends.length > 0 ? { ends: made.ends } : {}),
    settings: [...stops, ...placeAlone(input)].flatMap(settingsOf),
    picture: found.picture,
    sound: { sound: found.sound, from: speaker(input) },
    worksFully: worksFully(found, input.frame.best),
    axes: found.axes,
  }
  return { ...draft, cautions: cautionsOf({ hookup: draft, stops, input }) }
}

function speaker(input: BuildInput): Uid | null {
  const { found, alone } = input.wiring
  if (found.sound === 'none') return null
  const outside = found.speakers ? alone.at(-1) : undefined
  return outside ? unitFor(input, outside).uid : (input.frame.display.units[0]?.uid ?? null)
}
