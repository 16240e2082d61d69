import { MOST_SAMPLES } from '#shared/checklist/kinds/trend';
import { roundTo } from '#shared/units/round';
import type { PickedLog } from '../logger/log-choice';
import type { TakenLog } from './superheat-typed';

/** Keys of the two columns that a superheat is worked out from. */
export const LOG_COLUMNS = { pressure: 'pressure', temperature: 'temperature' } as const;

/**
 * What a picked log gives for an answer: rows that have both values, times to 0.1 s from the first of them, pressures to
 * 1 Pa, temperatures to 0.01 K, and the last rows where there are more than an entry holds. Every other row isn't an
 * option: means and periods are worked out from what is kept.
 */
export function takenLog(log: PickedLog): { readonly log: TakenLog; readonly isCut: boolean } {
  const valuesOf = (key: string): Float64Array =>
    log.columns.find((column) => column.key === key)?.values ?? new Float64Array();
  const pressure = valuesOf(LOG_COLUMNS.pressure);
  const temperature = valuesOf(LOG_COLUMNS.temperature);
  const whole = Array.from(log.times.keys()).filter(
    (index) => Number.isFinite(pressure[index]) && Number.isFinite(temperature[index]),
  );
  const kept = whole.slice(-MOST_SAMPLES);
  const firstS = log.times[kept[0] ?? 0] ?? 0;
  const taken = (values: Float64Array, decimals: number): number[] =>
    kept.map((index) => roundTo(values[index] ?? NaN, decimals));
  return {
    log: {
      file: log.file,
      atS: kept.map((index) => roundTo((log.times[index] ?? NaN) - firstS, 1)),
      pressurePag: taken(pressure, 0),
      temperatureK: taken(temperature, 2),
    },
    isCut: kept.length < whole.length,
  };
}
