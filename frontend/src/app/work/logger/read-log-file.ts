import type { ReadLoggerOptions } from '#shared/refrigeration/logger/logger-file';
import { readLogger } from '#shared/refrigeration/logger/read-logger';
import { sha256Of } from '../../offline/sha256-of';
import { withDecodedPieces } from './decoded-pieces';
import type { LogReading } from './log-reading';

/** A million rows, the most that are read, stay below this; a phone's memory doesn't hold much more. */
const MOST_BYTES = 100 * 1024 * 1024;
/** Getting the bytes is the shorter part of the work. */
const SHARE_OF_BYTES = 0.3;
const LONGEST_NAME = 200;

const CANNOT_OPEN: LogReading = { ok: false, reason: 'cannotOpen' };

/** The part of a `File` that is read. */
export type LogSource = Pick<File, 'name' | 'size' | 'stream'>;

/** All bytes of a file; `null` when it is no longer as long as it was when it was chosen. */
async function bytesOf(
  file: LogSource,
  onShare: (share: number) => void,
): Promise<Uint8Array<ArrayBuffer> | null> {
  const bytes = new Uint8Array(file.size);
  const reader = file.stream().getReader();
  let at = 0;
  for (let part = await reader.read(); !part.done; part = await reader.read()) {
    if (at + part.value.length > bytes.length) return null;
    bytes.set(part.value, at);
    at += part.value.length;
    onShare(at / bytes.length);
  }
  return at === bytes.length ? bytes : null;
}

/** A name that fits into an entry: its end, where what tells two logs apart stands. */
const shortName = (name: string): string => (name.length <= LONGEST_NAME ? name : name.slice(-LONGEST_NAME));

/**
 * Reads a logger's file: bytes, hash, text, columns. In a worker wherever there is one.
 *
 * @param file as chosen
 * @param options what a person said where the file doesn't
 * @param onShare told how far it is, from 0 to 1, never backwards save for a file that is no UTF-8
 * @returns columns and hash, or why it isn't read; a file that the phone doesn't give is a refusal, too
 */
export async function readLogFile(
  file: LogSource,
  options: ReadLoggerOptions,
  onShare: (share: number) => void,
): Promise<LogReading> {
  if (file.size > MOST_BYTES) return { ok: false, reason: 'tooLong' };
  let bytes: Uint8Array<ArrayBuffer> | null;
  try {
    bytes = await bytesOf(file, (share) => onShare(share * SHARE_OF_BYTES));
  } catch (error) {
    // NotFoundError, NotReadableError: moved, changed, or on a card that is gone.
    if (!(error instanceof DOMException)) throw error;
    return CANNOT_OPEN;
  }
  if (bytes === null) return CANNOT_OPEN;
  const onText = (share: number): void => onShare(SHARE_OF_BYTES + share * (1 - SHARE_OF_BYTES));
  const log = withDecodedPieces(bytes, onText, (pieces) => readLogger(pieces, options));
  if (!log.ok) return log;
  const sha256 = await sha256Of(bytes.buffer);
  return { ok: true, file: { name: shortName(file.name), sha256, rows: log.rows }, log };
}
