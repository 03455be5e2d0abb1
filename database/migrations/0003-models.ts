import { CODE, tables } from './sql'

/**
 * `home_collection_id` null is the shared catalogue. `home_key` says the same with 0 for shared, so
 * that a foreign key can hold a unit to models of its own collection or of the catalogue.
 */
export const models = tables('0003-models', {
  catalogue: `
    id tinyint unsigned not null primary key,
    version bigint unsigned not null default 1,
    constraint catalogue_single check (id = 1)`,

  models: `
    id bigint unsigned not null auto_increment primary key,
    home_collection_id bigint unsigned null,
    home_key bigint unsigned not null,
    uid char(22) ${CODE} not null,
    revision int unsigned not null default 1,
    type enum('device','piece') not null,
    kind varchar(40) ${CODE} not null,
    maker varchar(80) not null,
    name varchar(80) not null,
    market varchar(20) ${CODE} not null,
    year smallint unsigned null,
    fact_source varchar(20) ${CODE} not null,
    sort_name varchar(170) not null,
    made_from char(64) ${CODE} null,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    created_by bigint unsigned null,
    changed_at datetime(3) not null default current_timestamp(3),
    changed_by bigint unsigned null,
    deleted_at datetime(3) null,
    unique key models_home (home_key, id),
    unique key models_uid (home_key, uid),
    key models_by_name (home_key, deleted_at, sort_name, uid),
    key models_by_change (home_key, deleted_at, changed_at, uid),
    constraint models_home_agrees check (home_key = coalesce(home_collection_id, 0)),
    constraint models_collection_fk foreign key (home_collection_id) references collections (id),
    constraint models_created_by_fk foreign key (created_by) references people (id),
    constraint models_changed_by_fk foreign key (changed_by) references people (id)`,

  model_revisions: `
    id bigint unsigned not null auto_increment primary key,
    model_id bigint unsigned not null,
    number int unsigned not null,
    document json not null,
    made_at datetime(3) not null default current_timestamp(3),
    made_by bigint unsigned null,
    unique key model_revisions_number (model_id, number),
    constraint model_revisions_model_fk foreign key (model_id) references models (id),
    constraint model_revisions_made_by_fk foreign key (made_by) references people (id)`,

  model_aliases: `
    model_id bigint unsigned not null,
    position smallint unsigned not null,
    alias varchar(80) not null,
    primary key (model_id, position),
    key model_aliases_alias (alias, model_id),
    constraint model_aliases_model_fk foreign key (model_id) references models (id)`,

  model_keys: `
    model_id bigint unsigned not null,
    part enum('port','jack','control','function') not null,
    part_key varchar(60) ${CODE} not null,
    last_revision int unsigned not null,
    primary key (model_id, part, part_key),
    constraint model_keys_model_fk foreign key (model_id) references models (id)`,
})
