import type { DeviceModel, Model } from '@coaxwain/models'
import type { Caution, Hookup, Purchase, Question, Snapshot, Uid, Unit } from '@coaxwain/shelf'
import { SOUND_RANK, TIER } from '@coaxwain/signal'
import { CompiledShelf } from '../compile/shelf'
import { buildHookup } from '../result/build'
import { Bargains, byPicture, bySize } from '../search/bargains'
import type { Frame } from '../search/layout'
import { Solver, type Solved } from '../search/solve'
import { isSoldFor, receivedOffAir } from './sold-for'

/** Things that can be bought, by key. */
export type Parts = Readonly<Record<string, Model>>

/** How many of each lead and adapter may be bought. */
const MOST_OF_A_PIECE = 3

const PREFIX = 'part:'
export const partUid = (key: string): Uid => `${PREFIX}${key}`

/** The shelf with every part on it, untried by nobody: what is bought is taken to work. */
export function withParts(snapshot: Snapshot, parts: Parts): Snapshot {
  const entries = Object.entries(parts)
  const unitOf = ([key, model]: [string, Model]): Unit => ({
    uid: partUid(key),
    model: partUid(key),
    quantity: model.type === 'piece' ? MOST_OF_A_PIECE : 1,
    working: 'works',
    holding: 'kept',
    place: null,
    forms:
      model.type === 'device'
        ? model.jacks.flatMap((jack) =>
            jack.contacts.map(({ port }) => ({ jack: jack.key, port, state: 'works' as const })),
          )
        : [],
    functions:
      model.type === 'device'
        ? model.functions.map((f) => ({ function: f.key, state: 'works' as const }))
        : [],
    modifications: [],
    stands: {},
    remotePresent: true,
  })
  return {
    ...snapshot,
    models: {
      ...snapshot.models,
      ...Object.fromEntries(entries.map(([key, model]) => [partUid(key), model])),
    },
    units: [...snapshot.units, ...entries.map(unitOf)],
  }
}

const stocked = new WeakMap<CompiledShelf, WeakMap<Parts, CompiledShelf>>()

/** A compiled shelf with every part on it; made once. */
function stock(shelf: CompiledShelf, parts: Parts): CompiledShelf {
  const known = stocked.get(shelf) ?? new WeakMap<Parts, CompiledShelf>()
  stocked.set(shelf, known)
  const made =
    known.get(parts) ??
    new CompiledShelf(withParts(shelf.snapshot, parts), new Set(Object.keys(parts).map(partUid)))
  known.set(parts, made)
  return made
}

/** Parts that nobody sells where a set was. */
function notSoldFor(set: DeviceModel, parts: Parts): Uid[] {
  const received = receivedOffAir(set)
  return Object.entries(parts).flatMap(([key, part]) =>
    part.type === 'device' && !isSoldFor(part, received) ? [partUid(key)] : [],
  )
}

/** A second search over the shelf with the parts on it. */
export class Shopping {
  private readonly solver: Solver

  constructor(
    shelf: CompiledShelf,
    private readonly question: Question,
    /** The best way that the shelf has already. */
    private readonly now: Hookup | null,
    { parts, budget }: { readonly parts: Parts; readonly budget: number },
  ) {
    const set = shelf.end(question.display.unit).variant.device
    const avoid = [...question.avoid, ...notSoldFor(set, parts)]
    const asked = { ...question, avoid }
    const findsFor = ({ best }: Frame): Bargains => new Bargains(best, now !== null)
    this.solver = new Solver(stock(shelf, parts), asked, budget, findsFor)
  }

  step(expansions: number): void {
    this.solver.step(expansions)
  }

  get done(): boolean {
    return this.solver.done
  }

  get work(): number {
    return this.solver.work
  }

  get complete(): boolean {
    return this.solver.complete
  }

  /**
   * What opens a way where there is none: the smallest purchase, and the one with the best picture.
   * Where there is one already, at most two that do more than it does.
   */
  purchases(): Purchase[] {
    const { now } = this
    const options = this.solver
      .soFar()
      .filter(({ wiring }) => wiring.found.bought > 0)
      .map((solved) => ({ ...this.build(solved), bought: solved.wiring.found.bought }))
      .filter((hookup) => now === null || isMore(hookup, now))
    const whole = options.filter((hookup) => hookup.worksFully)
    const pool = whole.length > 0 ? whole : now === null ? options : []
    const chosen = [bySize, byPicture].flatMap((order) => [...pool].sort(order)[0] ?? [])
    return [...new Set(chosen)].map(({ bought: _, ...hookup }) => ({
      parts: partsOf(hookup),
      hookup,
      brings: brings(hookup, now),
      doesNot: doesNot(hookup),
    }))
  }

  private build(solved: Solved): Hookup {
    return buildHookup({ ...solved, frame: this.solver.frame, offAir: this.question.offAir })
  }
}

const isMore = (a: Hookup, b: Hookup): boolean =>
  TIER[a.picture.quality] > TIER[b.picture.quality] ||
  (TIER[a.picture.quality] === TIER[b.picture.quality] &&
    (a.picture.degradations.length < b.picture.degradations.length ||
      SOUND_RANK[a.sound.sound] > SOUND_RANK[b.sound.sound]))

/** Keys of what has to be bought, each as often as it is used. */
function partsOf(hookup: Hookup): string[] {
  const units = new Set(hookup.legs.flatMap((l) => l.stops.map((s) => s.unit)))
  const pieces = new Set(hookup.links.flatMap((l) => l.pieces.map((p) => `${p.model} ${p.copy}`)))
  const keys = [...units, ...[...pieces].map((p) => p.slice(0, p.lastIndexOf(' ')))]
  return keys.filter((k) => k.startsWith(PREFIX)).map((k) => k.slice(PREFIX.length))
}

const say = (code: string, details: Caution['details'] = {}): Caution => ({ code, details })

function brings(hookup: Hookup, now: Hookup | null): Caution[] {
  if (now === null) return [say('opens-way', { quality: hookup.picture.quality })]
  return [
    ...(TIER[hookup.picture.quality] > TIER[now.picture.quality] ? [say('better-picture')] : []),
    ...(now.picture.degradations.includes('monochrome') && hookup.picture.colour
      ? [say('colour')]
      : []),
    ...(SOUND_RANK[hookup.sound.sound] > SOUND_RANK[now.sound.sound] ? [say('more-sound')] : []),
  ]
}

/** What it does not bring back: detail lost before it, stereo, the old line structure. */
function doesNot(hookup: Hookup): Caution[] {
  return [
    ...(hookup.sound.sound === 'mono' ? [say('stays-mono')] : []),
    ...(TIER[hookup.picture.quality] <= TIER.composite ? [say('no-more-detail')] : []),
  ]
}
