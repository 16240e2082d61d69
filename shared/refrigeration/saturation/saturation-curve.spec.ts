import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { kelvin, pascalAbsolute } from '../../units/quantity';
import { REFRIGERANTS } from './refrigerants';
import { bubblePressure, bubbleTemperature, dewPressure, dewTemperature } from './saturation-curve';
import type { SaturationTable } from './saturation-table';

const TABLES = [...REFRIGERANTS.values()];

/** A table with every second row left out: what it says in between can be held against the rows that it lost. */
const thinned = (table: SaturationTable): SaturationTable => ({
  ...table,
  temperaturesK: { startK: table.lowerLimitK, stepK: 2 },
  bubblePa: table.bubblePa.filter((_, row) => row % 2 === 0),
  dewPa: table.dewPa.filter((_, row) => row % 2 === 0),
});

const pressureOf = (result: ReturnType<typeof dewPressure>): number => (result.ok ? result.pressure : NaN);
const temperatureOf = (result: ReturnType<typeof dewTemperature>): number =>
  result.ok ? result.temperature : NaN;

const within = (table: SaturationTable): fc.Arbitrary<number> =>
  fc.double({ min: table.lowerLimitK, max: table.upperLimitK, noNaN: true });

describe.each(TABLES)('saturation of $designation', (table) => {
  it('gives the table’s own rows', () => {
    table.dewPa.slice(0, -6).forEach((dewPa, row) => {
      const temperature = kelvin(table.lowerLimitK + row);
      expect(pressureOf(dewPressure(table, temperature)) / dewPa).toBeCloseTo(1, 10);
      expect(pressureOf(bubblePressure(table, temperature)) / (table.bubblePa[row] ?? NaN)).toBeCloseTo(
        1,
        10,
      );
      expect(temperatureOf(dewTemperature(table, pascalAbsolute(dewPa)))).toBeCloseTo(temperature, 8);
    });
  });

  // A straight line errs with the square of the spacing: 0.01 K on 2 K rows is a quarter of that on ours.
  it('is within 0.01 K between rows even when every second one is missing', () => {
    const thin = thinned(table);
    table.dewPa.slice(0, -7).forEach((dewPa, row) => {
      const temperature = table.lowerLimitK + row;
      const bubblePa = pascalAbsolute(table.bubblePa[row] ?? NaN);
      expect(Math.abs(temperatureOf(dewTemperature(thin, pascalAbsolute(dewPa))) - temperature)).toBeLessThan(
        0.01,
      );
      expect(Math.abs(temperatureOf(bubbleTemperature(thin, bubblePa)) - temperature)).toBeLessThan(0.01);
    });
  });

  it('has pressure and temperature as exact opposites', () => {
    fc.assert(
      fc.property(within(table), (temperatureK) => {
        const dewPa = pascalAbsolute(pressureOf(dewPressure(table, kelvin(temperatureK))));
        const bubblePa = pascalAbsolute(pressureOf(bubblePressure(table, kelvin(temperatureK))));
        expect(temperatureOf(dewTemperature(table, dewPa))).toBeCloseTo(temperatureK, 8);
        expect(temperatureOf(bubbleTemperature(table, bubblePa))).toBeCloseTo(temperatureK, 8);
        expect(dewPa).toBeLessThanOrEqual(bubblePa);
      }),
    );
  });

  it('rises with temperature', () => {
    fc.assert(
      fc.property(within(table), within(table), (a, b) => {
        fc.pre(Math.abs(a - b) > 1e-6);
        const [cold, warm] = a < b ? [a, b] : [b, a];
        expect(pressureOf(dewPressure(table, kelvin(cold)))).toBeLessThan(
          pressureOf(dewPressure(table, kelvin(warm))),
        );
        expect(pressureOf(bubblePressure(table, kelvin(cold)))).toBeLessThan(
          pressureOf(bubblePressure(table, kelvin(warm))),
        );
      }),
    );
  });

  it('answers at both limits and says why not beyond them', () => {
    expect(dewPressure(table, kelvin(table.lowerLimitK)).ok).toBe(true);
    expect(dewPressure(table, kelvin(table.upperLimitK)).ok).toBe(true);
    expect(dewPressure(table, kelvin(table.lowerLimitK - 0.001))).toEqual({
      ok: false,
      reason: 'belowTable',
    });
    expect(bubblePressure(table, kelvin(table.upperLimitK + 0.001))).toEqual({
      ok: false,
      reason: 'aboveTable',
    });
    expect(bubblePressure(table, kelvin(table.criticalK ?? NaN))).toEqual({
      ok: false,
      reason: 'aboveCritical',
    });
  });

  it('says why a pressure has no temperature', () => {
    const highest = pressureOf(dewPressure(table, kelvin(table.upperLimitK)));
    const criticalPa = table.criticalPa ?? NaN;
    expect(dewTemperature(table, pascalAbsolute((table.dewPa[0] ?? NaN) * 0.999))).toEqual({
      ok: false,
      reason: 'belowTable',
    });
    expect(dewTemperature(table, pascalAbsolute(highest * 1.001))).toEqual({
      ok: false,
      reason: 'aboveTable',
    });
    expect(dewTemperature(table, pascalAbsolute(criticalPa))).toEqual({ ok: false, reason: 'aboveCritical' });
    expect(bubbleTemperature(table, pascalAbsolute(criticalPa * 1.2))).toEqual({
      ok: false,
      reason: 'aboveCritical',
    });
    expect(bubbleTemperature(table, pascalAbsolute(0))).toEqual({ ok: false, reason: 'belowTable' });
    expect(bubbleTemperature(table, pascalAbsolute(-1))).toEqual({ ok: false, reason: 'belowTable' });
  });

  it.each([NaN, Infinity, -Infinity])('calls %d not finite', (value) => {
    expect(dewTemperature(table, pascalAbsolute(value))).toEqual({ ok: false, reason: 'notFinite' });
    expect(bubblePressure(table, kelvin(value))).toEqual({ ok: false, reason: 'notFinite' });
  });
});

describe('a maker’s own table', () => {
  const [base] = TABLES.filter((table) => table.designation === 'R-448A');
  if (base === undefined) throw new Error('R-448A is missing');
  const rows = [...base.dewPa.keys()].filter((row) => row % 10 === 0 && row <= 130);
  const maker: SaturationTable = {
    ...base,
    criticalK: null,
    criticalPa: null,
    upperLimitK: base.lowerLimitK + 130,
    temperaturesK: rows.map((row) => base.lowerLimitK + row),
    bubblePa: rows.map((row) => base.bubblePa[row] ?? NaN),
    dewPa: rows.map((row) => base.dewPa[row] ?? NaN),
  };

  it('with a row every 10 K stays within 0.1 K of the finer one', () => {
    base.dewPa.slice(0, 131).forEach((dewPa, row) => {
      const temperature = temperatureOf(dewTemperature(maker, pascalAbsolute(dewPa)));
      expect(Math.abs(temperature - (base.lowerLimitK + row))).toBeLessThan(0.1);
    });
  });

  it('without a critical point ends at its last row', () => {
    expect(dewTemperature(maker, pascalAbsolute(9e6))).toEqual({ ok: false, reason: 'aboveTable' });
    expect(dewPressure(maker, kelvin(400))).toEqual({ ok: false, reason: 'aboveTable' });
  });
});
