import { describe, expect, it } from '@jest/globals';
import { findRefrigerant, REFRIGERANTS } from './refrigerants';

const TABLES = [...REFRIGERANTS.values()];

describe('REFRIGERANTS', () => {
  it('holds the fifteen refrigerants whose figures hold, in ascending order', () => {
    expect([...REFRIGERANTS.keys()]).toEqual([
      ...[
        'R-22',
        'R-32',
        'R-134a',
        'R-290',
        'R-404A',
        'R-407A',
        'R-407C',
        'R-407F',
        'R-410A',
        'R-448A',
        'R-449A',
      ],
      ...['R-507A', 'R-744', 'R-1234yf', 'R-1234ze(E)'],
    ]);
  });

  it('states a limit exactly where the evidence is thin', () => {
    const limited = TABLES.filter((table) => table.limitNote !== null).map((table) => table.designation);
    expect(limited).toEqual(['R-407A', 'R-407F', 'R-448A', 'R-449A']);
  });

  it('says which refrigerants have a glide', () => {
    const gliding = TABLES.filter((table) => table.glide).map((table) => table.designation);
    expect(gliding).toEqual(['R-404A', 'R-407A', 'R-407C', 'R-407F', 'R-448A', 'R-449A']);
  });

  it('says which refrigerants burn', () => {
    const burning = TABLES.filter((table) => table.safetyClass !== 'A1').map((table) => table.designation);
    expect(burning).toEqual(['R-32', 'R-290', 'R-1234yf', 'R-1234ze(E)']);
  });
});

describe.each(TABLES)('table of $designation', (table) => {
  it('has a bubble and a dew pressure for every row', () => {
    expect(table.bubblePa.length).toBe(table.dewPa.length);
    expect(table.dewPa.length).toBeGreaterThan(80);
  });

  it('rises from row to row', () => {
    const rises = (values: readonly number[]): boolean =>
      values.every((value, row) => row === 0 || value > (values[row - 1] ?? Infinity));
    expect(rises(table.bubblePa)).toBe(true);
    expect(rises(table.dewPa)).toBe(true);
  });

  it('never has dew above bubble', () => {
    expect(table.dewPa.every((dew, row) => dew <= (table.bubblePa[row] ?? 0))).toBe(true);
  });

  it('ends 1 K (one component) or 5 K (blend) below its critical point, inside its rows', () => {
    const margin = table.composition.length === 1 ? 1 : 5;
    expect((table.criticalK ?? NaN) - table.upperLimitK).toBeCloseTo(margin, 6);
    const { startK, stepK } = table.temperaturesK as { startK: number; stepK: number };
    expect(table.upperLimitK).toBeLessThanOrEqual(startK + stepK * (table.dewPa.length - 1));
    expect(table.lowerLimitK).toBe(startK);
  });

  it('has components that make up the whole', () => {
    const whole = table.composition.reduce((sum, component) => sum + component.massPercent, 0);
    expect(whole).toBeCloseTo(100, 9);
  });
});

describe('findRefrigerant', () => {
  it.each([
    ['R-448A', 'R-448A'],
    ['R448A', 'R-448A'],
    ['448A', 'R-448A'],
    ['r 448a', 'R-448A'],
    ['CO2', 'R-744'],
    ['co₂', undefined],
    ['R744', 'R-744'],
    ['744', 'R-744'],
    ['Propane', 'R-290'],
    ['R-507', 'R-507A'],
    ['R1234ze', 'R-1234ze(E)'],
    ['R-1234ze(E)', 'R-1234ze(E)'],
    ['HFC-134a', 'R-134a'],
  ])('finds %j as %s', (text, designation) => {
    expect(findRefrigerant(text)?.designation).toBe(designation);
  });

  it.each(['', 'R', 'R-404', 'R-454C', 'R-450A', '44', 'ammonia'])('finds nothing for %j', (text) => {
    expect(findRefrigerant(text)).toBeUndefined();
  });
});
