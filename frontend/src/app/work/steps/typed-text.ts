import type { TypedValue } from '#shared/checklist/typed-value';
import type { UnitId } from '#shared/units/unit';

const MINUS = '\u2212';

/** The text with its sign turned: phone number pads have no minus. */
export function turnSign(text: string): string {
  const trimmed = text.trimStart();
  const isNegative = trimmed.startsWith('-') || trimmed.startsWith(MINUS);
  return isNegative ? trimmed.slice(1) : `${MINUS}${trimmed}`;
}

/** A typed value, or `null` while nothing but a sign stands there. */
export function typedOrNull(text: string, unit: UnitId): TypedValue | null {
  const trimmed = text.trim();
  return trimmed === '' || trimmed === '-' || trimmed === MINUS ? null : { text: trimmed, unit };
}
