import { describe, expect, it } from '@jest/globals';
import { parseUnit } from './parse-unit';
import { UNITS, type UnitId } from './unit';

const UNIT_IDS = Object.keys(UNITS) as UnitId[];

describe('parseUnit', () => {
  it.each([
    ['°F', 'degF'],
    ['F', 'degF'],
    ['deg F', 'degF'],
    ['Deg. F', 'degF'],
    ['degF', 'degF'],
    ['ºF', 'degF'],
    ['(°F)', 'degF'],
    ['°C', 'degC'],
    ['K', 'K'],
    ['Δ°F', 'degF_diff'],
    ['BTUH', 'BTU_h'],
    ['BTU/h', 'BTU_h'],
    ['Btu/hr', 'BTU_h'],
    ['MBH', 'MBH'],
    ['tons', 'ton'],
    ['ft', 'ft'],
    ['feet', 'ft'],
    ['Ft.', 'ft'],
    ["'", 'ft'],
    ['′', 'ft'],
    ['in.', 'in'],
    ['"', 'in'],
    ['m', 'm'],
    ['sq. ft.', 'ft2'],
    ['ft²', 'ft2'],
    ['psig', 'psig'],
    ['psi', 'psig'],
    ['PSI(g)', 'psig'],
    ['psia', 'psia'],
    ['bar', 'barg'],
    ['bar(a)', 'bara'],
    ['kPa', 'kPag'],
    ['in. Hg', 'inHg'],
    ['microns', 'micron'],
    ['μm Hg', 'micron'],
    ['W', 'W'],
    ['kW', 'kW'],
    ['min.', 'min'],
    ['hrs', 'h'],
    ['lbs', 'lb'],
    ['kg', 'kg'],
    ['Amps', 'A'],
    ['volts', 'V'],
    ['%', 'percent'],
  ])('reads %j as %s', (text, unit) => {
    expect(parseUnit(text)).toBe(unit);
  });

  it.each([
    ['°F', 'temperatureDifference', 'degF_diff'],
    ['K', 'temperatureDifference', 'K_diff'],
    ['psi', 'absolutePressure', 'psia'],
    ['bar', 'absolutePressure', 'bara'],
    ['kPa', 'absolutePressure', 'kPaa'],
    ['W', 'power', 'W_el'],
    ['kW', 'power', 'kW_el'],
  ] as const)('reads %j where a %s is wanted as %s', (text, dimension, unit) => {
    expect(parseUnit(text, dimension)).toBe(unit);
  });

  it.each(['', '   ', 'furlong', 'constructor', '__proto__', '20 °F'])('finds no unit in %j', (text) => {
    expect(parseUnit(text)).toBeUndefined();
  });

  it('finds no unit of another dimension', () => {
    expect(parseUnit('psig', 'absolutePressure')).toBeUndefined();
    expect(parseUnit('°F', 'length')).toBeUndefined();
  });

  it.each(UNIT_IDS)('reads the id %s as itself', (unit) => {
    expect(parseUnit(unit)).toBe(unit);
  });

  it.each(UNIT_IDS.filter((unit) => UNITS[unit].symbol !== ''))('reads the symbol of %s back', (unit) => {
    expect(parseUnit(UNITS[unit].symbol, UNITS[unit].dimension)).toBe(unit);
  });
});
