import type { ScheduleReason } from '#shared/contracts/schedule-reasons';

/** Files up to this size are read; a schedule of a large store has some 100 KB. */
export const LARGEST_FILE_BYTES = 5 * 1024 * 1024;

export type DecodedText =
  | { readonly ok: true; readonly text: string }
  | { readonly ok: false; readonly code: 'notATable' | 'tooLarge'; readonly reason: ScheduleReason };

/** First bytes of the files that get picked by mistake, and what they are. */
const SIGNATURES: readonly (readonly [bytes: readonly number[], what: ScheduleReason])[] = [
  [[0x50, 0x4b, 0x03, 0x04], { code: 'excelWorkbook', params: {} }],
  [[0xd0, 0xcf, 0x11, 0xe0], { code: 'olderExcelWorkbook', params: {} }],
  [[0x25, 0x50, 0x44, 0x46], { code: 'pdf', params: {} }],
  [[0x89, 0x50, 0x4e, 0x47], { code: 'picture', params: { format: 'PNG' } }],
  [[0xff, 0xd8, 0xff], { code: 'picture', params: { format: 'JPEG' } }],
];

const notATable = (reason: ScheduleReason): DecodedText => ({ ok: false, code: 'notATable', reason });

const startsWith = (bytes: Uint8Array, start: readonly number[]): boolean =>
  bytes.length >= start.length && start.every((byte, index) => bytes[index] === byte);

function decode(bytes: Uint8Array): string {
  // What a spreadsheet program calls "Unicode text".
  if (startsWith(bytes, [0xff, 0xfe])) return new TextDecoder('utf-16le').decode(bytes);
  if (startsWith(bytes, [0xfe, 0xff])) return new TextDecoder('utf-16be').decode(bytes);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    // Bytes that are no UTF-8 come from an older "CSV" export; every byte means something in windows-1252.
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/**
 * The text of a file: UTF-8, UTF-16 with a byte order mark, or else windows-1252; without the mark, with line feeds only.
 *
 * @returns the text, or why the bytes are no text
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes.length > LARGEST_FILE_BYTES) {
    const reason: ScheduleReason = { code: 'fileTooLarge', params: { bytes: LARGEST_FILE_BYTES } };
    return { ok: false, code: 'tooLarge', reason };
  }
  const known = SIGNATURES.find(([start]) => startsWith(bytes, start));
  if (known) return notATable(known[1]);
  const text = decode(bytes).replace(/\r\n?/g, '\n');
  if (text.trim() === '') return notATable({ code: 'fileEmpty', params: {} });
  if (text.includes('\0')) return notATable({ code: 'notText', params: {} });
  return { ok: true, text };
}
