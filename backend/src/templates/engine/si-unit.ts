import type { Dimension, UnitId } from '#shared/units/unit';

/** The SI unit that a step's limits and figures are stored in. */
export const SI_UNIT: Readonly<Record<Dimension, UnitId>> = {
  temperature: 'K',
  temperatureDifference: 'K_diff',
  gaugePressure: 'Pag',
  absolutePressure: 'Pa',
  vacuum: 'Pa_vac',
  pressureDifference: 'Pa_diff',
  length: 'm',
  area: 'm2',
  heatFlow: 'W',
  mass: 'kg',
  duration: 's',
  electricCurrent: 'A',
  voltage: 'V',
  power: 'W_el',
  ratio: 'fraction',
  count: 'count',
};

/** Every dimension that a reading can have. */
export const DIMENSIONS = Object.keys(SI_UNIT) as [Dimension, ...Dimension[]];
