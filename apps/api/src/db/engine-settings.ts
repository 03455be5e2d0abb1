import type { Knex } from 'knex'

export interface EngineFault {
  readonly setting: string
  readonly found: string
  readonly wanted: string
}

const on = (value: unknown): boolean => value === 1 || String(value).toUpperCase() === 'ON'

/** Compares the engine with what the promises on lost and damaged data need. */
export async function engineFaults(db: Knex): Promise<EngineFault[]> {
  const [[row]] = (await db.raw(`select
    @@global.innodb_flush_log_at_trx_commit as flush_log,
    @@global.innodb_doublewrite as doublewrite,
    @@global.log_bin as log_bin,
    @@global.sync_binlog as sync_binlog,
    @@session.innodb_snapshot_isolation as snapshot_isolation,
    @@session.sql_mode as sql_mode,
    @@session.time_zone as time_zone,
    @@session.innodb_lock_wait_timeout as lock_wait,
    @@session.character_set_connection as connection_set,
    @@character_set_database as schema_set`)) as [Record<string, unknown>[]]
  const is = (name: string): string => String(row?.[name])
  const fault = (setting: string, name: string, wanted: string, fits: boolean): EngineFault[] =>
    fits ? [] : [{ setting, found: is(name), wanted }]
  return [
    ...fault('innodb_flush_log_at_trx_commit', 'flush_log', '1', is('flush_log') === '1'),
    ...fault('innodb_doublewrite', 'doublewrite', 'ON', on(row?.['doublewrite'])),
    ...fault('sync_binlog', 'sync_binlog', '1', !on(row?.['log_bin']) || is('sync_binlog') === '1'),
    ...fault(
      'innodb_snapshot_isolation',
      'snapshot_isolation',
      'ON',
      on(row?.['snapshot_isolation']),
    ),
    ...fault(
      'sql_mode',
      'sql_mode',
      'STRICT_TRANS_TABLES',
      is('sql_mode').includes('STRICT_TRANS'),
    ),
    ...fault('time_zone', 'time_zone', '+00:00', is('time_zone') === '+00:00'),
    ...fault('innodb_lock_wait_timeout', 'lock_wait', '5', is('lock_wait') === '5'),
    ...fault(
      'character_set_connection',
      'connection_set',
      'utf8mb4',
      is('connection_set') === 'utf8mb4',
    ),
    ...fault('character_set_database', 'schema_set', 'utf8mb4', is('schema_set') === 'utf8mb4'),
    ...(await tableFaults(db)),
  ]
}

async function tableFaults(db: Knex): Promise<EngineFault[]> {
  const [rows] = (await db.raw(`select t.table_name as name, t.engine as engine
    from information_schema.tables t
    where t.table_schema = database() and t.table_type = 'BASE TABLE'
      and (t.engine <> 'InnoDB' or not exists (
        select 1 from information_schema.table_constraints c
        where c.table_schema = t.table_schema and c.table_name = t.table_name
          and c.constraint_type = 'PRIMARY KEY'))`)) as [{ name: string; engine: string }[]]
  return rows.map((r) => ({
    setting: `table ${r.name}`,
    found: r.engine,
    wanted: 'InnoDB with a primary key',
  }))
}
