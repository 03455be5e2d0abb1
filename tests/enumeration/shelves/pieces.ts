import { jackOf, type PieceModel } from '@coaxwain/models'
import type { Link, Unit, Uid } from '@coaxwain/shelf'
import type { Chance } from '../../support/chance'
import { portIn, refOf, type Box, type Stock } from '../bench'
import { Layout, type Wire } from '../layout'
import { pathsBetween } from '../paths'
import { pictureWires, soundWires, type End } from '../wires'
import type { Named } from './parts'
import type { Drawn } from './walk'

/** Longer runs are left to what else lies in the drawer. */
const MOST_IN_LINK = 2
const MOST_OF_A_SORT = 6

/** Pieces that were drawn for a way, and whether one of them serves two pairs of units. */
export interface DrawnPieces {
  readonly pieces: readonly Uid[]
  readonly shares: boolean
}

/** Leads that would join the drawn devices, and those for the sound where it is wanted; null where none do. */
export function piecesFor(
  drawn: readonly Drawn[],
  sounds: readonly (readonly [from: Drawn, to: Drawn])[],
  all: readonly Named<PieceModel>[],
  chance: Chance,
): DrawnPieces | null {
  const boxes = new Map([...drawn, ...sounds.flat()].map((d, i) => [d, boxOf(d, i)]))
  const drawer: Stock[] = chance
    .shuffled(all)
    .filter(({ model }) => model.kind !== 'terminator' && !chance.isHit(0.15))
    .map(({ uid, model }) => ({ model: uid, piece: model, count: MOST_OF_A_SORT }))
  const wires = [
    ...drawn.slice(1).flatMap((to, i) => {
      const from = drawn[i]!
      const out = { box: boxes.get(from)!, jack: jackOf(from.device.model, from.give!.jack) }
      const into = { box: boxes.get(to)!, jack: jackOf(to.device.model, to.in!) }
      return wiresBetween(out, into, chance.pickIfAny(pictureWires(out.jack, into.jack)), drawer)
    }),
    ...sounds.flatMap(([from, to]) =>
      soundBetween([from, boxes.get(from)!], [to, boxes.get(to)!], drawer),
    ),
  ]
  if (wires.some((w) => w.paths.length === 0)) return null
  const shuffled = wires.map((w) => ({ ...w, paths: chance.shuffled(w.paths) }))
  const laid = new Layout(drawer, shuffled).solve(MOST_OF_A_SORT)
  if (!laid) return null
  const uses = laid.links.flatMap((l) => l.pieces.map((p) => `${p.copy} ${p.model}`))
  const pieces = [...new Set(uses)].map((use) => use.slice(use.indexOf(' ') + 1))
  return { pieces, shares: sharedPieces(laid.links).length > 0 }
}

/** Pieces that serve more than one pair of units. */
export function sharedPieces(links: readonly Link[]): string[] {
  const served = new Map<string, Set<string>>()
  for (const { from, to, pieces } of links) {
    for (const { model, copy } of pieces) {
      const pairs = served.get(`${model} ${copy}`) ?? new Set()
      served.set(`${model} ${copy}`, pairs.add([from.unit, to.unit].sort().join(' ')))
    }
  }
  return [...served].flatMap(([piece, pairs]) => (pairs.size > 1 ? [piece] : []))
}

const boxOf = ({ device }: Drawn, index: number): Box => ({
  unit: { uid: `drawn-${index}`, forms: [], functions: [] } as unknown as Unit,
  device: device.model,
  powered: true,
})

type Pairs = ReturnType<typeof soundWires>[number]

const wiresBetween = (
  out: End,
  into: End,
  pairs: Pairs | undefined,
  drawer: readonly Stock[],
): Wire[] =>
  (pairs ?? []).map(([from, to]) => ({
    from: refOf(out.box, from.port),
    to: refOf(into.box, to.port),
    carried: { from: from.circuit, to: to.circuit },
    paths: pathsBetween(
      { port: portIn(out.box, from.port), circuit: from.circuit },
      { port: portIn(into.box, to.port), circuit: to.circuit },
      drawer,
      MOST_IN_LINK,
    ),
  }))

/** Straight wires for the sound, where both have sockets for it. */
function soundBetween(
  [from, outBox]: readonly [Drawn, Box],
  [to, inBox]: readonly [Drawn, Box],
  drawer: readonly Stock[],
): Wire[] {
  const give = from.fn.gives.find((g) => isSound(from, g.jack))
  const input = [...to.fn.needs, ...(to.fn.optional ?? []).map((o) => o.jack)].find((key) =>
    isSound(to, key),
  )
  if (!give || input === undefined) return []
  const out = { box: outBox, jack: jackOf(from.device.model, give.jack) }
  const into = { box: inBox, jack: jackOf(to.device.model, input) }
  const sets = soundWires(out, into, false)
  const both = sets.find(([a, b]) => a && b && a[1] !== b[1] && a[1].circuit !== 'audio-r')
  return wiresBetween(out, into, both ?? sets.find((set) => set.length === 1), drawer)
}

const isSound = ({ device }: Drawn, key: string): boolean =>
  jackOf(device.model, key).form === 'sound'
