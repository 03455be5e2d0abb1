import { drawerMaker, unitMaker } from '../unit-maker'

/** Running numbers begin at 101: an older book of numbers was closed when the collection moved. */
export const unit = unitMaker('a')
export const lead = drawerMaker('a', 'drawer', '2026-01-05')
