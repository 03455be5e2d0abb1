import type { DeviceModel, Jack } from '@coaxwain/models'
import type { Speak } from './words'

/** What each form of a device is called, by its key; two of one kind are told apart by their sockets. */
export function formTitles(device: DeviceModel, say: Speak): ReadonlyMap<string, string> {
  const plain = (jack: Jack): string => {
    const form = say(`form.${jack.form}`)
    return jack.label ? say('unit.form-label', { form, label: jack.label }) : form
  }
  const labels = new Map(device.ports.map((p) => [p.key, p.label]))
  const same = (a: Jack, b: Jack): boolean => a.dir === b.dir && plain(a) === plain(b)
  return new Map(
    device.jacks.map((jack) => {
      const form = plain(jack)
      if (!device.jacks.some((other) => other !== jack && same(other, jack)))
        return [jack.key, form]
      const ports = [...new Set(jack.contacts.map((c) => labels.get(c.port) ?? c.port))]
      return [jack.key, say('unit.form-label', { form, label: ports.join(', ') })]
    }),
  )
}
