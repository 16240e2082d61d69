import { Writable } from 'node:stream';
import { describe, expect, it } from '@jest/globals';
import { createLogger } from './logger';

describe('createLogger', () => {
  it('writes an error with its message and code, without the statement and its values', () => {
    const lines: string[] = [];
    const stream = new Writable({
      write(chunk: Buffer, _encoding, done) {
        lines.push(chunk.toString('utf8'));
        done();
      },
    });
    const error = Object.assign(new Error('Duplicate entry'), {
      code: 'ER_DUP_ENTRY',
      query: 'INSERT INTO person …',
      parameters: ['$argon2id$secret'],
      driverError: { sql: "INSERT … '$argon2id$secret'" },
    });
    createLogger('info', stream).error({ err: error }, 'failed');
    const line = JSON.parse(lines[0] ?? '{}');
    expect(line).toMatchObject({ msg: 'failed', err: { message: 'Duplicate entry', code: 'ER_DUP_ENTRY' } });
    expect(lines[0]).not.toContain('argon2id');
  });
});
