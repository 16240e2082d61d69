import {
  analysePullDown,
  type PullDownAnalysis,
  type PullDownResult,
} from '../refrigeration/logger/pull-down';
import { kelvin, second } from '../units/quantity';
import type { SequenceFacts } from './facts';
import { refusedJudgement, type Figure, type Judgement } from './judgement';
import type { TrendAnswer, TrendStep } from './kinds/trend';
import { physicalDoubt } from './physical-range';
import { judged, refusedBy } from './methods/judged';

/**
 * What a log shows against its step's band: the one analysis for the judgement and for whoever draws the log.
 *
 * @param answer with one temperature for each time
 * @returns as `analysePullDown`
 */
export function trendAnalysis(step: TrendStep, answer: TrendAnswer): PullDownResult {
  return analysePullDown({
    samples: answer.atS.map((at, index) => ({
      at: second(at),
      temperature: kelvin(answer.temperatureK[index] ?? NaN),
    })),
    bandLow: step.bandLowK === null ? null : kelvin(step.bandLowK),
    bandHigh: kelvin(step.bandHighK),
    holdFor: second(step.holdS),
    longestExcursion: second(step.longestExcursionS),
  });
}

/**
 * Judges a log of temperatures: when the band was reached, the longest time above it afterwards, and whether it held for
 * the time that the step asks. A hold that is still too short is kept without counting: the log goes on.
 */
export function judgeTrend(step: TrendStep, answer: TrendAnswer, _facts: SequenceFacts): Judgement {
  if (answer.atS.length !== answer.temperatureK.length) return refusedJudgement('tooFewSamples');
  if (answer.temperatureK.some((value) => physicalDoubt('temperature', value) !== null))
    return refusedJudgement('notPlausible');
  const result = trendAnalysis(step, answer);
  if (!result.ok) return refusedBy(result.reason);
  if (result.outcome === 'tooShort') return refusedJudgement('tooFewSamples');
  const goesOn = result.outcome === 'notLongEnough';
  return judged({
    outcome: goesOn ? 'recorded' : result.outcome === 'held' ? 'within' : 'outside',
    side:
      result.outcome === 'neverReached' || result.outcome === 'brokeAway' ? sideAtEnd(step, answer) : null,
    verdicts: [`trend_${result.outcome}`],
    doubts: goesOn ? [{ kind: 'incomplete', severity: 'keep' }] : [],
    figures: figuresOf(result),
    limit: { low: step.holdS, high: null, unit: 's' },
    working: [result.working],
    source: step.source ?? '',
  });
}

/** Where the log ends when it ends out of the band: a fixture can also be too cold. */
function sideAtEnd({ bandLowK }: TrendStep, { atS, temperatureK }: TrendAnswer): 'low' | 'high' {
  const lastS = atS.reduce((latest, at) => Math.max(latest, at), -Infinity);
  const lastK = temperatureK[atS.indexOf(lastS)] ?? NaN;
  return bandLowK !== null && lastK < bandLowK ? 'low' : 'high';
}

function figuresOf(result: PullDownAnalysis): Figure[] {
  const figures: Figure[] = [{ label: 'heldFor', value: result.heldFor, unit: 's' }];
  if (result.reachedAt !== null) figures.push({ label: 'reachedAt', value: result.reachedAt, unit: 's' });
  if (result.longestAbove)
    figures.push({ label: 'longestAbove', value: result.longestAbove.lasted, unit: 's' });
  if (result.afterReaching) {
    figures.push({ label: 'minimumTemperature', value: result.afterReaching.minimum, unit: 'K' });
    figures.push({ label: 'maximumTemperature', value: result.afterReaching.maximum, unit: 'K' });
  }
  return figures;
}
