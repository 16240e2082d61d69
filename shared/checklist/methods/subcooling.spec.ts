import { describe, expect, it } from '@jest/globals';
import { doubtsOf, fahrenheitDegrees, figure, GOOD, judgeMeasured, withBoxes } from './measurement.fixture';

const NONE = { low: null, high: null };
const BAND = { low: fahrenheitDegrees(5), high: fahrenheitDegrees(15) };

const cooled = (degF: string, criteria: Record<string, number | null> = BAND) =>
  judgeMeasured({ ...withBoxes(GOOD.subcooling, { lineTemperature: `${degF} degF` }), criteria });

describe('a subcooling', () => {
  // R-404A at 225 psig: bubble 96.5 °F (computed with a Helmholtz-energy property program); by dew it would be 10.1.
  it('is counted from the bubble temperature: R-404A, 225 psig, 86 °F', () => {
    const judgement = cooled('86');
    const inFahrenheit = (figure(judgement, 'subcooling') * 9) / 5;
    expect(Math.abs(inFahrenheit - 10.5)).toBeLessThanOrEqual(0.3);
    expect((figure(judgement, 'bubbleTemperature') * 9) / 5 - 459.67).toBeCloseTo(96.5, 0);
    expect(figure(judgement, 'glide')).toBeGreaterThan(0);
  });

  it.each([
    ['86', 'within', null],
    ['93', 'outside', 'low'],
    ['80', 'outside', 'high'],
    ['98', 'outside', 'low'],
  ])('of a line of %s °F is %s', (degF, outcome, side) => {
    expect(cooled(degF)).toMatchObject({ outcome, side, counts: true, doubts: [] });
  });

  it('is judged on the side that the template limits', () => {
    expect(cooled('60', { ...BAND, high: null })).toMatchObject({ outcome: 'within', limit: { high: null } });
    expect(cooled('93', { ...BAND, low: null }).outcome).toBe('within');
    expect(cooled('93', { ...BAND, high: null }).side).toBe('low');
  });

  it('is recorded where the template gives no limit', () => {
    expect(cooled('86', NONE)).toMatchObject({ outcome: 'recorded', side: null, counts: true, limit: null });
    expect(cooled('86', {}).outcome).toBe('recorded');
  });

  it('never hides that the line is warmer than its bubble temperature', () => {
    expect(figure(cooled('98', NONE), 'subcooling')).toBeLessThan(0);
  });

  it('takes the atmosphere of the place: at 5,000 ft the same gauge means less', () => {
    // The bubble slope of R-404A near 225 psig is 3.4 psi/°F, and 2.5 psi of atmosphere are missing: about 0.7 °F.
    const high = judgeMeasured({
      ...GOOD.subcooling,
      facts: { refrigerant: 'R-404A', atmospherePaAbs: 84_300 },
    });
    const less = ((figure(cooled('86'), 'subcooling') - figure(high, 'subcooling')) * 9) / 5;
    expect(less).toBeGreaterThan(0.5);
    expect(less).toBeLessThan(1);
  });

  it('knows none of a refrigerant without a table, nor of one beyond it', () => {
    const unknown = { ...GOOD.subcooling, facts: { refrigerant: '' } };
    expect(doubtsOf(judgeMeasured(unknown))).toEqual(['refuse unknownRefrigerant']);
    const hot = withBoxes(GOOD.subcooling, { liquidPressure: '700 psig' });
    expect(doubtsOf(judgeMeasured(hot))).toEqual(['refuse aboveCritical']);
  });
});
