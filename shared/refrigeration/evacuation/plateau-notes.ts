import type { Kelvin, PascalAbsolute } from '../../units/quantity';
import { kelvin } from '../../units/quantity';
import { waterVapourPressure, WATER_TRIPLE_POINT_K } from './water-vapour';

/**
 * What the plateau of a rise says, as keys that screens translate. `waterFreezing`: it rests where water freezes, so
 * liquid water is turning into ice that a pump won't lift out; warm it. `nearWaterSaturation`: it rests where water boils
 * at the ambient temperature. `aboveWaterSaturation`: higher than water at that temperature can reach, so it isn't water
 * alone (refrigerant leaving the oil, or a small leak).
 */
export type PlateauNote = 'waterFreezing' | 'nearWaterSaturation' | 'aboveWaterSaturation';

/** How near counts as near: water's own pressure moves 10 % with 1.5 K (common practice, no source). */
const FREEZING_FRACTION = 0.1;
const SATURATION_FRACTION = 0.2;

const isNear = (value: number, reference: number, fraction: number): boolean =>
  Math.abs(value - reference) <= fraction * reference;

/**
 * What a rise that has come to rest says about water.
 *
 * @param plateau where it rests, absolute, in pascals
 * @param ambientTemperature of the air round the pipes, in kelvin
 * @returns notes, most urgent first; without an ambient temperature only the one about freezing
 * @source `waterVapourPressure`; the widths are common practice without a publication
 * @example plateauNotes(4580 µm, 70 °F) // ['waterFreezing']
 */
export function plateauNotes(
  plateau: PascalAbsolute,
  ambientTemperature: Kelvin | undefined,
): readonly PlateauNote[] {
  const notes: PlateauNote[] = [];
  const freezing = waterVapourPressure(kelvin(WATER_TRIPLE_POINT_K));
  if (freezing.ok && isNear(plateau, freezing.pressure, FREEZING_FRACTION)) notes.push('waterFreezing');
  const ambient = ambientTemperature === undefined ? null : waterVapourPressure(ambientTemperature);
  if (ambient?.ok !== true) return notes;
  if (isNear(plateau, ambient.pressure, SATURATION_FRACTION)) notes.push('nearWaterSaturation');
  else if (plateau > ambient.pressure) notes.push('aboveWaterSaturation');
  return notes;
}
