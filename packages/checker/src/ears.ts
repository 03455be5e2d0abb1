import { inputsOf, type Give, type Jack, type Key, type ModelFunction } from '@coaxwain/models'
import type { Question, Uid } from '@coaxwain/shelf'
import { isPictureForm, type Circuit, type Sound } from '@coaxwain/signal'
import { ownSound, settled, type Bench } from './flow'

/** Which of the source's two channels are in a wire. A mono source puts both into one. */
export interface Channels {
  readonly left: boolean
  readonly right: boolean
}

const NOTHING: Channels = { left: false, right: false }
const BOTH: Channels = { left: true, right: true }

const add = (a: Channels, b: Channels): Channels => ({
  left: a.left || b.left,
  right: a.right || b.right,
})

/** The content of the left and of the right way at one place. */
export interface Pair {
  readonly l: Channels
  readonly r: Channels
}

export const SILENT: Pair = { l: NOTHING, r: NOTHING }

/** What two ways amount to. */
export function soundOf({ l, r }: Pair): Sound {
  const all = add(l, r)
  if (!all.left && !all.right) return 'none'
  if (!all.left || !all.right) return 'half'
  const apart = l.left && !l.right && r.right && !r.left
  return apart ? 'stereo' : 'mono'
}

/** A pair that carries a sound of a kind, as a source or a carrier makes it. */
export function pairOf(sound: Sound): Pair {
  switch (sound) {
    case 'none':
      return SILENT
    case 'half':
      return { l: { left: true, right: false }, r: { left: true, right: false } }
    case 'mono':
      return { l: BOTH, r: BOTH }
    case 'stereo':
      return { l: { left: true, right: false }, r: { left: false, right: true } }
  }
}

/** Follows sound from the source over wires and through functions, by what each wire carries. */
export class Ears {
  /** Sound inside the picture signal as it enters a stop, by unit. */
  readonly riding = new Map<Uid, { fn: Key; pair: Pair }>()

  constructor(
    private readonly bench: Bench,
    private readonly question: Question,
  ) {}

  /** Both ways of a sound input, as its links feed it. */
  into(unit: Uid, jack: Jack, depth = 0): Pair {
    const mono = this.wire(unit, jack, 'audio-mono', depth)
    const l = add(this.wire(unit, jack, 'audio-l', depth), mono)
    const r = add(this.wire(unit, jack, 'audio-r', depth), mono)
    return { l, r }
  }

  private wire(unit: Uid, jack: Jack, circuit: Circuit, depth: number): Channels {
    const contact = jack.contacts.find((c) => c.circuit === circuit)
    if (!contact || depth > 12) return NOTHING
    return this.bench.hookup.links
      .filter((l) => l.to.unit === unit && l.to.port === contact.port)
      .flatMap((l) => l.circuits.filter((c) => c.to === circuit).map((c) => ({ l, c })))
      .map(({ l, c }) => this.out(l.from.unit, l.from.port, c.from, depth + 1))
      .reduce(add, NOTHING)
  }

  private out(unit: Uid, port: Key, circuit: Circuit, depth: number): Channels {
    const device = this.bench.view.device(unit)
    const jacks = (device?.jacks ?? []).filter(
      (j) =>
        j.dir === 'out' &&
        j.form === 'sound' &&
        j.contacts.some((c) => c.port === port && c.circuit === circuit),
    )
    const pairs = jacks.map((jack) => this.given(unit, jack.key, depth))
    const pair = pairs.reduce<Pair>((a, b) => ({ l: add(a.l, b.l), r: add(a.r, b.r) }), SILENT)
    if (circuit === 'audio-l') return pair.l
    return circuit === 'audio-r' ? pair.r : add(pair.l, pair.r)
  }

  private given(unit: Uid, jack: Key, depth: number): Pair {
    const device = this.bench.view.device(unit)
    if (!device) return SILENT
    const { source, material } = this.question
    if (unit === source.unit) {
      const fn = device.functions.find((f) => f.key === source.playing)
      const give = fn?.gives.find((g) => g.jack === jack && g.sound !== undefined)
      return fn && give && this.open(unit, fn, give) ? pairOf(ownSound(fn, material)) : SILENT
    }
    return device.functions
      .flatMap((fn) =>
        fn.gives
          .filter((g) => g.jack === jack && g.sound !== undefined)
          .map((give) => ({ fn, give })),
      )
      .filter(({ fn, give }) => this.open(unit, fn, give))
      .map(({ fn, give }) => this.through(unit, fn, give, depth))
      .reduce<Pair>((a, b) => ({ l: add(a.l, b.l), r: add(a.r, b.r) }), SILENT)
  }

  private open(unit: Uid, fn: ModelFunction, give: Give): boolean {
    const quiet = { ...this.bench, found: [] }
    return settled(quiet, unit, fn.while) && settled(quiet, unit, give.while)
  }

  private through(unit: Uid, fn: ModelFunction, give: Give, depth: number): Pair {
    const inside = this.enters(unit, fn, depth)
    if (give.sound !== 'mono') return inside
    const all = add(inside.l, inside.r)
    return { l: all, r: all }
  }

  /** Sound that a function has to work with: from its sound inputs, and out of the picture signal. */
  enters(unit: Uid, fn: ModelFunction, depth = 0): Pair {
    const device = this.bench.view.device(unit)
    const quiet = { ...this.bench, found: [] }
    const wired = inputsOf(fn)
      .flatMap((key) => device?.jacks.filter((j) => j.key === key && j.form === 'sound') ?? [])
      .filter((jack) => {
        const optional = fn.optional?.find((o) => o.jack === jack.key)
        return !optional || settled(quiet, unit, optional.while)
      })
      .map((jack) => this.into(unit, jack, depth))
    const rides = this.riding.get(unit)
    const embedded = rides?.fn === fn.key ? [rides.pair] : []
    return [...wired, ...embedded].reduce<Pair>(
      (a, b) => ({ l: add(a.l, b.l), r: add(a.r, b.r) }),
      SILENT,
    )
  }
}

export const isPictureJack = (jack: Jack): boolean => isPictureForm(jack.form)
