import { describe, expect, it } from '@jest/globals';
import { convert } from '../../units/convert';
import { fahrenheit, refrigerant } from '../readings.fixture';
import { dewPressure } from './saturation-curve';

describe('dewPressure', () => {
  // Computed with CoolProp: how many psi a reading is off for each °F.
  it.each([
    ['R-404A', -20, 0.7],
    ['R-404A', 20, 1.31],
    ['R-22', -20, 0.58],
    ['R-22', 20, 1.1],
    ['R-744', -20, 3.97],
    ['R-744', 20, 6.51],
    ['R-448A', 20, 1.17],
  ])('of %s rises at %d °F by %d psi for each °F', (name, degF, expected) => {
    const above = dewPressure(refrigerant(name), fahrenheit(degF + 1));
    const below = dewPressure(refrigerant(name), fahrenheit(degF - 1));
    if (!above.ok || !below.ok) throw new Error('no answer');
    const slope = convert(above.pressure - below.pressure, 'Pa', 'psia') / 2;
    expect(Math.abs(slope - expected)).toBeLessThanOrEqual(0.03);
  });
});
