import { describe, expect, it } from '@jest/globals';
import { doubtsOf, fahrenheit, figure, GOOD, judgeMeasured } from './measurement.fixture';

const inFahrenheit = (kelvins: number): number => (kelvins * 9) / 5 - 459.67;

const held = (criteria: Record<string, number | null>) =>
  judgeMeasured({ ...GOOD.regulatorPressure, criteria: { room: 1, ...criteria } });

describe('the pressure at a regulator', () => {
  // R-407C at 80 psig: bubble 40 °F, dew 50.8 °F, middle 45.4 °F (a training page on glide; it prints 45.5 by a slip).
  it('is read on the basis of the schedule: dew', () => {
    const judgement = held({ dew: fahrenheit(50.8) });
    expect(judgement).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(Math.abs(inFahrenheit(figure(judgement, 'evaporatingTemperature')) - 50.8)).toBeLessThan(0.3);
    expect(Math.abs(figure(judgement, 'askedPressure') / 6894.757 - 80)).toBeLessThan(0.5);
  });

  it('is read on the basis of the schedule: mean, half the glide away', () => {
    const judgement = held({ mean: fahrenheit(45.4) });
    expect(judgement.outcome).toBe('within');
    expect(Math.abs(inFahrenheit(figure(judgement, 'evaporatingTemperature')) - 45.4)).toBeLessThan(0.3);
    // Taken for a dew temperature, the same number would be far off.
    expect(held({ dew: fahrenheit(45.4) })).toMatchObject({ outcome: 'outside', side: 'high' });
  });

  it('is outside on either side', () => {
    expect(held({ dew: fahrenheit(55) })).toMatchObject({ outcome: 'outside', side: 'low', counts: true });
    expect(held({ dew: fahrenheit(47) })).toMatchObject({ outcome: 'outside', side: 'high', counts: true });
  });

  it('is not judged by two bases at once, nor by none', () => {
    expect(doubtsOf(held({ dew: 280, mean: 278 }))).toEqual(['refuse noCriterion']);
    expect(doubtsOf(held({ dew: null }))).toEqual(['refuse noCriterion']);
  });
});
