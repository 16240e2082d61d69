import { UNITS, type UnitId } from '../../units/unit';
import { cellForm, type CellForm, type FoundRows } from './find-rows';
import { headingQuantity } from './heading-unit';
import type { ClockStyle } from './clock-time';
import type { ReadLoggerOptions } from './logger-file';

/** Where a row's time stands, and how it is written. */
export type TimeSource =
  | { readonly kind: 'dateTime'; readonly columns: readonly [number] }
  | { readonly kind: 'dateAndClock'; readonly columns: readonly [date: number, clock: number] }
  | {
      readonly kind: 'clock';
      readonly columns: readonly [number];
      readonly style: ClockStyle;
      /** "05:30" without a word about what the two parts are. */
      readonly isGuess: boolean;
    }
  | { readonly kind: 'elapsed'; readonly columns: readonly [number]; readonly secondsEach: number };

export type TimeSourceResult = TimeSource | 'noTimeColumn' | 'noTimeUnit';

const FORMS: readonly CellForm[] = ['dateTime', 'date', 'clock', 'number', 'words', 'empty'];

/** The form that most of a column's cells have; empty cells don't count unless all are. */
function formOf(rows: FoundRows['rows'], column: number): CellForm {
  const counts = new Map<CellForm, number>();
  for (const cells of rows) {
    const form = cellForm(cells[column] ?? '');
    if (form !== 'empty') counts.set(form, (counts.get(form) ?? 0) + 1);
  }
  let best: CellForm = 'empty';
  for (const form of FORMS) if ((counts.get(form) ?? 0) > (counts.get(best) ?? 0)) best = form;
  return best;
}

function clockSource(rows: FoundRows['rows'], column: number, heading: string): TimeSource {
  const first = rows.find((cells) => cellForm(cells[column] ?? '') === 'clock')?.[column] ?? '';
  const hasTwoParts = first.split(':').length === 2;
  const isMinutes = /\bm{1,2}:s{1,2}\b/i.test(heading);
  const saysHours = /\bh{1,2}:m{1,2}\b/i.test(heading);
  return {
    kind: 'clock',
    columns: [column],
    style: hasTwoParts && isMinutes ? 'minutes' : 'elapsed',
    isGuess: hasTwoParts && !isMinutes && !saysHours,
  };
}

/** Seconds in one unit of a column of plain numbers; undefined when its heading names no unit of time. */
function secondsEach(heading: string, unit: UnitId | null): number | undefined {
  if (unit !== null && UNITS[unit].dimension === 'duration') return UNITS[unit].factor;
  return /\b(?:ms|msec|milliseconds?|milisegundos?)\b/i.test(heading) ? 0.001 : undefined;
}

function elapsedSource(
  found: FoundRows,
  units: readonly (UnitId | null)[],
  forms: readonly CellForm[],
  options: ReadLoggerOptions,
): TimeSourceResult {
  const { headings } = found;
  const numbers = forms.flatMap((form, column) => (form === 'number' ? [column] : []));
  const each = (column: number) => secondsEach(headings[column] ?? '', units[column] ?? null);
  const isTime = (column: number) => headingQuantity(headings[column] ?? '') === 'time';
  const said =
    numbers.find((column) => isTime(column) && each(column) !== undefined) ??
    numbers.find((column) => each(column) !== undefined);
  if (said !== undefined) return { kind: 'elapsed', columns: [said], secondsEach: each(said) ?? NaN };
  const hasHeadings = headings.some((heading) => heading !== '');
  const maybe = hasHeadings ? numbers.find(isTime) : numbers[0];
  if (maybe === undefined) return 'noTimeColumn';
  if (options.elapsedUnit === undefined) return 'noTimeUnit';
  return { kind: 'elapsed', columns: [maybe], secondsEach: UNITS[options.elapsedUnit].factor };
}

/**
 * Which column is the time: a date with a time, else a date beside a time, else a clock, else plain numbers whose heading
 * says that they are seconds, minutes or hours.
 *
 * @param found the table's rows and headings
 * @param units one for each heading
 * @param options what a person said about plain numbers
 * @returns the column and its form, or why there is none
 */
export function timeSource(
  found: FoundRows,
  units: readonly (UnitId | null)[],
  options: ReadLoggerOptions,
): TimeSourceResult {
  const forms = found.headings.map((_, column) => formOf(found.rows, column));
  const dateTime = forms.indexOf('dateTime');
  if (dateTime !== -1) return { kind: 'dateTime', columns: [dateTime] };
  const date = forms.indexOf('date');
  const clock = forms.indexOf('clock');
  if (date !== -1 && clock !== -1) return { kind: 'dateAndClock', columns: [date, clock] };
  if (clock !== -1) return clockSource(found.rows, clock, found.headings[clock] ?? '');
  return elapsedSource(found, units, forms, options);
}
