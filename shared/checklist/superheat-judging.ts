import { findRefrigerant } from '../refrigeration/saturation/refrigerants';
import type { SaturationTable } from '../refrigeration/saturation/saturation-table';
import { doubtSuperheatInputs } from '../refrigeration/doubt-superheat-inputs';
import { huntingMean } from '../refrigeration/hunting-mean';
import { superheat } from '../refrigeration/superheat';
import { judgeSuperheat } from '../refrigeration/superheat-band';
import { fromSi } from '../units/convert';
import {
  kelvin,
  kelvinDifference,
  pascalAbsolute,
  pascalGauge,
  type KelvinDifference,
} from '../units/quantity';
import type { SequenceFacts } from './facts';
import { plainJudgement, refusedJudgement, type Doubt, type Figure, type Judgement } from './judgement';
import type { SuperheatAnswer, SuperheatObservation, SuperheatPair, SuperheatStep } from './kinds/superheat';
import { readTypedValue } from './typed-value';

interface PairResult {
  readonly superheat: KelvinDifference;
  readonly figures: readonly Figure[];
  readonly working: Judgement['working'][number];
}

interface ObservationResult {
  readonly mean: KelvinDifference;
  readonly minimum: KelvinDifference;
  readonly pairs: readonly PairResult[];
}

/**
 * Judges the superheat of one coil: saturation (dew) at the coil's outlet pressure, the difference to the line
 * temperature at the bulb, and that against the fixture's band. A hunting valve is judged by the mean of its high and
 * its low (common practice, no source); a minimum at or below zero is flagged whatever the mean is. Never clamped.
 */
export function judgeSuperheatAnswer(
  step: SuperheatStep,
  answer: SuperheatAnswer,
  facts: SequenceFacts,
): Judgement {
  const table = findRefrigerant(facts.refrigerant);
  if (!table) return refusedJudgement('unknownRefrigerant');
  const doubts: Doubt[] = [];
  const left = observe(answer.asLeft, table, facts, doubts);
  if (!left) return { ...plainJudgement('recorded', doubts), counts: false };
  const foundDoubts: Doubt[] = [];
  const found = answer.asFound ? observe(answer.asFound, table, facts, foundDoubts) : null;
  // An as-found that can't be read is asked about; it doesn't keep the as-left from counting.
  doubts.push(...foundDoubts.map((doubt) => ({ ...doubt, severity: 'ask' as const })));

  const band = { low: kelvinDifference(step.band.lowK), high: kelvinDifference(step.band.highK) };
  const verdict = judgeSuperheat(left.mean, band, left.minimum);
  if (verdict.liquidRisk) doubts.push({ kind: 'liquidRisk', severity: 'ask' });
  return {
    outcome: verdict.outcome,
    side: verdict.side,
    counts: doubts.every((doubt) => doubt.severity !== 'refuse'),
    doubts: unique(doubts),
    figures: figuresOf(left, found),
    limit: { low: step.band.lowK, high: step.band.highK, unit: 'K_diff', source: step.source ?? '' },
    working: [...left.pairs, ...(found?.pairs ?? [])].map((pair) => pair.working),
  };
}

function figuresOf(left: ObservationResult, found: ObservationResult | null): Figure[] {
  const figures: Figure[] = [{ label: 'superheat', value: left.mean, unit: 'K_diff' }];
  if (left.pairs.length > 1) {
    figures.push({ label: 'superheatLow', value: left.minimum, unit: 'K_diff' });
    figures.push({
      label: 'superheatHigh',
      value: Math.max(...left.pairs.map((pair) => pair.superheat)),
      unit: 'K_diff',
    });
  }
  figures.push(...(left.pairs[0]?.figures ?? []));
  if (found) figures.push({ label: 'superheatAsFound', value: found.mean, unit: 'K_diff' });
  return figures;
}

function observe(
  observation: SuperheatObservation,
  table: SaturationTable,
  facts: SequenceFacts,
  doubts: Doubt[],
): ObservationResult | null {
  if (observation.valve === 'steady') {
    const pair = workOut(observation.pair, table, facts, doubts);
    return pair && { mean: pair.superheat, minimum: pair.superheat, pairs: [pair] };
  }
  const low = workOut(observation.low, table, facts, doubts);
  const high = workOut(observation.high, table, facts, doubts);
  if (!low || !high) return null;
  if (low.superheat > high.superheat) {
    doubts.push({ kind: 'lowAboveHigh', severity: 'refuse' });
    return null;
  }
  return { mean: huntingMean(high.superheat, low.superheat), minimum: low.superheat, pairs: [low, high] };
}

function workOut(
  pair: SuperheatPair,
  table: SaturationTable,
  facts: SequenceFacts,
  doubts: Doubt[],
): PairResult | null {
  const pressure = readTypedValue(pair.pressure, 'gaugePressure');
  const temperature = readTypedValue(pair.temperature, 'temperature');
  if (!pressure.ok || !temperature.ok) {
    const problem = !pressure.ok ? pressure.problem : !temperature.ok ? temperature.problem : 'notANumber';
    doubts.push({ kind: problem, severity: 'refuse' });
    return null;
  }
  const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
  const raised = doubtSuperheatInputs({
    table,
    atmosphere,
    pressureTyped: fromSi(pressure.si, pair.pressure.unit),
    pressureUnit: pair.pressure.unit,
    temperatureTyped: fromSi(temperature.si, pair.temperature.unit),
    temperatureUnit: pair.temperature.unit,
  });
  doubts.push(...raised.map(({ kind, severity }) => ({ kind, severity })));
  if (raised.some((doubt) => doubt.severity === 'refuse')) return null;
  const result = superheat({
    table,
    suctionPressure: pascalGauge(pressure.si),
    atmosphere,
    lineTemperature: kelvin(temperature.si),
  });
  if (!result.ok) {
    doubts.push({ kind: result.reason, severity: 'refuse' });
    return null;
  }
  return {
    superheat: result.superheat,
    working: { ...result.working, lines: [...result.working.lines] },
    figures: [
      { label: 'saturation', value: result.saturation, unit: 'K' },
      { label: 'glide', value: result.glide, unit: 'K_diff' },
    ],
  };
}

function unique(doubts: readonly Doubt[]): Doubt[] {
  return doubts.filter((doubt, index) => doubts.findIndex((other) => other.kind === doubt.kind) === index);
}
