import type { Condition } from '@coaxwain/models'
import type { OffAir, Unit } from '@coaxwain/shelf'
import type { Core, Sig } from '../compile/signal'
import { pathOf, type Label } from '../search/label'
import type { Frame } from '../search/layout'
import type { Node, Wiring } from '../search/wiring'
import { channelControl, chooseChannel, type ChosenChannel } from './channels'
import type { PieceStock } from './links'
import type { Placing } from './settings'

export interface BuildInput {
  readonly wiring: Wiring
  readonly unitOf: ReadonlyMap<Node, Unit>
  readonly frame: Frame
  readonly offAir: readonly OffAir[]
  /** Shared by hookups that are wired at once, so that a lead that serves both is one lead. */
  readonly pieces?: PieceStock | undefined
  /** Positions where a unit serves several hookups at once. */
  readonly standOf?: ReadonlyMap<Node, Condition> | undefined
}

/** One unit of the picture's path, first to last. */
export interface PathStop extends Placing {
  readonly node: Node
  /** What leaves it; at the display, what arrives. */
  readonly sig: Sig
}

export function unitFor({ wiring, unitOf, frame }: BuildInput, node: Node): Unit {
  const { chain } = wiring
  const fixed = node === chain[0] ? frame.source : node === chain.at(-1) ? frame.display : null
  const unit = fixed ? fixed.units[0] : unitOf.get(node)
  if (!unit) throw new Error(`no unit was picked for ${node.way.fn.key}`)
  return unit
}

/** The carrier sets on the way, narrowed by whoever receives them, each with its channel. */
function channelsOnPath(path: readonly Label[], arriving: Core, offAir: readonly OffAir[]) {
  const sent = new Map<Label, ChosenChannel>()
  const received = new Map<Label | 'end', ChosenChannel>()
  let maker: Label | null = null
  const receive = (at: Label | 'end', core: Core): void => {
    if (!maker || !core.carrier) return
    const chosen = chooseChannel(core.carrier, offAir)
    sent.set(maker, chosen)
    received.set(at, chosen)
    maker = null
  }
  for (const label of path) {
    if (label.way.fn.tunedBy !== undefined && label.step) receive(label, label.step.taken.core)
    if ((label.way.out?.rf ?? []).length > 0) maker = label
  }
  receive('end', arriving)
  return { sent, received }
}

export function placeStops(input: BuildInput): PathStop[] {
  const { found, chain } = input.wiring
  const path = pathOf(found.last)
  const { sent, received } = channelsOnPath(path, found.step.taken.core, input.offAir)
  const narrowScreen = input.frame.display.device.display?.shape === '4:3'
  const boxes = path.map((label, i): PathStop => {
    const channel = sent.get(label)
    const { way } = label
    return {
      ...placing(input, chain[i]!, label.stand),
      receives: received.get(label) ?? null,
      sends: channel ? { channel, control: channelControl(way.variant, way.out?.rf ?? []) } : null,
      narrowScreen: narrowScreen && label.prev === null,
      sig: label.sig,
    }
  })
  const end: PathStop = {
    ...placing(input, chain.at(-1)!, found.stand),
    receives: received.get('end') ?? null,
    sig: { ...found.last.sig, core: found.step.taken.core },
  }
  return [...boxes, end]
}

function placing(input: BuildInput, node: Node, stand: Condition) {
  return {
    node,
    unit: unitFor(input, node),
    variant: node.way.variant,
    way: node.way,
    stand: input.standOf?.get(node) ?? stand,
    receives: null,
    sends: null,
    narrowScreen: false,
  }
}

/** Boxes that handle sound alone, and loudspeakers, are set like any other unit. */
export const placeAlone = (input: BuildInput): (Placing & { readonly node: Node })[] =>
  input.wiring.alone.map((node) => placing(input, node, node.way.stand))
