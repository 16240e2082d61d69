import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { checkDefrostPlan } from './check-defrost-plan';
import { DAY_S } from './day-circle';
import { circuit, freeRules, MINUTE_S } from './defrost.fixture';

// A second opinion that shares no code with the checker: the day drawn minute by minute.
const MINUTES = DAY_S / MINUTE_S;

/** For each minute of the day, the indexes of the circuits in defrost. */
function drawDay(startMinutes: readonly number[], lengthMinutes: readonly number[]): readonly Set<number>[] {
  const day = Array.from({ length: MINUTES }, () => new Set<number>());
  startMinutes.forEach((start, index) => {
    for (let minute = start; minute < start + (lengthMinutes[index] ?? 0); minute++)
      day[minute % MINUTES]?.add(index);
  });
  return day;
}

const minutes = fc.array(fc.integer({ min: 0, max: MINUTES - 1 }), { minLength: 4, maxLength: 4 });
const lengths = fc.array(fc.integer({ min: 1, max: 700 }), { minLength: 4, maxLength: 4 });
const loads = fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 4, maxLength: 4 });

describe('checkDefrostPlan against the day drawn minute by minute', () => {
  it('agrees on load, hot gas, heaters, boxes and quiet hours', () => {
    fc.assert(
      fc.property(minutes, lengths, loads, (starts, lengthsMin, loadsKw) => {
        const circuits = starts.map((_, index) =>
          circuit(`c${index}`, {
            type: index < 3 ? 'hotGas' : 'electric',
            durationS: (lengthsMin[index] ?? 0) * MINUTE_S,
            loadW: (loadsKw[index] ?? 0) * 1000,
            heaterW: 1000,
            box: index % 2 === 0 ? 'even' : null,
          }),
        );
        const rules = freeRules({
          largestShareOfLoad: 0.5,
          largestShareInHotGas: 0.4,
          largestHeaterDemandW: 2000,
          quietHours: [{ fromS: 22 * 3600, toS: 2 * 3600 }],
        });
        const plan = starts.map((start, index) => ({ circuitId: `c${index}`, startsS: [start * MINUTE_S] }));
        const check = checkDefrostPlan(circuits, rules, plan);
        const found = new Set(check.ok ? check.breaches.map(({ rule }) => rule) : []);

        const day = drawDay(starts, lengthsMin);
        const total = loadsKw.reduce((sum, load) => sum + load, 0);
        const sumOf = (set: Set<number>): number =>
          [...set].reduce((sum, each) => sum + (loadsKw[each] ?? 0), 0);
        const isOverLoad = day.some((set) => set.size > 1 && 2 * sumOf(set) > total);
        expect(found.has('shareOfLoad')).toBe(isOverLoad);
        expect(found.has('shareInHotGas')).toBe(
          day.some((set) => [0, 1, 2].filter((each) => set.has(each)).length > 1),
        );
        expect(found.has('heaterDemand')).toBe(day.some((set) => set.size > 2));
        expect(found.has('sharedBox')).toBe(day.some((set) => set.has(0) && set.has(2)));
        const quiet = [...day.slice(0, 120), ...day.slice(22 * 60)];
        expect(found.has('quietHours')).toBe(quiet.some((set) => set.size > 0));
      }),
      { numRuns: 400, seed: 5 },
    );
  });
});
