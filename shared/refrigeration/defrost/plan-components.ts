import type { DefrostCircuit, DefrostRules } from './defrost-plan-types';
import { heaterDemandW } from './defrost-spans';

/**
 * Splits the circuits into parts that can be planned one without the other: they share no suction group, no box, no air
 * curtain, and no heater limit.
 *
 * @param circuits in any order
 * @param rules whether there is a heater limit
 * @returns the parts, each in the order given
 * @example independentParts(circuits of two groups, USUAL_DEFROST_RULES) // two
 */
export function independentParts(
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
): readonly (readonly DefrostCircuit[])[] {
  const parts: { keys: Set<string>; circuits: DefrostCircuit[] }[] = [];
  for (const circuit of circuits) {
    const keys = keysOf(circuit, rules);
    const joined = parts.filter((part) => keys.some((key) => part.keys.has(key)));
    const merged = {
      keys: new Set([...joined.flatMap((part) => [...part.keys]), ...keys]),
      circuits: [...joined.flatMap((part) => part.circuits), circuit],
    };
    for (const part of joined) parts.splice(parts.indexOf(part), 1);
    parts.push(merged);
  }
  return parts.map((part) => circuits.filter((circuit) => part.circuits.includes(circuit)));
}

function keysOf(circuit: DefrostCircuit, rules: DefrostRules): readonly string[] {
  const { groupId, box, airCurtain } = circuit;
  return [
    `group ${groupId}`,
    ...(box === null ? [] : [`box ${box}`]),
    ...(airCurtain === null ? [] : [`airCurtain ${airCurtain}`]),
    ...(rules.largestHeaterDemandW === null || heaterDemandW(circuit) === 0 ? [] : ['heaters']),
  ];
}
