import { DEMO } from '@coaxwain/demo'
import { jackOf, type DeviceModel, type PieceModel } from '@coaxwain/models'
import type { Uid } from '@coaxwain/shelf'
import { isPictureForm } from '@coaxwain/signal'
import { withTails } from './mutate'

/** A model of the demo catalogue with its uid. */
export interface Named<M> {
  readonly uid: Uid
  readonly model: M
}

const models = Object.entries(DEMO.models)

export const DEVICES: readonly Named<DeviceModel>[] = models.flatMap(([uid, model]) =>
  model.type === 'device' ? [{ uid, model }] : [],
)

export const PIECES: readonly Named<PieceModel>[] = models.flatMap(([uid, model]) =>
  model.type === 'piece' ? [{ uid, model }] : [],
)

/** Leads that end in tails instead of their second plug. */
export const TAILED: readonly Named<PieceModel>[] = PIECES.flatMap(({ uid, model }) => {
  const tailed = withTails(model)
  return tailed ? [{ uid: `${uid}-tailed`, model: tailed }] : []
})

const hasPicture = (model: DeviceModel, keys: readonly string[]): boolean =>
  keys.some((key) => isPictureForm(jackOf(model, key).form))

/** Passes a picture on. */
export const BOXES = DEVICES.filter(({ model }) =>
  model.functions.some(
    (f) =>
      hasPicture(model, [...f.needs, ...(f.oneOf ?? [])]) &&
      hasPicture(
        model,
        f.gives.map((g) => g.jack),
      ),
  ),
)

export const SOURCES = DEVICES.filter(({ model }) =>
  model.functions.some((f) => f.kind === 'plays'),
)

export const DISPLAYS = DEVICES.filter(({ model }) => model.display !== undefined)

export const SILENT_DISPLAYS = DISPLAYS.filter(
  ({ model }) => model.display?.loudspeakers === 'none',
)

export const RF_DISPLAYS = DISPLAYS.filter(({ model }) =>
  model.functions
    .filter((f) => f.kind === 'shows')
    .every((f) => f.needs.every((key) => jackOf(model, key).form === 'rf')),
)

export const LOUDSPEAKERS = DEVICES.filter(({ model }) =>
  model.functions.some((f) => f.kind === 'makes-sound'),
)

export const MIXERS = DEVICES.filter(({ model }) =>
  model.functions.some((f) => f.kind === 'mixes-sound'),
)
