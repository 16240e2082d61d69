import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { UNITS, type UnitId } from '../../units/unit';
import { judge } from '../judge';
import { buildStep, fahrenheitInKelvin, SEA_LEVEL } from '../step.fixture';
import type { StepOf } from '../step';

type Limits = StepOf<'reading'>['limits'];

const PSI = 6894.757293168361;

function read(text: string, unit: UnitId, change: Partial<StepOf<'reading'>> = {}) {
  return judge(buildStep('reading', change), { kind: 'reading', value: { text, unit } }, SEA_LEVEL);
}

const refused = (kind: string) => ({ counts: false, doubts: [{ kind, severity: 'refuse' }] });

describe('judge of a reading', () => {
  it('only records where the template gives no limit', () => {
    expect(read('36.5', 'degF')).toMatchObject({
      outcome: 'recorded',
      counts: true,
      side: null,
      limit: null,
    });
  });

  it('keeps the value in SI with its unit, and the limits of the day with their source', () => {
    const limits: Limits = { low: null, high: fahrenheitInKelvin(41) };
    const judgement = read('36.5', 'degF', { limits, source: 'FDA Food Code' });
    expect(judgement.figures).toEqual([{ label: 'value', value: expect.closeTo(275.65, 9), unit: 'K' }]);
    expect(judgement.limit).toEqual({ ...limits, unit: 'K', source: 'FDA Food Code' });
  });

  // An outside reading is a true record: it satisfies the step, and the lead sees it first.
  it.each([
    ['41', 'within', null],
    ['41.0', 'within', null],
    ['41,0', 'within', null],
    ['+41', 'within', null],
    ['41.1', 'outside', 'high'],
    ['41.001', 'outside', 'high'],
    ['32', 'within', null],
    ['31.9', 'outside', 'low'],
    ['-5', 'outside', 'low'],
    ['\u22125', 'outside', 'low'],
  ])('judges %s °F against 32 to 41 °F: %s', (text, outcome, side) => {
    const limits = { low: fahrenheitInKelvin(32), high: fahrenheitInKelvin(41) };
    expect(read(text, 'degF', { limits })).toMatchObject({ outcome, side, counts: true });
  });

  it.each([
    ['5', 'within', null],
    ['5.0', 'within', null],
    ['5,1', 'outside', 'high'],
    ['0', 'within', null],
    ['\u22120.1', 'outside', 'low'],
  ])('judges %s °C against 0 to 5 °C, which are 32 to 41 °F: %s', (text, outcome, side) => {
    const limits = { low: fahrenheitInKelvin(32), high: fahrenheitInKelvin(41) };
    expect(read(text, 'degC', { limits })).toMatchObject({ outcome, side });
  });

  it.each([
    ['150', 'psig', 'within', null],
    ['149.9', 'psig', 'outside', 'low'],
    ['10.342', 'barg', 'outside', 'low'],
    ['10.343', 'barg', 'within', null],
    ['160.1', 'psig', 'outside', 'high'],
  ] as const)('judges %s %s against 150 to 160 psig: %s', (text, unit, outcome, side) => {
    const limits = { low: 150 * PSI, high: 160 * PSI };
    const change = { dimension: 'gaugePressure', siUnit: 'Pag', limits } as const;
    expect(read(text, unit, change)).toMatchObject({ outcome, side });
  });

  it('counts every edge from −100 to 200 °F, typed to a tenth, as within', () => {
    for (let tenths = -1000; tenths <= 2000; tenths += 1) {
      const edge = fahrenheitInKelvin(tenths / 10);
      const judgement = read((tenths / 10).toFixed(1), 'degF', { limits: { low: edge, high: edge } });
      expect(judgement.outcome).toBe('within');
    }
  });

  it.each([
    ['', 'degF', 'empty'],
    ['  ', 'degF', 'empty'],
    ['warm', 'degF', 'notANumber'],
    ['41 F', 'degF', 'notANumber'],
    ['1e3', 'degF', 'notANumber'],
    ['1,234', 'degF', 'ambiguous'],
    ['41', 'psig', 'wrongUnit'],
    ['10', 'degF_diff', 'wrongUnit'],
    ['-460', 'degF', 'belowAbsoluteZero'],
    ['-200', 'degF', 'notPlausible'],
    ['500', 'degF', 'notPlausible'],
  ] as const)('does not count %j in %s: %s', (text, unit, kind) => {
    const limits = { low: 0, high: 400 };
    expect(read(text, unit, { limits })).toMatchObject({ ...refused(kind), outcome: 'recorded', side: null });
  });

  it.each([
    ['gaugePressure', 'Pag', '-14.6', 'psig', null],
    ['gaugePressure', 'Pag', '-14.8', 'psig', 'deeperThanVacuum'],
    ['gaugePressure', 'Pag', '3000', 'psig', 'notPlausible'],
    ['vacuum', 'Pa', '500', 'micron', null],
    ['vacuum', 'Pa', '-1', 'micron', 'deeperThanVacuum'],
    ['electricCurrent', 'A', '0', 'A', null],
    ['electricCurrent', 'A', '-0.1', 'A', 'notNegatable'],
    ['voltage', 'V', '-208', 'V', 'notNegatable'],
    ['mass', 'kg', '-1', 'lb', 'notNegatable'],
    ['duration', 's', '-1', 'min', 'notNegatable'],
    ['ratio', 'fraction', '100', 'percent', null],
    ['ratio', 'fraction', '1001', 'percent', 'notPlausible'],
    ['temperatureDifference', 'K_diff', '-4', 'degF_diff', null],
  ] as const)('knows for %s (%s) that %s %s is %s', (dimension, siUnit, text, unit, kind) => {
    const judgement = read(text, unit, { dimension, siUnit });
    expect(judgement).toMatchObject(kind ? refused(kind) : { counts: true, doubts: [] });
  });

  it('never throws and never gives a figure that is no number, whatever is typed', () => {
    const units = Object.keys(UNITS) as UnitId[];
    const typed = fc.oneof(
      fc.string({ maxLength: 40 }),
      fc.stringMatching(/^[-+\u2212]?[0-9.,]{1,39}$/),
      fc.double().map(String),
    );
    const limit = fc.option(fc.double({ noNaN: true, min: -1e6, max: 1e8 }), { nil: null });
    fc.assert(
      fc.property(typed, fc.constantFrom(...units), limit, limit, (text, unit, low, high) => {
        const { dimension } = UNITS[unit];
        const judgement = read(text, unit, { dimension, limits: { low, high } });
        expect(judgement.figures.every((figure) => Number.isFinite(figure.value))).toBe(true);
        // Something refused never passes for a good value.
        if (!judgement.counts) expect(judgement.outcome).toBe('recorded');
      }),
      { numRuns: 1500 },
    );
  });
});
