import { describe, expect, it } from '@jest/globals';
import { drawJoint, type JointState } from './joint-drawing';

const STATES: readonly JointState[] = ['open', 'underWay', 'submitted', 'sentBack', 'approved', 'noSequence'];

describe('drawJoint', () => {
  it('draws every state differently without any colour', () => {
    const shapes = STATES.map((state) => {
      const { pipe, ring, fill, collar, flag, reached } = drawJoint(state, 'medium');
      return JSON.stringify({ pipe, ring, fill, collar, flag, reached });
    });
    expect(new Set(shapes).size).toBe(STATES.length);
  });

  it('gives collars to an approved joint only', () => {
    expect(STATES.filter((state) => drawJoint(state, 'large').collar !== '')).toEqual(['approved']);
  });

  it('tells submitted from under way by a flag', () => {
    expect(drawJoint('submitted', 'small').fill).toBe(drawJoint('underWay', 'small').fill);
    expect(drawJoint('submitted', 'small').flag).not.toBe('');
    expect(drawJoint('underWay', 'small').flag).toBe('');
  });

  it('offsets the two ends of a line that was sent back', () => {
    const { pipe, ring } = drawJoint('sentBack', 'medium');
    expect(ring).toBeNull();
    const [left = '', right = ''] = pipe.split('M').slice(1);
    const endOfLeft = Number(left.split(' ').at(-1));
    const startOfRight = Number(right.split('L')[0]?.split(' ')[1]);
    expect(startOfRight - endOfLeft).toBeGreaterThan(4);
  });

  it('draws the pipe as reached once work has begun', () => {
    expect(STATES.filter((state) => !drawJoint(state, 'medium').reached)).toEqual(['open', 'noSequence']);
  });
});
