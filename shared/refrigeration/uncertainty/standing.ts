import type { KelvinDifference } from '../../units/quantity';
import { judgeSuperheat, type SuperheatBand } from '../superheat-band';

/**
 * Where a reading stands against its band once its own uncertainty is known. `inside`, `outside`: whatever the
 * instruments' error; `insideWithinError`, `outsideWithinError`: the reading is on that side of an edge, the truth may be
 * on the other.
 */
export type Standing = 'inside' | 'insideWithinError' | 'outsideWithinError' | 'outside';

/** As in `judgeSuperheat`: wide enough for conversion noise only. */
const TOLERANCE_K = 1e-9;

/**
 * Places a reading in or outside its band with its uncertainty. The outcome of a step stays `judgeSuperheat`'s; this tells
 * whether the instruments can vouch for it.
 *
 * @param value superheat or subcooling, in kelvin
 * @param band in kelvin, edges included
 * @param uncertainty half width in kelvin, zero or more
 * @returns the standing; a superheat at or below zero, a figure that is not a number, a negative uncertainty and a band with
 *   its edges swapped are `outside`
 * @source common practice: an edge nearer than the uncertainty can't be told from the reading
 * @example standingOf(kelvinDifference(3.5), { low: kelvinDifference(3), high: kelvinDifference(5) }, kelvinDifference(0.8))
 *   // 'insideWithinError'
 */
export function standingOf(
  value: KelvinDifference,
  band: SuperheatBand,
  uncertainty: KelvinDifference,
): Standing {
  if (!Number.isFinite(value) || !(uncertainty >= 0) || !(band.low <= band.high)) return 'outside';
  const { outcome } = judgeSuperheat(value, band);
  if (outcome === 'within') {
    const toEdge = Math.min(value - band.low, band.high - value);
    return uncertainty > Math.max(toEdge, 0) + TOLERANCE_K ? 'insideWithinError' : 'inside';
  }
  // Wet gas is never explained away by the instruments.
  if (value <= TOLERANCE_K) return 'outside';
  const beyondEdge = Math.max(band.low - value, value - band.high);
  return beyondEdge <= uncertainty + TOLERANCE_K ? 'outsideWithinError' : 'outside';
}
