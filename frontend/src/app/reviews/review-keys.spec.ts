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
    ['n', 'queueNext'],
    ['x', null],
  ])('takes %s for %s', (key, action) => {
    expect(reviewAction(press(key))).toBe(action);
  });

  it('leaves letters alone while somebody writes a remark', () => {
    expect(reviewAction(press('a', { target: document.createElement('textarea') }))).toBeNull();
  });

  it.each(['summary', 'button', 'a', 'canvas'])('works while a %s has the focus', (tag) => {
    expect(reviewAction(press('a', { target: document.createElement(tag) }))).toBe('approve');
  });

  it('tells a check box from a text box', () => {
    const box = document.createElement('input');
    expect(reviewAction(press('a', { target: box }))).toBeNull();
    box.type = 'checkbox';
    expect(reviewAction(press('a', { target: box }))).toBe('approve');
  });

  it('leaves the browser its shortcuts', () => {
    expect(reviewAction(press('a', { ctrlKey: true }))).toBeNull();
    expect(reviewAction(press('r', { metaKey: true }))).toBeNull();
  });
});
