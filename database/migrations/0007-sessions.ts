import { CODE, tables } from './sql'

/** Columns as the session store and the limiter write them. */
export const sessions = tables('0007-sessions', {
  sessions: `
    sid varchar(255) ${CODE} not null primary key,
    sess json not null,
    expired datetime not null,
    key sessions_expired (expired)`,

  limits: `
    \`key\` varchar(255) ${CODE} not null primary key,
    points int not null default 0,
    expire bigint unsigned null,
    key limits_expire (expire)`,

  seeds: `
    name varchar(60) ${CODE} not null primary key,
    done_at datetime(3) not null default current_timestamp(3)`,
})
