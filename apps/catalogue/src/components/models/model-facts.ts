import type { ModelDetail } from '@coaxwain/contract'
import type { Speak } from '../../format/words'

interface Fact {
  readonly key: string
  readonly name: string
  readonly value: string | null
}

/** What is known of a model beside its sockets. */
export function modelFacts(detail: ModelDetail, say: Speak): Fact[] {
  const { document } = detail
  const device = document.type === 'device' ? document : null
  const fact = (key: string, name: string, value: string | null): Fact => ({ key, name, value })
  return [
    fact('aliases', say('model.aliases'), document.aliases.join(', ') || null),
    fact('year', say('model.year'), document.year === undefined ? null : String(document.year)),
    fact('source', say('model.fact-source'), say(`source-of-fact.${document.factSource}`)),
    ...(device
      ? [
          fact('chassis', say('model.chassis'), say(`chassis.${device.chassis}`)),
          fact('remote', say('model.remote'), say(`model.remote-${device.remote}`)),
        ]
      : []),
    ...(device?.mains
      ? [
          fact(
            'mains',
            say('model.mains'),
            say('model.mains-volts', {
              low: device.mains.volts[0],
              high: device.mains.volts[1],
              hz: device.mains.hz.join(', '),
            }),
          ),
        ]
      : []),
    ...(device?.pack
      ? [
          fact(
            'pack',
            say('unit.pack'),
            say('unit.pack-needs', {
              volts: device.pack.volts,
              milliamps: device.pack.milliamps,
              current: device.pack.current.toUpperCase(),
            }),
          ),
        ]
      : []),
    fact('units', say('model.units'), say('shelf.units-here', { count: detail.units })),
    fact('whose', say('model.whose'), say(detail.own ? 'model.own' : 'model.shared')),
  ]
}
