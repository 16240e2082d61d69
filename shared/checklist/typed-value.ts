import * as z from 'zod/mini';
import { parseNumber } from '../units/parse-number';
import { toSi } from '../units/convert';
import { UNITS, type UnitId } from '../units/unit';

const UNIT_IDS = Object.keys(UNITS) as [UnitId, ...UnitId[]];

/** A number as somebody typed it, with the unit that stood beside the box: what was typed is kept, never only its conversion. */
export const typedValueSchema = z.object({ text: z.string().check(z.maxLength(40)), unit: z.enum(UNIT_IDS) });
export type TypedValue = z.infer<typeof typedValueSchema>;

export type TypedValueProblem = 'empty' | 'notANumber' | 'ambiguous' | 'notFinite' | 'wrongUnit';

/**
 * Reads a typed value.
 *
 * @returns its size in the SI unit of `dimension`, or why it can't be read
 */
export function readTypedValue(
  typed: TypedValue,
  dimension: (typeof UNITS)[UnitId]['dimension'],
): { ok: true; si: number } | { ok: false; problem: TypedValueProblem } {
  if (UNITS[typed.unit].dimension !== dimension) return { ok: false, problem: 'wrongUnit' };
  const parsed = parseNumber(typed.text);
  if (!parsed.ok) return { ok: false, problem: parsed.reason };
  return { ok: true, si: toSi(parsed.value, typed.unit) };
}
