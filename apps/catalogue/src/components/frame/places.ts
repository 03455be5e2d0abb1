import type { MessageCode } from '@coaxwain/wording'
import { PAGES, type PageName } from '../../router/names'
import type { IconName } from '../base/icons'

export interface Place {
  readonly key: 'hookups' | 'shelf' | 'models'
  readonly page: PageName
  readonly icon: IconName
  readonly word: MessageCode
}

/** The places of the house that are built, in the order of the rail. */
export const PLACES: readonly Place[] = [
  { key: 'hookups', page: PAGES.hookups, icon: 'hookups', word: 'place.hookups' },
  { key: 'shelf', page: PAGES.shelf, icon: 'shelf', word: 'place.shelf' },
  { key: 'models', page: PAGES.models, icon: 'models', word: 'place.models' },
]
