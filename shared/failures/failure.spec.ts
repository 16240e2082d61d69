import { describe, expect, it } from '@jest/globals';
import { Bug, DomainFailure, FAILURE_CODES, TemporaryFailure } from './failure';
import { unreachable } from './unreachable';

describe('the failures', () => {
  it('are told apart by class and by name, and are errors with a stack', () => {
    const failures = [new DomainFailure('notFound', 'No.'), new TemporaryFailure('Later.'), new Bug('Oh.')];
    expect(failures.map((failure) => failure.name)).toEqual(['DomainFailure', 'TemporaryFailure', 'Bug']);
    for (const failure of failures) {
      expect(failure).toBeInstanceOf(Error);
      expect(failure.stack).toContain('failure.spec');
    }
    expect(failures[2]).not.toBeInstanceOf(DomainFailure);
  });

  it('have codes that differ', () => {
    expect(new Set(FAILURE_CODES).size).toBe(FAILURE_CODES.length);
  });

  it('keep the cause of what is temporary', () => {
    const cause = new Error('connection lost');
    expect(new TemporaryFailure('Later.', 2, { cause }).cause).toBe(cause);
  });
});

describe('unreachable', () => {
  it('throws a bug that shows the value', () => {
    expect(() => unreachable({ kind: 'unheardOf' } as never)).toThrow(Bug);
    expect(() => unreachable('unheardOf' as never)).toThrow('"unheardOf"');
  });
});
