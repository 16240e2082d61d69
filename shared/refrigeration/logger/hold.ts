import { second, type Second } from '../../units/quantity';
import type { Stretch } from './stretches';

/** Why a hold began anew, and when. */
export interface HoldRestart {
  readonly at: Second;
  readonly lasted: Second;
  readonly because: 'above' | 'below' | 'gap';
}

export interface Hold {
  /** When the band was reached for good; null when the log doesn't end in a hold. */
  readonly from: Second | null;
  /** From then to the last moment in the band. */
  readonly lasted: Second;
  /** Every restart after the band was first reached. */
  readonly restarts: readonly HoldRestart[];
}

/** Conversion and interpolation noise of an allowed excursion. */
const TOLERANCE_S = 1e-6;

/**
 * The hold in which a log ends. An excursion longer than allowed begins it anew, and so does an unknown stretch of any
 * length, since nobody saw what happened in it.
 *
 * @param stretches of the whole log
 * @param longestExcursionS the longest time out of the band that doesn't count
 * @returns the last hold and every restart before it
 */
export function holdOf(stretches: readonly Stretch[], longestExcursionS: number): Hold {
  const restarts: HoldRestart[] = [];
  let from: number | null = null;
  let until = NaN;
  let wasReached = false;
  for (const stretch of stretches) {
    const lasted = stretch.to - stretch.from;
    if (stretch.state === 'inBand') {
      from ??= stretch.from;
      until = stretch.to;
      wasReached = true;
    } else if (stretch.state === 'unknown' || lasted > longestExcursionS + TOLERANCE_S) {
      from = null;
      const because = stretch.state === 'unknown' ? 'gap' : stretch.state;
      if (wasReached) restarts.push({ at: second(stretch.from), lasted: second(lasted), because });
    }
  }
  return {
    from: from === null ? null : second(from),
    lasted: second(from === null ? 0 : until - from),
    restarts,
  };
}
