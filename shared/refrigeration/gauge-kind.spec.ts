import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../units/convert';
import { pascalAbsolute } from '../units/quantity';
import { elevationShift, gaugeTemperatureDifference, toAbsoluteByGauge, type GaugeKind } from './gauge-kind';
import { SEA_LEVEL_ATMOSPHERE } from './gauge-pressure';
import { atmosphereAtFeet, fahrenheit, inFahrenheitDifference, psig, refrigerant } from './readings.fixture';
import { superheat } from './superheat';

const DENVER = atmosphereAtFeet(5280);
const psi = (value: number): number => toSi(value, 'psig');

const psiaOf = (kind: GaugeKind, readingPsi: number, zeroedAt?: typeof DENVER): number => {
  const result = toAbsoluteByGauge({
    kind,
    readingPa: psi(readingPsi),
    atmosphere: DENVER,
    ...(zeroedAt === undefined ? {} : { zeroedAt }),
  });
  return result.ok ? convert(result.pressure, 'Pa', 'psia') : NaN;
};

describe('toAbsoluteByGauge', () => {
  // US Standard Atmosphere 1976: 12.100 psia at 5280 ft, 14.696 psia at sea level, 14.173 at 1000 ft.
  it.each([
    ['vented', undefined, 22.1],
    ['sealed', undefined, 24.696],
    ['sealed', atmosphereAtFeet(1000), 24.173],
    ['absolute', undefined, 10],
    ['taredAtPowerUp', undefined, 22.1],
    ['taredAtPowerUp', SEA_LEVEL_ATMOSPHERE, 24.696],
  ] as const)('10 psi on a %s gauge (zeroed at %s Pa) at 5280 ft are %d psia', (kind, zeroedAt, expected) => {
    expect(psiaOf(kind, 10, zeroedAt)).toBeCloseTo(expected, 2);
  });

  it('has no answer for no number and from a perfect vacuum down', () => {
    const given = { kind: 'vented', atmosphere: DENVER } as const;
    expect(toAbsoluteByGauge({ ...given, readingPa: NaN })).toEqual({ ok: false, reason: 'notFinite' });
    expect(toAbsoluteByGauge({ ...given, readingPa: -DENVER })).toEqual({
      ok: false,
      reason: 'deeperThanVacuum',
    });
    expect(toAbsoluteByGauge({ ...given, kind: 'absolute', readingPa: 0 })).toEqual({
      ok: false,
      reason: 'deeperThanVacuum',
    });
    // −13 psi is possible against sea level, and deeper than a vacuum against the air of Denver.
    expect(psiaOf('vented', -13)).toBeNaN();
    expect(psiaOf('sealed', -13)).toBeCloseTo(1.696, 2);
  });
});

describe('elevationShift', () => {
  // Worked out with CoolProp: R-448A at 10 psig moves by 4.5 °F at 5280 ft; R-404A at 16.0 psig (dew −20 °F) goes to −23.7 °F
  // at 5000 ft and −25.0 °F at 7000 ft.
  it.each([
    ['R-448A', 10, 5280, -4.5],
    ['R-404A', 16, 5280, -3.9],
    ['R-404A', 16, 5000, -3.7],
    ['R-404A', 16, 7000, -5],
    ['R-404A', 16, 0, 0],
  ])('%s at %d psig and %d ft moves by %d °F', (name, gaugePsi, feet, expected) => {
    const result = elevationShift(refrigerant(name), psig(gaugePsi), atmosphereAtFeet(feet));
    if (!result.ok) throw new Error(result.reason);
    expect(Math.abs(inFahrenheitDifference(result.shift) - expected)).toBeLessThanOrEqual(0.2);
    expect(result.working.lines.at(-1)).toEqual({ label: 'shift', value: result.shift, unit: 'K_diff' });
  });

  it('has no answer where one of the two has none', () => {
    const result = elevationShift(refrigerant('R-744'), psig(62), atmosphereAtFeet(10000));
    expect(result).toEqual({ ok: false, reason: 'belowTable' });
  });
});

describe('gaugeTemperatureDifference', () => {
  const at = (kind: GaugeKind, atmosphere = DENVER, zeroedAt?: typeof DENVER) => {
    const result = gaugeTemperatureDifference(refrigerant('R-448A'), {
      kind,
      readingPa: psi(kind === 'absolute' ? 22.1 : 10),
      atmosphere,
      ...(zeroedAt === undefined ? {} : { zeroedAt }),
    });
    if (!result.ok) throw new Error(result.reason);
    return [result.cause, inFahrenheitDifference(result.difference)] as const;
  };

  it.each([
    ['vented', DENVER, undefined, 'assumesSeaLevel', 4.5],
    ['taredAtPowerUp', DENVER, undefined, 'assumesSeaLevel', 4.5],
    ['taredAtPowerUp', DENVER, SEA_LEVEL_ATMOSPHERE, 'samePressure', 0],
    ['sealed', DENVER, undefined, 'sealedGauge', 4.5],
    ['sealed', DENVER, DENVER, 'samePressure', 0],
    ['absolute', DENVER, undefined, 'samePressure', 0],
    ['vented', SEA_LEVEL_ATMOSPHERE, undefined, 'samePressure', 0],
    ['sealed', SEA_LEVEL_ATMOSPHERE, undefined, 'samePressure', 0],
  ] as const)(
    'of a %s gauge at %d Pa, zeroed at %s Pa: %s, %d °F',
    (kind, here, zeroedAt, cause, expected) => {
      const [foundCause, difference] = at(kind, here, zeroedAt);
      expect(foundCause).toBe(cause);
      expect(Math.abs(difference - expected)).toBeLessThanOrEqual(0.2);
    },
  );

  it('is what the superheat on such a gauge reads too low', () => {
    const table = refrigerant('R-448A');
    const inputs = { table, suctionPressure: psig(10), lineTemperature: fahrenheit(-10) };
    const ours = superheat({ ...inputs, atmosphere: DENVER });
    const theirs = superheat({ ...inputs, atmosphere: SEA_LEVEL_ATMOSPHERE });
    if (!ours.ok || !theirs.ok) throw new Error('no superheat');
    expect(inFahrenheitDifference(ours.superheat) - inFahrenheitDifference(theirs.superheat)).toBeCloseTo(
      at('vented')[1],
      9,
    );
  });

  it('passes a failure on', () => {
    const table = refrigerant('R-448A');
    const given = { kind: 'vented', atmosphere: DENVER } as const;
    expect(gaugeTemperatureDifference(table, { ...given, readingPa: -DENVER })).toEqual({
      ok: false,
      reason: 'deeperThanVacuum',
    });
    expect(gaugeTemperatureDifference(table, { ...given, readingPa: 5e6 })).toEqual({
      ok: false,
      reason: 'aboveCritical',
    });
    expect(gaugeTemperatureDifference(table, { ...given, readingPa: NaN })).toEqual({
      ok: false,
      reason: 'notFinite',
    });
  });

  it('of a vented gauge is positive above sea level and the opposite of the elevation’s shift', () => {
    const cases = fc.record({
      gaugePsi: fc.double({ min: 0, max: 100, noNaN: true }),
      feet: fc.double({ min: 10, max: 10000, noNaN: true }),
    });
    fc.assert(
      fc.property(cases, ({ gaugePsi, feet }) => {
        const table = refrigerant('R-404A');
        const atmosphere = pascalAbsolute(atmosphereAtFeet(feet));
        const shift = elevationShift(table, psig(gaugePsi), atmosphere);
        const found = gaugeTemperatureDifference(table, {
          kind: 'vented',
          readingPa: psi(gaugePsi),
          atmosphere,
        });
        if (!shift.ok || !found.ok) throw new Error('no answer');
        expect(found.difference).toBeGreaterThan(0);
        expect(found.difference).toBeCloseTo(-shift.shift, 12);
      }),
    );
  });
});
