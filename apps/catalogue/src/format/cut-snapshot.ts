import type { Hookup, Question, Snapshot, Uid } from '@coaxwain/shelf'

/** As much of a shelf as a hookup rests on: its units, its pieces, and the models of both. */
export function cutSnapshot(snapshot: Snapshot, hookup: Hookup, question: Question): Snapshot {
  const used = new Set<Uid>([
    question.source.unit,
    question.display.unit,
    ...hookup.legs.flatMap((leg) => leg.stops.map((stop) => stop.unit)),
    ...hookup.links.flatMap((link) => [link.from.unit, link.to.unit]),
  ])
  const pieces = new Set<Uid>([
    ...hookup.links.flatMap((link) => link.pieces.map((piece) => piece.model)),
    ...(hookup.ends ?? []).map((end) => end.model),
  ])
  const units = snapshot.units.filter((unit) => used.has(unit.uid) || pieces.has(unit.model))
  const kept = new Set<Uid>([...pieces, ...units.map((unit) => unit.model)])
  return {
    ...snapshot,
    units,
    models: Object.fromEntries(
      Object.entries(snapshot.models).filter(([model]) => kept.has(model)),
    ),
  }
}
