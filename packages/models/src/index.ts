export * from './check-model'
export * from './model'
export * from './read-model'
export * from './rf-outputs'
