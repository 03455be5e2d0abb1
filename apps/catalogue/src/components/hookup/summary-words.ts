import type { Hookup, Uid } from '@coaxwain/shelf'
import { capital, type Speak } from '../../format/words'
import type { Lookup } from '../../format/lookup'
import { unitOrder } from './unit-order'

const nameOf = (lookup: Lookup, unit: Uid): string => {
  const device = lookup.device(unit)
  return device ? `${device.maker} ${device.name}` : ''
}

/** The boxes between the two ends, in the order of the drawing. */
export function throughWords(
  hookup: Hookup,
  ends: readonly Uid[],
  lookup: Lookup,
  say: Speak,
): string {
  const names = unitOrder(hookup)
    .filter((uid) => !ends.includes(uid))
    .map((uid) => nameOf(lookup, uid))
  const [first, ...rest] = names
  if (first === undefined) return say('answer.straight')
  return say('answer.through', {
    names: rest.reduce((all, name) => say('answer.and', { first: all, second: name }), first),
  })
}

export const picturePart = (hookup: Hookup, say: Speak): string =>
  say(hookup.picture.colour ? 'answer.in-colour' : 'answer.in-grey', {
    sharpness: say(`sharpness.${hookup.picture.quality}`),
  })

/** Picture, sound and effort in one line. */
export const summaryWords = (hookup: Hookup, say: Speak): string =>
  say('answer.summary', {
    picture: picturePart(hookup, say),
    sound: say(`answer.sound.${hookup.sound.sound}`),
    boxes: say('answer.boxes', { count: hookup.axes.boxes }),
    pieces: say('answer.pieces', { count: hookup.axes.pieces }),
  })

export interface Expectation {
  readonly title: string
  readonly lines: readonly string[]
}

/** What the picture will be, and why no better. */
export function pictureExpectation(hookup: Hookup, title: string, say: Speak): Expectation {
  const stops = hookup.legs.find((l) => l.purpose === 'picture')?.stops ?? []
  const narrowest = stops.find((s) => s.picture && s.picture.lumaMhz === hookup.picture.lumaMhz)
  const mhz = hookup.picture.lumaMhz
  const channel = stops.map((s) => s.picture?.carrier?.channel).find((c) => c !== undefined)
  const why =
    hookup.picture.quality === 'rf' && channel !== undefined
      ? say('answer.narrow-rf', { channel, mhz })
      : narrowest
        ? say('answer.narrow', { mhz })
        : null
  return {
    title: capital(title),
    lines: [
      ...(why ? [why] : []),
      ...hookup.picture.degradations.map((d) => say(`answer.degraded.${d}`)),
    ],
  }
}

export function soundExpectation(hookup: Hookup, lookup: Lookup, say: Speak): Expectation {
  const { sound, from } = hookup.sound
  return {
    title: say(`answer.heard.${sound}`),
    lines: [
      from === null
        ? say('answer.sound-nowhere')
        : say('answer.sound-from', { name: nameOf(lookup, from) }),
    ],
  }
}
