/**
 * What every connection is told before its first statement. Values and reasons: the promises on
 * lost updates, silent cutting, UTC and stuck locks rest on them.
 */
export const sessionSettings = (statementSeconds: number): readonly string[] => [
  "set session sql_mode = 'STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION'",
  "set session time_zone = '+00:00'",
  'set session innodb_snapshot_isolation = on',
  'set session innodb_lock_wait_timeout = 5',
  `set session max_statement_time = ${statementSeconds}`,
]
