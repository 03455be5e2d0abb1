import { jackOf, type DeviceModel, type Key, type PieceModel } from '@coaxwain/models'
import type { Uid } from '@coaxwain/shelf'
import type { Chance } from '../../support/chance'
import { enumerate } from '../enumerate'
import { nameOf, vectorOf } from '../vectors'
import { bareShelf, shelve, type DeviceDraft, type Shelf } from './draft-shelf'
import { cut, inOneCase, isSplit, mutated, withConflict } from './mutate'
import {
  BOXES,
  DISPLAYS,
  LOUDSPEAKERS,
  MIXERS,
  PIECES,
  RF_DISPLAYS,
  SILENT_DISPLAYS,
  SOURCES,
  TAILED,
  type Named,
} from './parts'
import { piecesFor, type DrawnPieces } from './pieces'
import { drawBoxes, drawSource, takersIn, type Drawn } from './walk'

export const MOST_BOXES = 5
export const MOST_PIECES = 6

/** What a recipe asks of the way that is drawn for it. */
interface Wish {
  readonly boxes: number
  readonly displays: readonly Named<DeviceModel>[]
  /** Sound on leads from the source to the display, past the boxes. */
  readonly past?: boolean
  /** Loudspeakers beside the way, for the sound of the source. */
  readonly speakers?: Named<DeviceModel>
  /** Leads and adapters to draw from, where not from all of the catalogue. */
  readonly from?: readonly Named<PieceModel>[]
  /** Which ends are wanted, before anybody looks for what may lie between. */
  readonly areWanted?: (source: Drawn, display: Named<DeviceModel>) => boolean
}

/** A way that would roughly work, and the pieces for it. */
interface Way extends DrawnPieces {
  readonly drawn: readonly Drawn[]
}

const MOST_TRIES = 2000

/** Draws ways until one comes about with few enough pieces. */
function drawWay(chance: Chance, wish: Wish): Way {
  for (let n = 0; n < MOST_TRIES; n++) {
    const drawn = drawChain(chance, wish)
    const laid = drawn && piecesFor(drawn, soundsFor(drawn, wish), wish.from ?? PIECES, chance)
    if (drawn && laid && laid.pieces.length <= MOST_PIECES) return { drawn, ...laid }
  }
  throw new Error(`no way with ${wish.boxes} boxes was drawn`)
}

function drawChain(chance: Chance, wish: Wish): Drawn[] | null {
  const display = chance.pick(wish.displays)
  const sources = SOURCES.filter((s) => s !== display)
  const start = drawSource(chance, chance.pick(sources))
  if (!start || wish.areWanted?.(start.drawn, display) === false) return null
  const boxes = drawBoxes(chance, wish.boxes, start.picture)
  if (!boxes || boxes.drawn.some((d) => d.device === display || d.device === start.drawn.device)) {
    return null
  }
  const end = chance.pickIfAny(
    takersIn(display, boxes.picture).filter((t) => t.fn.kind === 'shows'),
  )
  return end ? [start.drawn, ...boxes.drawn, { ...end, give: null }] : null
}

/** Sound from unit to unit, or from the source to the display or to loudspeakers. */
function soundsFor(drawn: readonly Drawn[], wish: Wish): [Drawn, Drawn][] {
  const [first, last] = [drawn[0]!, drawn.at(-1)!]
  if (wish.speakers) return speakingBy(wish.speakers).map((to) => [first, to])
  return wish.past ? [[first, last]] : drawn.slice(1).map((to, i) => [drawn[i]!, to])
}

const speakingBy = (device: Named<DeviceModel>): Drawn[] =>
  device.model.functions
    .filter((fn) => fn.kind === 'makes-sound')
    .map((fn) => ({ device, fn, in: null, give: null }))

// ---------------------------------------------------------------- what stands beside the way

const draftOf = ({ uid, model }: Named<DeviceModel>): DeviceDraft => ({ model: uid, device: model })

/** A little of everything, so that there are other ways, and ways that lead nowhere. */
function withOthers(chance: Chance, boxes: readonly DeviceDraft[], share: number): DeviceDraft[] {
  const all = [...boxes]
  while (all.length < MOST_BOXES && chance.isHit(share)) all.push(draftOf(chance.pick(BOXES)))
  return all
}

function withMorePieces(chance: Chance, pieces: readonly Uid[], share: number): Uid[] {
  const all = [...pieces]
  while (all.length < MOST_PIECES && chance.isHit(share)) {
    all.push(all.length > 0 && chance.isHit(0.3) ? chance.pick(all) : chance.pick(PIECES).uid)
  }
  return all
}

/** One device in so many is made another, as its own model. */
function changed(chance: Chance, draft: DeviceDraft, share: number): DeviceDraft {
  if (!chance.isHit(share)) return draft
  const device = mutated(draft.device, chance)
  return { model: `${draft.model}-changed-${chance.below(1_000_000)}`, device }
}

interface Extras {
  readonly boxes?: readonly DeviceDraft[]
  readonly others: number
  readonly pieces: readonly Uid[]
  readonly morePieces: number
  readonly change: number
  readonly tried: number
}

function shelfOf(recipe: string, way: Way, extras: Extras, chance: Chance): Shelf {
  const [source, ...rest] = way.drawn.map((d) => draftOf(d.device))
  const [display] = rest.splice(-1)
  const own = extras.boxes ?? rest
  const boxes = withOthers(chance, own, extras.others).slice(0, MOST_BOXES)
  const pieces = withMorePieces(chance, extras.pieces, extras.morePieces).slice(0, MOST_PIECES)
  const change = (draft: DeviceDraft): DeviceDraft => changed(chance, draft, extras.change)
  const leads = pieces.map((uid) => leadOf(uid, chance, extras.change))
  return shelve(
    {
      recipe,
      source: change(source!),
      playing: way.drawn[0]!.fn.key,
      display: change(display!),
      boxes: boxes.map(change),
      pieces: leads,
      tried: extras.tried,
    },
    chance,
  )
}

function leadOf(uid: Uid, chance: Chance, change: number) {
  const { model } = [...PIECES, ...TAILED].find((p) => p.uid === uid)!
  return chance.isHit(change / 3)
    ? { model: `${uid}-cut`, piece: cut(model, chance) }
    : { model: uid, piece: model }
}

// ---------------------------------------------------------------- recipes

const tried = (chance: Chance): number => chance.pick([1, 1, 0.9, 0.7, 0])

type Recipe = (chance: Chance) => Shelf

const plain =
  (name: string, wish: (chance: Chance) => Wish, keep = 1): Recipe =>
  (chance) => {
    const way = drawWay(chance, wish(chance))
    const pieces = way.pieces.filter(() => chance.isHit(keep))
    const extras = { others: 0.6, morePieces: 0.5, change: 0.12, tried: tried(chance) }
    return shelfOf(name, way, { ...extras, pieces }, chance)
  }

const speakersFor = (chance: Chance): DeviceDraft[] => [
  draftOf(chance.pick(LOUDSPEAKERS)),
  ...(chance.isHit(0.4) ? [draftOf(chance.pick(MIXERS))] : []),
]

const PHONO_PAIR = PIECES.filter(
  ({ model }) =>
    model.kind === 'lead' && model.a.length === 2 && model.a[0]?.connector === 'phono-plug',
)

/** Loudspeakers beside the way, and a lead for them. */
const speakers: Recipe = (chance) => {
  const way = drawWay(chance, { boxes: chance.below(2), displays: DISPLAYS })
  const own = way.drawn.slice(1, -1).map((d) => draftOf(d.device))
  const boxes = [...own, ...speakersFor(chance)]
  const pieces = [chance.pick(PHONO_PAIR).uid, ...way.pieces]
  const extras = { others: 0.3, morePieces: 0.6, change: 0.1, tried: tried(chance) }
  return shelfOf('speakers', way, { ...extras, boxes, pieces }, chance)
}

/** A lead of which a picture takes some cores to one unit, and a sound the others to another. */
const sharedLead: Recipe = (chance) => {
  const beside = chance.pick(LOUDSPEAKERS)
  const { way } = drawWayWith(
    chance,
    () => ({
      from: [...PIECES, ...TAILED],
      ...(chance.isHit(0.3)
        ? { boxes: 1 + chance.below(2), displays: DISPLAYS, past: true }
        : { boxes: chance.below(2), displays: SILENT_DISPLAYS, speakers: beside }),
    }),
    ({ shares }) => shares || undefined,
  )
  const own = way.drawn.slice(1, -1).map((d) => draftOf(d.device))
  const mixers = chance.isHit(0.2) ? [draftOf(chance.pick(MIXERS))] : []
  const boxes = [...own, draftOf(beside), ...mixers]
  const extras = { others: 0.2, morePieces: 0.3, change: 0.04, tried: chance.pick([1, 1, 0.9]) }
  return shelfOf('shared lead', way, { ...extras, boxes, pieces: way.pieces }, chance)
}

/** Two units of one model, which has in one case what the way needs twice. */
const twice: Recipe = (chance) => {
  const way = drawWay(chance, { boxes: 2, displays: DISPLAYS })
  const [a, b] = way.drawn.slice(1, -1).map((d) => d.device)
  const device = inOneCase(a!.model, b!.model)
  const both = { model: `${a!.uid}-with-${b!.uid}`, device }
  const extras = { others: 0.3, morePieces: 0.3, change: 0, tried: tried(chance) }
  return shelfOf('twice', way, { ...extras, boxes: [both, both], pieces: way.pieces }, chance)
}

/** Ways until something is found in one. */
function drawWayWith<T>(
  chance: Chance,
  wish: () => Wish,
  find: (way: Way) => T | undefined,
): { readonly way: Way; readonly found: T } {
  for (let n = 0; n < MOST_TRIES; n++) {
    const way = drawWay(chance, wish())
    const found = find(way)
    if (found !== undefined) return { way, found }
  }
  throw new Error('no way of the kind was drawn')
}

/** The sound comes inside the picture. */
const isWhole = ({ device }: Drawn, key: Key): boolean =>
  ['rf', 'hdmi'].includes(jackOf(device.model, key).form)

/** A switch that cannot stand for the picture and for the sound at once. */
const conflict: Recipe = (chance) => {
  const splitIn = ({ drawn }: Way): number[] =>
    drawn.flatMap((d, i) => (isSplit(d.fn) && !isWhole(d, d.in ?? d.give!.jack) ? [i] : []))
  const { way, found: at } = drawWayWith(
    chance,
    () => ({ boxes: chance.below(2), displays: DISPLAYS }),
    (w) => chance.pickIfAny(splitIn(w)),
  )
  const drawn = way.drawn.map((d, i): Drawn => {
    if (i !== at) return d
    const model = withConflict(d.device.model, chance)
    return { ...d, device: { uid: `${d.device.uid}-conflict`, model } }
  })
  const extras = { others: 0.2, morePieces: 0.3, change: 0.02, tried: chance.pick([1, 1, 0.9]) }
  return shelfOf('conflict', { ...way, drawn }, { ...extras, pieces: way.pieces }, chance)
}

const isRepeated = (uid: Uid, all: readonly Uid[]): boolean =>
  all.indexOf(uid) < all.lastIndexOf(uid)

/** The source gives nothing in a form that the display takes. */
function needBoxes({ device, fn }: Drawn, display: Named<DeviceModel>): boolean {
  const formsOf = ({ model }: Named<DeviceModel>, keys: readonly Key[]): string[] =>
    keys.map((key) => jackOf(model, key).form).filter((form) => form !== 'sound')
  const given = formsOf(
    device,
    fn.gives.map((g) => g.jack),
  )
  const shown = display.model.functions.filter((f) => f.kind === 'shows')
  const taken = formsOf(
    display,
    shown.flatMap((f) => [...f.needs, ...(f.oneOf ?? [])]),
  )
  return given.every((form) => !taken.includes(form))
}

const piecesOf = (uids: readonly Uid[]) =>
  uids.map((uid) => ({ model: uid, piece: PIECES.find((p) => p.uid === uid)!.model }))

/** Without the second of its sort the way, everything else apart, does not come about, or not as well. */
function isMissed(lost: Uid, { drawn, pieces }: Way): boolean {
  const [source, ...rest] = drawn.map((d) => draftOf(d.device))
  const [display] = rest.splice(-1)
  const vectors = (uids: readonly Uid[]): string => {
    const { snapshot, question } = bareShelf({
      ...{ recipe: '', tried: 1, playing: drawn[0]!.fn.key, pieces: piecesOf(uids) },
      ...{ source: source!, display: display!, boxes: rest },
    })
    return enumerate(snapshot, question)
      .map((h) => nameOf(vectorOf(h)))
      .join()
  }
  const whole = vectors(pieces)
  return whole !== '' && whole !== vectors(withoutOne(lost, pieces))
}

const withoutOne = (lost: Uid, pieces: readonly Uid[]): Uid[] =>
  pieces.filter((uid, i) => uid !== lost || i !== pieces.indexOf(uid))

/** One lead where two of its sort would be wanted. */
const lastLead: Recipe = (chance) => {
  const repeatedIn = ({ pieces }: Way): Uid[] =>
    [...new Set(pieces)].filter((uid) => isRepeated(uid, pieces))
  const { way, found } = drawWayWith(
    chance,
    () => ({ boxes: chance.isHit(0.3) ? 2 : 1, displays: DISPLAYS, areWanted: needBoxes }),
    (w) => repeatedIn(w).find((uid) => isMissed(uid, w)),
  )
  const pieces = withoutOne(found, way.pieces)
  const extras = { others: 0.2, morePieces: 0.1, change: 0.02, tried: chance.pick([1, 1, 0.9]) }
  return shelfOf('last lead', way, { ...extras, pieces }, chance)
}

const SHARES: readonly (readonly [times: number, recipe: Recipe])[] = [
  [1, plain('direct', () => ({ boxes: 0, displays: DISPLAYS }))],
  [1, plain('boxes', (chance) => ({ boxes: 1 + chance.below(3), displays: DISPLAYS }))],
  [1, plain('rf', (chance) => ({ boxes: chance.below(3), displays: RF_DISPLAYS }))],
  [1, plain('rf', (chance) => ({ boxes: 1 + chance.below(2), displays: RF_DISPLAYS }))],
  [1, plain('past', (chance) => ({ boxes: 1 + chance.below(2), displays: DISPLAYS, past: true }))],
  [7, plain('broken', (chance) => ({ boxes: chance.below(3), displays: DISPLAYS }), 0.4)],
  [2, speakers],
  [3, sharedLead],
  [3, twice],
  [6, conflict],
  [4, lastLead],
]

/** Recipes, each as often as it has shares. */
const RECIPES = SHARES.flatMap(([times, recipe]) => new Array<Recipe>(times).fill(recipe))

/** The shelf of a number: the same whenever it is asked for. */
export const drawShelf = (chance: Chance): Shelf => chance.pick(RECIPES)(chance)

/** The same without the recipe that takes longest to draw. */
export const drawQuickly = (chance: Chance): Shelf =>
  chance.pick(RECIPES.filter((recipe) => recipe !== lastLead))(chance)
