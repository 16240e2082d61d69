import { fromSi, toSi } from '../../units/convert';
import { kelvin, pascalAbsolute, type Kelvin, type PascalAbsolute } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from '../gauge-pressure';
import { dewPressure } from '../saturation/saturation-curve';
import type { SaturationTable } from '../saturation/saturation-table';
import {
  problem,
  USUAL_PRINTED_STEP_PA,
  type MakersPoint,
  type MakersTableProblem,
  type MakersTableProblemCode,
} from './makers-table';

interface Pair {
  readonly temperature: Kelvin;
  readonly pressure: PascalAbsolute;
}

/** The line through ln p of a table over ln p of a known refrigerant at the same temperatures. */
interface Likeness {
  readonly slope: number;
  /** Root mean square of what the line leaves over. */
  readonly residual: number;
  /** Mean of ln p minus the relative's. */
  readonly offset: number;
}

// Othmer (Ind. Eng. Chem. 32, 841 (1940)): ln p of one substance over ln p of another is nearly a straight line with the
// ratio of latent heats as its slope. Each shipped refrigerant held against the other ones (−50 to 60 °C): best slope
// 0.86 to 1.02, residual up to 0.005. One atmosphere too few leaves 0.10 and more over (R-744 apart), one too many 0.027;
// °F for °C or back makes the slope 1.3 to 1.6, or 0.6 to 0.8.
const STEEPEST = 1.2;
const LARGEST_RESIDUAL = 0.015;
const FEWEST_IN_COMMON = 5;
/** A relative that covers less of the table says too little about it: any short stretch is nearly straight. */
const LEAST_COVERAGE = 0.6;
/** A pressure that many times above or below every relative's is asked about. */
const FAR = 2;

function likenessTo(relative: SaturationTable, pairs: readonly Pair[]): Likeness | null {
  const common = pairs.flatMap(({ temperature, pressure }) => {
    const known = dewPressure(relative, temperature);
    return known.ok && pressure > 0 ? [{ x: Math.log(known.pressure), y: Math.log(pressure) }] : [];
  });
  if (common.length < Math.max(FEWEST_IN_COMMON, LEAST_COVERAGE * pairs.length)) return null;
  const mean = (values: readonly number[]): number => values.reduce((sum, v) => sum + v, 0) / values.length;
  const meanX = mean(common.map(({ x }) => x));
  const meanY = mean(common.map(({ y }) => y));
  const slope =
    mean(common.map(({ x, y }) => (x - meanX) * (y - meanY))) / mean(common.map(({ x }) => (x - meanX) ** 2));
  const residual = Math.sqrt(mean(common.map(({ x, y }) => (y - meanY - slope * (x - meanX)) ** 2)));
  return { slope, residual, offset: meanY - meanX };
}

const isAlike = ({ slope, residual }: Likeness, rounding: number): boolean =>
  Math.abs(Math.log(slope)) <= Math.log(STEEPEST) && residual <= LARGEST_RESIDUAL + rounding;

/** Each mistake with what undoes it. */
const MISTAKES: readonly (readonly [MakersTableProblemCode, (pair: Pair) => Pair])[] = [
  [
    'gaugeTakenForAbsolute',
    (pair) => ({ ...pair, pressure: pascalAbsolute(pair.pressure + SEA_LEVEL_ATMOSPHERE) }),
  ],
  [
    'absoluteTakenForGauge',
    (pair) => ({ ...pair, pressure: pascalAbsolute(pair.pressure - SEA_LEVEL_ATMOSPHERE) }),
  ],
  [
    'celsiusInFahrenheit',
    (pair) => ({ ...pair, temperature: kelvin(toSi(fromSi(pair.temperature, 'degF'), 'degC')) }),
  ],
  [
    'fahrenheitInCelsius',
    (pair) => ({ ...pair, temperature: kelvin(toSi(fromSi(pair.temperature, 'degC'), 'degF')) }),
  ],
];

/**
 * Whether the figures behave like a refrigerant at all, and which mistake explains it when they don't.
 *
 * @param points ascending; pressures at or below zero are passed over
 * @param relatives tables that are known to be right; with none, or too little range in common, nothing is asked
 * @param printedStepPa last printed digit of the pressures in pascals
 * @returns questions, never refusals. A mistake is named only when the figures behave like no refrigerant as they stand
 *   and do after undoing it
 * @source Othmer, Ind. Eng. Chem. 32, 841 (1940) for the method (from memory); limits worked out from the shipped tables
 */
export function likenessProblems(
  points: readonly MakersPoint[],
  relatives: readonly SaturationTable[],
  printedStepPa: number = USUAL_PRINTED_STEP_PA,
): MakersTableProblem[] {
  // With its columns swapped the lower pressure is still the dew.
  const pairs = points.map(({ temperature, bubble, dew }) => ({
    temperature,
    pressure: pascalAbsolute(Math.min(bubble, dew)),
  }));
  const rounding = Math.max(
    0,
    ...pairs.filter((p) => p.pressure > 0).map((p) => printedStepPa / 2 / p.pressure),
  );
  const likenesses = (tried: readonly Pair[]): Likeness[] =>
    relatives.map((relative) => likenessTo(relative, tried)).filter((found) => found !== null);
  // Passing over a pressure that can't be must not make the rest convincing.
  const convinces = (tried: readonly Pair[]): boolean =>
    tried.every(({ pressure }) => pressure > 0) &&
    likenesses(tried).some((found) => isAlike(found, rounding));
  const asTyped = likenesses(pairs);
  if (convinces(pairs)) return distanceProblems(asTyped);
  const mistakes = MISTAKES.filter(([, undo]) => convinces(pairs.map(undo))).map(([code]) =>
    problem(code, 'ask'),
  );
  if (mistakes.length > 0 || asTyped.length === 0) return mistakes;
  return [problem('unlikeAnyRefrigerant', 'ask', { values: valuesOf(asTyped) })];
}

const closest = (likenesses: readonly Likeness[]): Likeness | undefined =>
  likenesses.toSorted((a, b) => Math.abs(a.offset) - Math.abs(b.offset))[0];

const valuesOf = (likenesses: readonly Likeness[]): MakersTableProblem['values'] => {
  const nearest = closest(likenesses);
  return nearest === undefined
    ? []
    : [{ label: 'pressureRatio', value: Math.exp(nearest.offset), unit: 'fraction' }];
};

function distanceProblems(likenesses: readonly Likeness[]): MakersTableProblem[] {
  const nearest = closest(likenesses);
  if (nearest === undefined || Math.abs(nearest.offset) <= Math.log(FAR)) return [];
  return [problem('farFromRelatives', 'ask', { values: valuesOf(likenesses) })];
}
