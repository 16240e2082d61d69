import {
  NEEDED_COLUMN_IDS,
  type NeededColumnId,
  type ScheduleLevel,
} from '#shared/contracts/schedule-reasons';
import { quantity, refrigerant, text, wholeNumber, word, type CellReader } from './cell-readers';
import {
  CONTROL_WORDS,
  DEFROST_TYPE_WORDS,
  EVAPORATING_BASIS_WORDS,
  FEED_WORDS,
  FIXTURE_KIND_WORDS,
  SYSTEM_KIND_WORDS,
  TEMPERATURE_CLASS_WORDS,
  VALVE_KIND_WORDS,
} from './schedule-words';

/** What a column describes; below a fixture's own columns, cells repeat or are left blank on the following lines. */
export type ColumnLevel = ScheduleLevel;

/** One column that a schedule is read for. */
export interface ScheduleColumn<V> {
  readonly level: ColumnLevel;
  /** What problems call it, and the first way of writing its heading. */
  readonly label: string;
  /** Further usual headings, compared without case, spaces, punctuation and the unit. */
  readonly spellings: readonly string[];
  /** Whether the schedule is refused without it; a column that is not needed has a default (see build-schedule). */
  readonly isNeeded: boolean;
  readonly reader: CellReader<V>;
}

const column =
  (isNeeded: boolean) =>
  <V>(
    level: ColumnLevel,
    reader: CellReader<V>,
    label: string,
    ...spellings: string[]
  ): ScheduleColumn<V> => ({
    level,
    label,
    spellings,
    isNeeded,
    reader,
  });
const needed = column(true);
const optional = column(false);

const NAME_LENGTH = 40;
const DESCRIPTION_LENGTH = 120;

const name = text(NAME_LENGTH);
const description = text(DESCRIPTION_LENGTH);
const evaporating = quantity('temperature', ['degC', 'degF'], -60, 20);
const superheat = quantity('temperatureDifference', ['K_diff', 'degF_diff'], 0.5, 20);

/** Every column, with the values it takes. The ranges catch slips and wrong units, not bad design. */
export const SCHEDULE_COLUMNS = {
  system: needed('system', name, 'System', 'Sys', 'System name', 'Rack', 'Rack name', 'Refrigeration system'),
  systemKind: optional('system', word(SYSTEM_KIND_WORDS), 'System type', 'System kind', 'Rack type'),
  refrigerant: needed('system', refrigerant, 'Refrigerant', 'Ref', 'Refrig', 'Refrigerant type', 'Gas'),
  suctionGroup: needed(
    'suctionGroup',
    name,
    'Suction group',
    'Group',
    'Suct group',
    'Suction group name',
    'SG',
  ),
  saturatedSuctionTemperature: optional(
    'suctionGroup',
    evaporating,
    'SST',
    'Saturated suction temperature',
    'Saturated suction temp',
    'Saturated suction',
    'Sat suction temp',
    'Suction temperature',
    'Group SST',
  ),
  circuit: needed(
    'circuit',
    name,
    'Circuit',
    'Ckt',
    'Circuit code',
    'Circuit no',
    'Circuit number',
    'Circuit ID',
    'Circuit #',
  ),
  circuitDescription: optional(
    'circuit',
    description,
    'Circuit description',
    'Circuit name',
    'Circuit served',
    'Serves',
  ),
  area: optional('circuit', text(60), 'Area', 'Department', 'Dept', 'Location', 'Store area'),
  temperatureClass: needed(
    'circuit',
    word(TEMPERATURE_CLASS_WORDS),
    'Temperature class',
    'Temp class',
    'Class',
    'Application',
    'LT/MT',
    'MT/LT',
  ),
  feed: optional('circuit', word(FEED_WORDS), 'Feed', 'Piping', 'Feed type', 'Piping type', 'Branch'),
  control: optional(
    'circuit',
    word(CONTROL_WORDS),
    'Control',
    'Circuit control',
    'Control type',
    'Temperature control',
  ),
  load: optional(
    'circuit',
    quantity('heatFlow', ['W', 'kW', 'BTU_h', 'MBH'], 50, 500_000),
    'Load',
    'Circuit load',
    'Design load',
    'Capacity',
    'Heat load',
    'Refrigeration load',
  ),
  defrostType: optional(
    'circuit',
    word(DEFROST_TYPE_WORDS),
    'Defrost',
    'Defrost type',
    'Defrost method',
    'Type of defrost',
  ),
  defrostsPerDay: optional(
    'circuit',
    wholeNumber(0, 24),
    'Defrosts per day',
    'Defrosts/day',
    'Defrost per day',
    'No of defrosts',
    'Number of defrosts',
    'Defrosts',
    'Defrost frequency',
  ),
  failSafe: optional(
    'circuit',
    quantity('duration', ['min', 'h'], 1, 240),
    'Fail-safe',
    'Failsafe time',
    'Defrost fail-safe',
    'Defrost failsafe time',
    'Max defrost time',
    'Defrost duration',
    'Defrost time',
  ),
  terminationTemperature: optional(
    'circuit',
    quantity('temperature', ['degC', 'degF'], -20, 60),
    'Termination temperature',
    'Termination temp',
    'Termination',
    'Defrost termination',
    'Defrost termination temperature',
    'Defrost termination temp',
    'Term temp',
  ),
  drip: optional(
    'circuit',
    quantity('duration', ['min', 's'], 0, 120),
    'Drip',
    'Drip time',
    'Drip-down',
    'Drip down time',
  ),
  fixtureTag: needed(
    'fixture',
    name,
    'Fixture tag',
    'Fixture',
    'Tag',
    'Fixture no',
    'Fixture number',
    'Fixture ID',
    'Fixture #',
    'Case tag',
    'Case no',
    'Case number',
    'Case #',
  ),
  fixtureDescription: optional(
    'fixture',
    description,
    'Description',
    'Fixture description',
    'Case description',
    'Fixture name',
  ),
  fixtureKind: optional(
    'fixture',
    word(FIXTURE_KIND_WORDS),
    'Fixture type',
    'Fixture kind',
    'Case type',
    'Kind',
  ),
  length: optional(
    'fixture',
    quantity('length', ['ft', 'm', 'in'], 1, 330),
    'Length',
    'Case length',
    'Fixture length',
    'Len',
  ),
  evaporatingTemperature: needed(
    'fixture',
    evaporating,
    'Evaporating temperature',
    'Evaporating temp',
    'Evaporating',
    'Evap temp',
    'Evap temperature',
    'Evaporator temperature',
    'Evaporator temp',
    'SET',
    'Saturated evaporating temperature',
    'Design evap temp',
  ),
  evaporatingBasis: optional(
    'fixture',
    word(EVAPORATING_BASIS_WORDS),
    'Evaporating basis',
    'Evap basis',
    'Dew or mean',
    'Dew/mean',
    'Evaporating temperature basis',
  ),
  dischargeAirTemperature: needed(
    'fixture',
    quantity('temperature', ['degC', 'degF'], -50, 30),
    'Discharge air',
    'Discharge air temperature',
    'Discharge air temp',
    'DAT',
    'Discharge temp',
  ),
  superheatLow: needed(
    'fixture',
    superheat,
    'Superheat low',
    'Low superheat',
    'Superheat min',
    'Min superheat',
    'Superheat minimum',
    'SH low',
    'SH min',
    'Superheat from',
  ),
  superheatHigh: needed(
    'fixture',
    superheat,
    'Superheat high',
    'High superheat',
    'Superheat max',
    'Max superheat',
    'Superheat maximum',
    'SH high',
    'SH max',
    'Superheat to',
  ),
  valveKind: optional(
    'fixture',
    word(VALVE_KIND_WORDS),
    'Valve',
    'Valve type',
    'Expansion valve',
    'Valve kind',
  ),
  coilCount: optional(
    'fixture',
    wholeNumber(1, 40),
    'Coils',
    'Coil count',
    'No of coils',
    'Number of coils',
    'Unit coolers',
    'Evaporators',
    'Coil qty',
  ),
} as const;

export type ColumnId = keyof typeof SCHEDULE_COLUMNS;

/** What each column's cells become. */
export type ColumnValues = {
  -readonly [Id in ColumnId]: (typeof SCHEDULE_COLUMNS)[Id] extends ScheduleColumn<infer V> ? V : never;
};

export const COLUMN_IDS = Object.keys(SCHEDULE_COLUMNS) as ColumnId[];

/** Whether the schedule is refused without this column. */
export const isNeededColumn = (id: ColumnId): id is NeededColumnId =>
  NEEDED_COLUMN_IDS.some((needed) => needed === id);
