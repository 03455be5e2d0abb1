import type {
  AcceptRow,
  Condition,
  Control,
  DeviceModel,
  Give,
  Jack,
  ModelFunction,
  PictureGive,
  PieceModel,
  Port,
} from '@coaxwain/models'
import {
  channelsIn,
  isSingle,
  SCANS,
  type Circuit,
  type PictureSignal,
  type PlanId,
  type PlanPart,
  type ScanId,
} from '@coaxwain/signal'
import type {
  CaseAnswer,
  CaseControl,
  CaseDoes,
  CaseMode,
  CasePiece,
  CasePort,
  CaseRf,
  CaseTuner,
  CaseUnit,
  When,
} from './form'
import { caseChannel, channelsOfPlan } from './translate'

/** A thing that is bought, in the shelf form of a case. */
export function pieceInCaseForm(id: string, model: PieceModel): CasePiece {
  const [a] = model.a
  const [b] = model.b
  const base = {
    id,
    kind: model.kind === 'adapter' ? ('adapter' as const) : ('lead' as const),
    what: model.name,
    ends: [a!.connector, b!.connector] as [string, string],
  }
  if (model.mixes) {
    return { ...base, cores: model.a.length, joins: ['audio-l', 'audio-r'], gives: 'audio-mono' }
  }
  const cores = Math.max(model.a.length, model.b.length)
  const multi = !isSingle(a!.connector) && !isSingle(b!.connector)
  if (multi) return { ...base, cores: 1 }
  return { ...base, cores, ...(model.meantFor ? { carries: [...model.meantFor] } : {}) }
}

export function unitInCaseForm(id: string, model: DeviceModel): CaseUnit {
  return {
    id,
    kind: 'unit',
    what: model.name,
    ...(model.mains || model.pack ? { powered: true } : {}),
    ...(model.functions.some((f) => f.hdcp) ? { hdcp: true } : {}),
    ports: model.ports.map((p) => portInCaseForm(model, p)).filter((p) => p.signals.length > 0),
    does: model.functions.flatMap((fn) => doesOf(model, fn)),
    settings: model.controls.flatMap(controlInCaseForm),
    leaks: model.leaks.map((l) => ({ ...l })),
  }
}

interface Pictures {
  readonly arriving: PictureSignal | null
  readonly leaving: PictureSignal | null
  /** Scans of the source. */
  readonly played: readonly string[]
}

/**
 * A box with no more than what it is bought for: the sockets that are used, the picture that comes and the one
 * that leaves, and the controls that matter for that. What else it can do decides nothing.
 */
export function asUsed(unit: CaseUnit, answer: CaseAnswer, pictures: Pictures): CaseUnit {
  const refs = new Set(answer.paths.flatMap((p) => p.hops.flatMap((h) => [h.from, h.to])))
  const stands = new Map(
    answer.settings.filter((s) => s.on === unit.id).map((s) => [s.set, s.to] as const),
  )
  const isOff = ({ when: condition }: { when?: When }): boolean =>
    Object.entries(condition ?? {}).some(([control, positions]) => {
      const at = stands.get(control)
      return at !== undefined && !positions.includes(at)
    })
  const ports = unit.ports
    .filter((p) => refs.has(`${unit.id}:${p.id}`))
    .map((p) => {
      const signal = p.dir === 'in' ? pictures.arriving : pictures.leaving
      const open = (p.modes ?? []).filter((m) => !isOff(m))
      const modes = likeThis(open, signal)
      const plain = p.dir === 'in' ? modes.filter((m) => pictures.played.includes(m.scan)) : []
      return p.modes ? { ...p, modes: plain.length > 0 ? plain : modes } : p
    })
  const kept = new Set(ports.map((p) => p.id))
  const does = (unit.does ?? []).filter((d) => kept.has(d.from) && kept.has(d.to) && !isOff(d))
  const text = JSON.stringify({ ports, does })
  return {
    ...unit,
    ports,
    does,
    settings: (unit.settings ?? []).filter((c) => text.includes(JSON.stringify(c.name))),
    leaks: (unit.leaks ?? []).filter((l) => kept.has(l.from) && kept.has(l.to)),
  }
}

/** Modes of the raster and colour of a picture; all of them where none is like it. */
function likeThis(modes: readonly CaseMode[], picture: PictureSignal | null): CaseMode[] {
  const own = picture?.scan
  if (!picture || own === undefined) return [...modes]
  const sameRaster = (scan: string): boolean => SCANS[scan as ScanId].lineKhz === SCANS[own].lineKhz
  const alike = modes.filter((m) => sameRaster(m.scan))
  const equal = alike.filter((m) => m.colour === picture.colour)
  return equal.length > 0 ? equal : alike.length > 0 ? alike : [...modes]
}

const when = (...conditions: (Condition | undefined)[]): When | undefined => {
  const all = conditions.flatMap((c) => c ?? []).filter((c) => c.control !== 'power')
  return all.length > 0 ? Object.fromEntries(all.map((c) => [c.control, [...c.in]])) : undefined
}

const withWhen = <T extends object>(value: T, ...conditions: (Condition | undefined)[]): T => {
  const found = when(...conditions)
  return found ? { ...value, when: found } : value
}

const jacksAt = (model: DeviceModel, port: string): Jack[] =>
  model.jacks.filter((j) => j.contacts.some((c) => c.port === port))

const SPLIT: Partial<Record<Circuit, string>> = {
  r: 'rgb-r',
  g: 'rgb-g',
  b: 'rgb-b',
  csync: 'sync',
  y: 'ypbpr-y',
  pb: 'ypbpr-pb',
  pr: 'ypbpr-pr',
  'audio-l': 'audio-l',
  'audio-r': 'audio-r',
  'audio-mono': 'audio-mono',
  spdif: 'digital-audio',
}

const WHOLE: Partial<Record<Jack['form'], string>> = {
  composite: 'composite',
  's-video': 's-video',
  rgbs: 'rgb-cs',
  rgsb: 'rgb-sog',
  rgbhv: 'rgb-hv',
  rgbi: 'rgbi',
  hdmi: 'hdmi',
  dvi: 'dvi',
  rf: 'rf',
}

function signalsAt(model: DeviceModel, port: string): string[] {
  const signals = jacksAt(model, port).flatMap((jack) => {
    const whole = WHOLE[jack.form]
    if (whole && jack.contacts.every((c) => c.port === port)) return [whole]
    return jack.contacts.filter((c) => c.port === port).flatMap((c) => SPLIT[c.circuit] ?? [])
  })
  return [...new Set(signals)]
}

function portInCaseForm(model: DeviceModel, port: Port): CasePort {
  const jacks = jacksAt(model, port.key)
  const dirs = new Set(jacks.map((j) => j.dir))
  const pictures = jacks.filter((j) => !['sound', 'digital-sound'].includes(j.form))
  const modes = pictures.flatMap((j) => (j.form === 'rf' ? [] : modesOf(model, j)))
  const rf = pictures.find((j) => j.form === 'rf')
  const volts = jacks.flatMap((j) => givers(model, j).flatMap(({ give }) => give.volts ?? []))
  const made: CasePort = {
    id: port.key,
    label: port.label,
    dir: dirs.size > 1 ? 'both' : dirs.has('in') ? 'in' : 'out',
    connector: port.connector,
    mount: port.mount,
    signals: signalsAt(model, port.key),
    works: true,
    ...(modes.length > 0 ? { modes } : {}),
    ...(volts.length > 0 ? { volts: [...new Set(volts)] } : {}),
    ...(port.impedanceOhm === undefined ? {} : { ohm: port.impedanceOhm }),
  }
  if (!rf) return made
  return rf.dir === 'out'
    ? { ...made, ...optional('rf', rfOf(model, rf)) }
    : { ...made, ...optional('tuner', tunerOf(model, rf)) }
}

const optional = <K extends string, V>(key: K, value: V | undefined): Partial<Record<K, V>> =>
  value === undefined ? {} : ({ [key]: value } as Record<K, V>)

const takers = (model: DeviceModel, jack: Jack): ModelFunction[] =>
  model.functions.filter((f) => [...f.needs, ...(f.oneOf ?? [])].includes(jack.key))

const givers = (model: DeviceModel, jack: Jack): { fn: ModelFunction; give: Give }[] =>
  model.functions.flatMap((fn) =>
    fn.gives.filter((g) => g.jack === jack.key).map((give) => ({ fn, give })),
  )

function modesOf(model: DeviceModel, jack: Jack): CaseMode[] {
  if (jack.dir === 'in')
    return takers(model, jack).flatMap((fn) => fn.accepts.flatMap((r) => rowModes(fn, r)))
  return givers(model, jack).flatMap(({ fn, give }) =>
    (give.picture ?? []).flatMap((row) => giveModes(fn, give, row)),
  )
}

function rowModes(fn: ModelFunction, row: AcceptRow): CaseMode[] {
  if (row.scans === 'any' || row.colours === 'any') return []
  const colours = row.colours.filter((c) => c !== 'mono' && c !== 'ntsc-j')
  return row.scans.flatMap((scan) =>
    colours.map((colour) => withWhen({ scan, colour }, fn.while, row.while)),
  )
}

/** A row that keeps the lines is a mode for each scan that the function takes. */
function giveModes(fn: ModelFunction, give: Give, row: PictureGive): CaseMode[] {
  if (row.scan === 'same' && row.colour === 'same') return []
  const taken = fn.accepts.flatMap((r) => (r.scans === 'any' ? [] : r.scans))
  const scans: readonly ScanId[] = row.scan === 'same' ? [...new Set(taken)] : [row.scan]
  const colour = row.colour
  return scans.map((scan) => withWhen({ scan, colour }, fn.while, give.while, row.while))
}

/** Codes of the form for the plans of the product, below 300 MHz and above. */
const PLANS: Partial<Record<PlanId, readonly [vhf: string, uhf: string, whole: string]>> = {
  'us-broadcast': ['us-air-vhf', 'us-air-uhf', 'us-air'],
  'us-cable-std': ['us-cable', 'us-cable', 'us-cable'],
  'uk-uhf': ['uk-uhf', 'uk-uhf', 'uk-uhf'],
  'uk-405': ['uk-405', 'uk-405', 'uk-405'],
  'ccir-west-europe': ['ccir-vhf', 'ccir-uhf', 'ccir-uhf'],
  australia: ['au-vhf', 'au-uhf', 'au'],
  'japan-broadcast': ['jp-vhf', 'jp-uhf', 'jp'],
  france: ['fr-uhf', 'fr-uhf', 'fr-uhf'],
}

const UHF_MHZ = 300

function planCodes(part: PlanPart): string[] {
  const [vhf, uhf] = PLANS[part.plan] ?? []
  if (vhf === undefined || uhf === undefined) return []
  return [...new Set(channelsIn(part).map((c) => (c.lowerMhz < UHF_MHZ ? vhf : uhf)))]
}

/** The one code for all channels of an output. */
function planCode(part: PlanPart): string {
  const [first, ...others] = planCodes(part)
  return others.length > 0 ? (PLANS[part.plan]?.[2] ?? '') : (first ?? '')
}

/** Channels by the names that the form gives them. */
function channelNames(part: PlanPart): string[] {
  const code = planCode(part)
  const own = channelsOfPlan(code)
  return channelsIn(part).flatMap(
    (c) => own.find((o) => caseChannel(code, o.name).name === c.name)?.name ?? [],
  )
}

function rfOf(model: DeviceModel, jack: Jack): CaseRf | undefined {
  const rows = givers(model, jack).flatMap(({ fn, give }) =>
    (give.rf ?? []).map((rf) => ({ rf, when: when(fn.while, give.while, rf.while) })),
  )
  const [first] = rows
  if (!first) return undefined
  const { channel } = first.rf
  const control =
    'control' in channel ? model.controls.find((c) => c.key === channel.control) : undefined
  const part =
    'part' in channel
      ? channel.part
      : control?.kind === 'channel'
        ? control.carriers.part
        : undefined
  if (!part) return undefined
  const made: CaseRf = {
    plan: planCode(part),
    channels: channelNames(part),
    system: first.rf.system,
    colour: first.rf.colours.filter((c) => c !== 'mono' && c !== 'ntsc-j'),
    sideband: first.rf.sideband === 'double' ? 'dsb' : 'vsb',
    levelDbmv: first.rf.levelDbmv,
    sound: first.rf.sound,
    ...(control ? { control: control.key } : {}),
  }
  if (rows.length === 1) return made
  return {
    ...made,
    variants: rows.map(({ rf, when: condition }) => ({ when: condition ?? {}, system: rf.system })),
  }
}

function tunerOf(model: DeviceModel, jack: Jack): CaseTuner | undefined {
  const fn = takers(model, jack).find((f) => f.tunedBy !== undefined)
  const control = model.controls.find((c) => c.key === fn?.tunedBy)
  if (!fn || control?.kind !== 'tuned-to') return undefined
  const plans = control.reaches.flatMap((r) => planCodes(r.part))
  const list = <T>(of: (row: AcceptRow) => readonly T[] | 'any'): T[] => [
    ...new Set(
      fn.accepts.flatMap((r) => {
        const got = of(r)
        return got === 'any' ? [] : got
      }),
    ),
  ]
  return {
    plans,
    systems: list((r) => r.systems ?? []),
    colours: list<string>((r) => r.colours).filter((c) => c !== 'mono' && c !== 'ntsc-j'),
    scans: list<string>((r) => r.scans),
    digital: list<string>((r) => r.digital ?? []).map((d) => (d === 'atsc' ? '8vsb' : d)),
    control: control.key,
    variants: fn.accepts.flatMap((r) => {
      const condition = when(r.while)
      return condition ? [{ when: condition, systems: [...(r.systems ?? [])] }] : []
    }),
  }
}

function doesOf(model: DeviceModel, fn: ModelFunction): CaseDoes[] {
  const ports = (key: string): string[] =>
    model.jacks.filter((j) => j.key === key).flatMap((j) => j.contacts.map((c) => c.port))
  const isSound = (key: string): boolean =>
    model.jacks.some((j) => j.key === key && j.form === 'sound')
  const edge = (from: string, to: string, give: Give, extra?: Condition): CaseDoes =>
    withWhen(
      { from, to, ...(fn.kind === 'tunes' && give.rf ? { how: 'tuned' as const } : {}) },
      fn.while,
      give.while,
      extra,
    )
  const pictures = [...fn.needs, ...(fn.oneOf ?? [])]
  const embedded = pictures.some((k) =>
    model.jacks.some((j) => j.key === k && (j.form === 'rf' || j.form === 'hdmi')),
  )
  const fromPicture = fn.gives
    .filter((g) => !isSound(g.jack) || embedded)
    .flatMap((g) => pictures.flatMap(ports).flatMap((a) => ports(g.jack).map((b) => edge(a, b, g))))
  const fromSound = fn.gives
    .filter((g) => isSound(g.jack) || g.rf !== undefined || g.sound !== undefined)
    .flatMap((g) =>
      (fn.optional ?? []).flatMap((o) =>
        ports(o.jack).flatMap((a) => ports(g.jack).map((b) => edge(a, b, g, o.while))),
      ),
    )
  const seen = new Set<string>()
  return [...fromPicture, ...fromSound].filter((d) => {
    const key = JSON.stringify(d)
    return !seen.has(key) && seen.add(key)
  })
}

const CLASSES: Readonly<Record<string, string>> = { 'tuner-plan': 'antenna-plan', shape: 'mode' }

function controlInCaseForm(control: Control): CaseControl[] {
  switch (control.kind) {
    case 'positions':
      return [
        {
          name: control.key,
          class: CLASSES[control.role] ?? control.role,
          choices: control.positions.map((p) => p.key),
        },
      ]
    case 'channel':
      return [
        {
          name: control.key,
          class: 'channel',
          choices: channelNames(control.carriers.part),
        },
      ]
    case 'tuned-to':
      return [
        {
          name: control.key,
          class: 'tuned-to',
          way: 'presets',
          range: { plans: control.reaches.flatMap((r) => planCodes(r.part)) },
        },
      ]
    default:
      return []
  }
}
