import { CODE, tables } from './sql'

const WHOLE = `
  id bigint unsigned not null auto_increment primary key,
  collection_id bigint unsigned not null,
  hookup_id bigint unsigned not null`

const ofHookup = (table: string): string => `
  unique key ${table}_tenant (collection_id, id),
  constraint ${table}_hookup_fk foreign key (collection_id, hookup_id)
    references hookups (collection_id, id)`

/** Beside the two documents the units, parts and pieces that they name, so that one can ask who needs what. */
export const hookups = tables('0006-hookups', {
  hookups: `
    id bigint unsigned not null auto_increment primary key,
    collection_id bigint unsigned not null,
    uid char(22) ${CODE} not null,
    title varchar(120) not null,
    question json not null,
    hookup json not null,
    made_from char(64) ${CODE} null,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    created_by bigint unsigned null,
    changed_at datetime(3) not null default current_timestamp(3),
    changed_by bigint unsigned null,
    deleted_at datetime(3) null,
    unique key hookups_tenant (collection_id, id),
    unique key hookups_uid (collection_id, uid),
    key hookups_by_title (collection_id, deleted_at, title, uid),
    key hookups_by_saving (collection_id, deleted_at, created_at, uid),
    constraint hookups_collection_fk foreign key (collection_id) references collections (id),
    constraint hookups_created_by_fk foreign key (created_by) references people (id),
    constraint hookups_changed_by_fk foreign key (changed_by) references people (id)`,

  hookup_units: `${WHOLE},
    unit_id bigint unsigned not null,
    part enum('source','display','box') not null,
    fingerprint char(64) ${CODE} not null,
    unique key hookup_units_unit (collection_id, hookup_id, unit_id),
    key hookup_units_needed (collection_id, unit_id, hookup_id),
    constraint hookup_units_unit_fk foreign key (collection_id, unit_id)
      references units (collection_id, id),
    ${ofHookup('hookup_units')}`,

  hookup_unit_parts: `${WHOLE},
    unit_id bigint unsigned not null,
    part enum('port','jack','control','function') not null,
    part_key varchar(60) ${CODE} not null,
    unique key hookup_unit_parts_key (collection_id, hookup_id, unit_id, part, part_key),
    key hookup_unit_parts_unit (collection_id, unit_id, part, part_key),
    constraint hookup_unit_parts_unit_fk foreign key (collection_id, unit_id)
      references units (collection_id, id),
    ${ofHookup('hookup_unit_parts')}`,

  hookup_pieces: `${WHOLE},
    model_home_key bigint unsigned not null,
    model_id bigint unsigned not null,
    copies smallint unsigned not null,
    is_assumed boolean not null,
    fingerprint char(64) ${CODE} not null,
    unique key hookup_pieces_model (collection_id, hookup_id, model_id),
    constraint hookup_pieces_within_reach
      check (model_home_key = 0 or model_home_key = collection_id),
    constraint hookup_pieces_model_fk foreign key (model_home_key, model_id)
      references models (home_key, id),
    ${ofHookup('hookup_pieces')}`,
})
