import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildSignature, buildStep, SEA_LEVEL } from '../step.fixture';
import type { Signature } from '../signature';

const sign = (change: Partial<Signature>) =>
  judge(buildStep('signature'), { kind: 'signature', signature: buildSignature(change) }, SEA_LEVEL);

describe('judge of a signature', () => {
  it('records one that was drawn, and one that was typed', () => {
    expect(sign({})).toMatchObject({ outcome: 'recorded', counts: true });
    expect(sign({ typed: true, strokes: [] })).toMatchObject({ outcome: 'recorded', counts: true });
  });

  it('does not count an empty box', () => {
    expect(sign({ strokes: [] })).toMatchObject({
      counts: false,
      doubts: [{ kind: 'emptySignature', severity: 'refuse' }],
    });
  });
});
