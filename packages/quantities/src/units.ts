declare const unit: unique symbol

/** A number that carries its unit in its type, so that dBmV cannot be added to MHz by accident. */
export type Quantity<Unit extends string> = number & { readonly [unit]: Unit }

/** Level across a stated impedance, relative to 1 mV r.m.s. */
export type Dbmv = Quantity<'dBmV'>
/** Level across a stated impedance, relative to 1 microvolt r.m.s.; always dBmV + 60. */
export type Dbuv = Quantity<'dBuV'>
/** Power relative to 1 mW. */
export type Dbm = Quantity<'dBm'>
/** A ratio: loss, gain, isolation. */
export type Db = Quantity<'dB'>
export type Mhz = Quantity<'MHz'>
export type Khz = Quantity<'kHz'>
export type Hz = Quantity<'Hz'>
export type Ohm = Quantity<'ohm'>
export type Volt = Quantity<'V'>
export type Microvolt = Quantity<'uV'>
export type Metre = Quantity<'m'>

const maker =
  <Unit extends string>(name: Unit) =>
  (value: number): Quantity<Unit> => {
    if (!Number.isFinite(value)) throw new Error(`not a finite number of ${name}: ${value}`)
    return value as Quantity<Unit>
  }

export const dbmv = maker('dBmV')
export const dbuv = maker('dBuV')
export const dbm = maker('dBm')
export const db = maker('dB')
export const mhz = maker('MHz')
export const khz = maker('kHz')
export const hz = maker('Hz')
export const ohm = maker('ohm')
export const volt = maker('V')
export const microvolt = maker('uV')
export const metre = maker('m')
