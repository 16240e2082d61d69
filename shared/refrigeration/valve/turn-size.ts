import { toSi } from '../../units/convert';
import type { KelvinDifference } from '../../units/quantity';
import type { SuperheatBand } from '../superheat-band';
import type { WorkingLine } from '../working';
import { kelvinPerClockwiseTurn, type ClockwiseEffect, type ValveLog } from './valve-log';

export type TurnSize = 'eighth' | 'quarter' | 'half';

export interface SizedTurn {
  readonly size: TurnSize;
  readonly sizedBy: 'observed' | 'commonPractice';
  readonly lines: readonly WorkingLine[];
}

/** Nobody turns more than half a turn at a time: a case maker's installation manual. */
const SIZES: readonly (readonly [TurnSize, number])[] = [
  ['half', 0.5],
  ['quarter', 0.25],
  ['eighth', 0.125],
];

/** Distances to the middle of the band from which a turn grows (common practice, no source). */
const HALF_FROM_K = toSi(6, 'degF_diff');
const QUARTER_FROM_K = toSi(2, 'degF_diff');

/** A valve that moves less than this in a full turn tells nothing about the next one. */
const SMALLEST_OBSERVED_K = toSi(1, 'degF_diff');

interface SizeInputs {
  readonly band: SuperheatBand;
  readonly superheat: KelvinDifference;
  readonly clockwiseDoes: ClockwiseEffect | null;
  readonly log: ValveLog;
}

function byPractice(distanceK: number): TurnSize {
  if (distanceK >= HALF_FROM_K) return 'half';
  return distanceK >= QUARTER_FROM_K ? 'quarter' : 'eighth';
}

/** The largest size that doesn't go beyond what is wanted; never less than an eighth. */
const notBeyond = (turns: number): TurnSize =>
  SIZES.find(([, size]) => size <= turns + 1e-9)?.[0] ?? 'eighth';

/** What a turn was seen to do; null when too little was, or the other way than the sheet says. */
function observed({ log, clockwiseDoes }: SizeInputs): number | null {
  const perTurn = kelvinPerClockwiseTurn(log);
  if (perTurn === null || Math.abs(perTurn) < SMALLEST_OBSERVED_K) return null;
  const contradicts = clockwiseDoes !== null && perTurn > 0 !== (clockwiseDoes === 'raisesSuperheat');
  return contradicts ? null : Math.abs(perTurn);
}

/**
 * How far to turn: what brings the superheat to the middle of its band by what at least two turns of this valve did,
 * rounded down to a half, a quarter or an eighth; without such turns half a turn from 6 °F off the middle on, a quarter
 * from 2 °F on, else an eighth. With liquid in the line half a turn at once: how far the coil is flooded can't be seen in
 * a superheat that has reached zero.
 *
 * @param inputs band and superheat in kelvin, the log and what the sheet says
 * @param isLiquid whether the superheat is at or below zero
 * @returns the size, where it comes from, and the figures behind it
 * @source sizes without observation: common practice, no source; half a turn at most: a case maker's installation manual
 * @example turnSize({ band 6 to 8 °F, superheat 12 °F, log: [] … }, false) // quarter: 5 °F off the middle
 */
export function turnSize(inputs: SizeInputs, isLiquid: boolean): SizedTurn {
  const { band, superheat } = inputs;
  const distanceK = Math.abs(superheat - (band.low + band.high) / 2);
  const distance: WorkingLine = { label: 'distanceToMiddle', value: distanceK, unit: 'K_diff' };
  if (isLiquid) return { size: 'half', sizedBy: 'commonPractice', lines: [distance] };
  const perTurn = observed(inputs);
  if (perTurn === null) return { size: byPractice(distanceK), sizedBy: 'commonPractice', lines: [distance] };
  const lines: WorkingLine[] = [distance, { label: 'changePerTurn', value: perTurn, unit: 'K_diff' }];
  return { size: notBeyond(distanceK / perTurn), sizedBy: 'observed', lines };
}
