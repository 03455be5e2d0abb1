import { SHAPES } from '@coaxwain/models'
import { AIMS, type Question } from '@coaxwain/shelf'
import { COLOURS, PROTECTIONS, SCAN_IDS } from '@coaxwain/signal'

export type QueryValues = Readonly<Record<string, string | undefined>>

const UID = /^[A-Za-z0-9_-]{22}$/
const flag = (value: boolean | undefined): string | undefined => (value ? '1' : undefined)

const oneOf = <T extends string>(list: readonly T[], value: string | undefined): T | undefined =>
  list.find((item) => item === value)

/** A question as it stands in the address of its answer. */
export const questionToQuery = (q: Question): Record<string, string> => {
  const all: Record<string, string | undefined> = {
    source: q.source.unit,
    playing: q.source.playing,
    display: q.display.unit,
    input: q.display.input,
    scan: q.material.scan,
    system: q.material.colour,
    shape: q.material.shape,
    protection: q.material.protection === 'none' ? undefined : q.material.protection,
    colour: flag(q.demands.colour),
    stereo: flag(q.demands.stereo),
    aerial: flag(q.demands.keepAerial),
    aim: q.demands.aim === 'watch' ? undefined : q.demands.aim,
    avoid: q.avoid.length > 0 ? q.avoid.join('.') : undefined,
  }
  return Object.fromEntries(
    Object.entries(all).filter((e): e is [string, string] => e[1] !== undefined),
  )
}

/** Null when the address does not hold a question. Values that mean nothing are left out. */
export function queryToQuestion(query: QueryValues): Question | null {
  const { source, playing, display } = query
  if (!source || !playing || !display || !UID.test(source) || !UID.test(display)) return null
  return {
    format: 1,
    source: { unit: source, playing },
    material: {
      protection: oneOf(PROTECTIONS, query['protection']) ?? 'none',
      ...defined('scan', oneOf(SCAN_IDS, query['scan'])),
      ...defined('colour', oneOf(COLOURS, query['system'])),
      ...defined('shape', oneOf(SHAPES, query['shape'])),
    },
    display: { unit: display, ...defined('input', query['input']) },
    demands: {
      aim: oneOf(AIMS, query['aim']) ?? 'watch',
      ...defined('colour', query['colour'] ? true : undefined),
      ...defined('stereo', query['stereo'] ? true : undefined),
      ...defined('keepAerial', query['aerial'] ? true : undefined),
    },
    avoid: (query['avoid'] ?? '').split('.').filter((uid) => UID.test(uid)),
    offAir: [],
    assumedLeads: [],
  }
}

const defined = <K extends string, V>(key: K, value: V | undefined): { [P in K]?: V } =>
  value === undefined ? {} : ({ [key]: value } as { [P in K]?: V })
