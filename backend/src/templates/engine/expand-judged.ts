import { METHODS } from '#shared/checklist/methods/methods';
import type { StepOf } from '#shared/checklist/step';
import { Bug } from '#shared/failures/failure';
import type { Fixture } from '#shared/plant/plant';
import type { Dimension } from '#shared/units/unit';
import { limitSize } from './evaluate';
import { isQuantityDimension } from './quantity-facts';
import { refuseTemplate } from './refuse-template';
import { SI_UNIT } from './si-unit';
import type { SourceText } from './source-text';
import type { Facts } from './specification-facts';
import type { PlacedLimit, StepBody, StepDocument } from './template-document';

// What only steps that are judged by numbers have: their limits, worked out for one circuit.

/** What a step of the kind has beyond what every step has. */
type PartOf<K extends 'reading' | 'superheat' | 'measurement' | 'trend', Keys extends keyof StepOf<K>> = Pick<
  StepOf<K>,
  Keys
>;

/** Left out where nothing changes: most steps, and all steps of older lists. */
export const changesOf = ({ changes }: { readonly changes: boolean }): { changes?: true } =>
  changes ? { changes: true } : {};

/** @throws {DomainFailure} templateRefused, as all parts here, when a limit has no value for this circuit */
export function readingPart(
  source: SourceText,
  body: StepBody & { kind: 'reading' },
  facts: Facts,
): PartOf<'reading', 'kind' | 'changes' | 'dimension' | 'limits' | 'siUnit'> {
  const { kind, dimension } = body;
  const limits = limitsOf(source, facts, dimension, body.low, body.high);
  return { kind, ...changesOf(body), dimension, limits, siUnit: SI_UNIT[dimension] };
}

/** The fixture's own band unless the template has one. */
export function superheatPart(
  source: SourceText,
  body: StepBody & { kind: 'superheat' },
  step: StepDocument,
  { facts, fixture }: { readonly facts: Facts; readonly fixture: Fixture | null },
): PartOf<'superheat', 'kind' | 'band' | 'judgedBy' | 'waitS'> {
  return {
    kind: body.kind,
    band: bandOf(source, body, step, facts, fixture),
    ...(body.judgedBy === 'timeWeighted' ? { judgedBy: body.judgedBy } : {}),
    ...(body.wait ? { waitS: limitSize(source, body.wait, 'duration', facts) } : {}),
  };
}

export function measurementPart(
  source: SourceText,
  body: StepBody & { kind: 'measurement' },
  facts: Facts,
): PartOf<'measurement', 'kind' | 'changes' | 'method' | 'criteria'> {
  const { kind, method } = body;
  return { kind, ...changesOf(body), method, criteria: criteriaOf(source, body, facts) };
}

export function trendPart(
  source: SourceText,
  body: StepBody & { kind: 'trend' },
  facts: Facts,
): PartOf<'trend', 'kind' | 'bandLowK' | 'bandHighK' | 'holdS' | 'longestExcursionS'> {
  const { low, high } = limitsOf(source, facts, 'temperature', body.low, body.high);
  if (high === null || body.hold === null) throw new Bug('A trend step has no upper edge or no hold');
  return {
    kind: body.kind,
    bandLowK: low,
    bandHighK: high,
    holdS: limitSize(source, body.hold, 'duration', facts),
    longestExcursionS: body.longestExcursion
      ? limitSize(source, body.longestExcursion, 'duration', facts)
      : 0,
  };
}

function criteriaOf(
  source: SourceText,
  body: StepBody & { kind: 'measurement' },
  facts: Facts,
): Record<string, number> {
  const criteria: Record<string, number> = {};
  for (const { key, dimension } of METHODS[body.method].criteria) {
    const placed = body.criteria.get(key);
    const worked = isQuantityDimension(dimension) ? dimension : null;
    if (placed) criteria[key] = limitSize(source, placed, worked, facts);
  }
  return criteria;
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
  facts: Facts,
  fixture: Fixture | null,
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
