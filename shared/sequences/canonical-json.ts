import canonicalize from 'canonicalize';
import { Bug } from '../failures/failure';

/**
 * The one text of a JSON value: members sorted, no white space, numbers in their shortest form (RFC 8785). Hashes are
 * taken over its UTF-8 bytes.
 *
 * @throws {Bug} for what JSON can't hold: undefined, functions, NaN
 * @example canonicalJson({ b: 1, a: [true] }) === '{"a":[true],"b":1}'
 */
export function canonicalJson(value: unknown): string {
  const text = attempt(value);
  if (text === undefined) throw new Bug('A value without a JSON form can not be hashed');
  return text;
}

function attempt(value: unknown): string | undefined {
  try {
    return canonicalize(value);
  } catch (error) {
    // The library throws a plain error for NaN and infinities.
    throw new Bug(error instanceof Error ? error.message : String(error));
  }
}
