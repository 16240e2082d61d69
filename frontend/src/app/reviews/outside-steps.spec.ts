import { describe, expect, it } from '@jest/globals';
import type { StepView } from '#shared/sequences/sequence-view';
import { outsideSteps } from './outside-steps';

const view = (
  key: string,
  outcome: string,
  answer: unknown,
  judgement: unknown,
  step: object = {},
): StepView =>
  ({
    step: { key, kind: 'reading', ...step },
    fold: { outcome },
    current: { body: { content: { kind: 'answer', answer } }, server: { judgement } },
  }) as unknown as StepView;

describe('outsideSteps', () => {
  it('lists what lies outside with its value in the units of the opening, and nothing else', () => {
    const judgement = {
      figures: [{ label: 'value', value: 280, unit: 'K' }],
      limit: { low: 270, high: 275, unit: 'K', source: '' },
    };
    const options = [{ value: 'slow', label: { en: 'Slow', es: 'Lenta' } }];
    const steps = [
      view('a', 'within', { kind: 'confirm' }, null),
      view('b', 'outside', { kind: 'reading' }, judgement),
      view('c', 'outside', { kind: 'choose', value: 'slow' }, null, { kind: 'choose', options }),
    ];
    expect(outsideSteps({ steps }, 'us', 'en').map(({ number, value }) => [number, value])).toEqual([
      [2, '44.3 °F'],
      [3, 'Slow'],
    ]);
  });
});
