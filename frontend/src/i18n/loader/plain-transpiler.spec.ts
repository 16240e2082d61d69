import { describe, expect, it } from '@jest/globals';
import { PlainTranspiler } from './plain-transpiler';

const fill = (value: unknown, params?: Record<string, unknown>): unknown =>
  new PlainTranspiler().transpile({ value, ...(params ? { params } : {}) });

describe('PlainTranspiler', () => {
  it('fills each placeholder, however it is spaced', () => {
    expect(fill('{{a}} of {{ b }}, {{a}}', { a: 1, b: 'two' })).toBe('1 of two, 1');
  });

  it('puts in what people wrote as it is, braces and dollar signs too', () => {
    expect(fill('Case {{tag}} is done', { tag: '{{tag}} $& {{other}}' })).toBe(
      'Case {{tag}} $& {{other}} is done',
    );
  });

  it('leaves a place empty that nobody gave', () => {
    expect(fill('So {{many}} left', {})).toBe('So  left');
    expect(fill('So {{many}} left')).toBe('So  left');
  });

  it('leaves alone what is no phrase', () => {
    expect(fill({ a: 1 })).toEqual({ a: 1 });
    expect(fill('plain')).toBe('plain');
  });
});
