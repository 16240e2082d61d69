import { describe, expect, it } from '@jest/globals';
import { pascalAbsolute } from '../../units/quantity';
import { PUBLISHED_GROUPS, type PublishedPoint } from './published-points.fixture';
import { findRefrigerant, REFRIGERANTS } from './refrigerants';
import { bubbleTemperature, dewTemperature } from './saturation-curve';

/** How far a temperature may be from a published one, plus half the last digit that was printed (in kelvin). */
const THRESHOLD_K = 0.3;

/** Ours minus the published temperature, at the published pressure and phase. */
function differenceK([name, phase, temperatureK, pressurePa]: PublishedPoint): number {
  const table = findRefrigerant(name);
  if (table === undefined) return NaN;
  const curve = phase === 'dew' ? dewTemperature : bubbleTemperature;
  const result = curve(table, pascalAbsolute(pressurePa));
  return result.ok ? result.temperature - temperatureK : NaN;
}

const ALL_POINTS = PUBLISHED_GROUPS.flatMap((group) => group.points);

describe.each(PUBLISHED_GROUPS)('$source', ({ points }) => {
  it.each(points)('%s %s at %d K and %d Pa agrees within 0.3 K and %d K (%s)', (...point) => {
    expect(Math.abs(differenceK(point))).toBeLessThanOrEqual(THRESHOLD_K + point[4]);
  });
});

describe('published points', () => {
  it('are three or more for every refrigerant', () => {
    const counts = [...REFRIGERANTS.keys()].map(
      (name) => ALL_POINTS.filter((point) => point[0] === name).length,
    );
    expect(Math.min(...counts)).toBeGreaterThanOrEqual(3);
  });

  // Limits are what the tables’ notes say, rounded as they are there.
  it.each([
    ['R-407A', -0.2, 0.2],
    ['R-407F', -0.15, 0.15],
    ['R-449A', 0, 0.265],
    ['R-448A', -0.29, 0.34],
    ['R-134a', -0.04, 0.04],
    ['R-290', -0.04, 0.04],
    ['R-744', -0.01, 0.01],
    ['R-404A', -0.07, 0.07],
  ])('of %s lie %d to %d K from ours', (name, lowest, highest) => {
    const differences = ALL_POINTS.filter((point) => point[0] === name).map(differenceK);
    expect(Math.min(...differences)).toBeGreaterThanOrEqual(lowest);
    expect(Math.max(...differences)).toBeLessThanOrEqual(highest);
  });

  it('show the dew of R-448A 0.19 to 0.34 K warm, as its note says', () => {
    const dews = ALL_POINTS.filter((point) => point[0] === 'R-448A' && point[1] === 'dew').map(differenceK);
    expect(Math.min(...dews)).toBeGreaterThan(0.19);
    expect(Math.max(...dews)).toBeLessThan(0.345);
  });
});
