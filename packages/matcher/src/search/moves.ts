import { allTogether, portOf, type Condition } from '@coaxwain/models'
import { accept, type Taken } from '../compile/accept'
import type { Face } from '../compile/face'
import { leave, type Leaving } from '../compile/leave'
import type { Core, CoreTable } from '../compile/signal'
import { priceOf } from '../compile/variant'
import { leastDoubt, type Way } from '../compile/way'
import { BOTH, PICTURE, type Join, type JoinTable } from '../join/join'
import { noWorseCost, type Cost } from './label'
import { handshakeUnknown, stopsAt } from './protection'

/** One step of a picture: out of a face, by a join, into a unit and, unless it is the last, out of it again. */
export interface Move extends Cost {
  readonly way: Way
  /** Ways of other units that do exactly the same, least doubt first, with this one among them. */
  readonly kin: readonly Way[]
  readonly join: Join
  /** The join brings the sound as well, from where the picture comes from. */
  readonly withSound: boolean
  readonly taken: Taken
  /** Terminators that end the lines, by sort. */
  readonly terminators: readonly number[]
  /** Null where the picture stays. */
  readonly leaving: Leaving | null
  readonly stand: Condition
}

/** Moves that lead to the same and can be told apart by their cost alone. */
export interface MoveGroup {
  readonly all: readonly Move[]
  /** Those that no other of them beats. */
  readonly best: readonly Move[]
}

/** All moves from one state. */
export interface Moves {
  readonly groups: ReadonlyMap<string, MoveGroup>
  readonly best: readonly Move[]
  /** Which of the groups have a variant among their best. */
  readonly bestOf: ReadonlyMap<string, readonly string[]>
}

/** What is worked out once per pair of numbers. */
class Memo<T> {
  private readonly rows = new Map<number, Map<number, T>>()

  has(first: number, second: number): boolean {
    return this.rows.get(first)?.has(second) === true
  }

  get(first: number, second: number, make: () => T): T {
    let row = this.rows.get(first)
    if (!row) this.rows.set(first, (row = new Map<number, T>()))
    const known = row.get(second)
    if (known !== undefined) return known
    const made = make()
    row.set(second, made)
    return made
  }
}

type Kin = readonly [Way, ...Way[]]

/** Ways into units with equal faces, put together by what their inputs take, and then by all that they do. */
interface Entrance {
  readonly face: Face
  readonly takes: readonly (readonly Kin[])[]
}

function groupBy<K, T>(things: readonly T[], keyOf: (thing: T) => K): Map<K, [T, ...T[]]> {
  const groups = new Map<K, [T, ...T[]]>()
  for (const thing of things) {
    const key = keyOf(thing)
    const group = groups.get(key)
    if (group) group.push(thing)
    else groups.set(key, [thing])
  }
  return groups
}

const kindOf = (place: Way['soundFrom']): string =>
  place === null ? '-' : place === 'picture' ? 'p' : 's'

/** All by which two ways into equal faces can differ but for their doubt. */
const contentOf = (way: Way): string =>
  JSON.stringify([
    way.takeId,
    way.leaveId,
    way.from?.face.id,
    kindOf(way.soundFrom) + kindOf(way.soundTo),
    way.soundMono,
    way.variant.powered,
    priceOf(way.variant),
    way.stand,
    way.terminate.map((key) => portOf(way.variant.device, key).connector),
  ])

function entrancesOf(ways: readonly Way[], apart: (way: Way) => boolean): Entrance[] {
  const kinOf = (alike: readonly Way[]): Kin[] =>
    [...groupBy(alike, (way) => (apart(way) ? way.id : contentOf(way))).values()].map((kin) =>
      kin.sort((a, b) => leastDoubt(a) - leastDoubt(b)),
    )
  const open = ways.filter((way) => way.into !== null)
  return [...groupBy(open, (way) => way.into!.face)].map(([face, alike]) => ({
    face,
    takes: [...groupBy(alike, (way) => way.takeId).values()].map(kinOf),
  }))
}

/** Works out once per face and picture what can be done with it. */
export class MoveTable {
  private readonly known = new Memo<Moves>()
  private readonly made = new Memo<readonly Move[]>()
  private readonly taken = new Memo<readonly Taken[]>()
  private readonly left = new Memo<readonly Leaving[]>()
  private readonly entrances: readonly Entrance[]

  /** `apart`: moves of which alike ones must not stand for each other. */
  constructor(
    private readonly joins: JoinTable,
    ways: readonly Way[],
    private readonly cores: CoreTable,
    private readonly apart: (way: Way) => boolean,
  ) {
    this.entrances = entrancesOf(ways, apart)
  }

  of(face: Face, core: Core): Moves {
    return this.known.get(face.id, core.id, () => {
      const groups = groupsOf(this.all(face, core), this.apart)
      return { groups, best: [...groups.values()].flatMap((g) => g.best), bestOf: bestOf(groups) }
    })
  }

  /** With those that others beat. */
  all(face: Face, core: Core): readonly Move[] {
    return this.made.get(face.id, core.id, () =>
      this.entrances.flatMap((entrance) => this.into(entrance, face, core)),
    )
  }

  /** Works the moves from one state out in slices. */
  *prepare(face: Face, core: Core): Generator<void> {
    if (this.made.has(face.id, core.id)) return
    const made: Move[] = []
    for (const entrance of this.entrances) {
      made.push(...this.into(entrance, face, core))
      yield
    }
    this.made.get(face.id, core.id, () => made)
  }

  private into({ face, takes }: Entrance, out: Face, core: Core): Move[] {
    const pictures = this.joins.between(out, face, PICTURE)
    if (pictures.length === 0) return []
    const both = out.sound.length > 0 && face.sound.length > 0
    const joins = both ? [...pictures, ...this.joins.between(out, face, BOTH)] : pictures
    return takes.flatMap((kins) => joins.flatMap((join) => this.byJoin(join, kins, core)))
  }

  /** Moves by one join into ways that take the same. */
  private byJoin(join: Join, kins: readonly Kin[], core: Core): Move[] {
    const first = kins[0]?.[0]
    if (!first || stopsAt(first, core.protection)) return []
    const lumaOnly = join.picture === 'luma-only'
    const taken = this.taken.get(first.takeId, core.id * 8 + qualityOf(join), () =>
      accept(
        { device: first.variant.device, fn: first.fn, jack: first.in ?? '' },
        { core, lumaOnly, volts: join.volts },
        this.cores,
      ),
    )
    return taken.flatMap((t) => kins.flatMap((kin) => this.through(kin, join, t)))
  }

  private through(kin: Kin, join: Join, taken: Taken): Move[] {
    const [way] = kin
    const terminators = this.terminatorsFor(way)
    if (!terminators) return []
    const lumaOnly = join.picture === 'luma-only'
    return this.leavings(way, taken, lumaOnly).flatMap((leaving) => {
      const stand = allTogether(way.stand, taken.stand, leaving?.stand)
      if (!stand) return []
      const unknown = handshakeUnknown(way, taken.core.protection) ? 1 : 0
      const { powered } = way.variant
      const inside = leaving !== null
      return {
        way,
        kin,
        join,
        withSound: join.sound !== null,
        taken,
        terminators,
        leaving,
        stand,
        boxes: inside && powered ? 1 : 0,
        pieces: join.pieces + terminators.length + (inside && !powered ? 1 : 0),
        doubt: unknown + (join.dcUnknown ? 1 : 0) + leastDoubt(way),
        bought: join.bought + this.priceOf(terminators) + priceOf(way.variant),
      }
    })
  }

  /** Null where a line would stay open for want of one. */
  private terminatorsFor({ terminate, variant }: Way): number[] | null {
    const found = terminate.map((key) => {
      const { connector } = portOf(variant.device, key)
      const { drawer } = this.joins
      return drawer.owned.terminatorFor(connector) ?? drawer.terminatorFor(connector)
    })
    return found.every((t) => t !== null) ? found : null
  }

  private priceOf(terminators: readonly number[]): number {
    return terminators.filter((t) => this.joins.drawer.pieces[t]?.bought).length
  }

  private leavings(way: Way, taken: Taken, lumaOnly: boolean): readonly (Leaving | null)[] {
    const give = way.out
    if (!give) return [null]
    const flags = (taken.colour ? 1 : 0) + (lumaOnly ? 2 : 0)
    return this.left.get(way.leaveId, taken.core.id * 4 + flags, () =>
      leave(
        { device: way.variant.device, fn: way.fn, give },
        { core: taken.core, colour: taken.colour, lumaOnly },
        this.cores,
      ),
    )
  }
}

/** What of a join an input can tell. */
const qualityOf = (join: Join): number =>
  (join.picture === 'luma-only' ? 1 : 0) +
  (join.volts.includes('av-select') ? 2 : 0) +
  (join.volts.includes('rgb-select') ? 4 : 0)

/** Moves with equal keys lead to the same and can be told apart by their cost alone. */
function keyOf(move: Move, apart: boolean): string {
  const { way, leaving, taken } = move
  const own = apart ? `${way.id} ${[...move.join.scarce].join()}` : ''
  const places = `${way.into?.face.id} ${way.from?.face.id} ${kindOf(way.soundFrom)}${kindOf(way.soundTo)}`
  const sound = `${way.soundMono} ${taken.heard} ${move.withSound}`
  if (!leaving) return `${places} ${sound} ${way.id} ${JSON.stringify(taken)} ${own}`
  const { core, poorest, lumaMhz, shape, direct } = leaving
  return `${places} ${sound} ${core.id} ${poorest} ${lumaMhz} ${shape} ${direct} ${leaving.sound} ${own}`
}

/** The same move by a unit that is not left out; null when there is none. */
export function movedBy(move: Move, isLeftOut: (way: Way) => boolean): Move | null {
  const way = move.kin.find((w) => !isLeftOut(w))
  if (!way || way === move.way) return way ? move : null
  return { ...move, way, doubt: move.doubt - leastDoubt(move.way) + leastDoubt(way) }
}

/** Of moves that lead to the same, those that no other beats on every cost. */
export function unbeaten(moves: readonly Move[]): readonly Move[] {
  let kept: Move[] = []
  for (const move of moves) {
    if (kept.some((k) => noWorseCost(k, move))) continue
    kept = kept.filter((k) => !noWorseCost(move, k))
    kept.push(move)
  }
  return kept
}

function groupsOf(
  moves: readonly Move[],
  apart: (way: Way) => boolean,
): ReadonlyMap<string, MoveGroup> {
  const groups = groupBy(moves, (move) => keyOf(move, apart(move.way) || move.join.scarce.size > 0))
  return new Map([...groups].map(([key, all]) => [key, { all, best: unbeaten(all) }]))
}

function bestOf(groups: ReadonlyMap<string, MoveGroup>): ReadonlyMap<string, readonly string[]> {
  const found = new Map<string, string[]>()
  for (const [key, { best }] of groups) {
    for (const id of new Set(best.map(({ way }) => way.variant.id))) {
      const keys = found.get(id)
      if (keys) keys.push(key)
      else found.set(id, [key])
    }
  }
  return found
}
