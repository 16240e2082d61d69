import { describe, expect, it } from '@jest/globals';
import { PACKAGE_FAILURES } from '#shared/contracts/packages';
import { TemporaryFailure } from '#shared/failures/failure';
import { packageFailureOf, storedPackageFailure } from './package-failure';

describe('packageFailureOf', () => {
  it.each([
    [new TemporaryFailure('The store does not answer'), 'temporary'],
    [Object.assign(new Error('no space left on device'), { code: 'ENOSPC' }), 'diskFull'],
    [new SyntaxError('Unexpected token'), 'bug'],
    ['thrown by somebody else', 'bug'],
    [undefined, 'bug'],
  ])('takes %p for %s', (error, code) => {
    expect(packageFailureOf(error)).toBe(code);
  });
});

describe('storedPackageFailure', () => {
  it('reads back every code, and takes words of an older row for a bug', () => {
    expect(PACKAGE_FAILURES.map(storedPackageFailure)).toEqual([...PACKAGE_FAILURES]);
    expect(storedPackageFailure('Unexpected token o in JSON')).toBe('bug');
    expect(storedPackageFailure(null)).toBeNull();
  });
});
