import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from '../../units/convert';
import { kilogram, type Kilogram } from '../../units/quantity';
import {
  annualisedLeakRate,
  countsAsLoss,
  LEAK_RATE_THRESHOLDS,
  rollingLeakRate,
  type AdditionKind,
  type LeakRateResult,
  type RefrigerantAddition,
} from './leak-rate';

const pounds = (value: number): Kilogram => kilogram(toSi(value, 'lb'));

function percent(result: LeakRateResult): number {
  if (!result.ok) throw new Error(result.reason);
  return result.ratePerYear * 100;
}

const annualised = (addedLb: number, fullLb: number, days: number | null): LeakRateResult =>
  annualisedLeakRate({ added: pounds(addedLb), fullCharge: pounds(fullLb), daysSinceLastAddition: days });

const addition = (massLb: number, daysAgo: number, kind: AdditionKind = 'topOff'): RefrigerantAddition => ({
  mass: pounds(massLb),
  daysAgo,
  kind,
});

const rolling = (
  additions: readonly RefrigerantAddition[],
  daysSinceVerification: number | null = null,
): LeakRateResult => rollingLeakRate({ additions, fullCharge: pounds(1500), daysSinceVerification });

const COMMERCIAL_PERCENT = LEAK_RATE_THRESHOLDS.commercialRefrigeration * 100;

describe('annualisedLeakRate', () => {
  // Worked by hand from the formula as public summaries of 40 CFR 82.152 give it; threshold 20 % (40 CFR 82.157(c)(2)).
  it.each([
    [10, 100, 180, 20.28, true],
    [40, 1500, 60, 16.22, false],
    [120, 1500, 200, 14.6, false],
    [40, 1500, 500, 2.67, false],
    [40, 1500, 365, 2.67, false],
  ])(
    '%d lb of %d lb after %d days is %d %% (over the threshold: %s)',
    (added, full, days, expected, over) => {
      const rate = percent(annualised(added, full, days));
      expect(rate).toBeCloseTo(expected, 2);
      expect(rate > COMMERCIAL_PERCENT).toBe(over);
    },
  );

  it('takes a year for the first addition', () => {
    expect(percent(annualised(40, 1500, null))).toBeCloseTo(2.67, 2);
  });

  it('shows its working with the days that count, the rate last', () => {
    const result = annualised(40, 1500, 500);
    expect(result.ok && result.working.lines.slice(2)).toEqual([
      { label: 'daysSinceLastAddition', value: 500, unit: 'count' },
      { label: 'countedDays', value: 365, unit: 'count' },
      { label: 'leakRatePerYear', value: 40 / 1500, unit: 'fraction' },
    ]);
  });

  it.each([
    [NaN, 100, 30, 'notFinite'],
    [10, NaN, 30, 'notFinite'],
    [10, 100, NaN, 'notFinite'],
    [-1, 100, 30, 'negativeMass'],
    [10, 0, 30, 'fullChargeNotPositive'],
    [10, 100, 0, 'daysNotPositive'],
    [10, 100, -5, 'daysNotPositive'],
  ])('%d lb of %d lb after %d days is refused: %s', (added, full, days, reason) => {
    expect(annualised(added, full, days)).toEqual({ ok: false, reason });
  });

  it('is the same in any unit of mass, falls with the days and never below the plain share', () => {
    const mass = fc.double({ min: 0.1, max: 5000, noNaN: true });
    fc.assert(
      fc.property(mass, mass, fc.integer({ min: 1, max: 800 }), (added, full, days) => {
        const inKilograms = annualisedLeakRate({
          added: kilogram(added),
          fullCharge: kilogram(full),
          daysSinceLastAddition: days,
        });
        const rate = percent(annualised(added, full, days));
        expect(percent(inKilograms) / rate).toBeCloseTo(1, 9);
        expect(percent(annualised(added, full, days + 1))).toBeLessThanOrEqual(rate);
        expect(rate).toBeGreaterThanOrEqual((added / full) * 100 * (1 - 1e-12));
      }),
    );
  });
});

describe('rollingLeakRate', () => {
  // Worked by hand.
  it('adds up a year, its first day included', () => {
    expect(percent(rolling([addition(60, 10), addition(60, 365), addition(60, 366)]))).toBeCloseTo(8, 9);
    expect(percent(rolling([]))).toBe(0);
  });

  it('begins anew after a successful follow-up verification', () => {
    const additions = [addition(60, 10), addition(60, 100), addition(60, 200)];
    expect(percent(rolling(additions, 100))).toBeCloseTo(4, 9);
    expect(percent(rolling(additions, 101))).toBeCloseTo(8, 9);
    expect(percent(rolling([...additions, addition(60, 400)], 500))).toBeCloseTo(12, 9);
  });

  // 40 CFR 82.157(b): not after a new installation, a retrofit or a seasonal variance.
  it('leaves out the initial charge and what finishes an installation', () => {
    const start = [
      addition(1500, 30, 'initialCharge'),
      addition(80, 20, 'installationTopOff'),
      addition(1500, 15, 'retrofit'),
      addition(100, 10, 'seasonalVariance'),
    ];
    expect(percent(rolling(start))).toBe(0);
    expect(percent(rolling([...start, addition(30, 5)]))).toBeCloseTo(2, 9);
    expect(start.map(({ kind }) => countsAsLoss(kind))).toEqual([false, false, false, false]);
    expect(countsAsLoss('topOff')).toBe(true);
  });

  it.each([
    [[addition(NaN, 10)], null, 'notFinite'],
    [[addition(10, NaN)], null, 'notFinite'],
    [[addition(10, 10)], NaN, 'notFinite'],
    [[addition(-10, 10)], null, 'negativeMass'],
    [[addition(10, -1)], null, 'negativeDays'],
    [[addition(10, 1)], -1, 'negativeDays'],
  ])('refuses case %#', (additions, verification, reason) => {
    expect(rolling(additions, verification)).toEqual({ ok: false, reason });
  });

  it('refuses a full charge of nothing', () => {
    const result = rollingLeakRate({ additions: [], fullCharge: kilogram(0), daysSinceVerification: null });
    expect(result).toEqual({ ok: false, reason: 'fullChargeNotPositive' });
  });

  it('shows its working, the rate last', () => {
    const result = rolling([addition(60, 10), addition(60, 400)]);
    expect(result.ok && result.working.lines.map(({ label }) => label)).toEqual([
      ...['countedDays', 'countedAdditions', 'added', 'fullCharge', 'leakRatePerYear'],
    ]);
    expect(result.ok && result.working.lines[1]?.value).toBe(1);
  });

  it('does not depend on the order, and never falls by an addition', () => {
    const additions = fc.array(
      fc
        .tuple(fc.double({ min: 0, max: 500, noNaN: true }), fc.integer({ min: 0, max: 800 }))
        .map(([mass, days]) => addition(mass, days)),
      { maxLength: 10 },
    );
    fc.assert(
      fc.property(additions, (list) => {
        const rate = percent(rolling(list));
        expect(percent(rolling([...list].reverse()))).toBeCloseTo(rate, 9);
        expect(percent(rolling([...list, addition(5, 3)]))).toBeGreaterThan(rate);
      }),
    );
  });
});
