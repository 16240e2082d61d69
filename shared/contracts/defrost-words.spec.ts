import { describe, expect, it } from '@jest/globals';
import { checkDefrostPlan } from '../refrigeration/defrost/check-defrost-plan';
import { at, circuit, freeRules, MINUTE_S } from '../refrigeration/defrost/defrost.fixture';
import {
  blockingInWords,
  breachInWords,
  clockText,
  noteInWords,
  percentText,
  type DefrostSpeech,
} from './defrost-words';

const speech = (change: Partial<DefrostSpeech> = {}): DefrostSpeech => ({
  language: 'en',
  unitSystem: 'us',
  rules: { leastRunningLoadForHotGasW: null },
  codeOf: (id) => id.toUpperCase(),
  ...change,
});

describe('breachInWords', () => {
  it('says when, which circuits, the value and the limit, in both languages', () => {
    const rules = freeRules({ leastGapBetweenStartsS: 15 * MINUTE_S });
    const check = checkDefrostPlan([circuit('a1'), circuit('a2')], rules, [
      { circuitId: 'a1', startsS: [at(6)] },
      { circuitId: 'a2', startsS: [at(6, 5)] },
    ]);
    const [breach] = check.ok ? check.breaches : [];
    expect(breach && breachInWords(breach, speech())).toBe(
      '06:05: A1, A2 start 5 min apart, at least 15 min is asked.',
    );
    expect(breach && breachInWords(breach, speech({ language: 'es' }))).toBe(
      '06:05: A1, A2 inician con 5 min de diferencia; se pide al menos 15 min.',
    );
  });

  it('writes shares in percent, heaters in kilowatts and a running load as it was asked for', () => {
    const common = { circuitIds: ['a1'], atS: 0 };
    expect(breachInWords({ ...common, rule: 'shareOfLoad', value: 0.4, limit: 0.25 }, speech())).toBe(
      '00:00: 40 % of the suction group is in defrost, 25 % is allowed (A1).',
    );
    expect(breachInWords({ ...common, rule: 'heaterDemand', value: 12_500, limit: 9000 }, speech())).toBe(
      '00:00: heaters draw 12.50 kW, 9.00 kW is allowed (A1).',
    );
    const running = { ...common, rule: 'runningLoadForHotGas' } as const;
    const inWatts = speech({ unitSystem: 'si', rules: { leastRunningLoadForHotGasW: 5000 } });
    expect(breachInWords({ ...running, value: 4000, limit: 5000 }, inWatts)).toContain('4000 W');
    expect(breachInWords({ ...running, value: 0.5, limit: 0.6 }, inWatts)).toContain('50 %');
  });

  it('says that heaters are unknown where there is no value', () => {
    const breach = { rule: 'heaterDemand', circuitIds: ['a1'], atS: 0, value: null, limit: 9000 } as const;
    expect(breachInWords(breach, speech())).toMatch(/nobody has said what the heaters of A1 draw/);
  });

  it('leaves a code alone that looks like a place to fill', () => {
    const breach = { rule: 'sharedBox', circuitIds: ['x'], atS: 0, value: null, limit: null } as const;
    expect(breachInWords(breach, speech({ codeOf: () => '{limit}' }))).toContain('{limit} feed one');
  });
});

describe('noteInWords and blockingInWords', () => {
  it('are sentences with codes', () => {
    const note = { note: 'aloneOverShare', circuitIds: ['a1'], atS: 0, value: 1 / 3, limit: 0.25 } as const;
    expect(noteInWords(note, speech())).toBe(
      'A1 alone is 33.3 % of its suction group, more than 25 %: it defrosts by itself.',
    );
    expect(
      blockingInWords({ rule: 'quietHours', circuitIds: ['a1', 'a2'], onlyWith: ['shareOfLoad'] }, speech()),
    ).toBe('Quiet hours: A1, A2 (only together with Share of load in defrost)');
  });
});

describe('clockText', () => {
  it.each([
    [0, '00:00'],
    [21_900, '06:05'],
    [86_399, '23:59'],
    [86_400, '24:00'],
    [null, '—'],
    [Number.NaN, '—'],
  ])('writes %p as %s', (atS, text) => {
    expect(clockText(atS)).toBe(text);
  });
});

describe('percentText', () => {
  it('has a decimal only where there is one to tell', () => {
    expect([percentText(0.25, 'en'), percentText(1 / 3, 'en')]).toEqual(['25 %', '33.3 %']);
  });
});
