import { CODE, tables } from './sql'

const WHOLE = `
  id bigint unsigned not null auto_increment primary key,
  collection_id bigint unsigned not null,
  unit_id bigint unsigned not null`

const ofUnit = (table: string): string => `
  unique key ${table}_tenant (collection_id, id),
  constraint ${table}_unit_fk foreign key (collection_id, unit_id)
    references units (collection_id, id)`

const EVIDENCE = `
  state enum('works','intermittent','dead') not null,
  found_on date null,
  how varchar(200) null,
  by_person_id bigint unsigned null,
  by_name varchar(80) null,
  noted_at datetime(3) not null default current_timestamp(3)`

export const units = tables('0005-units', {
  units: `
    id bigint unsigned not null auto_increment primary key,
    collection_id bigint unsigned not null,
    uid char(22) ${CODE} not null,
    number int unsigned not null,
    model_home_key bigint unsigned not null,
    model_id bigint unsigned not null,
    label varchar(80) not null default '',
    sort_name varchar(170) not null,
    serial varchar(80) not null default '',
    note text not null default '',
    quantity int unsigned not null default 1,
    working enum('untested','works','faulty','parts-only') not null default 'untested',
    holding enum('kept','spare','listed','held','sold','gone') not null default 'kept',
    place_id bigint unsigned null,
    remote_present boolean not null default true,
    made_from char(64) ${CODE} null,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    created_by bigint unsigned null,
    changed_at datetime(3) not null default current_timestamp(3),
    changed_by bigint unsigned null,
    deleted_at datetime(3) null,
    unique key units_tenant (collection_id, id),
    unique key units_uid (collection_id, uid),
    unique key units_number (collection_id, number),
    key units_by_name (collection_id, deleted_at, sort_name, uid),
    key units_by_addition (collection_id, deleted_at, created_at, uid),
    key units_by_change (collection_id, deleted_at, changed_at, uid),
    key units_model (model_home_key, model_id, collection_id),
    key units_place (collection_id, place_id),
    constraint units_quantity_some check (quantity >= 1),
    constraint units_model_within_reach check (model_home_key = 0 or model_home_key = collection_id),
    constraint units_collection_fk foreign key (collection_id) references collections (id),
    constraint units_model_fk foreign key (model_home_key, model_id) references models (home_key, id),
    constraint units_place_fk foreign key (collection_id, place_id)
      references places (collection_id, id),
    constraint units_created_by_fk foreign key (created_by) references people (id),
    constraint units_changed_by_fk foreign key (changed_by) references people (id)`,

  unit_form_states: `${WHOLE},
    jack_key varchar(60) ${CODE} not null,
    port_key varchar(60) ${CODE} not null,
    ${EVIDENCE},
    unique key unit_form_states_key (collection_id, unit_id, jack_key, port_key),
    key unit_form_states_state (collection_id, state, unit_id),
    ${ofUnit('unit_form_states')}`,

  unit_function_states: `${WHOLE},
    function_key varchar(60) ${CODE} not null,
    ${EVIDENCE},
    unique key unit_function_states_key (collection_id, unit_id, function_key),
    key unit_function_states_state (collection_id, state, unit_id),
    ${ofUnit('unit_function_states')}`,

  unit_modifications: `${WHOLE},
    position smallint unsigned not null,
    kind varchar(30) ${CODE} not null,
    document json not null,
    unique key unit_modifications_position (collection_id, unit_id, position),
    ${ofUnit('unit_modifications')}`,

  unit_added_parts: `${WHOLE},
    part enum('port','jack','function') not null,
    part_key varchar(60) ${CODE} not null,
    connector varchar(30) ${CODE} null,
    form varchar(20) ${CODE} null,
    dir enum('in','out') null,
    function_kind varchar(30) ${CODE} null,
    unique key unit_added_parts_key (collection_id, unit_id, part, part_key),
    key unit_added_parts_connector (collection_id, connector, unit_id),
    key unit_added_parts_form (collection_id, form, dir, unit_id),
    ${ofUnit('unit_added_parts')}`,

  unit_stands: `${WHOLE},
    control_key varchar(60) ${CODE} not null,
    position varchar(60) not null,
    unique key unit_stands_key (collection_id, unit_id, control_key),
    ${ofUnit('unit_stands')}`,
})
