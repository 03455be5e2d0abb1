export * from './levels'
export * from './money'
export * from './ranges'
export * from './units'
