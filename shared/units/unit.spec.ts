import { describe, expect, it } from '@jest/globals';
import { decimalsFor } from './format';
import { UNITS, type Dimension, type UnitId } from './unit';
import { displayUnit } from './unit-system';

const UNIT_IDS = Object.keys(UNITS) as UnitId[];
const DIMENSIONS = [...new Set(Object.values(UNITS).map((unit) => unit.dimension))];

describe('UNITS', () => {
  it('holds all sixteen dimensions', () => {
    expect(DIMENSIONS).toHaveLength(16);
  });

  it('gives every unit a positive factor', () => {
    expect(UNIT_IDS.filter((unit) => !(UNITS[unit].factor > 0))).toEqual([]);
  });

  it('shifts temperatures only', () => {
    const shifted = UNIT_IDS.filter((unit) => UNITS[unit].offset !== 0);
    expect(shifted).toEqual(['degC', 'degF']);
  });

  it('has different symbols within a dimension', () => {
    const seen = UNIT_IDS.map((unit) => `${UNITS[unit].dimension} ${UNITS[unit].symbol}`);
    expect(new Set(seen).size).toBe(seen.length);
  });

  it('tells a pressure’s difference, gauge, absolute and vacuum apart by their dimension alone', () => {
    expect([UNITS.Pag, UNITS.Pa, UNITS.Pa_vac, UNITS.Pa_diff].map(({ factor }) => factor)).toEqual([
      1, 1, 1, 1,
    ]);
    expect(new Set(['psig', 'psia', 'psi_diff'].map((unit) => UNITS[unit as UnitId].dimension)).size).toBe(3);
    expect(UNITS.Pa_vac.dimension).toBe('vacuum');
  });

  it('shows a difference in °F like a temperature in °F', () => {
    expect(UNITS.degF_diff.symbol).toBe(UNITS.degF.symbol);
    expect(UNITS.degF_diff.dimension).not.toBe(UNITS.degF.dimension);
  });
});

describe('displayUnit', () => {
  it.each(DIMENSIONS)('measures %s in both systems', (dimension: Dimension) => {
    expect(UNITS[displayUnit(dimension, 'us')].dimension).toBe(dimension);
    expect(UNITS[displayUnit(dimension, 'si')].dimension).toBe(dimension);
  });

  it('follows the habits of the two systems', () => {
    expect(displayUnit('gaugePressure', 'us')).toBe('psig');
    expect(displayUnit('gaugePressure', 'si')).toBe('barg');
    expect(displayUnit('temperatureDifference', 'us')).toBe('degF_diff');
    expect(displayUnit('vacuum', 'si')).toBe('micron');
    expect(displayUnit('pressureDifference', 'us')).toBe('psi_diff');
    expect(displayUnit('pressureDifference', 'si')).toBe('bar_diff');
  });
});

describe('decimalsFor', () => {
  it.each(UNIT_IDS)('gives whole decimals between 0 and 3 for %s', (unit) => {
    expect([0, 1, 2, 3]).toContain(decimalsFor(unit));
  });
});
