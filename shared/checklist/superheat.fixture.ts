import { fahrenheit, psig } from '../refrigeration/readings.fixture';
import type { SequenceFacts } from './facts';
import { judge } from './judge';
import type { Judgement } from './judgement';
import type { SuperheatAnswer, SuperheatObservation, SuperheatStep } from './kinds/superheat';
import { buildStep, fahrenheitDegrees, pair, SEA_LEVEL, steady } from './step.fixture';

// Superheats of R-404A as somebody reads them, for specs.

export const FACTS: SequenceFacts = { ...SEA_LEVEL, refrigerant: 'R-404A' };

/** Against a band in °F of difference. */
export function judgeFor(
  answer: SuperheatAnswer,
  [low, high]: readonly [number, number] = [5, 7],
  { facts = {}, step = {} }: { facts?: Partial<SequenceFacts>; step?: Partial<SuperheatStep> } = {},
): Judgement {
  const band = { lowK: fahrenheitDegrees(low), highK: fahrenheitDegrees(high) };
  return judge(buildStep('superheat', { band, ...step }), answer, { ...FACTS, ...facts });
}

export function inDegrees(judgement: Judgement, label = 'superheat'): number {
  const found = judgement.figures.find((candidate) => candidate.label === label);
  if (!found) throw new Error(`no figure ${label}`);
  return (found.value * 9) / 5;
}

export const kinds = ({ doubts }: Judgement) => doubts.map((doubt) => `${doubt.severity} ${doubt.kind}`);
export const labels = (judgement: Judgement) =>
  judgement.working.flatMap(({ lines }) => lines.map(({ label }) => label));
export const lineOf = (judgement: Judgement, wanted: string) =>
  judgement.working.flatMap(({ lines }) => lines).find(({ label }) => label === wanted);

/** Readings written as second:°F at one pressure. */
export const pointsOf = (points: string): [number, number][] =>
  points.split(' ').map((point) => point.split(':').map(Number) as [number, number]);

export const seriesOf = (points: string, gaugePsi = '16'): SuperheatObservation => ({
  valve: 'series',
  readings: pointsOf(points).map(([atS, degF]) => ({ atS, ...pair(gaugePsi, String(degF)) })),
});

export const FILE = { name: 'coil.csv', sha256: 'c'.repeat(64), rows: 5 };

export const logOf = (points: string, gaugePsi = 16): SuperheatObservation & { valve: 'log' } => ({
  valve: 'log',
  file: FILE,
  atS: pointsOf(points).map(([atS]) => atS),
  pressurePag: pointsOf(points).map(() => psig(gaugePsi)),
  temperatureK: pointsOf(points).map(([, degF]) => fahrenheit(degF)),
});

export const left = (
  asLeft: SuperheatObservation,
  change: Partial<SuperheatAnswer> = {},
): SuperheatAnswer => ({
  kind: 'superheat',
  asFound: null,
  asLeft,
  ...change,
});

// R-404A at 16.0 psig: dew −20.0 °F, so −14 °F is 6.0 °F.
export const STEADY = steady(pair('16.0', '-14'));

// The swings of a worked example of time-weighted means, as line temperatures at a dew of −20 °F.
export const SWING_FROM_2_TO_14 = '0:-18 20:-18 80:-6 90:-6 140:-18';
export const SWING_FROM_3_TO_15 = '0:-17 90:-17 100:-5 120:-5 140:-17';
