import { pascalAbsolute, second, type Kelvin, type PascalAbsolute, type Second } from '../../units/quantity';
import type { RiseCriteria } from './rise-criteria';
import type { VacuumReading } from './rise-shape';
import { waterVapourPressure } from './water-vapour';

/** Why a rise can't be judged, as a key that screens translate. */
export type RiseRefusal =
  | 'tooFewReadings'
  | 'notFinite'
  | 'notAbsolute'
  | 'timeNotRising'
  | 'noLimit'
  | 'criteriaNotPositive'
  | 'ambientOutOfRange';

function refusalOfReadings(readings: readonly VacuumReading[]): RiseRefusal | null {
  if (readings.length < 2) return 'tooFewReadings';
  let previousS = -Infinity;
  for (const { at, pressure } of readings) {
    if (!Number.isFinite(at) || !Number.isFinite(pressure)) return 'notFinite';
    if (pressure <= 0) return 'notAbsolute';
    if (at <= previousS) return 'timeNotRising';
    previousS = at;
  }
  return null;
}

function refusalOfCriteria(criteria: RiseCriteria): RiseRefusal | null {
  const { target, hold, limit, greatestRisePa, leakAbove } = criteria;
  const numbers = [target, hold, limit, greatestRisePa, leakAbove].filter((value) => value !== null);
  if (!numbers.every(Number.isFinite)) return 'notFinite';
  if (numbers.some((value) => value <= 0)) return 'criteriaNotPositive';
  return limit === null && greatestRisePa === null ? 'noLimit' : null;
}

/**
 * What keeps a rise from being judged.
 *
 * @returns the first reason found, or null when nothing is wrong
 */
export function refusalOfRise(
  readings: readonly VacuumReading[],
  criteria: RiseCriteria,
  ambientTemperature: Kelvin | undefined,
): RiseRefusal | null {
  const ofAmbient: RiseRefusal | null =
    ambientTemperature === undefined || waterVapourPressure(ambientTemperature).ok
      ? null
      : 'ambientOutOfRange';
  return refusalOfReadings(readings) ?? refusalOfCriteria(criteria) ?? ofAmbient;
}

export interface JudgedReading {
  readonly start: VacuumReading;
  readonly last: VacuumReading;
  readonly highest: PascalAbsolute;
  /** At the end of the hold; of the last reading when that came earlier. */
  readonly endPressure: PascalAbsolute;
  readonly held: Second;
}

/**
 * The figures of a series that a hold is judged by.
 *
 * @param readings in ascending order of time
 * @param hold in seconds
 * @returns null when there is no reading
 */
export function judgedReading(readings: readonly VacuumReading[], hold: Second): JudgedReading | null {
  const start = readings[0];
  const last = readings.at(-1);
  if (start === undefined || last === undefined) return null;
  return {
    start,
    last,
    highest: readings.reduce(
      (high, { pressure }) => pascalAbsolute(Math.max(high, pressure)),
      start.pressure,
    ),
    endPressure: pressureAt(readings, start.at + hold) ?? last.pressure,
    held: second(last.at - start.at),
  };
}

function pressureAt(readings: readonly VacuumReading[], atS: number): PascalAbsolute | null {
  const index = readings.findIndex((reading) => reading.at >= atS);
  const after = readings[index];
  const before = readings[index - 1];
  if (after === undefined || before === undefined) return null;
  const share = (atS - before.at) / (after.at - before.at);
  return pascalAbsolute(before.pressure + share * (after.pressure - before.pressure));
}
