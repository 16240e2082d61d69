import type { Ampere, Watt } from '../../units/quantity';
import type { Working, WorkingLine } from '../working';
import type { HeaterCurrentInputs, HeaterLeg, HeaterRating } from './heater-current';

export interface HeaterFigures {
  readonly inputs: HeaterCurrentInputs;
  readonly tolerance: number;
  readonly expected: Ampere;
  readonly expectedPower: Watt;
  readonly legs: readonly HeaterLeg[];
}

function ratingLines(rating: HeaterRating): readonly WorkingLine[] {
  const rated: WorkingLine =
    rating.kind === 'power'
      ? { label: 'ratedPower', value: rating.power, unit: 'W_el' }
      : { label: 'ratedCurrent', value: rating.current, unit: 'A' };
  return rating.voltage === null
    ? [rated]
    : [rated, { label: 'ratedVoltage', value: rating.voltage, unit: 'V' }];
}

/**
 * How a heater's current was judged.
 *
 * @returns working with the deviation of each leg (`leg1Deviation` …) last
 */
export function heaterWorking(figures: HeaterFigures): Working {
  const { inputs, tolerance, expected, expectedPower, legs } = figures;
  return {
    formula: inputs.supply === 'onePhase' ? 'heaterCurrentOnePhase' : 'heaterCurrentThreePhase',
    source: 'Ohm’s law, resistance as on the nameplate',
    lines: [
      ...ratingLines(inputs.rating),
      { label: 'measuredVoltage', value: inputs.measuredVoltage, unit: 'V' },
      { label: 'expectedPower', value: expectedPower, unit: 'W_el' },
      { label: 'expectedCurrent', value: expected, unit: 'A' },
      { label: 'tolerance', value: tolerance, unit: 'fraction' },
      ...legs.map(({ current }, leg): WorkingLine => ({
        label: `leg${leg + 1}Current`,
        value: current,
        unit: 'A',
      })),
      ...legs.map(({ deviation }, leg): WorkingLine => ({
        label: `leg${leg + 1}Deviation`,
        value: deviation,
        unit: 'fraction',
      })),
    ],
  };
}
