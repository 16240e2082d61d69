/** What a Range header asks of a file: nothing that we honour, one part, or one that isn't there. */
export type ByteRange = 'whole' | 'unsatisfiable' | { readonly first: number; readonly last: number };

/**
 * Reads a Range header (RFC 9110, 14.2) for a file of `bytes` bytes. One range is honoured, as a download that goes on
 * after a break asks for; several, or one that makes no sense, are answered by the whole file.
 *
 * @example byteRange('bytes=100-199', 1000) // { first: 100, last: 199 }
 */
export function byteRange(header: string | undefined, bytes: number): ByteRange {
  const match = /^bytes=(\d{0,15})-(\d{0,15})$/.exec(header ?? '');
  const [from = '', to = ''] = match?.slice(1) ?? [];
  if (from === '' && to === '') return 'whole';
  if (from === '') {
    const length = Math.min(Number(to), bytes);
    return length === 0 ? 'unsatisfiable' : { first: bytes - length, last: bytes - 1 };
  }
  const first = Number(from);
  const last = to === '' ? bytes - 1 : Math.min(Number(to), bytes - 1);
  if (first >= bytes) return 'unsatisfiable';
  return last < first ? 'whole' : { first, last };
}
