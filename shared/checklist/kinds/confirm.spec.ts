import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildStep, SEA_LEVEL } from '../step.fixture';
import { confirmAnswerSchema } from './confirm';

describe('judge of a confirmation', () => {
  it('records it and counts it', () => {
    const judgement = judge(buildStep('confirm'), { kind: 'confirm', confirmed: true }, SEA_LEVEL);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: true, doubts: [] });
  });

  it('has no form for a confirmation of the opposite', () => {
    expect(confirmAnswerSchema.safeParse({ kind: 'confirm', confirmed: false }).success).toBe(false);
  });
});
