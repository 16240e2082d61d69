import { beforeEach, describe, expect, it } from '@jest/globals';
import type { SuperheatAnswer } from '#shared/checklist/kinds/superheat';
import type { DeviceId } from '#shared/plant/ids';
import { localView } from '../sequence/local-view';
import {
  bodyOf,
  cachedOf,
  confirmStep,
  contentOf,
  PHONE,
  storedOf,
  uuid,
} from '../sequence/sequence.fixture';
import { InstrumentMemory } from './instrument-memory';
import { conditionsBefore, hadAsFound } from './superheat-before';
import { NO_INSTRUMENTS } from './superheat-typed';

const STEPS = ['a', 'b'].map((key) =>
  confirmStep(key, { kind: 'superheat', band: { lowK: 3, highK: 6 } } as never),
);
const pair = {
  pressure: { text: '45', unit: 'psig' as const },
  temperature: { text: '28', unit: 'degF' as const },
};
const answer = (more: Partial<SuperheatAnswer> = {}): SuperheatAnswer => ({
  kind: 'superheat',
  asFound: null,
  asLeft: { valve: 'steady', pair },
  conditions: ['pastDefrost', 'coilClear'],
  ...more,
});
/** Recorded at 9:00 on the phone. */
const recorded = (number: number, key: string, given = answer(), deviceId: DeviceId = PHONE) =>
  storedOf(number, bodyOf(number, contentOf(key, given), { deviceId }));
const viewOf = (...entries: ReturnType<typeof recorded>[]) => localView(cachedOf(STEPS, entries), []);
const at = (minutes: number): number => Date.parse('2026-03-02T09:00:00.000Z') + minutes * 60_000;

describe('conditionsBefore', () => {
  const view = viewOf(recorded(1, 'a'));

  it('takes over what was met at the last superheat of the circuit, for half an hour', () => {
    expect(conditionsBefore(view, PHONE, at(30))).toEqual(['pastDefrost', 'coilClear']);
    expect(conditionsBefore(view, PHONE, at(31))).toEqual([]);
  });

  it('takes nothing from another phone, whose clock may be hours off', () => {
    expect(conditionsBefore(view, uuid(9) as DeviceId, at(1))).toEqual([]);
  });

  it('takes nothing on the first coil, and nothing from the future', () => {
    expect(conditionsBefore(viewOf(), PHONE, at(1))).toEqual([]);
    expect(conditionsBefore(null, PHONE, at(1))).toEqual([]);
    expect(conditionsBefore(view, PHONE, at(-5))).toEqual([]);
  });
});

describe('hadAsFound', () => {
  it('is known from any earlier entry of the step', () => {
    const found = answer({ asFound: { valve: 'steady', pair } });
    const view = viewOf(recorded(1, 'a', found), recorded(2, 'a'), recorded(3, 'b'));
    expect(view.steps.map(hadAsFound)).toEqual([true, false]);
  });
});

describe('InstrumentMemory', () => {
  beforeEach(() => localStorage.clear());
  const mine = { gauge: 'sealed' as const, pressureAccuracy: '1', temperatureAccuracy: '0.9' };

  it('remembers for the unit system in which it was typed', () => {
    const memory = new InstrumentMemory();
    memory.keep('us', mine);
    expect(memory.read('us')).toEqual(mine);
    expect(memory.read('si')).toEqual(NO_INSTRUMENTS);
  });

  it.each(['{', '3', '{"gauge":"new","pressureAccuracy":"","temperatureAccuracy":""}'])(
    'starts afresh from %p',
    (text) => {
      localStorage.setItem('firstcold.instruments.us', text);
      expect(new InstrumentMemory().read('us')).toEqual(NO_INSTRUMENTS);
    },
  );
});
