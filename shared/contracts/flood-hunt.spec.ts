import { describe, expect, it } from '@jest/globals';
import { floodHuntSchema, rankCoils, type FloodHuntRow } from './flood-hunt';

const uuid = (number: number): string => `66666666-0000-4000-8000-${String(number).padStart(12, '0')}`;

const row = (number: number, change: Partial<FloodHuntRow> = {}): FloodHuntRow => ({
  coilId: uuid(number) as FloodHuntRow['coilId'],
  coilNumber: 1,
  fixtureTag: `D-${number}`,
  circuitCode: 'A1',
  sequenceId: uuid(100 + number) as FloodHuntRow['sequenceId'],
  stepKey: `superheat:${uuid(number)}`,
  superheatK: 4,
  minimumSuperheatK: null,
  asLeftStale: false,
  sinceDefrostS: null,
  overrideStanding: false,
  loadW: 1000,
  ...change,
});

describe('rankCoils', () => {
  it('puts the likeliest first and keeps what belongs to each', () => {
    const ranked = rankCoils([
      row(1),
      row(2, { minimumSuperheatK: -0.5 }),
      row(3, { superheatK: null }),
      row(4, { sinceDefrostS: 600 }),
    ]);
    expect(ranked.map(({ coil, reasons }) => [coil.fixtureTag, coil.stepKey, reasons])).toEqual([
      ['D-2', `superheat:${uuid(2)}`, ['minimumAtOrBelowZero']],
      ['D-3', `superheat:${uuid(3)}`, ['neverSet']],
      ['D-4', `superheat:${uuid(4)}`, ['recentDefrost']],
      ['D-1', `superheat:${uuid(1)}`, []],
    ]);
    expect(ranked.map(({ lowestSuperheatK }) => lowestSuperheatK)).toEqual([-0.5, null, 4, 4]);
  });

  it('takes what the server sends', () => {
    const hunt = { suctionGroupName: 'AS-1', coils: [row(1), row(2, { loadW: null })] };
    expect(floodHuntSchema.parse(JSON.parse(JSON.stringify(hunt)))).toEqual(hunt);
  });
});
