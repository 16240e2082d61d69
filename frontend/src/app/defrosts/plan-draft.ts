import type { DefrostDetails, DefrostPlanPage, DefrostPlanRequest } from '#shared/contracts/defrost-plans';
import type { CircuitId } from '#shared/plant/ids';
import { DAY_S } from '#shared/refrigeration/defrost/day-circle';
import { USUAL_DEFROST_RULES, type DefrostPlan } from '#shared/refrigeration/defrost/defrost-plan-types';

/** A plan being worked on; nothing of it is stored before it is saved. */
export type PlanDraft = Omit<DefrostPlanRequest, 'basedOn'>;

/** One defrost of one circuit, by its start. */
export interface ChosenStart {
  readonly circuitId: CircuitId;
  readonly startS: number;
}

const NOTHING: Omit<DefrostDetails, 'circuitId'> = {
  durationS: null,
  dripS: null,
  loadW: null,
  heaterW: null,
  box: null,
  airCurtain: null,
  fixedStartsS: [],
};

/** The newest plan to go on from, or the usual rules and no starts. Details of circuits that are gone are dropped. */
export function draftOf({ newest, circuits }: DefrostPlanPage): PlanDraft {
  if (!newest) return { rules: { ...USUAL_DEFROST_RULES, quietHours: [] }, details: [], plan: [] };
  const known = new Set(circuits.map(({ id }) => id));
  return {
    rules: newest.rules,
    details: newest.details.filter(({ circuitId }) => known.has(circuitId)),
    plan: newest.plan,
  };
}

export const detailsOf = ({ details }: PlanDraft, circuitId: CircuitId): DefrostDetails =>
  details.find((each) => each.circuitId === circuitId) ?? { circuitId, ...NOTHING };

/** Changes what was given by hand for one circuit; a circuit of which nothing is left to say goes from the list. */
export function withDetails(
  draft: PlanDraft,
  circuitId: CircuitId,
  change: Partial<DefrostDetails>,
): PlanDraft {
  const changed = { ...detailsOf(draft, circuitId), ...change, circuitId };
  const others = draft.details.filter((each) => each.circuitId !== circuitId);
  const { fixedStartsS, circuitId: _id, ...figures } = changed;
  const isEmpty = fixedStartsS.length === 0 && Object.values(figures).every((value) => value === null);
  return { ...draft, details: isEmpty ? others : [...others, changed] };
}

export const withPlan = (draft: PlanDraft, plan: DefrostPlan): PlanDraft => ({
  ...draft,
  plan: plan.map(({ circuitId, startsS }) => ({ circuitId: circuitId as CircuitId, startsS: [...startsS] })),
});

export const isKept = (draft: PlanDraft, { circuitId, startS }: ChosenStart): boolean =>
  detailsOf(draft, circuitId).fixedStartsS.includes(startS);

/** Keeps a start where it is when the day is laid out again, or lets it go. */
export function keeping(draft: PlanDraft, { circuitId, startS }: ChosenStart, isToKeep: boolean): PlanDraft {
  const others = detailsOf(draft, circuitId).fixedStartsS.filter((each) => each !== startS);
  return withDetails(draft, circuitId, { fixedStartsS: isToKeep ? [...others, startS] : others });
}

/**
 * Moves one defrost round the clock. What somebody moved by hand is kept where they put it.
 *
 * @param byS seconds, forwards or back; past midnight it goes on at the other end of the day
 * @returns the draft, and where the start is now; both as they were where there is no such start
 */
export function moved(
  draft: PlanDraft,
  chosen: ChosenStart,
  byS: number,
): { readonly draft: PlanDraft; readonly chosen: ChosenStart } {
  const { circuitId, startS } = chosen;
  const isThere = draft.plan.some((entry) => entry.circuitId === circuitId && entry.startsS.includes(startS));
  if (!isThere) return { draft, chosen };
  const toS = (((startS + byS) % DAY_S) + DAY_S) % DAY_S;
  const plan = draft.plan.map((entry) => {
    const at = entry.circuitId === circuitId ? entry.startsS.indexOf(startS) : -1;
    if (at < 0) return entry;
    return { ...entry, startsS: entry.startsS.with(at, toS).sort((a, b) => a - b) };
  });
  const to = { circuitId, startS: toS };
  return { draft: keeping(keeping({ ...draft, plan }, chosen, false), to, true), chosen: to };
}
