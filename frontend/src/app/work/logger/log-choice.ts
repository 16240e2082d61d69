import type { LogFile } from '#shared/checklist/kinds/trend';
import type { LoggerColumn, LoggerFile } from '#shared/refrigeration/logger/logger-file';
import { pickColumn, type PickedDimension } from '#shared/refrigeration/logger/pick-column';
import { toSi } from '#shared/units/convert';
import type { UnitId } from '#shared/units/unit';
import type { LogReading } from './log-reading';

/** A quantity that is to be taken from a log. */
export interface WantedColumn {
  /** Names it among the wanted ones. */
  readonly key: string;
  /** In the language that is read. */
  readonly label: string;
  readonly dimension: PickedDimension;
}

/** A column as picked, in SI: K, Pa above the atmosphere, Pa absolute, K of difference. */
export interface PickedColumn {
  /** Of the wanted column that it is. */
  readonly key: string;
  /** As the logger wrote it; may be empty. */
  readonly heading: string;
  /** One for each of the log's times, NaN where there was none. */
  readonly values: Float64Array;
}

/** What was taken from a logger's file: one column for each that was wanted, in their order. */
export interface PickedLog {
  readonly file: LogFile;
  /** The first row's time as the logger wrote it. */
  readonly startText: string;
  /** Seconds from the first row, strictly ascending. */
  readonly times: Float64Array;
  readonly columns: readonly PickedColumn[];
}

/** Which column was chosen, by its index in the log, and the unit for one whose heading names none. */
export interface ColumnChoice {
  readonly index: number | null;
  readonly unit: UnitId | null;
}
export type ColumnChoices = Readonly<Record<string, ColumnChoice>>;

export interface ColumnOption {
  readonly index: number;
  readonly column: LoggerColumn;
  /** Whether its unit or its words speak for it. */
  readonly isLikely: boolean;
}

/** Units in which loggers write a quantity, for a column whose heading doesn't say. */
export const LOGGED_UNITS: Readonly<Record<PickedDimension, readonly UnitId[]>> = {
  temperature: ['degF', 'degC', 'K'],
  temperatureDifference: ['degF_diff', 'K_diff'],
  gaugePressure: ['psig', 'barg', 'kPag'],
  absolutePressure: ['psia', 'bara', 'kPaa'],
};

/** Columns that may be the quantity: the likely ones first, then those that name no unit. One in another unit is none. */
export function columnOptions(log: LoggerFile, dimension: PickedDimension): readonly ColumnOption[] {
  const likely = pickColumn(log, dimension).map(({ column, index }) => ({ column, index, isLikely: true }));
  const others = log.columns.flatMap((column, index) =>
    column.unit === null && !likely.some((option) => option.index === index)
      ? [{ column, index, isLikely: false }]
      : [],
  );
  return [...likely, ...others];
}

/** What is chosen before anybody chose: the likeliest column for each, or the only one there is; never one twice. */
export function firstChoices(log: LoggerFile, wanted: readonly WantedColumn[]): ColumnChoices {
  const taken = new Set<number>();
  return Object.fromEntries(
    wanted.map(({ key, dimension }) => {
      const free = columnOptions(log, dimension).filter(({ index }) => !taken.has(index));
      const index =
        free.find(({ isLikely }) => isLikely)?.index ?? (free.length === 1 ? free[0]!.index : null);
      if (index !== null) taken.add(index);
      return [key, { index, unit: null }];
    }),
  );
}

/** What was picked; `null` while a column or a unit is still to be chosen. */
export function pickedLog(
  reading: Extract<LogReading, { ok: true }>,
  wanted: readonly WantedColumn[],
  choices: ColumnChoices,
): PickedLog | null {
  const columns: PickedColumn[] = [];
  for (const { key } of wanted) {
    const choice = choices[key];
    const column = reading.log.columns[choice?.index ?? NaN];
    const unit = column?.unit ?? choice?.unit;
    if (!column || !unit) return null;
    columns.push({ key, heading: column.heading, values: column.values.map((value) => toSi(value, unit)) });
  }
  const { times, startText } = reading.log;
  return { file: reading.file, startText, times, columns };
}
