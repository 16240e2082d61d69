import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildStep, SEA_LEVEL } from '../step.fixture';

const override = (phase: 'set' | 'putBack') =>
  judge(buildStep('override'), { kind: 'override', phase, remark: '' }, SEA_LEVEL);

describe('judge of an override', () => {
  it('does not count while it stands', () => {
    expect(override('set')).toMatchObject({ outcome: 'recorded', counts: false, doubts: [] });
  });

  it('counts once it is put back', () => {
    expect(override('putBack')).toMatchObject({ outcome: 'recorded', counts: true });
  });
});
