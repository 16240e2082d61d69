import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildStep, SEA_LEVEL } from '../step.fixture';

const choose = (value: string) => judge(buildStep('choose'), { kind: 'choose', value }, SEA_LEVEL);

describe('judge of a choice', () => {
  it.each([
    ['clear', 'within'],
    ['bubbles', 'outside'],
    ['noGlass', 'recorded'],
  ])('takes the outcome of the option %s from the template: %s', (value, outcome) => {
    expect(choose(value)).toMatchObject({ outcome, counts: true, doubts: [] });
  });

  it.each(['', 'Clear', 'clear ', 'constructor'])('does not count %j, which is no option', (value) => {
    expect(choose(value)).toMatchObject({
      counts: false,
      doubts: [{ kind: 'unknownOption', severity: 'refuse' }],
    });
  });
});
