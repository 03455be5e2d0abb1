import type { DeviceModel } from '@coaxwain/models'
import type { SeenPicture } from '@coaxwain/shelf'
import { TIER, type Sound } from '@coaxwain/signal'
import { unitsIn, type Bench } from './bench'
import { finding, type Finding } from './finding'

/** A hookup claims just what is seen and heard, and the effort that it takes. */
export function checkClaims(bench: Bench, seen: SeenPicture | null, heard: Sound): Finding[] {
  const { picture, sound, axes } = bench.hookup
  const effort = effortOf(bench)
  return [
    ...(seen && sameTo(seen, picture)
      ? []
      : [finding('claims-picture', { quality: seen?.quality ?? 'none' })]),
    ...(heard === sound.sound ? [] : [finding('claims-sound', { sound: heard })]),
    ...(effort.boxes === axes.boxes && effort.pieces === axes.pieces
      ? []
      : [finding('claims-effort', effort)]),
  ]
}

/** What was asked for is what comes: colour, both sound channels, the input that was named. */
export function checkDemands(bench: Bench, seen: SeenPicture | null, heard: Sound): Finding[] {
  const { demands, display } = bench.question
  const shownBy = bench.hookup.legs.find((l) => l.purpose === 'picture')?.stops.at(-1)?.function
  const missed = [
    demands.colour === true && seen?.colour !== true ? 'colour' : null,
    demands.stereo === true && heard !== 'stereo' ? 'stereo' : null,
    display.input !== undefined && display.input !== shownBy ? 'input' : null,
  ]
  return missed.flatMap((demand) => (demand === null ? [] : [finding('demand-missed', { demand })]))
}

const inOrder = (p: SeenPicture): string => [...p.degradations].sort().join()

const sameTo = (seen: SeenPicture, claimed: SeenPicture): boolean =>
  seen.colour === claimed.colour &&
  TIER[seen.quality] === TIER[claimed.quality] &&
  Math.abs(seen.lumaMhz - claimed.lumaMhz) < 0.001 &&
  inOrder(seen) === inOrder(claimed)

const isPowered = (d: DeviceModel): boolean =>
  d.mains !== undefined || d.pack !== undefined || d.functions.some((f) => f.power !== 'none')

/** Boxes under power between source and display, and loose things: leads, adapters, boxes without power. */
function effortOf({ question, hookup, view }: Bench): { boxes: number; pieces: number } {
  const aerial = hookup.legs.find((l) => l.purpose === 'aerial')?.stops[0]?.unit
  const ends = [question.source.unit, question.display.unit, aerial]
  const devices = unitsIn(hookup)
    .filter((u) => !ends.includes(u))
    .flatMap((u) => view.device(u) ?? [])
  const pieces = [...hookup.links.flatMap((l) => l.pieces), ...(hookup.ends ?? [])]
  const copies = new Set(pieces.map((p) => `${p.model} ${p.copy}`))
  const boxes = devices.filter(isPowered).length
  return { boxes, pieces: copies.size + devices.length - boxes }
}
