import type { CircuitStarts } from './defrost-plan-types';
import { fits, type Candidate, type Placeable } from './plan-occupancy';
import {
  newSearch,
  planOf,
  put,
  spend,
  takeAllAway,
  takeAway,
  type Order,
  type Search,
} from './search-state';

export type SearchResult =
  | { readonly found: true; readonly plan: readonly CircuitStarts[] }
  /** `proven` when every combination was ruled out, not merely the time used up. */
  | { readonly found: false; readonly proven: boolean };

// Counted in moments looked at, not in seconds, so that a phone and a server find the same plan.
// Many short attempts find more than a long one: an early unlucky choice is soon given up. The last is long, for proofs.
const ATTEMPTS: readonly { readonly order: Order; readonly budget: number }[] = [
  { order: 'flattest', budget: 400_000 },
  ...Array.from({ length: 6 }, () => [
    { order: 'roomiest' as const, budget: 300_000 },
    { order: 'earliest' as const, budget: 300_000 },
  ]).flat(),
  { order: 'earliest', budget: 1_500_000 },
];

/** Above what all attempts may cost on a store of the usual size; a huge single group stops here. */
const MOST_IN_ALL = 8_000_000;

/**
 * Looks for a candidate of each circuit such that no rule is broken: depth first, the circuit with the fewest candidates
 * left first, striking out the others' candidates after each step. Complete as long as the budget lasts, which it does
 * for the handful of circuits of a small group on a coarse grid.
 *
 * @param circuits nothing placed yet; nothing stays placed afterwards
 * @param effort multiplies the budget
 * @returns the starts, or whether it is proven that there are none among the candidates
 * @source depth-first search with forward checking and conflict-weighted choice of the next variable (common knowledge)
 * @example searchPlan(placeables(circuits, rules))
 */
export function searchPlan(circuits: readonly Placeable[], effort = 1): SearchResult {
  const search = newSearch(circuits);
  if (search.sizes.includes(0)) return { found: false, proven: true };
  for (const { order, budget } of ATTEMPTS) {
    if (search.spent > MOST_IN_ALL * effort) break;
    search.order = order;
    search.budget = budget * effort;
    search.hasDeadEnd = false;
    const outcome = descend(search);
    const plan = outcome === 'found' ? planOf(search) : [];
    takeAllAway(search);
    if (outcome === 'found') return { found: true, plan };
    if (outcome === 'none') return { found: false, proven: true };
  }
  return { found: false, proven: false };
}

function descend(search: Search): 'found' | 'none' | 'spent' {
  const next = hardest(search);
  if (next === undefined) return 'found';
  for (const candidate of inOrder(search, next)) {
    if (search.budget <= 0) return 'spent';
    const sizes = search.sizes.slice();
    put(search, next, candidate);
    if (strikeOut(search, next)) {
      const outcome = descend(search);
      if (outcome !== 'none') return outcome;
    }
    takeAway(search, next);
    search.sizes.set(sizes);
  }
  return 'none';
}

function hardest({ circuits, sizes, placed, trouble }: Search): number | undefined {
  let best: number | undefined;
  let bestScore = Infinity;
  for (let index = 0; index < circuits.length; index++) {
    const score = (sizes[index] ?? 0) / (trouble[index] ?? 1);
    if (placed[index] !== 0 || score >= bestScore) continue;
    best = index;
    bestScore = score;
  }
  return best;
}

function inOrder(search: Search, index: number): readonly Candidate[] {
  const circuit = search.circuits[index];
  const indexes = [...(search.live[index] ?? []).slice(0, search.sizes[index] ?? 0)].sort((a, b) => a - b);
  const candidates = indexes.flatMap((each) => search.candidates[index]?.[each] ?? []);
  if (search.order === 'earliest' || circuit === undefined) return candidates;
  const costOf = search.order === 'flattest' ? crowding : roomTaken;
  const costs = new Map(candidates.map((candidate) => [candidate, costOf(search, circuit, candidate)]));
  const cost = (candidate: Candidate): number => costs.get(candidate) ?? 0;
  // Sorting is stable: of two equal ones the earlier stays first.
  const byEvenness = (a: Candidate, b: Candidate): number => Number(b.isEven) - Number(a.isEven);
  if (search.order === 'flattest') return candidates.sort((a, b) => byEvenness(a, b) || cost(a) - cost(b));
  return candidates.sort((a, b) => cost(a) - cost(b) || byEvenness(a, b));
}

/** What is already in defrost while this one would be: of its group's load, and of all heaters as far as it has any. */
function crowding(search: Search, { group, heater, heaterW }: Placeable, candidate: Candidate): number {
  let sum = 0;
  for (const at of candidate.lasting) sum += group.share[at] ?? 0;
  let heatW = 0;
  for (const at of candidate.heating) heatW += heater[at] ?? 0;
  spend(search, candidate.lasting.length);
  return Math.round(1e6 * (sum + (heaterW > 0 ? heatW / (heaterW * 10) : 0)));
}

/** How many moments this one would take from the starts of the group's other circuits. */
function roomTaken(search: Search, { group }: Placeable, candidate: Candidate): number {
  let taken = 0;
  for (const at of candidate.near) if (group.near[at] === 0) taken++;
  spend(search, candidate.near.length);
  return taken;
}

/** Strikes out what no longer goes with the one just placed; false when a circuit is left with nothing. */
function strikeOut(search: Search, placedIndex: number): boolean {
  const justPlaced = search.circuits[placedIndex];
  for (let index = 0; index < search.circuits.length; index++) {
    const circuit = search.circuits[index];
    if (circuit === undefined || justPlaced === undefined || search.placed[index] !== 0) continue;
    if (!touch(circuit, justPlaced)) continue;
    const live = search.live[index] ?? new Int32Array();
    let size = search.sizes[index] ?? 0;
    for (let at = size - 1; at >= 0; at--) {
      const candidate = search.candidates[index]?.[live[at] ?? 0];
      if (candidate === undefined) continue;
      spend(search, candidate.starts.length + 4);
      if (fits(circuit, candidate)) {
        spend(search, candidate.lasting.length);
        continue;
      }
      size--;
      swap(live, at, size);
    }
    search.sizes[index] = size;
    if (size > 0) continue;
    search.hasDeadEnd = true;
    search.trouble[index] = (search.trouble[index] ?? 1) + 1;
    return false;
  }
  return true;
}

const touch = (a: Placeable, b: Placeable): boolean =>
  a.group === b.group ||
  a.apart.some((tally) => b.apart.includes(tally)) ||
  (a.rules.largestHeaterDemandW !== null && a.heaterW > 0 && b.heaterW > 0);

function swap(values: Int32Array, first: number, second: number): void {
  const kept = values[first] ?? 0;
  values[first] = values[second] ?? 0;
  values[second] = kept;
}
