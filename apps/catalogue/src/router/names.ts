/** Names of the pages. Addresses live in the route table alone. */
export const PAGES = {
  signIn: 'sign-in',
  hookups: 'hookups',
  answer: 'answer',
  check: 'check-hookup',
  arrange: 'arrange',
  arrangement: 'arrangement',
  hookup: 'hookup',
  shelf: 'shelf',
  unit: 'unit',
  addUnit: 'add-unit',
  editUnit: 'edit-unit',
  models: 'models',
  model: 'model',
  addModel: 'add-model',
  editModel: 'edit-model',
  help: 'help',
  noCollection: 'no-collection',
  failed: 'failed',
  notFound: 'not-found',
} as const

export type PageName = (typeof PAGES)[keyof typeof PAGES]
