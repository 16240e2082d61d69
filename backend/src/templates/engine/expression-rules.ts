import type { ASTNode } from '@marcbachmann/cel-js';
import { QUANTITY_FUNCTIONS } from './expression-environment';

/** Something in an expression that is not allowed, at a character of it. */
export interface ExpressionProblem {
  readonly index: number;
  readonly sentence: string;
}

const OPERATORS: readonly string[] = [
  ...['value', 'id', '.', 'call', 'rcall', 'list', '?:', '||', '&&', '!_', '-_'],
  ...['==', '!=', '<', '<=', '>', '>=', 'in', '+', '-', '*', '/'],
];
const FUNCTIONS: readonly string[] = [...Object.keys(QUANTITY_FUNCTIONS), 'size'];
const LOOPS: readonly string[] = ['exists', 'all', 'exists_one'];
const METHODS: readonly string[] = [...LOOPS, 'size', 'startsWith', 'endsWith', 'contains'];

/**
 * What an expression holds beyond the list of what is allowed. The list is what bounds the work of an evaluation: no
 * regular expressions, which can run for minutes, and no loop within a loop.
 */
export function forbiddenIn(ast: ASTNode): ExpressionProblem[] {
  const problems: ExpressionProblem[] = [];
  const open: { node: ASTNode; inLoop: boolean }[] = [{ node: ast, inLoop: false }];
  for (let next = open.pop(); next; next = open.pop()) {
    const { node, inLoop } = next;
    const sentence = forbidden(node, inLoop);
    if (sentence) problems.push({ index: node.range.start, sentence });
    const loops = inLoop || (node.op === 'rcall' && LOOPS.includes(node.args[0]));
    for (const child of childrenOf(node)) open.push({ node: child, inLoop: loops });
  }
  return problems;
}

function forbidden(node: ASTNode, inLoop: boolean): string | null {
  if (node.op === 'call') return FUNCTIONS.includes(node.args[0]) ? null : notAFunction(node.args[0]);
  if (node.op === 'rcall') {
    const [name] = node.args;
    if (!METHODS.includes(name)) return notAFunction(name);
    return inLoop && LOOPS.includes(name)
      ? `\`${name}\` can't stand inside another condition over a list.`
      : null;
  }
  return OPERATORS.includes(node.op) ? null : `\`${node.op}\` is not available in templates.`;
}

function notAFunction(name: string): string {
  return name === 'matches'
    ? '`matches` is not available in templates: a pattern can run for minutes. Use ==, in, startsWith, endsWith or contains.'
    : `\`${name}\` is not available in templates; there are ${[...FUNCTIONS, ...METHODS.filter((each) => each !== 'size')].join(', ')}.`;
}

/** Every name that an expression reads after a dot, wherever it stands. */
export function fieldsReadIn(ast: ASTNode): ReadonlyMap<string, number> {
  const fields = new Map<string, number>();
  const open: ASTNode[] = [ast];
  for (let node = open.pop(); node; node = open.pop()) {
    if (node.op === '.') fields.set(node.args[1], node.range.start);
    open.push(...childrenOf(node));
  }
  return fields;
}

function childrenOf(node: ASTNode): ASTNode[] {
  const found: ASTNode[] = [];
  const collect = (value: unknown): void => {
    if (Array.isArray(value)) value.forEach(collect);
    else if (isNode(value)) found.push(value);
  };
  // A literal's value is never a node, whatever it looks like.
  if (node.op !== 'value') collect(node.args);
  return found;
}

function isNode(value: unknown): value is ASTNode {
  return typeof value === 'object' && value !== null && 'op' in value && 'args' in value && 'range' in value;
}
