import type { SequenceFacts } from '#shared/checklist/facts';
import type { Answer, Step, StepOf } from '#shared/checklist/step';
import type { TypedValue } from '#shared/checklist/typed-value';
import type { PhotoRef } from '#shared/checklist/kinds/photo';
import type { SuperheatObservation } from '#shared/checklist/kinds/superheat';
import { unreachable } from '#shared/failures/unreachable';
import type { CircuitSpecification, Fixture } from '#shared/plant/plant';
import { toGauge } from '#shared/refrigeration/gauge-pressure';
import { dewPressure } from '#shared/refrigeration/saturation/saturation-curve';
import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { sha256OfText } from '#shared/sequences/sha256';
import { fromSi } from '#shared/units/convert';
import { decimalsFor } from '#shared/units/format';
import { kelvin, pascalAbsolute } from '#shared/units/quantity';
import { displayUnit } from '#shared/units/unit-system';
import { roundTo } from '#shared/units/round';
import type { Dimension } from '#shared/units/unit';
import { demoMeasurement } from './demo-measurement';

/** A box that comes down in five hours and then stays in its band, read every two minutes. */
function demoTrend(step: StepOf<'trend'>, { random }: DemoScene): Answer {
  const lowK = step.bandLowK ?? step.bandHighK - 3;
  const target = (lowK + step.bandHighK) / 2;
  const pullDownS = 5 * 3600;
  const atS: number[] = [];
  const temperatureK: number[] = [];
  for (let at = 0; at <= pullDownS + step.holdS + 1800; at += 120) {
    atS.push(at);
    const warm = 22 * Math.exp(-at / 4200);
    temperatureK.push(roundTo(target + warm + 0.4 * Math.sin(at / 900) + 0.1 * random(), 2));
  }
  return {
    kind: 'trend',
    file: { name: 'air-probe.csv', sha256: sha256OfText(temperatureK.join()), rows: atS.length },
    startText: '2026-11-28 18:00',
    column: 'Air (°F)',
    atS,
    temperatureK,
  };
}

export interface DemoScene {
  readonly specification: CircuitSpecification;
  readonly facts: SequenceFacts;
  readonly author: string;
  /** 0 to 1, repeatable. */
  readonly random: () => number;
  readonly photo: () => Promise<PhotoRef>;
  /** Makes superheat come out this far above the band's upper edge, in kelvin: work that a lead should stop at. */
  readonly superheatExcessK?: number;
}

/** What a careful installer might record on a step: within the limits and scattered as instruments scatter. */
export async function demoAnswer(step: Step, scene: DemoScene): Promise<Answer> {
  switch (step.kind) {
    case 'confirm':
      return { kind: 'confirm', confirmed: true };
    case 'choose':
      return {
        kind: 'choose',
        value: (step.options.find((option) => option.outcome === 'within') ?? step.options[0])?.value ?? '',
      };
    case 'reading':
      return { kind: 'reading', value: typed(readingValue(step, scene.random), step.dimension, scene) };
    case 'superheat':
      return superheatAnswer(step, scene);
    case 'measurement':
      return demoMeasurement(step, scene);
    case 'trend':
      return demoTrend(step, scene);
    case 'photo':
      return { kind: 'photo', photos: await photos(step.minCount, scene) };
    case 'note':
      return { kind: 'note', text: 'Door gasket on the end case seated by hand, closes well now.' };
    case 'override':
      return { kind: 'override', phase: 'putBack', remark: '' };
    case 'signature':
      return { kind: 'signature', signature: demoSignature(scene.author, scene.random) };
    default:
      return unreachable(step);
  }
}

/** A value that lies within the step's limits; where there are none, one that is ordinary for its dimension. */
function readingValue(step: StepOf<'reading'>, random: () => number): number {
  const { low, high } = step.limits;
  if (low !== null && high !== null) return low + (high - low) * (0.25 + 0.5 * random());
  // A few degrees inside on the kelvin scale; a few per cent for everything that begins at zero.
  const isTemperature = step.dimension === 'temperature';
  if (low !== null) return isTemperature ? low + 0.5 + 2 * random() : low * (1.02 + 0.08 * random());
  if (high !== null) return isTemperature ? high - 0.5 - 2 * random() : high * (0.9 + 0.08 * random());
  return (ORDINARY[step.dimension] ?? 1) * (0.97 + 0.06 * random());
}

const ORDINARY: Partial<Record<Dimension, number>> = {
  temperature: 296,
  temperatureDifference: 4,
  gaugePressure: 250_000,
  electricCurrent: 8.4,
  voltage: 207,
  duration: 1_500,
  ratio: 0.5,
  count: 4,
  mass: 5,
  length: 3,
  heatFlow: 3_000,
  power: 2_000,
};

function typed(si: number, dimension: Dimension, { facts }: Pick<DemoScene, 'facts'>): TypedValue {
  const unit = displayUnit(dimension, facts.unitSystem);
  return { text: String(roundTo(fromSi(si, unit), decimalsFor(unit))), unit };
}

function superheatAnswer(step: StepOf<'superheat'>, scene: DemoScene): Answer {
  const fixture = scene.specification.circuit.fixtures.find((candidate) => candidate.id === step.fixtureId);
  const { lowK, highK } = step.band;
  const target = lowK + (highK - lowK) * (0.3 + 0.4 * scene.random()) + (scene.superheatExcessK ?? 0);
  return {
    kind: 'superheat',
    asFound: observation(target + 1.5 + 3 * scene.random(), fixture, scene),
    asLeft: observation(target, fixture, scene),
  };
}

function observation(
  superheatK: number,
  fixture: Fixture | undefined,
  scene: DemoScene,
): SuperheatObservation {
  const dewK = (fixture?.evaporatingTemperatureK ?? 263.15) + (scene.random() - 0.5) * 0.8;
  const table = findRefrigerant(scene.facts.refrigerant);
  const pressure = table && dewPressure(table, kelvin(dewK));
  const gauge = pressure?.ok ? toGauge(pressure.pressure, pascalAbsolute(scene.facts.atmospherePaAbs)) : 0;
  return {
    valve: 'steady',
    pair: {
      pressure: typed(gauge, 'gaugePressure', scene),
      temperature: typed(dewK + superheatK, 'temperature', scene),
    },
  };
}

async function photos(count: number, scene: DemoScene): Promise<PhotoRef[]> {
  const made: PhotoRef[] = [];
  for (let index = 0; index < count; index += 1) made.push(await scene.photo());
  return made;
}

/** A scrawl, different for every name. */
export function demoSignature(printedName: string, random: () => number) {
  const stroke: number[] = [];
  let y = 80;
  for (let x = 24; x < 300; x += 9) {
    y = Math.max(30, Math.min(130, y + (random() - 0.5) * 60));
    stroke.push(x, Math.round(y));
  }
  return { printedName, width: 340, height: 160, strokes: [stroke, [180, 128, 320, 118]], typed: false };
}
