import { describe, expect, it } from '@jest/globals';
import { isDesignation, readSheet, type SheetFigures } from './sheet-reading';
import { sheetText } from './sheet.fixture';

const US = { temperature: 'degF', pressure: 'psig' } as const;
const NAMES = { designation: 'R-9X1', issuer: 'Example Gases', edition: '2026-01' };

function figures(text: string, names = NAMES): SheetFigures {
  const reading = readSheet(text, US, names);
  if (reading.kind !== 'figures') throw new Error(JSON.stringify(reading));
  return reading;
}
const codes = (text: string, names = NAMES) =>
  figures(text, names).problems.map(({ code, row }) => [code, row]);

describe('readSheet', () => {
  it('is empty without a text', () => {
    expect(readSheet(' \n', US, NAMES)).toEqual({ kind: 'empty' });
  });

  it('names cells that are no numbers', () => {
    const reading = readSheet(sheetText().replace('\t', '\tx'), US, NAMES);
    expect(reading).toMatchObject({
      kind: 'unreadable',
      problems: [{ code: 'notANumber', row: 1, column: 2 }],
    });
  });

  it('reads a sheet in SI units, with nothing against it and a curve', () => {
    const read = figures(sheetText());
    expect(read.problems).toEqual([]);
    expect(read.table.points).toHaveLength(10);
    expect(read.table.points[0]?.temperatureK).toBeCloseTo(233.15, 9);
    // A tenth of a psi (NIST SP 811: 6894.757 Pa).
    expect(read.table.printedStepPa).toBeCloseTo(689.4757, 3);
    expect(read.saturation?.source).toBe('pressure–temperature table of Example Gases, 2026-01');
  });

  it('draws the curve before the names are typed, and says that they are missing', () => {
    const nameless = { designation: '', issuer: ' ', edition: '' };
    expect(codes(sheetText(), nameless).map(([code]) => code)).toEqual([
      'noDesignation',
      'noIssuer',
      'noEdition',
    ]);
    expect(figures(sheetText(), nameless).saturation).not.toBeNull();
  });

  it('has no curve to work with while something is refused', () => {
    const lines = sheetText().split('\n');
    const reading = figures([...lines.slice(0, 3), ...lines.slice(5)].join('\n'));
    expect(reading.problems.map(({ code, row }) => [code, row])).toEqual([['gapTooWide', 4]]);
    expect(reading.saturation).toBeNull();
  });

  it('says of the one column of a pure refrigerant once what is wrong with it', () => {
    const lines = sheetText('R-290', 'dew').split('\n');
    const swapped = [lines[0], lines[1], lines[2]?.replace(/\t.*/, '\t1.0'), ...lines.slice(3)].join('\n');
    expect(codes(swapped)).toEqual([['outlyingPoint', 3]]);
    const few = lines.slice(0, 4).join('\n');
    expect(codes(few)).toEqual([['tooFewPoints', null]]);
    expect(codes(sheetText('R-290', 'dew'))).toEqual([]);
  });

  it('refuses more rows than are kept', () => {
    const rows = Array.from({ length: 401 }, (_, index) => `${index / 10},${index + 10}`).join('\n');
    expect(readSheet(rows, US, NAMES)).toEqual({ kind: 'tooManyRows', rowCount: 401 });
  });
});

describe('isDesignation', () => {
  it.each([
    ['R-9X1', true],
    ['r454c', true],
    ['', false],
    ['--', false],
    ['R-9Ж1', false],
    ['x'.repeat(25), false],
  ])('of %p is %p', (text, is) => {
    expect(isDesignation(text)).toBe(is);
  });
});
