import { describe, expect, it } from '@jest/globals';
import { TextDecoder } from 'node:util';
import { MOST_BYTES, readSheetFile } from './sheet-file';

// jsdom has neither.
Object.assign(globalThis, { TextDecoder });

const fileOf = (bytes: Uint8Array): File =>
  ({ size: bytes.length, arrayBuffer: () => Promise.resolve(bytes.slice().buffer) }) as unknown as File;
const read = (text: string, encoding: BufferEncoding = 'utf8') =>
  readSheetFile(fileOf(new Uint8Array(Buffer.from(text, encoding))));

describe('readSheetFile', () => {
  it('reads UTF-8, with and without a byte-order mark', async () => {
    expect(await read('Temp (°F),psig\n0,1')).toEqual({ ok: true, text: 'Temp (°F),psig\n0,1' });
    expect(await read('\uFEFF0,1')).toEqual({ ok: true, text: '0,1' });
  });

  it('reads what an older spreadsheet program wrote', async () => {
    expect(await read('Temp (°F)', 'latin1')).toEqual({ ok: true, text: 'Temp (°F)' });
  });

  it.each([
    ['an empty file', '', 'empty'],
    ['a workbook', 'PK\u0003\u0004…', 'notText'],
    ['a PDF', '%PDF-1.7', 'notText'],
    ['bytes that no text has', 'a\0b', 'notText'],
    ['a large file', 'x'.repeat(MOST_BYTES + 1), 'tooLarge'],
  ])('refuses %s', async (_what, text, fault) => {
    expect(await read(text)).toEqual({ ok: false, fault });
  });
});
