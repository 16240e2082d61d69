import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../units/convert';
import {
  averageTemperature,
  kelvin,
  pascalAbsolute,
  pascalGauge,
  subtractTemperatures,
} from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from './gauge-pressure';
import {
  atmosphereAtFeet,
  fahrenheit,
  inFahrenheit,
  inFahrenheitDifference,
  psig,
  refrigerant,
} from './readings.fixture';
import { REFRIGERANTS } from './saturation/refrigerants';
import { bubbleTemperature } from './saturation/saturation-curve';
import { superheat, type SuperheatResult } from './superheat';

type Answer = Extract<SuperheatResult, { ok: true }>;

function answer(name: string, gaugePsi: number, lineDegF: number, feet = 0): Answer {
  const result = superheat({
    table: refrigerant(name),
    suctionPressure: psig(gaugePsi),
    atmosphere: atmosphereAtFeet(feet),
    lineTemperature: fahrenheit(lineDegF),
  });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

describe('superheat', () => {
  // The first from "TXV install instructions 066154", Emerson Flow Controls, p. 3; the others computed with CoolProp.
  it.each([
    ['R-22', 59, 40, 0, 7.0, 0.3],
    ['R-448A', 45, 28, 0, 7.1, 1],
    ['R-404A', 16, -14, 0, 6.0, 0.3],
    ['R-404A', 55.3, 27, 5000, 8.9, 0.3],
    ['R-404A', 55.3, 27, 0, 7.0, 0.3],
    ['R-744', 200, -10, 0, 10.1, 0.3],
    ['R-404A', 55.3, 19.5, 0, -0.5, 0.3],
  ])(
    'of %s at %d psig and %d °F, %d ft up, is %d °F',
    (name, gaugePsi, lineDegF, feet, expected, tolerance) => {
      const difference = inFahrenheitDifference(answer(name, gaugePsi, lineDegF, feet).superheat);
      expect(Math.abs(difference - expected)).toBeLessThanOrEqual(tolerance);
    },
  );

  it('counts from dew, not from bubble or the middle', () => {
    const result = answer('R-448A', 45, 28);
    const bubble = bubbleTemperature(refrigerant('R-448A'), toAbsolute(psig(45), SEA_LEVEL_ATMOSPHERE));
    if (!bubble.ok) throw new Error(bubble.reason);
    const fromBubble = inFahrenheitDifference(subtractTemperatures(fahrenheit(28), bubble.temperature));
    const middle = averageTemperature([bubble.temperature, result.saturation]) ?? kelvin(NaN);
    expect(fromBubble).toBeCloseTo(18.2, 0);
    expect(inFahrenheitDifference(subtractTemperatures(fahrenheit(28), middle))).toBeCloseTo(12.7, 0);
    expect(inFahrenheit(result.saturation)).toBeCloseTo(20.9, 0);
    expect(inFahrenheitDifference(result.glide)).toBeCloseTo(11.1, 0);
  });

  // "Understanding superheat", ACHR News: 7 °F at the coil seems 15 °F with the pressure of the compressor's inlet.
  it('is a plain difference once saturation is known', () => {
    expect(inFahrenheitDifference(subtractTemperatures(fahrenheit(30), fahrenheit(23)))).toBeCloseTo(7, 9);
    expect(inFahrenheitDifference(subtractTemperatures(fahrenheit(30), fahrenheit(15)))).toBeCloseTo(15, 9);
  });

  it.each([
    [0, -20.0],
    [5000, -23.7],
    [7000, -25.0],
  ])('follows the elevation: at %d ft R-404A of 16 psig dews at %d °F', (feet, expected) => {
    expect(Math.abs(inFahrenheit(answer('R-404A', 16, -14, feet).saturation) - expected)).toBeLessThanOrEqual(
      0.2,
    );
  });

  it('reads 3.9 °F too low in Denver when the elevation is ignored', () => {
    const error = answer('R-404A', 16, -14).superheat - answer('R-404A', 16, -14, 5280).superheat;
    expect(Math.abs(convert(error, 'K_diff', 'degF_diff') - -3.9)).toBeLessThanOrEqual(0.2);
  });

  it.each([
    [55.3, 1.5],
    [16, 2.9],
  ])('moves at %d psig of R-404A by %d °F for 2 psi', (gaugePsi, expected) => {
    const change = answer('R-404A', gaugePsi - 2, 0).superheat - answer('R-404A', gaugePsi, 0).superheat;
    expect(Math.abs(convert(change, 'K_diff', 'degF_diff') - expected)).toBeLessThanOrEqual(0.1);
  });

  it('shows its working, result last', () => {
    const { working, superheat: value, saturation } = answer('R-448A', 45, 28);
    expect(working.formula).toBe('superheatFromDew');
    expect(working.source).toMatch(/^R-448A: CoolProp 8\.0\.0 \(HEOS\); .*Lemmon/);
    expect(working.lines.map((line) => line.label)).toEqual([
      ...[
        'suctionPressure',
        'atmosphere',
        'absolutePressure',
        'bubbleTemperature',
        'dewTemperature',
        'glide',
      ],
      ...['lineTemperature', 'superheat'],
    ]);
    expect(working.lines).toContainEqual({ label: 'dewTemperature', value: saturation, unit: 'K' });
    expect(working.lines.at(-1)).toEqual({ label: 'superheat', value, unit: 'K_diff' });
  });

  it('says why there is none', () => {
    const inputs = {
      table: refrigerant('R-744'),
      suctionPressure: psig(200),
      atmosphere: SEA_LEVEL_ATMOSPHERE,
      lineTemperature: fahrenheit(-10),
    };
    const reason = (change: Partial<typeof inputs>): unknown => superheat({ ...inputs, ...change });
    expect(reason({ suctionPressure: psig(1060) })).toEqual({ ok: false, reason: 'aboveCritical' });
    expect(reason({ suctionPressure: psig(45) })).toEqual({ ok: false, reason: 'belowTable' });
    expect(reason({ suctionPressure: pascalGauge(NaN) })).toEqual({ ok: false, reason: 'notFinite' });
    expect(reason({ atmosphere: pascalAbsolute(NaN) })).toEqual({ ok: false, reason: 'notFinite' });
    expect(reason({ lineTemperature: kelvin(NaN) })).toEqual({ ok: false, reason: 'notFinite' });
    expect(reason({ lineTemperature: kelvin(0) })).toEqual({ ok: false, reason: 'belowAbsoluteZero' });
  });

  it('does not depend on the units that were typed', () => {
    const tables = fc.constantFrom(...REFRIGERANTS.values());
    const pressures = fc.integer({ min: 70, max: 300 });
    const temperatures = fc.integer({ min: -40, max: 60 });
    fc.assert(
      fc.property(tables, pressures, temperatures, (table, gaugePsi, degF) => {
        const atmosphere = SEA_LEVEL_ATMOSPHERE;
        const us = superheat({
          table,
          atmosphere,
          suctionPressure: psig(gaugePsi),
          lineTemperature: fahrenheit(degF),
        });
        const si = superheat({
          table,
          atmosphere,
          suctionPressure: pascalGauge(toSi(convert(gaugePsi, 'psig', 'barg'), 'barg')),
          lineTemperature: kelvin(toSi(convert(degF, 'degF', 'degC'), 'degC')),
        });
        if (!us.ok || !si.ok) throw new Error(`${table.designation} has no answer at ${gaugePsi} psig`);
        expect(si.superheat).toBeCloseTo(us.superheat, 8);
      }),
    );
  });

  it('rises with the line and falls with the pressure', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 150, noNaN: true }),
        fc.double({ min: -40, max: 80, noNaN: true }),
        (p, t) => {
          const { superheat: value } = answer('R-448A', p, t);
          expect(answer('R-448A', p, t + 1).superheat - value).toBeCloseTo(toSi(1, 'degF_diff'), 8);
          expect(answer('R-448A', p + 1, t).superheat).toBeLessThan(value);
        },
      ),
    );
  });
});
