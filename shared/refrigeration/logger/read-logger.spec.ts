import { describe, expect, it } from '@jest/globals';
import type { LoggerFile, LoggerProblem, ReadLoggerOptions } from './logger-file';
import { MOST_ROWS, readLogger } from './read-logger';

function file(text: string | Iterable<string>, options?: ReadLoggerOptions): LoggerFile {
  const result = readLogger(text, options);
  if (!result.ok) throw new Error(result.reason);
  return result;
}

function reason(text: string | Iterable<string>, options?: ReadLoggerOptions): string | undefined {
  const result = readLogger(text, options);
  return result.ok ? undefined : result.reason;
}

function problem<Kind extends LoggerProblem['kind']>(
  { problems }: LoggerFile,
  kind: Kind,
): Extract<LoggerProblem, { kind: Kind }> | undefined {
  return problems.find((one): one is Extract<LoggerProblem, { kind: Kind }> => one.kind === kind);
}

const times = (read: LoggerFile): number[] => [...read.times];
const values = (read: LoggerFile, column = 0): number[] => [...(read.columns[column]?.values ?? [])];

const PLAIN = 'Time (s),Pressure (psig),Temp [°F]\n0,55.2,27\n10,-0.4,27.5\n20,55.8,28\n';

describe('readLogger', () => {
  it('reads headings, units, times and values', () => {
    const read = file(PLAIN);
    expect(read.columns.map(({ heading, unit, readable }) => [heading, unit, readable])).toEqual([
      ['Pressure (psig)', 'psig', 3],
      ['Temp [°F]', 'degF', 3],
    ]);
    expect(times(read)).toEqual([0, 10, 20]);
    expect(values(read)).toEqual([55.2, -0.4, 55.8]);
    expect(values(read, 1)).toEqual([27, 27.5, 28]);
    expect(read).toMatchObject({ rows: 3, startText: '0', problems: [] });
  });

  it.each([
    ['a byte order mark', `\uFEFF${PLAIN}`],
    ['CRLF', PLAIN.replaceAll('\n', '\r\n')],
    ['no line end at the end', PLAIN.trimEnd()],
    ['blank lines', PLAIN.replaceAll('\n', '\n\n')],
    ['tabs', PLAIN.replaceAll(',', '\t')],
    ['bars', PLAIN.replaceAll(',', '|')],
    ['semicolons', PLAIN.replaceAll(',', ';')],
    ['semicolons and decimal commas', PLAIN.replaceAll(',', ';').replaceAll('.', ',')],
    ['tabs and decimal commas', PLAIN.replaceAll(',', '\t').replaceAll('.', ',')],
    ['quotes', PLAIN.replace(/[^,\n]+/g, '"$&"')],
    ['quoted decimal commas', PLAIN.replace(/[^,\n]+/g, (cell) => `"${cell.replace('.', ',')}"`)],
    ['a trailing delimiter', PLAIN.replaceAll('\n', ',\n')],
    ['metadata', `sep=,\nSerial,12345\n"Site: cold ""room"", 2"\nStarted 05/06/2026 10:00\n\n${PLAIN}`],
    ['a piece a character', [...PLAIN]],
    [
      'pieces that cut a CRLF',
      ['\uFEFF', PLAIN.replaceAll('\n', '\r\n').slice(0, 36), PLAIN.replaceAll('\n', '\r\n').slice(36)],
    ],
  ])('reads the same with %s', (_, text) => {
    const read = file(text);
    expect(times(read)).toEqual([0, 10, 20]);
    expect([values(read), values(read, 1)]).toEqual([
      [55.2, -0.4, 55.8],
      [27, 27.5, 28],
    ]);
    expect(read.columns.slice(0, 2).map(({ unit }) => unit)).toEqual(['psig', 'degF']);
  });

  it('reads a row of units below the headings', () => {
    const read = file('Time;Suction pressure;T line\ns;bar;°C\n0;3,5;-2\n10;3,6;-1,5');
    expect(read.columns.map(({ heading, unit }) => [heading, unit])).toEqual([
      ['Suction pressure', 'barg'],
      ['T line', 'degC'],
    ]);
    expect(times(read)).toEqual([0, 10]);
  });

  it('reads headings that are channel numbers', () => {
    const read = file('Time (s),101,102\n0,55.2,27\n10,55.4,28');
    expect(read.columns.map(({ heading }) => heading)).toEqual(['101', '102']);
    expect(read).toMatchObject({ rows: 2, problems: [] });
  });

  it('takes a row whose values are missing for a row, not for headings', () => {
    const read = file('Time (s);P (bar);T (°C)\n0;---;---\n10;3,5;-4,2\n20;3,6;-4,1');
    expect(times(read)).toEqual([0, 10, 20]);
    expect(values(read)).toEqual([NaN, 3.5, 3.6]);
    expect(read.columns.map(({ unit }) => unit)).toEqual(['barg', 'degC']);
  });

  it('reads a file without headings', () => {
    const read = file('2026-01-05 10:00:00,55.2\n2026-01-05 10:00:10,55.4');
    expect(read.columns.map(({ heading, unit }) => [heading, unit])).toEqual([['', null]]);
    expect(times(read)).toEqual([0, 10]);
  });

  it.each([
    ['2026-01-05T23:59:50', '2026-01-06T00:00:05.5', 15.5],
    ['2026-01-05T23:59:50Z', '2026-01-06T01:00:00+01:00', 10],
    ['2026/01/05 23:59', '2026/01/06 00:01', 120],
    ['2026-02-28 23:59:59', '2026-03-01 00:00:00', 1],
    ['2024-02-28 23:59:59', '2024-03-01 00:00:00', 86401],
    ['12/31/2025 11:59:00 PM', '01/01/2026 12:00:00 AM', 60],
    ['1/15/2026, 9:05 a.m.', '1/15/2026, 1:05 p. m.', 14400],
    ['15/01/2026 10:00', '16/01/2026 10:00', 86400],
    ['05.01.2026 10:00', '06.01.2026 10:00', 86400],
    ['0:00:10', '100:00:10', 360000],
    ['00:00:10.5', '00:00:11.75', 1.25],
  ])('takes from %s to %s for %d s', (first, last, expected) => {
    const read = file(`When;Suction (psig)\n${first};55.2\n${last};55.4`);
    expect(times(read)[1]).toBeCloseTo(expected, 6);
    expect(read.startText).toBe(first);
    expect(problem(read, 'ambiguousDate')).toBeUndefined();
  });

  it.each([
    ['Time (s)', 1],
    ['Elapsed (min)', 60],
    ['Tiempo (h)', 3600],
    ['Tiempo (segundos)', 1],
    ['Elapsed time [ms]', 0.001],
    ['Minutes', 60],
  ])('takes plain numbers under %j as units of %d s', (heading, each) => {
    const read = file(`No.,${heading},P (psig)\n1,0.5,55\n2,2.5,56`);
    expect(times(read)[1]).toBeCloseTo(2 * each, 9);
    expect(read.columns.map((column) => column.heading)).toEqual(['No.', 'P (psig)']);
  });

  it('takes a date beside a time', () => {
    const read = file('Date,Time,P (psig)\n01/15/2026,23:59:50,55\n01/16/2026,00:00:10,56');
    expect(times(read)).toEqual([0, 20]);
    expect(read.startText).toBe('01/15/2026 23:59:50');
    expect(read.columns).toHaveLength(1);
  });

  it('says when a date can be read both ways, and takes the order that it is told', () => {
    const text = 'Time,P (psig)\n05/06/2026 10:00,55\n06/06/2026 10:00,56';
    const us = file(text);
    expect(problem(us, 'ambiguousDate')).toEqual({
      kind: 'ambiguousDate',
      taken: 'monthFirst',
      changesElapsed: true,
    });
    expect(times(us)).toEqual([0, 31 * 86400]);
    const other = file(text, { dateOrder: 'dayFirst' });
    expect(problem(other, 'ambiguousDate')?.taken).toBe('dayFirst');
    expect(times(other)).toEqual([0, 86400]);
  });

  it('knows that one ambiguous day changes no elapsed time, and that 06/06 is not ambiguous', () => {
    const one = file('Time,P (psig)\n05/06/2026 10:00,55\n05/06/2026 10:05,56');
    expect(problem(one, 'ambiguousDate')?.changesElapsed).toBe(false);
    const same = file('Time,P (psig)\n06/06/2026 10:00,55\n06/06/2026 10:05,56');
    expect(problem(same, 'ambiguousDate')).toBeUndefined();
  });

  it('lets the dates themselves outweigh what it is told', () => {
    const read = file('Time,P (psig)\n12/06/2026 10:00,55\n13/06/2026 10:00,56', { dateOrder: 'monthFirst' });
    expect(times(read)).toEqual([0, 86400]);
    expect(read.problems).toEqual([]);
  });

  it('counts a date that the others rule out as unreadable', () => {
    const rows = ['13/06/2026 10:00', '14/06/2026 10:00', '06/15/2026 10:00', '16/06/2026 10:00'];
    const read = file(`Time,P (psig)\n${rows.map((at) => `${at},55`).join('\n')}`);
    expect(times(read)).toEqual([0, 86400, 3 * 86400]);
    expect(problem(read, 'unreadableCells')).toEqual({
      kind: 'unreadableCells',
      count: 1,
      first: [{ row: 4, heading: 'Time', text: '06/15/2026 10:00' }],
    });
  });

  it('adds a day where a clock without dates passes midnight', () => {
    const read = file('Clock,P (psig)\n23:59:50,55\n00:00:00,56\n00:00:10,57');
    expect(times(read)).toEqual([0, 10, 20]);
    expect(problem(read, 'pastMidnight')?.count).toBe(1);
  });

  it('says when "05:30" was taken as hours and minutes', () => {
    const guess = file('Time,P (psig)\n05:30,55\n05:31,56');
    expect(times(guess)).toEqual([0, 60]);
    expect(problem(guess, 'hoursAndMinutes')).toBeDefined();
    const said = file('Time (mm:ss),P (psig)\n05:30,55\n05:31,56');
    expect(times(said)).toEqual([0, 1]);
    expect(problem(said, 'hoursAndMinutes')).toBeUndefined();
  });

  it('keeps the first of repeated times, sorts, and counts both', () => {
    const read = file('Time (s),P (psig)\n20,3\n0,1\n10,2\n10,9\n30,4');
    expect(times(read)).toEqual([0, 10, 20, 30]);
    expect(values(read)).toEqual([1, 2, 3, 4]);
    expect(read.startText).toBe('0');
    expect(problem(read, 'repeatedTimes')?.count).toBe(1);
    expect(problem(read, 'unorderedTimes')?.count).toBe(3);
  });

  it('lists steps longer than five usual ones as gaps', () => {
    const at = [0, 10, 20, 30, 80, 90, 141, 150];
    const read = file(`Time (s),P (psig)\n${at.map((time) => `${time},55`).join('\n')}`);
    expect(problem(read, 'gaps')).toEqual({
      kind: 'gaps',
      count: 1,
      medianStep: 10,
      first: [{ from: 90, to: 141 }],
    });
  });

  it('lists no more than 50 gaps and 20 unreadable cells, and counts all', () => {
    const rows = Array.from(
      { length: 300 },
      (_, index) => `${index + Math.floor(index / 4) * 100},bad ${index}`,
    );
    const read = file(`Time (s),P (psig)\n-10,1\n${rows.join('\n')}`);
    expect(problem(read, 'gaps')?.count).toBe(75);
    expect(problem(read, 'gaps')?.first).toHaveLength(50);
    expect(problem(read, 'unreadableCells')?.count).toBe(300);
    expect(problem(read, 'unreadableCells')?.first).toHaveLength(20);
  });

  it('tells unreadable cells from empty ones, with their lines', () => {
    const read = file(
      'Logger 4\nTime (s),P (psig),State\n0,55,on\n10,O.L,on\n20,,off\nnever,57,on\n30,58,on\nEnd',
    );
    expect(values(read)).toEqual([55, NaN, NaN, 58]);
    expect(read.columns[0]?.readable).toBe(2);
    expect(problem(read, 'unreadableCells')).toEqual({
      kind: 'unreadableCells',
      count: 3,
      first: [
        { row: 4, heading: 'P (psig)', text: 'O.L' },
        { row: 6, heading: 'Time (s)', text: 'never' },
        { row: 8, heading: 'Time (s)', text: 'End' },
      ],
    });
    expect(problem(read, 'emptyCells')?.count).toBe(1);
    expect(problem(read, 'columnWithoutNumbers')?.heading).toBe('State');
  });

  it('leaves "1,234" unread until somebody says what it is', () => {
    const text = 'Time (s);P (kPa)\n0;1,234\n10;1,235';
    expect(reason(text)).toBe('tooShort');
    expect(values(file(text, { decimalComma: true }))).toEqual([1.234, 1.235]);
    expect(values(file(text, { decimalComma: false }))).toEqual([1234, 1235]);
    const shown = file('Time (s);P (kPa)\n0;1,234\n10;1,25');
    expect(values(shown)).toEqual([1.234, 1.25]);
    const later = file('Time (s);P (kPa)\n0;1\n10;1,234\n20;2');
    expect(values(later)).toEqual([1, NaN, 2]);
    expect(problem(later, 'ambiguousNumbers')?.count).toBe(1);
  });

  it('reads 64 columns and says how many more there were', () => {
    const row = (start: string) => [start, ...Array.from({ length: 70 }, (_, index) => index)].join(',');
    const heading = ['Time (s)', ...Array.from({ length: 70 }, (_, index) => `T${index} (°F)`)].join(',');
    const read = file([heading, row('0'), row('10')].join('\n'));
    expect(read.columns).toHaveLength(64);
    expect(problem(read, 'columnsLeftOut')?.count).toBe(6);
  });

  it.each([
    ['', 'tooShort'],
    ['  \n\n', 'tooShort'],
    ['Time (s),P (psig)\n', 'tooShort'],
    ['Time (s),P (psig)\n0,55', 'tooShort'],
    ['Time (s),P (psig)\n0,55\n0,56', 'tooShort'],
    ['Dear reader,\nthis is a letter.\nNothing else.', 'tooShort'],
    ['55.2\n55.3\n55.4', 'noTimeColumn'],
    ['P (psig),T (°F)\n55,27\n56,28', 'noTimeColumn'],
    ['Date,P (psig)\n2026-01-05,55\n2026-01-06,56', 'noTimeColumn'],
    ['Time,P (psig)\n0,55\n1,56', 'noTimeUnit'],
    ['0,55\n1,56', 'noTimeUnit'],
    ['Time (s),P\n0,55\n1,\0', 'notText'],
    ['\u0001\u0002\u0003PK\u0004', 'notText'],
    ['\uFFFD\uFFFDJFIF\uFFFD', 'notText'],
  ])('refuses %j: %s', (text, expected) => {
    expect(reason(text)).toBe(expected);
  });

  it('refuses binary that begins later', () => {
    expect(reason([PLAIN.repeat(400), 'a\0b'])).toBe('notText');
    expect(reason(Array.from({ length: 40 }, () => 'x'.repeat(50_000)))).toBe('notText');
  });

  it('takes the unit of plain numbers that it is told', () => {
    expect(times(file('Time,P (psig)\n0,55\n1,56', { elapsedUnit: 'min' }))).toEqual([0, 60]);
    expect(times(file('0,55\n1,56', { elapsedUnit: 's' }))).toEqual([0, 1]);
  });

  it('refuses more rows than it is told', () => {
    expect(file(PLAIN, { mostRows: 3 }).rows).toBe(3);
    expect(reason(PLAIN, { mostRows: 2 })).toBe('tooLong');
    const long = Array.from({ length: 700 }, (_, index) => `${index},5`).join('\n');
    expect(file(`Time (s),P (psig)\n${long}`, { mostRows: 700 }).rows).toBe(700);
    expect(reason(`Time (s),P (psig)\n${long}`, { mostRows: 699 })).toBe('tooLong');
  });

  it('refuses more than a million rows unless told otherwise', () => {
    const piece = '1,5\n'.repeat(10_000);
    function* pieces(): Generator<string> {
      yield 'Time (s),P (psig)\n';
      for (let index = 0; index < MOST_ROWS / 10_000; index++) yield piece;
      yield '2,5\n';
    }
    expect(MOST_ROWS).toBe(1_000_000);
    expect(reason(pieces())).toBe('tooLong');
  }, 60_000);
});
