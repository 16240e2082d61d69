import { kelvinDifference, type KelvinDifference } from '../units/quantity';

/**
 * The middle between the highest and the lowest superheat of a hunting valve: the trade's usual mean. It reads too high
 * where the valve dwells low and spikes briefly (see `timeWeightedMean`) and hides the minimum, so judge that too.
 *
 * @param high highest superheat seen, in kelvin; negative when the line was colder than saturation
 * @param low lowest superheat seen, in kelvin; negative likewise
 * @returns mean in kelvin, never clamped; NaN when either is not a number. The order of the two doesn't matter
 * @source common practice, no publication
 * @example huntingMean(kelvinDifference(6), kelvinDifference(2)) // 4
 */
export const huntingMean = (high: KelvinDifference, low: KelvinDifference): KelvinDifference =>
  kelvinDifference((high + low) / 2);
