import type { Obstacle, Question, Snapshot, Uid, Unit } from '@coaxwain/shelf'
import { channelsIn, TIER, type Channel, type Quality } from '@coaxwain/signal'
import { carriersOf } from '../compile/carriers'
import { FaceTable } from '../compile/face'
import { SigTable } from '../compile/sig'
import { compileVariants, outOfReach, variantOf, type Variant } from '../compile/variant'
import { isUsable, WayMaker, type Way } from '../compile/way'
import { compileDrawer, type Drawer } from '../join/drawer'
import { JoinTable } from '../join/join'
import { obstacle } from '../reasons/breaks'
import { obstaclesBetween } from '../reasons/obstacles'
import { Aerials } from './aerial'
import { assign } from './assign'
import { Finisher, worksFully } from './finish'
import { pathOf, type Finished } from './label'
import { Search } from './search'
import { bestOf, startLabels } from './start'

/** A purchase of more things than this is no answer. */
const MOST_BOUGHT = 12

/** How often the search may be run again because units or pieces ran short. */
const MOST_ROUNDS = 6

export interface Solved {
  readonly found: Finished
  readonly units: ReadonlyMap<Way, Unit>
}

export interface Solving {
  readonly source: Variant
  readonly display: Variant
  readonly drawer: Drawer
  /** Boxes on the shelf whose own carrier is on whenever they are. */
  readonly idle: readonly { readonly variant: Variant; readonly channels: readonly Channel[] }[]
  readonly best: { readonly source: Quality; readonly display: Quality; readonly sound: boolean }
}

/** A search that can be run in slices, and again with exact counts where the shelf ran short. */
export class Solver {
  readonly frame: Solving
  private readonly starts: readonly Way[]
  private readonly ends: readonly Way[]
  /** With the harmful ones, which are reasons. */
  private readonly allEnds: readonly Way[]
  private readonly boxes: readonly Way[]
  private readonly soundBoxes: readonly Way[]
  private readonly speakers: readonly Way[]
  private readonly scarceUnits = new Set<string>()
  private readonly scarcePieces = new Set<number>()
  private readonly aerialWays: readonly Way[]
  private readonly faces = new FaceTable()
  private readonly sigs = new SigTable()
  private search: Search
  private joins: JoinTable
  private round = 1
  private spent = 0
  private cut = false
  solved: readonly Solved[] | null = null

  constructor(
    snapshot: Snapshot,
    private readonly question: Question,
    private readonly budget: number,
    private readonly bought: ReadonlySet<Uid> = new Set(),
  ) {
    const unit = (uid: Uid): Unit => {
      const found = snapshot.units.find((u) => u.uid === uid)
      if (!found) throw new Error(`no unit ${uid}`)
      return found
    }
    const leftOut = new Set([...question.avoid, question.source.unit, question.display.unit])
    const source = variantOf(snapshot, unit(question.source.unit))
    const display = variantOf(snapshot, unit(question.display.unit))
    const maker = new WayMaker(this.faces)
    const variants = compileVariants(snapshot, leftOut, bought)
    const ways = variants.map((v) => ({
      pictures: maker.waysOf(v).filter(isUsable),
      sounds: maker.soundWaysOf(v).filter(isUsable),
    }))
    this.starts = maker
      .waysOf(source)
      .filter((w) => w.fn.key === question.source.playing && isUsable(w))
    this.allEnds = maker
      .waysOf(display)
      .filter(
        (w) =>
          w.fn.kind === 'shows' &&
          w.in !== null &&
          (question.display.input ?? w.fn.key) === w.fn.key,
      )
    this.ends = this.allEnds.filter(isUsable)
    this.boxes = ways.flatMap((w) =>
      w.pictures.filter(
        (x) => x.into !== null && x.from !== null && x.in !== null && x.out !== null,
      ),
    )
    this.aerialWays = ways.flatMap((w) =>
      w.pictures.filter((x) => x.fn.kind === 'receives' && x.from !== null),
    )
    const sounds = ways.flatMap((w) => w.sounds)
    this.soundBoxes = sounds.filter((w) => w.soundTo !== null)
    this.speakers = sounds.filter((w) => w.soundTo === null)
    const drawer = compileDrawer(snapshot, leftOut, question.assumedLeads, bought)
    const played = bestOf(this.starts, question.material)
    this.frame = {
      source,
      display,
      drawer,
      idle: variants.flatMap((variant) => idleCarriers(variant)),
      best: {
        source: played.quality,
        display: bestShown(this.ends),
        sound:
          played.sound &&
          (display.device.display?.loudspeakers !== 'none' || this.speakers.length > 0),
      },
    }
    this.joins = new JoinTable(drawer, this.scarcePieces)
    this.search = this.begin()
  }

  private begin(): Search {
    const { demands, offAir } = this.question
    const aerials =
      demands.keepAerial === true
        ? new Aerials(this.aerialWays, this.boxes, this.joins, this.faces, offAir)
        : null
    return new Search(
      {
        starts: startLabels(this.starts, this.question.material, this.sigs),
        boxes: this.boxes,
        ends: this.ends,
        soundBoxes: this.soundBoxes,
        speakers: this.speakers,
        joins: this.joins,
        sigs: this.sigs,
        finisher: new Finisher(demands, this.speakers, aerials),
        aerials,
        scarceUnits: new Set(this.scarceUnits),
        mostBought: this.bought.size > 0 ? MOST_BOUGHT : 0,
      },
      this.budget - this.spent,
    )
  }

  get done(): boolean {
    return this.solved !== null
  }

  get work(): number {
    return this.spent + this.search.work
  }

  get complete(): boolean {
    return !this.cut && !this.search.cut && !this.joins.capped
  }

  step(expansions: number): void {
    if (this.solved) return
    this.search.step(expansions)
    if (this.search.done) this.settle()
  }

  /** Takes what is found, or starts again where something was used more often than it is there. */
  private settle(): void {
    const stock = (piece: number): number => this.frame.drawer.pieces[piece]?.stock ?? 0
    const solved: Solved[] = []
    let short = false
    for (const found of this.search.best()) {
      const result = assign(found, stock, this.scarceUnits)
      if ('units' in result) {
        solved.push({ found, units: result.units })
        continue
      }
      short = true
      for (const id of result.short.variants) this.scarceUnits.add(id)
      for (const piece of result.short.pieces) this.scarcePieces.add(piece)
    }
    if (!short || this.round >= MOST_ROUNDS || this.search.cut) {
      this.cut ||= short || this.search.cut
      this.solved = solved
      return
    }
    this.round++
    this.spent += this.search.work
    this.joins = new JoinTable(this.frame.drawer, new Set(this.scarcePieces))
    this.search = this.begin()
  }

  /** Why the shelf does not do it, or what looks right and would harm. */
  obstacles(): Obstacle[] {
    const starts = startLabels(this.starts, this.question.material, this.sigs)
    const efforts = (this.solved ?? []).map((s) => s.found.axes)
    const joined = new Set((this.solved ?? []).flatMap((s) => joinsOf(s.found)))
    const boxes = Math.min(...efforts.map((a) => a.boxes))
    const pieces = Math.min(...efforts.filter((a) => a.boxes === boxes).map((a) => a.pieces))
    const found = obstaclesBetween(starts, this.allEnds, {
      joins: this.joins,
      expander: this.search.expander,
      boxes: this.boxes,
      lightGun: this.question.demands.aim === 'light-gun',
      joined: (out, into) => joined.has(`${out.id} ${into.id}`),
      best: efforts.length > 0 ? { boxes, pieces } : null,
      whole: (this.solved ?? []).some((s) => worksFully(s.found, this.frame.best)),
    })
    return efforts.length > 0 ? found : [...this.stuck(), ...found]
  }

  /** Controls of the two ends that nobody can move, and of which nobody has noted where they stand. */
  private stuck(): Obstacle[] {
    return [this.frame.source, this.frame.display].flatMap(({ device, units }) => {
      const [unit] = units
      const unknown = device.controls.filter(
        (c) => unit && outOfReach(device, c, unit) && unit.stands[c.key] === undefined,
      )
      return unknown.map((c) => obstacle('out-of-reach', { to: device.name, control: c.label }))
    })
  }

  /** The best so far, as far as units and pieces go round. */
  soFar(): readonly Solved[] {
    if (this.solved) return this.solved
    const stock = (piece: number): number => this.frame.drawer.pieces[piece]?.stock ?? 0
    return this.search.best().flatMap((found) => {
      const result = assign(found, stock, this.scarceUnits)
      return 'units' in result ? [{ found, units: result.units }] : []
    })
  }
}

/** The faces that a chain joins, as pairs. */
function joinsOf(found: Finished): string[] {
  const path = pathOf(found.last)
  const ways = [...path.map((l) => l.way), found.end]
  return path.map((l, i) => `${l.way.from?.face.id} ${ways[i + 1]?.into?.face.id}`)
}

/** The channels of a carrier that is always on, beside a loop that passes the aerial. */
function idleCarriers(variant: Variant): Solving['idle'] {
  const { device } = variant
  const loops = device.functions.some(
    (f) => f.kind === 'loop-through' && (f.while ?? []).length === 0,
  )
  const always = device.functions
    .flatMap((f) => f.gives.flatMap((g) => g.rf ?? []))
    .find((r) => r.always)
  if (!loops || !always) return []
  const { part, names } = carriersOf(device, always)
  return [{ variant, channels: channelsIn(part).filter((c) => names.includes(c.name)) }]
}

const bestShown = (ends: readonly Way[]): Quality =>
  ends.reduce<Quality>((best, way) => {
    const form = way.into?.face.form ?? 'none'
    return TIER[form] > TIER[best] ? form : best
  }, 'none')
