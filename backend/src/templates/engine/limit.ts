import { physicalDoubt } from '#shared/checklist/physical-range';
import { toSi } from '#shared/units/convert';
import { parseUnit } from '#shared/units/parse-unit';
import type { Dimension } from '#shared/units/unit';
import { compileExpression, type CompiledExpression } from './expression';
import type { ExpressionProblem } from './expression-rules';
import type { Scope } from './fact-fields';
import { isQuantityDimension, QUANTITIES } from './quantity-facts';

/** One limit: fixed, in SI, or worked out of each circuit's specification. */
export type Limit =
  | { readonly kind: 'fixed'; readonly si: number }
  | { readonly kind: 'worked'; readonly expression: CompiledExpression };

export type LimitCompilation =
  | { readonly ok: true; readonly limit: Limit }
  | { readonly ok: false; readonly problems: readonly ExpressionProblem[] };

const NUMBER_WITH_UNIT = /^\s*(-?\d+(?:\.\d+)?)\s*([^\s\d].*)?$/u;

const EXAMPLES: Readonly<Partial<Record<Dimension, string>>> = {
  temperature: '41 °F',
  temperatureDifference: '10 K',
  gaugePressure: '60 psig',
  duration: '60 min',
  ratio: '80 %',
};

/** Reads a limit such as `41 °F`, `10 K` or `fixture.dischargeAirTemperatureK + differenceF(2.0)`. */
export function compileLimit(text: string, dimension: Dimension, scope: Scope): LimitCompilation {
  const literal = NUMBER_WITH_UNIT.exec(text);
  if (literal) return fixedLimit(Number(literal[1]), literal[2]?.trim() ?? '', dimension);
  if (!isQuantityDimension(dimension)) {
    return refused(`A limit of ${dimension} is a number with its unit${exampleOf(dimension)}.`);
  }
  const wanted = QUANTITIES[dimension].name as Parameters<typeof compileExpression>[2];
  const compiled = compileExpression(text, scope, wanted);
  return compiled.ok ? { ok: true, limit: { kind: 'worked', expression: compiled.expression } } : compiled;
}

function fixedLimit(value: number, unitText: string, dimension: Dimension): LimitCompilation {
  const unit = parseUnit(unitText, dimension);
  if (!unit) return refused(`This limit has no unit that measures ${dimension}${exampleOf(dimension)}.`);
  const si = toSi(value, unit);
  return physicalDoubt(dimension, si)
    ? refused(`No instrument shows such a ${dimension}.`)
    : { ok: true, limit: { kind: 'fixed', si } };
}

function exampleOf(dimension: Dimension): string {
  const example = EXAMPLES[dimension];
  return example ? `; write for example ${example}` : '';
}

function refused(sentence: string): LimitCompilation {
  return { ok: false, problems: [{ index: 0, sentence }] };
}
