import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../../units/convert';
import { kelvin, pascalGauge, second } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from '../gauge-pressure';
import { fahrenheit, inFahrenheitDifference, psig, refrigerant } from '../readings.fixture';
import { superheat } from '../superheat';
import { superheatTrace, type SuctionSample, type SuperheatTraceResult } from './superheat-trace';

const trace = (samples: readonly SuctionSample[], name = 'R-448A'): SuperheatTraceResult =>
  superheatTrace({ table: refrigerant(name), atmosphere: SEA_LEVEL_ATMOSPHERE, samples });

const sample = (at: number, gaugePsi: number, degF: number): SuctionSample => ({
  at: second(at),
  suctionPressure: psig(gaugePsi),
  lineTemperature: fahrenheit(degF),
});

function answer(samples: readonly SuctionSample[], name?: string) {
  const result = trace(samples, name);
  if (!result.ok) throw new Error(result.reason);
  return result;
}

describe('superheatTrace', () => {
  // The points of superheat.spec.ts: R-404A computed with CoolProp.
  it('gives the superheat of each moment, never clamped', () => {
    const { samples, leftOut } = answer(
      [sample(0, 55.3, 27), sample(10, 55.3, 19.5), sample(20, 16, -14)],
      'R-404A',
    );
    expect(leftOut).toEqual({});
    expect(samples.map(({ at }) => at)).toEqual([0, 10, 20]);
    [7.0, -0.5, 6.0].forEach((expected, index) => {
      const difference = inFahrenheitDifference(samples[index]?.superheat ?? (NaN as never));
      expect(Math.abs(difference - expected)).toBeLessThanOrEqual(0.3);
    });
  });

  it('leaves out moments without a superheat and says why', () => {
    const result = answer([
      sample(0, 45, 28),
      sample(10, NaN, 28),
      sample(20, 45, NaN),
      sample(30, 1060, 28),
      sample(40, 45, -500),
      sample(50, 45, 29),
      sample(NaN, 45, 29),
    ]);
    expect(result.samples.map(({ at }) => at)).toEqual([0, 50]);
    expect(result.leftOut).toEqual({ notFinite: 2, aboveCritical: 1, belowAbsoluteZero: 1 });
  });

  it('needs two moments', () => {
    expect(trace([])).toEqual({ ok: false, reason: 'tooShort', leftOut: {} });
    expect(trace([sample(0, 45, 28), sample(0, 45, 29)])).toMatchObject({ ok: false, reason: 'tooShort' });
    expect(trace([sample(0, 45, 28), sample(9, NaN, 29)])).toEqual({
      ok: false,
      reason: 'tooShort',
      leftOut: { notFinite: 1 },
    });
  });

  it('shows its working', () => {
    const { working } = answer([sample(0, 45, 28), sample(30, 45, 30), sample(40, NaN, 30)]);
    expect(working.formula).toBe('superheatTrace');
    expect(working.source).toMatch(/^R-448A: CoolProp/);
    expect(working.lines).toContainEqual({ label: 'samplesRead', value: 3, unit: 'count' });
    expect(working.lines).toContainEqual({ label: 'samplesUsed', value: 2, unit: 'count' });
    expect(working.lines).toContainEqual({ label: 'duration', value: 30, unit: 's' });
    expect(working.lines.at(-1)?.label).toBe('maximumSuperheat');
  });

  it('depends neither on the units typed nor on the order, and agrees with superheat()', () => {
    const reading = fc.record({
      at: fc.integer({ min: 0, max: 10_000 }),
      gaugePsi: fc.integer({ min: 5, max: 150 }),
      degF: fc.integer({ min: -40, max: 60 }),
    });
    const readings = fc.uniqueArray(reading, { minLength: 2, maxLength: 20, selector: ({ at }) => at });
    fc.assert(
      fc.property(readings, (points) => {
        const us = answer(points.map(({ at, gaugePsi, degF }) => sample(at, gaugePsi, degF)));
        const si = answer(
          points
            .map(({ at, gaugePsi, degF }) => ({
              at: second(at),
              suctionPressure: pascalGauge(toSi(convert(gaugePsi, 'psig', 'barg'), 'barg')),
              lineTemperature: kelvin(toSi(convert(degF, 'degF', 'degC'), 'degC')),
            }))
            .reverse(),
        );
        expect(si.samples).toHaveLength(points.length);
        us.samples.forEach(({ at, superheat: value }, index) => {
          const point = points.find((one) => one.at === at);
          const single = superheat({
            table: refrigerant('R-448A'),
            atmosphere: SEA_LEVEL_ATMOSPHERE,
            suctionPressure: psig(point?.gaugePsi ?? NaN),
            lineTemperature: fahrenheit(point?.degF ?? NaN),
          });
          expect(single.ok && single.superheat).toBe(value);
          expect(si.samples[index]?.at).toBe(at);
          expect(si.samples[index]?.superheat).toBeCloseTo(value, 8);
        });
      }),
      { numRuns: 50 },
    );
  });
});
