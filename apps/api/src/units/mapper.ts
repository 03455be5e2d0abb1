import type { UnitDetail, UnitSummary } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import { portBadges, unitBadge, type Unit, type UnitBadge } from '@coaxwain/shelf'
import type { Overlays, UnitRow } from './unit-rows'
import { withAdditions } from './unit-rules'

export interface Standing {
  readonly uid: string
  readonly path: readonly string[]
}

/** What a row cannot say by itself. */
export interface Around {
  readonly model: Model
  readonly overlays: Overlays
  readonly place: Standing | null
}

const PATH_JOINT = ', '

export const toUnit = (row: UnitRow, { overlays, place }: Omit<Around, 'model'>): Unit => ({
  uid: row.uid,
  model: row.modelUid,
  quantity: row.quantity,
  working: row.working,
  holding: row.holding,
  place: place ? place.path.join(PATH_JOINT) : null,
  forms: overlays.forms,
  functions: overlays.functions,
  modifications: overlays.modifications,
  stands: overlays.stands,
  remotePresent: row.remotePresent,
})

const NO_PORTS: UnitBadge = { state: 'untested', inThatState: 0, tried: 0, of: 0 }

const badgeOf = (row: UnitRow, around: Around): UnitBadge =>
  around.model.type === 'device'
    ? unitBadge(
        portBadges(toUnit(row, around), withAdditions(around.model, around.overlays.modifications)),
      )
    : NO_PORTS

export const toUnitSummary = (row: UnitRow, around: Around): UnitSummary => ({
  uid: row.uid,
  version: row.version,
  number: row.number,
  label: row.label,
  model: {
    uid: row.modelUid,
    type: row.modelType,
    kind: row.modelKind as UnitSummary['model']['kind'],
    maker: row.maker,
    name: row.modelName,
    market: row.market as UnitSummary['model']['market'],
    revision: row.revision,
  },
  quantity: row.quantity,
  working: row.working,
  holding: row.holding,
  place: around.place?.uid ?? null,
  placePath: [...(around.place?.path ?? [])],
  remotePresent: row.remotePresent,
  badge: badgeOf(row, around),
  neededByCount: row.neededByCount,
  addedAt: row.addedAt.toISOString(),
  changedAt: row.changedAt.toISOString(),
  deletedAt: row.deletedAt?.toISOString() ?? null,
})

export const toUnitDetail = (
  row: UnitRow,
  around: Around,
  neededBy: UnitDetail['neededBy'],
): UnitDetail => ({
  ...toUnitSummary(row, around),
  serial: row.serial,
  note: row.note,
  forms: [...around.overlays.forms],
  functions: [...around.overlays.functions],
  modifications: [...around.overlays.modifications],
  stands: { ...around.overlays.stands },
  neededBy,
})
