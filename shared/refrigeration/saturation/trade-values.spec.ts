import { describe, expect, it } from '@jest/globals';
import { convert, toSi } from '../../units/convert';
import { averageTemperature, kelvin, type Kelvin } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute, toGauge } from '../gauge-pressure';
import { fahrenheit, inFahrenheit, psig, refrigerant } from '../readings.fixture';
import { bubblePressure, bubbleTemperature, dewPressure, dewTemperature } from './saturation-curve';

const CURVES = { bubble: bubblePressure, dew: dewPressure } as const;

function psigAt(name: string, phase: keyof typeof CURVES, degF: number): number {
  const result = CURVES[phase](refrigerant(name), fahrenheit(degF));
  return result.ok ? convert(toGauge(result.pressure, SEA_LEVEL_ATMOSPHERE), 'Pag', 'psig') : NaN;
}

function temperatureAt(name: string, phase: keyof typeof CURVES, gaugePsi: number): Kelvin {
  const curve = phase === 'dew' ? dewTemperature : bubbleTemperature;
  const result = curve(refrigerant(name), toAbsolute(psig(gaugePsi), SEA_LEVEL_ATMOSPHERE));
  return result.ok ? result.temperature : kelvin(NaN);
}

// Sea level. Computed with CoolProp by hand for the trade's usual temperatures; ±0.3 psi, ±1 psi for R-448A and R-449A.
describe('pressures at the trade’s usual temperatures', () => {
  it.each([
    ['R-22', [-20, 0, 20, 40, 100], [10.2, 24.0, 43.1, 68.6, 195.9], 0.3],
    ['R-134a', [-20, 0, 20, 40, 100], [-1.8, 6.5, 18.4, 35.0, 124.2], 0.3],
    ['R-404A', [-20, 0, 20, 25, 100], [16.0, 32.6, 55.3, 62.1, 234.7], 0.3],
    ['R-407C', [20, 40, 100], [37.9, 63.2, 196.1], 0.3],
    ['R-410A', [40], [118.4], 0.3],
    ['R-744', [-40, -20, 0, 20, 30, 40], [131.0, 200.2, 291.0, 407.2, 476.1, 552.9], 0.3],
    ['R-448A', [0, 20, 25, 40, 100], [23.8, 43.9, 50.0, 71.2, 213], 1],
    ['R-449A', [0, 20, 25, 40, 100], [24.0, 44.0, 50.1, 71.2, 212], 1],
  ])('dew of %s', (name, temperatures, pressures, tolerance) => {
    temperatures.forEach((degF, index) => {
      expect(Math.abs(psigAt(name, 'dew', degF) - (pressures[index] ?? NaN))).toBeLessThanOrEqual(tolerance);
    });
  });

  it.each([
    ['R-404A', [-20, 0, 20, 25, 100], [16.8, 33.7, 56.6, 63.4, 236.8], 0.3],
    ['R-407C', [20, 40, 100], [51.2, 80.2, 225.5], 0.3],
    ['R-410A', [40], [118.8], 0.3],
    ['R-448A', [0, 20, 25, 40, 100], [34.3, 57.9, 65.0, 89.3, 244], 1],
    ['R-449A', [0, 20, 25, 40, 100], [33.6, 56.9, 63.9, 87.9, 241], 1],
  ])('bubble of %s', (name, temperatures, pressures, tolerance) => {
    temperatures.forEach((degF, index) => {
      expect(Math.abs(psigAt(name, 'bubble', degF) - (pressures[index] ?? NaN))).toBeLessThanOrEqual(
        tolerance,
      );
    });
  });
});

describe('published single values', () => {
  // Case maker's cut-in pressures: "RVLC Crystal Merchandiser manual", Zero Zone, defrost and settings table, p. 22.
  it.each([
    ['R-448A', -2, 23],
    ['R-404A', -2, 31],
    ['R-448A', -11, 16],
    ['R-404A', -11, 23],
  ])('dew of %s at %d °F is within 1 psi of %d psig', (name, degF, expected) => {
    expect(Math.abs(psigAt(name, 'dew', degF) - expected)).toBeLessThanOrEqual(1);
  });

  // "Mid-point article", HVAC School: R-407C at 80 psig boils at 40 °F, dews at 50.8 °F; midpoint 45.4 °F, and 46.5 °F by
  // the rule of 40 and 60 per cent.
  it('R-407C at 80 psig lies between 40 and 50.8 °F', () => {
    const bubble = temperatureAt('R-407C', 'bubble', 80);
    const dew = temperatureAt('R-407C', 'dew', 80);
    expect(Math.abs(inFahrenheit(bubble) - 40)).toBeLessThanOrEqual(0.2);
    expect(Math.abs(inFahrenheit(dew) - 50.8)).toBeLessThanOrEqual(0.2);
    expect(inFahrenheit(averageTemperature([bubble, dew]) ?? kelvin(NaN))).toBeCloseTo(45.3, 0);
    expect(Math.abs(inFahrenheit(kelvin(0.4 * bubble + 0.6 * dew)) - 46.5)).toBeLessThanOrEqual(0.2);
  });

  it('averages 40 and 50.8 °F to 45.4 °F', () => {
    const mean = averageTemperature([fahrenheit(40), fahrenheit(50.8)]) ?? kelvin(NaN);
    expect(inFahrenheit(mean)).toBeCloseTo(45.4, 6);
  });

  it.each([
    ['R-448A', 11.1],
    ['R-449A', 10.3],
    ['R-404A', 1.0],
    ['R-744', 0],
  ])('the glide of %s at 45 psig is %d °F within 1 °F', (name, expected) => {
    // CO2 has no saturation at 45 psig (it is below the triple point), so its glide is read higher up.
    const pressure = name === 'R-744' ? 200 : 45;
    const glide = temperatureAt(name, 'dew', pressure) - temperatureAt(name, 'bubble', pressure);
    expect(Math.abs(convert(glide, 'K_diff', 'degF_diff') - expected)).toBeLessThanOrEqual(1);
  });

  // "Servicing CO₂ systems: a technician's perspective", r744.com: 87.8 °F and 1055 psig.
  it('R-744 has its critical point at 87.8 °F and 1055 psig', () => {
    const table = refrigerant('R-744');
    expect(inFahrenheit(kelvin(table.criticalK ?? NaN))).toBeCloseTo(87.76, 1);
    expect(convert((table.criticalPa ?? NaN) - SEA_LEVEL_ATMOSPHERE, 'Pag', 'psig')).toBeCloseTo(1055.3, 0);
  });

  // Same source for the triple point: −69.8 °F, 60.4 psig. Our rows begin just above.
  it('R-744 begins within 1.1 °F and 2 psi above its triple point', () => {
    const table = refrigerant('R-744');
    const triplePa = toSi(60.43, 'psig') + SEA_LEVEL_ATMOSPHERE;
    expect(inFahrenheit(kelvin(table.lowerLimitK)) - -69.8).toBeLessThan(1.1);
    expect(convert((table.dewPa[0] ?? NaN) - triplePa, 'Pag', 'psig')).toBeLessThan(2);
  });
});
