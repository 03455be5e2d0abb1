import { jackOf, type Key, type ModelFunction, type Port } from '@coaxwain/models'
import {
  LIMITS,
  type Hookup,
  type Question,
  type SeenPicture,
  type Snapshot,
} from '@coaxwain/shelf'
import { isPictureForm, SOUND_RANK, TIER, type PictureForm } from '@coaxwain/signal'
import { benchOf, doubtIn, portIn, type Bench, type Box } from './bench'
import {
  boundOf,
  leantOn,
  leaving,
  pictureGives,
  pictureInputs,
  startsOf,
  stopOf,
  type Chain,
  type Working,
} from './chains'
import { judge, type Draft, type Judged } from './draft'
import { Layout, type Laid, type Wire } from './layout'
import { freeBoxes, likenessOf, oneOfEach } from './likeness'
import { SoundPlans, type Plan } from './sounds'
import { settingsOf, standsOf, tuningsOf, type Doing } from './stands'
import { Best, pictureScore, scoreOf, type Vector } from './vectors'
import { pictureWires, variantsOf, Wiring } from './wires'

/** What was tried, for the curious and for the clock. */
export interface Tally {
  chains: number
  judged: number
}

/** Faults that more stops, links and settings may still put right. */
const MAY_BE_RIGHTED = new Set<string>([
  'automatic-not-moved',
  'demand-missed',
  'aerial-not-kept',
  'legs-and-links-differ',
  'line-not-ended',
])

/** A unit that has let the picture in; what is seen where it is the display. */
interface Standing {
  readonly stop: Working
  readonly picture: SeenPicture | null
}

/** Every hookup that the check accepts, but for those that another matches on every axis. */
export function enumerate(snapshot: Snapshot, question: Question): Hookup[] {
  return new Enumerator(benchOf(snapshot, question)).run()
}

const hasVoltage = (port: Port): boolean =>
  port.suppliesDcVolts !== undefined || port.needsDcVolts !== undefined

/**
 * Tries everything on a small shelf, chains with few boxes first. What cannot be plugged is not followed, nor
 * a chain that the check refuses for something that no continuation rights, nor one that has already cost more
 * and lost more than a hookup that was accepted.
 */
export class Enumerator {
  readonly tally: Tally = { chains: 0, judged: 0 }
  private readonly best = new Best()
  private readonly wiring: Wiring
  private readonly plans: SoundPlans
  private readonly mostPieces: number
  private readonly mostHeard: number
  private readonly through = new Map<Box, Doing[]>()

  constructor(private readonly bench: Bench) {
    this.wiring = new Wiring(bench)
    this.plans = new SoundPlans(bench, this.wiring)
    this.mostPieces = bench.drawer.reduce((sum, s) => sum + s.count, 0)
    this.mostHeard = this.plans.mostBy(null)
  }

  run(): Hookup[] {
    const { demands } = this.bench.question
    if (demands.stereo === true && this.mostHeard < SOUND_RANK.stereo) return []
    let layer: readonly Chain[] = startsOf(this.bench)
    for (let boxes = 0; layer.length > 0; boxes++) {
      for (const chain of layer) this.end(chain)
      layer = boxes < LIMITS.boxesInLeg ? layer.flatMap((chain) => this.longer(chain)) : []
    }
    return this.best.all()
  }

  /** The chain with one more box, in every way. */
  private longer(chain: Chain): Chain[] {
    const used = chain.stops.map((s) => s.box)
    return freeBoxes(this.bench, used)
      .flatMap((box) => this.ways(box))
      .flatMap((way) => this.into(chain, way))
  }

  /** The ways of a picture through a unit; of those that are alike, one. */
  private ways(box: Box): Doing[] {
    const known = this.through.get(box)
    if (known) return known
    const all = box.device.functions.flatMap((fn) =>
      pictureInputs(box, fn).flatMap((input) =>
        pictureGives(box, fn).map((give): Doing => ({ box, fn, in: input, give })),
      ),
    )
    const made = oneOfEach(all, likenessOf)
    this.through.set(box, made)
    return made
  }

  /** The chain led into one more unit, by every set of wires and under all positions. */
  private into(chain: Chain, doing: Doing): Chain[] {
    if (this.isHopeless([...chain.stops, doing], chain.pieces)) return []
    return this.wiresInto(chain, doing).flatMap((wires) => {
      const laid = this.lay(wires)
      if (!laid || this.isHopeless([...chain.stops, doing], laid.pieces)) return []
      return this.standing(chain, doing, laid).map(({ stop }) => {
        this.tally.chains++
        return { stops: [...chain.stops, stop], wires, pieces: laid.pieces }
      })
    })
  }

  private wiresInto(chain: Chain, { box, fn, in: input }: Doing): Wire[][] {
    const last = chain.stops.at(-1)!
    const out = { box: last.box, jack: jackOf(last.box.device, last.give!.jack) }
    const into = { box, jack: jackOf(box.device, input!) }
    const asksVolts = fn.accepts.some((row) => row.volts !== undefined)
    return pictureWires(out.jack, into.jack).flatMap((pairs) => {
      const wires = this.wiring.wires(out, into, pairs)
      if (!wires) return []
      const hasDc = wires.some(
        (w) => hasVoltage(portIn(out.box, w.from.port)) || hasVoltage(portIn(into.box, w.to.port)),
      )
      return variantsOf(wires, asksVolts, hasDc).map((own) => [...chain.wires, ...own])
    })
  }

  private lay(wires: readonly Wire[]): Laid | null {
    return new Layout(this.bench.drawer, wires).solve(this.mostPieces)
  }

  /** The unit under each setting of its controls in which the check lets the picture in. */
  private standing(chain: Chain, doing: Doing, laid: Laid): Standing[] {
    return standsOf(doing).flatMap((stand) =>
      this.tunings(chain, doing).flatMap((tuning) => {
        const entering: Working = {
          ...doing,
          settings: [...settingsOf(doing.box, stand), ...tuning],
          claim: null,
          visionMhz: null,
        }
        const { faults, picture } = this.judge([...chain.stops, entering], laid)
        const isEnd = (f: (typeof faults)[number]): boolean =>
          f.code === 'function-unknown' && f.details['unit'] === doing.box.unit.uid
        const stopped = faults.filter((f) => !MAY_BE_RIGHTED.has(f.code) && !isEnd(f))
        if (stopped.length > 0) return []
        const carried = doing.give?.rf ? null : chain.stops.at(-1)!.visionMhz
        return leaving(this.bench, doing, stand, tuning).map((stop) => ({
          stop: { ...stop, visionMhz: stop.visionMhz ?? carried },
          picture,
        }))
      }),
    )
  }

  private tunings(chain: Chain, { box, fn }: Doing) {
    const { visionMhz } = chain.stops.at(-1)!
    if (fn.tunedBy === undefined) return [[]]
    return visionMhz === null ? [] : tuningsOf(box, fn.tunedBy, visionMhz).map((s) => [s])
  }

  private judge(stops: readonly Working[], laid: Laid): Judged {
    this.tally.judged++
    return judge(this.bench, {
      picture: stops.map(stopOf),
      pictureLinks: laid.links,
      sound: [],
      soundLinks: [],
      settings: stops.flatMap((s) => s.settings),
      from: null,
    })
  }

  /** The chain led into the display, with everything that may become of the sound. */
  private end(chain: Chain): void {
    const { display } = this.bench
    for (const fn of display.device.functions.filter((f) => f.kind === 'shows')) {
      for (const input of pictureInputs(display, fn)) this.endBy(chain, fn, input)
    }
  }

  private endBy(chain: Chain, fn: ModelFunction, input: Key): void {
    const doing = { box: this.bench.display, fn, in: input, give: null }
    if (this.isHopeless([...chain.stops, doing], chain.pieces)) return
    for (const wires of this.wiresInto(chain, doing)) {
      const laid = this.lay(wires)
      if (!laid || this.isHopeless([...chain.stops, doing], laid.pieces)) continue
      for (const { stop, picture } of this.standing(chain, doing, laid)) {
        if (picture)
          this.hear({ stops: [...chain.stops, stop], wires, pieces: laid.pieces }, picture)
      }
    }
  }

  private hear(chain: Chain, picture: SeenPicture): void {
    const atBest = (plan: Pick<Plan, 'most' | 'sound' | 'leant'>, pieces: number): Vector =>
      this.vectorAt(chain.stops, {
        picture: scoreOf(picture),
        sound: plan.most,
        pieces,
        also: plan.sound.map((s) => s.box),
        leant: plan.leant,
      })
    const { demands } = this.bench.question
    if (demands.colour === true && !picture.colour) return
    const isMatched = (plan: Parameters<typeof atBest>[0], pieces = chain.pieces): boolean =>
      (demands.stereo === true && plan.most < SOUND_RANK.stereo) ||
      this.best.matches(atBest(plan, pieces))
    const most = this.plans.mostBy(chain.stops.at(-1)!.fn)
    if (isMatched({ most, sound: [], leant: [] })) return
    for (const plan of this.plans.of(chain.stops, (begun) => !isMatched(begun))) {
      if (isMatched(plan)) continue
      const laid = this.lay([...chain.wires, ...plan.wires])
      if (!laid || isMatched(plan, laid.pieces)) continue
      this.tally.judged++
      const { hookup } = judge(this.bench, this.draft(chain, plan, laid))
      if (hookup) this.best.add(hookup)
    }
  }

  private draft(chain: Chain, plan: Plan, laid: Laid): Draft {
    const count = chain.wires.length
    return {
      picture: chain.stops.map(stopOf),
      pictureLinks: laid.links.slice(0, count),
      sound: plan.sound.map(({ box, fn, in: input, out }) => ({
        unit: box.unit.uid,
        function: fn.key,
        in: input,
        out,
        picture: null,
        sound: 'none',
      })),
      soundLinks: laid.links.slice(count),
      settings: [...chain.stops.flatMap((s) => s.settings), ...plan.settings],
      from: plan.from,
    }
  }

  private isHopeless(stops: readonly Doing[], pieces: number): boolean {
    if (doubtIn(leantOn(stops)) === null) return true
    const last = stops.at(-1)!
    const { tier, lumaMhz } = boundOf(stops)
    const shown = Math.min(tier, bestTier(this.bench.display, last))
    const isEnd = last.box === this.bench.display
    const sound = isEnd ? this.plans.mostBy(last.fn) : this.mostHeard
    const picture = pictureScore(shown, lumaMhz)
    return this.best.matches(this.vectorAt(stops, { picture, sound, pieces, also: [], leant: [] }))
  }

  /** The best that a hookup of these stops and pieces can be. */
  private vectorAt(
    stops: readonly Doing[],
    at: {
      readonly picture: number
      readonly sound: number
      readonly pieces: number
      readonly also: readonly Box[]
      readonly leant: Parameters<typeof doubtIn>[0]
    },
  ): Vector {
    const { source, display } = this.bench
    const units = new Set([...stops.map((s) => s.box), ...at.also])
    const between = [...units].filter((box) => box !== source && box !== display)
    const boxes = between.filter((b) => b.powered).length
    return {
      picture: at.picture,
      sound: at.sound,
      boxes,
      pieces: at.pieces + between.length - boxes,
      doubt: doubtIn([...leantOn(stops), ...at.leant]) ?? Infinity,
    }
  }
}

/** The tier of the display's input, or of its best where the chain is not there yet. */
function bestTier(display: Box, { box, in: input }: Doing): number {
  const tierOf = (key: Key): number => TIER[jackOf(box.device, key).form as PictureForm]
  if (box === display && input !== null) return tierOf(input)
  const forms = display.device.jacks.map((j) => j.form).filter(isPictureForm)
  return Math.max(0, ...forms.map((form) => TIER[form]))
}
