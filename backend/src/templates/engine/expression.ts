import type { TypeError as ExpressionTypeError } from '@marcbachmann/cel-js';
import { EvaluationError, ParseError, type ParseResult } from '@marcbachmann/cel-js';
import { ENVIRONMENTS } from './expression-environment';
import { fieldsReadIn, forbiddenIn, type ExpressionProblem } from './expression-rules';
import { NAMES, type Scope } from './fact-fields';
import type { Facts } from './specification-facts';

/** Longer conditions belong into two steps. */
export const LONGEST_EXPRESSION = 500;

/** What an expression must give. */
export type Wanted = 'bool' | 'Temperature' | 'TemperatureDifference' | 'Duration' | 'Length' | 'HeatFlow';

/** An expression that was checked: its names are known and its type is the wanted one. */
export interface CompiledExpression {
  readonly text: string;
  /** Facts that it reads, by their last name, with the character where each is read. */
  readonly reads: ReadonlyMap<string, number>;
  /** @throws {ExpressionFailure} when these facts have no answer, such as a value that the schedule leaves out */
  evaluate(facts: Facts): unknown;
}

export type Compilation =
  | { readonly ok: true; readonly expression: CompiledExpression }
  | { readonly ok: false; readonly problems: readonly ExpressionProblem[] };

/** An evaluation without an answer; `sentence` says why. Whoever expands turns it into a refusal with its place. */
export class ExpressionFailure extends Error {
  override readonly name = 'ExpressionFailure';

  constructor(
    readonly index: number,
    readonly sentence: string,
  ) {
    super(sentence);
  }
}

/** Checks an expression in the Common Expression Language for one place of a template; nothing is evaluated. */
export function compileExpression(text: string, scope: Scope, wanted: Wanted): Compilation {
  if (text.length > LONGEST_EXPRESSION) {
    return refused(
      0,
      `An expression has at most ${LONGEST_EXPRESSION} characters; this one has ${text.length}.`,
    );
  }
  let parsed: ParseResult;
  try {
    parsed = ENVIRONMENTS[scope].parse(text);
  } catch (error) {
    if (!(error instanceof ParseError)) throw error;
    return refused(error.range?.start ?? 0, `This can't be read as an expression: ${error.summary}.`);
  }
  const problems = forbiddenIn(parsed.ast);
  if (problems.length > 0) return { ok: false, problems };
  const reads = fieldsReadIn(parsed.ast);
  const checked = parsed.check();
  if (!checked.valid) {
    const { error } = checked;
    return refused(error?.range?.start ?? 0, typeSentence(error, scope));
  }
  if (checked.type !== wanted) {
    return refused(0, `This gives ${nameOf(checked.type ?? 'dyn')}, where ${nameOf(wanted)} is needed.`);
  }
  return { ok: true, expression: { text, reads, evaluate: (facts) => evaluate(parsed, facts) } };
}

function evaluate(parsed: ParseResult, facts: Facts): unknown {
  try {
    return parsed(facts) as unknown;
  } catch (error) {
    if (!(error instanceof EvaluationError)) throw error;
    const why = error.code === 'field_type_mismatch' ? 'the schedule leaves this value out' : error.summary;
    throw new ExpressionFailure(error.range?.start ?? 0, `This has no value for the circuit: ${why}.`);
  }
}

function refused(index: number, sentence: string): Compilation {
  return { ok: false, problems: [{ index, sentence }] };
}

const TYPE_NAMES: Readonly<Record<string, string>> = {
  bool: 'true or false',
  int: 'a whole number',
  double: 'a number',
  string: 'a text',
  Temperature: 'a temperature',
  TemperatureDifference: 'a temperature difference',
  Duration: 'a duration',
  Length: 'a length',
  HeatFlow: 'a heat flow',
};

function nameOf(type: string): string {
  return TYPE_NAMES[type] ?? `a ${type}`;
}

function typeSentence(error: ParseError | ExpressionTypeError | undefined, scope: Scope): string {
  const summary = error?.summary ?? 'its types do not fit';
  switch (error?.code) {
    case 'unknown_variable':
      return `${summary}. This place knows ${NAMES[scope].join(', ')}.`;
    case 'no_such_key':
      return `There is no such fact: ${summary.replace(/^No such key: /, '')}.`;
    case 'no_such_overload':
      return overloadSentence(summary.replace(/^(no such overload|found no matching overload for): ?/i, ''));
    default:
      return `The types don't fit: ${summary}.`;
  }
}

function overloadSentence(operation: string): string {
  if (operation === 'Temperature + Temperature') {
    return "Two temperatures can't be added; add a difference, such as differenceF(2.0).";
  }
  if (/^(Temperature|TemperatureDifference|Duration|Length|HeatFlow) (==|!=) /.test(operation)) {
    return 'Measured quantities are never exactly equal; compare them with <, <=, > or >=.';
  }
  return `These types don't go together: ${operation}.`;
}
