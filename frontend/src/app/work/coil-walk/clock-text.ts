import type { Language } from '#shared/checklist/text';
import { LOCALES } from '../../ui/words/dates';

/** Minutes and seconds of a time still to wait, begun seconds counted whole: "11:20". */
export function countdownText(seconds: number): string {
  const whole = Math.ceil(Math.max(0, seconds));
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** The time of day of a moment on the phone's own clock; the text itself when it is no moment. */
export function timeOfDay(moment: string, language: Language): string {
  const date = new Date(moment);
  if (Number.isNaN(date.getTime())) return moment;
  return new Intl.DateTimeFormat(LOCALES[language], { hour: 'numeric', minute: '2-digit' }).format(date);
}

/** Time since the first reading of a series as it stands in its box: "4:30". */
export function sinceText(seconds: number): string {
  const whole = Math.max(0, Math.round(seconds));
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/**
 * Reads such a time: minutes and seconds ("4:30"), or whole minutes ("4").
 *
 * @returns seconds; `null` when it is neither
 */
export function readSince(text: string): number | null {
  const match = /^(\d{1,4})(?::([0-5]\d))?$/.exec(text.trim());
  return match ? Number(match[1]) * 60 + Number(match[2] ?? 0) : null;
}
