import { describe, expect, it } from '@jest/globals';
import { kelvin, pascalAbsolute } from '../../units/quantity';
import { atmosphereAtFeet, fahrenheit, inFahrenheitDifference, psig, refrigerant } from '../readings.fixture';
import { REFRIGERANTS } from '../saturation/refrigerants';
import {
  bubblePressure,
  bubbleTemperature,
  dewPressure,
  dewTemperature,
} from '../saturation/saturation-curve';
import type { SaturationTable } from '../saturation/saturation-table';
import { superheat } from '../superheat';
import { buildMakersTable } from './build-makers-table';
import { makersTable, printedPoints, TENTH_PSI_PA, type Printing } from './makers-table.fixture';

function rebuilt(table: SaturationTable, printing: Printing): SaturationTable {
  const built = buildMakersTable(makersTable(printedPoints(table, printing), table.designation));
  if (!built.ok) throw new Error(`refused: ${JSON.stringify(built.problems)}`);
  return built.table;
}

const CURVES = [
  [bubblePressure, bubbleTemperature],
  [dewPressure, dewTemperature],
] as const;

/**
 * Largest difference of a temperature that both tables give at one pressure, every half kelvin. A rounded end row may lie
 * above the exact pressure: then the comparison begins `marginK` inside.
 */
function worstErrorK(full: SaturationTable, made: SaturationTable, marginK = 0): number {
  let worst = 0;
  for (
    let temperatureK = made.lowerLimitK + marginK;
    temperatureK <= made.upperLimitK - marginK;
    temperatureK += 0.5
  ) {
    for (const [pressureOf, temperatureOf] of CURVES) {
      const known = pressureOf(full, kelvin(temperatureK));
      const found = known.ok ? temperatureOf(made, known.pressure) : known;
      const error = found.ok ? Math.abs(found.temperature - temperatureK) : NaN;
      worst = Number.isNaN(error) ? NaN : Math.max(worst, error);
    }
  }
  return worst;
}

const offsets = [0, 3, 7];

describe('a table rebuilt from rows 10 K apart', () => {
  describe.each([...REFRIGERANTS.values()])('of $designation', (table) => {
    it.each(offsets)('beginning %d K higher is within 0.03 K of the full one', (offsetK) => {
      expect(worstErrorK(table, rebuilt(table, { stepK: 10, offsetK }))).toBeLessThan(0.03);
    });
  });

  it.each(['R-448A', 'R-404A', 'R-407C', 'R-744'])('of %s in tenths of a psi stays within 0.15 K', (name) => {
    const printing = { stepK: 10, fromK: fahrenheit(-40), lastDigitPa: TENTH_PSI_PA };
    expect(worstErrorK(refrigerant(name), rebuilt(refrigerant(name), printing), 0.5)).toBeLessThan(0.15);
  });
});

describe('buildMakersTable', () => {
  const r448a = refrigerant('R-448A');
  const printing = { stepK: 10, fromK: 223.15, toK: 323.15 };
  const made = rebuilt(r448a, printing);

  it('keeps printed rows as printed', () => {
    for (const { temperature, dew, bubble } of printedPoints(r448a, printing)) {
      const atDew = dewPressure(made, temperature);
      const atBubble = bubblePressure(made, temperature);
      expect(atDew.ok && atDew.pressure).toBeCloseTo(dew, 6);
      expect(atBubble.ok && atBubble.pressure).toBeCloseTo(bubble, 6);
    }
  });

  it('answers at its ends and not beyond, and knows no critical point', () => {
    expect(dewPressure(made, kelvin(223.15)).ok).toBe(true);
    expect(dewPressure(made, kelvin(323.15)).ok).toBe(true);
    expect(dewPressure(made, kelvin(223.149))).toEqual({ ok: false, reason: 'belowTable' });
    expect(dewPressure(made, kelvin(323.151))).toEqual({ ok: false, reason: 'aboveTable' });
    expect(dewTemperature(made, pascalAbsolute(9e6))).toEqual({ ok: false, reason: 'aboveTable' });
    expect(dewTemperature(made, pascalAbsolute(1e4))).toEqual({ ok: false, reason: 'belowTable' });
  });

  it('names the sheet in the working of a superheat', () => {
    const result = superheat({
      table: made,
      suctionPressure: psig(45),
      atmosphere: atmosphereAtFeet(0),
      lineTemperature: fahrenheit(28),
    });
    if (!result.ok) throw new Error(result.reason);
    expect(inFahrenheitDifference(result.superheat)).toBeCloseTo(7.1, 1);
    expect(result.working.source).toBe(
      'R-448A: pressure–temperature table of a maker, 2026-01; 11 printed rows, entered by hand',
    );
  });

  it.each([
    ['R-448A', true],
    ['R-404A', true],
    ['R-507A', false],
    ['R-134a', false],
  ])('finds of %s whether it glides: %s', (name, glide) => {
    expect(rebuilt(refrigerant(name), { stepK: 5, fromK: 233.15 }).glide).toBe(glide);
    expect(refrigerant(name).glide).toBe(glide);
  });

  it('lays rows down at most 1 K apart, uneven printing included', () => {
    const points = printedPoints(r448a, { stepK: 2.5, fromK: 233.15, toK: 283.15 }).filter(
      (_, index) => index % 3 !== 1,
    );
    const built = buildMakersTable(makersTable(points));
    if (!built.ok || 'startK' in built.table.temperaturesK) throw new Error('no uneven table');
    const grid: readonly number[] = built.table.temperaturesK;
    grid.slice(1).forEach((temperatureK, index) => {
      expect(temperatureK - (grid[index] ?? NaN)).toBeGreaterThan(0);
      expect(temperatureK - (grid[index] ?? NaN)).toBeLessThanOrEqual(1 + 1e-9);
    });
    expect(grid).toHaveLength(built.table.dewPa.length);
  });

  it('refuses −40, 0 and 40 °C alone for their gaps', () => {
    const built = buildMakersTable(
      makersTable(printedPoints(r448a, { stepK: 40, fromK: 233.15, toK: 313.15 })),
    );
    if (built.ok) throw new Error('built');
    expect(built.problems.map(({ code, row }) => [code, row])).toEqual([
      ['tooFewPoints', null],
      ['gapTooWide', 2],
      ['gapTooWide', 3],
    ]);
    const step = built.problems[1]?.values.find(({ label }) => label === 'step');
    expect(step?.value).toBeCloseTo(40, 9);
  });

  it('survives a journey as JSON', () => {
    const sent = makersTable(printedPoints(r448a, printing));
    const received = JSON.parse(JSON.stringify(sent)) as typeof sent;
    expect(buildMakersTable(received)).toEqual(buildMakersTable(sent));
  });

  it('carries the safety class that was said, and none that wasn’t', () => {
    const table = makersTable(printedPoints(r448a, printing));
    const classOf = (built: ReturnType<typeof buildMakersTable>) => built.ok && built.table.safetyClass;
    expect(classOf(buildMakersTable({ ...table, safetyClass: 'B2L' }))).toBe('B2L');
    expect(classOf(buildMakersTable(table))).toBeNull();
  });

  it('is built in spite of questions', () => {
    const built = buildMakersTable({ ...makersTable(printedPoints(r448a, printing)), edition: '' });
    expect(built.ok && built.table.source).toBe('pressure–temperature table of a maker');
  });
});
