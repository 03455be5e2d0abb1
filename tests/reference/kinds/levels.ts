import {
  addCarrierToNoise,
  carrierToNoise,
  cascade,
  celsius,
  db,
  dbmv,
  dbuv,
  dbuvToDbmv,
  digitalThreshold,
  foot,
  hz,
  kelvin,
  levelFor,
  metre,
  metreToFoot,
  mhz,
  ohm,
  resistiveStar,
  splitterLoss,
  tapThroughLoss,
  thermalFloor,
  type Db,
  type Dbmv,
  type Foot,
} from '@coaxwain/quantities'
import {
  afterSteps,
  amplifierDerating,
  cascadeDerating,
  fittedLoss,
  LEVEL_WINDOWS,
  loss20At,
  neighbourRule,
  placeInWindow,
  ratioAfter,
  scaledLoss,
  soundBelowVision,
  spreadRule,
  tabledLoss,
  TRIPLE_BEAT,
  type CableId,
  type IntermodulationOrder,
  type LevelStep,
  type LevelWindowId,
} from '@coaxwain/signal'
import { got, oneOf, passOrFail, type Inputs, type Kinds } from '../inputs'

/** Names as the published tables write them, with what they say of the make. */
const CABLE_NAMES: readonly (readonly [RegExp, CableId])[] = [
  [/twin lead.*22/u, 'twin lead 22 AWG'],
  [/twin lead.*20/u, 'twin lead 20 AWG'],
  [/^RG-59.*(older|solid)/u, 'RG-59 solid'],
  [/^RG-59\b/u, 'RG-59'],
  [/^RG-6\b/u, 'RG-6'],
  [/^RG-11\b/u, 'RG-11'],
]

function cable(i: Inputs): CableId {
  const text = i.text('cable')
  const named = CABLE_NAMES.find(([pattern]) => pattern.test(text))
  if (!named) throw new Error(`cable ${text} is not known`)
  return named[1]
}

const length = (i: Inputs): Foot =>
  i.has('length_m') ? metreToFoot(metre(i.number('length_m'))) : foot(i.number('length_ft'))

const level = (i: Inputs): Dbmv =>
  i.has('level_dbuv') ? dbuvToDbmv(dbuv(i.number('level_dbuv'))) : dbmv(i.number('level_dbmv'))

const reception = (i: Inputs) => ({
  bandwidth: hz(i.number('bandwidth_hz')),
  noiseFigure: db(i.number('noise_figure_db')),
})

const excess = (i: Inputs): Db => db(i.numberOr('excess_db', 0))

/** How each key of a step is read. */
const STEPS: Readonly<Record<string, (i: Inputs) => LevelStep>> = {
  cable: (i) => ({ kind: 'cable', cable: cable(i), length: length(i), at: mhz(i.number('f_mhz')) }),
  splitter_outputs: (i) => ({
    kind: 'splitter',
    outputs: i.number('splitter_outputs'),
    excess: excess(i),
  }),
  pad_db: (i) => ({ kind: 'loss', loss: db(i.number('pad_db')) }),
  loss_db: (i) => ({ kind: 'loss', loss: db(i.number('loss_db')) }),
  amplifier_gain_db: (i) => ({ kind: 'amplifier', gain: db(i.number('amplifier_gain_db')) }),
}

/** Keys that only go with another one. */
const COMPANIONS = ['f_mhz', 'length_ft', 'length_m', 'excess_db']

function steps(i: Inputs): LevelStep[] {
  return i.names
    .filter((name) => !COMPANIONS.includes(name))
    .map((name) => {
      const read = STEPS[name]
      if (!read) throw new Error(`a step ${name} is not known`)
      return read(i)
    })
}

function order(i: Inputs): IntermodulationOrder {
  const given = i.number('order')
  if (given !== 2 && given !== 3) throw new Error(`order ${given} is not worked out`)
  return given
}

const DERATING_RULE = '7.5*log10(n-1)'

/** Cables, splitters, amplifiers, noise, and what a level must lie between. */
export const LEVEL_KINDS: Kinds = {
  cable_loss_fit: (i) => got(fittedLoss(cable(i), mhz(i.number('f_mhz')), length(i))),

  cable_loss_table: (i) => got(tabledLoss(cable(i), mhz(i.number('f_mhz')), length(i))),

  cable_loss_sqrt_scale: (i) =>
    got(
      scaledLoss(db(i.number('loss_db_at_f1')), mhz(i.number('f1_mhz')), mhz(i.number('f2_mhz'))),
    ),

  cable_temperature: (i) => got(loss20At(db(i.number('loss_db_20c')), celsius(i.number('temp_c')))),

  splitter_ideal: (i) => got(splitterLoss(i.number('outputs'))),

  splitter_chain: (i) => {
    const excesses = i.numbers('typical_excess_db_each')
    const chain = i.numbers('splitters').map((outputs, at): LevelStep => ({
      kind: 'splitter',
      outputs,
      excess: db(excesses[at] ?? 0),
    }))
    return got(afterSteps(dbmv(i.number('level_in_dbmv')), chain))
  },

  tap_through_ideal: (i) => got(tapThroughLoss(db(i.number('tap_db')))),

  splitter_resistive: (i) => {
    const star = got(resistiveStar(i.number('outputs'), ohm(i.numberOr('z_ohm', 75))))
    return { resistor_ohm: star.resistor, loss_db: star.loss, isolation_db: star.isolation }
  },

  thermal_floor: (i) => {
    const floor = got(
      thermalFloor({
        bandwidth: hz(i.number('bandwidth_hz')),
        temperature: kelvin(i.numberOr('temperature_k', 290)),
        across: ohm(i.numberOr('impedance_ohm', 75)),
      }),
    )
    return { dbmv: floor.level, dbm: floor.power }
  },

  friis_cascade: (i) => {
    const row = got(
      cascade(
        i.records('stages').map((s) => ({
          gain: db(s.number('gain_db')),
          noiseFigure: db(s.number('noise_figure_db')),
        })),
      ),
    )
    return { noise_figure_db: row.noiseFigure, gain_db: row.gain }
  },

  carrier_to_noise: (i) => got(carrierToNoise(level(i), reception(i))),

  carrier_to_noise_combine: (i) => got(addCarrierToNoise(i.numbers('ratios_db').map(db))),

  level_for_cnr: (i) => got(levelFor(db(i.number('target_cn_db')), reception(i))),

  digital_threshold: (i) => {
    const edge = got(digitalThreshold(db(i.number('cn_required_db')), reception(i)))
    return { dbm: edge.power, dbmv: edge.level }
  },

  level_cascade: (i) =>
    got(afterSteps(dbmv(i.number('start_dbmv')), i.records('steps').flatMap(steps))),

  intermod_level_change: (i) =>
    ratioAfter(db(i.number('ratio_before_db')), order(i), db(i.number('output_change_db'))),

  triple_beat_versus_two_tone: (i) => {
    if (i.number('equal_carriers') !== 3) throw new Error('a triple beat is made of three carriers')
    return TRIPLE_BEAT
  },

  amplifier_derating: (i) => {
    oneOf([DERATING_RULE], i.textOr('rule', DERATING_RULE).replaceAll(' ', ''), 'rule')
    return got(amplifierDerating(i.number('channels')))
  },

  cascade_derating: (i) => got(cascadeDerating(i.number('identical_amplifiers'))),

  level_window: (i) => {
    const rules = Object.keys(LEVEL_WINDOWS) as LevelWindowId[]
    return placeInWindow(level(i), LEVEL_WINDOWS[oneOf(rules, i.text('rule'), 'rule')])
  },

  adjacent_level_rule: (i) =>
    passOrFail(
      neighbourRule(
        dbmv(i.number('level_a_dbmv')),
        dbmv(i.number('level_b_dbmv')),
        mhz(i.number('separation_mhz')),
      ).holds,
    ),

  system_level_spread: (i) => {
    const levels = i.numbers('levels_dbmv').map(dbmv)
    const rule = got(spreadRule(levels, mhz(i.number('upper_limit_mhz'))))
    return { allowed_db: rule.allowed, spread_db: rule.found, result: passOrFail(rule.holds) }
  },

  aural_below_visual: (i) => {
    const rule = soundBelowVision(
      dbmv(i.number('visual_dbmv')),
      dbmv(i.number('aural_dbmv')),
      i.flag('after_converter'),
    )
    return { difference_db: rule.below, result: passOrFail(rule.holds) }
  },
}
