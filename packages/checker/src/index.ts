export { checkChain } from './chain/check-chain'
export { CHAIN_CODES, type ChainCode } from './chain/codes'
export { wireChain, type Wired } from './chain/wire'
export {
  checkArrangement,
  type ArrangementFinding,
  type CheckedArrangement,
} from './check-arrangement'
export { checkHookup, type Checked } from './check-hookup'
export { checkProofs, type CheckedProofs, type ProofFinding } from './check-proofs'
export { FINDINGS, type Finding, type FindingCode } from './finding'
export { HEARINGS, SIGHTS, whenWrong, type Hearing, type Sight, type WhenWrong } from './when-wrong'
