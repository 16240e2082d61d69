import type { Step } from '#shared/checklist/step';
import type { Text } from '#shared/checklist/text';
import { unreachable } from '#shared/failures/unreachable';
import type { Coil, Fixture } from '#shared/plant/plant';
import { changesOf, measurementPart, readingPart, superheatPart, trendPart } from './expand-judged';
import { fillPlaceholders } from './placeholder';
import type { SourceText } from './source-text';
import type { Facts } from './specification-facts';
import type { StepDocument } from './template-document';

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
      return { kind: body.kind, ...base, ...changesOf(body) };
    case 'note':
      return { kind: body.kind, ...base };
    case 'choose':
      return {
        kind: body.kind,
        ...base,
        options: body.options.map(({ value, label, outcome, changes }) => ({
          value,
          label: fill(label),
          outcome,
          ...changesOf({ changes }),
        })),
      };
    case 'reading':
      return { ...base, ...readingPart(source, body, target.facts) };
    case 'superheat':
      return { ...base, ...superheatPart(source, body, step, target) };
    case 'measurement':
      return { ...base, ...measurementPart(source, body, target.facts) };
    case 'trend':
      return { ...base, ...trendPart(source, body, target.facts) };
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
