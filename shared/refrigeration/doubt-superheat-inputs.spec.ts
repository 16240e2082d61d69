import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, fromSi, toSi, UnitMismatch } from '../units/convert';
import { kelvin, pascalAbsolute } from '../units/quantity';
import { doubtSuperheatInputs, type TypedSuperheatInputs } from './doubt-superheat-inputs';
import { SEA_LEVEL_ATMOSPHERE } from './gauge-pressure';
import { refrigerant } from './readings.fixture';
import { REFRIGERANTS } from './saturation/refrigerants';
import { dewPressure } from './saturation/saturation-curve';

function typed(name: string, pressureTyped: number, temperatureTyped: number): TypedSuperheatInputs {
  return {
    table: refrigerant(name),
    atmosphere: SEA_LEVEL_ATMOSPHERE,
    pressureTyped,
    pressureUnit: 'psig',
    temperatureTyped,
    temperatureUnit: 'degF',
  };
}

const kindsOf = (inputs: TypedSuperheatInputs): string[] =>
  doubtSuperheatInputs(inputs).map((doubt) => doubt.kind);

describe('doubtSuperheatInputs', () => {
  it.each([
    ['R-448A', 45, 28],
    ['R-404A', 16, -14],
    ['R-404A', 55.3, 19.5],
    ['R-744', 200, -10],
    ['R-134a', -1.8, -12],
    // Starved and flooded coils: far from good, but real.
    ['R-404A', 16, 20],
    ['R-448A', 45, 17],
  ])('has nothing against %s at %d psig and %d °F', (name, pressure, temperature) => {
    expect(doubtSuperheatInputs(typed(name, pressure, temperature))).toEqual([]);
  });

  it.each([
    ['R-448A', 33, 50],
    ['R-404A', -14, 16],
    ['R-744', -10, 200],
    ['R-744', 28, 412],
  ])('asks whether %s at %d psig and %d °F is swapped', (name, pressure, temperature) => {
    expect(doubtSuperheatInputs(typed(name, pressure, temperature))).toEqual([
      { kind: 'swapped', severity: 'ask', about: 'both' },
    ]);
  });

  it('refuses what is deeper than a vacuum and still names the swap', () => {
    expect(kindsOf(typed('R-404A', -18, 16))).toEqual(['deeperThanVacuum', 'swapped']);
  });

  it('asks whether °C was read where only °C fits', () => {
    expect(kindsOf(typed('R-404A', 55.3, -3))).toEqual(['celsiusInFahrenheit']);
  });

  it('asks whether °F was read where only °F fits', () => {
    const inputs = { ...typed('R-404A', 3.8, 27), pressureUnit: 'barg', temperatureUnit: 'degC' } as const;
    expect(kindsOf(inputs)).toEqual(['fahrenheitInCelsius']);
  });

  it.each([
    ['R-448A', 45, -459.68, 'belowAbsoluteZero', 'refuse', 'temperature'],
    ['R-448A', -40, 300, 'deeperThanVacuum', 'refuse', 'pressure'],
    ['R-448A', 900, 28, 'aboveCritical', 'refuse', 'pressure'],
    ['R-448A', 45, NaN, 'notFinite', 'refuse', 'temperature'],
    ['R-448A', Infinity, 28, 'notFinite', 'refuse', 'pressure'],
    ['R-448A', 45, 105, 'notPlausible', 'ask', 'both'],
    ['R-134a', 45, 5, 'notPlausible', 'ask', 'both'],
  ])(
    'says of %s at %d psig and %d °F: %s, %s, about %s',
    (name, pressure, temperature, kind, severity, about) => {
      expect(doubtSuperheatInputs(typed(name, pressure, temperature))).toContainEqual({
        kind,
        severity,
        about,
      });
    },
  );

  it('takes absolute pressures too', () => {
    const inputs = {
      ...typed('R-448A', 45 + fromSi(SEA_LEVEL_ATMOSPHERE, 'psia'), 28),
      pressureUnit: 'psia',
    } as const;
    expect(doubtSuperheatInputs(inputs)).toEqual([]);
    expect(kindsOf({ ...inputs, pressureTyped: -1 })).toContain('deeperThanVacuum');
  });

  it.each([{ pressureUnit: 'degF' as const }, { temperatureUnit: 'degF_diff' as const }])(
    'refuses units that can’t be (%j)',
    (change) => {
      expect(() => doubtSuperheatInputs({ ...typed('R-448A', 45, 28), ...change })).toThrow(UnitMismatch);
    },
  );

  it('raises no false alarm for ordinary coils of any refrigerant, whatever the units and the elevation', () => {
    const tables = fc.constantFrom(...REFRIGERANTS.values());
    const dews = fc.double({ min: -45, max: 12, noNaN: true });
    const superheats = fc.double({ min: -2.9, max: 19.9, noNaN: true });
    const atmospheres = fc.integer({ min: 75000, max: 102000 });
    const units = fc.constantFrom(
      ['psig', 'degF'] as const,
      ['barg', 'degC'] as const,
      ['kPaa', 'K'] as const,
    );
    fc.assert(
      fc.property(
        tables,
        dews,
        superheats,
        atmospheres,
        units,
        (table, dewC, superheatK, atmospherePa, chosen) => {
          const dew = toSi(dewC, 'degC');
          const pressure = dewPressure(table, kelvin(dew));
          if (!pressure.ok) throw new Error(pressure.reason);
          const [pressureUnit, temperatureUnit] = chosen;
          const shown = pressureUnit === 'kPaa' ? pressure.pressure : pressure.pressure - atmospherePa;
          const doubts = doubtSuperheatInputs({
            table,
            atmosphere: pascalAbsolute(atmospherePa),
            pressureTyped: fromSi(shown, pressureUnit),
            pressureUnit,
            temperatureTyped: convert(dew + superheatK, 'K', temperatureUnit),
            temperatureUnit,
          });
          expect(doubts).toEqual([]);
        },
      ),
      { numRuns: 500 },
    );
  });
});
