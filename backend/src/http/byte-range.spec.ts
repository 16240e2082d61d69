import { describe, expect, it } from '@jest/globals';
import { byteRange } from './byte-range';

describe('byteRange', () => {
  it.each([
    [undefined, 'whole'],
    ['bytes=0-', { first: 0, last: 999 }],
    ['bytes=100-199', { first: 100, last: 199 }],
    ['bytes=900-5000', { first: 900, last: 999 }],
    ['bytes=-200', { first: 800, last: 999 }],
    ['bytes=-5000', { first: 0, last: 999 }],
    ['bytes=-0', 'unsatisfiable'],
    ['bytes=1000-', 'unsatisfiable'],
    ['bytes=5-2', 'whole'],
    ['bytes=0-1,5-6', 'whole'],
    ['bytes=-', 'whole'],
    ['lines=1-2', 'whole'],
  ] as const)('reads %s', (header, expected) => {
    expect(byteRange(header, 1000)).toEqual(expected);
  });
});
