import { ExpressionFailure, type CompiledExpression } from './expression';
import type { PlacedLimit, Condition } from './template-document';
import { sizeOf, type QuantityDimension } from './quantity-facts';
import { refuseTemplate } from './refuse-template';
import type { SourceText } from './source-text';
import type { Facts } from './specification-facts';

/**
 * Whether a condition holds. Fails closed: no answer is a refusal, never a "no".
 *
 * @throws {DomainFailure} templateRefused
 */
export function isTrue(source: SourceText, condition: Condition, facts: Facts): boolean {
  const value = answer(source, condition.expression, condition.offset, facts);
  if (typeof value === 'boolean') return value;
  return refuseTemplate(source, [
    { offset: condition.offset, sentence: 'This gives neither true nor false.' },
  ]);
}

/**
 * A limit's size in SI.
 *
 * @throws {DomainFailure} templateRefused when its expression has no finite value for this circuit
 */
export function limitSize(
  source: SourceText,
  { limit, offset }: PlacedLimit,
  dimension: QuantityDimension | null,
  facts: Facts,
): number {
  if (limit.kind === 'fixed') return limit.si;
  const value = answer(source, limit.expression, offset, facts);
  const size = dimension && sizeOf(dimension, value);
  if (size !== null) return size;
  return refuseTemplate(source, [{ offset, sentence: 'This gives no finite limit for the circuit.' }]);
}

function answer(source: SourceText, expression: CompiledExpression, offset: number, facts: Facts): unknown {
  try {
    return expression.evaluate(facts);
  } catch (error) {
    if (!(error instanceof ExpressionFailure)) throw error;
    return refuseTemplate(source, [{ offset, sentence: error.sentence }]);
  }
}
