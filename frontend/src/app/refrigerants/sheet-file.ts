/** A printed sheet has a few hundred lines; what is larger is something else. */
export const MOST_BYTES = 500_000;

export type SheetFile =
  | { readonly ok: true; readonly text: string }
  | { readonly ok: false; readonly fault: 'empty' | 'tooLarge' | 'notText' };

/** UTF-8, else the encoding in which older spreadsheet programs write "°". */
function decode(bytes: ArrayBuffer): string {
  const text = new TextDecoder('utf-8').decode(bytes);
  return text.includes('\uFFFD') ? new TextDecoder('windows-1252').decode(bytes) : text;
}

/** The text of a chosen CSV file, or why it is none. */
export async function readSheetFile(file: File): Promise<SheetFile> {
  if (file.size === 0) return { ok: false, fault: 'empty' };
  if (file.size > MOST_BYTES) return { ok: false, fault: 'tooLarge' };
  const text = decode(await file.arrayBuffer());
  // Workbooks and pictures have bytes in them that no text has.
  return text.includes('\0') || text.startsWith('PK\u0003') || text.startsWith('%PDF')
    ? { ok: false, fault: 'notText' }
    : { ok: true, text };
}
