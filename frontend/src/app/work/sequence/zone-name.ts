import { Pipe, type PipeTransform } from '@angular/core';
import type { Language } from '#shared/checklist/text';
import { readingLanguage } from '../../ui/words/reading-language';

/**
 * The short name that a time zone has at a moment, such as "MST": a time that stands alone has to say whose it is.
 *
 * @returns empty when the moment or the zone is none that the browser knows
 */
export function zoneName(moment: string, timeZone: string, language: Language): string {
  const date = new Date(moment);
  if (Number.isNaN(date.getTime())) return '';
  try {
    const parts = new Intl.DateTimeFormat(language, { timeZone, timeZoneName: 'short' }).formatToParts(date);
    return parts.find((part) => part.type === 'timeZoneName')?.value ?? '';
  } catch (error) {
    // An unknown zone: the time beside it is then in the reader's own, which needs no name.
    if (error instanceof RangeError) return '';
    throw error;
  }
}

/** `moment | appZoneName: timeZone`, for beside a time. */
@Pipe({ name: 'appZoneName', pure: false })
export class ZoneName implements PipeTransform {
  private readonly language = readingLanguage();

  transform(moment: string, timeZone: string): string {
    return zoneName(moment, timeZone, this.language());
  }
}
