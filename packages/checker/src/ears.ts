import { inputsOf, type Give, type Jack, type Key } from '@coaxwain/models'
import type { PortRef, Uid } from '@coaxwain/shelf'
import type { Circuit, Sound } from '@coaxwain/signal'
import { Stage, type Bench } from './bench'
import { ownSound } from './giving'

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

const SILENT: Pair = { l: NOTHING, r: NOTHING }

const mixed = (pairs: readonly Pair[]): Pair =>
  pairs.reduce((a, b) => ({ l: add(a.l, b.l), r: add(a.r, b.r) }), SILENT)

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

/** More boxes in a row than any hookup has; ends the walk where sound goes in a ring. */
const MOST_WIRES = 12

/** Follows sound from the source over wires and through functions, by what each wire carries. */
export class Ears {
  /** Sound inside the picture signal as it enters a function, by unit. */
  private readonly riding = new Map<Uid, { fn: Key; pair: Pair }>()
  /** What has been followed already, so that rings and parallel ways cost no more than once. */
  private readonly known = new Map<string, Channels>()

  constructor(private readonly bench: Bench) {}

  /** Notes what of the sound in the picture signal a function hears. */
  hearsPicture({ unit, fn }: Stage, sound: Sound): void {
    this.known.clear()
    this.riding.set(unit, { fn: fn.key, pair: pairOf(sound) })
  }

  /** Sound that a function has to work with: from its sound inputs, and out of the picture signal. */
  enters(stage: Stage, depth = 0): Pair {
    const { unit, device, fn } = stage
    const wired = inputsOf(fn)
      .flatMap((key) => device.jacks.filter((j) => j.key === key && j.form === 'sound'))
      .filter((jack) => stage.holds(fn.optional?.find((o) => o.jack === jack.key)?.while))
      .map((jack) => this.into(unit, jack, depth))
    const rides = this.riding.get(unit)
    return mixed([...wired, ...(rides?.fn === fn.key ? [rides.pair] : [])])
  }

  /** Both ways of a sound input, as its links feed it. */
  private into(unit: Uid, jack: Jack, depth: number): Pair {
    const on = (circuit: Circuit): Channels => {
      const contact = jack.contacts.find((c) => c.circuit === circuit)
      return contact ? this.wire({ unit, port: contact.port }, circuit, depth) : NOTHING
    }
    const mono = on('audio-mono')
    return { l: add(on('audio-l'), mono), r: add(on('audio-r'), mono) }
  }

  private wire(to: PortRef, circuit: Circuit, depth: number): Channels {
    if (depth > MOST_WIRES) return NOTHING
    const name = `${to.unit} ${to.port} ${circuit} ${depth}`
    const carried = this.known.get(name) ?? this.follow(to, circuit, depth)
    this.known.set(name, carried)
    return carried
  }

  private follow(to: PortRef, circuit: Circuit, depth: number): Channels {
    return this.bench.hookup.links
      .filter((l) => l.to.unit === to.unit && l.to.port === to.port)
      .flatMap((l) =>
        l.circuits
          .filter((c) => c.to === circuit)
          .map((c) => this.leaves(l.from, c.from, depth + 1)),
      )
      .reduce(add, NOTHING)
  }

  private leaves({ unit, port }: PortRef, circuit: Circuit, depth: number): Channels {
    const jacks = (this.bench.view.device(unit)?.jacks ?? []).filter(
      (j) =>
        j.dir === 'out' &&
        j.form === 'sound' &&
        j.contacts.some((c) => c.port === port && c.circuit === circuit),
    )
    const { l, r } = mixed(jacks.map((jack) => this.given(unit, jack.key, depth)))
    if (circuit === 'audio-l') return l
    return circuit === 'audio-r' ? r : add(l, r)
  }

  private given(unit: Uid, jack: Key, depth: number): Pair {
    const { source } = this.bench.question
    const functions = this.bench.view.device(unit)?.functions ?? []
    return mixed(
      functions
        .filter((fn) => unit !== source.unit || fn.key === source.playing)
        .flatMap((fn) => Stage.of(this.bench, unit, fn.key) ?? [])
        .flatMap((stage) =>
          stage.fn.gives
            .filter((g) => g.jack === jack && g.sound !== undefined)
            .filter((g) => stage.acts() && stage.holds(g.while))
            .map((g) => this.through(stage, g, depth)),
        ),
    )
  }

  private through(stage: Stage, give: Give, depth: number): Pair {
    const { source, material } = this.bench.question
    if (stage.unit === source.unit) return pairOf(ownSound(stage.fn, material))
    const inside = this.enters(stage, depth)
    if (give.sound !== 'mono') return inside
    const all = add(inside.l, inside.r)
    return { l: all, r: all }
  }
}
