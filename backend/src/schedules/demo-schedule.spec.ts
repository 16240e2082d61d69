import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from '@jest/globals';
import { convert, fromSi } from '#shared/units/convert';
import { parseSchedule } from './schedule-parser';
import { circuitsOf, fixturesOf, scheduleOf } from './schedule-csv.fixture';

const reading = parseSchedule(readFileSync(join(__dirname, '../../demo/harbor-street-schedule.csv')));
const schedule = scheduleOf(reading);
const circuits = circuitsOf(schedule);

const caseFeetOf = (isLow: boolean): number => {
  const some = circuits.filter(({ temperatureClass }) => (temperatureClass === 'low') === isLow);
  const cases = some.flatMap(({ fixtures }) => fixtures).filter(({ kind }) => kind === 'case');
  return fromSi(
    cases.reduce((sum, { lengthM }) => sum + (lengthM ?? 0), 0),
    'ft',
  );
};

const caseLoadOf = (isLow: boolean): number =>
  circuits
    .filter(
      ({ temperatureClass, fixtures }) =>
        (temperatureClass === 'low') === isLow && fixtures[0]?.kind === 'case',
    )
    .reduce((sum, { loadW }) => sum + (loadW ?? 0), 0);

describe('the demo schedule', () => {
  it('is the plant of a store: systems, suction groups, circuits, fixtures and coils', () => {
    const groups = schedule.systems.flatMap(({ suctionGroups }) => suctionGroups);
    expect(schedule.systems.map(({ name, refrigerant }) => [name, refrigerant])).toEqual([
      ['Rack A', 'R-448A'],
      ['Rack B', 'R-449A'],
    ]);
    expect(groups.map(({ temperatureClass }) => temperatureClass)).toEqual([
      'medium',
      'medium',
      'medium',
      'low',
      'low',
    ]);
    expect(circuits.map(({ code }) => code)).toEqual([
      ...Array.from({ length: 52 }, (_, index) => `A${index + 1}`),
      ...Array.from({ length: 30 }, (_, index) => `B${index + 1}`),
    ]);
    expect(fixturesOf(schedule)).toHaveLength(150);
    expect(fixturesOf(schedule).reduce((sum, { coilCount }) => sum + coilCount, 0)).toBe(174);
  });

  it('leaves no column unread', () => {
    expect(reading).toMatchObject({ ok: true, ignoredColumns: [] });
  });

  it('has each feed, control and defrost that needs a check of its own', () => {
    expect(new Set(circuits.map(({ feed }) => feed)).size).toBe(2);
    expect(new Set(circuits.map(({ control }) => control)).size).toBe(4);
    expect(new Set(circuits.map(({ defrost }) => defrost.type))).toEqual(
      new Set(['offTime', 'electric', 'hotGas']),
    );
    expect(fixturesOf(schedule).filter(({ kind }) => kind === 'walkIn')).toHaveLength(16);
  });

  // Typical store: openstudio-standards (NREL), typical_refrigerated_cases and refrigerated_cases, template new.
  it.each([
    ['low', true, 402, 54_330],
    ['medium', false, 396, 61_820],
  ])('has about the case length and load of a typical store, %s temperature', (_, isLow, feet, load) => {
    expect(Math.abs(caseFeetOf(isLow) / feet - 1)).toBeLessThan(0.15);
    expect(Math.abs(caseLoadOf(isLow) / load - 1)).toBeLessThan(0.15);
  });

  it('has superheat bands as the trade sets them', () => {
    for (const { temperatureClass, fixtures } of circuits) {
      for (const { superheatLowK, superheatHighK } of fixtures) {
        const band = [superheatLowK, superheatHighK].map((kelvin) =>
          Math.round(convert(kelvin, 'K_diff', 'degF_diff')),
        );
        expect(temperatureClass === 'low' ? ['3-5', '4-6'] : ['6-8', '6-10']).toContain(band.join('-'));
      }
    }
  });
});
