import type { DeviceModel } from '@coaxwain/models'
import type { Hookup, HookupStep, Question, Uid } from '@coaxwain/shelf'
import { fullName, type Lookup } from '../../format/lookup'
import { capital, type Speak } from '../../format/words'
import { cableKind, tagOf } from '../drawing/layout/cables'
import type {
  CableInput,
  DrawingInput,
  ScreenLine,
  Sign,
  UnitControlInput,
  UnitInput,
} from '../drawing/layout/drawing-input'
import { symbolOf } from '../drawing/layout/symbols'
import { carriedWords } from './carried-words'
import { controlSpec, positionLabel } from './control-spec'
import { circuitsOf, linkParts, type LinkPiece } from './link-parts'
import { runNumbers, settingNumber } from './step-plan'
import { unitOrder } from './unit-order'
import { isMoulded, portInputs } from './unit-ports'

export interface DrawingSource {
  readonly hookup: Hookup
  readonly question: Pick<Question, 'display'>
  readonly lookup: Lookup
  readonly steps: readonly HookupStep[]
  readonly say: Speak
  /** Whether what leaves each unit is written under it. */
  readonly carried: boolean
}

/** Chooses words, marks and order: everything that the layout is not to know. */
export const toDrawing = (source: DrawingSource): DrawingInput => ({
  units: unitOrder(source.hookup).flatMap((uid) => toUnit(uid, source)),
  cables: source.hookup.links.map((_, i) => toCable(i, source)),
})

function toUnit(uid: Uid, source: DrawingSource): UnitInput[] {
  const { hookup, lookup, say } = source
  const device = lookup.device(uid)
  const unit = lookup.unit(uid)
  if (!device || !unit) return []
  const used = new Set(
    hookup.links.flatMap((l) => [l.from, l.to]).flatMap((r) => (r.unit === uid ? [r.port] : [])),
  )
  const power = device.pack ? device.ports.find((p) => p.connector.startsWith('dc-')) : undefined
  if (power) used.add(power.key)
  const kind = say(`kind.${device.kind}`)
  return [
    {
      key: uid,
      title: fullName(device),
      subtitle: unit.place === null ? kind : say('drawing.unit', { kind, place: unit.place }),
      ports: portInputs(device, used),
      controls: faceControls(uid, device, source),
      screen: screenOf(uid, device, source),
      captions: {
        back: say('drawing.back'),
        front: say('drawing.front'),
        side: say('drawing.side'),
      },
      moulded: isMoulded(device),
      pack: power ? { port: power.key, text: say('drawing.pack') } : null,
      carried: source.carried
        ? carriedWords(hookup, uid, source.question.display.unit, source)
        : null,
    },
  ]
}

/** Settings of a unit that a hand makes, with the number of their step. */
const handSettings = (uid: Uid, device: DeviceModel, { hookup, steps }: DrawingSource) =>
  hookup.settings.flatMap((setting, i) => {
    if (setting.unit !== uid || setting.why === 'moves-itself') return []
    const control = device.controls.find((c) => c.key === setting.control)
    return control ? [{ setting, control, number: settingNumber(steps, i) }] : []
  })

function faceControls(uid: Uid, device: DeviceModel, source: DrawingSource): UnitControlInput[] {
  return handSettings(uid, device, source).flatMap(({ setting, control, number }) =>
    control.access === 'menu' || control.access === 'remote'
      ? []
      : [
          {
            key: control.key,
            face: control.access === 'front' ? ('front' as const) : ('back' as const),
            spec: controlSpec(control, setting.position, source.say),
            number,
          },
        ],
  )
}

function screenOf(uid: Uid, device: DeviceModel, source: DrawingSource): UnitInput['screen'] {
  const onScreen = handSettings(uid, device, source).filter(
    ({ control }) => control.access === 'menu' || control.access === 'remote',
  )
  if (onScreen.length === 0) return null
  const byMenu = onScreen.some(({ control }) => control.access === 'menu')
  return {
    caption: source.say(byMenu ? 'drawing.menu' : 'drawing.remote'),
    lines: onScreen.map(({ setting, control, number }): ScreenLine => ({
      name: control.label,
      value: positionLabel(control, setting.position, source.say),
      number,
    })),
  }
}

function toCable(index: number, source: DrawingSource): CableInput {
  const { hookup, lookup, steps } = source
  const link = hookup.links[index]
  if (!link) throw new Error(`no link ${index}`)
  const circuits = circuitsOf(link)
  let run = 0
  const found = linkParts(link, lookup)
  const numbers = runNumbers(steps, index, found)
  const parts = found.map((part): CableInput['parts'][number] => {
    if (part.kind === 'piece') return toPiece(part)
    const look = cableKind(circuits, part.ends)
    const [lead] = part.leads
    const names = part.leads.map((l) => lookup.piece(l.model)?.name ?? '')
    return {
      kind: 'run',
      look,
      tag: tagOf(look, circuits),
      numbers: numbers[run++] ?? [],
      lead: lead ? { key: `${lead.model} ${lead.copy}`, name: names.join(', ') } : null,
    }
  })
  return { key: `link ${index}`, from: link.from, to: link.to, parts }
}

function toPiece({ use, model, ends }: LinkPiece): CableInput['parts'][number] {
  return {
    kind: 'piece',
    key: `${use.model} ${use.copy}`,
    name: capital(model.name),
    ends: [symbolOf(ends[0]), symbolOf(ends[1])],
    sign: signOf(model),
  }
}

const signOf = (model: LinkPiece['model']): Sign =>
  model.impedanceOhm && model.impedanceOhm[0] !== model.impedanceOhm[1]
    ? 'transformer'
    : model.mixes
      ? 'mix'
      : model.lossDb >= 3
        ? 'pad'
        : 'joint'
