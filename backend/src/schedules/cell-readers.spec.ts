import { describe, expect, it } from '@jest/globals';
import type { UnitId } from '#shared/units/unit';
import { quantity, type CellSurroundings } from './cell-readers';
import { readFeetAndInches } from './feet-and-inches';

const length = quantity('length', ['ft', 'm'], 1, 330);
const temperature = quantity('temperature', ['degC', 'degF'], -60, 20);
const superheat = quantity('temperatureDifference', ['K_diff', 'degF_diff'], 0.5, 20);
const load = quantity('heatFlow', ['W'], 50, 500_000);

const surroundings = (unit?: UnitId, decimalComma: 'auto' | false = 'auto'): CellSurroundings => ({
  unit,
  decimalComma,
  knowsRefrigerant: () => undefined,
});

describe('quantity', () => {
  it.each([
    [superheat, '4 °F', undefined, 2.2222],
    [temperature, '4 °F', undefined, 257.594],
    [superheat, '4 K', undefined, 4],
    [superheat, '4', 'degF_diff', 2.2222],
    [temperature, '-25F', 'degF', 241.483],
    [temperature, '−25', 'degC', 248.15],
    [temperature, '68 °F', undefined, 293.15],
    [length, "8'", undefined, 2.4384],
    [length, `8'-6"`, 'ft', 2.5908],
    [length, '8,5 ft', undefined, 2.5908],
    [load, '3.5 MBH', undefined, 1025.75],
    [load, '1 ton', undefined, 3516.85],
  ] as const)('reads %# %s', (reader, cell, unit, si) => {
    expect(reader.read(cell, surroundings(unit))).toEqual({ ok: true, value: expect.closeTo(si, 2) });
  });

  it('asks about a comma that could group thousands, except in a file delimited by commas', () => {
    expect(load.read('12,400', surroundings('W'))).toMatchObject({
      reason: { code: 'twoWaysToRead', params: { text: '12,400' } },
    });
    expect(load.read('12,400', surroundings('W', false))).toEqual({ ok: true, value: 12400 });
  });

  it.each(['', 'abc', '12abc34', '1 2', '--4', '1e3', '∞', '0x10', '٣'])(
    'refuses %j without throwing',
    (cell) => {
      expect(length.read(cell, surroundings('ft'))).toMatchObject({
        ok: false,
        reason: { code: expect.any(String) },
      });
    },
  );

  it('says that the unit is missing where neither heading nor cell has one', () => {
    expect(length.read('8', surroundings())).toEqual({
      ok: false,
      reason: { code: 'missingUnit', params: { units: ['ft', 'm'] } },
    });
  });
});

describe('readFeetAndInches', () => {
  it.each([
    [`8'`, 8],
    [`8'-6"`, 8.5],
    [`8’ 6”`, 8.5],
    [`8' 4 1/2"`, 8.375],
  ])('reads %s', (text, feet) => {
    expect(readFeetAndInches(text)).toBeCloseTo(feet, 9);
  });

  it.each([`8'-12"`, `8' 4 1/0"`, `-8'`, `6"`, '8'])('leaves %s alone', (text) => {
    expect(readFeetAndInches(text)).toBeUndefined();
  });
});
