import { secondsApart } from './day-circle';
import type { DefrostBreach, DefrostFindings, DefrostNote } from './defrost-breach';
import { POWER_TOLERANCE_W, SHARE_TOLERANCE, type DefrostRules } from './defrost-plan-types';
import { circuitIdsOf, heatingAt, lastingAt, type PlannedDefrost } from './defrosts-of-plan';

/**
 * Judges the defrosts of one group that last at one moment: share of load, share in hot gas, running load. It is enough
 * to ask at every start, since what is in defrost only grows there.
 *
 * @param together of one group, all lasting at `atS`; one or more
 * @param rules limits as fractions and watts
 * @param atS second of the day
 * @returns breaches and notes
 * @example groupFindings([two of 20 %], { …, largestShareOfLoad: 0.25 }, 0) // shareOfLoad: 0.4 of 0.25
 */
export function groupFindings(
  together: readonly PlannedDefrost[],
  rules: DefrostRules,
  atS: number,
): DefrostFindings {
  const breaches: DefrostBreach[] = [];
  const notes: DefrostNote[] = [];
  const hot = together.filter(({ circuit }) => circuit.type === 'hotGas');
  const share = together.reduce((sum, defrost) => sum + defrost.share, 0);
  const hotShare = hot.length === 0 ? 0 : hot.length / (hot[0]?.group.hotGasCount ?? 1);

  const over = (which: readonly PlannedDefrost[], value: number, limit: number, isHot: boolean): void => {
    if (value <= limit + SHARE_TOLERANCE) return;
    const found = { circuitIds: circuitIdsOf(which), atS, value, limit };
    // One circuit has to defrost some time, however large it is.
    if (which.length === 1) notes.push({ note: isHot ? 'aloneOverHotGasShare' : 'aloneOverShare', ...found });
    else breaches.push({ rule: isHot ? 'shareInHotGas' : 'shareOfLoad', ...found });
  };
  over(together, share, rules.largestShareOfLoad, false);
  over(hot, hotShare, rules.largestShareInHotGas, true);
  if (hot.length > 0) breaches.push(...runningLoadBreaches(together, share, rules, atS));
  return { breaches, notes };
}

/** Loads that nobody knows count as not running: gas that may not be there must not make a plan pass. */
function runningLoadBreaches(
  together: readonly PlannedDefrost[],
  share: number,
  rules: DefrostRules,
  atS: number,
): readonly DefrostBreach[] {
  const { leastRunningLoadForHotGasW: leastW, leastRunningShareForHotGas: leastShare } = rules;
  const common = { rule: 'runningLoadForHotGas' as const, circuitIds: circuitIdsOf(together), atS };
  const inDefrostW = together.reduce((sum, { circuit }) => sum + (circuit.loadW ?? 0), 0);
  const runningW = (together[0]?.group.knownLoadW ?? 0) - inDefrostW;
  const found: DefrostBreach[] = [];
  if (leastW !== null && !(runningW >= leastW - POWER_TOLERANCE_W))
    found.push({ ...common, value: runningW, limit: leastW });
  if (leastShare !== null && !(1 - share >= leastShare - SHARE_TOLERANCE))
    found.push({ ...common, value: 1 - share, limit: leastShare });
  return found;
}

/**
 * Judges the heaters of all groups at one moment. An electric circuit whose heaters nobody knows breaks the limit, with no
 * value: it can't be shown to keep it.
 *
 * @param defrosts of the plan
 * @param limitW watts
 * @param atS second of the day
 * @returns at most one breach
 * @example heaterBreaches([6 kW and 6 kW at once], 10_000, 0) // 12 000 of 10 000 W
 */
export function heaterBreaches(
  defrosts: readonly PlannedDefrost[],
  limitW: number,
  atS: number,
): readonly DefrostBreach[] {
  const heating = heatingAt(defrosts, atS).filter(({ heaterW }) => heaterW !== 0);
  const unknown = heating.filter(({ heaterW }) => heaterW === null);
  const value = heating.reduce((sum, { heaterW }) => sum + (heaterW ?? 0), 0);
  const common = { rule: 'heaterDemand' as const, atS, limit: limitW };
  if (value > limitW + POWER_TOLERANCE_W) return [{ ...common, circuitIds: circuitIdsOf(heating), value }];
  if (unknown.length > 0) return [{ ...common, circuitIds: circuitIdsOf(unknown), value: null }];
  return [];
}

/**
 * Starts of different circuits of one group that follow each other too closely.
 *
 * @param defrosts of one group, sorted by start
 * @param limitS seconds
 * @returns one breach for each neighbouring pair, round midnight too
 * @example gapBreaches([starts at 0 and 600 s], 900) // 600 of 900 s
 */
export function gapBreaches(defrosts: readonly PlannedDefrost[], limitS: number): readonly DefrostBreach[] {
  return defrosts.flatMap((defrost, index) => {
    const next = defrosts[(index + 1) % defrosts.length];
    if (next === undefined || next.circuit.id === defrost.circuit.id) return [];
    // Of two starts a day, both neighbours are the same pair.
    if (defrosts.length === 2 && index === 1) return [];
    const value = secondsApart(defrost.startS, next.startS);
    if (value >= limitS) return [];
    const circuitIds = [defrost.circuit.id, next.circuit.id];
    return [{ rule: 'gapBetweenStarts' as const, circuitIds, atS: next.startS, value, limit: limitS }];
  });
}

/**
 * Circuits of one walk-in box, or of one air curtain, that defrost at once as one of them starts.
 *
 * @param starting a defrost
 * @param defrosts of the plan
 * @returns at most one breach for the box and one for the curtain
 * @example apartBreaches(coil 1 of a box, [coil 2 of it, still dripping]) // sharedBox
 */
export function apartBreaches(
  starting: PlannedDefrost,
  defrosts: readonly PlannedDefrost[],
): readonly DefrostBreach[] {
  const { box, airCurtain, id } = starting.circuit;
  // Two that start together see each other; the pair is told once.
  const isOther = ({ circuit, startS }: PlannedDefrost): boolean =>
    circuit.id !== id && !(startS === starting.startS && circuit.id < id);
  const others = lastingAt(defrosts, starting.startS).filter(isOther);
  const sharing = (
    rule: 'sharedBox' | 'sharedAirCurtain',
    which: readonly PlannedDefrost[],
  ): DefrostBreach[] => {
    if (which.length === 0) return [];
    const circuitIds = [id, ...circuitIdsOf(which)];
    return [{ rule, circuitIds, atS: starting.startS, value: null, limit: null }];
  };
  const inBox = others.filter(({ circuit }) => box !== null && circuit.box === box);
  const atCurtain = others.filter(({ circuit }) => airCurtain !== null && circuit.airCurtain === airCurtain);
  return [...sharing('sharedBox', inBox), ...sharing('sharedAirCurtain', atCurtain)];
}
