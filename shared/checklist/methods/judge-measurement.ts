import { physicalDoubt } from '../physical-range';
import { plainJudgement, refusedJudgement, type Doubt, type DoubtKind, type Judgement } from '../judgement';
import type { SequenceFacts } from '../facts';
import type { MeasurementAnswer, MeasurementBoxes, MeasurementStep } from '../kinds/measurement';
import { readTypedValue } from '../typed-value';
import type { MethodField } from './method';
import { METHODS } from './methods';

type Read = Record<string, number | string | null>;

/**
 * Judges a measurement by its method. Every box is read by the method's own declarations first: one that can't be read
 * refuses the whole, one that is needed and empty leaves it incomplete, which is kept and doesn't count yet.
 */
export function judgeMeasurement(
  step: MeasurementStep,
  answer: MeasurementAnswer,
  facts: SequenceFacts,
): Judgement {
  if (answer.method !== step.method) return refusedJudgement('wrongAnswerKind');
  const method = METHODS[step.method];
  const doubts: Doubt[] = [];
  const values = readBoxes(method.fields, answer, doubts);
  const rowFields = method.rows?.fields ?? [];
  const rows = answer.rows.map((row) => readBoxes(rowFields, row, doubts));
  if (method.rows && rows.length < method.rows.least) refuse(doubts, 'incomplete');
  if (method.rows ? rows.length > method.rows.most : rows.length > 0) refuse(doubts, 'tooMany');
  // The first half of a test that stands overnight is recorded on purpose.
  const halfDone = method.inTwoVisits && doubts.every((doubt) => doubt.kind === 'incomplete');
  if (halfDone && doubts.length > 0)
    return plainJudgement('recorded', [{ kind: 'incomplete', severity: 'keep' }]);
  if (doubts.length > 0) return plainJudgement('recorded', doubts);
  const criteria: Record<string, number | null> = {};
  for (const criterion of method.criteria) {
    const given = step.criteria[criterion.key] ?? null;
    // The template's check lets no such step through; an old step list of another program version might hold one.
    if (given === null && criterion.required) return refusedJudgement('noCriterion');
    criteria[criterion.key] = given;
  }
  return method.judge({ values, rows, criteria, facts, source: step.source ?? '' });
}

function readBoxes(
  fields: readonly MethodField[],
  boxes: Pick<MeasurementBoxes, 'quantities' | 'words'>,
  doubts: Doubt[],
): Read {
  const read: Read = {};
  for (const field of fields) {
    read[field.key] =
      field.kind === 'quantity' ? readQuantity(field, boxes, doubts) : readWord(field, boxes, doubts);
  }
  return read;
}

function readQuantity(
  field: MethodField & { kind: 'quantity' },
  { quantities }: Pick<MeasurementBoxes, 'quantities'>,
  doubts: Doubt[],
): number | null {
  const typed = Object.hasOwn(quantities, field.key) ? quantities[field.key] : undefined;
  if (!typed || typed.text.trim() === '') {
    if (field.required) refuse(doubts, 'incomplete');
    return null;
  }
  const value = readTypedValue(typed, field.dimension);
  const problem = value.ok ? physicalDoubt(field.dimension, value.si) : value.problem;
  if (problem) refuse(doubts, problem);
  return value.ok ? value.si : null;
}

function readWord(
  field: MethodField & { kind: 'choice' | 'words' },
  { words }: Pick<MeasurementBoxes, 'words'>,
  doubts: Doubt[],
): string | null {
  const word = (Object.hasOwn(words, field.key) ? words[field.key] : undefined)?.trim() ?? '';
  if (word === '') {
    if (field.required) refuse(doubts, 'incomplete');
    return null;
  }
  if (field.kind === 'choice' && !field.options.some((option) => option.value === word)) {
    refuse(doubts, 'unknownOption');
    return null;
  }
  return word;
}

function refuse(doubts: Doubt[], kind: DoubtKind): void {
  if (!doubts.some((doubt) => doubt.kind === kind)) doubts.push({ kind, severity: 'refuse' });
}
