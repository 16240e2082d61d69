import * as z from 'zod/mini';
import {
  CONTROLS,
  DEFROST_TYPES,
  EVAPORATING_BASES,
  FEEDS,
  FIXTURE_KINDS,
  SYSTEM_KINDS,
  TEMPERATURE_CLASSES,
  VALVE_KINDS,
} from '../plant/words';
import { UNITS, type UnitId } from '../units/unit';

const UNIT_IDS = Object.keys(UNITS) as [UnitId, ...UnitId[]];

/** The columns without which no schedule is read: what a problem can say is missing. */
export const NEEDED_COLUMN_IDS = [
  'system',
  'refrigerant',
  'suctionGroup',
  'circuit',
  'temperatureClass',
  'fixtureTag',
  'evaporatingTemperature',
  'dischargeAirTemperature',
  'superheatLow',
  'superheatHigh',
] as const;
export type NeededColumnId = (typeof NEEDED_COLUMN_IDS)[number];

/** What a line of a schedule speaks of. */
export const SCHEDULE_LEVELS = ['system', 'suctionGroup', 'circuit', 'fixture'] as const;
export type ScheduleLevel = (typeof SCHEDULE_LEVELS)[number];

/** The words that cells of closed sets can say. */
export const SCHEDULE_WORDS = [
  ...TEMPERATURE_CLASSES,
  ...SYSTEM_KINDS,
  ...FEEDS,
  ...CONTROLS,
  ...DEFROST_TYPES,
  ...FIXTURE_KINDS,
  ...VALVE_KINDS,
  ...EVAPORATING_BASES,
] as const;
export type ScheduleWord = (typeof SCHEDULE_WORDS)[number];

/** What the file says, verbatim, cut where it is long. */
const quoted = z.string();
const unit = z.enum(UNIT_IDS);
/** A needed column, and its heading as it has to be written in the file, in whatever language the screen is. */
const column = { column: z.enum(NEEDED_COLUMN_IDS), heading: z.string() };

const reason = <const Code extends string, Params extends z.core.$ZodShape>(code: Code, params: Params) =>
  z.object({ code: z.literal(code), params: z.object(params) });

const REASONS = [
  // The file.
  reason('fileTooLarge', { bytes: z.int() }),
  reason('excelWorkbook', {}),
  reason('olderExcelWorkbook', {}),
  reason('pdf', {}),
  reason('picture', { format: z.enum(['PNG', 'JPEG']) }),
  reason('fileEmpty', {}),
  reason('notText', {}),
  // The table.
  reason('noHeadings', {}),
  reason('openQuotationMark', {}),
  reason('onlyHeadings', {}),
  reason('tooManyColumns', { upTo: z.int() }),
  reason('tooManyRows', { upTo: z.int() }),
  reason('beyondLastHeading', { text: quoted }),
  reason('moreProblems', { count: z.int() }),
  // The headings. `found` are those that the file has, `moreCount` how many there are beyond these.
  reason('missingColumn', { ...column, found: z.array(quoted), moreCount: z.int() }),
  reason('sameColumn', { other: quoted }),
  // One cell.
  reason('missingValue', column),
  reason('spreadsheetError', { text: quoted }),
  reason('textTooLong', { characterCount: z.int(), upTo: z.int() }),
  /** `write`: how a word is written in the file, in whatever language the screen is. */
  reason('unknownWord', {
    text: quoted,
    words: z.array(z.object({ word: z.enum(SCHEDULE_WORDS), write: z.string() })),
  }),
  reason('notANumber', { text: quoted }),
  reason('twoWaysToRead', { text: quoted }),
  reason('notAWholeNumber', { text: quoted, lowCount: z.int(), highCount: z.int() }),
  reason('outOfRange', { text: quoted, low: z.number(), high: z.number(), unit }),
  reason('unknownUnit', { text: quoted, units: z.array(unit) }),
  reason('missingUnit', { units: z.array(unit) }),
  reason('twoUnits', { cell: unit, heading: unit }),
  reason('unknownRefrigerant', { text: quoted }),
  // How lines fit together.
  reason('missingName', { level: z.enum(SCHEDULE_LEVELS) }),
  reason('circuitElsewhere', { circuit: quoted, suctionGroup: quoted, system: quoted, row: z.int() }),
  reason('fixtureTagTwice', { text: quoted, row: z.int() }),
  reason('rowsDisagree', { row: z.int(), level: z.enum(SCHEDULE_LEVELS), name: quoted }),
  // How values fit together.
  reason('superheatBandEmpty', {}),
  reason('dischargeAirTooCold', {}),
  reason('tooWarmForLow', {}),
  reason('tooColdForMedium', {}),
  reason('tooColdForHigh', {}),
  reason('colderThanSuction', {}),
  reason('defrostsWithoutDefrost', {}),
  reason('defrostWithoutDefrosts', {}),
] as const;

/** Why something in a schedule can't be used: a code that screens translate, with what it is about. */
export const scheduleReasonSchema = z.discriminatedUnion('code', REASONS);
export type ScheduleReason = z.infer<typeof scheduleReasonSchema>;
export type ScheduleReasonCode = ScheduleReason['code'];

/** What each code is told with. */
export type ScheduleReasonParams = {
  readonly [Code in ScheduleReasonCode]: Extract<ScheduleReason, { code: Code }>['params'];
};

/** Every code, for which screens have to have words. */
export const SCHEDULE_REASON_CODES: readonly ScheduleReasonCode[] = REASONS.flatMap(
  ({ shape }) => shape.code.def.values,
);
