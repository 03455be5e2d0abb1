import { drawerMaker, unitMaker } from '../unit-maker'

export const unit = unitMaker('m')
export const lead = drawerMaker('m', 'drawer', '2026-01-03')
