import type { Problem } from '@coaxwain/result'
import { CONNECTORS, FORM_CIRCUITS, channelsIn, type Circuit } from '@coaxwain/signal'
import type { Condition, Control, DeviceModel, Give, Key, Model, PieceModel } from './model'
import { POWER_KEY, POWER_STATES } from './model'

export type ModelProblem = Problem<
  | 'key-repeated'
  | 'unknown-port'
  | 'unknown-group'
  | 'unknown-jack'
  | 'unknown-control'
  | 'unknown-position'
  | 'unknown-channel'
  | 'circuit-not-on-port'
  | 'contact-missing'
  | 'jack-direction'
  | 'function-without-jacks'
  | 'plug-missing'
  | 'connector-unknown'
  | 'display-facts-missing',
  { path: string; name: string }
>

const fault = (code: ModelProblem['code'], details: ModelProblem['details']): ModelProblem => ({
  code,
  details,
})

/** Everything in a description that does not hold together; an empty list when it does. */
export const checkModel = (model: Model): ModelProblem[] =>
  model.type === 'device' ? checkDevice(model) : checkPiece(model)

function checkDevice(model: DeviceModel): ModelProblem[] {
  return [
    ...repeats('groups', model.groups),
    ...repeats('ports', model.ports),
    ...repeats('jacks', model.jacks),
    ...repeats('controls', model.controls),
    ...repeats('functions', model.functions),
    ...checkPorts(model),
    ...checkJacks(model),
    ...checkControls(model),
    ...checkFunctions(model),
    ...checkDisplay(model),
  ]
}

const repeats = (path: string, items: readonly { key: Key }[]): ModelProblem[] =>
  items.flatMap((item, i) =>
    items.findIndex((other) => other.key === item.key) < i
      ? [fault('key-repeated', { path: `${path}.${i}.key`, name: item.key })]
      : [],
  )

function checkPorts(model: DeviceModel): ModelProblem[] {
  const groups = new Set(model.groups.map((g) => g.key))
  const ports = new Set(model.ports.map((p) => p.key))
  return model.ports.flatMap((port, i) => {
    const found: ModelProblem[] = []
    const at = `ports.${i}`
    if (!CONNECTORS.includes(port.connector)) {
      found.push(fault('connector-unknown', { path: `${at}.connector`, name: port.connector }))
    }
    if (port.group !== undefined && !groups.has(port.group)) {
      found.push(fault('unknown-group', { path: `${at}.group`, name: port.group }))
    }
    if (port.loopsTo !== undefined && !ports.has(port.loopsTo)) {
      found.push(fault('unknown-port', { path: `${at}.loopsTo`, name: port.loopsTo }))
    }
    if (port.load?.kind === 'switch') {
      const stands = [{ control: port.load.control, in: [port.load.position75] }]
      found.push(...checkCondition(model, stands, `${at}.load`))
    }
    return found
  })
}

function checkJacks(model: DeviceModel): ModelProblem[] {
  return model.jacks.flatMap((jack, i): ModelProblem[] => {
    const at = `jacks.${i}`
    const found = jack.contacts.flatMap((contact, j): ModelProblem[] => {
      const port = model.ports.find((p) => p.key === contact.port)
      const path = `${at}.contacts.${j}`
      if (!port) return [fault('unknown-port', { path, name: contact.port })]
      const circuit = port.circuits.find((c) => c.circuit === contact.circuit)
      if (!circuit) return [fault('circuit-not-on-port', { path, name: contact.circuit })]
      return circuit.dir === jack.dir || circuit.dir === 'either'
        ? []
        : [fault('jack-direction', { path, name: contact.circuit })]
    })
    const carried = new Set(jack.contacts.map((c) => c.circuit))
    const missing =
      jack.form === 'sound'
        ? soundMissing(carried)
        : FORM_CIRCUITS[jack.form].filter((c) => !carried.has(c) && !syncInstead(carried, c))
    return [
      ...found,
      ...missing.map((name) => fault('contact-missing', { path: `${at}.contacts`, name })),
    ]
  })
}

/** Sound needs one wire at least: left, right or mono. */
const soundMissing = (carried: ReadonlySet<Circuit>): Circuit[] =>
  carried.has('audio-l') || carried.has('audio-r') || carried.has('audio-mono')
    ? []
    : ['audio-mono']

/** The sync of RGB may travel as composite video; the fourth TTL wire may be absent. */
const syncInstead = (carried: ReadonlySet<Circuit>, circuit: Circuit): boolean =>
  (circuit === 'csync' && carried.has('cvbs')) || circuit === 'ttl-i'

function checkControls(model: DeviceModel): ModelProblem[] {
  return model.controls.flatMap((control, i) => {
    const at = `controls.${i}`
    switch (control.kind) {
      case 'channel':
        return channelsIn(control.carriers.part).length > 0
          ? []
          : [fault('unknown-channel', { path: `${at}.carriers`, name: control.label })]
      case 'tuned-to':
        return control.reaches.flatMap((reach, j) => [
          ...(channelsIn(reach.part).length > 0
            ? []
            : [
                fault('unknown-channel', {
                  path: `${at}.reaches.${j}`,
                  name: control.label,
                }),
              ]),
          ...checkCondition(model, reach.while, `${at}.reaches.${j}.while`),
        ])
      case 'auto':
        return control.positions.flatMap((position, j) =>
          'port' in position.cause && !hasKey(model.ports, position.cause.port)
            ? [
                fault('unknown-port', {
                  path: `${at}.positions.${j}.cause.port`,
                  name: position.cause.port,
                }),
              ]
            : [],
        )
      default:
        return []
    }
  })
}

const hasKey = (items: readonly { key: Key }[], key: Key): boolean =>
  items.some((item) => item.key === key)

function checkFunctions(model: DeviceModel): ModelProblem[] {
  const jackCheck = (key: Key, path: string): ModelProblem[] =>
    hasKey(model.jacks, key) ? [] : [fault('unknown-jack', { path, name: key })]
  return model.functions.flatMap((fn, i) => {
    const at = `functions.${i}`
    const inputs = [...fn.needs, ...(fn.oneOf ?? [])]
    const nothing = inputs.length === 0 && fn.gives.length === 0 && fn.kind !== 'receives'
    return [
      ...(nothing ? [fault('function-without-jacks', { path: at, name: fn.key })] : []),
      ...fn.needs.flatMap((k, j) => jackCheck(k, `${at}.needs.${j}`)),
      ...(fn.oneOf ?? []).flatMap((k, j) => jackCheck(k, `${at}.oneOf.${j}`)),
      ...(fn.optional ?? []).flatMap((o, j) => [
        ...jackCheck(o.jack, `${at}.optional.${j}.jack`),
        ...checkCondition(model, o.while, `${at}.optional.${j}.while`),
      ]),
      ...checkCondition(model, fn.while, `${at}.while`),
      ...fn.accepts.flatMap((row, j) => [
        ...(row.jacks ?? []).flatMap((k) => jackCheck(k, `${at}.accepts.${j}.jacks`)),
        ...checkCondition(model, row.while, `${at}.accepts.${j}.while`),
      ]),
      ...fn.gives.flatMap((give, j) => checkGive(model, give, `${at}.gives.${j}`)),
      ...(fn.tunedBy !== undefined && !hasKey(model.controls, fn.tunedBy)
        ? [fault('unknown-control', { path: `${at}.tunedBy`, name: fn.tunedBy })]
        : []),
    ]
  })
}

function checkGive(model: DeviceModel, give: Give, at: string): ModelProblem[] {
  const jack = hasKey(model.jacks, give.jack)
    ? []
    : [fault('unknown-jack', { path: `${at}.jack`, name: give.jack })]
  const rows = [...(give.picture ?? []), ...(give.rf ?? [])]
  const channels = (give.rf ?? []).flatMap((rf, j) =>
    'control' in rf.channel && !hasKey(model.controls, rf.channel.control)
      ? [
          fault('unknown-control', {
            path: `${at}.rf.${j}.channel`,
            name: rf.channel.control,
          }),
        ]
      : [],
  )
  return [
    ...jack,
    ...checkCondition(model, give.while, `${at}.while`),
    ...rows.flatMap((row, j) => checkCondition(model, row.while, `${at}.rows.${j}.while`)),
    ...channels,
  ]
}

/** The positions that a condition may name, or null for a control without named positions. */
function positionsOf(control: Control): readonly string[] | null {
  return control.kind === 'positions' || control.kind === 'auto'
    ? control.positions.map((p) => p.key)
    : null
}

function checkCondition(
  model: DeviceModel,
  condition: Condition | undefined,
  path: string,
): ModelProblem[] {
  return (condition ?? []).flatMap((stands): ModelProblem[] => {
    const control = model.controls.find((c) => c.key === stands.control)
    const positions: readonly string[] | null =
      stands.control === POWER_KEY ? POWER_STATES : control ? positionsOf(control) : null
    if (!positions) return [fault('unknown-control', { path, name: stands.control })]
    return stands.in
      .filter((p) => !positions.includes(p))
      .map((name) => fault('unknown-position', { path, name }))
  })
}

function checkDisplay(model: DeviceModel): ModelProblem[] {
  const shows = model.functions.findIndex((f) => f.kind === 'shows')
  return shows >= 0 && !model.display
    ? [fault('display-facts-missing', { path: 'display', name: model.functions[shows]?.key ?? '' })]
    : []
}

function checkPiece(model: PieceModel): ModelProblem[] {
  const ends = [
    ...model.a.map((p, i) => [`a.${i}`, p.connector] as const),
    ...model.b.map((p, i) => [`b.${i}`, p.connector] as const),
  ]
  return [
    ...ends
      .filter(([, c]) => !CONNECTORS.includes(c))
      .map(([path, c]) => fault('connector-unknown', { path, name: c })),
    ...model.wires.flatMap((wire, i) => [
      ...(model.a[wire.a.plug]
        ? []
        : [fault('plug-missing', { path: `wires.${i}.a`, name: String(wire.a.plug) })]),
      ...(model.b[wire.b.plug]
        ? []
        : [fault('plug-missing', { path: `wires.${i}.b`, name: String(wire.b.plug) })]),
    ]),
  ]
}
