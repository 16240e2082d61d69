import { second, type Second } from '../../units/quantity';
import type { SuperheatSample } from '../time-weighted-mean';

/** How often a trace swings. */
export interface Swing {
  /** From one swing to the next; null when no cycle repeats. */
  readonly period: Second | null;
  /** Whole turns that were seen, regular or not: from rise to rise and from fall to fall. */
  readonly turns: number;
}

/** How far from the mean to either edge a swing must go to count, so that a probe's flutter doesn't. */
const HYSTERESIS = 0.25;
/** A turn this much longer or shorter than the median one is irregular. */
const REGULAR_WITHIN = 0.3;
const FEWEST_REGULAR = 0.7;
/** Three whole periods show as three turns at least, wherever in the cycle the trace begins. */
export const FEWEST_TURNS = 3;

/**
 * The value below which a trace spends a share of its time.
 *
 * @param samples in ascending order of time
 * @param share from 0 to 1
 * @returns superheat in kelvin, one of the samples'
 */
function quantileK(samples: readonly SuperheatSample[], share: number): number {
  const weighted = samples.map(({ at, superheat }, index) => ({
    superheat,
    lasts: ((samples[index + 1]?.at ?? at) - (samples[index - 1]?.at ?? at)) / 2,
  }));
  weighted.sort((a, b) => a.superheat - b.superheat);
  let left = share * weighted.reduce((total, { lasts }) => total + lasts, 0);
  for (const { superheat, lasts } of weighted) {
    left -= lasts;
    if (left <= 0) return superheat;
  }
  return weighted.at(-1)?.superheat ?? NaN;
}

/** When the trace passes a level upwards (or downwards), once it has been on the far side of the other level. */
function passings(samples: readonly SuperheatSample[], level: number, other: number): number[] {
  const sign = Math.sign(level - other);
  const times: number[] = [];
  let isArmed = false;
  let previous: SuperheatSample | undefined;
  for (const sample of samples) {
    if ((sample.superheat - other) * sign < 0) isArmed = true;
    if (isArmed && previous !== undefined && (sample.superheat - level) * sign > 0) {
      const share = (level - previous.superheat) / (sample.superheat - previous.superheat);
      times.push(previous.at + share * (sample.at - previous.at));
      isArmed = false;
    }
    previous = sample;
  }
  return times;
}

const steps = (times: readonly number[]): number[] =>
  times.slice(1).map((time, index) => time - (times[index] ?? NaN));

const median = (sorted: readonly number[]): number =>
  ((sorted[(sorted.length - 1) >> 1] ?? NaN) + (sorted[sorted.length >> 1] ?? NaN)) / 2;

/**
 * The period of a hunting valve. Method: passings of two levels, a quarter of the way from the mean to where the trace
 * spends its lowest and its highest twentieth, so that neither flutter nor one wild sample counts; the median time
 * between passings in the same direction, where at least three such times are known and most of them are alike.
 *
 * @param samples in ascending order of time
 * @param meanK of the trace, in kelvin
 * @returns the period in seconds, null when no cycle repeats
 * @source hysteresis as in any two-point controller; the shares are common practice, no publication
 */
export function swingOf(samples: readonly SuperheatSample[], meanK: number): Swing {
  const upperK = meanK + HYSTERESIS * (quantileK(samples, 0.95) - meanK);
  const lowerK = meanK + HYSTERESIS * (quantileK(samples, 0.05) - meanK);
  // A trace that lies on its mean nearly always has no levels to pass.
  if (!(upperK > lowerK)) return { period: null, turns: 0 };
  const rises = steps(passings(samples, upperK, lowerK));
  const falls = steps(passings(samples, lowerK, upperK));
  const turns = [...rises, ...falls].sort((a, b) => a - b);
  const usual = median(turns);
  const regular = turns.filter((turn) => Math.abs(turn - usual) <= REGULAR_WITHIN * usual);
  const repeats = turns.length >= FEWEST_TURNS && regular.length >= FEWEST_REGULAR * turns.length;
  return { period: repeats ? second(usual) : null, turns: turns.length };
}
