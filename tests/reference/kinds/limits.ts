import { db, dbmv, metre, mhz, microvoltPerMetre, ohm } from '@coaxwain/quantities'
import {
  antennaSwitchIsolation,
  backfeed,
  fieldAt,
  leakageLimit,
  radiatedField,
  rfLimit,
} from '@coaxwain/signal'
import { got, passOrFail, type Kinds } from '../inputs'

/** What may leave a box, a switch, a cable. */
export const LIMIT_KINDS: Kinds = {
  rf_output_limit: (i) => {
    const limit = got(rfLimit(i.number('constant_uv_per_sqrt_ohm'), ohm(i.number('impedance_ohm'))))
    return { uv: limit.voltage, dbmv: limit.level }
  },

  antenna_switch_isolation: (i) => got(antennaSwitchIsolation(mhz(i.number('f_mhz')))),

  leakage_limit: (i) => {
    const limit = got(leakageLimit(mhz(i.number('f_mhz'))))
    return { uv_per_m: limit.field, distance_m: limit.at }
  },

  field_distance_scaling: (i) =>
    got(
      fieldAt(
        { field: microvoltPerMetre(i.number('uv_per_m')), at: metre(i.number('from_m')) },
        metre(i.number('to_m')),
      ),
    ),

  radiated_field_estimate: (i) =>
    got(
      radiatedField({
        level: dbmv(i.number('level_dbmv')),
        shielding: db(i.numberOr('shielding_db', 0)),
        antennaGain: i.number('antenna_gain'),
        distance: metre(i.number('distance_m')),
      }),
    ),

  antenna_backfeed: (i) => {
    const found = got(
      backfeed(
        dbmv(i.number('modulator_level_dbmv')),
        i.names.filter((name) => name.endsWith('isolation_db')).map((name) => db(i.number(name))),
        ohm(i.numberOr('impedance_ohm', 75)),
      ),
    )
    return {
      level_at_antenna_dbmv: found.level,
      limit_dbmv: found.limit,
      excess_db: found.excess,
      result: passOrFail(found.allowed),
    }
  },
}
