import { kelvinDifference, second, type KelvinDifference, type Second } from '../../units/quantity';
import { huntingMean } from '../hunting-mean';
import { timeWeightedMean, type SuperheatSample } from '../time-weighted-mean';
import type { Working, WorkingLine } from '../working';
import { inOrderOfTime } from './in-order-of-time';
import { meanBetween } from './trace-mean';
import { FEWEST_TURNS, swingOf, type Swing } from './trace-period';

/** What counts as hunting and as settled. All common practice, no publication. */
export interface SuperheatTraceLimits {
  /** A repeating swing hunts when it is larger than this from peak to peak; 2 K unless told. */
  readonly huntsAboveK?: number;
  /** How long a valve that doesn't hunt must have been watched; 300 s unless told. */
  readonly steadyForS?: number;
  /** How many periods of a cycle must have been watched; 3 unless told. */
  readonly wholePeriods?: number;
  /** The trace has settled when its mean drifts by less than this from its first to its last part; 0.5 K unless told. */
  readonly driftBelowK?: number;
}

export type Settled = 'yes' | 'no' | 'tooShort';

export interface SuperheatTraceAnalysis {
  readonly ok: true;
  readonly duration: Second;
  /** Time-weighted. */
  readonly mean: KelvinDifference;
  readonly minimum: KelvinDifference;
  readonly maximum: KelvinDifference;
  /** The middle between the two, as the trade takes it. */
  readonly midpoint: KelvinDifference;
  /** From peak to peak. */
  readonly amplitude: KelvinDifference;
  /** Null when no cycle repeats. */
  readonly period: Second | null;
  readonly hunts: boolean;
  readonly settled: Settled;
  /** Mean of the last part minus that of the first. */
  readonly drift: KelvinDifference;
  /** Whether liquid may have left the coil: the minimum is at or below saturation. */
  readonly liquidRisk: boolean;
  /** The longest time between two samples: how much lies between them nobody saw. */
  readonly longestStep: Second;
  readonly working: Working;
}

export type SuperheatTraceAnalysisResult =
  SuperheatTraceAnalysis | { readonly ok: false; readonly reason: 'tooShort' | 'notFinite' };

/** Conversion noise, as in `judgeSuperheat`: far too narrow for any instrument. */
const TOLERANCE_K = 1e-9;
const TOLERANCE_SHARE = 1e-9;

const DEFAULTS: Required<SuperheatTraceLimits> = {
  huntsAboveK: 2,
  steadyForS: 300,
  wholePeriods: 3,
  driftBelowK: 0.5,
};

interface Extremes {
  readonly minimum: KelvinDifference;
  readonly maximum: KelvinDifference;
  readonly longestStep: Second;
}

function extremesOf(samples: readonly SuperheatSample[]): Extremes {
  let minimum = Infinity;
  let maximum = -Infinity;
  let longestStep = 0;
  samples.forEach(({ at, superheat }, index) => {
    minimum = Math.min(minimum, superheat);
    maximum = Math.max(maximum, superheat);
    longestStep = Math.max(longestStep, at - (samples[index - 1]?.at ?? at));
  });
  return {
    minimum: kelvinDifference(minimum),
    maximum: kelvinDifference(maximum),
    longestStep: second(longestStep),
  };
}

/**
 * The means of the first and the last part. Halves of a steady trace; of a hunting one as many whole periods as fit in
 * half of it, because part of a cycle shifts a mean by more than any drift.
 */
function partMeans(samples: readonly SuperheatSample[], period: Second | null) {
  const start = samples[0]?.at ?? second(NaN);
  const end = samples.at(-1)?.at ?? second(NaN);
  const half = (end - start) / 2;
  const periods = period === null ? 0 : Math.max(Math.floor(half / period), 1) * period;
  const length = period === null || periods > 2 * half ? half : periods;
  const first = meanBetween(samples, start, second(start + length));
  const last = meanBetween(samples, second(end - length), end);
  return first === undefined || last === undefined ? undefined : { first, last };
}

function settledOf(
  trace: {
    readonly duration: number;
    readonly amplitude: number;
    readonly drift: number;
    readonly hunts: boolean;
  },
  swing: Swing,
  limits: Required<SuperheatTraceLimits>,
): Settled {
  const periods = limits.wholePeriods * (swing.period ?? 0);
  // A small swing may be flutter that happens to repeat: then the few seconds of its periods prove nothing.
  const needed = trace.hunts ? periods : Math.max(limits.steadyForS, periods);
  if (trace.duration < needed * (1 - TOLERANCE_SHARE)) return 'tooShort';
  if (swing.period === null && trace.amplitude > limits.huntsAboveK) {
    // A slow cycle or two may be the beginning of several; a swing that comes back irregularly, or doesn't, is not settled.
    return swing.turns > 0 && swing.turns < FEWEST_TURNS ? 'tooShort' : 'no';
  }
  return Math.abs(trace.drift) < limits.driftBelowK ? 'yes' : 'no';
}

function workingOf(
  samples: number,
  parts: { readonly first: number; readonly last: number },
  trace: Omit<SuperheatTraceAnalysis, 'working' | 'ok'>,
): Working {
  const difference = (label: string, value: number): WorkingLine => ({ label, value, unit: 'K_diff' });
  return {
    formula: 'superheatTraceMean',
    source: 'trapezium rule; period by passings with hysteresis; limits of hunting: common practice',
    lines: [
      { label: 'samplesUsed', value: samples, unit: 'count' },
      { label: 'duration', value: trace.duration, unit: 's' },
      { label: 'longestStep', value: trace.longestStep, unit: 's' },
      difference('minimumSuperheat', trace.minimum),
      difference('maximumSuperheat', trace.maximum),
      difference('midpointSuperheat', trace.midpoint),
      difference('amplitude', trace.amplitude),
      ...(trace.period === null ? [] : [{ label: 'period', value: trace.period, unit: 's' } as const]),
      difference('firstPartMean', parts.first),
      difference('lastPartMean', parts.last),
      difference('drift', trace.drift),
      difference('timeWeightedMean', trace.mean),
    ],
  };
}

/**
 * What a log of one valve's superheat shows: its time-weighted mean, its extremes, whether it hunts, and whether it was
 * watched long enough and held still enough to be judged. A pull-down or a defrost in the log shows as not settled.
 *
 * @param input superheats in kelvin at seconds, in any order; of two at the same time the first counts
 * @param limits of hunting and settling, see `SuperheatTraceLimits`
 * @returns differences in kelvin, never clamped; `notFinite` when any value is no number, `tooShort` for fewer than two
 *   moments
 * @source trapezium rule; thresholds are common practice, no publication
 * @example analyseSuperheatTrace([0 s: 2 °F, 20 s: 2, 80 s: 14, 90 s: 14, 140 s: 2]) // mean 7.57 °F, midpoint 8 °F
 */
export function analyseSuperheatTrace(
  input: readonly SuperheatSample[],
  limits: SuperheatTraceLimits = {},
): SuperheatTraceAnalysisResult {
  if (!input.every(({ at, superheat }) => Number.isFinite(at) && Number.isFinite(superheat))) {
    return { ok: false, reason: 'notFinite' };
  }
  const samples = inOrderOfTime(input);
  const mean = timeWeightedMean(samples);
  if (mean === undefined) return { ok: false, reason: 'tooShort' };
  const bounds = { ...DEFAULTS, ...limits };
  const { minimum, maximum, longestStep } = extremesOf(samples);
  const swing = swingOf(samples, mean);
  const parts = partMeans(samples, swing.period) ?? { first: mean, last: mean };
  const duration = second((samples.at(-1)?.at ?? NaN) - (samples[0]?.at ?? NaN));
  const amplitude = kelvinDifference(maximum - minimum);
  const drift = kelvinDifference(parts.last - parts.first);
  const hunts = swing.period !== null && amplitude > bounds.huntsAboveK;
  const trace = {
    duration,
    mean,
    minimum,
    maximum,
    midpoint: huntingMean(maximum, minimum),
    amplitude,
    period: swing.period,
    hunts,
    settled: settledOf({ duration, amplitude, drift, hunts }, swing, bounds),
    drift,
    liquidRisk: minimum <= TOLERANCE_K,
    longestStep,
  };
  return { ok: true, ...trace, working: workingOf(samples.length, parts, trace) };
}
