import type { Judgement } from '#shared/checklist/judgement';
import type { Language } from '#shared/checklist/text';
import { formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { displayUnitFor, type UnitSystem } from '#shared/units/unit-system';

export type WorkingLineText = { readonly label: string; readonly text: string };

/** The lines of one working in the reader's units: SI inside, converted and rounded only here. */
export function workingLines(
  working: Judgement['working'][number],
  unitSystem: UnitSystem,
  language: Language,
): readonly WorkingLineText[] {
  return working.lines.map(({ label, value, unit }) => ({
    label,
    text: formatQuantity(value, displayUnitFor(value, UNITS[unit].dimension, unitSystem), language),
  }));
}

/** The table and the program behind it: what a citation begins with. The literature follows behind a semicolon. */
export function shortSource(source: string): string {
  return source.split(';')[0]?.trim() ?? source;
}
