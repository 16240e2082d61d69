import { createHash } from 'node:crypto';
import { describe, expect, it } from '@jest/globals';
import { fileOf } from './log-file.fixture';
import { readLogFile } from './read-log-file';

const rows = (count: number): string =>
  Array.from({ length: count }, (_, index) => `${index * 10},${(40 + (index % 7) / 10).toFixed(1)}`).join(
    '\n',
  );
const LOG = `Time (s),Air (°F)\n${rows(2000)}`;
const noProgress = (): void => undefined;

describe('readLogFile', () => {
  it('reads columns, counts rows and says of which bytes they are', async () => {
    const reading = await readLogFile(fileOf(LOG), {}, noProgress);
    if (!reading.ok) throw new Error(reading.reason);
    expect(reading.file).toEqual({
      name: 'log.csv',
      sha256: createHash('sha256').update(LOG, 'utf8').digest('hex'),
      rows: 2000,
    });
    expect(reading.log.columns.map(({ heading, unit }) => [heading, unit])).toEqual([['Air (°F)', 'degF']]);
    expect(reading.log.times.at(-1)).toBe(19_990);
  });

  it('tells how far it is, from the beginning to the end', async () => {
    const shares: number[] = [];
    await readLogFile(fileOf(LOG), {}, (share) => shares.push(share));
    expect(shares.length).toBeGreaterThan(5);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.at(-1)).toBeCloseTo(1, 9);
  });

  it('reads bytes that are no UTF-8 as windows-1252', async () => {
    const bytes = Uint8Array.from(Buffer.from(`Tiempo (s),Cámara (°C)\n${rows(20)}`, 'latin1'));
    const reading = await readLogFile(fileOf(bytes), {}, noProgress);
    expect(reading.ok && reading.log.columns[0]?.heading).toBe('Cámara (°C)');
    expect(reading.ok && reading.log.columns[0]?.unit).toBe('degC');
  });

  it('finds a byte that is no UTF-8 late in a long file, and keeps characters whole where pieces meet', async () => {
    const long = `Time (s),Air (°C),Note\n${'1,2,°\n'.repeat(200_000)}`;
    const reading = await readLogFile(fileOf(`${long}2,3,°\n`), {}, noProgress);
    expect(reading.ok && reading.log.rows).toBe(2);
    const late = Uint8Array.from([...Buffer.from(long), ...Buffer.from('2,3,é\n', 'latin1')]);
    const other = await readLogFile(fileOf(late, 'log.csv', 100_000), {}, noProgress);
    expect(other.ok && other.log.columns[0]?.heading).toBe('Air (Â°C)');
  });

  it('reads UTF-16 with its mark', async () => {
    const bytes = Uint8Array.from(Buffer.from(`\uFEFF${LOG}`, 'utf16le'));
    const reading = await readLogFile(fileOf(bytes), {}, noProgress);
    expect(reading.ok && reading.log.columns[0]?.heading).toBe('Air (°F)');
  });

  it.each([
    ['notText', fileOf(Uint8Array.from([0x50, 0x4b, 3, 4, 0, 0, 0, 0, 0, 10]), 'book.xlsx')],
    ['tooShort', fileOf('')],
    ['noTimeColumn', fileOf('Air (°F)\n1\n2\n3')],
    ['noTimeUnit', fileOf('Time,Air (°F)\n1,2\n2,3')],
    ['tooLong', { ...fileOf(''), size: 101 * 1024 * 1024 }],
  ])('refuses with %s', async (reason, file) => {
    expect(await readLogFile(file, {}, noProgress)).toEqual({ ok: false, reason });
  });

  it('refuses a file that the phone does not hand over, or that changed meanwhile', async () => {
    const gone = () => {
      throw new DOMException('gone', 'NotReadableError');
    };
    const refusal = { ok: false, reason: 'cannotOpen' };
    expect(await readLogFile({ ...fileOf(LOG), stream: gone }, {}, noProgress)).toEqual(refusal);
    expect(await readLogFile({ ...fileOf(LOG), size: 10 }, {}, noProgress)).toEqual(refusal);
    expect(await readLogFile({ ...fileOf(LOG), size: 1_000_000 }, {}, noProgress)).toEqual(refusal);
  });

  it('lets a mistake of ours through', async () => {
    const broken = () => {
      throw new RangeError('ours');
    };
    await expect(readLogFile({ ...fileOf(LOG), stream: broken }, {}, noProgress)).rejects.toThrow('ours');
  });

  it('keeps the end of a name that is too long', async () => {
    const reading = await readLogFile(fileOf(LOG, `${'x'.repeat(300)}-box-7.csv`), {}, noProgress);
    expect(reading.ok && reading.file.name).toMatch(/^x{190}-box-7\.csv$/);
  });
});
