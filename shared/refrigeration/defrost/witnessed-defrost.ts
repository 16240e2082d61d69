import {
  second,
  subtractTemperatures,
  type Kelvin,
  type KelvinDifference,
  type Second,
} from '../../units/quantity';
import type { Working, WorkingLine } from '../working';
import { DAY_S, secondsUntil } from './day-circle';

export interface WitnessedDefrost {
  /** On any clock that both ends share; past midnight the end needs the day added (see `durationAcrossMidnight`). */
  readonly startedAt: Second;
  readonly endedAt: Second;
  /** Where the control measures, as the defrost ended; null when nobody read it. */
  readonly endTemperature: Kelvin | null;
  /** Null when the defrost ends on time. */
  readonly terminationTemperature: Kelvin | null;
  /** The longest it may last; for a defrost that ends on time, the time set. */
  readonly failSafe: Second | null;
  /** How far below its termination temperature the reading still counts as reached, not negative. */
  readonly temperatureTolerance: KelvinDifference;
}

export type DefrostEnding =
  | 'endedOnTemperature'
  | 'endedOnTime'
  /** Still too cold, and its time wasn't up: ended by hand, by another control, or by a sensor in a warm place. */
  | 'endedEarly'
  /** The time was up: the fail-safe is an alarm, not a setting. So even if the temperature was reached just then. */
  | 'endedOnFailSafe'
  /** Heaters or gas stayed on beyond the time that should have cut them. */
  | 'ranPastItsTime';

export type WitnessedDefrostResult =
  | {
      readonly ok: true;
      readonly outcome: 'within' | 'outside';
      readonly ending: DefrostEnding;
      readonly duration: Second;
      readonly working: Working;
    }
  | {
      readonly ok: false;
      readonly reason: 'notFinite' | 'noDuration' | 'noFailSafe' | 'noEndTemperature' | 'negativeTolerance';
    };

/** Starts and ends are written down to the minute (common practice, no source). */
const TIME_READING_S = 60;
/** Conversion noise. */
const TOLERANCE_K = 1e-9;

/**
 * Judges a defrost that somebody watched. One with a termination temperature has to reach it before its fail-safe time;
 * one that ends on time has to end by it, a minute of reading allowed.
 *
 * @param defrost times in seconds, temperatures in kelvin
 * @returns within or outside, how it ended, and its working; or the reason why it can't be judged
 * @range longer than nothing; how far above its termination temperature it ended is not judged
 * @source common practice, no source: a defrost ends on temperature, the fail-safe time is an alarm
 * @example judgeWitnessedDefrost({ 0 to 28 min, ended at 51 °F, terminates at 50 °F, fail-safe 36 min, … }) // within
 */
export function judgeWitnessedDefrost(defrost: WitnessedDefrost): WitnessedDefrostResult {
  const { startedAt, endedAt, failSafe, temperatureTolerance } = defrost;
  const given = [startedAt, endedAt, temperatureTolerance, failSafe, defrost.endTemperature];
  if (![...given, defrost.terminationTemperature].every((value) => value === null || Number.isFinite(value)))
    return { ok: false, reason: 'notFinite' };
  const duration = second(endedAt - startedAt);
  if (duration <= 0) return { ok: false, reason: 'noDuration' };
  if (failSafe === null || failSafe <= 0) return { ok: false, reason: 'noFailSafe' };
  if (temperatureTolerance < 0) return { ok: false, reason: 'negativeTolerance' };
  const ending = endingOf(defrost, duration, failSafe);
  if (ending === undefined) return { ok: false, reason: 'noEndTemperature' };
  const isWithin = ending === 'endedOnTemperature' || ending === 'endedOnTime';
  const working = workingOf(defrost, duration, failSafe);
  return { ok: true, outcome: isWithin ? 'within' : 'outside', ending, duration, working };
}

/** Undefined when it takes a temperature to say, and there is none. */
function endingOf(defrost: WitnessedDefrost, duration: Second, failSafe: Second): DefrostEnding | undefined {
  const { endTemperature, terminationTemperature, temperatureTolerance } = defrost;
  if (duration > failSafe + TIME_READING_S) return 'ranPastItsTime';
  if (terminationTemperature === null) return 'endedOnTime';
  if (duration >= failSafe) return 'endedOnFailSafe';
  if (endTemperature === null) return undefined;
  const short = subtractTemperatures(terminationTemperature, endTemperature);
  return short <= temperatureTolerance + TOLERANCE_K ? 'endedOnTemperature' : 'endedEarly';
}

function workingOf(defrost: WitnessedDefrost, duration: Second, failSafe: Second): Working {
  const { endTemperature, terminationTemperature, temperatureTolerance } = defrost;
  const end: readonly WorkingLine[] =
    endTemperature === null ? [] : [{ label: 'endTemperature', value: endTemperature, unit: 'K' }];
  const termination: readonly WorkingLine[] =
    terminationTemperature === null
      ? []
      : [
          { label: 'terminationTemperature', value: terminationTemperature, unit: 'K' },
          { label: 'temperatureTolerance', value: temperatureTolerance, unit: 'K_diff' },
        ];
  return {
    formula: terminationTemperature === null ? 'defrostEndsOnTime' : 'defrostEndsOnTemperature',
    source: 'common practice, no source',
    lines: [
      ...end,
      ...termination,
      { label: 'failSafe', value: failSafe, unit: 's' },
      { label: 'defrostDuration', value: duration, unit: 's' },
    ],
  };
}

/**
 * How long a defrost lasted by the clock on the wall, which may have passed midnight once.
 *
 * @param startS second of the day, below 86 400
 * @param endS likewise
 * @returns seconds, less than a day; undefined when either is no second of the day. Equal ones are 0, never a whole day
 * @example durationAcrossMidnight(85_800, 600) // 1200
 */
export function durationAcrossMidnight(startS: number, endS: number): Second | undefined {
  const isClock = (value: number): boolean => value >= 0 && value < DAY_S;
  return isClock(startS) && isClock(endS) ? second(secondsUntil(startS, endS)) : undefined;
}
