import type { MakersTableFacts } from '#shared/checklist/facts';
import type { MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import type { SaturationTable } from '#shared/refrigeration/saturation/saturation-table';
import { fromSi } from '#shared/units/convert';
import { absoluteUnit } from './sheet-units';

/** Logarithmic shows a slip anywhere; linear is how sheets are drawn. */
export const SCALES = ['logarithmic', 'linear'] as const;
export type Scale = (typeof SCALES)[number];

export const WIDTH = 400;
export const HEIGHT = 300;
const LEFT = 46;
const RIGHT = 12;
const TOP = 12;
const BOTTOM = 34;

export interface Tick {
  readonly at: number;
  readonly text: string;
}
export interface Dot {
  readonly x: number;
  readonly bubbleY: number;
  readonly dewY: number;
  /** Something is said about this row. */
  readonly isNamed: boolean;
}
export interface CurveDrawing {
  readonly bubble: string;
  readonly dew: string;
  readonly dots: readonly Dot[];
  readonly temperatures: readonly Tick[];
  readonly pressures: readonly Tick[];
  readonly frame: {
    readonly left: number;
    readonly right: number;
    readonly top: number;
    readonly bottom: number;
  };
}

interface Row {
  readonly temperature: number;
  readonly bubble: number;
  readonly dew: number;
}

const FRAME = { left: LEFT, right: WIDTH - RIGHT, top: TOP, bottom: HEIGHT - BOTTOM };

/** 1, 2 or 5 times a power of ten, so that there are at most `most` steps. */
function roundStep(span: number, most: number): number {
  const power = 10 ** Math.floor(Math.log10(span / most));
  return [1, 2, 5, 10].map((digit) => digit * power).find((step) => span / step <= most) ?? span;
}

function evenTicks(low: number, high: number, most: number): number[] {
  const step = roundStep(high - low, most);
  const first = Math.ceil(low / step - 1e-9);
  return Array.from(
    { length: Math.floor(high / step + 1e-9) - first + 1 },
    (_, index) => (first + index) * step,
  );
}

function logarithmicTicks(low: number, high: number): number[] {
  const decades = Array.from(
    { length: Math.ceil(Math.log10(high)) - Math.floor(Math.log10(low)) + 1 },
    (_, index) => 10 ** (Math.floor(Math.log10(low)) + index),
  );
  return decades
    .flatMap((decade) => [1, 2, 5].map((digit) => digit * decade))
    .filter((tick) => tick >= low && tick <= high);
}

const tickText = (value: number): string =>
  (Math.abs(value) < 10 ? String(Number(value.toPrecision(3))) : String(Math.round(value))).replace(
    '-',
    '\u2212',
  );

const isDrawable = ({ temperature, bubble, dew }: Row): boolean =>
  [temperature, bubble, dew].every(Number.isFinite) && bubble > 0 && dew > 0;

/** The curve as it is worked with, or straight from row to row while something is still refused. */
function curveRows(
  rows: readonly Row[],
  table: SaturationTable | null,
  units: MakersTableUnits,
): readonly Row[] {
  if (table === null || 'startK' in table.temperaturesK) return rows;
  return table.temperaturesK.map((temperatureK, index) => ({
    temperature: fromSi(temperatureK, units.temperature),
    bubble: fromSi(table.bubblePa[index] ?? NaN, units.pressure),
    dew: fromSi(table.dewPa[index] ?? NaN, units.pressure),
  }));
}

/**
 * Bubble and dew pressure over temperature, with a dot for each printed row.
 *
 * @param points of the sheet
 * @param table as results are worked out with; null while something is refused
 * @param units of the axes; pressures are drawn absolute
 * @param named rows that something is said about, counted from 1
 * @returns null where there are not two rows to draw
 */
export function drawCurve(
  points: MakersTableFacts['points'],
  table: SaturationTable | null,
  units: MakersTableUnits,
  scale: Scale,
  named: ReadonlySet<number>,
): CurveDrawing | null {
  const shown = { temperature: units.temperature, pressure: absoluteUnit(units.pressure) };
  const all = points.map(({ temperatureK, bubblePa, dewPa }, index) => ({
    temperature: fromSi(temperatureK, shown.temperature),
    bubble: fromSi(bubblePa, shown.pressure),
    dew: fromSi(dewPa, shown.pressure),
    isNamed: named.has(index + 1),
  }));
  const rows = all.filter(isDrawable);
  const temperatures = rows.map(({ temperature }) => temperature);
  const pressures = rows.flatMap(({ bubble, dew }) => [bubble, dew]);
  const [coldest, warmest] = [Math.min(...temperatures), Math.max(...temperatures)];
  const [lowest, highest] = [Math.min(...pressures), Math.max(...pressures)];
  if (!(warmest > coldest) || !(highest > lowest)) return null;
  const share = (pressure: number): number =>
    scale === 'linear' ? pressure / highest : Math.log(pressure / lowest) / Math.log(highest / lowest);
  const x = (temperature: number): number =>
    FRAME.left + ((temperature - coldest) / (warmest - coldest)) * (FRAME.right - FRAME.left);
  const y = (pressure: number): number => FRAME.bottom - share(pressure) * (FRAME.bottom - FRAME.top);
  const path = (column: 'bubble' | 'dew'): string =>
    curveRows(rows, table, shown)
      .map(
        (row, index) =>
          `${index === 0 ? 'M' : 'L'}${x(row.temperature).toFixed(1)} ${y(row[column]).toFixed(1)}`,
      )
      .join('');
  const pressureTicks = scale === 'linear' ? evenTicks(0, highest, 6) : logarithmicTicks(lowest, highest);
  return {
    bubble: path('bubble'),
    dew: path('dew'),
    dots: rows.map(({ temperature, bubble, dew, isNamed }) => ({
      x: x(temperature),
      bubbleY: y(bubble),
      dewY: y(dew),
      isNamed,
    })),
    temperatures: evenTicks(coldest, warmest, 9).map((value) => ({ at: x(value), text: tickText(value) })),
    pressures: pressureTicks.map((value) => ({ at: y(value), text: tickText(value) })),
    frame: FRAME,
  };
}
