import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, fromSi, toSi } from '../../units/convert';
import { kelvin, pascalAbsolute, second, type Kelvin, type PascalAbsolute } from '../../units/quantity';
import { fahrenheit } from '../readings.fixture';
import { judgeRise, type JudgedRise, type RiseVerdict } from './judge-rise';
import { plateauNotes } from './plateau-notes';
import { PUBLISHED_RISE_CRITERIA, type RiseCriteria } from './rise-criteria';
import type { VacuumReading } from './rise-shape';

type Answer = Extract<JudgedRise, { ok: true }>;

const microns = (value: number): PascalAbsolute => pascalAbsolute(toSi(value, 'micron'));

/** Readings written as minute:microns. */
const readingsOf = (points: string): VacuumReading[] =>
  points.split(' ').map((point) => {
    const [minute, value] = point.split(':').map(Number);
    return { at: second((minute ?? NaN) * 60), pressure: microns(value ?? NaN) };
  });

function criteriaOf(id: string): RiseCriteria {
  const found = PUBLISHED_RISE_CRITERIA.find((published) => published.id === id);
  if (found === undefined) throw new Error(`no criteria ${id}`);
  return found.criteria;
}

function answer(points: string, criteria: RiseCriteria, ambientTemperature?: Kelvin): Answer {
  const result = judgeRise({
    readings: readingsOf(points),
    criteria,
    ...(ambientTemperature === undefined ? {} : { ambientTemperature }),
  });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const FEDERAL = criteriaOf('federalRefrigerantPiping');
const UNITARY = criteriaOf('unitaryMaker');

describe('judgeRise', () => {
  // UFGS 15182: no more than 500 µm one hour after isolation at 300 µm.
  it.each<readonly [string, string, RiseVerdict]>([
    ['300 to 480 in an hour', '0:300 60:480', 'dryAndTight'],
    ['at the limit', '0:300 60:500', 'dryAndTight'],
    ['300 to 620 in an hour, nothing between', '0:300 60:620', 'overLimit'],
    ['300 to 620 steadily', '0:300 20:407 40:513 60:620', 'leak'],
    ['300 to 620, levelling off', '0:300 20:560 40:610 60:620', 'moisture'],
    ['isolated too early', '0:301 60:400', 'notDeepEnough'],
    ['the lunch hour', '0:300 45:400', 'tooShort'],
    ['over the limit early and still rising', '0:300 10:450 20:600 30:750', 'overLimit'],
    ['over the limit early and at rest', '0:300 10:700 20:710 30:710', 'moisture'],
    ['watched longer than asked', '0:300 60:480 120:660', 'dryAndTight'],
    ['watched longer, over the limit between', '0:300 50:480 70:560', 'overLimit'],
  ])('by the federal piping specification: %s', (_, points, verdict) => {
    expect(answer(points, FEDERAL).verdict).toBe(verdict);
  });

  // Installation manual of a maker of unitary heat pumps: after 10 minutes up to 1000 µm tight and dry, 1000 to 2000 µm
  // and steady moisture or gas that doesn't condense, above 2000 µm a leak.
  it.each<readonly [string, string, RiseVerdict]>([
    ['stays at 900', '0:500 5:800 10:900', 'dryAndTight'],
    ['stands at 1000', '0:500 10:1000', 'dryAndTight'],
    ['steady between 1000 and 2000', '0:500 3:1400 7:1500 10:1520', 'moisture'],
    ['rising between 1000 and 2000', '0:500 3:900 7:1400 10:1800', 'leak'],
    ['above 2000, even if steady', '0:500 3:2400 7:2410 10:2410', 'leak'],
    ['above 2000 before the time', '0:500 4:2001', 'leak'],
    ['exactly 2000 is not above', '0:500 10:2000', 'overLimit'],
  ])('by the unitary maker: %s', (_, points, verdict) => {
    expect(answer(points, UNITARY).verdict).toBe(verdict);
  });

  // CALGreen 5.508.2.6 (from memory): drift of no more than 100 µm in 24 hours.
  it.each<readonly [number, RiseVerdict]>([
    [410, 'overLimit'],
    [400, 'dryAndTight'],
  ])('by the drift rule: 300 to %d µm in a day is %s', (end, verdict) => {
    expect(answer(`0:300 1440:${end}`, criteriaOf('californiaGreenCode')).verdict).toBe(verdict);
  });

  it('gives the figures', () => {
    const result = answer('0:300 20:560 40:610 60:620', FEDERAL);
    expect(fromSi(result.endPressure, 'micron')).toBeCloseTo(620, 9);
    expect(fromSi(result.risePa, 'micron')).toBeCloseTo(320, 9);
    expect(result.held).toBe(3600);
    expect(result.shape?.startSlopePaPerS).toBeCloseTo(toSi(260, 'micron') / 1200, 9);
    expect(result.shape?.endSlopePaPerS).toBeCloseTo(toSi(10, 'micron') / 1200, 9);
  });

  it('reads the end of the hold between its neighbours', () => {
    expect(fromSi(answer('0:300 50:480 70:560', FEDERAL).endPressure, 'micron')).toBeCloseTo(520, 9);
  });

  it('notes liquid water that is freezing', () => {
    const result = answer('0:300 20:4400 40:4570 60:4580', FEDERAL, fahrenheit(70));
    expect(result).toMatchObject({ verdict: 'moisture', notes: ['waterFreezing'] });
  });

  it('notes a plateau where water boils at the ambient temperature', () => {
    const points = '0:300 20:18000 40:18700 60:18750';
    expect(answer(points, FEDERAL, fahrenheit(70)).notes).toEqual(['nearWaterSaturation']);
    expect(answer(points, FEDERAL, fahrenheit(40)).notes).toEqual(['aboveWaterSaturation']);
    expect(answer(points, FEDERAL).notes).toEqual([]);
  });

  it('notes nothing about a rise that goes on, or that passes', () => {
    expect(answer('0:300 20:1700 40:3100 60:4580', FEDERAL, fahrenheit(70)).notes).toEqual([]);
    expect(answer('0:300 20:380 40:380 60:380', FEDERAL, fahrenheit(-16)).notes).toEqual([]);
  });

  it('shows its working the rise last', () => {
    const { working } = answer('0:300 20:380 40:400 60:480', FEDERAL, fahrenheit(70));
    expect(working.formula).toBe('vacuumRise');
    const last = working.lines.at(-1);
    expect(last).toMatchObject({ label: 'rise', unit: 'Pa_vac' });
    expect(fromSi(last?.value ?? NaN, 'micron')).toBeCloseTo(180, 9);
    const water = working.lines.find((line) => line.label === 'waterVapourPressure');
    expect(Math.abs(fromSi(water?.value ?? NaN, 'micron') / 18790 - 1)).toBeLessThan(5e-4);
    expect(working.lines.map((line) => line.label)).not.toContain('leakAbove');
  });

  const good = readingsOf('0:300 60:480');
  it.each<readonly [string, Parameters<typeof judgeRise>[0]]>([
    ['tooFewReadings', { readings: good.slice(0, 1), criteria: FEDERAL }],
    ['tooFewReadings', { readings: [], criteria: FEDERAL }],
    [
      'notFinite',
      {
        readings: readingsOf('0:NaN 60:480'),
        criteria: FEDERAL,
      },
    ],
    [
      'notFinite',
      {
        readings: readingsOf('0:300 NaN:480'),
        criteria: FEDERAL,
      },
    ],
    [
      'notAbsolute',
      {
        readings: readingsOf('0:0 60:480'),
        criteria: FEDERAL,
      },
    ],
    [
      'timeNotRising',
      {
        readings: readingsOf('5:300 5:480'),
        criteria: FEDERAL,
      },
    ],
    ['noLimit', { readings: good, criteria: { ...FEDERAL, limit: null } }],
    ['notFinite', { readings: good, criteria: { ...FEDERAL, limit: pascalAbsolute(NaN) } }],
    ['criteriaNotPositive', { readings: good, criteria: { ...FEDERAL, hold: second(0) } }],
    ['ambientOutOfRange', { readings: good, criteria: FEDERAL, ambientTemperature: kelvin(NaN) }],
  ])('refuses: %s (case %#)', (reason, test) => {
    expect(judgeRise(test)).toEqual({ ok: false, reason });
  });

  it('does not depend on when the clock was started, nor on the unit', () => {
    const value = fc.integer({ min: 300, max: 3000 });
    fc.assert(
      fc.property(fc.tuple(value, value, value), fc.integer({ min: 0, max: 1e6 }), ([a, b, c], offsetS) => {
        const readings = readingsOf(`0:300 20:${a} 40:${b} 90:${c}`);
        const moved = readings.map(({ at, pressure }) => ({
          at: second(at + offsetS),
          pressure: pascalAbsolute(toSi(convert(fromSi(pressure, 'micron'), 'micron', 'Torr'), 'Torr')),
        }));
        const one = judgeRise({ readings, criteria: FEDERAL });
        const other = judgeRise({ readings: moved, criteria: FEDERAL });
        expect(one.ok && one.verdict).toBe(other.ok && other.verdict);
        expect(one.ok && one.endPressure).toBeCloseTo(other.ok ? other.endPressure : NaN, 9);
      }),
    );
  });

  it('never passes a higher end pressure where it failed a lower one', () => {
    const value = fc.integer({ min: 300, max: 3000 });
    fc.assert(
      fc.property(value, value, (a, b) => {
        const passes = (end: number): boolean => answer(`0:300 60:${end}`, FEDERAL).verdict === 'dryAndTight';
        if (passes(Math.max(a, b))) expect(passes(Math.min(a, b))).toBe(true);
        expect(passes(a)).toBe(a <= 500);
      }),
    );
  });
});

describe('plateauNotes', () => {
  it.each([
    [4585, 70, ['waterFreezing']],
    [4585, 33, ['waterFreezing', 'nearWaterSaturation']],
    [1000, 70, []],
    [957, 0, ['nearWaterSaturation']],
  ])('at %d µm and %d °F: %j', (plateau, degF, notes) => {
    expect(plateauNotes(microns(plateau), fahrenheit(degF))).toEqual(notes);
  });
});

describe('PUBLISHED_RISE_CRITERIA', () => {
  it('have ids that differ, a source each, and can be judged by', () => {
    const ids = PUBLISHED_RISE_CRITERIA.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const { source, criteria } of PUBLISHED_RISE_CRITERIA) {
      expect(source).not.toBe('');
      const steady = [
        { at: second(0), pressure: criteria.target },
        { at: criteria.hold, pressure: criteria.target },
      ];
      expect(judgeRise({ readings: steady, criteria })).toMatchObject({ ok: true, verdict: 'dryAndTight' });
    }
  });
});
