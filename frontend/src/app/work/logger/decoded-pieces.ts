const PIECE_BYTES = 256 * 1024;

/** The bytes are no UTF-8: they mean something else. */
class NotUtf8 extends Error {
  override readonly name = 'NotUtf8';
}

const startsWith = (bytes: Uint8Array, start: readonly number[]): boolean =>
  start.every((byte, index) => bytes[index] === byte);

/** UTF-16 is only taken where its mark says so; anything else is UTF-8 until it proves not to be. */
function encodingOf(bytes: Uint8Array): string {
  if (startsWith(bytes, [0xff, 0xfe])) return 'utf-16le';
  return startsWith(bytes, [0xfe, 0xff]) ? 'utf-16be' : 'utf-8';
}

function* piecesOf(
  bytes: Uint8Array<ArrayBuffer>,
  encoding: string,
  onShare: (share: number) => void,
): Generator<string> {
  const decoder = new TextDecoder(encoding, { fatal: encoding === 'utf-8' });
  const decode = (piece: Uint8Array<ArrayBuffer>, stream: boolean): string => {
    try {
      return decoder.decode(piece, { stream });
    } catch {
      // All that decoding throws: a byte that the encoding doesn't have.
      throw new NotUtf8();
    }
  };
  for (let at = 0; at < bytes.length; at += PIECE_BYTES) {
    yield decode(bytes.subarray(at, at + PIECE_BYTES), true);
    onShare(Math.min((at + PIECE_BYTES) / bytes.length, 1));
  }
  yield decode(bytes.subarray(bytes.length), false);
}

/**
 * Hands a file's text to a reader piece by piece: as UTF-8 (or UTF-16 with its mark), and once more from the beginning as
 * windows-1252, which older loggers' programs write, where it turns out to be no UTF-8.
 *
 * @param onShare told how much of the text the reader has taken, from 0 to 1
 */
export function withDecodedPieces<T>(
  bytes: Uint8Array<ArrayBuffer>,
  onShare: (share: number) => void,
  read: (pieces: Iterable<string>) => T,
): T {
  try {
    return read(piecesOf(bytes, encodingOf(bytes), onShare));
  } catch (error) {
    if (!(error instanceof NotUtf8)) throw error;
    return read(piecesOf(bytes, 'windows-1252', onShare));
  }
}
