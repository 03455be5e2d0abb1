import type { Control, DeviceModel, Model, Port, PortGroup } from '@coaxwain/models'
import { one, port, trim, tube, tuner } from '@coaxwain/models/build'
import type { Connector } from '@coaxwain/signal'
import { buildFunctions } from './build-functions'
import { deriveJacks } from './derive-jacks'
import { MARKET_FACTS } from './market-facts'
import { USE_FACTS, type ControlForm, type ModelForm, type SocketForm } from './model-form'

const list = (text: string): string[] =>
  text
    .split(',')
    .map((t) => t.trim())
    .filter((t) => t !== '')

const headingKey = (s: SocketForm): string | undefined => {
  const name = s.heading.trim()
  if (name === '') return undefined
  const slug = name
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-|-$/g, '')
  return `${s.face}-${slug || 'heading'}`
}

/** A number, or what cannot be one: that is left for the schema to refuse at its field. */
const numberIn = (text: string): number => (text.trim() === '' ? NaN : Number(text))

function buildPort(s: SocketForm, column: number, form: ModelForm): Port {
  const circuits = s.use === '' ? [] : USE_FACTS[s.use].circuits
  const video = s.use === 'composite' || s.use === 's-video' || s.use.startsWith('component')
  const aerial = s.use === 'rf'
  return {
    ...port(
      s.key,
      s.label.trim(),
      circuits.map((c) => one(c, s.dir)),
      {
        connector: s.connector as Connector,
        ...(video ? { impedanceOhm: 75 } : {}),
        ...(video && s.dir === 'in' ? { load: { kind: '75' as const } } : {}),
        ...(aerial ? { impedanceOhm: s.connector === 'screws' ? 300 : 75 } : {}),
        ...(aerial && s.dir === 'in' ? { standsDc: 'unknown' as const } : {}),
        isolated: form.chassis === 'isolated' ? 'yes' : 'unknown',
      },
    ),
    group: headingKey(s),
    at: { face: s.face, row: Math.max(0, numberIn(s.row) - 1), column },
  }
}

/** Sockets of one row stand in the order in which they were typed. */
function buildPorts(form: ModelForm): Port[] {
  const counts = new Map<string, number>()
  return form.sockets.map((s) => {
    const row = `${s.face} ${s.row.trim()}`
    const column = counts.get(row) ?? 0
    counts.set(row, column + 1)
    return buildPort(s, column, form)
  })
}

function buildGroups(sockets: readonly SocketForm[]): PortGroup[] {
  const groups = new Map<string, string>()
  for (const s of sockets) {
    const key = headingKey(s)
    if (key !== undefined) groups.set(key, s.heading.trim())
  }
  return [...groups].map(([key, label]) => ({ key, label }))
}

/** A position's key is its printed name as far as a key may hold it. */
export const positionKey = (label: string, i: number): string =>
  label.replaceAll(/[^A-Za-z0-9._:-]+/g, '-').replaceAll(/^[^A-Za-z0-9]+|-$/g, '') ||
  `place-${i + 1}`

export const positionsOf = (control: ControlForm) =>
  list(control.positions).map((label, i) => ({ key: positionKey(label, i), label }))

function buildControl(c: ControlForm): Control {
  const label = c.label.trim()
  const part = {
    plan: c.plan,
    ...(c.channels.trim() === '' ? {} : { names: c.channels.replaceAll(' ', '') }),
  }
  const look =
    c.access === 'menu' || c.access === 'remote' ? 'menu' : c.access === 'front' ? 'push' : 'slide'
  switch (c.kind) {
    case 'positions':
      return {
        kind: 'positions',
        key: c.key,
        label,
        access: c.access,
        look,
        role: c.role,
        positions: positionsOf(c),
      }
    case 'channel':
      return {
        kind: 'channel',
        key: c.key,
        label,
        access: c.access,
        look,
        carriers: { kind: 'channels', part },
        toleranceMhz: 0.1,
      }
    case 'tuned-to':
      return tuner(c.key, label, c.way, { reaches: [part], access: c.access })
    case 'trim':
      return trim(c.key, label, c.quantity, c.access)
  }
}

/** The description that a filled-in form means. Whether it holds together is for the checks to say. */
export function buildModel(form: ModelForm): DeviceModel {
  const jacks = deriveJacks(form.sockets)
  const shows = form.does.some((d) => d.kind === 'shows')
  const powered = form.packVolts.trim() !== '' || form.packMilliamps.trim() !== ''
  return {
    format: 1,
    type: 'device',
    maker: form.maker.trim(),
    name: form.name.trim(),
    kind: form.kind as DeviceModel['kind'],
    market: form.market,
    aliases: list(form.aliases),
    ...(form.year.trim() === '' ? {} : { year: numberIn(form.year) }),
    factSource: form.factSource,
    groups: buildGroups(form.sockets),
    ports: buildPorts(form),
    jacks,
    controls: form.controls.map(buildControl),
    functions: buildFunctions(form, jacks),
    leaks: [],
    chassis: form.chassis,
    remote: form.remote,
    ...(powered
      ? {
          pack: {
            current: 'dc' as const,
            volts: numberIn(form.packVolts),
            milliamps: numberIn(form.packMilliamps),
            ...(form.packPolarity === '' ? {} : { polarity: form.packPolarity }),
          },
        }
      : {}),
    ...(shows
      ? { display: tube(MARKET_FACTS[form.market].deflection, form.loudspeakers, form.screen) }
      : {}),
  }
}

/** A description under other names. */
export const renamed = (model: Model, form: ModelForm): Model => ({
  ...model,
  maker: form.maker.trim(),
  name: form.name.trim(),
  aliases: list(form.aliases),
  factSource: form.factSource,
  year: form.year.trim() === '' ? undefined : numberIn(form.year),
})
