import {
  POWER_TOLERANCE_W,
  SHARE_TOLERANCE,
  type DefrostCircuit,
  type DefrostRules,
} from './defrost-plan-types';

// Everything is asked at moments: the grid and the hand-set starts. What is in defrost only grows at a start, and every
// start is a moment, so nothing can happen between two of them, and no duration needs to fit the grid.

/** A spreading of one circuit as indexes of moments. */
export interface Candidate {
  readonly startsS: readonly number[];
  readonly isEven: boolean;
  readonly starts: Int32Array;
  /** Moments at which it is in defrost, drip included. */
  readonly lasting: Int32Array;
  readonly heating: Int32Array;
  /** Moments at which no other circuit of the group may start. */
  readonly near: Int32Array;
}

/** What is in defrost in one suction group at each moment. */
export interface GroupTally {
  readonly share: Float64Array;
  readonly loadW: Float64Array;
  readonly count: Int32Array;
  readonly hotGas: Int32Array;
  readonly near: Int32Array;
  readonly mostHotGas: number;
  readonly mostLoadWBesideHotGas: number;
}

/** A circuit to be placed, with all that placing it touches. */
export interface Placeable {
  readonly circuit: DefrostCircuit;
  readonly candidates: readonly Candidate[];
  readonly group: GroupTally;
  readonly share: number;
  readonly loadW: number;
  readonly hotGas: 0 | 1;
  readonly heaterW: number;
  readonly heater: Float64Array;
  /** One tally for its box, one for its air curtain, where it has them. */
  readonly apart: readonly Int32Array[];
  readonly rules: DefrostRules;
}

/**
 * Whether a circuit's spreading goes with all that is placed so far.
 *
 * @param placeable the circuit, not placed itself
 * @param candidate one of its own
 * @returns true when no rule is broken
 * @example fits(placeable, placeable.candidates[0])
 */
export const fits = (placeable: Placeable, candidate: Candidate): boolean =>
  startsFit(placeable, candidate) && groupFits(placeable, candidate) && heatersFit(placeable, candidate);

function startsFit({ group: { near } }: Placeable, { starts }: Candidate): boolean {
  for (const at of starts) if (near[at] !== 0) return false;
  return true;
}

function groupFits(placeable: Placeable, { lasting }: Candidate): boolean {
  const { group, apart, rules, share, hotGas } = placeable;
  const mostShare = rules.largestShareOfLoad + SHARE_TOLERANCE - share;
  for (const at of lasting) {
    for (const tally of apart) if (tally[at] !== 0) return false;
    if (group.count[at] !== 0 && (group.share[at] ?? 0) > mostShare) return false;
    const hotGasThen = (group.hotGas[at] ?? 0) + hotGas;
    if (hotGasThen > 0 && !hotGasFits(placeable, hotGasThen, at)) return false;
  }
  return true;
}

/** Gas for the circuits in hot-gas defrost, whether this one is among them or takes away load that makes their gas. */
function hotGasFits({ group, loadW, share, rules }: Placeable, hotGasThen: number, at: number): boolean {
  if (hotGasThen > group.mostHotGas) return false;
  if ((group.loadW[at] ?? 0) + loadW > group.mostLoadWBesideHotGas) return false;
  const runningShare = 1 - (group.share[at] ?? 0) - share;
  return runningShare >= (rules.leastRunningShareForHotGas ?? -Infinity) - SHARE_TOLERANCE;
}

function heatersFit({ heater, heaterW, rules }: Placeable, { heating }: Candidate): boolean {
  if (rules.largestHeaterDemandW === null || heaterW === 0) return true;
  const most = rules.largestHeaterDemandW - heaterW + POWER_TOLERANCE_W;
  for (const at of heating) if ((heater[at] ?? 0) > most) return false;
  return true;
}

/**
 * Places a circuit, or takes it away again.
 *
 * @param placeable the circuit
 * @param candidate one of its own
 * @param sign 1 to place, −1 to take away
 * @returns nothing; the tallies change
 * @example place(placeable, candidate, 1)
 */
export function place(placeable: Placeable, candidate: Candidate, sign: 1 | -1): void {
  const { group, apart, heater, share, loadW, hotGas, heaterW } = placeable;
  for (const at of candidate.near) add(group.near, at, sign);
  for (const at of candidate.heating) add(heater, at, sign * heaterW);
  for (const at of candidate.lasting) {
    add(group.share, at, sign * share);
    add(group.loadW, at, sign * loadW);
    add(group.count, at, sign);
    add(group.hotGas, at, sign * hotGas);
    for (const tally of apart) add(tally, at, sign);
  }
}

function add(tally: Float64Array | Int32Array, at: number, amount: number): void {
  tally[at] = (tally[at] ?? 0) + amount;
}
