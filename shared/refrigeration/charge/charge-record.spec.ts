import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from '../../units/convert';
import { kilogram } from '../../units/quantity';
import {
  recordCharge,
  type ChargeRecord,
  type CylinderMovement,
  type MovementRefusal,
} from './charge-record';

type Answer = Extract<ChargeRecord, { ok: true }>;

const movement = (
  cylinderId: string,
  direction: 'in' | 'out',
  beforeKg: number,
  afterKg: number,
  refrigerant = 'R-448A',
): CylinderMovement => ({
  cylinderId,
  refrigerant,
  direction,
  before: kilogram(beforeKg),
  after: kilogram(afterKg),
});

function record(movements: readonly CylinderMovement[], scaleRoomKg?: number): Answer {
  const scaleRoom = scaleRoomKg === undefined ? {} : { scaleRoom: kilogram(scaleRoomKg) };
  const result = recordCharge({ refrigerant: 'R-448A', movements, ...scaleRoom });
  if (!result.ok) throw new Error(JSON.stringify(result));
  return result;
}

describe('recordCharge', () => {
  // Additions and subtractions, worked by hand.
  it('adds up what went in and what came out, by cylinder', () => {
    const result = record([
      movement('A-1', 'in', 60, 15),
      movement('B-2', 'in', 58, 40),
      movement('R-9', 'out', 20, 23),
      movement('b-2 ', 'in', 40, 35),
    ]);
    expect(result).toMatchObject({ in: 68, out: 3, net: 65, doubts: [] });
    expect(result.cylinders).toEqual([
      { cylinderId: 'A-1', in: 45, out: 0 },
      { cylinderId: 'B-2', in: 23, out: 0 },
      { cylinderId: 'R-9', in: 0, out: 3 },
    ]);
  });

  it('is negative when more came out, and zero without movements', () => {
    expect(record([movement('R-9', 'out', 20, 31)]).net).toBe(-11);
    expect(record([])).toMatchObject({ net: 0, cylinders: [], doubts: [] });
  });

  it('takes one refrigerant by any of its names', () => {
    expect(record([movement('A-1', 'in', 60, 15, 'r448a')]).net).toBe(45);
  });

  it('doubts a cylinder that comes back with another mass', () => {
    const again = (beforeKg: number): Answer =>
      record([movement('A-1', 'in', 60, 40), movement('a-1', 'in', beforeKg, 30)]);
    expect(again(40).doubts).toEqual([]);
    expect(again(40.1).doubts).toEqual([]);
    expect(again(45).doubts).toEqual([{ index: 1, kind: 'massDoesNotFollow', difference: 5 }]);
    expect(again(38).doubts).toEqual([{ index: 1, kind: 'massDoesNotFollow', difference: -2 }]);
    expect(again(45).net).toBe(35);
  });

  it('takes the room for the scale from its caller', () => {
    const twice = [movement('A-1', 'in', 60, 40), movement('A-1', 'in', 40.4, 30)];
    expect(record(twice, 0.5).doubts).toEqual([]);
    expect(record(twice, 0.3).doubts).toHaveLength(1);
    const negative = recordCharge({ refrigerant: 'R-448A', movements: twice, scaleRoom: kilogram(-1) });
    expect(negative).toMatchObject({ ok: false, reason: 'scaleRoomNotAMass' });
  });

  it('doubts a cylinder from which nothing moved', () => {
    expect(record([movement('A-1', 'in', 60, 60)]).doubts).toEqual([
      { index: 0, kind: 'nothingMoved', difference: 0 },
    ]);
  });

  const refused: readonly (readonly [MovementRefusal, CylinderMovement])[] = [
    ['wrongWay', movement('A-1', 'in', 15, 60)],
    ['wrongWay', movement('A-1', 'out', 60, 15)],
    ['negativeMass', movement('A-1', 'in', 15, -1)],
    ['negativeMass', movement('A-1', 'out', -2, -1)],
    ['notFinite', movement('A-1', 'in', NaN, 15)],
    ['notFinite', movement('A-1', 'in', Infinity, 15)],
    ['otherRefrigerant', movement('A-1', 'in', 60, 15, 'R-449A')],
    ['otherRefrigerant', movement('A-1', 'in', 60, 15, 'unheard of')],
    ['noCylinderId', movement('  ', 'in', 60, 15)],
  ];
  it.each(refused)('refuses: %s (case %#)', (reason, bad) => {
    const movements = [movement('C-3', 'in', 60, 15), bad];
    expect(recordCharge({ refrigerant: 'R-448A', movements })).toEqual({
      ok: false,
      reason: 'movementRefused',
      refusals: [{ index: 1, reason }],
    });
  });

  it('names every refused movement', () => {
    const movements = [movement('', 'in', 60, 15), movement('A', 'in', 60, 15), movement('A', 'in', 1, 2)];
    expect(recordCharge({ refrigerant: 'R-448A', movements })).toMatchObject({
      refusals: [
        { index: 0, reason: 'noCylinderId' },
        { index: 2, reason: 'wrongWay' },
      ],
    });
  });

  it('shows its working with the sign of each movement, the net last', () => {
    const { working } = record([movement('A-1', 'in', 60, 15), movement('R-9', 'out', 20, 23)]);
    expect(working.lines.map(({ label, value }) => [label, value])).toEqual([
      ['movement1', 45],
      ['movement2', -3],
      ['massIn', 45],
      ['massOut', 3],
      ['massNet', 42],
    ]);
  });

  const movements = fc.array(
    fc
      .tuple(
        fc.constantFrom('A', 'B', 'C', 'D'),
        fc.constantFrom('in' as const, 'out' as const),
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
      )
      .map(([cylinder, direction, a, b]) =>
        direction === 'in'
          ? movement(cylinder, direction, Math.max(a, b), Math.min(a, b))
          : movement(cylinder, direction, Math.min(a, b), Math.max(a, b)),
      ),
    { maxLength: 12 },
  );

  it('has the same net in any order, and as the sum of its cylinders', () => {
    fc.assert(
      fc.property(movements, (list) => {
        const result = record(list);
        const sum = result.cylinders.reduce((net, cylinder) => net + cylinder.in - cylinder.out, 0);
        expect(record([...list].reverse()).net).toBeCloseTo(result.net, 9);
        expect(sum).toBeCloseTo(result.net, 9);
      }),
    );
  });

  it('weighs the same in pounds', () => {
    fc.assert(
      fc.property(movements, (list) => {
        const inPounds = list.map(({ before, after, ...rest }) => ({
          ...rest,
          before: kilogram(toSi(before, 'lb')),
          after: kilogram(toSi(after, 'lb')),
        }));
        expect(record(inPounds).net).toBeCloseTo(toSi(record(list).net, 'lb'), 9);
      }),
    );
  });
});
