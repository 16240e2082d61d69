import { toSi } from '../../units/convert';
import { second, type KelvinDifference, type Second } from '../../units/quantity';

export type TurnDirection = 'clockwise' | 'counterclockwise';

/**
 * What a clockwise turn of this valve's stem does, from its own sheet; null where nobody has read it. Makers differ, so it
 * is never worked out from readings.
 */
export type ClockwiseEffect = 'raisesSuperheat' | 'lowersSuperheat';

/** One adjustment of one valve. */
export interface ValveTurn {
  /** Size in turns of the stem, above zero: 0.25 is a quarter turn. */
  readonly turns: number;
  readonly direction: TurnDirection;
  /** When, in seconds of any clock that the whole log goes by. */
  readonly at: Second;
  /** Settled superheat before the turn; null when it wasn't read. */
  readonly superheatBefore: KelvinDifference | null;
  /** Settled superheat after the turn; null when it wasn't read, or not yet. */
  readonly superheatAfter: KelvinDifference | null;
}

/** Adjustments of one valve in the order of time. */
export type ValveLog = readonly ValveTurn[];

export type NetTurnsResult =
  | {
      readonly ok: true;
      /** Where the stem stands from where the log began: clockwise positive. */
      readonly clockwise: number;
      /** How far it was turned in all, both ways. */
      readonly travelled: number;
    }
  | { readonly ok: false; readonly reason: 'notATurn' | 'outOfOrder'; readonly index: number };

/** Waiting times that two sheets name: 15 min (a case maker's installation manual), 30 min (a valve maker's sheet). */
export const SETTLING_WAITS: Readonly<Record<'shorter' | 'longer', Second>> = {
  shorter: second(toSi(15, 'min')),
  longer: second(toSi(30, 'min')),
};

/** A turn with its sign: clockwise positive. */
export const signedTurns = ({ turns, direction }: ValveTurn): number =>
  direction === 'clockwise' ? turns : -turns;

/**
 * Where a valve's stem stands from where its log began: what brings it back.
 *
 * @param log in the order of time
 * @returns turns, clockwise positive; or the first entry that is no turn (zero, negative, not a number) or not in order
 * @example netTurns([half clockwise, quarter counterclockwise]) // clockwise 0.25, travelled 0.75
 */
export function netTurns(log: ValveLog): NetTurnsResult {
  let clockwise = 0;
  let travelled = 0;
  for (const [index, turn] of log.entries()) {
    if (!(turn.turns > 0) || !Number.isFinite(turn.turns) || !Number.isFinite(turn.at))
      return { ok: false, reason: 'notATurn', index };
    const before = log[index - 1];
    if (before !== undefined && turn.at < before.at) return { ok: false, reason: 'outOfOrder', index };
    clockwise += signedTurns(turn);
    travelled += turn.turns;
  }
  return { ok: true, clockwise, travelled };
}

export interface Settling {
  /** Whether the wait since the last turn has passed; true for a valve that wasn't touched. */
  readonly settled: boolean;
  /** What is left of the wait; zero when settled. */
  readonly remaining: Second;
  /** Null for a valve that wasn't touched. */
  readonly sinceLastTurn: Second | null;
}

/**
 * Whether a valve has had its wait since it was last touched.
 *
 * @param log in the order of time
 * @param now on the log's clock, in seconds
 * @param wait in seconds, as the valve's or the case's sheet asks; see `SETTLING_WAITS`
 * @returns not settled, with the whole wait left, when the clock stands before the last turn or anything is no number
 * @source waits differ between makers: 15 min, 30 min, "a few minutes"
 * @example settling(log, second(600), SETTLING_WAITS.shorter) // turned at 0: settled false, remaining 300 s
 */
export function settling(log: ValveLog, now: Second, wait: Second): Settling {
  const last = log.at(-1);
  if (last === undefined) return { settled: true, remaining: second(0), sinceLastTurn: null };
  const since = second(now - last.at);
  if (since >= wait) return { settled: true, remaining: second(0), sinceLastTurn: since };
  const remaining = since >= 0 ? second(wait - since) : wait;
  return { settled: false, remaining, sinceLastTurn: since };
}

/** Turns with both readings, as the change of superheat that each brought. */
function responses(log: ValveLog): { turns: number; changeK: number }[] {
  return log.flatMap((turn) => {
    const { superheatBefore, superheatAfter } = turn;
    if (superheatBefore === null || superheatAfter === null) return [];
    const changeK = superheatAfter - superheatBefore;
    return Number.isFinite(changeK) ? [{ turns: signedTurns(turn), changeK }] : [];
  });
}

/**
 * How much a full clockwise turn of this valve changed the superheat so far: the least squares line through zero.
 *
 * @param log in the order of time
 * @returns kelvin a turn, positive where clockwise raised it; null with fewer than two turns that were read before and
 *   after. An observation to size the next turn by, never the valve's direction
 * @source one valve maker's sheet gives 3 to 4 °F a turn of one family; each coil answers its own way
 * @example kelvinPerClockwiseTurn([0.5 cw: 3 → 4 K, 0.5 cw: 4 → 5.2 K]) // 2.2
 */
export function kelvinPerClockwiseTurn(log: ValveLog): number | null {
  const read = responses(log);
  if (read.length < 2) return null;
  const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
  return sum(read.map(({ turns, changeK }) => turns * changeK)) / sum(read.map(({ turns }) => turns ** 2));
}

/** Less than 1 °F (0.56 K) is drift and reading, no answer of the valve (common practice, no source). */
const SMALLEST_RESPONSE_K = toSi(1, 'degF_diff');

/**
 * Whether the last turn that was read before and after moved the superheat the other way than the valve's sheet says: the
 * wrong sheet, a hunting valve, a reading before it settled, or something else that changed. A doubt, never a correction.
 *
 * @param log in the order of time
 * @param clockwiseDoes from the valve's sheet; null when unknown
 * @returns true only for a change of at least 1 °F the other way
 * @example isAgainstSheet([half clockwise: 4 → 2 K], 'raisesSuperheat') // true
 */
export function isAgainstSheet(log: ValveLog, clockwiseDoes: ClockwiseEffect | null): boolean {
  const last = responses(log).at(-1);
  if (last === undefined || clockwiseDoes === null) return false;
  const sense = clockwiseDoes === 'raisesSuperheat' ? 1 : -1;
  return Math.abs(last.changeK) >= SMALLEST_RESPONSE_K && last.changeK * last.turns * sense < 0;
}
