import { Pipe, type PipeTransform } from '@angular/core';
import type { DoubtKind } from '#shared/checklist/judgement';
import { DOUBT_WORDS } from '#shared/checklist/words/doubt-words';
import { figureWords } from '#shared/checklist/words/figure-words';
import { FORMULA_WORDS } from '#shared/checklist/words/formula-words';
import { VERDICT_WORDS } from '#shared/checklist/words/verdict-words';
import type { Text } from '#shared/checklist/text';
import { readingLanguage } from './reading-language';

export type JudgedWord = 'doubt' | 'figure' | 'formula' | 'verdict';

/**
 * The words of a code that a judgement carries. They are not among the screens' own words: the package prints the same.
 *
 * @returns the code itself where it has no words here, as one of a newer server's
 */
export function judgedWords(code: string, of: JudgedWord): Text {
  const words =
    of === 'doubt'
      ? DOUBT_WORDS[code as DoubtKind]
      : of === 'figure'
        ? figureWords(code)
        : of === 'formula'
          ? FORMULA_WORDS[code]
          : VERDICT_WORDS[code];
  return words ?? { en: code, es: code };
}

/** A judgement's code in the language that is read now. Not pure: it reads otherwise after a change of language. */
@Pipe({ name: 'appJudged', pure: false })
export class JudgedOf implements PipeTransform {
  private readonly language = readingLanguage();

  transform(code: string, of: JudgedWord): string {
    return judgedWords(code, of)[this.language()];
  }
}
