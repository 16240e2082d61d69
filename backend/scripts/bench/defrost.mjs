import { performance } from 'node:perf_hooks';
import { checkDefrostPlan } from '#shared/refrigeration/defrost/check-defrost-plan';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { planDefrosts } from '#shared/refrigeration/defrost/plan-defrosts';
import { count } from './report.mjs';
import { median } from './statistics.mjs';

const CIRCUITS = 60;
const GROUPS = 4;

/**
 * A day of defrosts for 60 circuits, laid out, against one check of the finished plan.
 * @param {{ quick: boolean, log: (line: string) => void }} context
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureDefrostPlan({ quick, log }) {
  const circuits = store();
  const rules = { ...USUAL_DEFROST_RULES, quietHours: [{ fromS: 16 * 3600, toS: 19 * 3600 }] };
  const times = { planning: /** @type {number[]} */ ([]), checking: /** @type {number[]} */ ([]) };
  let defrosts = 0;
  for (let round = 0; round < (quick ? 3 : 9); round += 1) {
    const started = performance.now();
    const planned = planDefrosts(circuits, rules);
    times.planning.push(performance.now() - started);
    if (!planned.ok) throw new Error('The bench asks for a plan that is possible, and got none.');
    const checking = performance.now();
    const check = checkDefrostPlan(circuits, rules, planned.plan);
    times.checking.push(performance.now() - checking);
    if (!check.ok || check.breaches.length > 0) throw new Error('The plan breaks a rule.');
    defrosts = planned.plan.reduce((sum, { startsS }) => sum + startsS.length, 0);
  }
  const [planning, checking] = [median(times.planning), median(times.checking)];
  log(
    `  ${CIRCUITS} circuits, ${defrosts} defrosts: planned in ${count(planning)} ms, checked in ${count(checking, 1)} ms`,
  );
  return [
    {
      what: `A day of ${defrosts} defrosts of ${CIRCUITS} circuits laid out`,
      ours: `${count(planning)} ms`,
      reference: `${count(checking, 1)} ms to check a finished plan`,
      ratio: planning / checking,
      goal: 'under 1 s',
      isMet: planning < 1000,
    },
  ];
}

/** Electric, hot-gas and off-time circuits of four groups, as a store has them. */
function store() {
  return Array.from({ length: CIRCUITS }, (_, index) => {
    const type = /** @type {const} */ (['electric', 'offTime', 'hotGas'])[index % 3];
    return {
      id: String(index),
      code: `C${index}`,
      groupId: String(index % GROUPS),
      type,
      perDay: type === 'offTime' ? 4 : 2 + (index % 2),
      durationS: 60 * (type === 'offTime' ? 30 : 40),
      dripS: 300,
      loadW: 4000 + 500 * (index % 7),
      heaterW: type === 'electric' ? 6000 : 0,
      box: null,
      airCurtain: null,
    };
  });
}
