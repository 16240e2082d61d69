import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildStep, SEA_LEVEL } from '../step.fixture';
import { noteAnswerSchema } from './note';

const note = (text: string) => judge(buildStep('note'), { kind: 'note', text }, SEA_LEVEL);

describe('judge of a note', () => {
  it('records words', () => {
    expect(note('Drain pan reseated.')).toMatchObject({ outcome: 'recorded', counts: true });
  });

  it.each(['', '   ', '\n\t'])('does not count %j, which says nothing', (text) => {
    expect(note(text)).toMatchObject({ counts: false, doubts: [{ kind: 'empty', severity: 'refuse' }] });
  });

  it('bounds its length', () => {
    expect(noteAnswerSchema.safeParse({ kind: 'note', text: 'x'.repeat(4000) }).success).toBe(true);
    expect(noteAnswerSchema.safeParse({ kind: 'note', text: 'x'.repeat(4001) }).success).toBe(false);
  });
});
