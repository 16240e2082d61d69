import { describe, expect, it } from '@jest/globals';
import { SEA_LEVEL_ATMOSPHERE } from '#shared/refrigeration/gauge-pressure';
import { fromSi } from '#shared/units/convert';
import { checkValues } from './check-values';
import { readSheet } from './sheet-reading';
import { sheetText } from './sheet.fixture';

function valuesOf(designation: string, unit: 'degF' | 'degC' = 'degF') {
  const names = { designation, issuer: 'Example Gases', edition: '1' };
  const reading = readSheet(sheetText(), { temperature: 'degF', pressure: 'psig' }, names);
  if (reading.kind !== 'figures' || !reading.saturation) throw new Error(reading.kind);
  return checkValues(reading.saturation, unit);
}

describe('checkValues', () => {
  it('is of round temperatures between the first and the last row', () => {
    const rounded = (unit: 'degF' | 'degC') =>
      valuesOf('R-9X1', unit).map(({ temperatureK }) => Math.round(fromSi(temperatureK, unit)));
    expect(rounded('degF')).toEqual([-40, -20, 0, 20, 40, 60, 80, 100, 120]);
    expect(rounded('degC')).toEqual([-40, -30, -20, -10, 0, 10, 20, 30, 40, 50]);
  });

  it('gives the figures of R-448A, of which the sheet is made', () => {
    // 20 °F: 57.9 psig bubble, 43.9 psig dew, see trade-values.spec.ts of the saturation tables.
    const value = valuesOf('R-9X1')[3];
    const psig = (pressurePa = NaN): number => fromSi(pressurePa - SEA_LEVEL_ATMOSPHERE, 'psig');
    expect(psig(value?.bubblePa)).toBeCloseTo(57.9, 0);
    expect(psig(value?.dewPa)).toBeCloseTo(43.9, 0);
    // 10 to 12 °F of glide at case temperatures (trade sheets of R-448A, from memory).
    expect((value?.glideK ?? NaN) * 1.8).toBeGreaterThan(9);
    expect((value?.glideK ?? NaN) * 1.8).toBeLessThan(13);
  });

  it('has no glide where the bubble point lies below the table', () => {
    expect(valuesOf('R-9X1')[0]?.glideK).toBeNull();
  });

  it('says how far the program’s own figures are, where it has some', () => {
    expect(valuesOf('R-9X1').every(({ ownDifferenceK }) => ownDifferenceK === null)).toBe(true);
    for (const { ownDifferenceK } of valuesOf('R-448A'))
      expect(Math.abs(ownDifferenceK ?? NaN)).toBeLessThan(0.15);
    const against = valuesOf('R-404A').map(({ ownDifferenceK }) => ownDifferenceK ?? NaN);
    expect(Math.max(...against.map(Math.abs))).toBeGreaterThan(2);
  });
});
