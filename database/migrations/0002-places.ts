import { CODE, tables } from './sql'

export const places = tables('0002-places', {
  places: `
    id bigint unsigned not null auto_increment primary key,
    collection_id bigint unsigned not null,
    uid char(22) ${CODE} not null,
    parent_id bigint unsigned null,
    name varchar(80) not null,
    made_from char(64) ${CODE} null,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    changed_at datetime(3) not null default current_timestamp(3),
    deleted_at datetime(3) null,
    unique key places_tenant (collection_id, id),
    unique key places_uid (collection_id, uid),
    key places_parent (collection_id, parent_id),
    constraint places_collection_fk foreign key (collection_id) references collections (id),
    constraint places_parent_fk foreign key (collection_id, parent_id)
      references places (collection_id, id)`,
})
