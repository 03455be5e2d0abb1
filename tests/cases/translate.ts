import type {
  AcceptRow,
  AutoCause,
  Condition,
  Control,
  ControlRole,
  DeviceModel,
  DisplayFacts,
  Give,
  Jack,
  ModelFunction,
  OptionalInput,
  PictureGive,
  PieceModel,
  Plug,
  Port,
  PortCircuit,
  RfGive,
  Wire,
} from '@coaxwain/models'
import { POWER_KEY } from '@coaxwain/models'
import type { OffAir, Question, Snapshot, Unit } from '@coaxwain/shelf'
import {
  channelsIn,
  CONNECTOR_FACTS,
  familyOf,
  FORM_CIRCUITS,
  isSingle,
  nominalFieldHz,
  type Circuit,
  type Colour,
  type Connector,
  type ConnectorFamily,
  type DigitalSystem,
  type Form,
  type PlanId,
  type PlanPart,
  type Protection,
  type RfSystemId,
  type ScanId,
  type SwitchVolt,
} from '@coaxwain/signal'
import { withImplied } from './implied'
import {
  isPiece,
  PICTURE_CIRCUITS,
  stated,
  type CaseControl,
  type CaseDoes,
  type CaseMode,
  type CasePiece,
  type CasePort,
  type CaseQuestion,
  type CaseTuner,
  type CaseUnit,
  type Stated,
  type When,
} from './form'

/** A case in the product's own types. Ids of units, ports, controls and leads stay the case's own. */
export interface Translated {
  readonly snapshot: Snapshot
  readonly question: Question
}

export const SOURCE = 'source'
export const DISPLAY = 'display'
const PLAYS = 'plays'

// ---------------------------------------------------------------- words of the form

const CIRCUITS_OF: Readonly<Record<string, readonly Circuit[]>> = {
  ...PICTURE_CIRCUITS,
  'ac3-rf': ['ac3-rf'],
  'digital-audio': ['spdif'],
  'audio-l': ['audio-l'],
  'audio-r': ['audio-r'],
  'audio-mono': ['audio-mono'],
}

/** Signals that are a whole form on one port. */
const WHOLE_FORMS: Readonly<Record<string, Form>> = {
  composite: 'composite',
  's-video': 's-video',
  'rgb-cs': 'rgbs',
  'rgb-hv': 'rgbhv',
  'rgb-sog': 'rgsb',
  rgbi: 'rgbi',
  'mono-ttl': 'ttl-mono',
  hdmi: 'hdmi',
  dvi: 'dvi',
  rf: 'rf',
  'ac3-rf': 'ac3-rf',
  'digital-audio': 'digital-sound',
}

/** Forms over several ports: the signal of each, the first being the one whose modes count. */
const SPLIT_FORMS: readonly {
  form: Form
  signals: readonly string[]
  maybe?: readonly string[]
}[] = [
  { form: 'component', signals: ['ypbpr-y', 'ypbpr-pb', 'ypbpr-pr'] },
  { form: 's-video', signals: ['luma', 'chroma'] },
  { form: 'rgbs', signals: ['rgb-g', 'rgb-r', 'rgb-b', 'sync'] },
  { form: 'rgsb', signals: ['rgb-g', 'rgb-r', 'rgb-b'] },
]

const PLAN_PARTS: Readonly<Record<string, PlanPart>> = {
  'us-air': { plan: 'us-broadcast', names: '2..83' },
  'us-air-vhf': { plan: 'us-broadcast', names: '2..13' },
  'us-air-uhf': { plan: 'us-broadcast', names: '14..83' },
  'us-cable': { plan: 'us-cable-std' },
  'uk-uhf': { plan: 'uk-uhf' },
  'uk-405': { plan: 'uk-405' },
  'ccir-vhf': { plan: 'ccir-west-europe', names: 'E2..E12' },
  'ccir-uhf': { plan: 'ccir-west-europe', names: '21..69' },
  'au-vhf': { plan: 'australia', names: '0..5,5A,6..11' },
  'au-uhf': { plan: 'australia', names: '28..69' },
  au: { plan: 'australia' },
  'jp-vhf': { plan: 'japan-broadcast', names: '1..12' },
  'jp-uhf': { plan: 'japan-broadcast', names: '13..62' },
  jp: { plan: 'japan-broadcast' },
  'fr-uhf': { plan: 'france', names: '21..69' },
}

const PREFIXED: Partial<Record<PlanId, string>> = { 'ccir-west-europe': 'E', 'uk-405': 'B' }

/** A channel of a case by the name that the product's own plan gives it. */
function ownName(plan: string, channel: string): string {
  const part = planPart(plan)
  const vhf = plan.endsWith('vhf') || plan === 'uk-405'
  const prefix = vhf ? (PREFIXED[part.plan] ?? '') : ''
  return prefix && /^\d/.test(channel) ? prefix + channel : channel
}

function planPart(plan: string): PlanPart {
  const [name = '', span] = plan.split(':')
  const part = PLAN_PARTS[name]
  if (!part) throw new Error(`unknown plan ${plan}`)
  if (span === undefined) return part
  const [from = '', to = ''] = span.split('-')
  return { plan: part.plan, names: `${ownName(name, from)}..${ownName(name, to)}` }
}

/** A channel of a case in the product's own plan. */
export const caseChannel = (plan: string, channel: string): { plan: PlanId; name: string } => ({
  plan: planPart(plan).plan,
  name: ownName(plan.split(':')[0] ?? plan, channel),
})

/** Channels of a plan of the form, by the case's own names, with their vision carriers. */
export function channelsOfPlan(plan: string): { name: string; mhz: number }[] {
  const prefix = ownName(plan.split(':')[0] ?? plan, '1').slice(0, -1)
  return channelsIn(planPart(plan)).flatMap((c) =>
    c.visionMhz === null ? [] : [{ name: c.name.slice(prefix.length), mhz: c.visionMhz }],
  )
}

const DIGITAL: Readonly<Record<string, DigitalSystem>> = {
  '8vsb': 'atsc',
  atsc: 'atsc',
  qam: 'qam',
  'dvb-t': 'dvb-t',
  'isdb-t': 'isdb-t',
}

/** `power` is the implicit control of every unit; one that a case lists itself goes by another key. */
export const controlKey = (name: string): string => (name === POWER_KEY ? 'power switch' : name)

const condition = (when: When | undefined): Condition =>
  Object.entries(when ?? {}).map(([control, positions]) => ({
    control: controlKey(control),
    in: positions,
  }))

const both = (...all: (When | undefined)[]): Condition => all.flatMap((w) => condition(w))

// ---------------------------------------------------------------- ports and jacks

interface CaseJack {
  readonly jack: Jack
  readonly ports: readonly CasePort[]
  /** The signal whose modes count. */
  readonly lead: string
  readonly when: When | undefined
}

const sides = (port: CasePort): ('in' | 'out')[] =>
  port.dir === 'both' ? ['in', 'out'] : [port.dir]

const sameWhen = (a: CasePort, b: CasePort): boolean =>
  JSON.stringify(a.when ?? {}) === JSON.stringify(b.when ?? {})

/** What holds while both hold; null where they cannot hold at once. */
function bothHold(a: When | undefined, b: When | undefined): When | null {
  const joined: Record<string, readonly string[]> = { ...a }
  for (const [control, positions] of Object.entries(b ?? {})) {
    const before = joined[control]
    const left = before ? positions.filter((p) => before.includes(p)) : positions
    if (left.length === 0) return null
    joined[control] = left
  }
  return joined
}

const allHold = (whens: readonly (When | undefined)[]): When | null =>
  whens.reduce<When | null>((all, when) => all && bothHold(all, when), {})

function wholeJacks(port: CasePort, dir: 'in' | 'out'): CaseJack[] {
  return port.signals.flatMap((signal): CaseJack[] => {
    const form = WHOLE_FORMS[signal]
    if (!form) return []
    const contacts = (CIRCUITS_OF[signal] ?? []).map((circuit) => ({ circuit, port: port.id }))
    return [
      {
        jack: { key: `${port.id} ${signal} ${dir}`, form, dir, contacts },
        ports: [port],
        lead: signal,
        when: port.when,
      },
    ]
  })
}

/** Where a monitor says from which port it takes its sync. */
const syncFacts = (unit: CaseUnit) => [
  ...stated(unit.syncFrom),
  ...unit.ports.flatMap((p) => stated(p.syncFrom)),
]

/** While this holds the sync of RGB is taken from the ports of a jack; null where it never is. */
function syncStands(unit: CaseUnit, form: Form, ports: readonly CasePort[]): When | null {
  const said = syncFacts(unit)
  if (said.length === 0 || !['rgbs', 'rgsb'].includes(form)) return {}
  const wire = form === 'rgbs' ? ports.at(-1) : ports[0]
  const own = said.find((s) => s.value === wire?.id)
  return own ? (own.when ?? {}) : null
}

/** RGB with a sync wire of its own is no RGB with sync on green, unless the unit can be told so. */
const isSyncedApart = (unit: CaseUnit, made: readonly CaseJack[], lead: CasePort): boolean =>
  syncFacts(unit).length === 0 && made.some((m) => m.jack.form === 'rgbs' && m.ports[0] === lead)

/** Forms over several ports: the n-th port of each signal goes with the n-th of the others. */
function splitJacks(unit: CaseUnit, dir: 'in' | 'out'): CaseJack[] {
  const ports = unit.ports.filter((p) => sides(p).includes(dir))
  const made: CaseJack[] = []
  for (const { form, signals } of SPLIT_FORMS) {
    const [first = '', ...rest] = signals
    const firsts = ports.filter((p) => p.signals.includes(first))
    firsts.forEach((lead, n) => {
      const others = rest.map((signal) => {
        const with_ = ports.filter((p) => p.signals.includes(signal))
        const alike = with_.filter((p) => sameWhen(p, lead))
        return alike.length > 0 && alike.length < with_.length ? alike[0] : with_[n]
      })
      if (others.some((p) => p === undefined)) return
      const all = [lead, ...(others as CasePort[])]
      const sync = syncStands(unit, form, all)
      const when = sync && allHold([...all.map((p) => p.when), sync])
      if (!when || (form === 'rgsb' && isSyncedApart(unit, made, lead))) return
      made.push({
        jack: {
          key: `${all.map((p) => p.id).join('+')} ${form} ${dir}`,
          form,
          dir,
          contacts: signals.flatMap((signal, i) =>
            (CIRCUITS_OF[signal] ?? []).map((circuit) => ({ circuit, port: all[i]!.id })),
          ),
        },
        ports: all,
        lead: first,
        when,
      })
    })
  }
  return made
}

const hasSound = (port: CasePort, signal: string): boolean => port.signals.includes(signal)

/** The track that is wanted of a source that plays two programmes. */
function wantedTrack(unit: CaseUnit): string | undefined {
  const { tracks, wanted } = unit.content ?? {}
  const inside =
    tracks && typeof tracks === 'object' ? (tracks as { wanted?: unknown }).wanted : undefined
  const named = wanted ?? inside
  return typeof named === 'string' ? named : undefined
}

/** Of two programmes only the wanted one is sound; a port that carries the other is none for this question. */
function trackJacks(unit: CaseUnit, wanted: string): CaseJack[] {
  return unit.ports.flatMap((port) => {
    const isSound = port.signals.some((s) => s.startsWith('audio-'))
    if (!isSound || port.dir === 'in') return []
    const said = stated(port.tracks)
    const own = said.length === 0 ? [{ when: undefined }] : said.filter((s) => s.value === wanted)
    return own.map(({ when }, i) => ({
      jack: {
        key: `${port.id} track ${i}`,
        form: 'sound' as const,
        dir: 'out' as const,
        contacts: [{ circuit: 'audio-mono' as const, port: port.id }],
      },
      ports: [port],
      lead: 'sound',
      when: bothHold(port.when, when) ?? undefined,
    }))
  })
}

/** Sound jacks: left and right that belong together, or one port for all there is. */
function soundJacks(unit: CaseUnit, dir: 'in' | 'out'): CaseJack[] {
  const wanted = wantedTrack(unit)
  if (wanted !== undefined && dir === 'out') return trackJacks(unit, wanted)
  const ports = unit.ports.filter((p) => sides(p).includes(dir))
  const rights = ports.filter(
    (p) => hasSound(p, 'audio-r') && !hasSound(p, 'audio-l') && !hasSound(p, 'audio-mono'),
  )
  const lefts = ports.filter(
    (p) => (hasSound(p, 'audio-l') || hasSound(p, 'audio-mono')) && !whole(p),
  )
  const jack = (all: CasePort[], contacts: Jack['contacts']): CaseJack => ({
    jack: { key: `${all.map((p) => p.id).join('+')} sound ${dir}`, form: 'sound', dir, contacts },
    ports: all,
    lead: 'sound',
    when: all[0]?.when,
  })
  const taken = new Set<CasePort>()
  const pairs = lefts.flatMap((left) => {
    const free = rights.filter((r) => !taken.has(r))
    const right = free.find((r) => sameWhen(r, left)) ?? free[0]
    if (!right || !hasSound(left, 'audio-l'))
      return [jack([left], [{ circuit: 'audio-mono', port: left.id }])]
    taken.add(right)
    return [
      jack(
        [left, right],
        [
          { circuit: 'audio-l', port: left.id },
          { circuit: 'audio-r', port: right.id },
          ...(hasSound(left, 'audio-mono') && dir === 'in'
            ? [{ circuit: 'audio-mono' as const, port: left.id }]
            : []),
        ],
      ),
    ]
  })
  const alone = rights
    .filter((r) => !taken.has(r))
    .map((r) => jack([r], [{ circuit: 'audio-r', port: r.id }]))
  const wholes = ports.filter(whole).map((p) =>
    isSingle(p.connector as Connector)
      ? jack([p], [{ circuit: 'audio-mono', port: p.id }])
      : jack(
          [p],
          [
            { circuit: 'audio-l', port: p.id },
            { circuit: 'audio-r', port: p.id },
          ],
        ),
  )
  return [...pairs, ...alone, ...wholes]
}

/** One port that carries both channels: a multi-way socket, or a mono input that takes either. */
const whole = (port: CasePort): boolean => hasSound(port, 'audio-l') && hasSound(port, 'audio-r')

function jacksOf(unit: CaseUnit): CaseJack[] {
  return (['in', 'out'] as const).flatMap((dir) => {
    const ports = unit.ports.filter((p) => sides(p).includes(dir))
    return [
      ...ports.flatMap((p) => wholeJacks(p, dir)),
      ...splitJacks(unit, dir),
      ...soundJacks(unit, dir),
    ]
  })
}

function portOf(unit: CaseUnit, port: CasePort, jacks: readonly CaseJack[], column: number): Port {
  const circuits = new Map<Circuit, PortCircuit['dir']>()
  for (const { jack } of jacks) {
    for (const contact of jack.contacts.filter((c) => c.port === port.id)) {
      const before = circuits.get(contact.circuit)
      circuits.set(contact.circuit, before && before !== jack.dir ? 'either' : jack.dir)
    }
  }
  const aerial = port.signals.includes('rf')
  return {
    key: port.id,
    label: port.label,
    connector: port.connector as Connector,
    mount: port.mount,
    circuits: [...circuits].map(([circuit, dir]) => ({ circuit, dir })),
    ...(port.ohm === undefined ? {} : { impedanceOhm: port.ohm }),
    origin: 'factory',
    isolated: unit.liveChassis === true && !aerial ? 'no' : 'yes',
    ...directCurrentOf(unit, port),
    ...loadOf(unit, port),
    ...loopOf(unit, port),
    at: { face: 'back', row: 0, column },
  }
}

/** Ports that a fact of a unit names: all of them when it is simply true. */
function namesPort(unit: CaseUnit, fact: Stated, port: CasePort): boolean {
  if (fact === true) return true
  const words = stated(fact).map((s) => String(s.value))
  const named = unit.ports.some((p) => words.includes(p.id))
  return words.includes(port.id) || (words.includes('true') && !named)
}

/** Supply of an aerial's own amplifier when the figure is not stated (common practice, no source). */
const USUAL_SUPPLY_VOLTS = 12

/** Direct current that a port puts on its cable, wants from it, or must not get. */
function directCurrentOf(
  unit: CaseUnit,
  port: CasePort,
): Pick<Port, 'suppliesDcVolts' | 'needsDcVolts' | 'standsDc'> {
  const isRf = port.signals.includes('rf')
  const gives = isRf && namesPort(unit, unit.dcOut, port)
  const volts = port.dcVolts ?? (gives ? USUAL_SUPPLY_VOLTS : 0)
  const isAerial = !unit.ports.some((p) => p.dir !== 'out')
  const wants = isRf && namesPort(unit, unit.needsDc, port)
  return {
    ...(volts === 0 ? {} : { suppliesDcVolts: volts }),
    ...(wants ? { needsDcVolts: USUAL_SUPPLY_VOLTS } : {}),
    standsDc: isRf && isAerial && !wants ? 'no' : 'yes',
  }
}

const is75 = (value: unknown): boolean => value === undefined || /75/.test(String(value))

/** Where a line goes on: said with the port or with the unit, else an output that has the load of the line. */
function loopOf(unit: CaseUnit, port: CasePort): Pick<Port, 'loopsTo'> {
  if (port.dir !== 'in' || port.signals.includes('rf')) return {}
  const own = stated(port.loops ?? (unit.loops as Record<string, unknown> | undefined)?.[port.id])
  const told = own[0]?.value ?? loopEnds(unit, port)
  if (typeof told === 'string') return { loopsTo: told }
  const loaded = (unit.does ?? []).find(
    ({ from, to }) =>
      from === port.id && stated(unit.ports.find((p) => p.id === to)?.load).length > 0,
  )
  return loaded && stated(port.load).length === 0 ? { loopsTo: loaded.to } : {}
}

/** The other end where the loops of a unit are listed as pairs of ports. */
const loopEnds = ({ loops }: CaseUnit, { id }: CasePort): unknown =>
  (Array.isArray(loops) ? (loops as object[]) : [])
    .map((pair) => Object.values(pair) as unknown[])
    .find((pair) => pair.includes(id))
    ?.find((other) => other !== id)

/** The load of a port, or of the socket by which its line would go on. */
function loadStated(unit: CaseUnit, port: CasePort) {
  const loop = unit.ports.find((p) => p.id === loopOf(unit, port).loopsTo)
  return stated(port.load ?? loop?.load)
}

/** How an input ends its line: always, never, or as one control is set. */
function loadOf(unit: CaseUnit, port: CasePort): Pick<Port, 'load'> {
  const said = loadStated(unit, port)
  const ends = said.find((s) => is75(s.value))
  if (said.length === 0) return {}
  const [control, positions] = Object.entries(ends?.when ?? {})[0] ?? []
  const known = unit.settings?.some((c) => c.name === control)
  const position75 = positions?.[0]
  if (control === undefined || position75 === undefined || !known)
    return { load: { kind: ends ? '75' : 'high' } }
  return { load: { kind: 'switch', control: controlKey(control), position75 } }
}

// ---------------------------------------------------------------- controls

const ROLES: Readonly<Record<string, ControlRole>> = {
  input: 'input',
  standard: 'standard',
  scan: 'scan',
  direction: 'direction',
  mode: 'mode',
  termination: 'termination',
  'antenna-plan': 'tuner-plan',
  power: 'power',
  other: 'other',
}

const WAYS: Readonly<Record<string, 'numbers' | 'presets' | 'knob' | 'turret' | 'search'>> = {
  numbers: 'numbers',
  presets: 'presets',
  turret: 'turret',
  dial: 'knob',
  scan: 'search',
}

const isShape = (control: CaseControl): boolean =>
  control.class === 'mode' && (control.choices ?? []).includes('16:9')

function controlOf(unit: CaseUnit, control: CaseControl, plays: readonly ScanId[]): Control[] {
  const base = {
    key: controlKey(control.name),
    label: control.name,
    access: 'front' as const,
    look: 'slide' as const,
  }
  const choices = control.choices ?? []
  switch (control.class) {
    case 'channel':
      return channelControl(unit, control)
    case 'tuned-to':
      return tunedControl(unit, control)
    case 'trim':
      return [
        { ...base, kind: 'trim', quantity: trimQuantity(control), ...standing(control, plays) },
      ]
    case 'auto':
      return [
        {
          ...base,
          kind: 'auto',
          positions: choices.map((key) => ({
            key,
            label: key,
            cause: causeOf(unit, control.movedBy?.[key]),
          })),
        },
      ]
    default:
      return [
        {
          ...base,
          kind: 'positions',
          role: isShape(control) ? 'shape' : (ROLES[control.class] ?? 'other'),
          positions: choices.map((key) => ({ key, label: key })),
        },
      ]
  }
}

type Quantity = 'fine-tuning' | 'video-level' | 'sound-level' | 'vertical-hold' | 'other'

/** By the measure in which it is known how a trimmer stands, else by its name. */
const QUANTITIES: readonly (readonly [told: RegExp, quantity: Quantity])[] = [
  [/fine.?tun/i, 'fine-tuning'],
  [/depth|video.?(level|gain)|percent/i, 'video-level'],
  [/(audio|sound).?level/i, 'sound-level'],
  [/field|\bv(ert(ical)?)?[ .-]*hold/i, 'vertical-hold'],
]

function trimQuantity({ name, now }: CaseControl): Quantity {
  const [measure] = Object.keys(now ?? {})
  const told = [measure, name].flatMap((words) =>
    QUANTITIES.flatMap(([is, quantity]) => (words !== undefined && is.test(words) ? quantity : [])),
  )
  return told[0] ?? 'other'
}

/** How a trimmer stands and how it should: as stated, and for a field rate that of the source. */
function standing(
  control: CaseControl,
  plays: readonly ScanId[],
): { stands?: number; aim?: number } {
  const [stands] = Object.values(control.now ?? {})
  if (stands === undefined) return {}
  const rates = new Set(plays.map(nominalFieldHz))
  const own =
    trimQuantity(control) === 'vertical-hold' && rates.size === 1 ? [...rates][0] : undefined
  const aim = Object.values(control.aim ?? {})[0] ?? own
  return aim === undefined ? { stands } : { stands, aim }
}

/** What moves an automatic control, read from its words. */
function causeOf(unit: CaseUnit, words: string | undefined): AutoCause {
  const port = unit.ports.find(
    (p) => words !== undefined && new RegExp(`\\b${p.id}\\b`).test(words),
  )
  if (!words || !port) return { kind: 'otherwise' }
  if (/volt|dc\b|direct current/i.test(words)) return { kind: 'voltage-at', port: port.id }
  return { kind: /plug/i.test(words) ? 'plug-in' : 'signal-at', port: port.id }
}

function channelControl(unit: CaseUnit, control: CaseControl): Control[] {
  const rf = unit.ports.find((p) => p.rf?.control === control.name)?.rf
  if (!rf) return []
  const part = {
    plan: planPart(rf.plan).plan,
    names: rf.channels.map((c) => ownName(rf.plan, c)).join(','),
  }
  return [
    {
      key: control.name,
      label: control.name,
      access: 'back',
      look: 'slide',
      kind: 'channel',
      carriers: { kind: 'channels', part },
      toleranceMhz: 0.1,
    },
  ]
}

function tunedControl(unit: CaseUnit, control: CaseControl): Control[] {
  const tuners = unit.ports.flatMap((p) => (p.tuner?.control === control.name ? [p.tuner] : []))
  const reaches = tuners.flatMap((tuner) => reachesOf(tuner))
  if (reaches.length === 0) return []
  return [
    {
      key: control.name,
      label: control.name,
      access: 'front',
      look: control.way === 'turret' ? 'knob' : 'push',
      kind: 'tuned-to',
      // A stepless tuner of a case stops on channels only, so that it is judged by the same measure.
      way: WAYS[control.way ?? ''] === 'turret' ? 'turret' : 'numbers',
      reaches,
      pullInMhz: 0.3,
    },
  ]
}

function reachesOf(tuner: CaseTuner): { part: PlanPart; while?: Condition }[] {
  const variants = (tuner.variants ?? []).filter((v) => v.plans)
  if (variants.length === 0) return tuner.plans.map((plan) => ({ part: planPart(plan) }))
  return variants.flatMap((v) =>
    (v.plans ?? []).map((plan) => ({ part: planPart(plan), while: condition(v.when) })),
  )
}

// ---------------------------------------------------------------- functions

const modesFor = (jack: CaseJack): CaseMode[] =>
  (jack.ports[0]?.modes ?? []).filter(
    (m) => (!m.signals || m.signals.includes(jack.lead)) && colourFits(jack.jack.form, m.colour),
  )

/** A mode of another form on the same port says nothing of this one. */
function colourFits(form: Form, colour: string): boolean {
  const plain: Partial<Record<Form, readonly string[]>> = {
    component: ['ypbpr', 'mono'],
    rgbs: ['rgb', 'mono'],
    rgsb: ['rgb', 'mono'],
    rgbhv: ['rgb', 'mono'],
    rgbi: ['rgbi', 'mono'],
    hdmi: ['digital'],
    dvi: ['digital'],
    'ttl-mono': ['mono'],
  }
  const own = plain[form]
  return own ? own.includes(colour) : !['ypbpr', 'rgb', 'rgbi', 'digital'].includes(colour)
}

const colours = (list: readonly string[]): readonly Colour[] | 'any' =>
  list.includes('mono') ? 'any' : (list as Colour[])

function acceptRows(jack: CaseJack): AcceptRow[] {
  const tuner = jack.ports[0]?.tuner
  if (tuner && jack.jack.form === 'rf') return tunerRows(tuner)
  const modes = modesFor(jack)
  if (modes.length === 0) return [{ scans: 'any', colours: 'any' }]
  return modes.map((m) => ({
    scans: [m.scan as ScanId],
    colours: colours([m.colour]),
    while: condition(m.when),
    ...(m.needs ? { volts: m.needs as SwitchVolt[] } : {}),
  }))
}

function tunerRows(tuner: CaseTuner): AcceptRow[] {
  const row = (
    t: Pick<CaseTuner, 'systems' | 'colours' | 'scans' | 'digital'>,
    when?: When,
  ): AcceptRow => ({
    scans: t.scans as ScanId[],
    colours: colours(t.colours),
    systems: t.systems as RfSystemId[],
    digital: t.digital.flatMap((d) => (DIGITAL[d] ? [DIGITAL[d]] : [])),
    while: condition(when),
  })
  const variants = (tuner.variants ?? []).filter((v) => v.systems ?? v.colours ?? v.scans)
  return variants.length > 0 ? variants.map((v) => row({ ...tuner, ...v }, v.when)) : [row(tuner)]
}

/** How wide material is laid out, with what it depends on: of the port, else of the unit. */
function shapesOf(unit: CaseUnit, port: CasePort | undefined) {
  const own = stated(port?.shape)
  return (own.length > 0 ? own : stated(unit.shape)).map((s) => ({
    shape: s.value as NonNullable<PictureGive['shape']>,
    when: s.when,
  }))
}

function pictureRows(unit: CaseUnit, jack: CaseJack, modes: readonly CaseMode[]): PictureGive[] {
  const shapes = shapesOf(unit, jack.ports[0])
  if (modes.length === 0) return [{ scan: 'same', colour: 'same' }]
  return modes.flatMap((m) =>
    (shapes.length > 0 ? shapes : [{ shape: undefined, when: undefined }]).flatMap(
      ({ shape, when }): PictureGive[] => {
        const stands = bothHold(m.when, when)
        if (!stands) return []
        return [
          {
            scan: m.scan as ScanId,
            colour: m.colour as Colour,
            while: condition(stands),
            ...(m.converts ? { converts: true } : {}),
            ...(shape ? { shape } : {}),
          },
        ]
      },
    ),
  )
}

function rfRows(port: CasePort): RfGive[] {
  const { rf } = port
  if (!rf || rf.system === 'digital') return []
  const row = (r: typeof rf, when?: When): RfGive => ({
    channel:
      r.control === undefined
        ? {
            part: {
              plan: planPart(r.plan).plan,
              names: r.channels.map((c) => ownName(r.plan, c)).join(','),
            },
          }
        : { control: r.control },
    system: r.system as RfSystemId,
    colours: r.colour as Colour[],
    sideband: r.sideband === 'vsb' ? 'vestigial' : 'double',
    levelDbmv: r.levelDbmv ?? 6,
    sound: r.sound === 'stereo' ? 'stereo' : r.sound === 'none' ? 'none' : 'mono',
    ...(r.always ? { always: true } : {}),
    while: condition(when),
  })
  return rf.variants?.length ? rf.variants.map((v) => row({ ...rf, ...v }, v.when)) : [row(rf)]
}

interface Volts {
  readonly volts: readonly SwitchVolt[]
  readonly when: When
}

/** What is put on the switching pins, once for each way in which the controls may stand that decide it. */
function voltsOf(unit: CaseUnit, port: CasePort | undefined): Volts[] {
  const said = (port?.volts ?? []).map((v) =>
    typeof v === 'string' ? { volt: v, when: undefined } : v,
  )
  const decisive = [...new Set(said.flatMap((v) => Object.keys(v.when ?? {})))]
  const ways = decisive.reduce<When[]>(
    (all, control) => {
      const choices = unit.settings?.find((c) => c.name === control)?.choices ?? []
      return all.flatMap((when) => choices.map((c) => ({ ...when, [control]: [c] })))
    },
    [{}],
  )
  return ways.map((when) => ({
    when,
    volts: said.filter((v) => bothHold(when, v.when) !== null).map((v) => v.volt as SwitchVolt),
  }))
}

/** What leaves by a jack; more than once where switching voltages depend on controls. */
function gives(
  unit: CaseUnit,
  jack: CaseJack,
  extra: When | undefined,
  modes = modesFor(jack),
): Give[] {
  const port = jack.ports[0]!
  const rf = jack.jack.form === 'rf' ? rfRows(port) : []
  return voltsOf(unit, port).flatMap(({ volts, when }): Give[] => {
    const stands = allHold([jack.when, extra, when])
    const open = modes.filter((m) => bothHold(m.when, stands ?? {}) !== null)
    if (!stands || (modes.length > 0 && open.length === 0)) return []
    return [
      {
        jack: jack.jack.key,
        while: condition(stands),
        picture: pictureRows(unit, jack, open),
        ...(rf.length > 0 ? { rf } : {}),
        volts,
      },
    ]
  })
}

const isSoundJack = (jack: CaseJack): boolean => jack.jack.form === 'sound'
const isPicture = (jack: CaseJack): boolean =>
  !['sound', 'digital-sound', 'ac3-rf'].includes(jack.jack.form)

/** The source: what it plays leaves by every output. */
function playing(unit: CaseUnit, jacks: readonly CaseJack[]): ModelFunction {
  const recorded = unit.content?.scans
  const serves = (m: CaseMode): boolean =>
    !recorded || m.converts === true || recorded.includes(m.scan)
  const outs = jacks.filter((j) => j.jack.dir === 'out')
  const anywhere = outs.flatMap((j) => modesFor(j)).filter(serves)
  const pictures = outs.filter(isPicture).flatMap((j): Give[] => {
    const modes = modesFor(j).filter(serves)
    // Without a channel of its own an RF output only repeats what comes in.
    if (j.jack.form === 'rf' && j.ports.every((p) => !p.rf)) return []
    if (j.jack.form === 'rf')
      return gives(unit, j, besideLoop(unit, j), modes).map((g) => ({
        ...g,
        picture: rfPictures(j, anywhere),
      }))
    const given = modes.length > 0 ? modes : modesFor(j).length > 0 ? [] : anywhere
    return given.length > 0 ? gives(unit, j, undefined, given) : []
  })
  const withHdmi = pictures.map((g) =>
    outs.find((j) => j.jack.key === g.jack)?.jack.form === 'hdmi'
      ? { ...g, sound: 'stereo' as const }
      : g,
  )
  const sounds = outs.filter(isSoundJack).map((j): Give => ({
    jack: j.jack.key,
    while: condition(j.when),
    sound: j.jack.contacts.some((c) => c.circuit === 'audio-r') ? 'stereo' : 'mono',
  }))
  return {
    key: PLAYS,
    kind: 'plays',
    needs: [],
    accepts: [],
    gives: [...withHdmi, ...sounds],
    power: 'on',
  }
}

/** While a switch lets the aerial pass straight to an output, what is played does not leave by it. */
function besideLoop(unit: CaseUnit, jack: CaseJack): When | undefined {
  const loop = (unit.does ?? []).find(
    (d) => d.how === 'loop' && jack.ports.some((p) => p.id === d.to) && d.when,
  )
  const [control, positions] = Object.entries(loop?.when ?? {})[0] ?? []
  const choices = unit.settings?.find((s) => s.name === control)?.choices ?? []
  const others = choices.filter((c) => !positions?.includes(c))
  return control === undefined || others.length === 0 ? undefined : { [control]: others }
}

/** A source with nothing but RF says its colours; its lines are those of its system. */
function rfPictures(jack: CaseJack, anywhere: readonly CaseMode[]): PictureGive[] {
  const rf = jack.ports[0]?.rf
  const known = anywhere.filter((m) => rf?.colour.includes(m.colour))
  if (known.length > 0)
    return known.map((m) => ({
      scan: m.scan as ScanId,
      colour: m.colour as Colour,
      while: condition(m.when),
    }))
  const scans: ScanId[] =
    rf?.system === 'M'
      ? ['262p60', '525i60']
      : rf?.system === 'A'
        ? ['405i50']
        : ['312p50', '625i50']
  return scans.flatMap((scan) =>
    (rf?.colour ?? []).map((colour) => ({ scan, colour: colour as Colour })),
  )
}

/** Sound inputs that can be listened to while a picture input is chosen. */
const listened = (jacks: readonly CaseJack[], picture: CaseJack): OptionalInput[] =>
  jacks
    .filter((j) => isSoundJack(j) && j.jack.dir === 'in' && agree(picture.when, j.when))
    .map((j) => ({ jack: j.jack.key, ifAbsent: 'silent', while: condition(j.when) }))

/** Two conditions that can hold at once. */
const agree = (a: When | undefined, b: When | undefined): boolean =>
  Object.entries(a ?? {}).every(([control, positions]) => {
    const other = b?.[control]
    return !other || positions.some((p) => other.includes(p))
  })

function showing(jacks: readonly CaseJack[]): ModelFunction[] {
  return jacks
    .filter((j) => j.jack.dir === 'in' && isPicture(j))
    .map((j): ModelFunction => {
      const tuner = j.jack.form === 'rf' ? j.ports[0]?.tuner : undefined
      return {
        key: `shows ${j.jack.key}`,
        kind: 'shows',
        while: condition(j.when),
        needs: [j.jack.key],
        optional: j.jack.form === 'rf' ? [] : listened(jacks, j),
        accepts: acceptRows(j),
        gives: [],
        ...(tuner?.control ? { tunedBy: tuner.control } : {}),
        power: 'on',
        ...(j.ports[0]?.recorderInputAgc ? { inputAgc: true } : {}),
        ...(j.ports[0]?.hdcp === false ? { hdcp: false } : { hdcp: true }),
      }
    })
}

const edges = (unit: CaseUnit, from: CaseJack, to: CaseJack): CaseDoes[] =>
  (unit.does ?? []).filter(
    (d) => from.ports.some((p) => p.id === d.from) && to.ports.some((p) => p.id === d.to),
  )

/** Every port of the output is fed by the input, under conditions that can hold at once. */
function feeds(unit: CaseUnit, from: CaseJack, to: CaseJack): CaseDoes[] | null {
  const found = edges(unit, from, to)
  return to.ports.every((p) => found.some((d) => d.to === p.id)) ? found : null
}

/** A box passes a form as it is where it can; only where it cannot does it make another. */
function turnsInto(
  jacks: readonly CaseJack[],
  unit: CaseUnit,
  from: CaseJack,
  to: CaseJack,
): boolean {
  if (from.jack.form === to.jack.form) return true
  const keeps = jacks.some(
    (j) =>
      j !== to &&
      j.jack.dir === 'out' &&
      j.jack.form === from.jack.form &&
      samePorts(j, to) &&
      feeds(unit, from, j),
  )
  const comes = jacks.some(
    (j) =>
      j !== from &&
      j.jack.dir === 'in' &&
      j.jack.form === to.jack.form &&
      samePorts(j, from) &&
      feeds(unit, j, to),
  )
  return !keeps && !comes
}

const samePorts = (a: CaseJack, b: CaseJack): boolean =>
  a.ports.some((p) => b.ports.some((q) => p.id === q.id))

const outsOf = (jacks: readonly CaseJack[]): CaseJack[] => jacks.filter((j) => j.jack.dir === 'out')

const insOf = (jacks: readonly CaseJack[]): CaseJack[] => jacks.filter((j) => j.jack.dir === 'in')

const powerOf = (unit: CaseUnit): ModelFunction['power'] => (unit.powered ? 'on' : 'none')

function boxFunctions(unit: CaseUnit, jacks: readonly CaseJack[]): ModelFunction[] {
  const pictures = insOf(jacks)
    .filter(isPicture)
    .flatMap((from) => HOWS.flatMap((how) => pictureFunction({ unit, jacks, from, how })))
  const sounds = pictures.length > 0 ? [] : soundFunctions(unit, jacks)
  return [...pictures, ...sounds, ...aerialFunctions(jacks)]
}

/** A box without pictures passes sound on, or makes it heard. */
function soundFunctions(unit: CaseUnit, jacks: readonly CaseJack[]): ModelFunction[] {
  const outs = outsOf(jacks)
  return insOf(jacks)
    .filter(isSoundJack)
    .flatMap((from): ModelFunction[] => {
      const gives = outs
        .filter(isSoundJack)
        .flatMap((to) => (feeds(unit, from, to) ?? []).slice(0, 1).map((d) => soundGive(to, d)))
      if (gives.length === 0 && outs.length > 0) return []
      const speaks = gives.length === 0
      return [
        {
          key: `${speaks ? 'speaks' : 'sound'} ${from.jack.key}`,
          kind: speaks ? 'makes-sound' : 'selects',
          while: condition(from.when),
          needs: [from.jack.key],
          accepts: [],
          gives,
          power: powerOf(unit),
        },
      ]
    })
}

/** What has RF outputs and no input at all is an aerial. */
const aerialFunctions = (jacks: readonly CaseJack[]): ModelFunction[] =>
  insOf(jacks).length > 0
    ? []
    : outsOf(jacks)
        .filter((j) => j.jack.form === 'rf')
        .map(({ jack }) => ({
          key: `receives ${jack.key}`,
          kind: 'receives',
          needs: [],
          accepts: [],
          gives: [{ jack: jack.key }],
          power: 'none',
        }))

const soundGive = (to: CaseJack, edge: CaseDoes): Give => ({
  jack: to.jack.key,
  while: both(to.when, edge.when),
  sound: to.jack.contacts.some((c) => c.circuit === 'audio-r') ? 'same' : 'mono',
})

const HOWS = ['loop', 'tuned', undefined] as const

/** A picture input of a box, and how the box passes on what comes in there. */
interface Passing {
  readonly unit: CaseUnit
  readonly jacks: readonly CaseJack[]
  readonly from: CaseJack
  readonly how: (typeof HOWS)[number]
}

function pictureFunction(passing: Passing): ModelFunction[] {
  const { unit, from, how } = passing
  const gives = pictureGives(passing)
  if (gives.length === 0) return []
  const base = {
    key: `${how ?? 'passes'} ${from.jack.key}`,
    kind: kindOf(from, gives, how),
    while: condition(from.when),
    needs: [from.jack.key],
    power: powerOf(unit),
    ...factsOf(unit, from),
  }
  if (how === 'loop') return [{ ...base, optional: [], accepts: [], gives }]
  const tuner = from.jack.form === 'rf' ? from.ports[0]?.tuner : undefined
  return [
    {
      ...base,
      optional: tuner ? [] : soundsTaken(passing, gives),
      accepts: acceptRows(from),
      gives: [...gives, ...soundGives(passing)],
      ...(tuner?.control ? { tunedBy: tuner.control } : {}),
    },
  ]
}

function pictureGives({ unit, jacks, from, how }: Passing): Give[] {
  return outsOf(jacks)
    .filter((to) => isPicture(to) && turnsInto(jacks, unit, from, to))
    .flatMap((to): Give[] => {
      const found = (feeds(unit, from, to) ?? []).filter((d) => d.how === how)
      if (found.length === 0) return []
      const stands = allHold([mergeWhen(found), ...outletsEnded(unit, to)])
      if (!stands) return []
      const made = gives(unit, to, stands)
      return how === 'loop'
        ? made.map(({ jack, while: stands }) => ({
            jack,
            while: stands,
            picture: [{ scan: 'same', colour: 'same' }],
          }))
        : made
    })
}

/** Outlets with a switched load have it while nothing hangs on them, and not while something does. */
function outletsEnded(unit: CaseUnit, to: CaseJack): (When | undefined)[] {
  const loops = unit.ports.map((p) => loopOf(unit, p).loopsTo)
  const outlets = unit.ports.filter((p) => p.dir === 'out' && !loops.includes(p.id))
  return outlets.map((port) => {
    const when = stated(port.load).find((s) => is75(s.value))?.when
    const [control, ending] = Object.entries(when ?? {})[0] ?? []
    if (control === undefined || !to.ports.includes(port)) return when
    const choices = unit.settings?.find((s) => s.name === control)?.choices ?? []
    return { [control]: choices.filter((c) => ending?.includes(c) !== true) }
  })
}

/** Sound that leaves along with a picture: out of the picture input itself, else from a sound input. */
function soundGives({ unit, jacks, from, how }: Passing): Give[] {
  const soundIns = insOf(jacks).filter(isSoundJack)
  return outsOf(jacks)
    .filter(isSoundJack)
    .flatMap((to) => {
      const direct = (feeds(unit, from, to) ?? []).filter((d) => d.how === how)
      const beside = soundIns.flatMap((s) => feeds(unit, s, to) ?? [])
      return [...direct, ...beside].slice(0, 1).map((edge) => soundGive(to, edge))
    })
}

/** Sound inputs that go on while the picture does. */
function soundsTaken({ unit, jacks }: Passing, gives: readonly Give[]): OptionalInput[] {
  return insOf(jacks)
    .filter(isSoundJack)
    .flatMap((s): OptionalInput[] => {
      const [edge] = outsOf(jacks).flatMap((to) => edges(unit, s, to))
      const fits = edge && gives.some((g) => compatible(g.while, edge.when))
      return fits ? [{ jack: s.jack.key, ifAbsent: 'silent', while: both(s.when, edge.when) }] : []
    })
}

function factsOf(unit: CaseUnit, from: CaseJack): Partial<ModelFunction> {
  const { gainDb, lossDb, hdcp } = unit
  const agc = unit.recorderInputAgc === true || from.ports[0]?.recorderInputAgc === true
  return {
    ...(agc && from.jack.form !== 'rf' ? { inputAgc: true } : {}),
    ...(hdcp === undefined ? {} : { hdcp }),
    ...(gainDb === undefined && lossDb === undefined
      ? {}
      : { gainDb: (gainDb ?? 0) - (lossDb ?? 0) }),
  }
}

const mergeWhen = (found: readonly CaseDoes[]): When =>
  Object.assign({}, ...found.map((d) => d.when ?? {})) as When

const compatible = (a: Condition | undefined, b: When | undefined): boolean =>
  (a ?? []).every((c) => {
    const other = b?.[c.control]
    return !other || c.in.some((p) => other.includes(p))
  })

function kindOf(
  from: CaseJack,
  gives: readonly Give[],
  how: string | undefined,
): ModelFunction['kind'] {
  if (how === 'loop') return 'loop-through'
  if (how === 'tuned') return 'remodulates'
  if (from.jack.form === 'rf') return from.ports[0]?.tuner ? 'tunes' : 'selects'
  return gives.some((g) => g.rf) ? 'modulates' : 'converts-form'
}

// ---------------------------------------------------------------- whole units

const isTube = ({ kind }: CaseUnit): boolean => /crt|tube/.test(kind ?? '') || kind === 'monitor'

function screenOf(unit: CaseUnit): DisplayFacts['screen'] {
  if (unit.kind === 'flat') return 'flat'
  if (unit.kind === 'crt-mono') return 'tube-mono'
  return isTube(unit) ? 'tube-colour' : 'projector'
}

/** A display whose rates are not stated follows whatever its inputs list. */
const ANY_RATE: NonNullable<CaseUnit['deflection']> = { lineKhz: [[10, 120]], fieldHz: [45, 125] }

function displayFacts(unit: CaseUnit, role: Role): DisplayFacts | undefined {
  if (!unit.deflection && role !== 'display') return undefined
  const { sound, deflection = ANY_RATE } = unit
  return {
    screen: screenOf(unit),
    deflection: {
      lineKhz: deflection.lineKhz,
      // The ends of what it follows are listed; nothing of the form lies between two television rates.
      fieldHz: [[Math.min(...deflection.fieldHz), Math.max(...deflection.fieldHz)]],
      fixed: isTube(unit),
    },
    shape: unit.aspect === '16:9' || unit.kind === 'flat' ? '16:9' : '4:3',
    loudspeakers: sound === 'stereo' || sound === 'mono' ? sound : 'none',
    storesFields: unit.fieldStore === true,
    convertsScan: unit.scanConversion === true,
    directView: isTube(unit) && (unit.tube?.view ?? 'direct') === 'direct',
  }
}

/** Games and computers answer to the hand; the words of a unit tell them from players. */
const kindOfSource = (unit: CaseUnit): DeviceModel['kind'] =>
  /\b(console|game)/i.test(unit.what)
    ? 'console'
    : /computer/i.test(unit.what)
      ? 'computer'
      : 'other'

/** Mains of the country whose channels a display receives (common practice, no source). */
const HOME_VOLTS: readonly (readonly [prefix: string, volts: number])[] = [
  ['us-', 120],
  ['jp', 100],
  ['uk-', 230],
  ['ccir', 230],
  ['au', 230],
  ['fr-', 230],
]

/** South American sets count in the same channels as others: their colour tells, and in Brazil not even that. */
function homeVolts(unit: CaseUnit): number | undefined {
  const tuner = unit.ports.find((p) => p.tuner)?.tuner
  const colours = [...(tuner?.colours ?? []), ...unit.ports.flatMap(coloursTaken)]
  if (colours.includes('pal-n')) return 220
  if (colours.includes('pal-m')) return undefined
  return HOME_VOLTS.find(([prefix]) => tuner?.plans[0]?.startsWith(prefix))?.[1]
}

const coloursTaken = ({ modes }: CasePort): string[] => (modes ?? []).map((m) => m.colour)

/** Stated with a unit, or those of the country of a display; anything else takes what there is. */
function mainsOf(unit: CaseUnit, role: Role): DeviceModel['mains'] {
  const stated = /(\d+)\s*V/.exec(unit.mains ?? '')
  const volts = stated ? Number(stated[1]) : role === 'display' ? homeVolts(unit) : undefined
  if (volts === undefined) return { volts: [100, 240], hz: [50, 60] }
  // What is called 220, 230 and 240 V is one mains (common practice, no source).
  const isHigh = role !== 'display' && volts >= 220 && volts <= 240
  return { volts: isHigh ? [220, 240] : [volts, volts], hz: [50, 60] }
}

type Role = 'source' | 'display' | 'box'

function deviceOf(unit: CaseUnit, role: Role, plays: readonly ScanId[]): DeviceModel {
  const jacks = jacksOf(unit)
  const display = displayFacts(unit, role)
  const functions =
    role === 'source'
      ? [playing(unit, jacks), ...receiving(jacks), ...boxFunctions(unit, jacks)]
      : role === 'display'
        ? [...showing(jacks), ...boxFunctions(unit, jacks)]
        : boxFunctions(unit, jacks)
  return {
    format: 1,
    type: 'device',
    kind: role === 'display' ? 'television' : kindOfSource(unit),
    maker: '',
    name: unit.what,
    market: 'any',
    aliases: [],
    factSource: 'manual',
    groups: [],
    ports: unit.ports.map((p, i) => portOf(unit, p, jacks, i)),
    jacks: jacks.map((j) => j.jack).filter((j) => j.contacts.length > 0),
    controls: (unit.settings ?? []).flatMap((c) => controlOf(unit, c, plays)),
    functions,
    leaks: leaksOf(unit),
    chassis: unit.liveChassis ? 'live' : 'isolated',
    ...(unit.powered || role !== 'box' ? { mains: mainsOf(unit, role) } : {}),
    remote: 'none',
    ...(display ? { display } : {}),
  }
}

/** An isolation that a case does not state is none: 0 dB backwards and from input to input. */
function leaksOf(unit: CaseUnit): DeviceModel['leaks'] {
  const rf = unit.ports.filter((p) => p.signals.includes('rf'))
  const stated = unit.leaks ?? []
  const others = rf.flatMap((a) =>
    rf
      .filter((b) => a !== b && !stated.some((l) => l.from === a.id && l.to === b.id))
      .map((b) => ({ from: a.id, to: b.id, db: 0 })),
  )
  return [...stated, ...others]
}

/** A source that decodes stations by itself, such as a converter box, is fed by the aerial. */
const receiving = (jacks: readonly CaseJack[]): ModelFunction[] =>
  jacks
    .filter((j) => j.jack.form === 'rf' && j.jack.dir === 'in' && decodes(j.ports[0]?.tuner))
    .map((j) => ({
      key: `watches ${j.jack.key}`,
      kind: 'tunes',
      needs: [j.jack.key],
      accepts: acceptRows(j),
      gives: [],
      tunedBy: j.ports[0]?.tuner?.control,
      power: 'on',
    }))

/** Something else hangs on a port that is taken, or no position chooses it: for this question it is not there. */
const withoutTaken = (unit: CaseUnit): CaseUnit => ({
  ...unit,
  ports: unit.ports.filter((p) => !p.taken && canStand(unit, p.when)),
})

/** Each control stands on one of the positions that are named, or anywhere where none is. */
const canStand = ({ settings }: CaseUnit, when: When | undefined): boolean =>
  Object.entries(when ?? {}).every(([control, positions]) => {
    const choices = settings?.find((s) => s.name === control)?.choices
    return choices === undefined || positions.some((p) => choices.includes(p))
  })

/** Ends the name of the place at an input where a terminator goes in between plug and socket. */
export const THROUGH = '~end'

/** A terminator that is plugged in between, so that its line needs no loop. */
const isThrough = ({ terminates, ends }: CasePiece): boolean =>
  Boolean(terminates) &&
  ends.some((e) => e.endsWith('-plug')) &&
  ends.some((e) => e.endsWith('-socket'))

/** At an input that never ends its line such a terminator sits as others do on a loop socket. */
function withPlaces(unit: CaseUnit, pieces: readonly CasePiece[]): CaseUnit {
  const open = unit.ports.filter((port) => {
    const said = stated(port.load)
    return port.dir === 'in' && said.length > 0 && !said.some((s) => is75(s.value))
  })
  if (open.length === 0 || !pieces.some(isThrough)) return unit
  const placed = unit.ports.map((p) => (open.includes(p) ? { ...p, loops: p.id + THROUGH } : p))
  const places = open.map(({ id, connector, signals, ...p }): CasePort => ({
    id: id + THROUGH,
    label: p.label,
    dir: 'out',
    connector,
    mount: p.mount,
    signals,
  }))
  return { ...unit, ports: [...placed, ...places] }
}

const decodes = (tuner: CaseTuner | undefined): boolean =>
  tuner?.control !== undefined && tuner.digital.length > 0

/** What is recorded as not working is dead, the rest works: a case knows no doubt. */
function unitOf(id: string, unit: CaseUnit, device: DeviceModel): Unit {
  const dead = new Set(unit.ports.filter((p) => p.works === false).map((p) => p.id))
  return {
    uid: id,
    model: id,
    quantity: 1,
    working: 'works',
    holding: 'kept',
    place: null,
    forms: device.jacks.flatMap((jack) =>
      jack.contacts.map(({ port }) => ({
        jack: jack.key,
        port,
        state: dead.has(port) ? ('dead' as const) : ('works' as const),
      })),
    ),
    functions: device.functions.map((f) => ({ function: f.key, state: 'works' as const })),
    modifications: [],
    stands: {},
    remotePresent: true,
  }
}

// ---------------------------------------------------------------- leads and adapters

const USUAL_WIRES: Partial<Record<ConnectorFamily, readonly Circuit[]>> = {
  scart: ['cvbs', 'audio-l', 'audio-r', 'r', 'g', 'b'],
  hd15: ['r', 'g', 'b', 'hsync', 'vsync'],
  svideo4: ['y', 'c'],
  jack35: ['audio-l', 'audio-r', 'cvbs'],
  dterm: ['y', 'pb', 'pr'],
  din5: ['audio-l', 'audio-r'],
  din6: ['cvbs', 'audio-l', 'audio-r'],
  db23: ['r', 'g', 'b', 'csync'],
}

const LOOSE_300: readonly string[] = ['spades', 'screws', 'bare']

const signalCircuits = (signals: readonly string[]): Circuit[] => [
  ...new Set(signals.flatMap((s) => CIRCUITS_OF[s] ?? [])),
]

function pieceOf(piece: CasePiece): PieceModel {
  const limited = piece.wired ?? piece.carries
  const meant = limited ? signalCircuits(limited) : undefined
  const [a, b, wires] = piece.terminates
    ? ending(piece)
    : piece.joins
      ? mixing(piece)
      : ordinary(piece, meant)
  const ohm = piece.ends.map((e) => (LOOSE_300.includes(e) ? 300 : 75))
  return {
    format: 1,
    type: 'piece',
    kind: piece.terminates ? 'terminator' : piece.kind,
    maker: '',
    name: piece.what,
    market: 'any',
    aliases: [],
    factSource: 'manual',
    a,
    b,
    wires,
    ...(meant ? { meantFor: meant } : {}),
    lossDb: piece.lossDb ?? 0,
    ...(ohm[0] === ohm[1] ? {} : { impedanceOhm: [ohm[0]!, ohm[1]!] as const }),
    mixes: piece.joins !== undefined,
    suppliesVolts: (piece.volts ?? []).map(
      (v) => (typeof v === 'string' ? v : v.volt) as SwitchVolt,
    ),
    blocksDc: false,
  }
}

/** A terminator, by the end that goes into a socket. */
function ending({ ends }: CasePiece): [Plug[], Plug[], Wire[]] {
  const connector = ends.find((e) => e.endsWith('-plug')) ?? ends[0]
  return [[{ connector: connector as Connector }], [], []]
}

function mixing(piece: CasePiece): [Plug[], Plug[], Wire[]] {
  const [separate, joined] = piece.ends as [Connector, Connector]
  const count = piece.joins?.length ?? 2
  return [
    Array.from({ length: count }, () => ({ connector: separate })),
    [{ connector: joined }],
    Array.from({ length: count }, (_, i): Wire => ({
      a: { plug: i, circuit: 'any' },
      b: { plug: 0, circuit: 'any' },
      way: 'both',
    })),
  ]
}

function ordinary(
  piece: CasePiece,
  meant: readonly Circuit[] | undefined,
): [Plug[], Plug[], Wire[]] {
  const [endA, endB] = piece.ends as [Connector, Connector]
  const cores = piece.cores ?? 1
  const singleA = isSingle(endA)
  const singleB = isSingle(endB)
  const many = (connector: Connector): Plug[] =>
    Array.from({ length: cores }, () => ({ connector }))
  if (singleA && singleB) {
    return [many(endA), many(endB), many(endA).map((_, i) => wire(i, 'any', i, 'any'))]
  }
  const circuits = meant ?? usualWires(singleA ? endB : endA, singleA || singleB)
  if (!singleA && !singleB) {
    const volts: Circuit[] = piece.wired || piece.carries ? [] : ['switch-volts']
    return [
      [{ connector: endA }],
      [{ connector: endB }],
      [...circuits, ...volts].map((c) => wire(0, c, 0, c)),
    ]
  }
  const used = circuits.slice(0, cores)
  return singleB
    ? [[{ connector: endA }], many(endB), used.map((c, i) => wire(0, c, i, 'any'))]
    : [many(endA), [{ connector: endB }], used.map((c, i) => wire(i, 'any', 0, c))]
}

const wire = (a: number, ca: Circuit | 'any', b: number, cb: Circuit | 'any'): Wire => ({
  a: { plug: a, circuit: ca },
  b: { plug: b, circuit: cb },
  way: 'both',
})

/** Without a list a lead between two multi-way plugs carries all that they have. */
function usualWires(multi: Connector, fansOut: boolean): readonly Circuit[] {
  const family = familyOf(multi) as ConnectorFamily
  if (fansOut) return USUAL_WIRES[family] ?? ['cvbs', 'audio-l', 'audio-r']
  return [...new Set(Object.values(FORM_CIRCUITS).flat())].filter(
    (c) => family in CONNECTOR_FACTS && c !== 'rf',
  )
}

// ---------------------------------------------------------------- whole cases

function protectionOf(list: readonly string[] | undefined): Protection {
  if (list?.includes('hdcp')) return 'hdcp'
  return list?.includes('analogue-agc') ? 'agc-pulses' : 'none'
}

/** The plan in which the numbers of stations are to be read: that of the tuners at hand. */
export function airPlan(question: CaseQuestion): string {
  const units = [
    question.display,
    question.source,
    ...question.shelf.filter((s) => !isPiece(s)),
  ] as CaseUnit[]
  const plans = units.flatMap((u) =>
    u.ports.flatMap((p) => p.tuner?.plans ?? (p.rf ? [p.rf.plan] : [])),
  )
  const air = plans.filter((p) => !p.startsWith('us-cable'))
  const first = (air[0] ?? 'us-air').split(':')[0] ?? 'us-air'
  const region = first.replace(/-(air-)?(vhf|uhf)$/, first.startsWith('us-air') ? '-air' : '')
  return PLAN_PARTS[region] ? region : first
}

function offAir(question: CaseQuestion): OffAir[] {
  const region = airPlan(question)
  return question.environment.offAir.map((station) => {
    const { plan, name } = caseChannel(region, station.channel)
    return {
      plan,
      channel: name,
      kind: station.kind,
      ...(station.levelDbmv === undefined ? {} : { levelDbmv: station.levelDbmv }),
    }
  })
}

/** Every scan in which the source may play. */
function scansPlayed(source: CaseUnit): ScanId[] {
  const recorded = source.content?.scans
  const modes = source.ports.flatMap((p) => p.modes ?? [])
  return modes
    .filter((m) => !recorded || m.converts === true || recorded.includes(m.scan))
    .map((m) => m.scan as ScanId)
}

const wantsGun = (question: CaseQuestion): boolean =>
  [question.source.needs ?? []].flat().includes('light-gun') ||
  /light.?gun/i.test(question.aim ?? '')

/** Nothing can be put into it any more. */
const isOccupied = ({ ports }: CaseUnit): boolean => {
  const ins = ports.filter((p) => p.dir !== 'out')
  return ins.length > 0 && ins.every((p) => p.taken)
}

/** Turns the question part of a case into a shelf and a question; sees nothing of what is expected. */
export function translate(question: CaseQuestion): Translated {
  const pieces = question.shelf.filter(isPiece)
  const plays = scansPlayed(question.source)
  const device = (id: string, whole: CaseUnit, role: Role): [string, CaseUnit, DeviceModel] => {
    const present = withoutTaken(withImplied(whole))
    const unit = role === 'display' ? withPlaces(present, pieces) : present
    return [id, unit, deviceOf(unit, role, plays)]
  }
  const devices = [
    device(SOURCE, question.source, 'source'),
    device(DISPLAY, question.display, 'display'),
    ...question.shelf.flatMap((s) =>
      // A box with everything taken that leads into it is no aerial.
      isPiece(s) || isOccupied(s) ? [] : [device(s.id ?? '', s, 'box')],
    ),
  ]
  const pieceUnit = (p: CasePiece): Unit => ({
    ...unitOf(p.id, { what: '', ports: [] }, EMPTY),
    uid: p.id,
    model: p.id,
  })
  return {
    snapshot: {
      shelfVersion: 1,
      catalogueVersion: 1,
      models: Object.fromEntries([
        ...devices.map(([id, , device]) => [id, device] as const),
        ...pieces.map((p) => [p.id, pieceOf(p)] as const),
      ]),
      units: [
        ...devices.map(([id, unit, device]) => unitOf(id, unit, device)),
        ...pieces.map(pieceUnit),
      ],
    },
    question: {
      format: 1,
      source: { unit: SOURCE, playing: PLAYS },
      material: {
        protection: protectionOf([question.source.content?.protection ?? []].flat()),
        ...(wantedTrack(question.source) === undefined ? {} : { twoProgrammes: true }),
      },
      display: { unit: DISPLAY },
      demands: {
        ...(question.environment.antennaUsed ? { keepAerial: true } : {}),
        ...(wantsGun(question) ? { aim: 'light-gun' as const } : {}),
      },
      avoid: [],
      offAir: offAir(question),
      assumedLeads: [],
    },
  }
}

const EMPTY: DeviceModel = {
  format: 1,
  type: 'device',
  kind: 'other',
  maker: '',
  name: '',
  market: 'any',
  aliases: [],
  factSource: 'manual',
  groups: [],
  ports: [],
  jacks: [],
  controls: [],
  functions: [],
  leaks: [],
  chassis: 'isolated',
  remote: 'none',
}
