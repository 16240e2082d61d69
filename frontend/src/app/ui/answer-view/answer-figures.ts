import type { Figure, Judgement } from '#shared/checklist/judgement';
import type { MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import type { MethodField } from '#shared/checklist/methods/method';
import { METHODS } from '#shared/checklist/methods/methods';
import type { Text } from '#shared/checklist/text';
import type { Step } from '#shared/checklist/step';
import type { TypedValue } from '#shared/checklist/typed-value';
import { UNITS, type Dimension } from '#shared/units/unit';
import type { EntryContent } from '#shared/sequences/entry';

/** What is judged on a strip: the figure that the outcome rests on, and its limits. */
export interface JudgedFigure {
  readonly value: number;
  readonly dimension: Dimension;
  readonly low: number | null;
  readonly high: number | null;
  readonly minimum: number | null;
  readonly maximum: number | null;
  /** Half width of the instruments' error; `null` where it isn't known. */
  readonly uncertainty: number | null;
}

/** One value just as it was typed, with what it is of. */
export interface TypedInput {
  readonly label: string;
  readonly typed: TypedValue;
}

const ON_STRIP: readonly string[] = [
  'value',
  'superheat',
  'superheatLow',
  'superheatHigh',
  'superheatUncertainty',
];

/**
 * The figure for the strip. Limits come from the judgement, because those applied on the day.
 *
 * @returns `null` when there is no figure, or nothing that it is judged against
 */
export function judgedFigure(judgement: Judgement | null): JudgedFigure | null {
  const main = judgement?.figures.find(({ label }) => label === 'value' || label === 'superheat');
  if (!judgement?.limit || !main) return null;
  const named = (label: string): number | null =>
    judgement.figures.find((figure) => figure.label === label)?.value ?? null;
  return {
    value: main.value,
    dimension: UNITS[main.unit].dimension,
    low: judgement.limit.low,
    high: judgement.limit.high,
    minimum: named('superheatLow'),
    maximum: named('superheatHigh'),
    uncertainty: named('superheatUncertainty'),
  };
}

/** What belongs to one pair only: where an answer has several, each pair's own lines say it. */
const OF_A_PAIR: readonly string[] = ['saturation', 'glide'];

/**
 * The figures that neither the strip nor the lines of the pairs show already.
 *
 * @param withPairs whether the pairs are shown with a saturation each
 */
export function otherFigures(judgement: Judgement | null, withPairs = false): readonly Figure[] {
  const onStrip = judgedFigure(judgement) !== null;
  return (judgement?.figures ?? []).filter(
    ({ label }) => !(onStrip && ON_STRIP.includes(label)) && !(withPairs && OF_A_PAIR.includes(label)),
  );
}

/** The readings of an answer as they were typed: what was typed is shown, not only its conversion. */
export function typedInputs(content: EntryContent): readonly TypedInput[] {
  if (content.kind !== 'answer') return [];
  const { answer } = content;
  if (answer.kind === 'reading') return [{ label: 'typed_value', typed: answer.value }];
  return answer.kind === 'superheat' ? pairsOf(answer).flatMap(pairInputs) : [];
}

/** One pair of a superheat as it was typed, and the saturation that was worked out from its pressure. */
export interface PairLines {
  readonly inputs: readonly TypedInput[];
  /** Label of the saturation. */
  readonly label: string;
  /** `null` for a pair that couldn't be worked out. */
  readonly saturationK: number | null;
}

/**
 * The pairs of a superheat answer, each with its own saturation: a hunting valve has two, before and after adjusting.
 * Saturations come from the working that was kept with the judgement.
 *
 * @returns `null` for any other answer, a single pair (its saturation is among the figures), or one without working
 */
export function pairLines(content: EntryContent, judgement: Judgement | null): readonly PairLines[] | null {
  if (content.kind !== 'answer' || content.answer.kind !== 'superheat') return null;
  const pairs = pairsOf(content.answer);
  const left = pairs.filter(({ when }) => when === 'Left');
  const dews = dewTemperaturesK(judgement);
  // Judging works out the as-left first; an as-found that can't be read has no working at all.
  if (pairs.length < 2 || (dews.length !== pairs.length && dews.length !== left.length)) return null;
  const judged = [...left, ...pairs.filter(({ when }) => when === 'Found')];
  return pairs.map((pair) => ({
    inputs: pairInputs(pair),
    label: `saturation_${pair.when}${pair.suffix}`,
    saturationK: dews[judged.indexOf(pair)] ?? null,
  }));
}

type SuperheatAnswer = Extract<Extract<EntryContent, { kind: 'answer' }>['answer'], { kind: 'superheat' }>;
type Observation = SuperheatAnswer['asLeft'];

interface TypedPair {
  readonly when: 'Found' | 'Left';
  readonly suffix: '' | 'Low' | 'High';
  readonly pressure: TypedValue;
  readonly temperature: TypedValue;
}

/** All pairs that were typed, in the order of the work. */
function pairsOf({ asFound, asLeft }: SuperheatAnswer): readonly TypedPair[] {
  return [...(asFound ? observationPairs(asFound, 'Found') : []), ...observationPairs(asLeft, 'Left')];
}

function observationPairs(observation: Observation, when: TypedPair['when']): readonly TypedPair[] {
  if (observation.valve === 'steady') return [{ when, suffix: '', ...observation.pair }];
  if (observation.valve !== 'hunting') return [];
  return [
    { when, suffix: 'Low', ...observation.low },
    { when, suffix: 'High', ...observation.high },
  ];
}

function pairInputs({ when, suffix, pressure, temperature }: TypedPair): readonly TypedInput[] {
  return [
    { label: `typed_pressure${when}${suffix}`, typed: pressure },
    { label: `typed_temperature${when}${suffix}`, typed: temperature },
  ];
}

function dewTemperaturesK(judgement: Judgement | null): readonly number[] {
  return (judgement?.working ?? []).flatMap(({ formula, lines }) => {
    const dew = lines.find(({ label, unit }) => label === 'dewTemperature' && unit === 'K');
    return formula === 'superheatFromDew' && dew ? [dew.value] : [];
  });
}

/** One box of a measurement as it was filled: its name is the method's own. */
export interface MeasuredLine {
  readonly label: Text;
  readonly text: Text;
}

/** Everything that was typed into a measurement, row by row, empty boxes left out. */
export function measuredLines(content: EntryContent): readonly MeasuredLine[] {
  if (content.kind !== 'answer' || content.answer.kind !== 'measurement') return [];
  const { answer } = content;
  const { fields, rows } = METHODS[answer.method];
  return [
    ...boxLines(fields, answer, { en: '', es: '' }),
    ...answer.rows.flatMap((row, index) => {
      const { en, es } = rows?.label ?? { en: '', es: '' };
      return boxLines(rows?.fields ?? [], row, { en: `${en} ${index + 1}: `, es: `${es} ${index + 1}: ` });
    }),
  ];
}

function boxLines(
  fields: readonly MethodField[],
  { quantities, words }: Pick<MeasurementBoxes, 'quantities' | 'words'>,
  before: Text,
): MeasuredLine[] {
  return fields.flatMap((field): MeasuredLine[] => {
    const label = { en: before.en + field.label.en, es: before.es + field.label.es };
    if (field.kind === 'quantity') {
      const typed = quantities[field.key];
      const text = typed ? `${typed.text} ${UNITS[typed.unit].symbol}`.trim() : '';
      return text === '' ? [] : [{ label, text: { en: text, es: text } }];
    }
    const word = words[field.key] ?? '';
    const option = field.kind === 'choice' ? field.options.find(({ value }) => value === word) : undefined;
    return word === '' ? [] : [{ label, text: option?.label ?? { en: word, es: word } }];
  });
}

/** The label of the chosen option; the stored value where the step has no such option any more. */
export function chosenLabel(step: Step, value: string): { en: string; es: string } {
  const option =
    step.kind === 'choose' ? step.options.find((candidate) => candidate.value === value) : undefined;
  return option?.label ?? { en: value, es: value };
}
