import { describe, expect, it } from '@jest/globals';
import { doubtsOf, fahrenheit, figure, judgeMeasured } from './measurement.fixture';

const ON_TEMPERATURE = {
  failSafe: 2160,
  terminationTemperature: fahrenheit(50),
  temperatureTolerance: null,
};

function watched(took: string, end: string | null, criteria: Record<string, number | null> = ON_TEMPERATURE) {
  const typed = { took: `${took} min`, ...(end === null ? {} : { endTemperature: `${end} degF` }) };
  return judgeMeasured({ method: 'witnessedDefrost', typed, criteria });
}

describe('a defrost that was watched', () => {
  // Common practice, no source: it ends on temperature, and the fail-safe time is an alarm.
  it.each([
    ['28', '51', 'within', null, 'endedOnTemperature'],
    ['28', '50', 'within', null, 'endedOnTemperature'],
    ['28', '49', 'outside', null, 'endedEarly'],
    ['36', '45', 'outside', 'high', 'endedOnFailSafe'],
    ['36', '51', 'outside', 'high', 'endedOnFailSafe'],
    ['38', '51', 'outside', 'high', 'ranPastItsTime'],
  ])('%s minutes to %s °F of 36 minutes and 50 °F: %s', (took, end, outcome, side, ending) => {
    expect(watched(took, end)).toMatchObject({
      outcome,
      side,
      counts: true,
      doubts: [],
      verdicts: [`witnessedDefrost_${ending}`],
      limit: { low: null, high: 2160, unit: 's' },
    });
  });

  it('ends on time where it has no temperature', () => {
    const onTime = { ...ON_TEMPERATURE, terminationTemperature: null };
    expect(watched('36', null, onTime)).toMatchObject({
      outcome: 'within',
      verdicts: ['witnessedDefrost_endedOnTime'],
    });
    expect(watched('38', null, onTime).outcome).toBe('outside');
    expect(watched('36', null, onTime).figures.map(({ label }) => label)).toEqual(['duration']);
  });

  it('takes the template’s room below the temperature', () => {
    const room = { ...ON_TEMPERATURE, temperatureTolerance: 1 };
    // 1 K is 1.8 °F.
    expect(watched('28', '48.3', room).outcome).toBe('within');
    expect(watched('28', '48.1', room).outcome).toBe('outside');
  });

  it('gives its figures', () => {
    const judgement = watched('28', '51');
    expect(figure(judgement, 'duration')).toBe(1680);
    expect(figure(judgement, 'endTemperature')).toBeCloseTo(fahrenheit(51), 9);
  });

  it('is incomplete without the temperature that it ends on', () => {
    expect(doubtsOf(watched('28', null))).toEqual(['refuse incomplete']);
  });

  it('refuses one that took no time', () => {
    expect(doubtsOf(watched('0', '51'))).toEqual(['refuse notPlausible']);
    expect(doubtsOf(watched('-5', '51'))).toEqual(['refuse notNegatable']);
  });
});
