import type { Hookup, Stop, Uid } from '@coaxwain/shelf'
import type { Colour, Sound } from '@coaxwain/signal'
import type { Lookup } from '../../format/lookup'
import { capital, type Speak } from '../../format/words'

const inColour = (colour: Colour, say: Speak): string =>
  say(colour === 'mono' ? 'carried.in-grey' : 'carried.in-colour')

const soundWords = (sound: Sound, say: Speak): string => say(`carried.sound.${sound}`)

/** Best sound among the stops of a unit: the legs of one unit tell of one thing. */
function soundAt(stops: readonly Stop[]): Sound | null {
  const order: readonly Sound[] = ['stereo', 'mono', 'half', 'none']
  return order.find((s) => stops.some((stop) => stop.sound === s)) ?? null
}

/** Where the luma bandwidth first falls to what finally arrives: the narrowest step of the way. */
function narrowestUnit(hookup: Hookup): Uid | null {
  const stops = hookup.legs.find((l) => l.purpose === 'picture')?.stops ?? []
  const least = Math.min(...stops.map((s) => s.picture?.lumaMhz ?? Infinity))
  const poorest = stops.at(-1)?.picture?.poorest
  const at = stops.findIndex((s) => s.picture?.lumaMhz === least && s.picture.poorest === poorest)
  return at > 0 && at < stops.length - 1 ? (stops[at]?.unit ?? null) : null
}

/** What leaves a unit, or at the display what it shows. Null for units that only pass an aerial on. */
export function carriedWords(
  hookup: Hookup,
  unit: Uid,
  display: Uid,
  { lookup, say }: { readonly lookup: Lookup; readonly say: Speak },
): { lead: string; text: string } | null {
  if (unit === display) {
    return { lead: say('drawing.shows'), text: shownWords(hookup, unit, lookup, say) }
  }
  if (unit === hookup.sound.from) {
    return { lead: say('drawing.sounds'), text: capital(say(`heard.${hookup.sound.sound}`)) }
  }
  const stops = hookup.legs
    .flatMap((l) => (l.purpose === 'aerial' ? [] : l.stops))
    .filter((s) => s.unit === unit)
  const picture = stops.find((s) => s.picture)?.picture
  const sound = soundAt(stops)
  if (!picture && sound === null) return null
  const text = picture
    ? picture.carrier
      ? say('carried.channel', {
          channel: picture.carrier.channel,
          colour: inColour(picture.colour, say),
          sound: soundWords(sound ?? 'none', say),
        })
      : say('carried.with-sound', {
          picture: say('carried.picture', {
            form: say(`form.${picture.form}`),
            scan: say(`scan.${picture.scan}`),
            colour: inColour(picture.colour, say),
          }),
          sound: soundWords(sound ?? 'none', say),
        })
    : capital(soundWords(sound ?? 'none', say))
  return {
    lead: say('drawing.leaves-as'),
    text: narrowestUnit(hookup) === unit ? say('carried.narrowest', { carried: text }) : text,
  }
}

/** Picture and sound at the display, in one line; loudspeakers elsewhere are named. */
function shownWords(hookup: Hookup, display: Uid, lookup: Lookup, say: Speak): string {
  const { sound, from } = hookup.sound
  const picture = pictureWords(hookup, say)
  return from === null || from === display
    ? say('carried.with-sound', { picture, sound: say(`heard.${sound}`) })
    : say('carried.sound-elsewhere', { picture, name: lookup.device(from)?.name ?? '' })
}

export function pictureWords(hookup: Hookup, say: Speak): string {
  const { quality, colour } = hookup.picture
  if (quality === 'none') return say('seen.none')
  return say(colour ? 'seen.colour' : 'seen.grey', { sharpness: say(`sharpness.${quality}`) })
}
