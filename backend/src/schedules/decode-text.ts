/** Files up to this size are read; a schedule of a large store has some 100 KB. */
export const LARGEST_FILE_BYTES = 5 * 1024 * 1024;

export type DecodedText =
  | { readonly ok: true; readonly text: string }
  | { readonly ok: false; readonly code: 'notATable' | 'tooLarge'; readonly reason: string };

const SAVE_AS_CSV = 'open it in the spreadsheet program, save it as CSV (UTF-8), and import that file.';

/** First bytes of the files that get picked by mistake, and what they are. */
const SIGNATURES: readonly (readonly [bytes: readonly number[], what: string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], `This is an Excel workbook (XLSX) or an archive; ${SAVE_AS_CSV}`],
  [[0xd0, 0xcf, 0x11, 0xe0], `This is an older Excel workbook (XLS); ${SAVE_AS_CSV}`],
  [
    [0x25, 0x50, 0x44, 0x46],
    'This is a PDF; ask the designer for the schedule as a spreadsheet and save that as CSV.',
  ],
  [[0x89, 0x50, 0x4e, 0x47], 'This is a picture (PNG); choose the schedule saved as CSV.'],
  [[0xff, 0xd8, 0xff], 'This is a picture (JPEG); choose the schedule saved as CSV.'],
];

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
    const reason = 'The file is larger than 5 MB; remove what is not part of the schedule and import again.';
    return { ok: false, code: 'tooLarge', reason };
  }
  const known = SIGNATURES.find(([start]) => startsWith(bytes, start));
  if (known) return { ok: false, code: 'notATable', reason: known[1] };
  const text = decode(bytes).replace(/\r\n?/g, '\n');
  if (text.trim() === '')
    return { ok: false, code: 'notATable', reason: 'The file is empty; choose another one.' };
  if (text.includes('\0')) {
    return {
      ok: false,
      code: 'notATable',
      reason: 'This is no text file; choose the schedule saved as CSV.',
    };
  }
  return { ok: true, text };
}
