import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../../units/convert';
import { kelvinDifference, pascalAbsolute, pascalGauge } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from '../gauge-pressure';
import {
  atmosphereAtFeet,
  fahrenheit,
  fahrenheitDifference,
  inFahrenheitDifference,
  psig,
  refrigerant,
} from '../readings.fixture';
import { dewPressure } from '../saturation/saturation-curve';
import {
  bubbleSlope,
  dewSlope,
  gaugeLimit,
  subcoolingUncertainty,
  superheatUncertainty,
  type UncertaintyInputs,
} from './superheat-uncertainty';

const psi = (value: number): number => toSi(value, 'psig');

const inputs = (name: string, gaugePsi: number, limitPsi: number, degF: number): UncertaintyInputs => ({
  table: refrigerant(name),
  pressure: psig(gaugePsi),
  atmosphere: SEA_LEVEL_ATMOSPHERE,
  accuracy: { gauge: { kind: 'absolute', limitPa: psi(limitPsi) }, thermometer: fahrenheitDifference(degF) },
});

function uncertaintyOf(given: UncertaintyInputs) {
  const result = superheatUncertainty(given);
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const inDegF = inFahrenheitDifference;

describe('dewSlope', () => {
  // Computed with CoolProp: psi for each °F, as in dew-slope.spec.ts.
  it.each([
    ['R-404A', -20, 0.7],
    ['R-404A', 20, 1.31],
    ['R-22', -20, 0.58],
    ['R-22', 20, 1.1],
    ['R-744', -20, 3.97],
    ['R-744', 20, 6.51],
    ['R-448A', 20, 1.17],
  ])('of %s at %d °F is the inverse of %d psi a °F', (name, degF, psiPerDegF) => {
    const pressure = dewPressure(refrigerant(name), fahrenheit(degF));
    if (!pressure.ok) throw new Error(pressure.reason);
    const slope = dewSlope(refrigerant(name), pressure.pressure);
    if (!slope.ok) throw new Error(slope.reason);
    const found = 1 / convert(slope.slopeKPerPa * psi(1), 'K_diff', 'degF_diff');
    expect(Math.abs(found - psiPerDegF)).toBeLessThanOrEqual(0.03);
  });

  it('is taken over one side at the ends of a table, and not beyond them', () => {
    const table = refrigerant('R-404A');
    const first = pascalAbsolute(table.dewPa[0] ?? NaN);
    const inside = dewSlope(table, pascalAbsolute(first * 1.02));
    const atEnd = dewSlope(table, first);
    if (!inside.ok || !atEnd.ok) throw new Error('no slope');
    expect(atEnd.slopeKPerPa / inside.slopeKPerPa).toBeCloseTo(1, 1);
    expect(dewSlope(table, pascalAbsolute(first * 0.99))).toEqual({ ok: false, reason: 'belowTable' });
    expect(bubbleSlope(table, pascalAbsolute(NaN))).toEqual({ ok: false, reason: 'notFinite' });
  });
});

describe('superheatUncertainty', () => {
  // Computed with CoolProp: 2 psi of reading error on R-404A are 1.5 °F at +20 °F and 2.9 °F at −20 °F of dew.
  it.each([
    [55.3, 1.5],
    [16, 2.9],
  ])('of R-404A at %d psig and ±2 psi with a perfect thermometer is %d °F', (gaugePsi, expected) => {
    const result = uncertaintyOf(inputs('R-404A', gaugePsi, 2, 0));
    expect(inDegF(result.uncertainty)).toBeCloseTo(expected, 1);
    expect(result.worstCase).toBeCloseTo(result.uncertainty, 12);
  });

  it('of ±1 psi at low temperature is about 1.5 °F: most of a band of 2 °F', () => {
    expect(inDegF(uncertaintyOf(inputs('R-404A', 16, 1, 0)).uncertainty)).toBeCloseTo(1.43, 1);
    expect(inDegF(uncertaintyOf(inputs('R-404A', 16, 1, 0.9)).uncertainty)).toBeCloseTo(1.7, 1);
  });

  it('combines a 3 and a 4 to a 5, and to 7 at worst', () => {
    const alone = uncertaintyOf(inputs('R-448A', 45, 1, 0)).fromGauge;
    const accuracy = {
      gauge: { kind: 'absolute', limitPa: psi(3) },
      thermometer: kelvinDifference(alone * 4),
    } as const;
    const result = uncertaintyOf({ ...inputs('R-448A', 45, 1, 0), accuracy });
    expect(result.uncertainty / alone).toBeCloseTo(5, 9);
    expect(result.worstCase / alone).toBeCloseTo(7, 9);
  });

  it('takes a gauge by its class: 1 % of 500 psi are 5 psi wherever the needle stands', () => {
    const gauge = { kind: 'fullScale', fraction: 0.01, fullScalePa: psi(500) } as const;
    expect(gaugeLimit(gauge)).toBeCloseTo(psi(5), 6);
    const accuracy = { gauge, thermometer: kelvinDifference(0) };
    const byClass = uncertaintyOf({ ...inputs('R-404A', 16, 0, 0), accuracy });
    expect(byClass.uncertainty).toBeCloseTo(uncertaintyOf(inputs('R-404A', 16, 5, 0)).uncertainty, 9);
  });

  it('grows with elevation, where the same gauge pressure is a lower absolute one', () => {
    const low = inputs('R-404A', 16, 1, 0);
    const high = { ...low, atmosphere: atmosphereAtFeet(5280) };
    expect(uncertaintyOf(high).uncertainty).toBeGreaterThan(uncertaintyOf(low).uncertainty);
  });

  it('shows its working down to the result', () => {
    const { working, uncertainty } = uncertaintyOf(inputs('R-404A', 16, 1, 1));
    expect(working.formula).toBe('superheatUncertainty');
    expect(working.source).toContain('JCGM 100:2008');
    expect(working.lines.at(-1)).toEqual({ label: 'uncertainty', value: uncertainty, unit: 'K_diff' });
  });

  it.each([
    [inputs('R-404A', 16, -1, 1), 'negativeAccuracy'],
    [inputs('R-404A', 16, 1, -1), 'negativeAccuracy'],
    [inputs('R-404A', 16, NaN, 1), 'notFinite'],
    [inputs('R-404A', 16, 1, NaN), 'notFinite'],
    [{ ...inputs('R-404A', 16, 1, 1), pressure: pascalGauge(NaN) }, 'notFinite'],
    [inputs('R-404A', -14.5, 1, 1), 'belowTable'],
    [inputs('R-404A', 900, 1, 1), 'aboveCritical'],
  ])('case %#: has no answer', (given, reason) => {
    expect(superheatUncertainty(given)).toEqual({ ok: false, reason });
  });

  it('is never below either share nor above the worst case', () => {
    const share = fc.double({ min: 0, max: 5, noNaN: true });
    fc.assert(
      fc.property(share, share, fc.double({ min: 0, max: 200, noNaN: true }), (limit, degF, gaugePsi) => {
        const result = uncertaintyOf(inputs('R-448A', gaugePsi, limit, degF));
        expect(result.uncertainty).toBeGreaterThanOrEqual(Math.max(result.fromGauge, result.fromThermometer));
        expect(result.uncertainty).toBeLessThanOrEqual(result.worstCase + 1e-12);
      }),
    );
  });
});

describe('subcoolingUncertainty', () => {
  it('goes by the bubble curve', () => {
    const given = inputs('R-448A', 225, 2, 0);
    const slope = bubbleSlope(given.table, toAbsolute(given.pressure, given.atmosphere));
    const result = subcoolingUncertainty(given);
    if (!slope.ok || !result.ok) throw new Error('no answer');
    expect(result.fromGauge).toBeCloseTo(slope.slopeKPerPa * psi(2), 12);
    expect(result.working.formula).toBe('subcoolingUncertainty');
    expect(result.fromGauge).not.toBeCloseTo(uncertaintyOf(given).fromGauge, 3);
  });

  // R-404A liquid at 225 psig boils at 96.5 °F, at 236.8 psig at 100 °F (trade-values.spec.ts): 3.4 psi a °F.
  it('of R-404A at 225 psig and ±2 psi is 0.6 °F', () => {
    const result = subcoolingUncertainty(inputs('R-404A', 225, 2, 0));
    expect(result.ok && inDegF(result.uncertainty)).toBeCloseTo(2 / 3.4, 1);
  });
});
