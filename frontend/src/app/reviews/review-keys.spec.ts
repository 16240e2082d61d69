import { describe, expect, it } from '@jest/globals';
import { reviewAction } from './review-keys';

const press = (key: string, change: Partial<KeyboardEvent> = {}) => ({
  key,
  ctrlKey: false,
  metaKey: false,
  altKey: false,
  target: document.body,
  ...change,
});

describe('reviewAction', () => {
  it.each([
    ['j', 'next'],
    ['ArrowUp', 'previous'],
    ['r', 'remark'],
    ['f', 'photo'],
    ['a', 'approve'],
    ['s', 'sendBack'],
    ['?', 'help'],
    ['x', null],
  ])('takes %s for %s', (key, action) => {
    expect(reviewAction(press(key))).toBe(action);
  });

  it('leaves letters alone while somebody writes a remark', () => {
    expect(reviewAction(press('a', { target: document.createElement('textarea') }))).toBeNull();
  });

  it('leaves the browser its shortcuts', () => {
    expect(reviewAction(press('a', { ctrlKey: true }))).toBeNull();
    expect(reviewAction(press('r', { metaKey: true }))).toBeNull();
  });
});
