import { describe, expect, it } from '@jest/globals';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { withReading } from './superheat-series-rows';
import { withoutLastTurn, withTurn } from './superheat-turning';
import { startSuperheat } from './superheat-typed';

const STEP = { kind: 'superheat', waitS: 900 } as unknown as SuperheatStep;
const NOW = Date.parse('2026-03-02T09:00:00.000Z');
const FORM = startSuperheat(null);
const read = { ...FORM.asLeft, pair: { pressure: '45', temperature: '28' } };
const half = { turns: 0.5, direction: 'clockwise' } as const;

describe('withTurn', () => {
  it('stamps the turn with the phone’s clock', () => {
    expect(withTurn(FORM, half, null, STEP, NOW).turns).toEqual([
      { ...half, at: '2026-03-02T09:00:00.000Z', beforeK: null, readBefore: null },
    ]);
  });

  it('takes what was read before the turn out of the boxes for as left', () => {
    const turned = withTurn({ ...FORM, asFound: read, asLeft: read }, half, 4, STEP, NOW);
    expect(turned.asLeft.pair.pressure).toBe('');
    expect(turned.asFound).toBe(read);
    expect(turned.turns[0]).toMatchObject({ beforeK: 4, readBefore: read });
  });

  it('gives it back when the turn is taken back', () => {
    expect(withoutLastTurn(withTurn({ ...FORM, asLeft: read }, half, 4, STEP, NOW))).toEqual({
      ...FORM,
      asLeft: read,
    });
  });

  it('keeps what was read since when the turn is taken back', () => {
    const since = { ...read, pair: { pressure: '46', temperature: '30' } };
    const turned = { ...withTurn({ ...FORM, asLeft: read }, half, 4, STEP, NOW), asLeft: since };
    expect(withoutLastTurn(turned).asLeft).toBe(since);
  });

  it('does not keep a superheat as settled that was read during the wait', () => {
    const once = withTurn(FORM, half, 3, STEP, NOW);
    const soon = withTurn({ ...once, asLeft: read }, half, 4, STEP, NOW + 60_000);
    const later = withTurn({ ...once, asLeft: read }, half, 4, STEP, NOW + 900_000);
    expect(soon.turns[1]?.beforeK).toBeNull();
    expect(later.turns[1]?.beforeK).toBe(4);
  });
});

describe('withReading', () => {
  it('stamps rows with the time since the first', () => {
    const first = withReading({ ...FORM.asLeft, valve: 'series' }, NOW);
    const third = withReading(withReading(first, NOW + 31_000), NOW + 95_000);
    expect(third.readings.map(({ since }) => since)).toEqual(['0:00', '0:31', '1:35']);
  });

  it('leaves the time open where nobody knows when the first was read', () => {
    const readings = [{ since: '0:00', pressure: '45', temperature: '28' }];
    const recorded = { ...FORM.asLeft, valve: 'series' as const, readings };
    expect(withReading(recorded, NOW).readings[1]?.since).toBe('');
  });
});
