import type {
  LoggerGap,
  LoggerProblem,
  ReadLoggerOptions,
  UnreadableCell,
} from '#shared/refrigeration/logger/logger-file';
import { formatQuantity } from '#shared/units/format';
import type { Language } from '#shared/checklist/text';

/** Another way to read the file, which only a person can tell. */
export interface LogOffer {
  /** Of the words on its button. */
  readonly key: string;
  readonly options: ReadLoggerOptions;
}

/** One thing to know about a file that was read: words with their figures, cells to look at, other ways to read it. */
export interface LogNote {
  readonly key: string;
  readonly params: Readonly<Record<string, string | number>>;
  readonly cells: readonly UnreadableCell[];
  readonly offers: readonly LogOffer[];
}

/** As many of the unreadable cells are shown: enough to find them in the file. */
const CELLS_SHOWN = 5;
const HOUR_S = 3600;
const MINUTE_S = 60;

const COMMA_OFFERS: readonly LogOffer[] = [
  { key: 'work.log_commaDecimal', options: { decimalComma: true } },
  { key: 'work.log_commaThousands', options: { decimalComma: false } },
];

/** A time or a step of a log: hours from an hour on, minutes from a minute on. */
export function logTime(seconds: number, language: Language): string {
  const unit = seconds >= HOUR_S ? 'h' : seconds >= MINUTE_S ? 'min' : 's';
  return formatQuantity(seconds, unit, language);
}

const plain = (key: string, params: LogNote['params'] = {}): LogNote => ({
  key: `work.log_problem_${key}`,
  params,
  cells: [],
  offers: [],
});

function dateNote(problem: Extract<LoggerProblem, { kind: 'ambiguousDate' }>): LogNote {
  const other = problem.taken === 'monthFirst' ? 'dayFirst' : 'monthFirst';
  return {
    ...plain(`${problem.changesElapsed ? 'dates' : 'startDate'}_${problem.taken}`),
    offers: [{ key: `work.log_read_${other}`, options: { dateOrder: other } }],
  };
}

function gapsNote(problem: Extract<LoggerProblem, { kind: 'gaps' }>, language: Language): LogNote {
  const longest = problem.first.reduce<LoggerGap | null>(
    (most, gap) => (most && most.to - most.from >= gap.to - gap.from ? most : gap),
    null,
  );
  const time = (seconds: number): string => logTime(seconds, language);
  return plain('gaps', {
    count: problem.count,
    step: time(problem.medianStep),
    lasted: time(longest ? longest.to - longest.from : NaN),
    from: time(longest?.from ?? NaN),
  });
}

/** What a reader's problem says to a person. */
export function logNote(problem: LoggerProblem, language: Language): LogNote {
  switch (problem.kind) {
    case 'ambiguousDate':
      return dateNote(problem);
    case 'gaps':
      return gapsNote(problem, language);
    case 'unreadableCells':
      return { ...plain(problem.kind, { count: problem.count }), cells: problem.first.slice(0, CELLS_SHOWN) };
    case 'ambiguousNumbers':
      return { ...plain(problem.kind, { count: problem.count }), offers: COMMA_OFFERS };
    case 'columnWithoutNumbers':
      return plain(problem.kind, { heading: problem.heading });
    case 'hoursAndMinutes':
      return plain(problem.kind);
    default:
      return plain(problem.kind, { count: problem.count });
  }
}
