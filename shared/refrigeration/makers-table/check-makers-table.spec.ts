import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { fromSi, toSi } from '../../units/convert';
import { kelvin, pascalAbsolute, type Kelvin } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from '../gauge-pressure';
import { fahrenheit, psig, refrigerant } from '../readings.fixture';
import { REFRIGERANTS } from '../saturation/refrigerants';
import { checkMakersTable } from './check-makers-table';
import { changed, makersTable, printedPoints, TENTH_PSI_PA, type Printing } from './makers-table.fixture';
import type { MakersPoint } from './makers-table';

const SHIPPED = [...REFRIGERANTS.values()];
const USUAL: Printing = { stepK: 10, fromK: 233.15, toK: 323.15, lastDigitPa: TENTH_PSI_PA };
const POINTS = printedPoints(refrigerant('R-448A'), USUAL);

const check = (points: readonly MakersPoint[], relatives = SHIPPED) =>
  checkMakersTable(makersTable(points), relatives);
const summary = (points: readonly MakersPoint[]) =>
  check(points).map(({ code, severity, row, column }) => [code, severity, row, column]);

const absolute = (gaugePsi: number) => pascalAbsolute(psig(gaugePsi) + SEA_LEVEL_ATMOSPHERE);
const degF = (value: number): Kelvin => fahrenheit(value);

describe('checkMakersTable has nothing against', () => {
  describe.each(SHIPPED)('$designation', (table) => {
    it.each([
      [10, 0, 0],
      [10, 3, TENTH_PSI_PA],
      [10, 7, 100],
      [5, 1, TENTH_PSI_PA],
      [2, 0, 100],
      [5 / 9, 0, TENTH_PSI_PA],
    ])('rows %d K apart from %d K on, printed to %d Pa', (stepK, offsetK, lastDigitPa) => {
      // At −75 °C a tenth of a psi is several kelvin of some refrigerants: rows close together print alike.
      const printing = { stepK, offsetK, lastDigitPa, fromK: stepK < 5 ? 223.15 : 0 };
      expect(check(printedPoints(table, printing))).toEqual([]);
    });

    it('it without itself among the relatives, but for carbon dioxide’s far higher pressure', () => {
      const relatives = SHIPPED.filter((other) => other !== table);
      const codes = check(printedPoints(table, USUAL), relatives).map(({ code }) => code);
      expect(codes).toEqual(table.designation === 'R-744' ? ['farFromRelatives'] : []);
    });
  });

  it('anything about likeness when there are no relatives', () => {
    const senseless = POINTS.map((point) => ({
      ...point,
      temperature: kelvin(point.temperature * 0.7 + 100),
    }));
    expect(check(senseless, [])).toEqual([]);
  });
});

describe('checkMakersTable refuses', () => {
  it('a table without designation or issuer, and asks for the edition', () => {
    const table = { ...makersTable(POINTS), designation: ' ', issuer: '', edition: '' };
    expect(checkMakersTable(table, SHIPPED).map(({ code, severity }) => [code, severity])).toEqual([
      ['noDesignation', 'refuse'],
      ['noIssuer', 'refuse'],
      ['noEdition', 'ask'],
    ]);
  });

  it('an empty table and five rows', () => {
    expect(summary([])).toEqual([['tooFewPoints', 'refuse', null, null]]);
    expect(summary(POINTS.slice(0, 5))).toEqual([['tooFewPoints', 'refuse', null, null]]);
    expect(summary(POINTS.slice(0, 6))).toEqual([]);
  });

  it('what is no number, no temperature, no absolute pressure', () => {
    const wrong = [
      changed(POINTS, 3, () => ({ dew: pascalAbsolute(NaN) })),
      changed(POINTS, 1, () => ({ temperature: kelvin(0) })),
      changed(POINTS, 1, () => ({ dew: pascalAbsolute(0) })),
    ];
    expect(wrong.map((points) => summary(points)[0])).toEqual([
      ['notFinite', 'refuse', 3, null],
      ['belowAbsoluteZero', 'refuse', 1, null],
      ['notPositive', 'refuse', 1, 'dew'],
    ]);
  });

  it('rows out of order, repeated, or printed from warm to cold', () => {
    const [first, second, ...rest] = POINTS;
    if (first === undefined || second === undefined) throw new Error('no rows');
    expect(summary([second, first, ...rest])[0]).toEqual(['notAscending', 'refuse', 2, null]);
    expect(summary([first, second, second, ...rest])).toEqual([['repeatedTemperature', 'refuse', 3, null]]);
    expect(summary(POINTS.toReversed())).toEqual([['descending', 'refuse', null, null]]);
  });

  it('a gap of more than 10 K, named with its step', () => {
    const holed = POINTS.filter((_, index) => index !== 4);
    const [found, ...more] = check(holed);
    expect(found).toMatchObject({ code: 'gapTooWide', severity: 'refuse', row: 5 });
    expect(found?.values.find(({ label }) => label === 'step')?.value).toBeCloseTo(20, 9);
    expect(more).toEqual([]);
  });

  it('18 °F is no gap, 20 °F is', () => {
    const table = refrigerant('R-404A');
    expect(check(printedPoints(table, { stepK: 10, fromK: degF(-40) }))).toEqual([]);
    expect(check(printedPoints(table, { stepK: 100 / 9, fromK: degF(-40) }))[0]?.code).toBe('gapTooWide');
  });

  it('a pressure that stands still while the temperature rises', () => {
    const fine = printedPoints(refrigerant('R-448A'), {
      stepK: 0.1,
      fromK: 253.15,
      toK: 254.15,
      lastDigitPa: 1e4,
    });
    const codes = checkMakersTable({ ...makersTable(fine), printedStepPa: 1e4 }, []).map(({ code }) => code);
    expect(new Set(codes)).toEqual(new Set(['notRising']));
  });

  it('swapped columns, once and without asking anything else', () => {
    const swapped = POINTS.map((point) => ({ ...point, bubble: point.dew, dew: point.bubble }));
    expect(summary(swapped)).toEqual([['columnsSwapped', 'refuse', null, null]]);
  });

  it('a single row with the dew above the bubble', () => {
    // R-404A: 0.9 psi between the two, so exchanging them is too small a step to break the smoothness.
    const points = printedPoints(refrigerant('R-507A'), { ...USUAL, lastDigitPa: 0 });
    const wrong = changed(points, 4, ({ bubble }) => ({ dew: pascalAbsolute(bubble + 10) }));
    expect(summary(wrong)).toEqual([['dewAboveBubble', 'refuse', 4, 'dew']]);
  });
});

describe('checkMakersTable names the mistyped row', () => {
  // R-448A at 0 °F: 23.8 psig dew, 34.3 psig bubble (see trade-values.spec.ts).
  const inFahrenheit = printedPoints(refrigerant('R-448A'), {
    stepK: 50 / 9,
    fromK: degF(-40),
    toK: degF(101),
    lastDigitPa: TENTH_PSI_PA,
  });

  it('when 32.8 is typed for 23.8', () => {
    const wrong = changed(inFahrenheit, 5, () => ({ dew: absolute(32.8) }));
    const [found, ...more] = check(wrong);
    expect(more).toEqual([]);
    expect(found).toMatchObject({ code: 'outlyingPoint', severity: 'refuse', row: 5, column: 'dew' });
    const expectedPa = found?.values.find(({ label }) => label === 'dewExpected')?.value ?? NaN;
    expect(fromSi(expectedPa - SEA_LEVEL_ATMOSPHERE, 'psig')).toBeCloseTo(23.8, 0);
  });

  it.each([1, 2, 7, 14, 15])('when 6 °F are added in row %d: both columns break', (row) => {
    const wrong = changed(inFahrenheit, row, ({ temperature }) => ({
      temperature: kelvin(temperature + toSi(6, 'degF_diff')),
    }));
    expect(summary(wrong).filter(([code]) => code === 'outlyingPoint')).toEqual([
      ['outlyingPoint', 'refuse', row, 'both'],
    ]);
  });

  it('for two rows far apart', () => {
    const once = changed(inFahrenheit, 3, ({ dew }) => ({ dew: pascalAbsolute(dew * 1.1) }));
    const twice = changed(once, 11, ({ bubble }) => ({ bubble: pascalAbsolute(bubble * 0.94) }));
    expect(summary(twice)).toEqual([
      ['outlyingPoint', 'refuse', 3, 'dew'],
      ['outlyingPoint', 'refuse', 11, 'bubble'],
    ]);
  });

  it('not when every other row is off: that is no typing error', () => {
    const noisy = inFahrenheit.map((point, index) => ({
      ...point,
      dew: pascalAbsolute(point.dew * (index % 2 === 0 ? 1 : 0.97)),
    }));
    expect(summary(noisy)).toContainEqual(['notSmooth', 'refuse', null, 'dew']);
  });

  it('whichever refrigerant, row and column: from 3 % inside, 9 % next to the ends and 15 % at them', () => {
    const cases = fc.record({
      table: fc.constantFrom(...SHIPPED),
      place: fc.nat({ max: 1000 }),
      column: fc.constantFrom('bubble' as const, 'dew' as const),
      sign: fc.constantFrom(-1, 1),
      excess: fc.double({ min: 1, max: 4, noNaN: true }),
    });
    fc.assert(
      fc.property(cases, ({ table, place, column, sign, excess }) => {
        const points = printedPoints(table, { ...USUAL, toK: 313.15 });
        const row = (place % points.length) + 1;
        const fromEnd = Math.min(row - 1, points.length - row);
        const factor = Math.exp(sign * excess * ([0.15, 0.09][fromEnd] ?? 0.03));
        const wrong = changed(points, row, (point) => ({ [column]: pascalAbsolute(point[column] * factor) }));
        const outliers = check(wrong).filter(({ code }) => code === 'outlyingPoint');
        expect(outliers.map((found) => [found.row, found.column])).toEqual([[row, column]]);
      }),
      { numRuns: 300 },
    );
  });
});

describe('checkMakersTable asks', () => {
  const NAMES = ['R-448A', 'R-404A', 'R-134a', 'R-22', 'R-407C', 'R-290'];
  // The kind of refrigerant that has to come with its own table: not among the relatives.
  const others = (name: string) => SHIPPED.filter(({ designation }) => designation !== name);
  const codesOf = (name: string, change: (point: MakersPoint) => MakersPoint, printing: Printing = USUAL) =>
    check(printedPoints(refrigerant(name), printing).map(change), others(name)).map(({ code }) => code);

  const shifted = (byPa: number) => (point: MakersPoint) => ({
    ...point,
    bubble: pascalAbsolute(point.bubble + byPa),
    dew: pascalAbsolute(point.dew + byPa),
  });
  const retyped = (from: 'degC' | 'degF', to: 'degC' | 'degF') => (point: MakersPoint) => ({
    ...point,
    temperature: kelvin(toSi(fromSi(point.temperature, from), to)),
  });

  it.each(NAMES)('whether the figures of %s are gauge pressures', (name) => {
    const printing = { ...USUAL, fromK: 248.15 };
    expect(codesOf(name, shifted(-SEA_LEVEL_ATMOSPHERE), printing)).toContain('gaugeTakenForAbsolute');
  });

  it.each(NAMES)('whether the figures of %s are absolute pressures', (name) => {
    expect(codesOf(name, shifted(SEA_LEVEL_ATMOSPHERE))).toEqual(['absoluteTakenForGauge']);
  });

  it.each(NAMES)('whether the temperatures of %s are °C', (name) => {
    const printing = { ...USUAL, stepK: 5 };
    expect(codesOf(name, retyped('degC', 'degF'), printing)).toEqual(['celsiusInFahrenheit']);
  });

  it.each(NAMES)('whether the temperatures of %s are °F', (name) => {
    const printing = { ...USUAL, stepK: 5, fromK: 248.15 };
    expect(codesOf(name, retyped('degF', 'degC'), printing)).toEqual(['fahrenheitInCelsius']);
  });

  it('about figures that behave like no refrigerant', () => {
    const squared = codesOf('R-448A', (point) => ({
      ...point,
      bubble: pascalAbsolute(point.bubble ** 2 / 1e5),
      dew: pascalAbsolute(point.dew ** 2 / 1e5),
    }));
    expect(squared).toEqual(['unlikeAnyRefrigerant']);
  });

  it('about a pressure that is three times too high', () => {
    const triple = check(
      printedPoints(refrigerant('R-134a'), USUAL).map((point) => ({
        ...point,
        bubble: pascalAbsolute(point.bubble / 3),
        dew: pascalAbsolute(point.dew / 3),
      })),
    );
    expect(triple.map(({ code, severity }) => [code, severity])).toEqual([['farFromRelatives', 'ask']]);
  });
});
