import { mhz } from '@coaxwain/quantities'
import {
  channelsAt,
  channelsOf,
  findChannel,
  frequencyError,
  harmonicOf,
  intermodulation,
  mirrorImages,
  movedOffAircraft,
  PLAN_IDS,
  soundColourBeat,
  uhfTaboos,
  vsbPilot,
  weakSpots,
  type Landing,
  type PlanPart,
} from '@coaxwain/signal'
import { got, oneOf, type Inputs, type Kinds } from '../inputs'
import { protectionCheck } from './protection'

const planOf = (word: string) => oneOf(PLAN_IDS, word, 'plan')

/** A plan, or a plan and its first and last channel: `us-broadcast 2-36`. */
function part(text: string): PlanPart {
  const [word = '', span] = text.trim().split(/\s+/)
  const plan = planOf(word)
  if (span === undefined) return { plan }
  const names = channelsOf(plan).map((c) => c.name)
  const from = names.findIndex((name) => span.startsWith(`${name}-`))
  const to = names.findIndex((name) => from >= 0 && span === `${names[from]}-${name}`)
  if (to < 0) throw new Error(`${text} names no channels`)
  return { plan, names: names.slice(from, to + 1).join(',') }
}

const asNumber = (name: string): string | number => (/^\d+$/.test(name) ? Number(name) : name)

const landed = ({ channel, mhz: at, aboveVisionMhz }: Landing) => ({
  f_mhz: at,
  channel: asNumber(channel.name),
  offset_from_vision_mhz: aboveVisionMhz,
})

function products(i: Inputs) {
  const order = i.number('order')
  if (order !== 2 && order !== 3) throw new Error(`order ${order} is not worked out`)
  const found = got(intermodulation(i.numbers('carriers_mhz').map(mhz), order))
  const within = part(i.text('plan'))
  return {
    products_mhz: found,
    landing: found.flatMap((at) => channelsAt(within, at).map(landed)),
  }
}

function harmonic(i: Inputs) {
  const at = got(harmonicOf(mhz(i.number('vision_mhz')), i.number('harmonic')))
  const [first] = channelsAt(part(i.text('plan')), at)
  return {
    f_mhz: at,
    channel: first?.channel.name ?? 'none',
    offset_from_vision_mhz: first?.aboveVisionMhz ?? null,
  }
}

/** Channels, and where carriers of one fall into another. */
export const CARRIER_KINDS: Kinds = {
  channel_row: (i) => {
    const channel = findChannel(planOf(i.text('plan')), i.text('channel'))
    if (!channel) throw new Error('there is no such channel')
    return {
      plan: channel.plan,
      channel: channel.name,
      band: channel.band,
      lower_mhz: channel.lowerMhz,
      upper_mhz: channel.upperMhz,
      vision_mhz: channel.visionMhz,
      sound_mhz: channel.soundMhz,
      system: channel.system,
      still_allocated: channel.allocated,
    }
  },

  intermod_products: products,

  harmonic_landing: harmonic,

  protection_ratio: protectionCheck,

  double_sideband_images: (i) => {
    const found = got(
      mirrorImages({
        vision: mhz(i.number('vision_mhz')),
        channelWidth: mhz(i.number('channel_width_mhz')),
        soundOffset: mhz(i.number('sound_offset_mhz')),
        colourSubcarrier: mhz(i.number('colour_subcarrier_mhz')),
      }),
    )
    return {
      mirror_sound_mhz: found.sound,
      mirror_sound_above_lower_vision_mhz: found.soundAboveLowerVision,
      mirror_colour_mhz: found.colour,
      mirror_colour_above_lower_vision_mhz: found.colourAboveLowerVision,
      video_mhz_hitting_lower_sound: found.videoOnLowerSound,
    }
  },

  uhf_taboos: (i) => {
    oneOf(['us-broadcast'], i.textOr('plan', 'us-broadcast'), 'plan')
    const found = uhfTaboos(i.number('channel'))
    return {
      if_beat: found.ifBeat,
      intermodulation: found.intermodulation,
      adjacent: found.adjacent,
      oscillator: found.oscillator,
      sound_image: found.soundImage,
      picture_image: found.pictureImage,
    }
  },

  image_and_oscillator: (i) => {
    const found = got(
      weakSpots(
        mhz(i.number('vision_mhz')),
        mhz(i.number('if_vision_mhz')),
        i.flagOr('high_side_oscillator', true) ? 'above' : 'below',
      ),
    )
    return { oscillator_mhz: found.oscillator, vision_image_mhz: found.visionImage }
  },

  aeronautical_offset: (i) => movedOffAircraft(mhz(i.number('visual_mhz_nominal'))),

  modulator_frequency_error: (i) => ({
    error_khz: got(frequencyError(mhz(i.number('nominal_mhz')), i.number('error_ppm'))),
  }),

  dtv_pilot: (i) => vsbPilot(mhz(i.number('lower_edge_mhz'))),

  sound_colour_beat: (i) =>
    soundColourBeat(mhz(i.number('sound_offset_mhz')), mhz(i.number('colour_subcarrier_mhz'))),
}
