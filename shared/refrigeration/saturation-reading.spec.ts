import { describe, expect, it } from '@jest/globals';
import { pascalAbsolute } from '../units/quantity';
import { refrigerant } from './readings.fixture';
import { readSaturation, sourceOf } from './saturation-reading';

const TABLE = refrigerant('R-448A');

describe('readSaturation', () => {
  it('gives dew, bubble and the glide between them', () => {
    const reading = readSaturation(TABLE, pascalAbsolute(411589));
    if (!reading.ok) throw new Error(reading.reason);
    expect(reading.dew).toBeCloseTo(267.0, 1);
    expect(reading.bubble).toBeCloseTo(260.8, 1);
    expect(reading.glide).toBe(reading.dew - reading.bubble);
  });

  it('gives no glide for a single component', () => {
    const reading = readSaturation(refrigerant('R-290'), pascalAbsolute(411589));
    expect(reading.ok && reading.glide).toBe(0);
  });

  it('gives nothing when only one of the two is inside the table', () => {
    const [coldestDew = NaN] = TABLE.dewPa;
    const between = pascalAbsolute(coldestDew * 1.1);
    expect(readSaturation(TABLE, between)).toEqual({ ok: false, reason: 'belowTable' });
    expect(readSaturation(TABLE, pascalAbsolute(coldestDew * 0.9))).toEqual({
      ok: false,
      reason: 'belowTable',
    });
  });
});

describe('sourceOf', () => {
  it('names refrigerant, program and equations', () => {
    expect(sourceOf(refrigerant('R-744'))).toBe(
      'R-744: CoolProp 8.0.0 (HEOS); R. Span & W. Wagner, J. Phys. Chem. Ref. Data 25, 1509 (1996)',
    );
  });
});
