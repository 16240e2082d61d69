import type { DefrostPlanRequest, PlannedCircuit, SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import { checkDefrostPlan } from '#shared/refrigeration/defrost/check-defrost-plan';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { uuid } from './package-steps.fixture';

const HOUR_S = 3600;

export const plannedCircuit = (number: number, change: Partial<PlannedCircuit> = {}): PlannedCircuit => ({
  id: uuid('c1', number) as PlannedCircuit['id'],
  code: `A-${number}`,
  groupId: uuid('60', 1) as PlannedCircuit['groupId'],
  groupName: 'AS-1',
  type: 'electric',
  perDay: 2,
  durationS: 1800,
  dripS: 600,
  loadW: 3000,
  heaterW: 4000,
  box: null,
  airCurtain: null,
  fixedStartsS: [],
  ...change,
});

/** A saved plan with the breaches that the server would have found. */
export function savedPlan(
  circuits: readonly PlannedCircuit[],
  startsH: readonly (readonly number[])[],
  change: Partial<DefrostPlanRequest['rules']> = {},
): SavedDefrostPlan {
  const rules = { ...USUAL_DEFROST_RULES, quietHours: [], largestShareOfLoad: 0.5, ...change };
  const plan = circuits.map(({ id }, index) => ({
    circuitId: id,
    startsS: (startsH[index] ?? []).map((hour) => hour * HOUR_S),
  }));
  const check = checkDefrostPlan(circuits, rules, plan);
  return {
    id: uuid('de', 1),
    version: 4,
    rules,
    details: [],
    circuits: [...circuits],
    plan,
    breaches: check.ok ? check.breaches.map((each) => ({ ...each, circuitIds: [...each.circuitIds] })) : [],
    notes: check.ok ? check.notes.map((each) => ({ ...each, circuitIds: [...each.circuitIds] })) : [],
    createdAt: '2026-11-29T15:30:00.000Z',
    createdByName: 'Dana Reyes',
  };
}
