import type { Kelvin, PascalAbsolute, Second } from '../../units/quantity';
import type { Working, WorkingLine } from '../working';
import type { RiseCriteria } from './rise-criteria';
import type { RiseShape } from './rise-shape';
import { waterVapourPressure } from './water-vapour';

export interface RiseFigures {
  readonly criteria: RiseCriteria;
  readonly start: PascalAbsolute;
  readonly endPressure: PascalAbsolute;
  readonly held: Second;
  readonly shape: RiseShape | null;
  readonly ambientTemperature: Kelvin | undefined;
}

/** In a vacuum's own unit: only so do screens tell it from an absolute pressure in psi. */
const vacuum = (label: string, valuePa: number | null): readonly WorkingLine[] =>
  valuePa === null ? [] : [{ label, value: valuePa, unit: 'Pa_vac' }];

function shapeLines(shape: RiseShape | null, held: Second): readonly WorkingLine[] {
  if (shape === null) return [];
  return [
    ...vacuum('riseOverFirstThird', (shape.startSlopePaPerS * held) / 3),
    ...vacuum('riseOverLastThird', (shape.endSlopePaPerS * held) / 3),
    ...vacuum('plateau', shape.plateau),
  ];
}

function ambientLines(ambientTemperature: Kelvin | undefined): readonly WorkingLine[] {
  if (ambientTemperature === undefined) return [];
  const water = waterVapourPressure(ambientTemperature);
  return [
    { label: 'ambientTemperature', value: ambientTemperature, unit: 'K' },
    ...vacuum('waterVapourPressure', water.ok ? water.pressure : null),
  ];
}

/**
 * How a rise was judged.
 *
 * @param figures pressures in pascals absolute, times in seconds
 * @returns working, the rise last
 */
export function riseWorking(figures: RiseFigures): Working {
  const { criteria, start, endPressure, held, shape, ambientTemperature } = figures;
  return {
    formula: 'vacuumRise',
    source:
      'criteria of the template; slopes of the first and the last third; water after Murphy and Koop 2005',
    lines: [
      ...vacuum('target', criteria.target),
      ...vacuum('limit', criteria.limit),
      ...vacuum('greatestRise', criteria.greatestRisePa),
      ...vacuum('leakAbove', criteria.leakAbove),
      { label: 'hold', value: criteria.hold, unit: 's' },
      { label: 'held', value: held, unit: 's' },
      ...ambientLines(ambientTemperature),
      ...vacuum('pressureAtIsolation', start),
      ...shapeLines(shape, held),
      ...vacuum('pressureAtEnd', endPressure),
      ...vacuum('rise', endPressure - start),
    ],
  };
}
