import type { Jack } from '@coaxwain/models'
import type { Circuit } from '@coaxwain/signal'
import { USE_FACTS, type SocketForm, type Use } from './model-form'

const PARTS: Partial<Record<Use, Circuit>> = {
  'sound-left': 'audio-l',
  'sound-right': 'audio-r',
  'component-y': 'y',
  'component-pb': 'pb',
  'component-pr': 'pr',
}

/** Sockets that may belong together: of one face, one heading, one direction. */
const bundleOf = (s: SocketForm): string => JSON.stringify([s.face, s.heading.trim(), s.dir])

/**
 * Puts forms together from sockets. One socket may carry whole forms; left and right, or Y Pb Pr, under one
 * heading make one form, each socket being used once and in the order of the panel.
 */
export function deriveJacks(sockets: readonly SocketForm[]): Jack[] {
  const whole = sockets.flatMap((s): Jack[] => {
    if (s.use === '') return []
    const { forms } = USE_FACTS[s.use]
    return forms.map(({ form, circuits }) => ({
      key: forms.length === 1 ? s.key : `${s.key}-${form}`,
      form,
      dir: s.dir,
      contacts: circuits.map((circuit) => ({ circuit, port: s.key })),
    }))
  })
  const bundles = new Map<string, SocketForm[]>()
  for (const s of sockets) {
    if (s.use !== '' && PARTS[s.use])
      bundles.set(bundleOf(s), [...(bundles.get(bundleOf(s)) ?? []), s])
  }
  return [
    ...whole,
    ...[...bundles.values()].flatMap((b) => [...soundJacks(b), ...componentJacks(b)]),
  ]
}

const ofUse = (sockets: readonly SocketForm[], use: Use): SocketForm[] =>
  sockets.filter((s) => s.use === use)

function soundJacks(bundle: readonly SocketForm[]): Jack[] {
  const [left, right] = [ofUse(bundle, 'sound-left'), ofUse(bundle, 'sound-right')]
  return Array.from({ length: Math.max(left.length, right.length) }, (_, i): Jack => {
    const pair = [left[i], right[i]].filter((s) => s !== undefined)
    return {
      key: `sound-${pair[0]?.key ?? ''}`,
      form: 'sound',
      dir: pair[0]?.dir ?? 'out',
      contacts: pair.map((s) => ({
        circuit: s.use === 'sound-left' ? 'audio-l' : 'audio-r',
        port: s.key,
      })),
    }
  })
}

function componentJacks(bundle: readonly SocketForm[]): Jack[] {
  const y = ofUse(bundle, 'component-y')
  const pb = ofUse(bundle, 'component-pb')
  const pr = ofUse(bundle, 'component-pr')
  return y.flatMap((first, i): Jack[] => {
    const [second, third] = [pb[i], pr[i]]
    if (!second || !third) return []
    return [
      {
        key: `component-${first.key}`,
        form: 'component',
        dir: first.dir,
        contacts: [
          { circuit: 'y', port: first.key },
          { circuit: 'pb', port: second.key },
          { circuit: 'pr', port: third.key },
        ],
      },
    ]
  })
}
