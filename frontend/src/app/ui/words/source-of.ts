import { Pipe, type PipeTransform } from '@angular/core';
import { sourceInWords } from '#shared/checklist/source-words';
import { readingLanguage } from './reading-language';

/** The source of a step's criterion in the language that is read now. */
@Pipe({ name: 'appSource', pure: false })
export class SourceOf implements PipeTransform {
  private readonly language = readingLanguage();

  transform(source: string): string {
    return sourceInWords(source, this.language());
  }
}
