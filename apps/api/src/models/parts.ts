import { rfOutputs, type DeviceModel, type Model, type PieceModel } from '@coaxwain/models'

export const PARTS = ['port', 'jack', 'control', 'function'] as const
export type Part = (typeof PARTS)[number]

export interface PartKey {
  readonly part: Part
  readonly key: string
}

/** Every key that a description makes. */
export const partKeys = (model: Model): PartKey[] =>
  model.type === 'piece'
    ? []
    : [
        ...model.ports.map(({ key }) => ({ part: 'port' as const, key })),
        ...model.jacks.map(({ key }) => ({ part: 'jack' as const, key })),
        ...model.controls.map(({ key }) => ({ part: 'control' as const, key })),
        ...model.functions.map(({ key }) => ({ part: 'function' as const, key })),
      ]

type Row = Readonly<Record<string, string | number | boolean | null>>

/** The rows of the tables that one queries, without the id of the model. */
export type PartRows = Readonly<Record<string, readonly Row[]>>

const unique = <T>(items: readonly T[], key: (item: T) => string): T[] => [
  ...new Map(items.map((i) => [key(i), i])).values(),
]

const deviceRows = (model: DeviceModel): PartRows => ({
  model_ports: model.ports.map((p, position) => ({
    port_key: p.key,
    position,
    label: p.label,
    connector: p.connector,
    mount: p.mount,
    origin: p.origin,
    isolated: p.isolated,
    is_retired: p.retired ?? false,
  })),
  model_port_circuits: model.ports.flatMap((p) =>
    unique(p.circuits, (c) => `${c.circuit} ${c.dir}`).map((c) => ({
      port_key: p.key,
      circuit: c.circuit,
      dir: c.dir,
    })),
  ),
  model_jacks: model.jacks.map((j) => ({ jack_key: j.key, form: j.form, dir: j.dir })),
  model_jack_ports: model.jacks.flatMap((j) =>
    unique(j.contacts, (c) => c.port).map((c) => ({ jack_key: j.key, port_key: c.port })),
  ),
  model_controls: model.controls.map((c) => ({
    control_key: c.key,
    kind: c.kind,
    role: c.kind === 'positions' ? c.role : null,
    access: c.access,
    label: c.label,
  })),
  model_functions: model.functions.map((f) => ({ function_key: f.key, kind: f.kind })),
  model_rf_outputs: rfOutputs(model).map((o, number) => ({
    number,
    function_key: o.function,
    jack_key: o.jack,
    system: o.system,
    low_mhz: o.lowMhz,
    high_mhz: o.highMhz,
  })),
})

const pieceRows = (model: PieceModel): PartRows => ({
  model_plugs: (['a', 'b'] as const).flatMap((side) =>
    model[side].map((plug, position) => ({ side, position, connector: plug.connector })),
  ),
})

/** In an order in which they can be written; the opposite order deletes them. */
export const PART_TABLES = [
  'model_ports',
  'model_port_circuits',
  'model_jacks',
  'model_jack_ports',
  'model_controls',
  'model_functions',
  'model_rf_outputs',
  'model_plugs',
] as const

export const partRows = (model: Model): PartRows => ({
  model_aliases: model.aliases.map((alias, position) => ({ position, alias })),
  ...(model.type === 'device' ? deviceRows(model) : pieceRows(model)),
})
