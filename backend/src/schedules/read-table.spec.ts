import { describe, expect, it } from '@jest/globals';
import { LARGEST_FILE_BYTES } from './decode-text';
import { parseSchedule } from './schedule-parser';
import { bytesOf, csvOf, fixturesOf, line, problemsOf, reasonsOf, scheduleOf } from './schedule-csv.fixture';

const CSV = csvOf([
  line({ Description: 'Café "à la carte"\nsecond line' }),
  line({ 'Fixture tag': 'ME-02' }),
]);
const tagsOf = (bytes: Uint8Array) => fixturesOf(scheduleOf(parseSchedule(bytes))).map(({ tag }) => tag);
const windows1252 = (text: string) => Uint8Array.from(text, (character) => character.charCodeAt(0));

function utf16(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length * 2);
  const view = new DataView(bytes.buffer);
  Array.from({ length: text.length }, (_, index) => view.setUint16(index * 2, text.charCodeAt(index), true));
  return bytes;
}

describe('parseSchedule, given ways of writing a table', () => {
  it.each([',', ';', '\t'])('finds the delimiter %j', (delimiter) => {
    expect(tagsOf(bytesOf(csvOf([line({ Description: 'a, b; c' })], delimiter)))).toEqual(['ME-01']);
  });

  it.each([
    ['a byte order mark', bytesOf(`\uFEFF${CSV}`)],
    ['line ends of two characters', bytesOf(CSV.replaceAll('\n', '\r\n'))],
    ['line ends of an old kind', bytesOf(CSV.replaceAll('\n', '\r'))],
    ['no line end at the end', bytesOf(CSV.trimEnd())],
    ['windows-1252', windows1252(CSV)],
    ['UTF-16 with a mark', utf16(`\uFEFF${CSV}`)],
    ['a line that names the delimiter', bytesOf(`sep=,\n${CSV}`)],
    ['titles above the headings', bytesOf(`Harbor Street Market\n\n"Schedule, revision 3"\n${CSV}`)],
  ])('reads a file with %s', (_, bytes) => {
    expect(tagsOf(bytes)).toEqual(['ME-01', 'ME-02']);
    expect(fixturesOf(scheduleOf(parseSchedule(bytes)))[0]?.description).toBe(
      'Café "à la carte" second line',
    );
  });

  it('counts physical lines, across blank lines and line breaks in cells', () => {
    const bad = csvOf([
      line({ Description: 'one\ntwo' }),
      line({ 'Fixture tag': 'ME-02', Circuit: 'A'.repeat(50) }),
    ]);
    const [first, ...rest] = bad.split('\n');
    const bytes = bytesOf([first, '', ...rest].join('\n'));
    expect(problemsOf(parseSchedule(bytes)).map(({ row }) => row)).toEqual([5]);
  });

  it('passes over lines of nothing but delimiters', () => {
    expect(tagsOf(bytesOf(`${csvOf([line()])},,,,,,,,,\n`))).toEqual(['ME-01']);
  });

  it('drops invisible characters, so that a pasted name is the same name', () => {
    const lines = [line({ Circuit: 'A1\u200B' }), line({ 'Fixture tag': 'ME-\u202E02' })];
    expect(tagsOf(bytesOf(csvOf(lines)))).toEqual(['ME-01', 'ME-02']);
  });

  it('takes an inch sign in a cell for what it is', () => {
    const text = csvOf([line({ Description: 'DESCRIPTION' })]).replace('DESCRIPTION', 'Case 48" high');
    expect(fixturesOf(scheduleOf(parseSchedule(bytesOf(text))))[0]?.description).toBe('Case 48" high');
  });

  it('refuses cells beyond the last heading, which come of a comma without quotation marks', () => {
    const text = csvOf([line({ 'Load (BTU/h)': '12400' })]).replace('12400', '12,400');
    expect(reasonsOf(parseSchedule(bytesOf(text)))).toContainEqual({
      row: 2,
      column: null,
      code: 'beyondLastHeading',
      params: { text: '400' },
    });
  });
});

describe('parseSchedule, given what is no table', () => {
  it.each([
    ['nothing', [], { code: 'fileEmpty', params: {} }],
    ['blanks', [32, 10, 13, 10], { code: 'fileEmpty', params: {} }],
    ['a PNG', [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a], { code: 'picture', params: { format: 'PNG' } }],
    ['a JPEG', [0xff, 0xd8, 0xff, 0xe0], { code: 'picture', params: { format: 'JPEG' } }],
    ['a PDF', [0x25, 0x50, 0x44, 0x46, 0x2d], { code: 'pdf', params: {} }],
    ['an XLSX', [0x50, 0x4b, 0x03, 0x04, 0x14], { code: 'excelWorkbook', params: {} }],
    ['an XLS', [0xd0, 0xcf, 0x11, 0xe0, 0xa1], { code: 'olderExcelWorkbook', params: {} }],
    ['NUL bytes', [65, 0, 66], { code: 'notText', params: {} }],
    ['a letter', [...bytesOf('Dear all,\nplease find enclosed\n')], { code: 'noHeadings', params: {} }],
    ['only headings', [...bytesOf(csvOf([]))], { code: 'onlyHeadings', params: {} }],
  ])('refuses %s', (_, bytes, reason) => {
    expect(parseSchedule(Uint8Array.from(bytes))).toEqual({
      ok: false,
      code: 'notATable',
      problems: [{ row: 1, column: null, reason, message: expect.stringMatching(/\.$/) }],
    });
  });

  it('names the line of a quotation mark that stays open', () => {
    const text = csvOf([line(), line({ 'Fixture tag': '"' }), line()]).replace('""""', '"oops');
    expect(parseSchedule(bytesOf(text))).toMatchObject({
      code: 'notATable',
      problems: [{ row: 3, reason: { code: 'openQuotationMark' } }],
    });
  });

  it('refuses more than 5 MB, without reading them', () => {
    const bytes = new Uint8Array(LARGEST_FILE_BYTES + 1);
    expect(parseSchedule(bytes)).toMatchObject({
      code: 'tooLarge',
      problems: [{ row: 1, reason: { code: 'fileTooLarge', params: { bytes: 5_242_880 } } }],
    });
  });

  it('takes 5,000 lines and refuses one more', () => {
    const lines = Array.from({ length: 5001 }, (_, index) => line({ 'Fixture tag': `F${index}` }));
    expect(tagsOf(bytesOf(csvOf(lines.slice(1))))).toHaveLength(5000);
    expect(parseSchedule(bytesOf(csvOf(lines)))).toMatchObject({
      code: 'tooLarge',
      problems: [{ row: 5002, reason: { code: 'tooManyRows', params: { upTo: 5000 } } }],
    });
  });

  it.each([
    ['blank lines', 'tooManyRows', `${csvOf([line()])}${'\n'.repeat(1_000_000)}`],
    ['columns', 'tooManyColumns', `${Object.keys(line()).join(',')}${',x'.repeat(100_000)}\n1\n`],
  ])('refuses a flood of %s', (_, code, text) => {
    expect(parseSchedule(bytesOf(text))).toMatchObject({
      ok: false,
      code: 'tooLarge',
      problems: [{ reason: { code } }],
    });
  });
});
