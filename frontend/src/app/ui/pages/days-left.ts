import { Pipe, type PipeTransform, inject } from '@angular/core';
import { TranslocoService } from '@jsverse/transloco';
import { dayOf, daysBetween } from '../words/dates';
import { readingLanguage } from '../words/reading-language';

/** The key (scope `ui`) of the sentence for so many days to go, and its figure. */
export function daysLeftKey(days: number): { key: string; count: number } {
  if (days === 0) return { key: 'daysToOpeningToday', count: 0 };
  if (days < 0) return { key: days === -1 ? 'daysToOpeningPastOne' : 'daysToOpeningPast', count: -days };
  return { key: days === 1 ? 'daysToOpeningOne' : 'daysToOpening', count: days };
}

/** How many days there are to an opening day, in a sentence, counted on the store's calendar where its zone is known. */
@Pipe({ name: 'appDaysLeft', pure: false })
export class DaysLeft implements PipeTransform {
  private readonly transloco = inject(TranslocoService);
  private readonly language = readingLanguage();

  transform(openingDate: string, timeZone?: string): string {
    const days = daysBetween(dayOf(new Date(), timeZone), openingDate);
    const { key, count } = daysLeftKey(days);
    return this.transloco.translate(`ui.${key}`, { count }, this.language());
  }
}
