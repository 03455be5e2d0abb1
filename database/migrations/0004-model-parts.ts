import { CODE, tables } from './sql'

const ofModel = (table: string): string =>
  `constraint ${table}_model_fk foreign key (model_id) references models (id)`

/** What one would ask for of the latest revision; rebuilt together with it. */
export const modelParts = tables('0004-model-parts', {
  model_ports: `
    model_id bigint unsigned not null,
    port_key varchar(60) ${CODE} not null,
    position smallint unsigned not null,
    label varchar(80) not null,
    connector varchar(30) ${CODE} not null,
    mount enum('chassis','lead') not null,
    origin enum('factory','added') not null,
    isolated enum('yes','no','unknown') not null,
    is_retired boolean not null,
    primary key (model_id, port_key),
    key model_ports_connector (connector, model_id),
    ${ofModel('model_ports')}`,

  model_port_circuits: `
    model_id bigint unsigned not null,
    port_key varchar(60) ${CODE} not null,
    circuit varchar(20) ${CODE} not null,
    dir enum('in','out','either') not null,
    primary key (model_id, port_key, circuit, dir),
    key model_port_circuits_circuit (circuit, dir, model_id),
    constraint model_port_circuits_port_fk foreign key (model_id, port_key)
      references model_ports (model_id, port_key)`,

  model_jacks: `
    model_id bigint unsigned not null,
    jack_key varchar(60) ${CODE} not null,
    form varchar(20) ${CODE} not null,
    dir enum('in','out') not null,
    primary key (model_id, jack_key),
    key model_jacks_form (form, dir, model_id),
    ${ofModel('model_jacks')}`,

  model_jack_ports: `
    model_id bigint unsigned not null,
    jack_key varchar(60) ${CODE} not null,
    port_key varchar(60) ${CODE} not null,
    primary key (model_id, jack_key, port_key),
    key model_jack_ports_port (model_id, port_key),
    constraint model_jack_ports_jack_fk foreign key (model_id, jack_key)
      references model_jacks (model_id, jack_key),
    constraint model_jack_ports_port_fk foreign key (model_id, port_key)
      references model_ports (model_id, port_key)`,

  model_controls: `
    model_id bigint unsigned not null,
    control_key varchar(60) ${CODE} not null,
    kind varchar(20) ${CODE} not null,
    role varchar(20) ${CODE} null,
    access varchar(20) ${CODE} not null,
    label varchar(80) not null,
    primary key (model_id, control_key),
    key model_controls_kind (kind, role, model_id),
    ${ofModel('model_controls')}`,

  model_functions: `
    model_id bigint unsigned not null,
    function_key varchar(60) ${CODE} not null,
    kind varchar(30) ${CODE} not null,
    primary key (model_id, function_key),
    key model_functions_kind (kind, model_id),
    ${ofModel('model_functions')}`,

  model_rf_outputs: `
    model_id bigint unsigned not null,
    number smallint unsigned not null,
    function_key varchar(60) ${CODE} not null,
    jack_key varchar(60) ${CODE} not null,
    system varchar(4) ${CODE} not null,
    low_mhz decimal(9,4) not null,
    high_mhz decimal(9,4) not null,
    primary key (model_id, number),
    key model_rf_outputs_span (low_mhz, high_mhz, model_id),
    constraint model_rf_outputs_span_runs_up check (low_mhz <= high_mhz),
    ${ofModel('model_rf_outputs')}`,

  model_plugs: `
    model_id bigint unsigned not null,
    side enum('a','b') not null,
    position smallint unsigned not null,
    connector varchar(30) ${CODE} not null,
    primary key (model_id, side, position),
    key model_plugs_connector (connector, model_id),
    ${ofModel('model_plugs')}`,
})
