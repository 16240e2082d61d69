import { doubtSuperheatInputs } from '../refrigeration/doubt-superheat-inputs';
import { toAbsoluteByGauge, type GaugeKind } from '../refrigeration/gauge-kind';
import { toGauge } from '../refrigeration/gauge-pressure';
import { huntingMean } from '../refrigeration/hunting-mean';
import { analyseSuperheatTrace, type Settled } from '../refrigeration/logger/analyse-superheat-trace';
import { superheatTrace, type SuctionSample } from '../refrigeration/logger/superheat-trace';
import type { SaturationTable } from '../refrigeration/saturation/saturation-table';
import { superheat } from '../refrigeration/superheat';
import type { Working, WorkingLine } from '../refrigeration/working';
import { fromSi } from '../units/convert';
import {
  kelvin,
  pascalAbsolute,
  pascalGauge,
  second,
  type KelvinDifference,
  type PascalGauge,
} from '../units/quantity';
import { unreachable } from '../failures/unreachable';
import type { SequenceFacts } from './facts';
import type { Doubt, DoubtKind, Figure } from './judgement';
import type { SuperheatObservation, SuperheatPair } from './kinds/superheat';
import { readTypedValue } from './typed-value';

/** How the pressures of an answer are to be read. */
export interface ObservingScene {
  readonly table: SaturationTable;
  readonly facts: SequenceFacts;
  readonly gauge: GaugeKind;
  /** What the line loses between coil and tap, in pascals; 0 at the coil's outlet. */
  readonly lineDropPa: number;
}

/** What one look at a coil gave. `pressure` is that of its (lowest) reading, for the instruments' error. */
export interface Observed {
  /** The middle between high and low; the one value of a steady valve. */
  readonly midpoint: KelvinDifference;
  /** Known of a series only. */
  readonly timeWeighted: KelvinDifference | null;
  readonly minimum: KelvinDifference;
  readonly maximum: KelvinDifference;
  readonly settled: Settled | null;
  readonly hunts: boolean;
  readonly pressure: PascalGauge;
  readonly figures: readonly Figure[];
  readonly workings: readonly Working[];
}

/**
 * Works one look at a coil out. What can't be read is said in `doubts`.
 *
 * @returns `null` when there is no superheat to judge
 */
export function observe(
  observation: SuperheatObservation,
  scene: ObservingScene,
  doubts: Doubt[],
): Observed | null {
  switch (observation.valve) {
    case 'steady':
      return steady(observation.pair, scene, doubts);
    case 'hunting':
      return hunting(observation.low, observation.high, scene, doubts);
    case 'series':
      return series(observation, scene, doubts);
    case 'log':
      return log(observation, scene, doubts);
    default:
      return unreachable(observation);
  }
}

function steady(pair: SuperheatPair, scene: ObservingScene, doubts: Doubt[]): Observed | null {
  const worked = workOut(pair, scene, doubts);
  return (
    worked && {
      midpoint: worked.superheat,
      timeWeighted: null,
      minimum: worked.superheat,
      maximum: worked.superheat,
      settled: null,
      hunts: false,
      pressure: worked.pressure,
      figures: worked.figures,
      workings: [worked.working],
    }
  );
}

function hunting(
  lowPair: SuperheatPair,
  highPair: SuperheatPair,
  scene: ObservingScene,
  doubts: Doubt[],
): Observed | null {
  const low = workOut(lowPair, scene, doubts);
  const high = workOut(highPair, scene, doubts);
  if (!low || !high) return null;
  if (low.superheat > high.superheat) {
    doubts.push({ kind: 'lowAboveHigh', severity: 'refuse' });
    return null;
  }
  return {
    midpoint: huntingMean(high.superheat, low.superheat),
    timeWeighted: null,
    minimum: low.superheat,
    maximum: high.superheat,
    settled: null,
    hunts: true,
    pressure: low.pressure,
    figures: low.figures,
    workings: [low.working, high.working],
  };
}

function series(
  observation: SuperheatObservation & { valve: 'series' },
  scene: ObservingScene,
  doubts: Doubt[],
): Observed | null {
  const samples: SuctionSample[] = [];
  for (const reading of observation.readings) {
    // Each reading is looked at like a single one: a slip in one of them would bend the whole mean.
    const worked = workOut(reading, scene, doubts);
    const temperature = readTypedValue(reading.temperature, 'temperature');
    if (!worked || !temperature.ok) return null;
    samples.push({
      at: second(reading.atS),
      suctionPressure: worked.pressure,
      lineTemperature: kelvin(temperature.si),
    });
  }
  return trace(samples, scene, doubts);
}

function log(
  { atS, pressurePag, temperatureK }: SuperheatObservation & { valve: 'log' },
  scene: ObservingScene,
  doubts: Doubt[],
): Observed | null {
  // Which temperature belongs to which pressure isn't known then.
  if (pressurePag.length !== atS.length || temperatureK.length !== atS.length) {
    doubts.push({ kind: 'tooFewSamples', severity: 'refuse' });
    return null;
  }
  const samples = atS.map((at, index): SuctionSample => ({
    at: second(at),
    // No number stays none, and is left out of the trace and of its count of readings used.
    suctionPressure: pressureAtCoil(pascalGauge(pressurePag[index] ?? NaN), scene) ?? pascalGauge(NaN),
    lineTemperature: kelvin(temperatureK[index] ?? NaN),
  }));
  return trace(samples, scene, doubts);
}

/** Works a series out whose pressures are already those at the coil. */
function trace(atCoil: readonly SuctionSample[], scene: ObservingScene, doubts: Doubt[]): Observed | null {
  const { table, facts } = scene;
  const read = superheatTrace({ table, atmosphere: pascalAbsolute(facts.atmospherePaAbs), samples: atCoil });
  const analysed = read.ok ? analyseSuperheatTrace(read.samples) : null;
  if (!read.ok || !analysed?.ok) {
    doubts.push({ kind: 'tooFewSamples', severity: 'refuse' });
    return null;
  }
  // A trace with holes, or one that was watched for moments, counts and is looked at.
  const isThin = read.samples.length < 0.9 * atCoil.length || analysed.settled === 'tooShort';
  if (isThin) doubts.push({ kind: 'tooFewSamples', severity: 'ask' });
  return {
    midpoint: analysed.midpoint,
    timeWeighted: analysed.mean,
    minimum: analysed.minimum,
    maximum: analysed.maximum,
    settled: analysed.settled,
    hunts: analysed.hunts,
    pressure: atCoil[0]?.suctionPressure ?? pascalGauge(0),
    figures: [
      { label: 'amplitude', value: analysed.amplitude, unit: 'K_diff' },
      ...(analysed.period === null ? [] : [{ label: 'period', value: analysed.period, unit: 's' as const }]),
    ],
    workings: [
      { ...read.working, lines: [...correctionLines(scene), ...read.working.lines] },
      analysed.working,
    ],
  };
}

interface WorkedPair {
  readonly superheat: KelvinDifference;
  readonly pressure: PascalGauge;
  readonly working: Working;
  readonly figures: readonly Figure[];
}

function workOut(pair: SuperheatPair, scene: ObservingScene, doubts: Doubt[]): WorkedPair | null {
  const { table, facts } = scene;
  const refuse = (kind: DoubtKind): null => {
    doubts.push({ kind, severity: 'refuse' });
    return null;
  };
  const typed = readTypedValue(pair.pressure, 'gaugePressure');
  if (!typed.ok) return refuse(typed.problem);
  const temperature = readTypedValue(pair.temperature, 'temperature');
  if (!temperature.ok) return refuse(temperature.problem);
  const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
  const pressure = pressureAtCoil(pascalGauge(typed.si), scene);
  if (pressure === null) return refuse('deeperThanVacuum');
  const raised = doubtSuperheatInputs({
    table,
    // A reading is as deep or as high as its own gauge's zero makes it.
    atmosphere: pascalAbsolute(atmosphere + zeroShiftOf(scene)),
    // As typed: what looks swapped is what stands in the box.
    pressureTyped: fromSi(typed.si, pair.pressure.unit),
    pressureUnit: pair.pressure.unit,
    temperatureTyped: fromSi(temperature.si, pair.temperature.unit),
    temperatureUnit: pair.temperature.unit,
  });
  doubts.push(...raised.map(({ kind, severity }) => ({ kind, severity })));
  if (raised.some((doubt) => doubt.severity === 'refuse')) return null;
  const result = superheat({
    table,
    suctionPressure: pressure,
    atmosphere,
    lineTemperature: kelvin(temperature.si),
  });
  if (!result.ok) return refuse(result.reason);
  return {
    superheat: result.superheat,
    pressure,
    working: withCorrections(result.working, typed.si, scene),
    figures: [
      { label: 'saturation', value: result.saturation, unit: 'K' },
      { label: 'glide', value: result.glide, unit: 'K_diff' },
    ],
  };
}

/**
 * What a vented gauge at the coil's outlet would have shown: the reading of a sealed or absolute gauge is counted from
 * another zero, and a tap farther down the line reads less than the coil has.
 */
function pressureAtCoil(
  reading: PascalGauge,
  { facts, gauge, lineDropPa }: ObservingScene,
): PascalGauge | null {
  const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
  if (gauge === 'vented' || gauge === 'taredAtPowerUp') return pascalGauge(reading + lineDropPa);
  const absolute = toAbsoluteByGauge({ kind: gauge, readingPa: reading, atmosphere });
  return absolute.ok ? pascalGauge(toGauge(absolute.pressure, atmosphere) + lineDropPa) : null;
}

/** How far the gauge's zero lies above the local atmosphere, in pascals: 0 for a vented one. */
function zeroShiftOf({ facts, gauge }: ObservingScene): number {
  const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
  const atZero = toAbsoluteByGauge({ kind: gauge, readingPa: atmosphere, atmosphere });
  return atZero.ok ? atZero.zero - atmosphere : 0;
}

/** What is added to a reading before the formula sees it. */
function correctionLines(scene: ObservingScene): WorkingLine[] {
  const lines = [
    { label: 'gaugeZero', value: zeroShiftOf(scene), unit: 'Pa_diff' },
    { label: 'lineDrop', value: scene.lineDropPa, unit: 'Pa_diff' },
  ] as const;
  return lines.filter(({ value }) => value !== 0);
}

/** Says in the working what was made of the reading before the formula saw it. */
function withCorrections(working: Working, readingPa: number, scene: ObservingScene): Working {
  const corrections = correctionLines(scene);
  if (corrections.length === 0) return working;
  const unit = scene.gauge === 'absolute' ? 'Pa' : 'Pag';
  return {
    ...working,
    lines: [{ label: 'gaugeReading', value: readingPa, unit }, ...corrections, ...working.lines],
  };
}
