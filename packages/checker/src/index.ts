export { checkHookup, type Checked } from './check-hookup'
export { FINDINGS, type Finding, type FindingCode } from './finding'
