import { toSi } from '../../units/convert';
import { kelvin, second, type Kelvin, type Second } from '../../units/quantity';
import type { Working, WorkingLine } from '../working';
import { holdOf, type Hold, type HoldRestart } from './hold';
import { rangeAfter, type TemperatureRange } from './range-after';
import { stretchesOf, type Stretch, type StretchState, type TemperatureSample } from './stretches';
import { inOrderOfTime } from './in-order-of-time';

/** The warmest that food which needs it may be kept: 5 °C, 41 °F. */
export const COLD_HOLDING_LIMIT: { readonly temperature: Kelvin; readonly source: string } = {
  temperature: kelvin(toSi(5, 'degC')),
  source: 'FDA Food Code 3-501.16(A)(2)',
};

export interface PullDownInputs {
  /** In any order; of two at the same time the first counts. */
  readonly samples: readonly TemperatureSample[];
  /** Null when nothing is too cold. Edges count as within. */
  readonly bandLow: Kelvin | null;
  readonly bandHigh: Kelvin;
  /** How long the band must be held. */
  readonly holdFor: Second;
  /** The longest time out of the band that doesn't restart the hold; none unless told. */
  readonly longestExcursion?: Second;
  /** A longer step between two samples is unknown; 900 s unless told (common practice, no publication). */
  readonly longestGap?: Second;
}

/**
 * `brokeAway`: it left the band for longer than allowed and the log ends there. `notLongEnough`: it holds, but not yet
 * for the time asked; `restarts` says what cost it time. `tooShort`: no two samples are close enough to say anything.
 */
export type PullDownOutcome = 'held' | 'notLongEnough' | 'brokeAway' | 'neverReached' | 'tooShort';

/** A time out of the band. */
export interface Excursion {
  readonly from: Second;
  readonly lasted: Second;
}

export interface PullDownAnalysis {
  readonly ok: true;
  readonly outcome: PullDownOutcome;
  /** In the samples' own clock, as all times here; null when never. */
  readonly reachedAt: Second | null;
  /** The longest stretch above the band after that. */
  readonly longestAbove: Excursion | null;
  readonly timeAbove: Second;
  readonly timeBelow: Second;
  /** How long the log says nothing after the band was reached. */
  readonly timeUnknown: Second;
  /** From `reachedAt` on, unknown stretches left out; null when never reached. */
  readonly afterReaching: TemperatureRange | null;
  /** The hold in which the log ends; null when it doesn't end in one. */
  readonly heldFrom: Second | null;
  readonly heldFor: Second;
  readonly restarts: readonly HoldRestart[];
  readonly working: Working;
}

export type PullDownResult =
  | PullDownAnalysis
  | { readonly ok: false; readonly reason: 'notFinite' | 'edgesSwapped' | 'negativeDuration' };

const NO_TIME = second(0);
/** Steps longer than this between two samples are unknown unless told otherwise (common practice, no publication). */
export const LONGEST_GAP = second(900);
/** Interpolation noise of a hold. */
const TOLERANCE_S = 1e-6;

function refusalOf(
  inputs: Required<PullDownInputs>,
): Extract<PullDownResult, { ok: false }>['reason'] | null {
  const { samples, bandLow, bandHigh, holdFor, longestExcursion, longestGap } = inputs;
  const numbers = [bandLow ?? 0, bandHigh, holdFor, longestExcursion, longestGap];
  if (!numbers.every(Number.isFinite)) return 'notFinite';
  if (!samples.every(({ at, temperature }) => Number.isFinite(at) && Number.isFinite(temperature))) {
    return 'notFinite';
  }
  if (bandLow !== null && bandLow > bandHigh) return 'edgesSwapped';
  return Math.min(holdFor, longestExcursion, longestGap) < 0 ? 'negativeDuration' : null;
}

const timeIn = (stretches: readonly Stretch[], state: StretchState): Second =>
  second(stretches.reduce((total, part) => (part.state === state ? total + part.to - part.from : total), 0));

function longestAboveOf(stretches: readonly Stretch[]): Excursion | null {
  let longest: Excursion | null = null;
  for (const { from, to, state } of stretches) {
    if (state === 'above' && to - from > (longest?.lasted ?? 0)) {
      longest = { from: second(from), lasted: second(to - from) };
    }
  }
  return longest;
}

function outcomeOf(
  stretches: readonly Stretch[],
  hold: Hold,
  { holdFor, longestExcursion }: Required<PullDownInputs>,
): PullDownOutcome {
  const last = stretches.findLast(({ state }) => state !== 'unknown');
  if (last === undefined) return 'tooShort';
  if (!stretches.some(({ state }) => state === 'inBand')) return 'neverReached';
  if (hold.from !== null) return hold.lasted >= holdFor - TOLERANCE_S ? 'held' : 'notLongEnough';
  // A log that ends in the dark hasn't shown that it broke away.
  const isOut = last === stretches.at(-1) && last.to - last.from > longestExcursion + TOLERANCE_S;
  return isOut ? 'brokeAway' : 'notLongEnough';
}

function workingOf(inputs: Required<PullDownInputs>, result: Omit<PullDownAnalysis, 'working'>): Working {
  const seconds = (label: string, value: number | null): WorkingLine[] =>
    value === null ? [] : [{ label, value, unit: 's' }];
  const temperature = (label: string, value: number | undefined | null): WorkingLine[] =>
    value === undefined || value === null ? [] : [{ label, value, unit: 'K' }];
  return {
    formula: 'pullDown',
    source: 'straight lines between samples; trapezium rule; the band and the time are the template’s',
    lines: [
      { label: 'samplesRead', value: inputs.samples.length, unit: 'count' },
      ...temperature('bandLow', inputs.bandLow),
      ...temperature('bandHigh', inputs.bandHigh),
      ...seconds('holdFor', inputs.holdFor),
      ...seconds('longestExcursion', inputs.longestExcursion),
      ...seconds('longestGap', inputs.longestGap),
      ...seconds('reachedAt', result.reachedAt),
      ...temperature('minimumTemperature', result.afterReaching?.minimum),
      ...temperature('maximumTemperature', result.afterReaching?.maximum),
      ...temperature('timeWeightedMean', result.afterReaching?.mean),
      ...seconds('timeAbove', result.timeAbove),
      ...seconds('timeBelow', result.timeBelow),
      ...seconds('timeUnknown', result.timeUnknown),
      ...seconds('longestAbove', result.longestAbove?.lasted ?? null),
      { label: 'restarts', value: result.restarts.length, unit: 'count' },
      ...seconds('heldFrom', result.heldFrom),
      ...seconds('heldFor', result.heldFor),
    ],
  };
}

/**
 * Whether a box came down to its band and held it. The hold counts from when the band was reached for good: too long an
 * excursion, above or below, begins it anew, and so does a gap in the log. It ends with the last moment in the band.
 *
 * @param given temperatures in kelvin at seconds of any clock
 * @returns what happened and an outcome; or why it can't be told: a value that is no number, a band whose edges are
 *   swapped, a duration below zero
 * @source the band and the hours are the template's; for food see `COLD_HOLDING_LIMIT`
 * @example analysePullDown({ samples: [0 s: 300 K, 3600 s: 275 K, …], bandLow: null, bandHigh: 278.15 K, holdFor: 86400 s })
 */
export function analysePullDown(given: PullDownInputs): PullDownResult {
  const inputs = { longestExcursion: NO_TIME, longestGap: LONGEST_GAP, ...given };
  const refusal = refusalOf(inputs);
  if (refusal !== null) return { ok: false, reason: refusal };
  const samples = inOrderOfTime(inputs.samples);
  const band = { lowK: inputs.bandLow, highK: inputs.bandHigh };
  const stretches = stretchesOf(samples, band, inputs.longestGap);
  const reached = stretches.findIndex(({ state }) => state === 'inBand');
  const after = reached === -1 ? [] : stretches.slice(reached);
  const reachedAt = after[0] === undefined ? null : second(after[0].from);
  const hold = holdOf(stretches, inputs.longestExcursion);
  const result = {
    ok: true as const,
    outcome: outcomeOf(stretches, hold, inputs),
    reachedAt,
    longestAbove: longestAboveOf(after),
    timeAbove: timeIn(after, 'above'),
    timeBelow: timeIn(after, 'below'),
    timeUnknown: timeIn(after, 'unknown'),
    afterReaching: reachedAt === null ? null : rangeAfter(samples, reachedAt, inputs.longestGap),
    heldFrom: hold.from,
    heldFor: hold.lasted,
    restarts: hold.restarts,
  };
  return { ...result, working: workingOf(inputs, result) };
}
