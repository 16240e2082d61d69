import type { ExpressionProblem } from './expression-rules';
import { FACT_FIELDS, NAMES, type Scope } from './fact-fields';
import type { Facts } from './specification-facts';

const PLACEHOLDER = /\{\{\s*([^{}]*?)\s*\}\}/g;

const TYPE_OF_NAME: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  opening: FACT_FIELDS.Opening,
  system: FACT_FIELDS.System,
  suctionGroup: FACT_FIELDS.SuctionGroup,
  circuit: FACT_FIELDS.Circuit,
  fixture: FACT_FIELDS.Fixture,
  coil: FACT_FIELDS.Coil,
  'circuit.defrost': FACT_FIELDS.Defrost,
};

/** What is wrong with the placeholders of a text, such as `{{fixture.tag}}`: only words and counts can stand in one. */
export function placeholderProblems(text: string, scope: Scope): ExpressionProblem[] {
  const problems: ExpressionProblem[] = [];
  for (const match of text.matchAll(PLACEHOLDER)) {
    const sentence = wrongWith(match[1] ?? '', scope);
    if (sentence) problems.push({ index: match.index, sentence });
  }
  // What remains of braces after every whole placeholder was taken out was opened or closed only once.
  const left = text.replace(PLACEHOLDER, (whole) => ' '.repeat(whole.length)).search(/\{\{|\}\}/);
  if (left !== -1)
    problems.push({ index: left, sentence: 'A placeholder is written {{fixture.tag}}, with both ends.' });
  return problems;
}

function wrongWith(path: string, scope: Scope): string | null {
  const parts = path.split('.');
  const owner = parts.slice(0, -1).join('.');
  const type = TYPE_OF_NAME[owner]?.[parts.at(-1) ?? ''];
  if (type === undefined || !Object.hasOwn(TYPE_OF_NAME, owner)) return `There is no such fact: ${path}.`;
  if (!NAMES[scope].includes(parts[0] ?? '')) {
    return `\`${parts[0] ?? ''}\` is not known at this place, which knows ${NAMES[scope].join(', ')}.`;
  }
  if (type === 'string' || type === 'int') return null;
  return `\`${path}\` can't stand in a text: a quantity is shown by the step's limits, in the opening's units.`;
}

/** Fills the placeholders of a checked text. What the schedule says is taken as it is, braces and all. */
export function fillPlaceholders(text: string, facts: Facts): string {
  return text.replace(PLACEHOLDER, (_whole, path: string) => {
    let value: unknown = facts;
    for (const part of path.split('.')) value = (value as Facts)[part];
    return String(value);
  });
}
