import { Pipe, type PipeTransform } from '@angular/core';
import type { Text } from '#shared/checklist/text';
import { readingLanguage } from './words/reading-language';

/**
 * Words of a template or a company in the language that is read now. Not pure: the same text reads otherwise after
 * a change of language, and looking it up costs nothing.
 */
@Pipe({ name: 'appText', pure: false })
export class TextOf implements PipeTransform {
  private readonly language = readingLanguage();

  transform(text: Text): string {
    return text[this.language()];
  }
}
