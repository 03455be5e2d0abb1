import type { PieceModel } from '@coaxwain/models'
import type { CarriedCircuit, Link, PieceUse, PortRef, Uid } from '@coaxwain/shelf'
import { isSoundCircuit } from '@coaxwain/signal'
import type { Stock } from './bench'
import { sameBothWays, type Path, type Step } from './paths'

/** A wire that is wanted from a port to a port, with every path that would do. */
export interface Wire {
  readonly from: PortRef
  readonly to: PortRef
  readonly carried: CarriedCircuit
  readonly paths: readonly Path[]
}

/** Links of a hookup, and how many pieces lie in them. */
export interface Laid {
  readonly links: readonly Link[]
  readonly pieces: number
}

/** A piece taken out of the drawer: its model, and which one of them. */
interface Taken {
  readonly stock: Stock
  readonly copy: number
}

const betweenOf = ({ from, to }: Wire): string => [from.unit, to.unit].sort().join(' ')

const isSound = ({ carried }: Wire): boolean => isSoundCircuit(carried.from)

/** A picture and a sound that leave one unit, or go into one. */
const mayShare = (a: Wire, b: Wire): boolean =>
  isSound(a) !== isSound(b) && (a.from.unit === b.from.unit || a.to.unit === b.to.unit)

const nameOfPort = ({ unit, port }: PortRef): string => `${unit} ${port}`

/** The name of a plug: a side of a piece, and which of its plugs. */
function nameOfPlug({ stock, copy }: Taken, step: Step, end: 'in' | 'out'): string {
  const forward = step.wayRound === 'forward'
  const side = (end === 'in') === forward ? 'a' : 'b'
  return `${stock.model} ${copy} ${side} ${end === 'in' ? step.inPlug : step.outPlug}`
}

/** Cores that differ in nothing, so that of those which are free one is as good as another. */
const hasLikeCores = (piece: PieceModel): boolean =>
  piece.a.length > 1 &&
  piece.wires.length === piece.a.length &&
  sameBothWays(piece) &&
  piece.wires.every((w) => w.a.circuit === 'any') &&
  [...piece.a, ...piece.b].every((plug) => plug.connector === piece.a[0]?.connector)

/**
 * Lays several wires at once with the fewest pieces that do it: a plug sits in one socket, a socket holds one
 * plug, a lead of several cores serves several wires, and no more is taken than the drawer holds.
 */
export class Layout {
  private readonly taken: Taken[] = []
  private readonly mates = new Map<string, string>()
  private readonly uses: PieceUse[][] = []
  private most = 0

  constructor(
    private readonly drawer: readonly Stock[],
    private readonly wires: readonly Wire[],
  ) {}

  /** The least, or null when it cannot be done with so many pieces. */
  solve(most: number): Laid | null {
    const shortest = this.wires.map((w) => Math.min(...w.paths.map((p) => p.steps.length)))
    for (this.most = Math.max(0, ...shortest); this.most <= most; this.most++) {
      if (this.wire(0)) return { links: this.links(), pieces: this.taken.length }
    }
    return null
  }

  private links(): Link[] {
    return this.wires.map(({ from, to, carried }, i) => ({
      from,
      to,
      pieces: this.uses[i]!,
      circuits: [carried],
    }))
  }

  private wire(index: number): boolean {
    const wire = this.wires[index]
    if (!wire) return true
    return wire.paths.some((path) => {
      if (path.steps.length > this.most) return false
      this.uses[index] = []
      return this.step(index, path, 0, nameOfPort(wire.from))
    })
  }

  /** Goes on along a path from an open end. */
  private step(index: number, path: Path, at: number, open: string): boolean {
    const step = path.steps[at]
    const uses = this.uses[index]!
    if (!step) {
      return this.meet(open, nameOfPort(this.wires[index]!.to), () => this.wire(index + 1))
    }
    return this.choices(index, step.model).some((taken) => {
      if (!this.isFirstFree(taken, step)) return false
      const isNew = !this.taken.includes(taken)
      if (isNew) this.taken.push(taken)
      uses.push({ ...step, copy: taken.copy })
      const done = this.meet(open, nameOfPlug(taken, step, 'in'), () =>
        this.step(index, path, at + 1, nameOfPlug(taken, step, 'out')),
      )
      if (!done) {
        uses.pop()
        if (isNew) this.taken.pop()
      }
      return done
    })
  }

  /** Pieces of a model that lie there already, and one more where that is allowed. */
  private choices(index: number, model: Uid): Taken[] {
    const laid = this.taken.filter((t) => t.stock.model === model)
    const open = laid.filter((t) => this.mayServe(t, index))
    const stock = this.drawer.find((s) => s.model === model)
    const more = stock && laid.length < stock.count && this.taken.length < this.most
    return more ? [...open, { stock, copy: laid.length + 1 }] : open
  }

  /**
   * A piece serves one pair of units; or two, of which one has a picture of it, the other a sound, and both
   * have the unit in common that this comes from or goes to.
   */
  private mayServe({ stock, copy }: Taken, index: number): boolean {
    const own = this.wires[index]!
    const served = this.wires
      .slice(0, index)
      .filter((_, i) => this.uses[i]!.some((u) => u.model === stock.model && u.copy === copy))
    const [here, elsewhere] = [true, false].map((is) =>
      served.filter((w) => (betweenOf(w) === betweenOf(own)) === is),
    )
    return (
      elsewhere!.length === 0 ||
      (new Set(elsewhere!.map(betweenOf)).size === 1 &&
        elsewhere!.every((w) => mayShare(w, own)) &&
        here!.every((w) => isSound(w) === isSound(own)))
    )
  }

  /** Of like cores that nothing is plugged to, only the first is tried. */
  private isFirstFree(taken: Taken, step: Step): boolean {
    if (!hasLikeCores(taken.stock.piece)) return true
    const isFree = (plug: number): boolean =>
      (['a', 'b'] as const).every(
        (side) => !this.mates.has(`${taken.stock.model} ${taken.copy} ${side} ${plug}`),
      )
    if (!isFree(step.inPlug)) return true
    return taken.stock.piece.a.findIndex((_, plug) => isFree(plug)) === step.inPlug
  }

  /** Plugs two ends together for as long as something comes of it. */
  private meet(a: string, b: string, then: () => boolean): boolean {
    const [mateOfA, mateOfB] = [this.mates.get(a), this.mates.get(b)]
    if (mateOfA === b && mateOfB === a) return then()
    if (mateOfA !== undefined || mateOfB !== undefined) return false
    this.mates.set(a, b).set(b, a)
    if (then()) return true
    this.mates.delete(a)
    this.mates.delete(b)
    return false
  }
}
