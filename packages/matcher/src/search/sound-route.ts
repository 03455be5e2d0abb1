import { SOUND_RANK, type Sound } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import { priceOf } from '../compile/variant'
import { leastDoubt, type Way } from '../compile/way'
import type { Forks, Shared } from '../join/fork'
import { SOUND, type Join, type JoinTable } from '../join/join'
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
export function scarceIn({ joins }: Pick<SoundRoute, 'joins'>): Map<number, number> {
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

/** A picture beside which a sound is led, and the way by which it is taken. */
export interface PictureLed {
  readonly join: Join
  readonly way: Way
}

/** What of the picture a sound could share pieces with. */
export interface Beside {
  /** The picture that leaves the unit where the sound waits. */
  readonly leaving: PictureLed | null
  /** The picture that comes into the unit where the sound goes. */
  readonly arriving: PictureLed | null
  /** They leave, or arrive, by one socket, and so on one plug. */
  readonly leavesWith: boolean
  readonly arrivesWith: boolean
}

const ALONE: Beside = { leaving: null, arriving: null, leavesWith: false, arrivesWith: false }

/** Finds how waiting sound gets to a sound input, straight or through one box that handles sound alone. */
export class SoundRoutes {
  private readonly known = new Map<string, readonly SoundRoute[]>()
  private readonly forks: Forks | null

  /** `forks`: leads that a sound may share with a picture on its way elsewhere. */
  constructor(
    private readonly joins: JoinTable,
    private readonly boxes: readonly Way[],
    forks: Forks | null,
  ) {
    this.forks = forks?.any === true ? forks : null
  }

  /** Whether a sound may wait in a socket by which the picture leaves. */
  part(out: Face): boolean {
    return this.forks?.part(out) === true
  }

  between(out: Face, sound: Sound, into: Face, beside: Beside): readonly SoundRoute[] {
    const key = this.keyOf(out, sound, into, beside)
    const known = this.known.get(key)
    if (known) return known
    // Between the same two units a straight route is a link of both, found already.
    const straight = isHere(beside) ? [] : this.straight(out, sound, into, beside)
    const made = pareto([...straight, ...this.throughBox(out, sound, into, beside)])
    this.known.set(key, made)
    return made
  }

  private keyOf(out: Face, sound: Sound, into: Face, beside: Beside): string {
    const { leaving, arriving, leavesWith, arrivesWith } = beside
    const ends = `${out.id} ${sound} ${into.id} ${isHere(beside)} ${leavesWith} ${arrivesWith}`
    if (!this.forks) return ends
    const led = [leaving, arriving].map((p) => p && `${p.join.id}${asksVolts(p.way)}`)
    return `${ends} ${led.join()}`
  }

  private straight(out: Face, sound: Sound, into: Face, beside: Beside): SoundRoute[] {
    return this.joinsFor(out, into, beside).map((join) => ({
      joins: [join],
      via: null,
      sound: met(sound, join.sound ?? 'mono'),
      boxes: 0,
      pieces: join.pieces,
      doubt: join.dcUnknown ? 1 : 0,
      bought: join.bought,
    }))
  }

  /** On leads of its own, or on those of the picture that leaves or arrives. */
  private joinsFor(out: Face, into: Face, beside: Beside): readonly Join[] {
    const { leaving, arriving, leavesWith, arrivesWith } = beside
    const own = leavesWith || arrivesWith ? [] : this.joins.between(out, into, SOUND)
    const shared = (led: PictureLed | null, at: Shared): Join[] =>
      led ? this.sharing(led, { out, into }, at, own[0]) : []
    return [
      ...own,
      ...(arrivesWith ? [] : shared(leaving, 'from')),
      ...(leavesWith ? [] : shared(arriving, 'to')),
    ]
  }

  private sharing(
    { join, way }: PictureLed,
    ends: { readonly out: Face; readonly into: Face },
    at: Shared,
    own: Join | undefined,
  ): Join[] {
    if (!this.forks) return []
    // What saves no piece is no better than leads of its own, unless those run short.
    const most = own && !this.joins.hasScarce ? join.pieces + own.pieces - 1 : Infinity
    const asks = asksVolts(way)
    return this.forks
      .along(join, { ...ends, shared: at, most, volts: asks ? join.volts : [] })
      .filter(({ along }) => !asks || along!.join.volts.join() === join.volts.join())
  }

  private throughBox(out: Face, sound: Sound, into: Face, beside: Beside): SoundRoute[] {
    const { leaving, arriving, leavesWith, arrivesWith } = beside
    return this.boxes.flatMap((way) => {
      if (!way.into || !way.from) return []
      const first = this.straight(out, sound, way.into.face, { ...ALONE, leaving, leavesWith })
      return first.flatMap((a) => {
        const inside = way.soundMono ? toMono(a.sound) : a.sound
        const rest = { ...ALONE, arriving, arrivesWith }
        return this.straight(way.from!.face, inside, into, rest)
          .filter((b) => !isHere(beside) || !sharesPicture(a) || !sharesPicture(b))
          .map((b) => ({
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

/** One picture leaves where the sound waits and arrives where it goes. */
const isHere = ({ leaving, arriving }: Beside): boolean =>
  leaving !== null && leaving.join === arriving?.join && leaving.way === arriving.way

const sharesPicture = ({ joins }: SoundRoute): boolean => joins.some((j) => j.along !== null)

/** Something depends on the voltages that come along with the picture. */
const asksVolts = ({ fn }: Way): boolean => fn.accepts.some((row) => row.volts !== undefined)
