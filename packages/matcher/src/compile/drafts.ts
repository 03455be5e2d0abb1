import {
  allTogether,
  inputsOf,
  jackOf,
  POWER_KEY,
  together,
  type Condition,
  type DeviceModel,
  type Give,
  type Jack,
  type Key,
  type ModelFunction,
} from '@coaxwain/models'
import { isPictureForm, type Circuit, type PictureForm } from '@coaxwain/signal'
import { embedsSound } from './signal'
import { soundEnd, type Draft, type SoundEnd, type SoundPlace } from './way'

/** The parts of a sound jack that may be used: both channels, each alone, mono. */
function soundEnds(jack: Jack): SoundEnd[] {
  const has = (c: Circuit): boolean => jack.contacts.some((k) => k.circuit === c)
  const ends: Circuit[][] = []
  if (has('audio-l') && has('audio-r')) ends.push(['audio-l', 'audio-r'])
  for (const one of ['audio-l', 'audio-r', 'audio-mono'] as const) if (has(one)) ends.push([one])
  return ends.map((circuits) => ({ jack: jack.key, circuits }))
}

const endsOf = (device: DeviceModel, key: Key): SoundEnd[] => {
  const jack = jackOf(device, key)
  return jack.form === 'sound' ? soundEnds(jack) : []
}

const isPictureJack = (device: DeviceModel, key: Key): boolean =>
  isPictureForm(jackOf(device, key).form)

/** Sound inputs that a function takes beside its picture, with the positions under which it does. */
function soundInputs(
  device: DeviceModel,
  fn: ModelFunction,
): { end: SoundEnd; stand: Condition }[] {
  const optional = (fn.optional ?? []).map((o) => ({ jack: o.jack, stand: o.while ?? [] }))
  const needed = [...fn.needs, ...(fn.oneOf ?? [])].map((jack) => ({ jack, stand: [] }))
  return [...optional, ...needed].flatMap(({ jack, stand }) =>
    endsOf(device, jack)
      .filter((end) => !isMonoSocket(jackOf(device, jack), end))
      .map((end) => ({ end, stand })),
  )
}

/** With nothing in the other socket, a left socket that takes a whole mono sound puts it on both channels. */
const isMonoSocket = (jack: Jack, { circuits }: SoundEnd): boolean => {
  const portOf = (circuit: Circuit): Key | undefined =>
    jack.contacts.find((c) => c.circuit === circuit)?.port
  return circuits.join() === 'audio-l' && portOf('audio-mono') === portOf('audio-l')
}

/** What comes in on one channel alone does not go out on the other. */
const crosses = ({ from, to, mono }: SoundPart): boolean => {
  const [a, b] = [soundEnd(from)?.circuits.join(), soundEnd(to)?.circuits.join()]
  return !mono && ((a === 'audio-l' && b === 'audio-r') || (a === 'audio-r' && b === 'audio-l'))
}

export const isSoundOnly = (device: DeviceModel, fn: ModelFunction): boolean =>
  inputsOf(fn).length > 0 && inputsOf(fn).every((k) => !isPictureJack(device, k))

interface SoundPart {
  readonly from: SoundPlace
  readonly to: SoundPlace
  readonly mono: boolean
  readonly fn: ModelFunction
  readonly stand: Condition
}

/** Everything that a unit may do with sound while one picture way is in use. */
function soundParts(
  device: DeviceModel,
  fn: ModelFunction,
  input: Key | null,
  out: Give | null,
): SoundPart[] {
  const nothing: SoundPart = { from: null, to: null, mono: false, fn, stand: [] }
  const inside = input === null || embeds(device, input)
  const separate = device.functions.filter((g) => g !== fn && isSoundOnly(device, g))
  return [
    nothing,
    ...(out === null ? takenIn(device, { ...nothing, to: null }, inside) : []),
    ...(out !== null && embeds(device, out.jack)
      ? takenIn(device, { ...nothing, to: 'picture' }, inside)
      : []),
    ...outputsBeside(device, nothing, inside),
    ...separate.flatMap((g) => soundOnlyParts(device, g)),
  ]
}

const embeds = (device: DeviceModel, key: Key): boolean =>
  embedsSound(jackOf(device, key).form as PictureForm)

/** Sound that comes inside the picture or by an input of its own, to one place. */
function takenIn(device: DeviceModel, to: SoundPart, inside: boolean): SoundPart[] {
  const apart = soundInputs(device, to.fn).map(({ end, stand }) => ({ ...to, from: end, stand }))
  return inside ? [{ ...to, from: 'picture' }, ...apart] : apart
}

/** Sound that goes out by a jack of its own. */
function outputsBeside(device: DeviceModel, part: SoundPart, inside: boolean): SoundPart[] {
  const outputs = part.fn.gives.flatMap((give) =>
    give.sound ? endsOf(device, give.jack).map((to) => ({ to, give })) : [],
  )
  return outputs.flatMap(({ to, give }) =>
    takenIn(device, { ...part, to, mono: give.sound === 'mono' }, inside).flatMap((taken) => {
      const stand = together(taken.stand, give.while)
      return stand && !crosses(taken) ? [{ ...taken, stand }] : []
    }),
  )
}

export function soundOnlyParts(device: DeviceModel, fn: ModelFunction): SoundPart[] {
  return soundInputs(device, fn).flatMap(({ end: from, stand }) =>
    fn.gives.flatMap((give) =>
      endsOf(device, give.jack).flatMap((to): SoundPart[] => {
        const both = together(stand, give.while)
        const part = both && { from, to, mono: give.sound === 'mono', fn, stand: both }
        return part && !crosses(part) ? [part] : []
      }),
    ),
  )
}

/** The power states in which a function acts. */
function powerFor(fn: ModelFunction): Condition {
  if (fn.power === 'none') return []
  return [{ control: POWER_KEY, in: fn.power === 'on' ? ['on'] : ['on', 'standby'] }]
}

/** Every way through a device that one function allows. */
export function draftsOf(device: DeviceModel, fn: ModelFunction): Draft[] {
  const inputs = [...fn.needs, ...(fn.oneOf ?? [])].filter((k) => isPictureJack(device, k))
  const outputs = fn.gives.filter((g) => isPictureJack(device, g.jack))
  const ins: readonly (Key | null)[] = inputs.length > 0 ? inputs : [null]
  const outs: readonly (Give | null)[] = outputs.length > 0 ? outputs : [null]
  return ins.flatMap((input) =>
    outs.flatMap((out) =>
      soundParts(device, fn, input, out).flatMap((part): Draft[] => {
        const own = allTogether(fn.while, out?.while, powerFor(fn))
        const other = part.fn === fn ? part.stand : together(part.fn.while, part.stand)
        const stand = own && other ? together(own, other) : null
        if (!stand) return []
        return [
          {
            fn,
            in: input,
            out,
            soundFrom: part.from,
            soundTo: part.to,
            soundMono: part.mono,
            functions: part.fn === fn ? [fn.key] : [fn.key, part.fn.key],
            stand,
          },
        ]
      }),
    ),
  )
}

/** Ways that handle sound alone: mixers, sound selectors, loudspeakers. */
export function soundDraftsOf(device: DeviceModel, fn: ModelFunction): Draft[] {
  const into =
    fn.kind === 'makes-sound'
      ? soundInputs(device, fn).map(({ end, stand }): SoundPart => ({
          from: end,
          to: null,
          mono: false,
          fn,
          stand,
        }))
      : []
  return [...soundOnlyParts(device, fn), ...into].flatMap((part): Draft[] => {
    const stand = allTogether(fn.while, part.stand, powerFor(fn))
    if (!stand) return []
    return [
      {
        fn,
        in: null,
        out: null,
        soundFrom: part.from,
        soundTo: part.to,
        soundMono: part.mono,
        functions: [fn.key],
        stand,
      },
    ]
  })
}
