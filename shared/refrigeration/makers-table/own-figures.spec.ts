import { describe, expect, it } from '@jest/globals';
import { addDifference, kelvin, kelvinDifference, pascalAbsolute } from '../../units/quantity';
import { bubblePressure, dewPressure } from '../saturation/saturation-curve';
import { findRefrigerant } from '../saturation/refrigerants';
import type { MakersPoint } from './makers-table';
import { ownFigureProblems } from './own-figures';

/** Rows of a shipped refrigerant at every 10 K, shifted in temperature. */
function rowsOf(designation: string, shiftK = 0): MakersPoint[] {
  const table = findRefrigerant(designation);
  if (!table) throw new Error(designation);
  return Array.from({ length: 8 }, (_, index) => {
    const temperature = kelvin(235 + 10 * index);
    const [bubble, dew] = [bubblePressure(table, temperature), dewPressure(table, temperature)];
    if (!bubble.ok || !dew.ok) throw new Error('outside the table');
    return {
      temperature: addDifference(temperature, kelvinDifference(shiftK)),
      bubble: pascalAbsolute(bubble.pressure),
      dew: pascalAbsolute(dew.pressure),
    };
  });
}

const asked = (designation: string, points: readonly MakersPoint[]) =>
  ownFigureProblems({ designation, issuer: 'Example Gases', edition: '1', points });

describe('a sheet of a refrigerant that the program has figures of', () => {
  it('is not asked about when both say the same, nor when the program knows none', () => {
    expect(asked('R-448A', rowsOf('R-448A'))).toEqual([]);
    // As far as published charts differ: 0.34 K.
    expect(asked('R-448A', rowsOf('R-448A', 0.34))).toEqual([]);
    expect(asked('R-9X1', rowsOf('R-448A', 6))).toEqual([]);
  });

  it.each([
    ['another refrigerant’s figures', rowsOf('R-134a')],
    ['figures that are 6 K off', rowsOf('R-404A', 6)],
    ['figures that are 6 K off the other way', rowsOf('R-404A', -6)],
  ])('is asked about with %s', (_, points) => {
    const [question, ...others] = asked('r404a', points);
    expect(question).toMatchObject({ code: 'differsFromOwn', severity: 'ask' });
    expect(Math.abs(question?.values[0]?.value ?? 0)).toBeGreaterThan(5);
    expect(others).toEqual([]);
  });
});
