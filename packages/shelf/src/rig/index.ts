/** Small models, units and a question for the tests of whatever works on a shelf. */
import type { Model } from '@coaxwain/models'
import type { Question } from '../hookup'
import type { Unit } from '../unit'

export * from './models'

/** A thing in working order, with every socket and function tried. */
export function tried(uid: string, model: Model, quantity = 1): Unit {
  const works = 'works' as const
  const isDevice = model.type === 'device'
  return {
    uid,
    model: uid,
    quantity,
    working: works,
    holding: 'kept',
    place: null,
    forms: isDevice
      ? model.jacks.flatMap((j) =>
          j.contacts.map(({ port }) => ({ jack: j.key, port, state: works })),
        )
      : [],
    functions: isDevice ? model.functions.map((f) => ({ function: f.key, state: works })) : [],
    modifications: [],
    stands: {},
    remotePresent: true,
  }
}

/** From the player to the set, and what is different this time. */
export const asked = (changes: Partial<Question> = {}): Question => ({
  format: 1,
  source: { unit: 'player', playing: 'play' },
  material: { protection: 'none' },
  display: { unit: 'set' },
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
  ...changes,
})
