import { inputsOf, jackOf, type Give, type Key, type ModelFunction } from '@coaxwain/models'
import { LIMITS, type Setting, type Uid } from '@coaxwain/shelf'
import { SOUND_RANK, type PictureForm } from '@coaxwain/signal'
import type { Bench, Box, Leant } from './bench'
import { pictureInputs, soundGives, soundInputs, type Working } from './chains'
import type { Wire } from './layout'
import { freeBoxes, oneOfEach, soundLikeness } from './likeness'
import { settingsOf, standsOf } from './stands'
import { soundWires, type End, type Wiring } from './wires'

/** A unit that the sound passes by sockets of its own, and what it does there. */
export interface SoundStop {
  readonly box: Box
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly out: Key | null
}

/** Something that may become of the sound, the picture being as it is. */
export interface Plan {
  readonly wires: readonly Wire[]
  readonly sound: readonly SoundStop[]
  readonly settings: readonly Setting[]
  readonly from: Uid | null
  /** The rank of the best that could be heard. */
  readonly most: number
  readonly leant: readonly Leant[]
}

/** The part of a plan by which it can be told whether it is worth going on. */
export type Begun = Pick<Plan, 'most' | 'sound' | 'leant'>

/** How the sound got as far as the inside of a unit. */
interface Route {
  readonly wires: readonly Wire[]
  readonly stops: readonly SoundStop[]
  readonly settings: readonly Setting[]
  readonly leant: readonly Leant[]
  readonly most: number
  /** Boxes for sound alone on the way. */
  readonly alone: number
}

const SILENCE: Plan = { wires: [], sound: [], settings: [], from: null, most: 0, leant: [] }

/** A function of a unit by which sound comes in by one socket and goes out by another, or is played. */
interface Alone {
  readonly box: Box
  readonly fn: ModelFunction
  readonly in: Key
  readonly give: Give | null
}

const handlesSoundOnly = ({ device }: Box, fn: ModelFunction): boolean =>
  inputsOf(fn).length > 0 && inputsOf(fn).every((key) => jackOf(device, key).form === 'sound')

const fromWithin = (form: PictureForm | undefined): boolean => form === 'rf' || form === 'hdmi'

/** Lists everything that may become of the sound along a chain. */
export class SoundPlans {
  private readonly mixes: boolean
  private readonly mixers: readonly Alone[]
  private readonly speakers: readonly Alone[]
  private readonly reached = new Map<string, boolean>()
  private isWorthwhile: (route: Route) => boolean = () => true

  constructor(
    private readonly bench: Bench,
    private readonly wiring: Wiring,
  ) {
    this.mixes = bench.drawer.some(({ piece }) => piece.mixes)
    const alone = freeBoxes(bench, []).flatMap((box) =>
      box.device.functions
        .filter((fn) => handlesSoundOnly(box, fn) || fn.kind === 'makes-sound')
        .map((fn) => ({ box, fn })),
    )
    this.mixers = alone.flatMap(({ box, fn }) =>
      soundInputs(box, fn).flatMap((input) =>
        soundGives(box, fn).map((give) => ({ box, fn, in: input, give })),
      ),
    )
    this.speakers = alone
      .filter(({ fn }) => fn.kind === 'makes-sound')
      .flatMap(({ box, fn }) =>
        soundInputs(box, fn).map((input) => ({ box, fn, in: input, give: null })),
      )
  }

  /** The rank of the best that could be heard by a function of the display, or by any. */
  mostBy(fn: ModelFunction | null): number {
    const { display } = this.bench
    const own = SOUND_RANK[display.device.display?.loudspeakers ?? 'none']
    const functions = fn ? [fn] : display.device.functions
    const inside = functions.some((f) => this.mayEnter(display, f)) ? own : SOUND_RANK.none
    const outside = this.speakers.some(({ box, in: input }) => this.isReached(box, input))
    return Math.min(outside ? SOUND_RANK.stereo : inside, this.played())
  }

  /** Sound may come inside the picture, or some output on the bench can be led to a socket for it. */
  private mayEnter(box: Box, fn: ModelFunction): boolean {
    const forms = pictureInputs(box, fn).map((key) => jackOf(box.device, key).form as PictureForm)
    return forms.some(fromWithin) || soundInputs(box, fn).some((key) => this.isReached(box, key))
  }

  private isReached(box: Box, key: Key): boolean {
    const name = `${box.unit.uid} ${key}`
    const known = this.reached.get(name)
    if (known !== undefined) return known
    const into = endOf(box, key)
    const outs = [this.bench.source, ...this.bench.boxes].flatMap((from) =>
      from.device.jacks
        .filter((j) => j.form === 'sound' && j.dir === 'out' && from !== box)
        .map((jack): End => ({ box: from, jack })),
    )
    const made = outs.some((out) =>
      soundWires(out, into, true).some((pairs) =>
        pairs.some((pair) => this.wiring.wires(out, into, [pair]) !== null),
      ),
    )
    this.reached.set(name, made)
    return made
  }

  private played(): number {
    const { source, question } = this.bench
    const fn = source.device.functions.find((f) => f.key === question.source.playing)
    if (question.material.sound === 'none') return SOUND_RANK.none
    const sounds = (fn?.gives ?? []).flatMap((g) => [g.sound, ...(g.rf ?? []).map((r) => r.sound)])
    if (sounds.includes('stereo')) return SOUND_RANK.stereo
    return sounds.some((s) => s === 'mono' || s === 'same') ? SOUND_RANK.mono : SOUND_RANK.none
  }

  /** The best first. What is not worthwhile when it has only begun is not followed. */
  of(stops: readonly Working[], isWorthwhile: (begun: Begun) => boolean): Plan[] {
    this.isWorthwhile = (route) => isWorthwhile({ ...route, sound: route.stops })
    const display = stops.length - 1
    const inside = this.entering(stops, display).map((r) =>
      planOf(r, this.bench.question.display.unit),
    )
    const outside = this.speakers
      .filter(({ box }) => stops.every((s) => s.box !== box))
      .flatMap((alone) =>
        this.leavingAny(stops, stops.length).flatMap((from) =>
          this.into(from, alone, stops).map((r) => planOf(r, alone.box.unit.uid)),
        ),
      )
    return [...inside, ...outside, SILENCE].sort(
      (a, b) => b.most - a.most || a.wires.length - b.wires.length,
    )
  }

  /** Every way in which sound may get inside a unit of the chain: in the picture, or by a socket of its own. */
  private entering(stops: readonly Working[], index: number): Route[] {
    const stop = stops[index]!
    if (index === 0)
      return [{ wires: [], stops: [], settings: [], leant: [], most: this.played(), alone: 0 }]
    const before = stops[index - 1]!
    const form = before.give && (jackOf(before.box.device, before.give.jack).form as PictureForm)
    const riding = form && fromWithin(form) ? this.entering(stops, index - 1) : []
    const joined = soundInputs(stop.box, stop.fn).flatMap((input) =>
      this.leavingAny(stops, index).flatMap((from) => this.fed(from, stop, input, stops)),
    )
    return [...riding, ...joined]
  }

  /** Every sound output of the units before one, with every way in which sound gets there. */
  private leavingAny(stops: readonly Working[], before: number): Leaving[] {
    return stops
      .slice(0, before)
      .flatMap((stop, i) =>
        oneOfEach(soundGives(stop.box, stop.fn), (g) => soundLikeness(stop, g)).flatMap((give) =>
          this.entering(stops, i).map((route) => ({ route, stop, give })),
        ),
      )
  }

  /** Into a unit of the chain, straight or by way of one box. */
  private fed(from: Leaving, stop: Working, input: Key, stops: readonly Working[]): Route[] {
    return this.led(from, { box: stop.box, fn: stop.fn, in: input, give: null }, stops)
  }

  /** Into loudspeakers of their own. */
  private into(from: Leaving, alone: Alone, stops: readonly Working[]): Route[] {
    return this.led(from, alone, stops).flatMap((route) => this.set(route, alone))
  }

  private led(from: Leaving, to: Alone, stops: readonly Working[]): Route[] {
    const start = leavingBy(from.route, from.stop, from.give)
    const source = endOf(from.stop.box, from.give.jack)
    const straight = this.joined(start, source, to)
    if (start.alone >= LIMITS.soundOnlyBoxes) return straight
    const free = this.mixers.filter(
      ({ box }) => box !== to.box && stops.every((s) => s.box !== box),
    )
    const round = free.flatMap((mixer) =>
      this.joined(start, source, mixer)
        .flatMap((route) => this.set(route, mixer))
        .flatMap((route) => {
          const inside = leavingBy(route, mixer, mixer.give!)
          return this.joined(
            { ...inside, alone: inside.alone + 1 },
            endOf(mixer.box, mixer.give!.jack),
            to,
          )
        }),
    )
    return [...straight, ...round]
  }

  /** A unit for sound alone, under each setting of its controls. */
  private set(route: Route, { box, fn, give }: Alone): Route[] {
    return standsOf({ box, fn, in: null, give }).map((stand) => ({
      ...route,
      settings: [...route.settings, ...settingsOf(box, stand)],
    }))
  }

  /** The wires from a sound output to a sound input, every set of them. */
  private joined(route: Route, out: End, to: Alone): Route[] {
    const into = endOf(to.box, to.in)
    return soundWires(out, into, this.mixes).flatMap((pairs) => {
      const wires = this.wiring.wires(out, into, pairs)
      if (!wires) return []
      const leant: Leant[] = wires.flatMap((w) => [
        { box: out.box, jack: out.jack.key, port: w.from.port },
        { box: into.box, jack: into.jack.key, port: w.to.port },
      ])
      const made = {
        ...route,
        wires: [...route.wires, ...wires],
        stops: withStop(route.stops, { box: to.box, fn: to.fn, in: to.in, out: null }),
        leant: [...route.leant, ...leant, { box: to.box, fn: to.fn.key }],
        most: pairs.length > 1 ? route.most : Math.min(route.most, SOUND_RANK.mono),
      }
      return this.isWorthwhile(made) ? [made] : []
    })
  }
}

/** Sound at an output of a unit of the chain. */
interface Leaving {
  readonly route: Route
  readonly stop: Working
  readonly give: Give
}

const endOf = (box: Box, key: Key): End => ({ box, jack: jackOf(box.device, key) })

const leavingBy = (
  route: Route,
  { box, fn }: { readonly box: Box; readonly fn: ModelFunction },
  give: Give,
): Route => ({
  ...route,
  stops: withStop(route.stops, { box, fn, in: null, out: give.jack }),
  most: give.sound === 'mono' ? Math.min(route.most, SOUND_RANK.mono) : route.most,
})

/** A unit that takes sound and gives it again is one stop. */
function withStop(stops: readonly SoundStop[], stop: SoundStop): SoundStop[] {
  const known = stops.find((s) => s.box === stop.box)
  if (!known) return [...stops, stop]
  const both = { ...known, in: known.in ?? stop.in, out: known.out ?? stop.out }
  return stops.map((s) => (s === known ? both : s))
}

const planOf = (route: Route, from: Uid): Plan => ({
  wires: route.wires,
  sound: route.stops,
  settings: route.settings,
  from,
  most: route.most,
  leant: route.leant,
})
