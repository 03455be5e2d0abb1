import {
  addPowers,
  attenuator,
  convertLevel,
  db,
  dbmv,
  foldedLevel,
  foldedOneSide,
  ghost,
  LEVEL_UNITS,
  loadVideo,
  metre,
  mhz,
  microsecond,
  minimumLossPad,
  ohm,
  percent,
  picofarad,
  reflect,
  returnLossThrough,
  transformed,
  voltPp,
} from '@coaxwain/quantities'
import {
  combineYc,
  FOUR_BY_THREE,
  horizontalTvLines,
  modulationDepth,
  RF_SYSTEM_IDS,
  type RfSystemId,
} from '@coaxwain/signal'
import { got, oneOf, type Inputs, type Kinds } from '../inputs'

/** `dBµV` is written with either letter and with `u`. */
const unit = (word: string) => oneOf(LEVEL_UNITS, word.replace(/[µμ]/u, 'u'), 'unit')

/** `M`, `B/G`, `PAL I`: the first system that is named. */
function systemOf(text: string): RfSystemId {
  const named = text.split(/[\s/,]+/u).find((word) => RF_SYSTEM_IDS.some((id) => id === word))
  return oneOf(RF_SYSTEM_IDS, named ?? text, 'system')
}

function aspectOf(text: string): number {
  const [wide = Number.NaN, high = Number.NaN] = text.split(':').map(Number)
  return wide / high
}

const fold = (inputs: Inputs) => ({
  source: ohm(inputs.number('source_ohm_each')),
  series: ohm(inputs.number('series_ohm_each')),
  load: ohm(inputs.number('load_ohm')),
})

/** Wires, resistors and video. */
export const CIRCUIT_KINDS: Kinds = {
  level_conversion: (i) =>
    got(
      convertLevel(
        { value: i.number('value'), unit: unit(i.text('from')) },
        unit(i.text('to')),
        ohm(i.numberOr('impedance_ohm', 75)),
      ),
    ),

  transformer_level_change: (i) =>
    got(
      transformed(dbmv(i.number('level_in_dbmv')), {
        from: ohm(i.number('from_impedance_ohm')),
        to: ohm(i.number('to_impedance_ohm')),
        loss: db(i.numberOr('transformer_loss_db', 0)),
      }),
    ),

  power_sum: (i) => got(addPowers(i.numbers('levels_db').map(dbmv))),

  reflection: (i) => {
    const found = got(reflect(ohm(i.number('z0_ohm')), ohm(i.number('load_ohm'))))
    return {
      gamma: found.gamma,
      vswr: found.standingWaveRatio,
      return_loss_db: found.returnLoss,
      mismatch_loss_db: found.mismatchLoss,
    }
  },

  return_loss_through_line: (i) =>
    got(
      returnLossThrough(db(i.number('load_return_loss_db')), db(i.number('one_way_line_loss_db'))),
    ),

  ghost_delay: (i) => {
    const found = got(
      ghost({
        length: metre(i.number('length_m')),
        velocityFactor: i.number('velocity_factor'),
        activeLine: microsecond(i.number('active_line_us')),
      }),
    )
    return { delay_us: found.delay, percent_of_width: found.ofWidth }
  },

  minimum_loss_pad: (i) => {
    const pad = got(minimumLossPad(ohm(i.number('high_ohm')), ohm(i.number('low_ohm'))))
    return { series_ohm: pad.series, shunt_ohm: pad.shunt, loss_db: pad.loss }
  },

  attenuator: (i) => {
    const pad = got(attenuator(ohm(i.number('z_ohm')), db(i.number('loss_db'))))
    return {
      t_series_ohm: pad.teeSeries,
      t_shunt_ohm: pad.teeShunt,
      pi_shunt_ohm: pad.piShunt,
      pi_series_ohm: pad.piSeries,
    }
  },

  video_divider: (i) => {
    const source = {
      emf: voltPp(i.number('source_emf_vpp')),
      impedance: ohm(i.number('source_ohm')),
      nominal: voltPp(i.numberOr('nominal_vpp', 1)),
    }
    const found = got(loadVideo(source, i.numbers('loads_ohm').map(ohm)))
    return { vpp: found.level, level_error_db: found.error }
  },

  modulation_depth: (i) => {
    const white = i.has('white_percent_at_nominal')
      ? percent(i.number('white_percent_at_nominal'))
      : undefined
    const found = got(
      modulationDepth({
        system: systemOf(i.text('system')),
        white,
        videoGain: i.number('video_gain'),
      }),
    )
    return {
      white_carrier_percent: found.white,
      overmodulated: found.overmodulated,
      gain_limit: found.gainLimit,
      gain_limit_db: found.gainLimitLevel,
    }
  },

  horizontal_tv_lines: (i) =>
    got(
      horizontalTvLines(
        mhz(i.number('luma_bandwidth_mhz')),
        microsecond(i.number('active_line_us')),
        i.has('aspect') ? aspectOf(i.text('aspect')) : FOUR_BY_THREE,
      ),
    ),

  yc_combining_capacitor: (i) => {
    const found = got(
      combineYc(
        picofarad(i.number('capacitor_pf')),
        mhz(i.number('f_mhz')),
        ohm(i.numberOr('impedance_ohm', 75)),
      ),
    )
    return { chroma_gain_db: found.chroma, luma_gain_db: found.luma }
  },

  stereo_to_mono_resistors: (i) =>
    got(i.flagOr('same_signal_both', true) ? foldedLevel(fold(i)) : foldedOneSide(fold(i))),
}
