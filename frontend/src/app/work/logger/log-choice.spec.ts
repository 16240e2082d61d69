import { describe, expect, it } from '@jest/globals';
import { readLogger } from '#shared/refrigeration/logger/read-logger';
import { columnOptions, firstChoices, pickedLog, type WantedColumn } from './log-choice';

function readingOf(headings: string) {
  const log = readLogger(`Time (s),${headings}\n0,32,32,32\n10,50,,50`);
  if (!log.ok) throw new Error(log.reason);
  return { ok: true as const, file: { name: 'a.csv', sha256: 'a'.repeat(64), rows: log.rows }, log };
}
const AIR: WantedColumn = { key: 'air', label: 'Air', dimension: 'temperature' };
const LINE: WantedColumn = { ...AIR, key: 'line' };
const SUCTION: WantedColumn = { key: 'suction', label: 'Suction', dimension: 'gaugePressure' };

describe('columnOptions', () => {
  it('offers the likely first, then those without a unit, and none of another unit', () => {
    const { log } = readingOf('Ch1,Suction (psig),Box temp (°F)');
    expect(
      columnOptions(log, 'temperature').map(({ column, isLikely }) => [column.heading, isLikely]),
    ).toEqual([
      ['Box temp (°F)', true],
      ['Ch1', false],
    ]);
  });
});

describe('firstChoices', () => {
  it('takes the likeliest for each, never one twice', () => {
    const { log } = readingOf('Line temp (°F),Suction (psig),Box temp (°F)');
    expect(firstChoices(log, [SUCTION, AIR, LINE])).toEqual({
      suction: { index: 1, unit: null },
      air: { index: 0, unit: null },
      line: { index: 2, unit: null },
    });
  });

  it('takes the only one there is, and none of several that nothing speaks for', () => {
    expect(firstChoices(readingOf('Ch1,Suction (psig),Load (A)').log, [AIR])['air']?.index).toBe(0);
    expect(firstChoices(readingOf('Ch1,Ch2,Ch3').log, [AIR])['air']?.index).toBeNull();
  });
});

describe('pickedLog', () => {
  it('gives the columns in SI, with gaps where there was no value', () => {
    const reading = readingOf('Suction (psig),Box temp (°F),Ch3');
    const choices = { suction: { index: 0, unit: null }, air: { index: 1, unit: null } };
    const log = pickedLog(reading, [SUCTION, AIR], choices);
    expect(log).toMatchObject({ file: reading.file, startText: '0' });
    expect([...log!.times]).toEqual([0, 10]);
    expect(log!.columns.map(({ key, heading }) => [key, heading])).toEqual([
      ['suction', 'Suction (psig)'],
      ['air', 'Box temp (°F)'],
    ]);
    // NIST SP 811: 1 psi is 6 894.757 Pa.
    expect(log!.columns[0]!.values[0]).toBeCloseTo(32 * 6894.757, 0);
    expect(log!.columns[1]!.values[0]).toBeCloseTo(273.15, 9);
    expect(log!.columns[1]!.values[1]).toBeNaN();
  });

  it('gives nothing while a column or its unit is not chosen', () => {
    const reading = readingOf('Ch1,Ch2,Ch3');
    expect(pickedLog(reading, [AIR], { air: { index: null, unit: null } })).toBeNull();
    expect(pickedLog(reading, [AIR], { air: { index: 0, unit: null } })).toBeNull();
    expect(pickedLog(reading, [AIR], { air: { index: 0, unit: 'degC' } })?.columns[0]?.values[0]).toBeCloseTo(
      305.15,
      9,
    );
  });
});
