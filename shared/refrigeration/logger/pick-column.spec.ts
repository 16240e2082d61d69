import { describe, expect, it } from '@jest/globals';
import { pickColumn, valuesIn, type PickedDimension } from './pick-column';
import { readLogger } from './read-logger';

function picked(headings: string, dimension: PickedDimension): (readonly [string, string])[] {
  const width = headings.split(',').length;
  const row = (at: number) => [at, ...Array.from({ length: width }, () => 5)].join(',');
  const read = readLogger(`Time (s),${headings}\n${row(0)}\n${row(10)}`);
  if (!read.ok) throw new Error(read.reason);
  return pickColumn(read, dimension).map(({ column, by }) => [column.heading, by] as const);
}

describe('pickColumn', () => {
  const HEADINGS =
    'Ch1 (°F),Presión (psig),Line temperature,Recalentamiento (°F),Temp (°C),Discharge (bar a),Pressure,Ch2 (V)';

  it.each([
    [
      'gaugePressure',
      [
        ['Presión (psig)', 'unitAndHeading'],
        ['Pressure', 'heading'],
      ],
    ],
    [
      'absolutePressure',
      [
        ['Discharge (bar a)', 'unit'],
        ['Pressure', 'heading'],
      ],
    ],
    [
      'temperature',
      [
        ['Temp (°C)', 'unitAndHeading'],
        ['Ch1 (°F)', 'unit'],
        ['Line temperature', 'heading'],
      ],
    ],
    ['temperatureDifference', [['Recalentamiento (°F)', 'unitAndHeading']]],
  ] as const)('offers for a %s', (dimension, expected) => {
    expect(picked(HEADINGS, dimension)).toEqual(expected);
  });

  it('offers nothing where nothing fits', () => {
    expect(picked('Ch1 (V),Humidity (%)', 'temperature')).toEqual([]);
  });
});

describe('valuesIn', () => {
  it('converts and keeps what is missing', () => {
    const column = { heading: '', unit: 'degF', values: Float64Array.of(32, NaN, 50), readable: 2 } as const;
    const [first, second, third] = valuesIn(column, 'degF', 'degC');
    expect(first).toBeCloseTo(0, 9);
    expect(second).toBeNaN();
    expect(third).toBeCloseTo(10, 9);
  });
});
