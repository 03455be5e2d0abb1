import { SOUND_RANK, type Sound } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import { priceOf } from '../compile/variant'
import { leastDoubt, type Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import type { SoundMeeting } from '../join/wanted'
import type { SoundRoute } from './label'

/** What comes of a sound that meets an input so. A mono sound loses nothing by one wire. */
export function met(sound: Sound, meeting: SoundMeeting): Sound {
  if (sound !== 'stereo') return sound
  if (meeting === 'both') return 'stereo'
  return meeting === 'one' ? 'half' : 'mono'
}

export const toMono = (sound: Sound): Sound => (sound === 'stereo' ? 'mono' : sound)

const better = (a: SoundRoute, b: SoundRoute): boolean =>
  SOUND_RANK[a.sound] >= SOUND_RANK[b.sound] &&
  a.boxes <= b.boxes &&
  a.pieces <= b.pieces &&
  a.doubt <= b.doubt &&
  a.bought <= b.bought &&
  [...scarceIn(a)].every(([piece, n]) => n <= (scarceIn(b).get(piece) ?? 0))

/** Pieces of scarce sorts that a route takes. */
function scarceIn({ joins }: SoundRoute): Map<number, number> {
  const used = new Map<number, number>()
  for (const { scarce } of joins)
    for (const [piece, n] of scarce) used.set(piece, (used.get(piece) ?? 0) + n)
  return used
}

/** Keeps what no other route beats. */
function pareto(routes: readonly SoundRoute[]): SoundRoute[] {
  const kept: SoundRoute[] = []
  for (const route of routes) {
    if (kept.some((k) => better(k, route))) continue
    for (let i = kept.length - 1; i >= 0; i--)
      if (better(route, kept[i] as SoundRoute)) kept.splice(i, 1)
    kept.push(route)
  }
  return kept
}

/** Finds how waiting sound gets to a sound input, straight or through one box that handles sound alone. */
export class SoundRoutes {
  private readonly known = new Map<string, readonly SoundRoute[]>()

  constructor(
    private readonly joins: JoinTable,
    private readonly boxes: readonly Way[],
  ) {}

  between(out: Face, sound: Sound, into: Face): readonly SoundRoute[] {
    const key = `${out.id} ${sound} ${into.id}`
    const known = this.known.get(key)
    if (known) return known
    const made = pareto([...this.straight(out, sound, into), ...this.throughBox(out, sound, into)])
    this.known.set(key, made)
    return made
  }

  private straight(out: Face, sound: Sound, into: Face): SoundRoute[] {
    return this.joins.between(out, into, { picture: false, sound: true }).map((join) => ({
      joins: [join],
      via: null,
      sound: met(sound, join.sound ?? 'mono'),
      boxes: 0,
      pieces: join.pieces,
      doubt: join.dcUnknown ? 1 : 0,
      bought: join.bought,
    }))
  }

  private throughBox(out: Face, sound: Sound, into: Face): SoundRoute[] {
    return this.boxes.flatMap((way) => {
      if (!way.into || !way.from) return []
      const first = this.straight(out, sound, way.into.face)
      return first.flatMap((a) => {
        const inside = way.soundMono ? toMono(a.sound) : a.sound
        return this.straight(way.from!.face, inside, into).map((b) => ({
          joins: [...a.joins, ...b.joins],
          via: way,
          sound: b.sound,
          boxes: way.variant.powered ? 1 : 0,
          pieces: a.pieces + b.pieces + (way.variant.powered ? 0 : 1),
          doubt: a.doubt + b.doubt + leastDoubt(way),
          bought: a.bought + b.bought + priceOf(way.variant),
        }))
      })
    })
  }
}
