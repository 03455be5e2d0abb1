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
export type Millivolt = Quantity<'mV'>
/** Peak to peak, sync tip to white of a nominal composite signal being 1. */
export type VoltPp = Quantity<'Vpp'>
export type Metre = Quantity<'m'>
export type Foot = Quantity<'ft'>
export type Microsecond = Quantity<'us'>
export type Picofarad = Quantity<'pF'>
export type Kelvin = Quantity<'K'>
export type Celsius = Quantity<'degC'>
/** Strength of a field. */
export type MicrovoltPerMetre = Quantity<'uV/m'>
export type Percent = Quantity<'%'>

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
export const millivolt = maker('mV')
export const voltPp = maker('Vpp')
export const metre = maker('m')
export const foot = maker('ft')
export const microsecond = maker('us')
export const picofarad = maker('pF')
export const kelvin = maker('K')
export const celsius = maker('degC')
export const microvoltPerMetre = maker('uV/m')
export const percent = maker('%')

/**
 * Sum of two quantities of one unit; of two units it does not compile. Plain `+` gives a bare number that no
 * unit will take back.
 */
export const plus = <Unit extends string>(
  a: Quantity<Unit>,
  b: NoInfer<Quantity<Unit>>,
): Quantity<Unit> => (a + b) as Quantity<Unit>

/** Difference of two quantities of one unit. */
export const minus = <Unit extends string>(
  a: Quantity<Unit>,
  b: NoInfer<Quantity<Unit>>,
): Quantity<Unit> => (a - b) as Quantity<Unit>

/** A quantity so many times over. */
export const times = <Unit extends string>(a: Quantity<Unit>, factor: number): Quantity<Unit> =>
  (a * factor) as Quantity<Unit>
