import type { CircuitStarts } from './defrost-plan-types';
import { fits, place, type Candidate, type Placeable } from './plan-occupancy';

/**
 * Places as many circuits as go one after the other, the least flexible first.
 *
 * @param circuits nothing placed yet; nothing stays placed afterwards
 * @returns the starts of those that went; no rule is broken among them
 * @example placeWhatFits(placeables(circuits, rules))
 */
export function placeWhatFits(circuits: readonly Placeable[]): readonly CircuitStarts[] {
  const byChoice = [...circuits].sort((a, b) => a.candidates.length - b.candidates.length);
  const done: { circuit: Placeable; candidate: Candidate }[] = [];
  for (const circuit of byChoice) {
    const candidate = circuit.candidates.find((each) => fits(circuit, each));
    if (candidate === undefined) continue;
    place(circuit, candidate, 1);
    done.push({ circuit, candidate });
  }
  for (const { circuit, candidate } of done) place(circuit, candidate, -1);
  return done.map(({ circuit, candidate }) => ({
    circuitId: circuit.circuit.id,
    startsS: candidate.startsS,
  }));
}
