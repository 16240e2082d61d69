import { UNITS, type UnitId } from './unit';

/** Two units of different dimensions were put together, such as °F and a difference in °F. Always a mistake in code. */
export class UnitMismatch extends Error {
  override readonly name = 'UnitMismatch';

  constructor(
    readonly from: UnitId,
    readonly to: UnitId,
  ) {
    super(`${from} (${UNITS[from].dimension}) can't become ${to} (${UNITS[to].dimension})`);
  }
}

/**
 * A value in the SI unit of its dimension (K, Pa, m, m², W, kg, s, A, V, fraction, count).
 *
 * @param value in `unit`; any number, not checked for sense
 * @param unit of the value
 * @returns SI value, exact to floating point
 * @source NIST SP 811 (2008), see UNITS
 * @example toSi(10, 'degF_diff') // 5.5556 K
 */
export function toSi(value: number, unit: UnitId): number {
  const { factor, offset } = UNITS[unit];
  return (value + offset) * factor;
}

/**
 * The opposite of `toSi`. Rounding is left to whoever shows the value.
 *
 * @param siValue in the SI unit of the unit's dimension
 * @param unit wanted
 * @returns value in `unit`, exact to floating point
 * @source NIST SP 811 (2008), see UNITS
 * @example fromSi(283.15, 'degF') // 50
 */
export function fromSi(siValue: number, unit: UnitId): number {
  const { factor, offset } = UNITS[unit];
  return siValue / factor - offset;
}

/**
 * A value in another unit of the same dimension. Gauge to absolute is refused: that takes an atmosphere.
 *
 * @param value in `from`
 * @param from unit of the value
 * @param to unit wanted
 * @returns value in `to`; exactly `value` when the units are the same
 * @throws {UnitMismatch} when the units measure different things
 * @source NIST SP 811 (2008), see UNITS
 * @example convert(1, 'bara', 'psia') // 14.503774
 */
export function convert(value: number, from: UnitId, to: UnitId): number {
  if (UNITS[from].dimension !== UNITS[to].dimension) throw new UnitMismatch(from, to);
  return from === to ? value : fromSi(toSi(value, from), to);
}
