export { CompiledShelf } from './compile/shelf'
export {
  compileShelf,
  createSearch,
  findHookups,
  type HookupSearch,
  type SearchOptions,
} from './create-search'
export { partUid, withParts, type Parts } from './reasons/purchases'
export { createArrangementSearch, type ArrangementSearch } from './uses/create-arrangement-search'
export { createProveSearch, type ProveSearch } from './prove/create-prove-search'
export { compileTried } from './prove/trial'
export { arcsOf, DISPLAY, START, type Arc, type ArcMap, type Nodes } from './arcs'
