import { parseNumber } from '../../units/parse-number';

/** `'auto'`: nothing says which mark is the decimal one; see `parseNumber`. */
export type DecimalComma = 'auto' | boolean;

/** A cell's number, or why there is none. An empty cell is no mistake. */
export type CellNumber = number | 'empty' | 'unreadable' | 'ambiguous';

const ZERO = 48;
const NINE = 57;
const EXPONENT = /^[-+]?\d+(?:[.,]\d+)?[eE][-+]?\d{1,3}$/;

/** Whether the text is digits with a sign before and one decimal mark among them: what loggers nearly always write. */
function isPlain(text: string, mark: number): boolean {
  let marks = 0;
  let digits = 0;
  const first = text.charCodeAt(0);
  for (let index = first === 45 || first === 43 ? 1 : 0; index < text.length; index++) {
    const code = text.charCodeAt(index);
    if (code >= ZERO && code <= NINE) digits++;
    else if (code === mark) marks++;
    else return false;
  }
  return digits > 0 && marks < 2;
}

const finite = (value: number): CellNumber => {
  if (!Number.isFinite(value)) return 'unreadable';
  return value === 0 ? 0 : value;
};

/**
 * The number in one cell. As `parseNumber`, with exponents ("1.2E-3") as loggers write them, and a short cut for plain
 * digits: parseNumber's care costs more than five times as much (measured), which counts over a million cells.
 *
 * @param text one cell
 * @param decimalComma whether the file's decimal mark is the comma
 * @returns the number (never −0), or why there is none
 * @example cellNumber('3,5', true) // 3.5
 */
export function cellNumber(text: string, decimalComma: DecimalComma): CellNumber {
  const trimmed = text.trim();
  if (trimmed === '') return 'empty';
  const isComma = decimalComma === true;
  if (isPlain(trimmed, isComma ? 44 : 46)) {
    return finite(Number(isComma ? trimmed.replace(',', '.') : trimmed));
  }
  if (EXPONENT.test(trimmed)) return finite(Number(trimmed.replace(',', '.')));
  const parsed = parseNumber(trimmed, { decimalComma });
  if (parsed.ok) return parsed.value;
  return parsed.reason === 'ambiguous' ? 'ambiguous' : 'unreadable';
}
