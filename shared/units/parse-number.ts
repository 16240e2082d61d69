/** What came of reading a number; `ambiguous` is one separator that could be either a decimal or a thousands one. */
export type ParsedNumber =
  | { readonly ok: true; readonly value: number }
  | { readonly ok: false; readonly reason: 'empty' | 'notANumber' | 'ambiguous' | 'notFinite' };

/** How to read the one ambiguous form, "1,234" or "1.234". */
export interface ParseNumberOptions {
  /**
   * `true`: the comma is the decimal mark. `false`: the dot is. `'auto'` (default): "1,234" is ambiguous, and a single
   * dot is always a decimal mark. Any form that can mean one thing only is read so, whatever is said here.
   */
  readonly decimalComma?: 'auto' | boolean;
}

// Hyphens, dashes and minus signs that phone keyboards and pasted text bring along.
const MINUS_SIGNS = /^[-\u2010-\u2013\u2212\uFE63\uFF0D]/;
const GROUPED = { ',': /^\d{1,3}(,\d{3})+$/, '.': /^\d{1,3}(\.\d{3})+$/ } as const;

type Separator = keyof typeof GROUPED;

const refuse = (reason: 'empty' | 'notANumber' | 'ambiguous' | 'notFinite'): ParsedNumber => ({
  ok: false,
  reason,
});

/** Whether the digits before the decimal mark are plain or properly grouped by `separator`. */
const isWhole = (text: string, separator: Separator): boolean =>
  /^\d*$/.test(text) || GROUPED[separator].test(text);

function finish(sign: number, whole: string, decimals: string): ParsedNumber {
  const value = sign * Number(`${whole.replace(/[.,]/g, '') || '0'}.${decimals || '0'}`);
  return Number.isFinite(value) ? { ok: true, value: value === 0 ? 0 : value } : refuse('notFinite');
}

function parseUnsigned(body: string, sign: number, decimalComma: 'auto' | boolean): ParsedNumber {
  const last = Math.max(body.lastIndexOf(','), body.lastIndexOf('.'));
  if (last === -1) return finish(sign, body, '');
  const mark: Separator = body[last] === ',' ? ',' : '.';
  const other: Separator = mark === ',' ? '.' : ',';
  const whole = body.slice(0, last);
  const decimals = body.slice(last + 1);
  if (whole.includes(mark)) return GROUPED[mark].test(body) ? finish(sign, body, '') : refuse('notANumber');
  if (!isWhole(whole, other)) return refuse('notANumber');
  const couldGroup = !whole.includes(other) && GROUPED[mark].test(body) && !whole.startsWith('0');
  if (!couldGroup) return finish(sign, whole, decimals);
  if (decimalComma === 'auto') return mark === ',' ? refuse('ambiguous') : finish(sign, whole, decimals);
  return decimalComma === (mark === ',') ? finish(sign, whole, decimals) : finish(sign, body, '');
}

/**
 * Reads a number as a person types it on a phone: "20.9", "20,9", "−4", "1.234,5". Exponents, hexadecimal, units and
 * words are no numbers. Never guesses where a guess could be wrong by a thousand.
 *
 * @param text as typed; spaces around it and after the sign don't matter
 * @param options how to read "1,234" where the page knows the reader's habit
 * @returns the value (never −0), or why there is none
 * @example parseNumber('20,9') // { ok: true, value: 20.9 }
 * @example parseNumber('1,234') // { ok: false, reason: 'ambiguous' }
 */
export function parseNumber(text: string, options: ParseNumberOptions = {}): ParsedNumber {
  const trimmed = text.trim();
  if (trimmed === '') return refuse('empty');
  const isNegative = MINUS_SIGNS.test(trimmed);
  const body = isNegative || trimmed.startsWith('+') ? trimmed.slice(1).trim() : trimmed;
  if (!/^[\d.,]+$/.test(body) || !/\d/.test(body)) return refuse('notANumber');
  return parseUnsigned(body, isNegative ? -1 : 1, options.decimalComma ?? 'auto');
}
