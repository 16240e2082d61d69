import { CsvError, parse, type InfoRecord } from 'csv-parse/sync';
import type { ScheduleReason } from '#shared/contracts/schedule-reasons';
import { decodeText } from './decode-text';
import { countHeadings } from './find-columns';

/** Fixtures in one schedule; the largest stores have some 400. */
export const MOST_ROWS = 5000;

// Blank lines count here, so that a file of nothing but line ends is left early.
const MOST_RECORDS = 4 * MOST_ROWS;

const MOST_COLUMNS = 300;

const TABLE_OPTIONS = { record_delimiter: '\n', relax_column_count: true, relax_quotes: true };

/** One line of the table; more than one physical line when a quoted cell has line breaks. */
export interface TableRow {
  /** The physical line on which it begins. */
  readonly line: number;
  /** Trimmed, runs of white space made one space each, without invisible characters. */
  readonly cells: readonly string[];
}

export type TableReading =
  | {
      readonly ok: true;
      readonly headings: TableRow;
      /** Lines with something in them, at least one. */
      readonly rows: readonly TableRow[];
      readonly delimiter: Delimiter;
    }
  | {
      readonly ok: false;
      readonly code: 'notATable' | 'tooLarge';
      readonly row: number;
      readonly reason: ScheduleReason;
    };

const DELIMITERS = [',', ';', '\t'] as const;
type Delimiter = (typeof DELIMITERS)[number];

/** Titles and the designer's name may stand above the headings, as far down as this. */
const LINES_ABOVE_HEADINGS = 20;

/** Enough for the lines looked at, and little enough to parse once a delimiter. */
const HEAD_LENGTH = 65_536;

const refuse = (
  code: 'notATable' | 'tooLarge',
  row: number,
  reason: ScheduleReason,
): TableReading & { ok: false } => ({
  ok: false,
  code,
  row,
  reason,
});

interface ParsedRows {
  readonly rows: readonly TableRow[];
  /** Blank ones too. */
  readonly records: number;
  /** The line on which a quotation mark is opened that nothing closes. */
  readonly brokenAt: number | undefined;
}

/** White space made single; without the invisible characters that pasted text brings along. */
const tidy = (cell: string): string =>
  cell
    .replace(/\s+/g, ' ')
    .replace(/[\p{Cc}\p{Cf}]/gu, '')
    .trim();

function parseRows(text: string, delimiter: Delimiter, mostRecords: number): ParsedRows {
  const rows: TableRow[] = [];
  let records = 0;
  let linesBefore = 0;
  const take = (record: readonly string[], { lines }: Pick<InfoRecord, 'lines'>): null => {
    const cells = record.slice(0, MOST_COLUMNS + 1).map(tidy);
    if (cells.some((cell) => cell !== '')) rows.push({ line: linesBefore + 1, cells });
    linesBefore = lines;
    records += 1;
    return null;
  };
  try {
    // An inch sign in the middle of a cell is no quotation mark, hence the relaxed quotes.
    parse(text, { ...TABLE_OPTIONS, delimiter, to: mostRecords, on_record: take });
  } catch (error) {
    // With lines of any length and quotes relaxed, what is left to complain of is a quotation mark that stays open.
    if (!(error instanceof CsvError)) throw error;
    return { rows, records, brokenAt: linesBefore + 1 };
  }
  return { rows, records, brokenAt: undefined };
}

/** The delimiter and the line of headings for which the most headings are recognised. */
function findHeadings(text: string): { delimiter: Delimiter; line: number; recognised: number } {
  let best: ReturnType<typeof findHeadings> = { delimiter: ',', line: 1, recognised: 0 };
  for (const delimiter of DELIMITERS) {
    for (const { line, cells } of parseRows(text.slice(0, HEAD_LENGTH), delimiter, LINES_ABOVE_HEADINGS)
      .rows) {
      const recognised = countHeadings(cells);
      if (recognised > best.recognised) best = { delimiter, line, recognised };
    }
  }
  return best;
}

/**
 * Reads a table with headings from the bytes of a file: delimited by commas, semicolons or tabs, cells in quotation
 * marks where needed.
 *
 * @returns the headings and the lines below them, or why there is no table
 */
export function readTable(bytes: Uint8Array): TableReading {
  const decoded = decodeText(bytes);
  if (!decoded.ok) return refuse(decoded.code, 1, decoded.reason);
  const { text } = decoded;
  const { delimiter, line, recognised } = findHeadings(text);
  if (recognised === 0) {
    return refuse('notATable', 1, { code: 'noHeadings', params: {} });
  }
  const parsed = parseRows(text, delimiter, MOST_RECORDS);
  if (parsed.brokenAt !== undefined) {
    return refuse('notATable', parsed.brokenAt, { code: 'openQuotationMark', params: {} });
  }
  const [headings, ...rows] = parsed.rows.filter((row) => row.line >= line);
  if (!headings || rows.length === 0) {
    return refuse('notATable', line, { code: 'onlyHeadings', params: {} });
  }
  if (headings.cells.length > MOST_COLUMNS) {
    return refuse('tooLarge', line, { code: 'tooManyColumns', params: { upTo: MOST_COLUMNS } });
  }
  if (rows.length > MOST_ROWS || parsed.records >= MOST_RECORDS) {
    const row = rows[MOST_ROWS]?.line ?? line;
    return refuse('tooLarge', row, { code: 'tooManyRows', params: { upTo: MOST_ROWS } });
  }
  return { ok: true, headings, rows, delimiter };
}
