import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from '../units/convert';
import { kelvinDifference, second } from '../units/quantity';
import { FLOOD_REASONS, rankFloodSuspects, type FloodHuntCoil, type FloodReason } from './flood-hunt';
import { fahrenheitDifference } from './readings.fixture';

const coil = (coilId: string, change: Partial<FloodHuntCoil> = {}): FloodHuntCoil => ({
  coilId,
  fixtureTag: `case ${coilId}`,
  circuitCode: 'A1',
  minimumSuperheat: fahrenheitDifference(4),
  superheat: fahrenheitDifference(6),
  asLeftStale: false,
  sinceDefrost: second(toSi(3, 'h')),
  overrideStanding: false,
  loadW: 2000,
  ...change,
});

const unknown = { minimumSuperheat: null, superheat: null };

const order = (coils: readonly FloodHuntCoil[]): string[] =>
  rankFloodSuspects(coils).map(({ coilId }) => coilId);

// The order is common practice, no source.
describe('rankFloodSuspects', () => {
  it.each<readonly [string, Partial<FloodHuntCoil>, readonly FloodReason[]]>([
    ['nothing', {}, []],
    ['a minimum of zero', { minimumSuperheat: kelvinDifference(0) }, ['minimumAtOrBelowZero']],
    ['a negative minimum', { minimumSuperheat: fahrenheitDifference(-1) }, ['minimumAtOrBelowZero']],
    [
      'a steady superheat below zero',
      { minimumSuperheat: null, superheat: fahrenheitDifference(-1) },
      ['minimumAtOrBelowZero', 'lowSuperheat'],
    ],
    ['2.9 °F', { superheat: fahrenheitDifference(2.9) }, ['lowSuperheat']],
    ['3 °F', { superheat: fahrenheitDifference(3) }, []],
    ['no record', unknown, ['neverSet']],
    ['numbers that are none', { minimumSuperheat: kelvinDifference(NaN), superheat: null }, ['neverSet']],
    ['a minimum alone', { superheat: null }, []],
    ['an old record', { asLeftStale: true }, ['stale']],
    ['59 minutes since defrost', { sinceDefrost: second(59 * 60) }, ['recentDefrost']],
    ['an hour since defrost', { sinceDefrost: second(3600) }, []],
    ['an unknown defrost', { sinceDefrost: null }, []],
    ['a forced valve', { overrideStanding: true }, ['overrideStanding']],
    [
      'all that can come together',
      {
        minimumSuperheat: fahrenheitDifference(-1),
        superheat: fahrenheitDifference(2),
        asLeftStale: true,
        overrideStanding: true,
        sinceDefrost: second(0),
      },
      ['minimumAtOrBelowZero', 'overrideStanding', 'lowSuperheat', 'stale', 'recentDefrost'],
    ],
  ])('gives the reasons of %s', (_, change, reasons) => {
    expect(rankFloodSuspects([coil('1', change)])[0]?.reasons).toEqual(reasons);
  });

  it('puts each reason before the next, and a coil without any last', () => {
    const coils = [
      coil('none'),
      coil('defrost', { sinceDefrost: second(60) }),
      coil('stale', { asLeftStale: true }),
      coil('never', unknown),
      coil('low', { superheat: fahrenheitDifference(2) }),
      coil('forced', { overrideStanding: true }),
      coil('zero', { minimumSuperheat: kelvinDifference(0) }),
    ];
    expect(order(coils)).toEqual(['zero', 'forced', 'low', 'never', 'stale', 'defrost', 'none']);
  });

  it('puts one strong reason before all weaker ones together', () => {
    const weak = coil('weak', {
      superheat: fahrenheitDifference(1),
      minimumSuperheat: fahrenheitDifference(0.5),
      overrideStanding: true,
      asLeftStale: true,
      sinceDefrost: second(0),
    });
    expect(order([weak, coil('strong', { minimumSuperheat: kelvinDifference(0) })])).toEqual([
      'strong',
      'weak',
    ]);
  });

  it('orders equals by superheat, then load, then name', () => {
    const at = (id: string, degF: number, loadW: number | null): FloodHuntCoil =>
      coil(id, { minimumSuperheat: fahrenheitDifference(degF), loadW });
    const coils = [
      at('e', 5, null),
      at('d', 5, 1000),
      at('b', 5, 4000),
      at('c', 5, 1000),
      at('a', 3.5, null),
    ];
    expect(order(coils)).toEqual(['a', 'b', 'c', 'd', 'e']);
  });

  it('tells two coils of one fixture apart', () => {
    const twins = [coil('2', { fixtureTag: 'M4' }), coil('1', { fixtureTag: 'M4' })];
    expect(order(twins)).toEqual(['1', '2']);
  });

  it('has nothing to say of no coils', () => {
    expect(rankFloodSuspects([])).toEqual([]);
  });

  const superheats = fc.option(fc.integer({ min: -5, max: 12 }).map(fahrenheitDifference));
  const coilLists = fc
    .array(
      fc.record({
        minimumSuperheat: superheats,
        superheat: superheats,
        asLeftStale: fc.boolean(),
        sinceDefrost: fc.option(fc.integer({ min: 0, max: 7200 }).map(second)),
        overrideStanding: fc.boolean(),
        loadW: fc.option(fc.constantFrom(500, 2000)),
        fixtureTag: fc.constantFrom('M1', 'M2', 'L1'),
      }),
      { maxLength: 12 },
    )
    .map((list) => list.map((change, index) => coil(`c${index}`, change)));

  it('gives every coil once and the same order whatever the input’s', () => {
    fc.assert(
      fc.property(coilLists, fc.integer({ min: 0, max: 11 }), (coils, turn) => {
        const turned = [...coils.slice(turn), ...coils.slice(0, turn)].reverse();
        expect(order(turned)).toEqual(order(coils));
        expect([...order(coils)].sort()).toEqual(coils.map(({ coilId }) => coilId).sort());
      }),
    );
  });

  it('never lets the strongest reason get weaker down the list', () => {
    const strength = (reasons: readonly FloodReason[]): number =>
      reasons[0] === undefined ? FLOOD_REASONS.length : FLOOD_REASONS.indexOf(reasons[0]);
    fc.assert(
      fc.property(coilLists, (coils) => {
        const strengths = rankFloodSuspects(coils).map(({ reasons }) => strength(reasons));
        expect(strengths).toEqual([...strengths].sort((a, b) => a - b));
      }),
    );
  });
});
