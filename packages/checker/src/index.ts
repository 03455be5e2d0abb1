export { checkHookup, type Checked } from './check-hookup'
export { FINDINGS, type Finding, type FindingCode } from './finding'
export { HEARINGS, SIGHTS, whenWrong, type Hearing, type Sight, type WhenWrong } from './when-wrong'
