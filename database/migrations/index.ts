import type { Migration } from './migration'
import { people } from './0001-people'
import { places } from './0002-places'
import { models } from './0003-models'
import { modelParts } from './0004-model-parts'
import { units } from './0005-units'
import { hookups } from './0006-hookups'
import { sessions } from './0007-sessions'
import { catalogueRow } from './0008-catalogue-row'

/** In the order in which they run. A migration that has run anywhere is never edited again. */
export const MIGRATIONS: readonly Migration[] = [
  people,
  places,
  models,
  modelParts,
  units,
  hookups,
  sessions,
  catalogueRow,
]
