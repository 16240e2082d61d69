import { describe, expect, it } from '@jest/globals';
import { makersTable, printedPoints } from '../refrigeration/makers-table/makers-table.fixture';
import { refrigerant } from '../refrigeration/readings.fixture';
import { findRefrigerant } from '../refrigeration/saturation/refrigerants';
import { makersTableSchema, type MakersTableFacts } from './facts';
import { judge } from './judge';
import { makersTableOf, saturationOf } from './saturation-of';
import { buildStep, fahrenheitDegrees, pair, SEA_LEVEL, steady } from './step.fixture';

/** A shipped curve thinned to rows 5 K apart, as an invented maker would print it: the designation is nobody's. */
function printed(name = 'R-448A', lastDigitPa = 0): MakersTableFacts {
  const { points, ...named } = makersTable(
    printedPoints(refrigerant(name), { stepK: 5, lastDigitPa, fromK: 213 }),
  );
  return {
    ...named,
    printedStepPa: 690,
    safetyClass: 'A2L',
    points: points.map(({ temperature, bubble, dew }) => ({
      temperatureK: temperature,
      bubblePa: bubble,
      dewPa: dew,
    })),
  };
}

const band = { lowK: fahrenheitDegrees(5), highK: fahrenheitDegrees(9) };
const judged = (facts: { refrigerant: string; makersTable?: MakersTableFacts }, line = '28') =>
  judge(buildStep('superheat', { band }), steady(pair('45', line)), { ...SEA_LEVEL, ...facts });

const superheatOf = ({ figures }: ReturnType<typeof judged>) =>
  figures.find(({ label }) => label === 'superheat')?.value ?? NaN;

describe('saturationOf', () => {
  it('takes the program’s own figures where the company entered none', () => {
    expect(saturationOf({ refrigerant: 'R-448A' })).toBe(findRefrigerant('R-448A'));
    expect(saturationOf({ refrigerant: 'R-999X' })).toBeUndefined();
  });

  it('takes the maker’s, also of a refrigerant that the program has no figures of', () => {
    const table = printed();
    expect(makersTableSchema.parse(table)).toEqual(table);
    expect(saturationOf({ refrigerant: 'R-999X', makersTable: table })?.safetyClass).toBe('A2L');
    const judgement = judged({ refrigerant: 'R-999X', makersTable: table });
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, doubts: [] });
    // Between rows 5 K apart the table is good to 0.03 K.
    expect(Math.abs(superheatOf(judgement) - superheatOf(judged({ refrigerant: 'R-448A' })))).toBeLessThan(
      0.03,
    );
  });

  it('is not taken without a safety class of the standard', () => {
    const { safetyClass: _safetyClass, ...unclassed } = printed();
    expect(makersTableSchema.safeParse(unclassed).success).toBe(false);
    expect(makersTableSchema.safeParse({ ...unclassed, safetyClass: 'A4' }).success).toBe(false);
  });

  it('goes before the program’s own of the same name', () => {
    const higher = printed();
    const points = higher.points.map((point) => ({
      ...point,
      bubblePa: point.bubblePa * 1.02,
      dewPa: point.dewPa * 1.02,
    }));
    const own = superheatOf(judged({ refrigerant: 'R-448A' }));
    const makers = superheatOf(judged({ refrigerant: 'R-448A', makersTable: { ...higher, points } }));
    // 2 % of 59.7 psia at 1.17 psi/°F (computed with a Helmholtz-energy property program) is 1.0 °F.
    expect(((makers - own) * 9) / 5).toBeCloseTo(1.0, 0);
    expect(makers).toBeGreaterThan(own);
  });

  it('is named as the source, with its edition', () => {
    const [working] = judged({ refrigerant: 'R-999X', makersTable: printed() }).working;
    expect(working?.source).toContain('R-999X: pressure–temperature table of a maker, 2026-01');
    expect(working?.source).not.toContain('CoolProp');
    expect(judged({ refrigerant: 'R-448A' }).working[0]?.source).toContain('CoolProp');
  });

  it('answers nothing beyond its first and last row', () => {
    const table = printed();
    const points = table.points.filter(({ temperatureK }) => temperatureK < 263);
    const judgement = judged({ refrigerant: 'R-999X', makersTable: { ...table, points } });
    expect(judgement.counts).toBe(false);
    expect(judgement.doubts.map(({ kind }) => kind)).toContain('aboveTable');
  });

  it('is none where the table doesn’t hold together, and not the program’s instead', () => {
    const table = printed();
    for (const points of [[], table.points.slice(0, 3), [...table.points].reverse()]) {
      const facts = { refrigerant: 'R-448A', makersTable: { ...table, points } };
      expect(saturationOf(facts)).toBeUndefined();
      // Asked again, from what was kept.
      expect(saturationOf(facts)).toBeUndefined();
      expect(judged(facts).doubts).toEqual([{ kind: 'unknownRefrigerant', severity: 'refuse' }]);
    }
  });

  it('is built once for the same facts', () => {
    const facts = { refrigerant: 'R-999X', makersTable: printed() };
    expect(saturationOf(facts)).toBe(saturationOf(facts));
    expect(saturationOf(facts)).not.toBe(saturationOf({ ...facts, makersTable: printed() }));
  });
});

describe('makersTableOf', () => {
  it('keeps every figure and every word', () => {
    const table = printed('R-404A', 690);
    const { points, ...named } = makersTableOf(table);
    expect(named).toEqual({
      designation: 'R-999X',
      issuer: 'a maker',
      edition: '2026-01',
      printedStepPa: 690,
      safetyClass: 'A2L',
    });
    expect(points.map(({ temperature, bubble, dew }) => [temperature, bubble, dew])).toEqual(
      table.points.map(({ temperatureK, bubblePa, dewPa }) => [temperatureK, bubblePa, dewPa]),
    );
  });
});
