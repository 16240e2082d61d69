import { kilogram, type Kilogram } from '../../units/quantity';
import { findRefrigerant } from '../saturation/refrigerants';
import type { Working, WorkingLine } from '../working';

/** One time that a cylinder stood on the scale: what it weighed before and after refrigerant moved. */
export interface CylinderMovement {
  readonly cylinderId: string;
  /** As on the cylinder's label. */
  readonly refrigerant: string;
  /** Seen from the system: `in` charges it, `out` takes refrigerant from it. */
  readonly direction: 'in' | 'out';
  readonly before: Kilogram;
  readonly after: Kilogram;
}

/**
 * Why a movement can't be counted, as a key that screens translate. `wrongWay`: a cylinder that charges got heavier, or
 * one that recovers got lighter.
 */
export type MovementRefusal = 'noCylinderId' | 'notFinite' | 'negativeMass' | 'otherRefrigerant' | 'wrongWay';

/** `massDoesNotFollow`: the cylinder comes back with another mass than it left with. `nothingMoved`: both are equal. */
export type MovementDoubtKind = 'massDoesNotFollow' | 'nothingMoved';

export interface MovementDoubt {
  /** Of the movement, counted from zero. */
  readonly index: number;
  readonly kind: MovementDoubtKind;
  /** Before, less what the cylinder last weighed; zero when nothing moved. */
  readonly difference: Kilogram;
}

export interface CylinderTotal {
  /** As first written. */
  readonly cylinderId: string;
  readonly in: Kilogram;
  readonly out: Kilogram;
}

export interface ChargeInputs {
  /** What the system is to hold. */
  readonly refrigerant: string;
  /** In the order in which they happened. */
  readonly movements: readonly CylinderMovement[];
  /** How far a cylinder may be from its last mass; `DEFAULT_SCALE_ROOM` when left out. */
  readonly scaleRoom?: Kilogram;
}

export type ChargeRecord =
  | {
      readonly ok: true;
      /** In minus out; negative when more came out. */
      readonly net: Kilogram;
      readonly in: Kilogram;
      readonly out: Kilogram;
      /** One for each cylinder, in order of first use. */
      readonly cylinders: readonly CylinderTotal[];
      readonly doubts: readonly MovementDoubt[];
      readonly working: Working;
    }
  | {
      readonly ok: false;
      readonly reason: 'movementRefused' | 'scaleRoomNotAMass';
      /** Every movement that can't be counted, with its place counted from zero. */
      readonly refusals: readonly { readonly index: number; readonly reason: MovementRefusal }[];
    };

/** What a hose left on the valve or a moved scale makes: common practice, no source. */
export const DEFAULT_SCALE_ROOM = kilogram(0.1);

/** Floating-point noise of a conversion from pounds. */
const NOISE_KG = 1e-9;

const cylinderKey = (cylinderId: string): string => cylinderId.trim().toUpperCase();

const refrigerantKey = (name: string): string =>
  findRefrigerant(name)?.designation ?? name.trim().toUpperCase();

function refusalOf(movement: CylinderMovement, refrigerant: string): MovementRefusal | null {
  const { cylinderId, direction, before, after } = movement;
  if (cylinderKey(cylinderId) === '') return 'noCylinderId';
  if (!Number.isFinite(before) || !Number.isFinite(after)) return 'notFinite';
  if (before < 0 || after < 0) return 'negativeMass';
  if (refrigerantKey(movement.refrigerant) !== refrigerantKey(refrigerant)) return 'otherRefrigerant';
  const gained = after - before;
  return (direction === 'in' ? gained > NOISE_KG : gained < -NOISE_KG) ? 'wrongWay' : null;
}

const movedKg = ({ direction, before, after }: CylinderMovement): number =>
  direction === 'in' ? before - after : after - before;

const massMoved = (movements: readonly CylinderMovement[], direction: 'in' | 'out'): Kilogram =>
  kilogram(
    movements
      .filter((movement) => movement.direction === direction)
      .reduce((sum, movement) => sum + movedKg(movement), 0),
  );

function cylindersOf(movements: readonly CylinderMovement[]): readonly CylinderTotal[] {
  const byCylinder = new Map<string, CylinderMovement[]>();
  for (const movement of movements) {
    const key = cylinderKey(movement.cylinderId);
    byCylinder.set(key, [...(byCylinder.get(key) ?? []), movement]);
  }
  return [...byCylinder.values()].map((own) => ({
    cylinderId: own[0]?.cylinderId.trim() ?? '',
    in: massMoved(own, 'in'),
    out: massMoved(own, 'out'),
  }));
}

function doubtsOf(movements: readonly CylinderMovement[], scaleRoom: Kilogram): readonly MovementDoubt[] {
  const lastMassKg = new Map<string, number>();
  return movements.flatMap((movement, index) => {
    const key = cylinderKey(movement.cylinderId);
    const difference = kilogram(movement.before - (lastMassKg.get(key) ?? movement.before));
    lastMassKg.set(key, movement.after);
    const doubts: MovementDoubt[] = [];
    if (Math.abs(difference) > scaleRoom + NOISE_KG)
      doubts.push({ index, kind: 'massDoesNotFollow', difference });
    if (Math.abs(movedKg(movement)) <= NOISE_KG)
      doubts.push({ index, kind: 'nothingMoved', difference: kilogram(0) });
    return doubts;
  });
}

function workingOf(movements: readonly CylinderMovement[], into: Kilogram, out: Kilogram): Working {
  return {
    formula: 'chargeByWeight',
    source: 'scale readings before and after each movement',
    lines: [
      ...movements.map((movement, index): WorkingLine => {
        const sign = movement.direction === 'in' ? 1 : -1;
        return { label: `movement${index + 1}`, value: sign * movedKg(movement), unit: 'kg' };
      }),
      { label: 'massIn', value: into, unit: 'kg' },
      { label: 'massOut', value: out, unit: 'kg' },
      { label: 'massNet', value: kilogram(into - out), unit: 'kg' },
    ],
  };
}

/**
 * What a system holds, by the scale: every cylinder's mass before and after, added up.
 *
 * @param inputs masses in kilograms
 * @returns net, in and out, by cylinder, with doubts that a person may overrule and the working; or every movement that
 *   can't be counted. Nothing moved at all is a net of zero
 * @source weighing; that refrigerant is weighed in and out is common practice and the base of every later leak rate
 * @example recordCharge({ refrigerant: 'R-448A', movements: [{ cylinder A, in, 60 kg, 15 kg }] }) // net 45 kg
 */
export function recordCharge(inputs: ChargeInputs): ChargeRecord {
  const { refrigerant, movements, scaleRoom = DEFAULT_SCALE_ROOM } = inputs;
  if (!(scaleRoom >= 0 && Number.isFinite(scaleRoom)))
    return { ok: false, reason: 'scaleRoomNotAMass', refusals: [] };
  const refusals = movements.flatMap((movement, index) => {
    const reason = refusalOf(movement, refrigerant);
    return reason === null ? [] : [{ index, reason }];
  });
  if (refusals.length > 0) return { ok: false, reason: 'movementRefused', refusals };
  const into = massMoved(movements, 'in');
  const out = massMoved(movements, 'out');
  return {
    ok: true,
    net: kilogram(into - out),
    in: into,
    out,
    cylinders: cylindersOf(movements),
    doubts: doubtsOf(movements, scaleRoom),
    working: workingOf(movements, into, out),
  };
}
