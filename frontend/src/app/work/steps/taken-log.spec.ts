import { describe, expect, it } from '@jest/globals';
import { MOST_SAMPLES } from '#shared/checklist/kinds/trend';
import type { PickedLog } from '../logger/log-choice';
import { takenLog } from './taken-log';

const file = { name: 'coil.csv', sha256: 'a'.repeat(64), rows: 3 };
function picked(times: number[], pressure: number[], temperature: number[]): PickedLog {
  const column = (key: string, values: number[]) => ({
    key,
    heading: key,
    values: Float64Array.from(values),
  });
  return {
    file,
    startText: '9:00',
    times: Float64Array.from(times),
    columns: [column('pressure', pressure), column('temperature', temperature)],
  };
}

describe('takenLog', () => {
  it('leaves out rows that lack one of the two, and counts from the first that has both', () => {
    const { log, isCut } = takenLog(
      picked([0, 10, 20, 30.04], [NaN, 310_000.4, 311_000, 312_000], [270, 271.006, NaN, 272]),
    );
    expect(log).toEqual({
      file,
      atS: [0, 20],
      pressurePag: [310_000, 312_000],
      temperatureK: [271.01, 272],
    });
    expect(isCut).toBe(false);
  });

  it('keeps the last rows, unreduced, of a log that is longer than an entry holds', () => {
    const times = Array.from({ length: MOST_SAMPLES + 5 }, (_, index) => index);
    const { log, isCut } = takenLog(picked(times, times, times));
    expect(log.atS).toHaveLength(MOST_SAMPLES);
    expect(log.pressurePag[0]).toBe(5);
    expect(log.atS[0]).toBe(0);
    expect(isCut).toBe(true);
  });

  it('has no readings where no row has both', () => {
    expect(takenLog(picked([0, 1], [NaN, 1], [1, NaN])).log.atS).toEqual([]);
  });
});
