import { CODE, tables } from './sql'

export const people = tables('0001-people', {
  people: `
    id bigint unsigned not null auto_increment primary key,
    uid char(22) ${CODE} not null,
    email varchar(254) character set utf8mb4 collate utf8mb4_bin not null,
    name varchar(80) not null,
    password_hash varchar(255) ${CODE} not null,
    locale varchar(5) ${CODE} not null default 'en-GB',
    is_demo boolean not null default false,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    changed_at datetime(3) not null default current_timestamp(3),
    unique key people_uid (uid),
    unique key people_email (email)`,

  collections: `
    id bigint unsigned not null auto_increment primary key,
    uid char(22) ${CODE} not null,
    name varchar(120) not null,
    market varchar(20) ${CODE} not null default 'any',
    currency char(3) ${CODE} not null default 'EUR',
    next_unit_number int unsigned not null default 1,
    shelf_version bigint unsigned not null default 1,
    version int unsigned not null default 1,
    created_at datetime(3) not null default current_timestamp(3),
    changed_at datetime(3) not null default current_timestamp(3),
    deleted_at datetime(3) null,
    unique key collections_uid (uid)`,

  memberships: `
    id bigint unsigned not null auto_increment primary key,
    collection_id bigint unsigned not null,
    person_id bigint unsigned not null,
    role enum('owner','collector','restorer','reseller','viewer') not null,
    since datetime(3) not null default current_timestamp(3),
    unique key memberships_tenant (collection_id, id),
    unique key memberships_person (collection_id, person_id),
    key memberships_of_person (person_id),
    constraint memberships_collection_fk foreign key (collection_id) references collections (id),
    constraint memberships_person_fk foreign key (person_id) references people (id)`,

  off_air_channels: `
    id bigint unsigned not null auto_increment primary key,
    collection_id bigint unsigned not null,
    position smallint unsigned not null,
    plan varchar(30) ${CODE} not null,
    channel varchar(20) not null,
    kind enum('analogue','digital') not null,
    level_dbmv decimal(5,1) null,
    unique key off_air_channels_tenant (collection_id, id),
    unique key off_air_channels_position (collection_id, position),
    constraint off_air_channels_collection_fk foreign key (collection_id)
      references collections (id)`,
})
