import { trainsOf } from './candidate-trains';
import { DAY_S, lasts, secondsApart } from './day-circle';
import {
  POWER_TOLERANCE_W,
  SHARE_TOLERANCE,
  type DefrostCircuit,
  type DefrostRules,
} from './defrost-plan-types';
import { heaterDemandW, occupiedS, startsNeeded } from './defrost-spans';
import { groupWeights, shareOf, type GroupWeights } from './group-weights';
import type { Candidate, GroupTally, Placeable } from './plan-occupancy';

/**
 * Prepares the circuits that need defrosts, nothing placed yet. A circuit that can't be placed at all has no candidates.
 *
 * @param circuits whole suction groups; times in seconds, powers in watts
 * @param rules likewise
 * @returns one entry for each circuit with one defrost a day or more
 * @example placeables(circuits, rules)
 */
export function placeables(circuits: readonly DefrostCircuit[], rules: DefrostRules): readonly Placeable[] {
  const moments = momentsOf(circuits, rules);
  const heater = new Float64Array(moments.length);
  const apart = new Map<string, Int32Array>();
  const tally = (kind: string, name: string | null): readonly Int32Array[] => {
    if (name === null) return [];
    const key = `${kind} ${name}`;
    const found = apart.get(key) ?? new Int32Array(moments.length);
    apart.set(key, found);
    return [found];
  };
  return groupWeights(circuits).flatMap((weights) => {
    const group = emptyTally(weights, rules, moments.length);
    const needing = weights.circuits.filter((circuit) => startsNeeded(circuit) > 0);
    return needing.map((circuit) => ({
      circuit,
      candidates: candidatesOf(circuit, rules, moments),
      group,
      share: shareOf(weights, circuit),
      loadW: circuit.loadW ?? 0,
      hotGas: circuit.type === 'hotGas' ? (1 as const) : (0 as const),
      heaterW: heaterDemandW(circuit) ?? 0,
      heater,
      apart: [...tally('box', circuit.box), ...tally('airCurtain', circuit.airCurtain)],
      rules,
    }));
  });
}

function momentsOf(circuits: readonly DefrostCircuit[], rules: DefrostRules): readonly number[] {
  const moments = new Set(circuits.flatMap(({ fixedStartsS }) => fixedStartsS ?? []));
  for (let atS = 0; atS < DAY_S; atS += rules.stepS) moments.add(atS);
  return [...moments].sort((a, b) => a - b);
}

function emptyTally(weights: GroupWeights, rules: DefrostRules, size: number): GroupTally {
  const leastW = rules.leastRunningLoadForHotGasW;
  const { hotGasCount, knownLoadW } = weights;
  return {
    share: new Float64Array(size),
    loadW: new Float64Array(size),
    count: new Int32Array(size),
    hotGas: new Int32Array(size),
    near: new Int32Array(size),
    mostHotGas: Math.max(1, Math.floor((rules.largestShareInHotGas + SHARE_TOLERANCE) * hotGasCount)),
    mostLoadWBesideHotGas: leastW === null ? Infinity : knownLoadW - leastW + POWER_TOLERANCE_W,
  };
}

function candidatesOf(
  circuit: DefrostCircuit,
  rules: DefrostRules,
  moments: readonly number[],
): readonly Candidate[] {
  // Heaters that nobody knows can't be shown to keep a limit.
  if (rules.largestHeaterDemandW !== null && heaterDemandW(circuit) === null) return [];
  const indexes = new Map(moments.map((atS, index) => [atS, index]));
  const spans = new Map<number, StartSpans>();
  const spansOf = (startS: number): StartSpans => {
    const found = spans.get(startS) ?? spansFrom(circuit, rules, moments, indexes.get(startS) ?? 0);
    spans.set(startS, found);
    return found;
  };
  return trainsOf(circuit, rules).map(({ startsS, isEven }) => {
    const each = startsS.map(spansOf);
    return {
      startsS,
      isEven,
      starts: Int32Array.from(startsS, (startS) => indexes.get(startS) ?? 0),
      lasting: Int32Array.from(each.flatMap(({ lasting }) => lasting)),
      heating: Int32Array.from(each.flatMap(({ heating }) => heating)),
      near: Int32Array.from(each.flatMap(({ near }) => near)),
    };
  });
}

/** The moments that one start touches, as indexes. */
interface StartSpans {
  readonly lasting: readonly number[];
  readonly heating: readonly number[];
  readonly near: readonly number[];
}

function spansFrom(
  circuit: DefrostCircuit,
  rules: DefrostRules,
  moments: readonly number[],
  from: number,
): StartSpans {
  const startS = moments[from] ?? NaN;
  const isNear = (atS: number): boolean => secondsApart(startS, atS) < rules.leastGapBetweenStartsS;
  const within =
    (lengthS: number) =>
    (atS: number): boolean =>
      lasts(startS, lengthS, atS);
  return {
    lasting: walk(moments, from, 1, within(occupiedS(circuit))),
    heating: walk(moments, from, 1, within(circuit.durationS)),
    near: [...walk(moments, from, 1, isNear), ...walk(moments, from, -1, isNear)],
  };
}

/** The indexes from one moment on, round midnight, for as long as the moments belong. */
function walk(
  moments: readonly number[],
  from: number,
  direction: 1 | -1,
  belongs: (atS: number) => boolean,
): readonly number[] {
  const found: number[] = [];
  for (let taken = 0; taken < moments.length; taken++) {
    const index = (from + direction * taken + moments.length) % moments.length;
    if (!belongs(moments[index] ?? NaN)) break;
    found.push(index);
  }
  return found;
}
