import { Pipe, type PipeTransform } from '@angular/core';
import { formatMoment } from './words/dates';
import { readingLanguage } from './words/reading-language';

/** A moment in the reader's language, on the clock of the zone given (the store's, where it is known). */
@Pipe({ name: 'appDateTime', pure: false })
export class DateTimeOf implements PipeTransform {
  private readonly language = readingLanguage();

  transform(moment: string, timeZone?: string): string {
    return formatMoment(moment, this.language(), timeZone);
  }
}
