import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../../units/convert';
import { SEA_LEVEL_ATMOSPHERE } from '../gauge-pressure';
import type { MakersPoint } from './makers-table';
import { readMakersTable, type ReadMakersTable } from './read-makers-table';

const US = { temperature: 'degF', pressure: 'psig' } as const;
const SI = { temperature: 'degC', pressure: 'bara' } as const;

function read(text: string, units: Parameters<typeof readMakersTable>[1] = US) {
  const result = readMakersTable(text, units);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result;
}

const inUs = ({ temperature, bubble, dew }: MakersPoint): number[] => [
  convert(temperature, 'K', 'degF'),
  convert(bubble - SEA_LEVEL_ATMOSPHERE, 'Pag', 'psig'),
  convert(dew - SEA_LEVEL_ATMOSPHERE, 'Pag', 'psig'),
];

function expectRows(result: ReadMakersTable & { ok: true }, rows: readonly (readonly number[])[]): void {
  expect(result.points).toHaveLength(rows.length);
  result.points.forEach((point, index) => {
    inUs(point).forEach((value, place) => expect(value).toBeCloseTo(rows[index]?.[place] ?? NaN, 6));
  });
}

// R-448A, see trade-values.spec.ts.
const ROWS = [
  [0, 34.3, 23.8],
  [20, 57.9, 43.9],
  [40, 89.3, 71.2],
];

describe('readMakersTable', () => {
  it.each([
    ['tabs', 'Temp (°F)\tBubble (psig)\tDew (psig)\n0\t34.3\t23.8\n20\t57.9\t43.9\n40\t89.3\t71.2'],
    [
      'commas',
      'Temp (°F),Bubble/Liquid (psig),Dew/Vapor (psig)\r\n0,34.3,23.8\r\n20,57.9,43.9\r\n40,89.3,71.2\r\n',
    ],
    [
      'semicolons and decimal commas',
      '°F;Líquido (psig);Vapor (psig)\n0;34,3;23,8\n20;57,9;43,9\n40;89,3;71,2',
    ],
    [
      'the dew column first',
      'Dew psig\tTemperature °F\tBubble psig\n23.8\t0\t34.3\n43.9\t20\t57.9\n71.2\t40\t89.3',
    ],
    ['no headings', '0,34.3,23.8\n20,57.9,43.9\n40,89.3,71.2'],
    [
      'a title and headings on two lines',
      'A table; edition 3, 2024\n\nTemp\tLiquid\tVapor\n(°F)\t(psig)\t(psig)\n0\t34.3\t23.8\n20\t57.9\t43.9\n40\t89.3\t71.2',
    ],
    [
      'quotes and a column nobody asked for',
      'Temp (F),"Liquid, psig","Vapor, psig",Density\n"0","34.3",23.8,1\n20,57.9,43.9,2\n40,89.3,71.2,3',
    ],
    [
      'empty columns and a byte order mark',
      '\uFEFFTemp (°F),Bubble (psig),Dew (psig),,\n0,34.3,23.8,,\n20,57.9,43.9,,\n40,89.3,71.2,,',
    ],
  ])('reads %s', (_, text) => {
    const result = read(text);
    expectRows(result, ROWS);
    expect(result.units).toEqual(US);
    expect(result.printedStepPa).toBeCloseTo(689.476, 3);
  });

  it('counts the lines of the text', () => {
    expect(read('A title\n\nTemp,Liquid,Vapor\n0,34.3,23.8\n\n20,57.9,43.9').lines).toEqual([4, 6]);
  });

  it('takes one pressure of a pure refrigerant for both', () => {
    const result = read('Temp (°F)\tPressure (psig)\n−20\t10.2\n0\t24.0');
    expectRows(result, [
      [-20, 10.2, 10.2],
      [0, 24, 24],
    ]);
    expectRows(read('-20\t10.2\n0\t24.0'), [
      [-20, 10.2, 10.2],
      [0, 24, 24],
    ]);
  });

  it('goes by the units of the headings before the given ones', () => {
    const result = read('Temp (°C);Bubble (bar(a));Dew (bar(a))\n0;6,08;4,86', US);
    expect(result.units).toEqual(SI);
    expect(result.points[0]).toEqual({
      temperature: toSi(0, 'degC'),
      bubble: toSi(6.08, 'bara'),
      dew: toSi(4.86, 'bara'),
    });
    expect(result.printedStepPa).toBeCloseTo(1000, 9);
  });

  it('leaves "psi" and "bar" open: gauge or absolute is as given', () => {
    const text = 'Temp (°F)\tBubble (psi)\tDew (psi)\n0\t34.3\t23.8';
    expect(read(text, US).units.pressure).toBe('psig');
    expect(read(text, { temperature: 'degF', pressure: 'psia' }).units.pressure).toBe('psia');
    const absolute = read(text, { temperature: 'degF', pressure: 'psia' }).points[0];
    expect(absolute?.dew).toBeCloseTo(toSi(23.8, 'psia'), 6);
  });

  it('reads thousands: a comma is one where dots mark decimals', () => {
    expect(inUs(read('80\t"1,054.2"\t1,054.2').points[0] as MakersPoint)[1]).toBeCloseTo(1054.2, 6);
    expect(inUs(read('79.5,"1,055","1,050"').points[0] as MakersPoint)[2]).toBeCloseTo(1050, 6);
    expect(read('20;1,250;1,1', SI).points[0]?.bubble).toBeCloseTo(125000, 6);
  });

  it.each([
    ['', 'empty', null, null],
    ['Temp,Dew\n', 'empty', null, null],
    ['0,34.3,23.8\n20,,43.9', 'emptyCell', 2, 2],
    ['0,34.3,23.8\n20,57.9,about 44', 'notANumber', 2, 3],
    ['0\t34.3\t23.8\n20\t57.9', 'emptyCell', 2, 3],
    ['0;1,234;1,100', 'ambiguousNumber', 1, 2],
    ['0,34.3,23.8,1', 'tooManyColumns', 1, null],
    ['0\n20', 'tooFewColumns', 1, null],
    ['Temp,A,B\n0,34.3,23.8', 'columnsUnknown', 1, null],
    ['Temp (°F),Bubble (psig),Dew (psia)\n0,34.3,38.5', 'headingUnitsDiffer', 1, null],
  ])('can’t read %j: %s in row %s, column %s', (text, code, row, column) => {
    const result = readMakersTable(text, US);
    if (result.ok) throw new Error('read');
    expect(result.problems[0]).toMatchObject({ code, row, column });
  });

  it('names every cell that it can’t read', () => {
    const result = readMakersTable('0,34.3,23.8\nx,y,43.9\n40,89.3,z', US);
    expect(result.ok ? [] : result.problems.map(({ row, column, text }) => [row, column, text])).toEqual([
      [2, 1, 'x'],
      [2, 2, 'y'],
      [3, 3, 'z'],
    ]);
  });

  it('brings back what was printed, whatever the delimiter and the decimal mark', () => {
    const tenth = fc.integer({ min: -1000, max: 9999 }).map((value) => value / 10);
    const rows = fc.array(fc.tuple(tenth, tenth, tenth), { minLength: 1, maxLength: 20 });
    const styles = fc.constantFrom(['\t', '.'], ['\t', ','], [';', '.'], [';', ','], [',', '.']);
    fc.assert(
      fc.property(rows, styles, (figures, [delimiter, mark]) => {
        const lines = figures.map((row) =>
          row.map((value) => value.toFixed(1).replace('.', mark ?? '.')).join(delimiter),
        );
        expectRows(read(lines.join('\n')), figures);
      }),
    );
  });
});
