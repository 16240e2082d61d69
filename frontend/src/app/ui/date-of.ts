import { Pipe, type PipeTransform } from '@angular/core';
import { formatDay } from './words/dates';
import { readingLanguage } from './words/reading-language';

/** A calendar day in the reader's language. */
@Pipe({ name: 'appDate', pure: false })
export class DateOf implements PipeTransform {
  private readonly language = readingLanguage();

  transform(day: string): string {
    return formatDay(day, this.language());
  }
}
