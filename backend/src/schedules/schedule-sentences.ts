import type {
  ScheduleLevel,
  ScheduleReason,
  ScheduleReasonCode,
  ScheduleReasonParams,
} from '#shared/contracts/schedule-reasons';
import { UNITS, type UnitId } from '#shared/units/unit';

type Sentences = {
  readonly [Code in ScheduleReasonCode]: (params: ScheduleReasonParams[Code]) => string;
};

const LEVELS: Readonly<Record<ScheduleLevel, string>> = {
  system: 'system',
  suctionGroup: 'suction group',
  circuit: 'circuit',
  fixture: 'fixture',
};

const SAVE_AS_CSV = 'open it in the spreadsheet program, save it as CSV (UTF-8), and import that file.';

/** @returns "a", "a or b", "a, b or c" */
const either = (words: readonly string[]): string =>
  [words.slice(0, -1).join(', '), ...words.slice(-1)].filter((text) => text !== '').join(' or ');

const quote = (text: string): string => `"${text}"`;
const symbol = (unit: UnitId): string => UNITS[unit].symbol;
const symbols = (units: readonly UnitId[]): string => either(units.map(symbol));

const OF_THE_FILE = {
  fileTooLarge: ({ bytes }) =>
    `The file is larger than ${bytes / 1024 / 1024} MB; remove what is not part of the schedule and import again.`,
  excelWorkbook: () => `This is an Excel workbook (XLSX) or an archive; ${SAVE_AS_CSV}`,
  olderExcelWorkbook: () => `This is an older Excel workbook (XLS); ${SAVE_AS_CSV}`,
  pdf: () => 'This is a PDF; ask the designer for the schedule as a spreadsheet and save that as CSV.',
  picture: ({ format }) => `This is a picture (${format}); choose the schedule saved as CSV.`,
  fileEmpty: () => 'The file is empty; choose another one.',
  notText: () => 'This is no text file; choose the schedule saved as CSV.',
  noHeadings: () =>
    'No heading of a schedule was found, such as System, Circuit or Fixture tag; add a line of headings.',
  openQuotationMark: () =>
    'A quotation mark is opened on this line and never closed, so cells run together; close or remove it.',
  onlyHeadings: () => 'There are only headings; add one line for each fixture.',
  tooManyColumns: ({ upTo }) => `There are more than ${upTo} columns; remove those that are no part of it.`,
  tooManyRows: ({ upTo }) =>
    `There are more than ${upTo} lines; import one store at a time and remove blank lines.`,
  beyondLastHeading: ({ text }) =>
    `${quote(text)} stands beyond the last heading; put a text with a delimiter into quotation marks.`,
  moreProblems: ({ count }) =>
    `${count} more ${count === 1 ? 'problem follows' : 'problems follow'}; put right those listed and import again.`,
  missingColumn: ({ heading, found, moreCount }) =>
    `The column ${quote(heading)} is missing; add it. The headings found are: ` +
    `${found.map(quote).join(', ')}${moreCount > 0 ? ', …' : ''}.`,
  sameColumn: ({ other }) => `${quote(other)} is read as the same column; rename or remove one of the two.`,
} satisfies Partial<Sentences>;

const OF_A_CELL = {
  missingValue: ({ heading }) => `${heading} is missing; fill in the cell.`,
  spreadsheetError: ({ text }) =>
    `${quote(text)} is an error of the spreadsheet; put the formula right and export again.`,
  textTooLong: ({ characterCount, upTo }) =>
    `The text has ${characterCount} characters; shorten it to ${upTo}.`,
  unknownWord: ({ text, words }) =>
    `${quote(text)} is not a known word here; write one of: ${words.map(({ write }) => write).join(', ')}.`,
  notANumber: ({ text }) => `${quote(text)} is not a number; write digits only, such as 12.5.`,
  twoWaysToRead: ({ text }) =>
    `${quote(text)} can be read in two ways; write it without a thousands separator.`,
  notAWholeNumber: ({ text, lowCount, highCount }) =>
    `${quote(text)} is not a whole number from ${lowCount} to ${highCount}; correct it.`,
  outOfRange: ({ text, low, high, unit }) =>
    `${quote(text)} is out of the plausible range, ${low} ${symbol(unit)} to ${high} ${symbol(unit)}; ` +
    'check the number and its unit.',
  unknownUnit: ({ text, units }) => `The unit ${quote(text)} is not known here; write ${symbols(units)}.`,
  missingUnit: ({ units }) =>
    `The unit is missing; write it in brackets into the heading: ${symbols(units)}.`,
  twoUnits: ({ cell, heading }) =>
    `The cell says ${symbol(cell)} and its heading ${symbol(heading)}; write one of the two.`,
  unknownRefrigerant: ({ text }) =>
    `${quote(text)} is not a known refrigerant; write its full designation, such as R-448A, or enter its maker's table first.`,
} satisfies Partial<Sentences>;

const OF_WHAT_FITS_TOGETHER = {
  missingName: ({ level }) =>
    `The ${LEVELS[level]} is missing, and the line above has none to take over; fill in the cell.`,
  circuitElsewhere: ({ circuit, suctionGroup, system, row }) =>
    `The circuit ${quote(circuit)} stands in suction group ${quote(suctionGroup)} of system ${quote(system)} ` +
    `on line ${row}; give this one another code, or correct its suction group.`,
  fixtureTagTwice: ({ text, row }) =>
    `The fixture tag ${quote(text)} is used on line ${row} already; give each fixture, and each part of one on ` +
    'two circuits, its own tag.',
  rowsDisagree: ({ row, level, name }) =>
    `Line ${row} says something else about the ${LEVELS[level]} ${quote(name)}; write the same on all its lines, ` +
    'or leave this blank.',
  superheatBandEmpty: () => 'The high superheat is not above the low one; correct the band.',
  dischargeAirTooCold: () =>
    'Discharge air can not be as cold as the evaporating temperature; correct one of the two.',
  tooWarmForLow: () => 'Too warm for a low-temperature circuit; correct this or the class.',
  tooColdForMedium: () => 'Too cold for a medium-temperature circuit; correct this or the class.',
  tooColdForHigh: () => 'Too cold for a high-temperature circuit; correct this or the class.',
  colderThanSuction: () =>
    'Colder than the saturated suction temperature of its suction group; correct one of the two.',
  defrostsWithoutDefrost: () => 'There is no defrost; write 0 here, or correct the defrost type.',
  defrostWithoutDefrosts: () => 'No defrosts a day; write how many there are, or "none" as the defrost type.',
} satisfies Partial<Sentences>;

const SENTENCES: Sentences = { ...OF_THE_FILE, ...OF_A_CELL, ...OF_WHAT_FITS_TOGETHER };

/** @returns one English sentence that says what to do, for logs and for clients without words for the code */
export function sentenceOf<Code extends ScheduleReasonCode>(
  reason: Extract<ScheduleReason, { code: Code }>,
): string {
  return SENTENCES[reason.code as Code](reason.params as ScheduleReasonParams[Code]);
}
