import { DAY_S, lasts, secondsApart, type Span } from '../refrigeration/defrost/day-circle';
import type { DefrostBreach } from '../refrigeration/defrost/defrost-breach';
import type { DefrostPlan, QuietHours } from '../refrigeration/defrost/defrost-plan-types';
import { quietSpan } from '../refrigeration/defrost/defrost-spans';
import { startsOf } from '../refrigeration/defrost/defrosts-of-plan';
import type { PlannedCircuit } from './defrost-plans';

// What a chart of 24 hours draws, the same on the screen and in the package. All times are seconds of the day.

/** A piece of the day that doesn't pass midnight; `toS` is up to 86 400. */
export interface DayPiece {
  readonly fromS: number;
  readonly toS: number;
}

/**
 * A span of the day as what a chart from midnight to midnight can draw.
 *
 * @param span seconds; one that passes midnight is cut there
 * @returns one piece or two, in the order in which they happen; none for a span without length
 * @example piecesOf({ startS: 85_800, lengthS: 1200 }) // [{ 85_800 to 86_400 }, { 0 to 600 }]
 */
export function piecesOf({ startS, lengthS }: Span): readonly DayPiece[] {
  if (!(lengthS > 0)) return [];
  if (lengthS >= DAY_S) return [{ fromS: 0, toS: DAY_S }];
  const fromS = ((startS % DAY_S) + DAY_S) % DAY_S;
  const endS = fromS + lengthS;
  if (endS <= DAY_S) return [{ fromS, toS: endS }];
  return [
    { fromS, toS: DAY_S },
    { fromS: 0, toS: endS - DAY_S },
  ];
}

/** One defrost on a chart: its own pieces and those of its drip. */
export interface DefrostBar {
  readonly startS: number;
  readonly defrost: readonly DayPiece[];
  readonly drip: readonly DayPiece[];
}

/**
 * The bars of one circuit.
 *
 * @param circuit times in seconds
 * @param plan seconds of the day
 * @returns one bar a start, in order
 * @example barsOf({ …, durationS: 1800, dripS: 300 }, plan)
 */
export const barsOf = (circuit: PlannedCircuit, plan: DefrostPlan): readonly DefrostBar[] =>
  startsOf(plan, circuit.id).map((startS) => ({
    startS,
    defrost: piecesOf({ startS, lengthS: circuit.durationS }),
    drip: piecesOf({ startS: startS + circuit.durationS, lengthS: circuit.dripS }),
  }));

export const quietPieces = (quietHours: readonly QuietHours[]): readonly DayPiece[] =>
  quietHours.flatMap((quiet) => piecesOf(quietSpan(quiet)));

export interface ChartGroup {
  readonly id: string;
  readonly name: string;
  readonly circuits: readonly PlannedCircuit[];
}

/** The circuits by suction group, in the order in which the groups first appear. */
export function chartGroups(circuits: readonly PlannedCircuit[]): readonly ChartGroup[] {
  const groups = new Map<string, ChartGroup & { circuits: PlannedCircuit[] }>();
  for (const circuit of circuits) {
    const group = groups.get(circuit.groupId) ?? {
      id: circuit.groupId,
      name: circuit.groupName,
      circuits: [],
    };
    group.circuits.push(circuit);
    groups.set(circuit.groupId, group);
  }
  return [...groups.values()];
}

/** Names one start of one circuit. */
export const startKey = (circuitId: string, startS: number): string => `${circuitId} ${startS}`;

/**
 * The starts that a chart marks because a breach is about them.
 *
 * @param breaches of a check
 * @param circuits that were checked
 * @param plan that was checked
 * @returns keys of `startKey`; a breach without a moment marks every start of its circuits
 * @example startsInBreach([{ rule: 'startsPerDay', circuitIds: ['c'], atS: null, … }], circuits, plan)
 */
export function startsInBreach(
  breaches: readonly DefrostBreach[],
  circuits: readonly PlannedCircuit[],
  plan: DefrostPlan,
): ReadonlySet<string> {
  const byId = new Map<string, PlannedCircuit>(circuits.map((circuit) => [circuit.id, circuit]));
  const found = new Set<string>();
  for (const breach of breaches) {
    for (const id of breach.circuitIds) {
      const circuit = byId.get(id);
      if (circuit === undefined) continue;
      for (const startS of startsOf(plan, id))
        if (isAbout(breach, circuit, startS)) found.add(startKey(id, startS));
    }
  }
  return found;
}

function isAbout({ rule, atS, value }: DefrostBreach, circuit: PlannedCircuit, startS: number): boolean {
  if (atS === null) return true;
  // The moment of a gap is its later start; the earlier one may be over by then.
  if (rule === 'gapBetweenStarts') return startS === atS || secondsApart(startS, atS) === value;
  return lasts(startS, circuit.durationS + circuit.dripS, atS);
}
