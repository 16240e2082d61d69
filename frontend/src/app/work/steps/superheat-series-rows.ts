import { sinceText } from '../coil-walk/clock-text';
import type { TypedObservation } from './superheat-typed';

/**
 * The observation with a fresh row at its end, stamped with the time since the first reading.
 *
 * @param nowMs the phone's clock
 * @returns a row without a time where it isn't known when the first was read, as in one that came from a record
 */
export function withReading(observation: TypedObservation, nowMs: number): TypedObservation {
  const { readings, seriesFrom } = observation;
  const isFirst = readings.length === 0;
  const from = isFirst ? new Date(nowMs).toISOString() : seriesFrom;
  const since = from === null ? '' : sinceText((nowMs - Date.parse(from)) / 1000);
  return {
    ...observation,
    seriesFrom: from,
    readings: [...readings, { pressure: '', temperature: '', since }],
  };
}
