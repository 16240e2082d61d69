import type { Judgement } from '#shared/checklist/judgement';
import type { Answer } from '#shared/checklist/step';
import type { Language } from '#shared/checklist/text';
import { formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { judgedFigure, type JudgedFigure } from '../../ui/answer-view/answer-figures';

/** A value outside its limits, for the second look before it is recorded. */
export interface OutsideValue {
  /** With its unit. */
  readonly text: string;
  /** The limits that it misses. */
  readonly limits: Pick<JudgedFigure, 'low' | 'high' | 'dimension'>;
  readonly unitSystem: UnitSystem;
}

/**
 * The value that lies outside: a reading just as it was typed, since rounding could put it on its limit; what was worked
 * out in the opening's units.
 *
 * @returns `null` when nothing lies outside, or what does is no number
 */
export function outsideValue(
  answer: Answer | null,
  judgement: Judgement | null,
  unitSystem: UnitSystem,
  language: Language,
): OutsideValue | null {
  const limits = judgement?.outcome === 'outside' ? judgedFigure(judgement) : null;
  if (!limits) return null;
  const text =
    answer?.kind === 'reading'
      ? `${answer.value.text.trim()} ${UNITS[answer.value.unit].symbol}`.trim()
      : formatQuantity(limits.value, displayUnit(limits.dimension, unitSystem), language);
  return { text, limits, unitSystem };
}
