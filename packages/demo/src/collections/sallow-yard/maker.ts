import type { DeviceSlug } from '../../catalogue/index'
import type { DemoKey, DemoUnit } from '../../demo-data'
import { drawerMaker, unitMaker, type UnitDraft } from '../unit-maker'

export const unit = unitMaker('s')
export const lead = drawerMaker('s', 'drawer', '2026-01-12')

/** What came in with a lot and has not been tried yet. */
export const untried = (
  number: number,
  slug: DeviceSlug,
  where: { readonly place: DemoKey; readonly addedOn: string } & Partial<UnitDraft>,
): DemoUnit => unit(number, slug, { holding: 'spare', ...where })
