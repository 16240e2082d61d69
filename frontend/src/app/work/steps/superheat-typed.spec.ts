import { describe, expect, it } from '@jest/globals';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { liveObservation, livePair } from './superheat-live';
import { startSuperheat, superheatAnswerOf, superheatLacks, type TypedObservation } from './superheat-typed';

const blank = startSuperheat(null).asLeft;
const steady = (pressure: string, temperature: string): TypedObservation => ({
  ...blank,
  pair: { pressure, temperature },
});
const FACTS = { refrigerant: 'R-448A', atmospherePaAbs: 101_325, elevationM: 0, unitSystem: 'us' } as const;
const STEP = { kind: 'superheat', band: { lowK: 3, highK: 6 }, source: null } as unknown as SuperheatStep;

describe('superheatAnswerOf', () => {
  it('is null while the as-left is not complete', () => {
    expect(superheatAnswerOf({ asFound: steady('14', '2'), asLeft: steady('14', '') }, 'us')).toBeNull();
  });

  it('leaves the as-found out when nobody looked', () => {
    const answer = superheatAnswerOf({ asFound: blank, asLeft: steady('14', '2') }, 'us');
    expect(answer?.asFound).toBeNull();
    expect(answer?.asLeft).toEqual({
      valve: 'steady',
      pair: { pressure: { text: '14', unit: 'psig' }, temperature: { text: '2', unit: 'degF' } },
    });
  });

  it('is null while an as-found was begun and is not complete', () => {
    expect(superheatAnswerOf({ asFound: steady('14', ''), asLeft: steady('14', '2') }, 'us')).toBeNull();
  });

  it('comes back from what was recorded with the same texts', () => {
    const typed = {
      asFound: steady('14', '2'),
      asLeft: {
        ...blank,
        valve: 'hunting' as const,
        low: { pressure: '1', temperature: '2' },
        high: { pressure: '3', temperature: '4' },
      },
    };
    expect(startSuperheat(superheatAnswerOf(typed, 'us'))).toEqual(typed);
  });
});

describe('superheatLacks', () => {
  it.each([
    ['asLeft', steady('14', '2'), blank],
    ['asFoundTemperature', steady('14', ''), blank],
    ['asLeftTemperature', blank, steady('14', '')],
    ['asLeftPressure', steady('14', '2'), steady('', '2')],
    [null, blank, steady('14', '2')],
  ])('is %p', (lacking, asFound, asLeft) => {
    expect(superheatLacks({ asFound, asLeft })).toBe(lacking);
  });
});

describe('livePair', () => {
  it('works out saturation and superheat of R-448A at 45 psig and 28 °F', () => {
    const live = livePair({ pressure: '45', temperature: '28' }, STEP, FACTS);
    expect(live.saturationK).toBeCloseTo(267, 0);
    expect(live.superheatK! * 1.8).toBeCloseTo(7.1, 0);
  });

  it('has nothing while a box is empty', () => {
    expect(livePair({ pressure: '45', temperature: '' }, STEP, FACTS)).toEqual({
      saturationK: null,
      superheatK: null,
    });
  });
});

describe('liveObservation', () => {
  it('refuses a hunting valve whose lowest lies above its highest', () => {
    const hunting = {
      ...blank,
      valve: 'hunting' as const,
      low: { pressure: '45', temperature: '34' },
      high: { pressure: '45', temperature: '28' },
    };
    expect(liveObservation(hunting, STEP, FACTS, 'us')?.doubts.map((doubt) => doubt.kind)).toContain(
      'lowAboveHigh',
    );
  });
});
