import { describe, expect, it } from '@jest/globals';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { superheatAnswerOf, superheatLacks } from './superheat-answer';
import { figureOf, liveObservation, livePair } from './superheat-live';
import { keptSuperheat, startSuperheat, type TypedObservation, type TypedSuperheat } from './superheat-typed';

const FORM = startSuperheat(null);
const blank = FORM.asLeft;
const steady = (pressure: string, temperature: string): TypedObservation => ({
  ...blank,
  pair: { pressure, temperature },
});
const form = (asFound: TypedObservation, asLeft: TypedObservation): TypedSuperheat => ({
  ...FORM,
  asFound,
  asLeft,
});
const FACTS = { refrigerant: 'R-448A', atmospherePaAbs: 101_325, elevationM: 0, unitSystem: 'us' } as const;
const STEP = { kind: 'superheat', band: { lowK: 3, highK: 6 }, source: null } as unknown as SuperheatStep;
const row = (since: string, pressure: string, temperature: string) => ({ since, pressure, temperature });
const series = (...readings: ReturnType<typeof row>[]): TypedObservation => ({
  ...blank,
  valve: 'series',
  readings,
});

describe('superheatAnswerOf', () => {
  it('is null while the as-left is not complete', () => {
    expect(superheatAnswerOf(form(steady('14', '2'), steady('14', '')), 'us')).toBeNull();
  });

  it('leaves the as-found out when nobody looked', () => {
    const answer = superheatAnswerOf(form(blank, steady('14', '2')), 'us');
    expect(answer?.asFound).toBeNull();
    expect(answer?.asLeft).toEqual({
      valve: 'steady',
      pair: { pressure: { text: '14', unit: 'psig' }, temperature: { text: '2', unit: 'degF' } },
    });
  });

  it('is null while an as-found was begun and is not complete', () => {
    expect(superheatAnswerOf(form(steady('14', ''), steady('14', '2')), 'us')).toBeNull();
  });

  it('says at least which conditions were met, also when none was', () => {
    expect(superheatAnswerOf(form(blank, steady('14', '2')), 'us')).toEqual({
      kind: 'superheat',
      asFound: null,
      asLeft: expect.anything(),
      takenAt: 'coilOutlet',
      conditions: [],
    });
  });

  it('comes back from what was recorded with the same texts', () => {
    const typed: TypedSuperheat = {
      asFound: series(row('0:00', '45', '28'), row('0:30', '45', '29')),
      asLeft: {
        ...blank,
        valve: 'hunting',
        low: { pressure: '1', temperature: '2' },
        high: { pressure: '3', temperature: '4' },
      },
      turns: [
        {
          turns: 0.25,
          direction: 'clockwise',
          at: '2026-03-02T09:00:00.000Z',
          beforeK: null,
          readBefore: null,
        },
      ],
      clockwise: 'raisesSuperheat',
      conditions: ['pastDefrost', 'coilClear'],
      takenAt: 'elsewhere',
      lineDrop: '1.5',
      instruments: { gauge: 'sealed', pressureAccuracy: '1', temperatureAccuracy: '0.9' },
    };
    expect(startSuperheat(superheatAnswerOf(typed, 'us'))).toEqual(typed);
  });

  it('counts a series from its first reading, in the order of time, without rows that nothing was typed into', () => {
    const typed = series(row('1:30', '45', '29'), row('1:00', '44', '28'), row('2:00', '', ''));
    expect(superheatAnswerOf(form(blank, typed), 'us')?.asLeft).toMatchObject({
      valve: 'series',
      readings: [
        { atS: 0, pressure: { text: '44' } },
        { atS: 30, pressure: { text: '45' } },
      ],
    });
  });

  it('forgets the line drop of a reading at the coil', () => {
    const typed = { ...form(blank, steady('14', '2')), lineDrop: '2' };
    expect(superheatAnswerOf(typed, 'us')).not.toHaveProperty('lineDrop');
  });
});

describe('superheatLacks', () => {
  it.each([
    ['asLeft', steady('14', '2'), blank],
    ['asFoundTemperature', steady('14', ''), blank],
    ['asLeftTemperature', blank, steady('14', '')],
    ['asLeftPressure', steady('14', '2'), steady('', '2')],
    ['seriesTime', blank, series(row('0:00', '45', '28'), row('soon', '45', '28'))],
    ['asLeftTemperature', blank, series(row('0:00', '45', '28'), row('0:30', '45', ''))],
    ['log', blank, { ...blank, valve: 'log' as const }],
    [null, blank, steady('14', '2')],
  ])('is %p', (lacking, asFound, asLeft) => {
    expect(superheatLacks(form(asFound, asLeft))).toBe(lacking);
  });

  it('is the line drop when the pressure was read elsewhere', () => {
    expect(superheatLacks({ ...form(blank, steady('14', '2')), takenAt: 'elsewhere' })).toBe('lineDrop');
  });
});

describe('livePair', () => {
  it('works out saturation and superheat of R-448A at 45 psig and 28 °F', () => {
    const live = livePair({ pressure: '45', temperature: '28' }, STEP, FACTS);
    expect(live.saturationK).toBeCloseTo(267, 0);
    expect(live.superheatK! * 1.8).toBeCloseTo(7.1, 0);
  });

  it('reads less superheat where the line has lost pressure on the way to the tap', () => {
    const how = { ...FORM, takenAt: 'elsewhere' as const, lineDrop: '2' };
    const atTap = livePair({ pressure: '43', temperature: '28' }, STEP, FACTS).superheatK!;
    const atCoil = livePair({ pressure: '43', temperature: '28' }, STEP, FACTS, how).superheatK!;
    expect(atCoil).toBeCloseTo(livePair({ pressure: '45', temperature: '28' }, STEP, FACTS).superheatK!, 6);
    expect(atCoil).toBeLessThan(atTap);
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
    expect(liveObservation(hunting, STEP, FACTS)?.doubts.map((doubt) => doubt.kind)).toContain(
      'lowAboveHigh',
    );
  });

  it('gives the error of the superheat once both instruments say theirs', () => {
    const instruments = { gauge: 'vented' as const, pressureAccuracy: '1', temperatureAccuracy: '0.9' };
    const judged = liveObservation(steady('45', '28'), STEP, FACTS, { ...FORM, instruments });
    expect(figureOf(judged, 'superheatUncertainty')).toBeGreaterThan(0.5);
    expect(figureOf(liveObservation(steady('45', '28'), STEP, FACTS), 'superheatUncertainty')).toBeNull();
  });
});

describe('a barometer', () => {
  it('counts instead of the elevation, in the unit that barometers show', () => {
    const read = (barometer: string): number | null =>
      figureOf(
        liveObservation(steady('45', '28'), STEP, FACTS, {
          ...FORM,
          instruments: { ...FORM.instruments, barometer },
        }),
        'superheat',
      );
    // 28.9 inHg is 1 inHg below the standard day: 0.49 psi, at 1.17 psi/°F a superheat higher by 0.4 °F.
    const difference = (((read('28.92') ?? 0) - (read('') ?? 0)) * 9) / 5;
    expect(difference).toBeGreaterThan(0.35);
    expect(difference).toBeLessThan(0.5);
  });
});

describe('keptSuperheat', () => {
  it('takes a draft of this version', () => {
    expect(keptSuperheat(JSON.parse(JSON.stringify(FORM)))).toEqual(FORM);
  });

  it.each([null, 'text', {}, { asFound: blank, asLeft: blank }, { ...FORM, turns: 2 }])(
    'leaves %p alone',
    (kept) => {
      expect(keptSuperheat(kept)).toBeNull();
    },
  );
});
