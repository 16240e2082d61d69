import { plannedCircuits } from '#shared/contracts/defrost-circuits';
import type { OpeningId } from '#shared/plant/ids';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { planDefrosts } from '#shared/refrigeration/defrost/plan-defrosts';
import { Bug } from '#shared/failures/failure';
import type { Services } from '../app/services';
import type { Caller } from '../http/define-route';

const HOUR_S = 3600;

/** A hundred starts a day in one suction group leave no quarter of an hour between any two; nothing in the evening rush. */
const RULES = {
  ...USUAL_DEFROST_RULES,
  leastGapBetweenStartsS: 300,
  quietHours: [{ fromS: 17 * HOUR_S, toS: 19 * HOUR_S }],
};

/** Lays the day of the demo opening out and saves it as its lead. */
export async function saveDemoDefrostPlan(
  { defrosts }: Pick<Services, 'defrosts'>,
  lead: Caller,
  openingId: OpeningId,
): Promise<void> {
  const { circuits } = await defrosts.show(openingId);
  const planning = planDefrosts(plannedCircuits(circuits, []), RULES);
  if (!planning.ok) throw new Bug('The demo opening has no defrost plan');
  await defrosts.save(lead, openingId, {
    basedOn: 0,
    rules: RULES,
    details: [],
    plan: planning.plan.map(({ circuitId, startsS }) => ({
      circuitId: circuitId as (typeof circuits)[number]['id'],
      startsS: [...startsS],
    })),
  });
}
