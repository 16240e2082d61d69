import type { Kelvin, PascalAbsolute, Second } from '../../units/quantity';
import { judgedReading, refusalOfRise, type RiseRefusal } from './rise-checks';
import type { RiseCriteria } from './rise-criteria';
import { plateauNotes, type PlateauNote } from './plateau-notes';
import { riseShape, type RiseShape, type VacuumReading } from './rise-shape';
import { riseWorking } from './rise-working';
import type { Working } from '../working';

export interface RiseTest {
  /** From isolation on, in ascending order of time: the first reading is the one at isolation. */
  readonly readings: readonly VacuumReading[];
  readonly criteria: RiseCriteria;
  /** Of the air round the pipes; leave out when nobody measured it. */
  readonly ambientTemperature?: Kelvin;
}

/**
 * `overLimit`: the limit isn't kept, but too few readings (or too short a time) to tell a leak from moisture.
 */
export type RiseVerdict = 'dryAndTight' | 'moisture' | 'leak' | 'overLimit' | 'tooShort' | 'notDeepEnough';

export type JudgedRise =
  | {
      readonly ok: true;
      readonly verdict: RiseVerdict;
      /** From isolation to the last reading. */
      readonly held: Second;
      /** At the end of the hold, or at the last reading when it came earlier. */
      readonly endPressure: PascalAbsolute;
      /** End minus isolation, in pascals; negative when it fell. */
      readonly risePa: number;
      /** Slopes and plateau; null with fewer than two readings in the first or the last third. */
      readonly shape: RiseShape | null;
      readonly notes: readonly PlateauNote[];
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: RiseRefusal };

/** Wide enough for conversion noise, far too narrow for any vacuum gauge (1 µm is 0.13 Pa). */
const TOLERANCE_PA = 1e-6;

const isAbove = (pressurePa: number, limitPa: number | null): boolean =>
  limitPa !== null && pressurePa > limitPa + TOLERANCE_PA;

interface Figures {
  readonly startPressure: PascalAbsolute;
  readonly highest: PascalAbsolute;
  readonly endPressure: PascalAbsolute;
  readonly heldLongEnough: boolean;
  readonly shape: RiseShape | null;
}

function verdictOf(figures: Figures, criteria: RiseCriteria): RiseVerdict {
  const { startPressure, highest, endPressure, heldLongEnough, shape } = figures;
  if (isAbove(startPressure, criteria.target)) return 'notDeepEnough';
  if (isAbove(highest, criteria.leakAbove)) return 'leak';
  const isOver =
    isAbove(endPressure, criteria.limit) || isAbove(endPressure - startPressure, criteria.greatestRisePa);
  if (!isOver) return heldLongEnough ? 'dryAndTight' : 'tooShort';
  if (shape === null) return 'overLimit';
  if (shape.levelled) return 'moisture';
  // What still rises in a short hold may yet level off.
  return heldLongEnough ? 'leak' : 'overLimit';
}

/**
 * Judges the rise test that ends an evacuation: the pump isolated, the pressure watched. Within the template's limits
 * it is dry and tight; beyond them, a rise that levels off is moisture (or refrigerant leaving the oil), one that goes on
 * is a leak.
 *
 * @param test readings in seconds and pascals absolute, the template's criteria, ambient temperature in kelvin
 * @returns verdict with figures, notes and working, or the reason why there is none. A reading at its limit passes
 * @range two readings or more; the pressure at the end of the hold lies on a straight line between its neighbours
 * @source limits: the template's, see `PUBLISHED_RISE_CRITERIA`; the shape: `riseShape`
 * @example judgeRise({ readings: [0 min: 300 µm, 60 min: 480 µm], criteria: { 300 µm, 1 h, 500 µm } }) // dryAndTight
 */
export function judgeRise(test: RiseTest): JudgedRise {
  const { readings, criteria, ambientTemperature } = test;
  const refusal = refusalOfRise(readings, criteria, ambientTemperature);
  if (refusal !== null) return { ok: false, reason: refusal };
  const judged = judgedReading(readings, criteria.hold);
  if (judged === null) return { ok: false, reason: 'tooFewReadings' };
  const { start, last, highest, endPressure, held } = judged;
  const shape = riseShape(readings);
  const heldLongEnough = held >= criteria.hold;
  const verdict = verdictOf(
    { startPressure: start.pressure, highest, endPressure, heldLongEnough, shape },
    criteria,
  );
  const rest = shape?.levelled === true ? (shape.plateau ?? last.pressure) : null;
  return {
    ok: true,
    verdict,
    held,
    endPressure,
    risePa: endPressure - start.pressure,
    shape,
    notes: rest === null || verdict === 'dryAndTight' ? [] : plateauNotes(rest, ambientTemperature),
    working: riseWorking({ criteria, start: start.pressure, endPressure, held, shape, ambientTemperature }),
  };
}
