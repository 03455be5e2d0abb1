import { MODELS } from './catalogue/index'
import { ALDER_LANE } from './collections/alder-lane/index'
import { MARRAM_ROW } from './collections/marram-row/index'
import { SALLOW_YARD } from './collections/sallow-yard/index'
import { PEOPLE } from './collections/people'
import type { DemoData } from './demo-data'

export * from './demo-data'
export { demoUid, modelUid } from './uid'
export type { ModelSlug } from './catalogue/index'
export { placePath, snapshotOf } from './snapshot'

export const DEMO: DemoData = {
  models: MODELS,
  people: PEOPLE,
  collections: [ALDER_LANE, MARRAM_ROW, SALLOW_YARD],
}
