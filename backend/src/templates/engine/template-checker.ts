import type { Dimension } from '#shared/units/unit';
import { compileExpression, type CompiledExpression } from './expression';
import type { ExpressionProblem } from './expression-rules';
import { GUARDS, type Scope } from './fact-fields';
import { compileLimit } from './limit';
import { placeholderProblems } from './placeholder';
import type { Problem } from './source-text';
import type { WrittenText } from './step-shape';
import type { Condition, PlacedLimit } from './template-document';
import type { YamlDocument, YamlPath } from './yaml-document';

/** Collects what is wrong while a template's parts are checked, so that one reading names every problem. */
export class TemplateChecker {
  readonly problems: Problem[] = [];

  constructor(readonly yaml: YamlDocument) {}

  report(path: YamlPath, sentence: string): void {
    this.problems.push({ offset: this.yaml.offsetOf(path), sentence });
  }

  /** A condition, or `null` when it can't be used (and was reported). `guards` are the conditions around it. */
  condition(
    path: YamlPath,
    text: string,
    scope: Scope,
    guards: readonly (Condition | null)[],
  ): Condition | null {
    const compiled = compileExpression(text, scope, 'bool');
    if (!compiled.ok) {
      this.#reportInText(path, compiled.problems);
      return null;
    }
    this.#checkGuards(path, compiled.expression, guards);
    return { expression: compiled.expression, offset: this.yaml.offsetOf(path) };
  }

  /** A limit, or `null` when it can't be used (and was reported). */
  limit(
    path: YamlPath,
    text: string,
    dimension: Dimension,
    scope: Scope,
    guards: readonly (Condition | null)[],
  ): PlacedLimit | null {
    const compiled = compileLimit(text, dimension, scope);
    if (!compiled.ok) {
      this.#reportInText(path, compiled.problems);
      return null;
    }
    const { limit } = compiled;
    if (limit.kind === 'worked') this.#checkGuards(path, limit.expression, guards);
    return { limit, offset: this.yaml.offsetOf(path) };
  }

  /** Fixed limits that cross can never be met; limits that are worked out are compared for each circuit. */
  crossing(path: YamlPath, low: PlacedLimit | null, high: PlacedLimit | null): void {
    if (low?.limit.kind !== 'fixed' || high?.limit.kind !== 'fixed') return;
    if (low.limit.si > high.limit.si) this.report([...path, 'low'], 'The low limit lies above the high one.');
  }

  text(path: YamlPath, text: WrittenText | undefined, scope: Scope): void {
    if (!text) return;
    for (const language of ['en', 'es'] as const) {
      this.#reportInText([...path, language], placeholderProblems(text[language], scope));
    }
  }

  #reportInText(path: YamlPath, problems: readonly ExpressionProblem[]): void {
    for (const { index, sentence } of problems) {
      this.problems.push({ offset: this.yaml.offsetInText(path, index), sentence });
    }
  }

  /** A value that the schedule may leave out is read only where the same condition, or one around it, asks for it first. */
  #checkGuards(path: YamlPath, expression: CompiledExpression, around: readonly (Condition | null)[]): void {
    for (const [field, index] of expression.reads) {
      const guard = GUARDS[field];
      if (!guard || expression.reads.has(guard)) continue;
      if (around.some((condition) => condition?.expression.reads.has(guard))) continue;
      const sentence = `The schedule may leave \`${field}\` out: ask \`${guard}\` first, in this or in a \`when\`.`;
      this.problems.push({ offset: this.yaml.offsetInText(path, index), sentence });
    }
  }
}
