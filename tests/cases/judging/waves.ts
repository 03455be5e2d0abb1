import {
  stated,
  type CaseDoes,
  type CaseHop,
  type CaseMode,
  type CasePort,
  type CaseRf,
  type CaseTuner,
  type CaseUnit,
} from '../form'
import { channelsOfPlan } from '../translate'
import { followed, portName, unitOf, type Bench, type Stand } from './bench'
import {
  formOfSignal,
  isSound,
  lineKhz,
  passesPicture,
  rankOf,
  sameSound,
  scansOfSystem,
  type WordForm,
} from './facts'

/** A carrier on a lead. */
export interface Carrier {
  readonly mhz: number
  readonly system: string
  readonly sound: string
}

/** A picture at one point of a chain. */
export interface Wave {
  readonly form: WordForm
  readonly poorest: WordForm
  readonly scan: string
  readonly colour: string
  readonly shape: string
  readonly carrier: Carrier | null
  /** Lines made anew on the way. */
  readonly made: boolean
  /** The sound inside comes out of the tuner that received it. */
  readonly heard: boolean
}

const poorer = (a: WordForm, b: WordForm): WordForm => (rankOf(a) <= rankOf(b) ? a : b)

const PARTS: readonly (readonly [lead: string, ...others: string[]])[] = [
  ['ypbpr-y', 'ypbpr-pb', 'ypbpr-pr'],
  ['luma', 'chroma'],
  ['rgb-g', 'rgb-r', 'rgb-b'],
]

/** Signals that are only part of a picture, by the one that leads. */
const FOLLOWERS = new Set(PARTS.flatMap(([, ...others]) => others))

const PLAIN: Readonly<Record<string, readonly string[]>> = {
  component: ['ypbpr', 'mono'],
  rgb: ['rgb', 'mono'],
  rgbi: ['rgbi', 'mono'],
  digital: ['digital'],
}

/** A mode of another form on the same port says nothing of this one. */
const colourFits = (form: WordForm | undefined, colour: string): boolean =>
  form !== undefined && PLAIN[form]
    ? PLAIN[form].includes(colour)
    : !['ypbpr', 'rgb', 'rgbi', 'digital'].includes(colour)

/** Works out, for one way of standing, what comes through every connection of an answer. */
export class Waves {
  constructor(
    private readonly bench: Bench,
    private readonly stand: Stand,
  ) {}

  /** What the display shows by the connections that reach it; the best there is, or null. */
  shown(): { wave: Wave; colour: boolean } | null {
    const into = this.bench.watched.filter((h) => unitOf(h.to) === 'display')
    const display = this.bench.question.display
    const seen = this.leads(into)
      .filter((h) => this.isOpen(h.to))
      .flatMap((h) => this.through(h, 'display').flatMap((w) => this.taken(w, h, 'display')))
      .filter((w) => this.follows(w.scan))
      .map((wave) => ({ wave, colour: wave.colour !== 'mono' && display.kind !== 'crt-mono' }))
    return seen.sort((a, b) => this.worth(b) - this.worth(a))[0] ?? null
  }

  private worth({ wave, colour }: { wave: Wave; colour: boolean }): number {
    return (colour ? 100 : 0) + rankOf(wave.poorest) * 2 + (wave.heard ? 1 : 0)
  }

  private follows(scan: string): boolean {
    const { deflection } = this.bench.question.display
    const khz = lineKhz(scan)
    return deflection
      ? deflection.lineKhz.some(([low, high]) => khz >= low - 0.02 && khz <= high + 0.02)
      : true
  }

  private isOpen(ref: string): boolean {
    return this.stand.holds(unitOf(ref), this.bench.port(ref)?.when)
  }

  /** Of connections into one unit those that lead a picture: whole ones, and the first of those in parts. */
  private leads(hops: readonly CaseHop[]): CaseHop[] {
    const signals = hops.map((h) => h.signal)
    return hops.filter(
      (h) =>
        formOfSignal(h.signal) !== undefined &&
        !(
          FOLLOWERS.has(h.signal) &&
          PARTS.some(([l, ...o]) => o.includes(h.signal) && signals.includes(l))
        ),
    )
  }

  /** The picture that arrives by a connection and those that go with it; luma alone where parts are missing. */
  through(lead: CaseHop, unit: string): Wave[] {
    const waves = this.leaving(lead.from, lead.signal)
    const parts = PARTS.find(([first]) => first === lead.signal)
    if (!parts) return waves
    const beside = this.bench.watched.filter((h) => unitOf(h.to) === unit)
    const multi = this.bench.port(lead.to)?.signals ?? []
    const has = (signal: string): boolean =>
      beside.some((h) => h.signal === signal) || multi.includes(signal)
    if (parts.every(has)) return lead.signal === 'rgb-g' && !this.synced(unit, beside) ? [] : waves
    return lead.signal === 'rgb-g'
      ? []
      : waves.map((w) => ({ ...w, poorest: 'luma-only', colour: 'mono' }))
  }

  /** RGB in parts needs sync: from the port that the unit says, else by any sync or composite wire. */
  private synced(id: string, into: readonly CaseHop[]): boolean {
    const unit = this.bench.unit(id)
    const said = [
      ...stated(unit?.syncFrom),
      ...(unit?.ports ?? []).flatMap((p) => stated(p.syncFrom)),
    ].filter((s) => this.stand.holds(id, s.when))
    const onGreen = into.some((h) => this.bench.port(h.from)?.signals.includes('rgb-sog'))
    if (said.length > 0)
      return (
        said.some((s) => into.some((h) => portName(h.to) === s.value)) &&
        (onGreen || into.some(isSync))
      )
    return onGreen || into.some(isSync)
  }

  /** What leaves a port as one signal. */
  private leaving(from: string, signal: string): Wave[] {
    const id = unitOf(from)
    const unit = this.bench.unit(id)
    const port = this.bench.port(from)
    if (!unit || !port || !this.isOpen(from)) return []
    const into = this.bench.watched.filter(
      (h) => unitOf(h.to) === id && this.edges(id, h.to, from).length > 0,
    )
    const passed = this.leads(into).flatMap((h) =>
      this.edges(id, h.to, from).flatMap(({ how }) =>
        this.through(h, id).flatMap((w) =>
          how === 'loop'
            ? [w]
            : this.taken(w, h, id).flatMap((t) => this.given(t, h, from, signal)),
        ),
      ),
    )
    return id === 'source' && passed.length === 0 ? this.played(unit, port, signal) : passed
  }

  private edges(id: string, from: string, to: string): CaseDoes[] {
    return (this.bench.unit(id)?.does ?? []).filter(
      (d) => d.from === portName(from) && d.to === portName(to) && this.stand.holds(id, d.when),
    )
  }

  /** The modes of a port that hold for a signal now. */
  private modes(id: string, port: CasePort, signal: string): CaseMode[] {
    const form = formOfSignal(signal)
    return (port.modes ?? []).filter(
      (m) =>
        (!m.signals || m.signals.includes(signal)) &&
        colourFits(form, m.colour) &&
        this.stand.holds(id, m.when),
    )
  }

  private played(unit: CaseUnit, port: CasePort, signal: string): Wave[] {
    const recorded = unit.content?.scans
    const serves = (m: CaseMode): boolean =>
      !recorded || m.converts === true || recorded.includes(m.scan)
    const form = formOfSignal(signal) ?? 'none'
    const shape = this.shape(unit, port)
    const wave = (m: { scan: string; colour: string }): Wave => ({
      form,
      poorest: form,
      scan: m.scan,
      colour: m.colour,
      shape,
      carrier: null,
      made: false,
      heard: true,
    })
    if (signal === 'rf' && port.rf) return this.playedByRf(port, unit, wave)
    const own = this.modes('source', port, signal).filter(serves)
    const elsewhere = unit.ports.flatMap((p) => this.modes('source', p, signal)).filter(serves)
    return (port.modes ? own : elsewhere).map(wave)
  }

  private playedByRf(
    port: CasePort,
    unit: CaseUnit,
    wave: (m: { scan: string; colour: string }) => Wave,
  ): Wave[] {
    const rf = this.rfNow('source', port.rf as CaseRf)
    const carrier = this.carrier('source', rf)
    const known = unit.ports
      .flatMap((p) => this.modes('source', p, 'composite'))
      .filter((m) => scansOfSystem(rf.system).includes(m.scan))
    const scans = known.length > 0 ? known.map((m) => m.scan) : scansOfSystem(rf.system)
    const recorded = unit.content?.scans
    return [...new Set(scans)]
      .filter((s) => !recorded || recorded.includes(s))
      .flatMap((scan) => rf.colour.map((colour) => ({ ...wave({ scan, colour }), carrier })))
  }

  private shape(unit: CaseUnit, port: CasePort): string {
    const said = [...stated(port.shape), ...stated(unit.shape)].filter((s) =>
      this.stand.holds('source', s.when),
    )
    return typeof said[0]?.value === 'string' ? said[0].value : ''
  }

  /** What an input makes of a picture: itself, in grey, or nothing. */
  private taken(wave: Wave, hop: CaseHop, id: string): Wave[] {
    const port = this.bench.port(hop.to)
    if (!port) return []
    if (port.tuner && wave.form === 'rf') return this.tuned(wave, id, port)
    const listed = this.modes(id, port, hop.signal)
    if ((port.modes ?? []).length === 0) return [wave]
    const volts = this.voltsAt(hop)
    const modes = listed.filter((m) => (m.needs ?? []).every((v) => volts.includes(v)))
    const same = modes.filter((m) => m.scan === wave.scan)
    if (same.some((m) => m.colour === wave.colour)) return [wave]
    const encoded = wave.form === 'composite' || wave.form === 's-video'
    if (same.length === 0) return []
    return encoded || wave.colour === 'mono' || same.some((m) => m.colour === 'mono')
      ? [{ ...wave, colour: 'mono' }]
      : []
  }

  /** Switching voltages that arrive by a connection: of the output through full leads, or of a lead. */
  private voltsAt(hop: CaseHop): string[] {
    const from = this.bench.port(hop.from)
    const leads = hop.by.map((b) => this.bench.pieces.get(typeof b === 'string' ? b : b.id))
    const own = leads.flatMap((l) =>
      (l?.volts ?? []).map((v) => (typeof v === 'string' ? v : v.volt)),
    )
    if (leads.some((l) => l?.wired ?? l?.carries)) return own
    const given = (from?.volts ?? [])
      .map((v) => (typeof v === 'string' ? { volt: v, when: undefined } : v))
      .filter((v) => this.stand.holds(unitOf(hop.from), v.when))
    return [...own, ...given.map((v) => v.volt)]
  }

  /** What leaves by a port of a box when a picture has been taken. */
  private given(wave: Wave, hop: CaseHop, to: string, signal: string): Wave[] {
    const id = unitOf(to)
    const port = this.bench.port(to) as CasePort
    const form = formOfSignal(signal) ?? 'none'
    const plain = { ...wave, form, poorest: poorer(wave.poorest, form) }
    if (form === 'rf' && port.rf) return this.modulated(plain, id, port, hop)
    if (form === 'rf') return [plain]
    const modes = this.modes(id, port, signal)
    const bare = { ...plain, carrier: null }
    if (modes.length === 0) return (port.modes ?? []).length > 0 ? [] : [bare]
    const sameScan = modes.filter((m) => m.scan === wave.scan)
    const equal = sameScan.filter((m) => m.colour === wave.colour)
    const offered = equal.length > 0 ? equal : sameScan.length > 0 ? sameScan : modes
    return offered.map((m) => ({
      ...bare,
      scan: m.scan,
      colour: wave.colour === 'mono' ? 'mono' : m.colour,
      made: wave.made || m.scan !== wave.scan,
    }))
  }

  private modulated(wave: Wave, id: string, port: CasePort, hop: CaseHop): Wave[] {
    const rf = this.rfNow(id, port.rf as CaseRf)
    const scans = scansOfSystem(rf.system)
    const converts = (this.bench.port(hop.to)?.modes ?? []).length > 0
    const fits = scans.includes(wave.scan)
    if (!fits && !converts) return []
    const colour = rf.colour.includes(wave.colour) ? wave.colour : (rf.colour[0] ?? 'mono')
    return [
      {
        ...wave,
        scan: fits ? wave.scan : (scans[0] as string),
        colour: wave.colour === 'mono' ? 'mono' : fits ? wave.colour : colour,
        made: wave.made || !fits,
        carrier: this.carrier(id, rf),
      },
    ]
  }

  rfNow(id: string, rf: CaseRf): CaseRf {
    const variant = (rf.variants ?? []).find((v) => this.stand.holds(id, v.when))
    return variant ? { ...rf, ...variant } : rf
  }

  private tunerNow(id: string, tuner: CaseTuner): CaseTuner {
    return (tuner.variants ?? [])
      .filter((v) => this.stand.holds(id, v.when))
      .reduce<CaseTuner>((t, v) => ({ ...t, ...v }), tuner)
  }

  private carrier(id: string, rf: CaseRf): Carrier | null {
    const [set] = rf.control === undefined ? [] : this.bench.settingsFor(id, rf.control)
    const name = rf.control === undefined ? rf.channels[0] : set?.to
    const channel = channelsOfPlan(rf.plan).find((c) => c.name === name)
    if (!channel || !rf.channels.includes(channel.name)) return null
    return { mhz: channel.mhz, system: rf.system, sound: rf.sound ?? 'mono' }
  }

  /** The vision carrier that a unit puts out, where it puts out one. */
  private sentBy(id: string): number | undefined {
    const ports = this.bench.unit(id)?.ports.filter((p) => p.rf) ?? []
    return ports.flatMap((p) => this.carrier(id, this.rfNow(id, p.rf as CaseRf))?.mhz ?? [])[0]
  }

  private tuned(wave: Wave, id: string, port: CasePort): Wave[] {
    const { carrier } = wave
    const tuner = this.tunerNow(id, port.tuner as CaseTuner)
    if (!carrier || !this.isTunedTo(id, tuner, carrier.mhz)) return []
    if (!tuner.systems.some((s) => passesPicture(s, carrier.system))) return []
    if (!tuner.scans.includes(wave.scan)) return []
    const colour = tuner.colours.includes(wave.colour) ? wave.colour : 'mono'
    const heard = tuner.systems.some((s) => sameSound(s, carrier.system))
    return [{ ...wave, colour, heard: wave.heard && heard }]
  }

  private isTunedTo(id: string, tuner: CaseTuner, mhz: number): boolean {
    const channels = tuner.plans.flatMap((p) => channelsOfPlan(p))
    const near = (at: number | undefined): boolean => at !== undefined && Math.abs(at - mhz) <= 0.3
    if (!channels.some((c) => near(c.mhz))) return false
    const given = tuner.control === undefined ? [] : this.bench.settingsFor(id, tuner.control)
    return given.some(({ to }) => {
      const as = followed(to)
      return as === undefined
        ? channels.some((c) => c.name === to && near(c.mhz))
        : near(this.sentBy(as))
    })
  }
}

const isSync = ({ signal }: CaseHop): boolean => signal === 'sync' || signal === 'composite'

export const carriesSound = ({ signal }: CaseHop): boolean => isSound(signal)
