import {
  inputsOf,
  type DeviceModel,
  type Give,
  type Jack,
  type Key,
  type ModelFunction,
  type RfGive,
} from '@coaxwain/models'
import { LIMITS, type Question, type Setting, type Uid } from '@coaxwain/shelf'
import { isPictureForm } from '@coaxwain/signal'
import { takesAt } from '../bench'
import type { ShelfView } from '../shelf-view'
import type { Laid } from './lay'

/** One unit on the way of the picture: what it does there, and by which jacks. */
export interface Halt {
  readonly unit: Uid
  readonly device: DeviceModel
  readonly fn: ModelFunction
  readonly in: Jack | null
  readonly out: Jack | null
  /** Of several carriers that it could put out, the one that is tried. */
  readonly rf?: RfGive | undefined
}

export interface Path {
  readonly halts: readonly Halt[]
  /** Units off the way of the picture that sound is led to. */
  readonly beside: readonly Halt[]
  /** It ends in a function that shows the picture on the display asked for. */
  readonly arrives: boolean
}

const MOST_PATHS = 24

/** Every way in which a picture could run along the links, those that arrive first, then the longest. */
export function pathsAlong(laid: readonly Laid[], question: Question, view: ShelfView): Path[] {
  const { source, display } = question
  const device = view.device(source.unit)
  const fn = view.fn(source.unit, source.playing)
  if (!device || !fn) return []
  const found: Path[] = []
  const ends = { laid, view, display: display.unit, input: display.input, found }
  const start = { unit: source.unit, device, fn, in: null }
  const outs = outputs(start, fn.gives, ends)
  outs.forEach((out) => follow([{ ...start, out }], ends))
  if (outs.length === 0)
    found.push({ halts: [{ ...start, out: null }], beside: [], arrives: false })
  return found
    .sort((a, b) => Number(b.arrives) - Number(a.arrives) || b.halts.length - a.halts.length)
    .map((path) => ({ ...path, beside: besides(path, laid, view) }))
}

interface Walk {
  readonly laid: readonly Laid[]
  readonly view: ShelfView
  readonly display: Uid
  readonly input: Key | undefined
  readonly found: Path[]
}

type Open = Omit<Halt, 'out'>

/** Picture outputs of a function by which something leaves along a link. */
function outputs({ unit, device }: Open, gives: readonly Give[], { laid }: Walk): Jack[] {
  return gives.flatMap((give) => {
    const jack = device.jacks.find((j) => j.key === give.jack)
    if (!jack || !isPictureForm(jack.form)) return []
    return laid.some((l) => leavesBy(l, unit, jack)) ? [jack] : []
  })
}

const leavesBy = ({ link, way }: Laid, unit: Uid, jack: Jack): boolean =>
  link.from.unit === unit &&
  (way?.pairs.some((p) => touches(jack, link.from.port, p.from)) ?? false)

const touches = (jack: Jack, port: Key, circuit: string): boolean =>
  jack.contacts.some((c) => c.port === port && c.circuit === circuit)

function follow(halts: readonly Halt[], walk: Walk): void {
  const next = walk.found.length < MOST_PATHS ? nextOf(halts, walk) : []
  if (next.length === 0) walk.found.push({ halts, beside: [], arrives: false })
  for (const open of next) {
    if (open.unit === walk.display && open.fn.kind === 'shows') {
      walk.found.push({ halts: [...halts, { ...open, out: null }], beside: [], arrives: true })
      continue
    }
    const outs = outputs(open, open.fn.gives, walk)
    if (outs.length === 0)
      walk.found.push({ halts: [...halts, { ...open, out: null }], beside: [], arrives: false })
    else if (halts.length <= LIMITS.boxesInLeg + 1)
      outs.forEach((out) => follow([...halts, { ...open, out }], walk))
  }
}

/** Functions of the units at the far ends that take what arrives there. */
function nextOf(halts: readonly Halt[], { laid, view, display, input }: Walk): Open[] {
  const last = halts.at(-1) as Halt
  const out = last.out
  if (!out) return []
  const links = laid.filter((l) => leavesBy(l, last.unit, out))
  const units = [...new Set(links.map((l) => l.link.to.unit))]
  return units
    .filter((unit) => !halts.some((h) => h.unit === unit))
    .flatMap((unit) => {
      const device = view.device(unit)
      if (!device) return []
      const arriving = links.filter((l) => l.link.to.unit === unit)
      const taking = device.functions.flatMap((fn) =>
        inputsOf(fn).flatMap((key): Open[] => {
          const jack = device.jacks.find((j) => j.key === key)
          const fed =
            jack && isPictureForm(jack.form) && takesAt(fn, key) && isFed(arriving, jack, out)
          return fed ? [{ unit, device, fn, in: jack }] : []
        }),
      )
      const shows = taking.filter((t) => t.fn.kind === 'shows')
      const asked = shows.filter((t) => t.fn.key === input)
      const atDisplay = asked.length > 0 ? asked : shows
      return unit === display && atDisplay.length > 0 ? atDisplay : taking
    })
}

const isFed = (arriving: readonly Laid[], into: Jack, out: Jack): boolean =>
  arriving.some(({ link, way }) =>
    way?.pairs.some(
      (p) => touches(out, link.from.port, p.from) && touches(into, link.to.port, p.to),
    ),
  )

/** Functions that take the sound which is led to a unit beside the path. */
function besides({ halts }: Path, laid: readonly Laid[], view: ShelfView): Halt[] {
  const units = [...new Set(laid.map((l) => l.link.to.unit))]
  return units
    .filter((unit) => !halts.some((h) => h.unit === unit))
    .flatMap((unit): Halt[] => {
      const device = view.device(unit)
      const ports = laid.filter((l) => l.link.to.unit === unit).map((l) => l.link.to.port)
      const isLedTo = (key: Key): boolean =>
        device?.jacks.some(
          (j) =>
            j.key === key && j.form === 'sound' && j.contacts.some((c) => ports.includes(c.port)),
        ) ?? false
      const fn = device?.functions.find((f) => inputsOf(f).some(isLedTo))
      return device && fn ? [{ unit, device, fn, in: null, out: null }] : []
    })
}

/** The same path once for each carrier that the first box with several of them could put out as it is set. */
export function byCarrier(path: Path, named: readonly Setting[]): Path[] {
  const at = path.halts.findIndex((h) => carriersOf(h).length > 1)
  const halt = path.halts[at]
  if (!halt) return [path]
  const allowed = carriersOf(halt).filter((rf) =>
    (rf.while ?? []).every((c) => {
      const set = named.find((s) => s.unit === halt.unit && s.control === c.control)
      return !set || c.in.includes(set.position)
    }),
  )
  const tried = (rf: RfGive): Path => ({
    ...path,
    halts: path.halts.map((h, i) => (i === at ? { ...halt, rf } : h)),
  })
  return allowed.length > 0 ? allowed.map(tried) : [path]
}

const carriersOf = ({ fn, out }: Halt): readonly RfGive[] =>
  fn.gives.find((g) => g.jack === out?.key)?.rf ?? []
