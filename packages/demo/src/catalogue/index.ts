import type { Model } from '@coaxwain/models'
import type { Uid } from '@coaxwain/shelf'
import { modelUid } from '../uid'
import { ADAPTERS } from './adapters'
import { AERIAL_SETS_525 } from './aerial-sets-525'
import { AERIAL_SWITCHES } from './aerial-switches'
import { AERIALS, SOUND } from './aerials-and-sound'
import { BENCH_625 } from './bench-625'
import { COMPUTERS } from './computers'
import { CONSOLES } from './consoles'
import { CONVERTERS } from './converters'
import { COUNTER_625 } from './counter-625'
import { DISTRIBUTION } from './distribution'
import { LEADS } from './leads'
import { MODULATORS } from './modulators'
import { MONITORS } from './monitors'
import { PLAYERS } from './players'
import { RECEIVERS } from './receivers'
import { RECORDERS } from './recorders'
import { SELECTORS } from './selectors'
import { SETS_625 } from './sets-625'
import { TRANSCODERS } from './transcoders'
import { VIDEO_SETS_525 } from './video-sets-525'
import { VISITORS_625 } from './visitors-625'

const DEVICES = {
  ...PLAYERS,
  ...RECORDERS,
  ...CONSOLES,
  ...COMPUTERS,
  ...RECEIVERS,
  ...MODULATORS,
  ...AERIAL_SETS_525,
  ...VIDEO_SETS_525,
  ...SETS_625,
  ...MONITORS,
  ...SELECTORS,
  ...AERIAL_SWITCHES,
  ...CONVERTERS,
  ...TRANSCODERS,
  ...DISTRIBUTION,
  ...AERIALS,
  ...SOUND,
  ...VISITORS_625,
  ...BENCH_625,
  ...COUNTER_625,
}

const PIECES = { ...LEADS, ...ADAPTERS }

export type DeviceSlug = keyof typeof DEVICES
export type PieceSlug = keyof typeof PIECES
export type ModelSlug = DeviceSlug | PieceSlug

const BY_SLUG: Readonly<Record<ModelSlug, Model>> = { ...DEVICES, ...PIECES }

export const modelOf = (slug: ModelSlug): Model => BY_SLUG[slug]

/** The shared catalogue. */
export const MODELS: Readonly<Record<Uid, Model>> = Object.fromEntries(
  Object.entries(BY_SLUG).map(([slug, model]) => [modelUid(slug), model]),
)
