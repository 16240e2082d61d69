import { describe, expect, it } from '@jest/globals';
import { headingQuantity, headingUnit } from './heading-unit';

describe('headingUnit', () => {
  it.each([
    ['Pressure (psig)', 'psig'],
    ['Suction PSI(g)', 'psig'],
    ['psig', 'psig'],
    ['Temp [°F]', 'degF'],
    ['Temp (\uFFFDC)', 'degC'],
    ['T °C', 'degC'],
    ['T1_C', 'degC'],
    ['Temperatura (K)', 'K'],
    ['Air in, deg F', null],
    ['Temp, deg F', 'degF'],
    ['Superheat (°F)', 'degF_diff'],
    ['Sobrecalentamiento K', 'K_diff'],
    ['dT (°C)', 'degC_diff'],
    ['Pressure (bar)', 'barg'],
    ['Abs. pressure (kPa)', 'kPaa'],
    ['Suction bar', 'barg'],
    ['Time (s)', 's'],
    ['Tiempo (seg)', 's'],
    ['Elapsed min', 'min'],
    ['Temp (probe 2) (°F)', 'degF'],
    ['Temp, °F (probe 2)', 'degF'],
    // Words that would be units elsewhere.
    ['Case A', null],
    ['Probe C', null],
    ['Temp min', null],
    ['Air in', null],
    ['#', null],
    ['', null],
  ])('finds in %j %s', (heading, unit) => {
    expect(headingUnit(heading)).toBe(unit);
  });
});

describe('headingQuantity', () => {
  it.each([
    ['Suction Pressure', 'pressure'],
    ['Presión de succión', 'pressure'],
    ['Line_Temp', 'temperature'],
    ['Temperatura de línea', 'temperature'],
    ['T2 (°C)', 'temperature'],
    ['Super-heat', 'superheat'],
    ['Recalentamiento', 'superheat'],
    ['Superheat temperature', 'superheat'],
    ['Fecha y hora', 'time'],
    ['Timestamp', 'time'],
    ['Date/Time', 'time'],
    ['Compressor amps', null],
    ['Humidity (%)', null],
  ])('takes %j for %s', (heading, quantity) => {
    expect(headingQuantity(heading)).toBe(quantity);
  });
});
