import type { UnitDetail } from '@coaxwain/contract'
import type { DeviceModel } from '@coaxwain/models'
import { worst, type Evidence, type TestState } from '@coaxwain/shelf'
import { formTitles } from './form-titles'
import type { Speak } from './words'

/** A form of a unit, or one of its functions, with what is known of it. */
export interface EvidenceRow {
  readonly key: string
  readonly title: string
  readonly state: TestState
  readonly evidence: Evidence | null
  /** The sockets of a form; none for a function. */
  readonly ports: readonly string[]
  readonly jack: string | null
  readonly function: string | null
}

/** A state as a person notes it. */
export interface NotedState {
  readonly state: TestState
  readonly on: string
  readonly how: string
  /** One socket of the form, or all of them. */
  readonly port: string | null
}

type States = Pick<UnitDetail, 'forms' | 'functions'>

/** Newest of what was noted, by its date. */
const newest = (records: readonly Evidence[]): Evidence | null =>
  [...records].sort((a, b) => (b.on ?? '').localeCompare(a.on ?? ''))[0] ?? null

/** A row for every form, in the order of the model. Its state is the worst of its sockets that were tried. */
export function formRows(device: DeviceModel, unit: States, say: Speak): EvidenceRow[] {
  const ways = new Set(device.jacks.map((j) => j.dir))
  const titles = formTitles(device, say)
  return device.jacks.map((jack): EvidenceRow => {
    const ports = [...new Set(jack.contacts.map((c) => c.port))]
    const records = unit.forms.filter((f) => f.jack === jack.key && ports.includes(f.port))
    const tried = ports.map(
      (p) => records.find((r) => r.port === p)?.state ?? ('untested' as const),
    )
    const form = titles.get(jack.key) ?? jack.form
    return {
      key: `form ${jack.key}`,
      title: ways.size > 1 ? say(`unit.form-${jack.dir}`, { form }) : form,
      state: worst(tried),
      evidence: newest(records.filter((r) => r.state !== 'untested')),
      ports,
      jack: jack.key,
      function: null,
    }
  })
}

export const functionRows = (device: DeviceModel, unit: States, say: Speak): EvidenceRow[] =>
  device.functions.map((fn): EvidenceRow => {
    const record = unit.functions.find((f) => f.function === fn.key)
    return {
      key: `function ${fn.key}`,
      title: fn.label ?? say(`function.${fn.kind}`),
      state: record?.state ?? 'untested',
      evidence: record && record.state !== 'untested' ? record : null,
      ports: [],
      jack: null,
      function: fn.key,
    }
  })
