import { describe, expect, it } from '@jest/globals';
import { ENTRY_REFUSALS, entryResultSchema } from '#shared/contracts/sequences';
import { FAILURE_CODES } from '#shared/failures/failure';
import { WORDS as EN } from '../../../i18n/loader/en';
import { WORDS as ES } from '../../../i18n/loader/es';
import { refusalWords } from './refusal-words';

const LANGUAGES = [EN, ES] as unknown as readonly Record<string, Record<string, string>>[];

function expectWords(key: string): void {
  const [scope = '', name = ''] = key.split('.');
  for (const words of LANGUAGES) expect(words[scope]?.[name]).toMatch(/\.$/);
}

describe('refusalWords', () => {
  it.each(ENTRY_REFUSALS)('has words for %s in both languages', (code) => {
    const { key } = refusalWords({ code, params: {} });
    expect(key).toBe(`work.refusal_${code}`);
    expectWords(key);
  });

  it.each(FAILURE_CODES)('has words in both languages for a call refused as %s', (failure) => {
    const { key } = refusalWords({ code: 'callRefused', params: { failure } });
    expect(key).toBe(`ui.failure_${failure}`);
    expectWords(key);
  });

  it('names the field that is not as documented', () => {
    const words = refusalWords({ code: 'notAnEntry', params: { path: 'content.answer' } });
    expect(words).toEqual({ key: 'work.refusal_notAnEntryAt', params: { path: 'content.answer' } });
    expectWords(words.key);
  });

  it.each([
    ['a sentence that an earlier version kept', 'There is no such sequence for you.'],
    ['nothing', null],
    ['a code of another version', { code: 'newerCode', params: {} } as never],
  ])('takes %s for unknown', (_what, reason) => {
    expect(refusalWords(reason).key).toBe('work.refusal_unknown');
  });
});

describe('a refusal of another version', () => {
  it.each(['There is no such sequence for you.', { code: 'newerCode', params: {} }])(
    'is read as unknown: %j',
    (reason) => {
      const result = entryResultSchema.parse({ result: 'refused', id: null, reason, message: 'No.' });
      expect(result).toMatchObject({ reason: { code: 'unknown', params: {} } });
    },
  );
});
