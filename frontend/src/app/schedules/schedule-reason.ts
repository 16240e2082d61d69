import type { Language } from '#shared/checklist/text';
import type { ScheduleReason } from '#shared/contracts/schedule-reasons';
import { UNITS, type UnitId } from '#shared/units/unit';
import { countedKey } from '../ui/words/counted';
import { LOCALES } from '../ui/words/dates';

type Parameters = Readonly<Record<string, string | number>>;

/** Translates one key with its parameters into the language that is read. */
export type Say = (key: string, parameters?: Parameters) => string;

const BYTES_PER_MEGABYTE = 1024 * 1024;

const symbol = (unit: UnitId): string => UNITS[unit].symbol;

const either = (words: readonly string[], language: Language): string =>
  new Intl.ListFormat(LOCALES[language], { type: 'disjunction' }).format(words);

const withUnit = (value: number, unit: UnitId, language: Language): string =>
  `${new Intl.NumberFormat(LOCALES[language], { maximumFractionDigits: 6 }).format(value)} ${symbol(unit)}`;

/** What stands in the file stays as it is there; all else becomes words of the language that is read. */
function parametersOf(reason: ScheduleReason, say: Say, language: Language): Parameters {
  switch (reason.code) {
    case 'fileTooLarge':
      return { megabytes: reason.params.bytes / BYTES_PER_MEGABYTE };
    case 'missingColumn':
    case 'missingValue': {
      const { column, heading } = reason.params;
      return { column: say(`schedules.needed_${column}`, { heading }) };
    }
    case 'unknownWord': {
      const words = reason.params.words.map(({ word, write }) => say(`schedules.word_${word}`, { write }));
      return { text: reason.params.text, words: either(words, language) };
    }
    case 'outOfRange': {
      const { text, low, high, unit } = reason.params;
      return { text, low: withUnit(low, unit, language), high: withUnit(high, unit, language) };
    }
    case 'unknownUnit':
      return { text: reason.params.text, units: either(reason.params.units.map(symbol), language) };
    case 'missingUnit':
      return { units: either(reason.params.units.map(symbol), language) };
    case 'twoUnits':
      return { cell: symbol(reason.params.cell), heading: symbol(reason.params.heading) };
    case 'missingName':
      return { level: say(`schedules.level_${reason.params.level}`) };
    case 'rowsDisagree':
      return { ...reason.params, level: say(`schedules.level_${reason.params.level}`) };
    default:
      return reason.params;
  }
}

/** @returns why a row can't be used, as one sentence that says what to do */
export function reasonInWords(reason: ScheduleReason, say: Say, language: Language): string {
  const key = `schedules.reason_${reason.code}`;
  const parameters = Object.fromEntries(
    Object.entries(parametersOf(reason, say, language)).map(([name, value]) => [
      name,
      typeof value === 'string' ? value : value,
    ]),
  );
  return reason.code === 'moreProblems'
    ? say(countedKey(key, reason.params.count), parameters)
    : say(key, parameters);
}

/** @returns the headings that the file has, each in quotation marks; `null` where no column is missing */
export function headingsInWords(reasons: readonly ScheduleReason[], say: Say): string | null {
  // Each missing column names the same ones.
  const missing = reasons.find((reason) => reason.code === 'missingColumn');
  if (!missing) return null;
  const { found, moreCount } = missing.params;
  const headings = found.map((text) => say('schedules.quoted', { text: text }));
  return [...headings, ...(moreCount > 0 ? ['…'] : [])].join(', ');
}
