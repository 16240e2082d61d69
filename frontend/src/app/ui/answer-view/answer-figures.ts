import type { Figure, Judgement } from '#shared/checklist/judgement';
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
}

/** One value just as it was typed, with what it is of. */
export interface TypedInput {
  readonly label: string;
  readonly typed: TypedValue;
}

const ON_STRIP: readonly string[] = ['value', 'superheat', 'superheatLow', 'superheatHigh'];

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
  };
}

/** The figures that the strip doesn't show already. */
export function otherFigures(judgement: Judgement | null): readonly Figure[] {
  const onStrip = judgedFigure(judgement) !== null;
  return (judgement?.figures ?? []).filter(({ label }) => !onStrip || !ON_STRIP.includes(label));
}

/** The readings of an answer as they were typed: what was typed is shown, not only its conversion. */
export function typedInputs(content: EntryContent): readonly TypedInput[] {
  if (content.kind !== 'answer') return [];
  const { answer } = content;
  if (answer.kind === 'reading') return [{ label: 'typed_value', typed: answer.value }];
  if (answer.kind !== 'superheat') return [];
  const found = answer.asFound ? observationInputs(answer.asFound, 'Found') : [];
  return [...found, ...observationInputs(answer.asLeft, 'Left')];
}

type Observation = Extract<
  Extract<EntryContent, { kind: 'answer' }>['answer'],
  { kind: 'superheat' }
>['asLeft'];

function observationInputs(observation: Observation, when: 'Found' | 'Left'): TypedInput[] {
  const pairs =
    observation.valve === 'steady'
      ? [{ suffix: '', pair: observation.pair }]
      : [
          { suffix: 'Low', pair: observation.low },
          { suffix: 'High', pair: observation.high },
        ];
  return pairs.flatMap(({ suffix, pair }) => [
    { label: `typed_pressure${when}${suffix}`, typed: pair.pressure },
    { label: `typed_temperature${when}${suffix}`, typed: pair.temperature },
  ]);
}

/** The label of the chosen option; the stored value where the step has no such option any more. */
export function chosenLabel(step: Step, value: string): { en: string; es: string } {
  const option =
    step.kind === 'choose' ? step.options.find((candidate) => candidate.value === value) : undefined;
  return option?.label ?? { en: value, es: value };
}
