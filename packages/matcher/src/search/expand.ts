import { together, type Condition } from '@coaxwain/models'
import { SOUND_RANK, type Sound } from '@coaxwain/signal'
import { accept, type Taken } from '../compile/accept'
import { leave, type Leaving } from '../compile/leave'
import type { Sig, SigTable } from '../compile/sig'
import { priceOf } from '../compile/variant'
import type { SoundEnd, Way } from '../compile/way'
import type { Join, JoinTable } from '../join/join'
import { levelOf, type Aerials, type AerialUse } from './aerial'
import { leastApart } from './assign'
import { pathOf, type Label, type SoundRoute, type SoundState, type Step } from './label'
import { handshakeUnknown, stopsAt } from './protection'
import { met, toMono, type SoundRoutes } from './sound-route'

/** One way of getting from a label into a unit: what is plugged, what is taken, what sound came along. */
export interface Entry {
  readonly step: Step
  /** Sound left where it waits. */
  readonly left: SoundState
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  readonly bought: number
}

const isEnd = (place: Way['soundFrom']): place is SoundEnd => place !== null && place !== 'picture'

/** Sound shares its socket with the picture, so that one plug takes both or none. */
function shareSocket(way: Way, side: 'into' | 'from'): boolean {
  const face = way[side]?.face
  return face !== undefined && face.sound.some((s) => face.picture.some((p) => p.port === s.port))
}

export class Expander {
  private readonly takenBy = new Map<number, Map<number, readonly Taken[]>>()
  private readonly leavingBy = new Map<number, Map<number, readonly Leaving[]>>()

  constructor(
    private readonly joins: JoinTable,
    private readonly sounds: SoundRoutes,
    private readonly sigs: SigTable,
    private readonly scarceUnits: ReadonlySet<string>,
    private readonly aerials: Aerials | null,
  ) {}

  /** Every way of entering a unit from a label. */
  entries(label: Label, way: Way): Entry[] {
    if (!label.way.from || !way.into || stopsAt(way, label.sig.protection)) return []
    const pictures = this.joins.between(label.way.from.face, way.into.face, PICTURE)
    if (pictures.every((join) => this.taken(way, label.sig, join).length === 0)) return []
    const unknown = handshakeUnknown(way, label.sig.protection) ? 1 : 0
    return this.meetings(label, way).flatMap(({ join, route, sound, left }) =>
      this.taken(way, label.sig, join).map((taken): Entry => {
        const heard = way.soundFrom === 'picture' && !taken.heard ? 'none' : sound
        return {
          step: { join, taken, soundRoute: route, soundIn: heard },
          left,
          boxes: route?.boxes ?? 0,
          pieces: join.pieces + (route?.pieces ?? 0),
          doubt: unknown + (join.dcUnknown ? 1 : 0) + (route?.doubt ?? 0),
          bought: join.bought + (route?.bought ?? 0),
        }
      }),
    )
  }

  private meetings(
    label: Label,
    way: Way,
  ): { join: Join; route: SoundRoute | null; sound: Sound; left: SoundState }[] {
    const out = label.way.from!.face
    const into = way.into!.face
    const waits = label.sound.kind === 'waits' ? label.sound : null
    if (!isEnd(way.soundFrom)) {
      if (way.soundFrom === 'picture' && label.sig.sound === 'none') return []
      const left = waits && this.mayStay(label) ? waits : NONE
      return this.joins
        .between(out, into, PICTURE)
        .map((join) => ({ join, route: null, sound: label.sig.sound, left }))
    }
    if (!waits) return []
    const together =
      waits.at === label
        ? this.joins.between(out, into, { picture: true, sound: true }).map((join) => ({
            join,
            route: null,
            sound: met(waits.sound, join.sound ?? 'mono'),
            left: NONE,
          }))
        : []
    return [...together, ...this.apart(label, way, waits)]
  }

  /** Picture and sound by links of their own. */
  private apart(label: Label, way: Way, waits: Extract<SoundState, { kind: 'waits' }>) {
    const out = label.way.from!.face
    const into = way.into!.face
    const from = waits.at.way
    if (shareSocket(way, 'into') || (waits.at === label && shareSocket(from, 'from'))) return []
    const routes = this.sounds.between(from.from!.face, waits.sound, into)
    // Between the same two units a straight route is a link of both, found already.
    const own = waits.at === label ? routes.filter((r) => r.via !== null) : routes
    if (own.length === 0) return []
    const pictures = this.joins.between(out, into, PICTURE)
    return pictures.flatMap((join) =>
      own.map((route) => ({ join, route, sound: route.sound, left: NONE })),
    )
  }

  /** Sound may be left behind only where the picture's plug does not take its socket. */
  private mayStay(label: Label): boolean {
    return (
      label.sound.kind === 'waits' && (label.sound.at !== label || !shareSocket(label.way, 'from'))
    )
  }

  private taken(way: Way, sig: Sig, join: Join): readonly Taken[] {
    const lumaOnly = join.picture === 'luma-only'
    const volts =
      (join.volts.includes('av-select') ? 2 : 0) + (join.volts.includes('rgb-select') ? 4 : 0)
    return remember(this.takenBy, way.takeId, sig.id * 8 + volts + (lumaOnly ? 1 : 0), () =>
      accept(
        way.variant.device,
        way.fn,
        way.in ?? '',
        { sig, lumaOnly, volts: join.volts },
        (from, carrier) => this.sigs.intern({ ...from, carrier }),
      ),
    )
  }

  /** The labels that leave a unit by a way, after an entry. */
  leave(label: Label, way: Way, entry: Entry, add: (made: Label) => void): void {
    if (!way.out) return
    const { taken, join, soundIn } = entry.step
    const inside = way.soundMono ? toMono(soundIn) : soundIn
    const lumaOnly = join.picture === 'luma-only'
    const unitDoubt = this.unitDoubt(label, way)
    if (unitDoubt === null) return
    const riding: Sound = way.soundTo === 'picture' ? inside : 'none'
    for (const leaving of this.leaving(way, taken, lumaOnly, riding)) {
      const stand = settle(way, taken.stand, leaving.stand)
      if (!stand) continue
      const made: Omit<Label, 'sound'> & { sound: SoundState } = {
        way,
        sig: leaving.sig,
        stand,
        sound: entry.left,
        aerial: label.aerial,
        depth: label.depth + 1,
        prev: label,
        step: entry.step,
        boxes: label.boxes + entry.boxes + (way.variant.powered ? 1 : 0),
        pieces: label.pieces + entry.pieces + (way.variant.powered ? 0 : 1),
        doubt: label.doubt + entry.doubt + unitDoubt,
        bought: label.bought + entry.bought + priceOf(way.variant),
      }
      if (isEnd(way.soundTo)) {
        if (inside === 'none') continue
        made.sound = { kind: 'waits', sound: inside, at: made }
      } else if (way.soundTo === 'picture' && leaving.sig.sound === 'none') {
        continue
      }
      if (made.aerial && !this.passesOn(way)) continue
      for (const variant of this.withAerial(label, made)) add(variant)
    }
  }

  /** A label as it is, and once for each way in which an aerial can join at its last unit. */
  withAerial(before: Label | null, made: Label): Label[] {
    if (!this.aerials || made.aerial) return [made]
    const uses = [...this.aerials.atBox(before, made.way), ...this.atOwnTuner(made)]
    return [made, ...uses.flatMap((use) => this.joined(made, use))]
  }

  private atOwnTuner(made: Label): AerialUse[] {
    const taken = [...(made.way.into?.ports ?? []), ...(made.way.from?.ports ?? [])]
    return this.aerials?.atTuner(made.way, taken) ?? []
  }

  private joined(made: Label, use: AerialUse): Label[] {
    const sig = use.together
      ? this.aerials!.narrowed(made.sig, this.sigs, levelOf(made) ?? 0)
      : made.sig
    if (!sig) return []
    const copy: Omit<Label, 'sound'> & { sound: SoundState } = {
      ...made,
      sig,
      aerial: use,
      boxes: made.boxes + use.boxes,
      pieces: made.pieces + use.pieces,
      doubt: made.doubt + use.doubt,
      bought: made.bought + use.bought,
    }
    if (copy.sound.kind === 'waits' && copy.sound.at === made)
      copy.sound = { ...copy.sound, at: copy }
    return [copy]
  }

  /** An aerial that has joined before goes on to the next unit, or is received there. */
  private passesOn(way: Way): boolean {
    if (way.fn.tunedBy !== undefined) return this.aerials?.canWatch(way.fn) ?? false
    const { device } = way.variant
    return device.functions.some(
      (fn) =>
        fn.tunedBy === undefined &&
        way.in !== null &&
        [...fn.needs, ...(fn.oneOf ?? [])].includes(way.in) &&
        fn.gives.some((g) => g.jack === way.out?.jack && g.rf === undefined),
    )
  }

  /** Doubt that one more unit adds; exact where a chain may want more of a sort than there are. */
  private unitDoubt(label: Label, way: Way): number | null {
    if (!this.scarceUnits.has(way.variant.id)) return way.offers[0]?.doubt ?? 0
    const before = pathOf(label)
      .slice(1)
      .map((l) => l.way)
      .filter((w) => w.variant === way.variant)
    const after = leastApart([...before, way])
    return after && after.doubt - (leastApart(before)?.doubt ?? 0)
  }

  private leaving(way: Way, taken: Taken, lumaOnly: boolean, sound: Sound): readonly Leaving[] {
    const flags = (taken.colour ? 1 : 0) + (lumaOnly ? 2 : 0) + 4 * SOUND_RANK[sound]
    return remember(this.leavingBy, way.id, taken.sig.id * 16 + flags, () =>
      leave(
        way.variant.device,
        way.fn,
        way.out!,
        { sig: taken.sig, colour: taken.colour, lumaOnly, sound },
        this.sigs,
      ),
    )
  }
}

/** What is worked out once per pair of numbers. */
function remember<T>(
  table: Map<number, Map<number, T>>,
  first: number,
  second: number,
  make: () => T,
): T {
  let row = table.get(first)
  if (!row) table.set(first, (row = new Map<number, T>()))
  const known = row.get(second)
  if (known !== undefined) return known
  const made = make()
  row.set(second, made)
  return made
}

const NONE: SoundState = { kind: 'none' }

const PICTURE = { picture: true, sound: false }

/** The positions of a unit once its way, what it takes and what it gives are put together. */
export function settle(way: Way, ...more: readonly Condition[]): Condition | null {
  return more.reduce<Condition | null>((all, next) => all && together(all, next), way.stand)
}
