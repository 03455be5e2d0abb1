import type { DeviceModel, Jack, Key, ModelFunction, PictureGive } from '@coaxwain/models'
import type {
  CarriedCircuit,
  Hookup,
  Leg,
  LineEnd,
  Link,
  Question,
  SeenPicture,
  Setting,
  Stop,
  Uid,
} from '@coaxwain/shelf'
import {
  FORM_MHZ,
  isSoundCircuit,
  type Circuit,
  type PictureForm,
  type PictureSignal,
} from '@coaxwain/signal'
import type { ShelfView } from '../shelf-view'
import { aerialLeg } from './aerial-leg'
import type { Laid } from './lay'
import type { Path } from './paths'
import { contactsOf, type Pair } from './ways'

/** Everything of a hookup that is still open when its links are laid. */
export interface Draft {
  readonly question: Question
  readonly laid: readonly Laid[]
  readonly ends: readonly LineEnd[]
  readonly path: Path
  /** What the source gives, of several rows that it has. */
  readonly row: PictureGive | null
  readonly settings: readonly Setting[]
  /** The unit whose loudspeakers speak. */
  readonly from: Uid | null
}

const NOTHING_SEEN: SeenPicture = { colour: false, quality: 'none', lumaMhz: 0, degradations: [] }

/** A hookup that claims nothing yet. */
export function buildHookup(draft: Draft, view: ShelfView): Hookup {
  const links = draft.laid.map((l): Link => ({ ...l.link, circuits: carriedBy(l, draft, view) }))
  return {
    legs: legsOf(draft, links, view),
    links,
    ...(draft.ends.length > 0 ? { ends: draft.ends } : {}),
    settings: draft.settings,
    picture: NOTHING_SEEN,
    sound: { sound: 'none', from: draft.from },
    worksFully: false,
    cautions: [],
    axes: { picture: 0, sound: 0, boxes: 0, pieces: 0, doubt: 0, disturbance: 0 },
  }
}

// ---------------------------------------------------------------- circuits

/** What goes over a link: of circuits that share a contact, the one that the units at its ends work with. */
function carriedBy(laid: Laid, draft: Draft, view: ShelfView): CarriedCircuit[] {
  const { link, way } = laid
  const from = view.port(link.from.unit, link.from.port)
  const to = view.port(link.to.unit, link.to.port)
  if (!way || !from || !to) return []
  if (way.pairs.length === 0) return way.meant ? [way.meant] : []
  const ranked = [...way.pairs].sort(
    (a, b) => worth(b, laid, draft, view) - worth(a, laid, draft, view),
  )
  const taken = new Set<string>()
  const kept = ranked.filter((pair) => {
    const ends = contactsOf(pair, from, to).split(' ') as [string, string]
    const names = [`from ${ends[0]}`, `to ${ends[1]}`]
    if (names.some((n) => taken.has(n))) return false
    names.forEach((n) => taken.add(n))
    return true
  })
  const meant = kept.filter((p) => p.fitness > 0)
  return (meant.length > 0 ? meant : kept.slice(0, 1)).map((p) => ({ from: p.from, to: p.to }))
}

const ON_THE_WAY = 10
const ALONE = 4

function worth(pair: Pair, laid: Laid, draft: Draft, view: ShelfView): number {
  const { link } = laid
  const { halts } = draft.path
  const out = halts.find((h) => h.unit === link.from.unit)?.out
  const into = halts.find((h) => h.unit === link.to.unit)?.in
  return (
    pair.fitness +
    (serves(out, link.from.port, pair.from) ? ON_THE_WAY : 0) +
    (serves(into, link.to.port, pair.to) ? ON_THE_WAY : 0) +
    (isSoundCircuit(pair.to) && (pair.to === 'audio-mono') === isAlone(laid, draft, view)
      ? ALONE
      : 0)
  )
}

const serves = (jack: Jack | null | undefined, port: Key, circuit: Circuit): boolean =>
  jack?.contacts.some((c) => c.port === port && c.circuit === circuit) ?? false

/** A sound socket takes both channels to both sides when its neighbour is empty, or when both come to it. */
function isAlone({ link }: Laid, { laid }: Draft, view: ShelfView): boolean {
  const jacks = (view.device(link.to.unit)?.jacks ?? []).filter(
    (j) => j.form === 'sound' && j.dir === 'in' && j.contacts.some((c) => c.port === link.to.port),
  )
  const others = jacks
    .flatMap((j) => j.contacts.map((c) => c.port))
    .filter((p) => p !== link.to.port)
  const beside = laid.some(
    (l) => l.link.to.unit === link.to.unit && others.includes(l.link.to.port),
  )
  return others.length > 0 && !beside
}

// ---------------------------------------------------------------- legs

const isSound = (link: Link): boolean =>
  link.circuits.length > 0 && link.circuits.every((c) => isSoundCircuit(c.from))

function legsOf(draft: Draft, links: readonly Link[], view: ShelfView): Leg[] {
  const indices = links.map((_, i) => i)
  const sound = indices.filter((i) => isSound(links[i] as Link))
  const aerial = aerialLeg(draft.laid, draft.question, view)
  const onAerial = new Set(aerial?.links ?? [])
  const rest = indices.filter((i) => !sound.includes(i) && !onAerial.has(i))
  const shared = [...onAerial].filter((i) => isOnPath(links[i] as Link, draft.path))
  return [
    { purpose: 'picture', stops: pictureStops(draft), links: [...rest, ...shared] },
    ...(sound.length === 0
      ? []
      : [
          {
            purpose: 'sound' as const,
            stops: soundStops(
              sound.map((i) => links[i] as Link),
              draft,
              view,
            ),
            links: sound,
          },
        ]),
    ...(aerial ? [aerial] : []),
  ]
}

const isOnPath = ({ from, to }: Link, { halts }: Path): boolean =>
  halts.some((h, i) => h.unit === from.unit && halts[i + 1]?.unit === to.unit)

const pictureStops = ({ path, row, question }: Draft): Stop[] =>
  path.halts.map((halt, i): Stop => ({
    unit: halt.unit,
    function: halt.fn.key,
    in: halt.in?.key ?? null,
    out: halt.out?.key ?? null,
    picture: i === 0 && row && halt.out ? sentBy(halt.out, row, question) : null,
    sound: 'none',
  }))

/** What the source is taken to put out; the check works out all but form, scan and colour for itself. */
function sentBy(jack: Jack, row: PictureGive, { material }: Question): PictureSignal | null {
  const scan = row.scan === 'same' ? material.scan : row.scan
  const colour = row.colour === 'same' ? material.colour : row.colour
  if (!scan || !colour) return null
  const form = jack.form as PictureForm
  return {
    form,
    scan,
    colour,
    poorest: form,
    lumaMhz: FORM_MHZ[form],
    protection: material.protection,
    shape: row.shape ?? material.shape ?? '4:3',
    direct: true,
    delayMs: 0,
    carrier: null,
  }
}

function soundStops(links: readonly Link[], draft: Draft, view: ShelfView): Stop[] {
  const units = [...new Set(links.flatMap((l) => [l.from.unit, l.to.unit]))]
  return units.flatMap((unit): Stop[] => {
    const device = view.device(unit)
    if (!device) return []
    const into = jackAt(
      device,
      'in',
      links.flatMap((l) => (l.to.unit === unit ? [l.to.port] : [])),
    )
    const out = jackAt(
      device,
      'out',
      links.flatMap((l) => (l.from.unit === unit ? [l.from.port] : [])),
    )
    const fn = workingWith(device, into, out, { draft, unit })
    if (!fn) return []
    const [entry, exit] = [into?.key ?? null, out?.key ?? null]
    return [{ unit, function: fn.key, in: entry, out: exit, picture: null, sound: 'none' }]
  })
}

const jackAt = (device: DeviceModel, dir: 'in' | 'out', ports: readonly Key[]): Jack | null =>
  device.jacks.find(
    (j) => j.form === 'sound' && j.dir === dir && j.contacts.some((c) => ports.includes(c.port)),
  ) ?? null

/** The function that handles the sound at a unit: the one that the picture takes, if it does. */
function workingWith(
  device: DeviceModel,
  into: Jack | null,
  out: Jack | null,
  { draft, unit }: { draft: Draft; unit: Uid },
): ModelFunction | null {
  const { source } = draft.question
  const onPath = draft.path.halts.find((h) => h.unit === unit)?.fn
  const own = unit === source.unit ? device.functions.filter((f) => f.key === source.playing) : []
  const inputs = (f: ModelFunction): Key[] => [
    ...f.needs,
    ...(f.oneOf ?? []),
    ...(f.optional ?? []).map((o) => o.jack),
  ]
  const handles = (f: ModelFunction): boolean =>
    (into === null || inputs(f).includes(into.key)) &&
    (out === null || f.gives.some((g) => g.jack === out.key))
  const choices = [...own, ...(onPath ? [onPath] : []), ...device.functions]
  return choices.find(handles) ?? onPath ?? own[0] ?? null
}
