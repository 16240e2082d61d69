import { DAY_S } from './day-circle';
import { circuitBreaches } from './check-circuit-starts';
import { apartBreaches, gapBreaches, groupFindings, heaterBreaches } from './check-defrosts-together';
import type { DefrostBreach, DefrostFindings, DefrostNote } from './defrost-breach';
import { defrostInputProblems, type DefrostInputProblem } from './defrost-input-problems';
import type { DefrostCircuit, DefrostPlan, DefrostRules } from './defrost-plan-types';
import { defrostsOfPlan, lastingAt, type PlannedDefrost } from './defrosts-of-plan';
import { groupWeights } from './group-weights';

export type DefrostCheck =
  | ({ readonly ok: true } & DefrostFindings)
  | { readonly ok: false; readonly problems: readonly DefrostInputProblem[] };

/**
 * Checks a day's defrosts against the rules. The day is a circle; a defrost takes its fail-safe time and its drip, its
 * heaters the fail-safe time alone. A circuit that is by itself more than the share of load (or of hot-gas circuits) is
 * allowed as long as it is alone, since otherwise no small group could ever defrost; that comes back as a note. The
 * running load that hot gas needs and the heater limit know no such leave. Where a load is missing, the circuits of its group
 * weigh the same (a note says so).
 *
 * @param circuits times in seconds, powers in watts
 * @param rules times in seconds, powers in watts, shares as fractions
 * @param plan seconds of the day; several entries for one circuit count together
 * @returns breaches and notes, or the figures that nothing can be checked with. No breach means the plan stands
 * @range see `defrostInputProblems`
 * @source common practice, no source: nobody has published figures for staggering defrosts
 * @example checkDefrostPlan([circuit], rules, []) // startsPerDay
 */
export function checkDefrostPlan(
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
  plan: DefrostPlan,
): DefrostCheck {
  const problems = defrostInputProblems(circuits, rules);
  if (problems.length > 0) return { ok: false, problems };
  const defrosts = defrostsOfPlan(circuits, plan);
  const together = togetherFindings(defrosts, rules);
  const breaches = [
    ...planBreaches(circuits, plan),
    ...circuits.flatMap((circuit) => circuitBreaches(circuit, rules, plan)),
    ...together.breaches,
  ];
  return { ok: true, breaches, notes: [...countNotes(circuits), ...onceEach(together.notes)] };
}

function planBreaches(circuits: readonly DefrostCircuit[], plan: DefrostPlan): readonly DefrostBreach[] {
  const known = new Set(circuits.map(({ id }) => id));
  return plan.flatMap(({ circuitId, startsS }) => {
    const circuitIds = [circuitId];
    const found: DefrostBreach[] = [];
    if (!known.has(circuitId))
      found.push({ rule: 'unknownCircuit', circuitIds, atS: null, value: null, limit: null });
    for (const startS of startsS) {
      if (startS >= 0 && startS < DAY_S) continue;
      const value = Number.isFinite(startS) ? startS : null;
      found.push({ rule: 'startOutsideDay', circuitIds, atS: value, value, limit: DAY_S });
    }
    return found;
  });
}

function togetherFindings(defrosts: readonly PlannedDefrost[], rules: DefrostRules): DefrostFindings {
  const breaches: DefrostBreach[] = [];
  const notes: DefrostNote[] = [];
  for (const group of byGroup(defrosts)) {
    breaches.push(...gapBreaches(group, rules.leastGapBetweenStartsS));
    for (const atS of momentsOf(group)) {
      const found = groupFindings(lastingAt(group, atS), rules, atS);
      breaches.push(...found.breaches);
      notes.push(...found.notes);
    }
  }
  for (const defrost of defrosts) breaches.push(...apartBreaches(defrost, defrosts));
  const limitW = rules.largestHeaterDemandW;
  if (limitW !== null)
    for (const atS of momentsOf(defrosts)) breaches.push(...heaterBreaches(defrosts, limitW, atS));
  return { breaches, notes };
}

const momentsOf = (defrosts: readonly PlannedDefrost[]): ReadonlySet<number> =>
  new Set(defrosts.map(({ startS }) => startS));

function byGroup(defrosts: readonly PlannedDefrost[]): readonly (readonly PlannedDefrost[])[] {
  const groups = new Set(defrosts.map(({ group }) => group));
  return [...groups].map((wanted) => defrosts.filter(({ group }) => group === wanted));
}

/** A circuit that is over the share on its own is so at each of its defrosts; once is enough to know. */
const onceEach = (notes: readonly DefrostNote[]): readonly DefrostNote[] =>
  [
    ...new Map(
      notes.map((note) => [`${note.note} ${note.circuitIds.join(' ')}`, note] as const).reverse(),
    ).values(),
  ].reverse();

const countNotes = (circuits: readonly DefrostCircuit[]): readonly DefrostNote[] =>
  groupWeights(circuits)
    .filter(({ by, circuits: members }) => by === 'count' && members.some(({ type }) => type !== 'none'))
    .map(({ unknownIds }) => ({
      note: 'judgedByCount',
      circuitIds: unknownIds,
      atS: null,
      value: null,
      limit: null,
    }));
