import { describe, expect, it } from '@jest/globals';
import { entryIdSchema, sha256Schema } from './ids';

describe('entryIdSchema', () => {
  it('takes the UUIDv7 that a phone makes', () => {
    expect(entryIdSchema.safeParse('01890a5d-ac96-774b-bcce-b302099a8057').success).toBe(true);
  });

  it('refuses the same UUID in capitals: an id that can be written in two ways is two keys', () => {
    expect(entryIdSchema.safeParse('01890A5D-AC96-774B-BCCE-B302099A8057').success).toBe(false);
  });

  it.each(['', '1', '01890a5dac96774bbcceb302099a8057', "01890a5d-ac96-774b-bcce-b302099a805' OR 1", null])(
    'refuses %j',
    (id) => {
      expect(entryIdSchema.safeParse(id).success).toBe(false);
    },
  );
});

describe('sha256Schema', () => {
  it('takes 64 lower-case hexadecimal digits and nothing around them', () => {
    expect(sha256Schema.safeParse('0123456789abcdef'.repeat(4)).success).toBe(true);
    for (const text of [
      'A'.repeat(64),
      'a'.repeat(63),
      'a'.repeat(65),
      `${'a'.repeat(64)}\n`,
      '../etc/passwd',
    ]) {
      expect(sha256Schema.safeParse(text).success).toBe(false);
    }
  });
});
