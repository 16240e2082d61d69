import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, pound, type Typed } from './measurement.fixture';

const cylinder = (
  name: string,
  before: string,
  after: string,
  change: Readonly<Record<string, string>> = {},
): Typed => ({
  cylinder: `=${name}`,
  refrigerant: '=R-448A',
  direction: '=in',
  before: `${before} lb`,
  after: `${after} lb`,
  ...change,
});

const charged = (rows: readonly Typed[], criteria: Record<string, number | null> = {}) =>
  judgeMeasured({ method: 'refrigerantCharge', typed: {}, rows, criteria });

describe('a refrigerant charge', () => {
  it('is what went in less what came out', () => {
    const judgement = judgeMeasured(GOOD.refrigerantCharge);
    // 105 lb and 50 lb in, 5 lb out, by hand.
    expect(figure(judgement, 'charge')).toBeCloseTo(pound(150), 9);
    expect(figure(judgement, 'chargedIn')).toBeCloseTo(pound(155), 9);
    expect(figure(judgement, 'takenOut')).toBeCloseTo(pound(5), 9);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, doubts: [] });
  });

  it.each([
    ['119.9', 'outside', 'low'],
    ['120', 'within', null],
    ['160', 'within', null],
    ['160.1', 'outside', 'high'],
  ])('of %s lb is held against 120 to 160 lb: %s', (mass, outcome, side) => {
    const judgement = charged([cylinder('A', mass, '0')], { least: pound(120), most: pound(160) });
    expect(judgement).toMatchObject({ outcome, side, counts: true });
  });

  // In binary fractions of a kilogram the first comes out a last bit below, the second a last bit above.
  it.each([
    ['100', '0.1', 99.9],
    ['100.1', '32.3', 67.8],
  ])('is at its limit whatever the conversion leaves over: %s less %s lb', (before, after, limit) => {
    const judgement = charged([cylinder('A', before, after)], { least: pound(limit), most: pound(limit) });
    expect(judgement).toMatchObject({ outcome: 'within', side: null });
  });

  it('is recorded where the template gives no limit', () => {
    expect(charged([cylinder('A', '120', '15')])).toMatchObject({
      outcome: 'recorded',
      limit: null,
      counts: true,
    });
    expect(charged([cylinder('A', '120', '15')], { least: pound(10) })).toMatchObject({
      outcome: 'within',
      limit: { high: null },
    });
  });

  it.each([
    ['another refrigerant', cylinder('A', '120', '15', { refrigerant: '=R-404A' }), 'wrongRefrigerant'],
    ['charging that makes it heavier', cylinder('A', '15', '120'), 'wrongWay'],
    ['recovering that makes it lighter', cylinder('A', '120', '15', { direction: '=out' }), 'wrongWay'],
    ['a mass below nothing', cylinder('A', '120', '-15'), 'notNegatable'],
  ])('refuses %s', (_, row, doubt) => {
    const judgement = charged([cylinder('B', '60', '20'), row]);
    expect(doubtsOf(judgement)).toEqual([`refuse ${doubt}`]);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false, figures: [] });
  });

  it('asks about a cylinder that comes back with another mass', () => {
    const judgement = charged([cylinder('a-1', '120', '60'), cylinder('A-1', '75', '20')]);
    expect(doubtsOf(judgement)).toEqual(['ask massDoesNotFollow']);
    expect(judgement.counts).toBe(true);
    expect(charged([cylinder('a-1', '120', '60'), cylinder('A-1', '60', '20')]).doubts).toEqual([]);
  });

  it('keeps a cylinder that is still on the scale, without counting it', () => {
    const { after: _after, ...started } = cylinder('B', '110', '60');
    const judgement = charged([cylinder('A', '120', '15'), started]);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false });
    expect(doubtsOf(judgement)).toEqual(['keep incomplete']);
    expect(doubtsOf(charged([]))).toEqual(['keep incomplete']);
  });
});
