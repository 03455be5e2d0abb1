import type { Jack } from '@coaxwain/models'
import { isPictureForm } from '@coaxwain/signal'
import type { Speak } from '../../format/words'
import { deriveJacks } from './derive-jacks'
import type { SocketForm } from './model-form'

export interface JackOption {
  readonly value: string
  readonly label: string
}

/** Forms that a function may take or give, named by the labels of their sockets. */
export function jackOptions(sockets: readonly SocketForm[], say: Speak) {
  const labels = new Map(sockets.map((s) => [s.key, s.label.trim()]))
  const option = (jack: Jack): JackOption => ({
    value: jack.key,
    label: say('model.jack', {
      labels: [...new Set(jack.contacts.map((c) => labels.get(c.port) || '?'))].join(', '),
      form: say(`form.${jack.form}`),
    }),
  })
  const jacks = deriveJacks(sockets)
  const of = (dir: Jack['dir'], wanted: (jack: Jack) => boolean): JackOption[] =>
    jacks.filter((j) => j.dir === dir && wanted(j)).map(option)
  const isPicture = (j: Jack): boolean => isPictureForm(j.form)
  const isRf = (j: Jack): boolean => j.form === 'rf'
  return {
    pictureIn: of('in', isPicture),
    lineIn: of('in', (j) => isPicture(j) && !isRf(j)),
    rfIn: of('in', isRf),
    soundIn: of('in', (j) => j.form === 'sound'),
    allOut: of('out', () => true),
    rfOut: of('out', isRf),
  }
}
