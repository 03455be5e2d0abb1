import type { Chain, ChainLink, Link, PieceUse, PortRef } from '@coaxwain/shelf'
import type { ShelfView } from '../shelf-view'
import { waysOf, type Way } from './ways'

/** A link with every plug and copy settled, and what could get across it. */
export interface Laid {
  readonly link: Link
  readonly way: Way | null
  /** Ways that would do as well and carry something else. */
  readonly rivals: readonly Way[]
}

/**
 * Settles plugs and copies link by link: cores of one lead serve sockets of the same two units, and of others
 * where its other end sits there already or no second lead of the kind is left.
 */
export function layChain(chain: Chain, view: ShelfView): Laid[] {
  const drawer = new Plugs(view)
  return chain.links.map((link) => {
    const ways = waysOf(link, view)
    const [first] = ways
    if (!first) return { link: asNamed(link), way: null, rivals: [] }
    const likely = likelyOf(ways, link, drawer)
    const { way, pieces } = plug(link, likely, drawer) ??
      plug(link, ways, drawer) ?? {
        way: first,
        pieces: drawer.force(link, first),
      }
    return {
      link: { from: link.from, pieces, to: link.to, circuits: [] },
      way,
      rivals: likely.filter((w) => carriesOther(w, way)),
    }
  })
}

/** The way that can be plugged beside what is there with the fewest pieces more. */
function plug(
  link: ChainLink,
  ways: readonly Way[],
  drawer: Plugs,
): { way: Way; pieces: PieceUse[] } | null {
  const plans = ways.flatMap((way) => {
    const plan = drawer.hasSame(link, way) ? null : drawer.plan(link, way)
    return plan ? [{ way, ...plan }] : []
  })
  const [best] = plans.sort((a, b) => a.fresh - b.fresh)
  if (best) drawer.take(link, best.pieces)
  return best ?? null
}

/** The best ways; of the same join made again, those that use other plugs. */
function likelyOf(ways: readonly Way[], link: ChainLink, drawer: Plugs): Way[] {
  const [first] = ways as readonly [Way, ...Way[]]
  const fresh = ways.filter((w) => w.misfits === first.misfits && !drawer.hasSame(link, w))
  const best = fresh[0]?.fitness ?? first.fitness
  return (fresh.length > 0 ? fresh : ways).filter(
    (w) => w.misfits === first.misfits && w.fitness === best,
  )
}

const carried = (way: Way): string =>
  way.pairs
    .filter((p) => p.fitness === way.fitness)
    .map((p) => `${p.from} ${p.to}`)
    .sort()
    .join()

const carriesOther = (a: Way, b: Way): boolean => a.pairs.length > 0 && carried(a) !== carried(b)

const asNamed = ({ from, pieces, to }: ChainLink): Link => ({
  from,
  to,
  pieces: pieces.map((p) => ({
    model: p.model,
    copy: p.copy ?? 1,
    wayRound: p.wayRound ?? 'forward',
    inPlug: p.inPlug ?? 0,
    outPlug: p.outPlug ?? 0,
  })),
  circuits: [],
})

/** Plugs that sit somewhere already, and the pieces that they belong to. */
class Plugs {
  private mates = new Map<string, string>()
  private readonly joined = new Set<string>()
  private readonly copies = new Map<string, { between: string; copy: number }[]>()

  constructor(private readonly view: ShelfView) {}

  /** Pieces for a link with free plugs and how many are new, or null where they cannot be plugged. */
  plan(link: ChainLink, way: Way): { pieces: PieceUse[]; fresh: number } | null {
    const before = new Map(this.mates)
    const pieces = this.tryPlugs(link, way)
    this.mates = before
    if (!pieces) return null
    const isFresh = ({ model, copy }: PieceUse): boolean =>
      !(this.copies.get(model) ?? []).some((c) => c.copy === copy)
    return { pieces, fresh: pieces.filter(isFresh).length }
  }

  take(link: ChainLink, pieces: readonly PieceUse[]): void {
    let open = socketName(link.from)
    for (const piece of pieces) {
      this.join(open, nameOf(piece, 'in'))
      open = nameOf(piece, 'out')
    }
    this.join(open, socketName(link.to))
    this.note(link, pieces)
  }

  private tryPlugs(link: ChainLink, way: Way): PieceUse[] | null {
    const pieces: PieceUse[] = []
    let open = socketName(link.from)
    for (const [i, use] of way.pieces.entries()) {
      const copies = [...this.pluggedTo(open, use.model), ...this.copiesFor(link, i, use.model)]
      const copy = copies.find((c) => this.isFree(open, nameOf({ ...use, copy: c }, 'in')))
      if (copy === undefined) return null
      const piece = { ...use, copy }
      this.join(open, nameOf(piece, 'in'))
      pieces.push(piece)
      open = nameOf(piece, 'out')
    }
    return this.isFree(open, socketName(link.to)) ? pieces : null
  }

  /** Whether the very same plugs lie between the same sockets already. */
  hasSame = (link: ChainLink, way: Way): boolean => this.joined.has(joinOf(link, way))

  /** As the person has it, though something is then plugged twice. */
  force(link: ChainLink, way: Way): PieceUse[] {
    const pieces = way.pieces.map((use, i) => ({
      ...use,
      copy: link.pieces[i]?.copy ?? this.next(use.model) + i,
    }))
    this.note(link, pieces)
    return pieces
  }

  /** A lead that is plugged there already, of which another end may go to another unit. */
  private pluggedTo(end: string, model: string): number[] {
    const [, at, copy] = (this.mates.get(end) ?? '').split(' ')
    return at === model ? [Number(copy)] : []
  }

  private next = (model: string): number =>
    Math.max(0, ...(this.copies.get(model) ?? []).map((c) => c.copy)) + 1

  /**
   * The copy that was named; else those that lie between the same units, and a fresh one; where there is none
   * left, one that lies elsewhere, of which another core may be free.
   */
  private copiesFor(link: ChainLink, index: number, model: string): number[] {
    const named = link.pieces[index]?.copy
    if (named !== undefined) return [named]
    const between = betweenOf(link)
    const near = (this.copies.get(model) ?? []).filter((c) => c.between === between)
    const fresh = this.next(model) + index
    const elsewhere = fresh > this.stockOf(model) ? (this.copies.get(model) ?? []) : []
    return [...new Set([...near, ...elsewhere].map((c) => c.copy)), fresh]
  }

  private stockOf = (model: string): number =>
    this.view.snapshot.units
      .filter((u) => u.model === model)
      .reduce((sum, u) => sum + u.quantity, 0)

  private note(link: ChainLink, pieces: readonly PieceUse[]): void {
    this.joined.add(joinOf(link, { pieces }))
    for (const { model, copy } of pieces) {
      const known = this.copies.get(model) ?? []
      this.copies.set(model, [...known, { between: betweenOf(link), copy }])
    }
  }

  private isFree(a: string, b: string): boolean {
    const [mateOfA, mateOfB] = [this.mates.get(a), this.mates.get(b)]
    return (mateOfA === undefined && mateOfB === undefined) || (mateOfA === b && mateOfB === a)
  }

  private join(a: string, b: string): void {
    this.mates.set(a, b).set(b, a)
  }
}

const socketName = ({ unit, port }: PortRef): string => `port ${unit} ${port}`

const betweenOf = ({ from, to }: ChainLink): string => [from.unit, to.unit].sort().join(' ')

function nameOf({ model, copy, wayRound, inPlug, outPlug }: PieceUse, end: 'in' | 'out'): string {
  const side = (end === 'in') === (wayRound === 'forward') ? 'a' : 'b'
  return `plug ${model} ${copy} ${side} ${end === 'in' ? inPlug : outPlug}`
}

const joinOf = ({ from, to }: ChainLink, { pieces }: Pick<Way, 'pieces'>): string =>
  JSON.stringify([from, to, pieces.map((p) => [p.model, p.wayRound, p.inPlug, p.outPlug])])
