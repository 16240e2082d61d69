import { USUAL_DEFROST_RULES, type DefrostCircuit, type DefrostRules } from './defrost-plan-types';

// Made-up circuits for specs: off-time, half an hour, once a day, unless told otherwise.

export const MINUTE_S = 60;
export const HOUR_S = 3600;

export const circuit = (id: string, change: Partial<DefrostCircuit> = {}): DefrostCircuit => ({
  id,
  code: id.toUpperCase(),
  groupId: 'group',
  type: 'offTime',
  perDay: 1,
  durationS: 30 * MINUTE_S,
  dripS: 0,
  loadW: 1000,
  heaterW: null,
  box: null,
  airCurtain: null,
  ...change,
});

/** Rules that forbid nothing, on a grid of half an hour. */
export const freeRules = (change: Partial<DefrostRules> = {}): DefrostRules => ({
  ...USUAL_DEFROST_RULES,
  largestShareOfLoad: 1,
  largestShareInHotGas: 1,
  leastGapBetweenStartsS: 0,
  stepS: 30 * MINUTE_S,
  ...change,
});

export const at = (hour: number, minute = 0): number => hour * HOUR_S + minute * MINUTE_S;

/** A store of made-up circuits in groups of up to 15: electric and hot gas at low temperature, off-time otherwise. */
export function storeOf(count: number): readonly DefrostCircuit[] {
  return Array.from({ length: count }, (_, index) => {
    const group = Math.floor(index / 15);
    const type = group === 0 ? 'electric' : group === 1 ? 'hotGas' : 'offTime';
    return circuit(`c${index}`, {
      groupId: `group ${group}`,
      type,
      perDay: group === 0 ? 1 + (index % 2) : group === 1 ? 2 + (index % 3) : ([2, 3, 4, 6][index % 4] ?? 4),
      durationS: (type === 'hotGas' ? 20 : 30 + (index % 3) * 5) * MINUTE_S,
      dripS: type === 'offTime' ? 0 : 5 * MINUTE_S,
      loadW: 2000 + ((index * 737) % 5000),
      heaterW: type === 'electric' ? 4000 + ((index * 311) % 3000) : null,
      box: index % 15 === 3 || index % 15 === 4 ? `box ${group}` : null,
      airCurtain: index % 15 > 8 && index % 15 < 12 ? `curtain ${group}` : null,
    });
  });
}
