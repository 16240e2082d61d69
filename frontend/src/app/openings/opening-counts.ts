import type { CircuitCounts } from '#shared/contracts/openings';
import { shrinkToJoints, STATES_IN_ORDER, type StateCount } from '../ui/copper-line/line-summary';
import type { LineJoint } from '../ui/copper-line/copper-line';

const MOST_JOINTS = 24;

/** The states of an opening's circuits that occur, finished ones first. */
export function stateCounts(counts: CircuitCounts): readonly StateCount[] {
  return STATES_IN_ORDER.flatMap((state) =>
    state === 'noSequence' || counts[state] === 0 ? [] : [{ state, count: counts[state] }],
  );
}

/** How many circuits an opening has. */
export function circuitTotal(counts: CircuitCounts): number {
  return counts.open + counts.underWay + counts.submitted + counts.sentBack + counts.approved;
}

/** An opening's counts as a short copper line; each joint stands for the same share of its circuits. */
export function lineOfCounts(counts: CircuitCounts): readonly LineJoint[] {
  return shrinkToJoints(stateCounts(counts), MOST_JOINTS).map((state) => ({ label: '', state }));
}
