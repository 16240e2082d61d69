import { describe, expect, it } from '@jest/globals';
import { DOCUMENT_WORDS } from './document-words';

/** Paths of all words, with the number of parts that a phrase takes. */
function pathsOf(value: unknown, path = ''): string[] {
  if (typeof value === 'function') return [`${path}(${value.length})`];
  if (typeof value !== 'object' || value === null) return [path];
  return Object.entries(value)
    .flatMap(([key, inner]) => pathsOf(inner, `${path}.${key}`))
    .sort();
}

function textsOf(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  if (typeof value === 'function') return [String((value as (...parts: string[]) => unknown)('1', '2', '3'))];
  return Object.values(value as object).flatMap(textsOf);
}

describe('DOCUMENT_WORDS', () => {
  it('has the same keys and phrases in both languages', () => {
    expect(pathsOf(DOCUMENT_WORDS.es)).toEqual(pathsOf(DOCUMENT_WORDS.en));
  });
  it('leaves no word empty', () => {
    for (const words of Object.values(DOCUMENT_WORDS))
      expect(textsOf(words).filter((text) => text.trim() === '')).toEqual([]);
  });
  it('is translated, not copied', () => {
    const english = textsOf(DOCUMENT_WORDS.en);
    const same = textsOf(DOCUMENT_WORDS.es).filter(
      (text, index) => text === english[index] && /[a-z]{4}/.test(text),
    );
    expect(same).toEqual(['Control']);
  });
});
