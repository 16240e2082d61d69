import type { CircuitStarts } from './defrost-plan-types';
import { fits, place, type Candidate, type Placeable } from './plan-occupancy';

/** Which candidate is tried first: what leaves the flattest day, most room for other starts, or simply the earliest. */
export type Order = 'flattest' | 'roomiest' | 'earliest';

/** A search under way. Mutable for speed, and never seen outside `searchPlan`. */
export interface Search {
  readonly circuits: readonly Placeable[];
  /** Candidates of each circuit; the first `sizes[c]` of them still go with what is placed. */
  readonly candidates: readonly (readonly Candidate[])[];
  readonly live: readonly Int32Array[];
  readonly sizes: Int32Array;
  readonly placed: Int8Array;
  readonly chosen: (Candidate | undefined)[];
  /** How often a circuit ran out of candidates: those come first the next time. */
  readonly trouble: Float64Array;
  order: Order;
  /** Moments that may still be looked at once there was a first dead end; the way down to it is free. */
  budget: number;
  hasDeadEnd: boolean;
  /** Moments looked at in all attempts, the free ones too. */
  spent: number;
}

/**
 * A search with nothing placed, each circuit with the candidates that it could have if it were alone.
 *
 * @param circuits nothing placed yet
 * @returns its state, which the functions below change
 * @example newSearch(placeables(circuits, rules))
 */
export function newSearch(circuits: readonly Placeable[]): Search {
  const candidates = circuits.map((circuit) => circuit.candidates);
  const live = circuits.map((circuit) =>
    Int32Array.from(
      circuit.candidates.flatMap((candidate, index) => (fits(circuit, candidate) ? [index] : [])),
    ),
  );
  return {
    circuits,
    candidates,
    live,
    sizes: Int32Array.from(live, ({ length }) => length),
    placed: new Int8Array(circuits.length),
    chosen: circuits.map(() => undefined),
    trouble: new Float64Array(circuits.length).fill(1),
    order: 'flattest',
    budget: 0,
    hasDeadEnd: false,
    spent: 0,
  };
}

/**
 * Takes moments off the budget, once there was a dead end.
 *
 * @param search its state changes
 * @param moments how many were looked at
 * @returns nothing
 * @example spend(search, 12)
 */
export function spend(search: Search, moments: number): void {
  search.spent += moments;
  if (search.hasDeadEnd) search.budget -= moments;
}

/**
 * Places one of a circuit's candidates.
 *
 * @param search its state changes
 * @param index of the circuit, not placed yet
 * @param candidate one of its own
 * @returns nothing
 * @example put(search, 0, candidate)
 */
export function put(search: Search, index: number, candidate: Candidate): void {
  const circuit = search.circuits[index];
  if (circuit !== undefined) place(circuit, candidate, 1);
  search.placed[index] = 1;
  search.chosen[index] = candidate;
}

/**
 * Takes a circuit's candidate away again, if it has one.
 *
 * @param search its state changes
 * @param index of the circuit
 * @returns nothing
 * @example takeAway(search, 0)
 */
export function takeAway(search: Search, index: number): void {
  const circuit = search.circuits[index];
  const candidate = search.chosen[index];
  if (circuit !== undefined && candidate !== undefined) place(circuit, candidate, -1);
  search.placed[index] = 0;
  search.chosen[index] = undefined;
}

/**
 * Takes everything away and gives every circuit its candidates back. What was learnt about trouble stays.
 *
 * @param search its state changes
 * @returns nothing
 * @example takeAllAway(search)
 */
export function takeAllAway(search: Search): void {
  search.circuits.forEach((_, index) => takeAway(search, index));
  search.live.forEach((live, index) => (search.sizes[index] = live.length));
}

/**
 * What is placed, as starts.
 *
 * @param search with every circuit placed
 * @returns the starts of each circuit, in their order
 * @example planOf(search)
 */
export const planOf = ({ circuits, chosen }: Search): readonly CircuitStarts[] =>
  circuits.map(({ circuit }, index) => ({ circuitId: circuit.id, startsS: chosen[index]?.startsS ?? [] }));
