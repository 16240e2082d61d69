import { kelvinDifference, type KelvinDifference } from '../units/quantity';

/** The superheats that a fixture's specification allows, edges included. */
export interface SuperheatBand {
  readonly low: KelvinDifference;
  readonly high: KelvinDifference;
}

export interface SuperheatJudgement {
  readonly outcome: 'within' | 'outside';
  /** Which way it is outside; null when within, or when there is no number to judge. */
  readonly side: 'low' | 'high' | null;
  /** How far outside, in kelvin, never negative; zero when within. */
  readonly distance: KelvinDifference;
  /** Whether liquid may be leaving the coil: the mean or the minimum is at or below saturation, or unknown. */
  readonly liquidRisk: boolean;
}

/** Wide enough for conversion noise, far too narrow for any instrument. */
const TOLERANCE_K = 1e-9;

const isDry = (superheat: KelvinDifference): boolean => superheat > TOLERANCE_K;

/**
 * Judges a superheat against a fixture's band. The outcome follows the mean alone; a hunting valve whose minimum touches
 * saturation shows in `liquidRisk`, whatever the outcome.
 *
 * @param mean in kelvin. At or below zero it is outside and low, whatever the band says
 * @param band in kelvin; an edge counts as within (1e-9 K of tolerance). With its edges swapped nothing is within
 * @param minimum lowest superheat while the valve hunted, in kelvin; leave out when it was steady
 * @returns the judgement; a mean that is not a number is outside with a liquid risk
 * @source the band is the specification's; that zero is never a pass is common practice
 * @example judgeSuperheat(kelvinDifference(5), { low: kelvinDifference(3), high: kelvinDifference(4) }) // outside, high, 1
 */
export function judgeSuperheat(
  mean: KelvinDifference,
  band: SuperheatBand,
  minimum: KelvinDifference = mean,
): SuperheatJudgement {
  const liquidRisk = !isDry(mean) || !isDry(minimum);
  const judged = (
    outcome: 'within' | 'outside',
    side: 'low' | 'high' | null,
    distance: number,
  ): SuperheatJudgement => ({
    outcome,
    side,
    distance: kelvinDifference(distance),
    liquidRisk,
  });
  if (!isDry(mean) && !Number.isNaN(mean))
    return judged('outside', 'low', Math.max(Math.max(band.low, 0) - mean, 0));
  if (mean < band.low - TOLERANCE_K) return judged('outside', 'low', band.low - mean);
  if (mean > band.high + TOLERANCE_K) return judged('outside', 'high', mean - band.high);
  // A NaN anywhere fails every comparison and must not end up as a pass.
  if (mean >= band.low - TOLERANCE_K && mean <= band.high + TOLERANCE_K) return judged('within', null, 0);
  return judged('outside', null, 0);
}
