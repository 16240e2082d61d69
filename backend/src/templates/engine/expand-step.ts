import type { Step } from '#shared/checklist/step';
import type { Text } from '#shared/checklist/text';
import { Bug } from '#shared/failures/failure';
import { unreachable } from '#shared/failures/unreachable';
import type { Coil, Fixture } from '#shared/plant/plant';
import type { Dimension } from '#shared/units/unit';
import { limitSize } from './evaluate';
import { fillPlaceholders } from './placeholder';
import { isQuantityDimension } from './quantity-facts';
import { refuseTemplate } from './refuse-template';
import { SI_UNIT } from './si-unit';
import type { SourceText } from './source-text';
import type { Facts } from './specification-facts';
import type { PlacedLimit, StepBody, StepDocument } from './template-document';

/** What a step is made for: the circuit, one of its fixtures, or one coil of a fixture. */
export interface StepTarget {
  readonly facts: Facts;
  readonly fixture: Fixture | null;
  readonly coil: Coil | null;
}

/**
 * One step of one circuit.
 *
 * @throws {DomainFailure} templateRefused when its limits have no value or cross for this circuit
 */
export function expandStep(
  source: SourceText,
  section: string,
  step: StepDocument,
  target: StepTarget,
): Step {
  const fill = (text: Text): Text => ({
    en: fillPlaceholders(text.en, target.facts),
    es: fillPlaceholders(text.es, target.facts),
  });
  const id = target.coil?.id ?? target.fixture?.id;
  const base = {
    key: id === undefined ? step.key : `${step.key}:${id}`,
    section,
    title: fill(step.title),
    instruction: step.instruction && fill(step.instruction),
    caution: step.caution && { hazard: step.caution.hazard, text: fill(step.caution.text) },
    fixtureId: target.fixture?.id ?? null,
    coilId: target.coil?.id ?? null,
    required: step.required,
    source: step.source,
  };
  const { body } = step;
  switch (body.kind) {
    case 'confirm':
    case 'note':
      return { kind: body.kind, ...base };
    case 'choose':
      return {
        kind: body.kind,
        ...base,
        options: body.options.map(({ value, label, outcome }) => ({ value, label: fill(label), outcome })),
      };
    case 'reading': {
      const limits = limitsOf(source, target.facts, body.dimension, body.low, body.high);
      return { kind: body.kind, ...base, dimension: body.dimension, limits, siUnit: SI_UNIT[body.dimension] };
    }
    case 'superheat':
      return { kind: body.kind, ...base, band: bandOf(source, body, step, target) };
    case 'photo':
      return { kind: body.kind, ...base, minCount: body.minCount };
    case 'override':
      return { kind: body.kind, ...base, subject: fill(body.subject) };
    case 'signature':
      return { kind: body.kind, ...base, meaning: fill(body.meaning) };
    default:
      return unreachable(body);
  }
}

function limitsOf(
  source: SourceText,
  facts: Facts,
  dimension: Dimension,
  low: PlacedLimit | null,
  high: PlacedLimit | null,
): { low: number | null; high: number | null } {
  const worked = isQuantityDimension(dimension) ? dimension : null;
  const limits = {
    low: low && limitSize(source, low, worked, facts),
    high: high && limitSize(source, high, worked, facts),
  };
  if (low && limits.low !== null && limits.high !== null && limits.low > limits.high) {
    refuseTemplate(source, [
      { offset: low.offset, sentence: 'The low limit lies above the high one for this circuit.' },
    ]);
  }
  return limits;
}

function bandOf(
  source: SourceText,
  body: StepBody & { kind: 'superheat' },
  step: StepDocument,
  { facts, fixture }: StepTarget,
): { lowK: number; highK: number } {
  if (!fixture) throw new Bug(`Superheat step ${step.key} has no fixture`);
  const { low, high } = body.band
    ? limitsOf(source, facts, 'temperatureDifference', body.band.low, body.band.high)
    : { low: fixture.superheatLowK, high: fixture.superheatHighK };
  if (low === null || high === null) throw new Bug(`Superheat step ${step.key} has half a band`);
  if (low > high) {
    const sentence = `The schedule's superheat band of ${fixture.tag} has its low end above its high end.`;
    refuseTemplate(source, [{ offset: step.offset, sentence }]);
  }
  return { lowK: low, highK: high };
}
