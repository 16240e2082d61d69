declare const quantity: unique symbol;
type Quantity<Name extends string> = number & { readonly [quantity]: Name };

/** A temperature in kelvin (absolute, ITS-90). Never a difference between two temperatures. */
export type Kelvin = Quantity<'Kelvin'>;

/** A difference between two temperatures in kelvin, such as a superheat. May be negative. */
export type KelvinDifference = Quantity<'KelvinDifference'>;

/** A pressure in pascals above a perfect vacuum. What saturation curves take. */
export type PascalAbsolute = Quantity<'PascalAbsolute'>;

/** A pressure in pascals above the local atmosphere: what a gauge shows. Negative in a vacuum. */
export type PascalGauge = Quantity<'PascalGauge'>;

/** A length or an elevation above sea level in metres. */
export type Metre = Quantity<'Metre'>;

/** A heat flow or an electric power in watts. */
export type Watt = Quantity<'Watt'>;

/** A mass in kilograms. */
export type Kilogram = Quantity<'Kilogram'>;

/** A duration in seconds. */
export type Second = Quantity<'Second'>;

/** An electric current in amperes. */
export type Ampere = Quantity<'Ampere'>;

/** A voltage in volts. */
export type Volt = Quantity<'Volt'>;

/** Says that a number is a temperature in kelvin; nothing is checked or converted. */
export const kelvin = (value: number): Kelvin => value as Kelvin;

/** Says that a number is a temperature difference in kelvin; nothing is checked or converted. */
export const kelvinDifference = (value: number): KelvinDifference => value as KelvinDifference;

/** Says that a number is an absolute pressure in pascals; nothing is checked or converted. */
export const pascalAbsolute = (value: number): PascalAbsolute => value as PascalAbsolute;

/** Says that a number is a gauge pressure in pascals; nothing is checked or converted. */
export const pascalGauge = (value: number): PascalGauge => value as PascalGauge;

/** Says that a number is a length in metres; nothing is checked or converted. */
export const metre = (value: number): Metre => value as Metre;

/** Says that a number is a heat flow or power in watts; nothing is checked or converted. */
export const watt = (value: number): Watt => value as Watt;

/** Says that a number is a mass in kilograms; nothing is checked or converted. */
export const kilogram = (value: number): Kilogram => value as Kilogram;

/** Says that a number is a duration in seconds; nothing is checked or converted. */
export const second = (value: number): Second => value as Second;

/** Says that a number is a current in amperes; nothing is checked or converted. */
export const ampere = (value: number): Ampere => value as Ampere;

/** Says that a number is a voltage in volts; nothing is checked or converted. */
export const volt = (value: number): Volt => value as Volt;

/**
 * The difference `a` minus `b`; negative when `a` is the colder one, and never clamped.
 *
 * @param a temperature in kelvin
 * @param b temperature in kelvin
 * @returns difference in kelvin; NaN when either is not a number
 * @example subtractTemperatures(kelvin(280), kelvin(275)) // 5
 */
export const subtractTemperatures = (a: Kelvin, b: Kelvin): KelvinDifference => kelvinDifference(a - b);

/**
 * The temperature that lies `difference` above `temperature`.
 *
 * @param temperature in kelvin
 * @param difference in kelvin, may be negative
 * @returns temperature in kelvin; nothing stops it below absolute zero, the caller checks
 * @example addDifference(kelvin(275), kelvinDifference(5)) // 280
 */
export const addDifference = (temperature: Kelvin, difference: KelvinDifference): Kelvin =>
  kelvin(temperature + difference);

/**
 * The arithmetic mean of temperatures. Adding temperatures means nothing by itself, so only the mean is offered.
 *
 * @param temperatures in kelvin
 * @returns mean in kelvin, or undefined when there is none to average
 * @example averageTemperature([kelvin(270), kelvin(280)]) // 275
 */
export function averageTemperature(temperatures: readonly Kelvin[]): Kelvin | undefined {
  if (temperatures.length === 0) return undefined;
  let sum = 0;
  for (const temperature of temperatures) sum += temperature;
  return kelvin(sum / temperatures.length);
}
