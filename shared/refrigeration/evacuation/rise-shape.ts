import { pascalAbsolute, type PascalAbsolute, type Second } from '../../units/quantity';

/** One reading of a vacuum gauge, and when, counted from any start. */
export interface VacuumReading {
  readonly at: Second;
  readonly pressure: PascalAbsolute;
}

/** How a rise runs. The slopes are those of its first and of its last third. */
export interface RiseShape {
  readonly startSlopePaPerS: number;
  readonly endSlopePaPerS: number;
  /** Whether the rise has all but stopped. */
  readonly levelled: boolean;
  /** Where it comes to rest if it goes on like this; null when it hardly bends, or upwards. */
  readonly plateau: PascalAbsolute | null;
}

/**
 * A rise has levelled off when its last third is no steeper than this fraction of its first third (common practice has
 * only "levels off", no number). Water reaches it after about two of its time constants, a leak at constant inflow never.
 */
export const LEVELLED_SLOPE_FRACTION = 0.25;

/** Beyond this many times the watched time, the bend is too slight to say where the rise will rest. */
const LONGEST_TIME_CONSTANT = 3;

/** Floating-point noise of a conversion: a micron in four years. */
const NOISE_PA_PER_S = 1e-9;

interface Point {
  readonly atS: number;
  readonly pressurePa: number;
}

interface Chord {
  readonly from: Point;
  readonly to: Point;
  readonly slopePaPerS: number;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const upper = sorted[Math.floor(sorted.length / 2)] ?? NaN;
  const lower = sorted[Math.floor((sorted.length - 1) / 2)] ?? NaN;
  return (lower + upper) / 2;
}

const middleOf = (readings: readonly VacuumReading[]): Point => ({
  atS: median(readings.map((reading) => reading.at)),
  pressurePa: median(readings.map((reading) => reading.pressure)),
});

/** From the middle of the earlier half to the middle of the later one; a middle reading belongs to both. */
function chordOf(readings: readonly VacuumReading[]): Chord | null {
  if (readings.length < 2) return null;
  const half = Math.ceil(readings.length / 2);
  const from = middleOf(readings.slice(0, half));
  const to = middleOf(readings.slice(-half));
  return { from, to, slopePaPerS: (to.pressurePa - from.pressurePa) / (to.atS - from.atS) };
}

const middleTimeS = ({ from, to }: Chord): number => (from.atS + to.atS) / 2;

function plateauOf(first: Chord, last: Chord, watchedS: number): PascalAbsolute | null {
  if (last.slopePaPerS <= 0) return pascalAbsolute(last.to.pressurePa);
  if (first.slopePaPerS <= last.slopePaPerS) return null;
  const timeConstantS =
    (middleTimeS(last) - middleTimeS(first)) / Math.log(first.slopePaPerS / last.slopePaPerS);
  if (timeConstantS > LONGEST_TIME_CONSTANT * watchedS) return null;
  const covered = 1 - Math.exp(-(last.to.atS - last.from.atS) / timeConstantS);
  const plateauPa = last.from.pressurePa + (last.to.pressurePa - last.from.pressurePa) / covered;
  return Number.isFinite(plateauPa) ? pascalAbsolute(plateauPa) : null;
}

/**
 * Whether a pressure that rises in an isolated system goes on rising or levels off. Each third's slope runs between the
 * medians of its two halves (Tukey's resistant line), so one wild reading moves nothing. The plateau is that of
 * p = p∞ − Δ·e^(−t/τ) with τ from the two slopes, given up when τ is over
 * three times the time watched.
 *
 * @param readings two or more, in ascending order of time, seconds and pascals
 * @returns slopes in pascals for each second, whether it levelled, and the plateau in pascals; null when the first or the
 *   last third of the time holds fewer than two readings
 * @source resistant line: J. W. Tukey, Exploratory Data Analysis (1977), from memory; one time constant for water that
 *   evaporates into a closed volume; the threshold is common practice without a publication
 * @example riseShape([0 s: 40 Pa, 1200 s: 90 Pa, 2400 s: 98 Pa, 3600 s: 99 Pa]) // levelled, plateau near 99 Pa
 */
export function riseShape(readings: readonly VacuumReading[]): RiseShape | null {
  const startS = readings[0]?.at ?? NaN;
  const endS = readings.at(-1)?.at ?? NaN;
  const thirdS = (endS - startS) / 3;
  // A reading on the edge counts, whatever the division left behind.
  const slackS = thirdS * 1e-9;
  const first = chordOf(readings.filter((reading) => reading.at <= startS + thirdS + slackS));
  const last = chordOf(readings.filter((reading) => reading.at >= endS - thirdS - slackS));
  if (first === null || last === null) return null;
  const levelled =
    last.slopePaPerS <= Math.max(LEVELLED_SLOPE_FRACTION * first.slopePaPerS, 0) + NOISE_PA_PER_S;
  return {
    startSlopePaPerS: first.slopePaPerS,
    endSlopePaPerS: last.slopePaPerS,
    levelled,
    plateau: plateauOf(first, last, endS - startS),
  };
}
