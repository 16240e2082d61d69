import { describe, expect, it } from '@jest/globals';
import { usualDesignation } from './designation';
import { refrigerantKey, REFRIGERANTS } from './refrigerants';

// ANSI/ASHRAE Standard 34 (from memory): 4xx and 5xx are blends with capital letters, isomers have small ones.
describe('usualDesignation', () => {
  it.each([
    ['r454c', 'R-454C'],
    [' R 454 c ', 'R-454C'],
    ['R-1233zdE', 'R-1233zdE'],
    ['R-1336mzz(Z)', 'R-1336mzz(Z)'],
    ['454C', 'R-454C'],
    ['R600A', 'R-600a'],
    ['R-1234ZE(e)', 'R-1234ze(E)'],
    ['r-1336mzz(z)', 'R-1336mzz(Z)'],
    ['R-513a', 'R-513A'],
    ['R-23', 'R-23'],
    ['CO2', 'R-744'],
    ['r448a', 'R-448A'],
    ['R-9X1', 'R-9X1'],
    ['Trial blend 7', 'Trial blend 7'],
    ['', ''],
  ])('writes %p as %p', (written, usual) => {
    expect(usualDesignation(written)).toBe(usual);
  });

  it('leaves every designation that the program has, and changes nothing the second time', () => {
    for (const designation of REFRIGERANTS.keys()) expect(usualDesignation(designation)).toBe(designation);
    expect(usualDesignation(usualDesignation('r454c'))).toBe('R-454C');
  });
});

describe('refrigerantKey', () => {
  it.each([
    ['R-9X1', '9X1'],
    [' r 9x1', '9X1'],
    ['CO2', '744'],
    ['R-1234ze(E)', '1234ZEE'],
    ['--', ''],
  ])('of %p is %p', (written, key) => {
    expect(refrigerantKey(written)).toBe(key);
  });

  it('is the same for what was written and for its usual designation', () => {
    for (const written of ['r454c', 'R600A', 'CO2', 'R-9X1'])
      expect(refrigerantKey(usualDesignation(written))).toBe(refrigerantKey(written));
  });
});
