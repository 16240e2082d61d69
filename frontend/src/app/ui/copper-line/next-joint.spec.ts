import { describe, expect, it } from '@jest/globals';
import { nextJoint } from './next-joint';

describe('nextJoint', () => {
  it.each([
    ['ArrowRight', 0, 1],
    ['ArrowRight', 4, 4],
    ['ArrowLeft', 3, 2],
    ['ArrowLeft', 0, 0],
    ['Home', 3, 0],
    ['End', 1, 4],
  ])('moves by %s from %i to %i of five joints', (key, from, to) => {
    expect(nextJoint(key, from, 5)).toBe(to);
  });

  it('leaves other keys and empty lines alone', () => {
    expect(nextJoint('Enter', 1, 5)).toBeNull();
    expect(nextJoint('End', 0, 0)).toBeNull();
  });
});
