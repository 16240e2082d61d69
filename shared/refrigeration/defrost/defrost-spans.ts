import { DAY_S, secondsUntil, type Span } from './day-circle';
import type { DefrostCircuit, QuietHours } from './defrost-plan-types';

/**
 * How many defrosts a day a plan must hold for a circuit.
 *
 * @param circuit its type and count
 * @returns a count; 0 where the type is `none`
 * @example startsNeeded({ …, type: 'none', perDay: 4 }) // 0
 */
export const startsNeeded = (circuit: DefrostCircuit): number =>
  circuit.type === 'none' ? 0 : circuit.perDay;

/**
 * How long a circuit is away from its load: fail-safe time and drip.
 *
 * @param circuit times in seconds
 * @returns seconds
 * @example occupiedS({ …, durationS: 1800, dripS: 300 }) // 2100
 */
export const occupiedS = (circuit: DefrostCircuit): number => circuit.durationS + circuit.dripS;

/**
 * What a circuit's heaters draw while it defrosts (not while it drips).
 *
 * @param circuit its type and heaters
 * @returns watts; null when it is electric and nobody has said how much
 * @example heaterDemandW({ …, type: 'hotGas', heaterW: null }) // 0
 */
export function heaterDemandW(circuit: DefrostCircuit): number | null {
  if (circuit.type === 'none') return 0;
  if (circuit.heaterW === null) return circuit.type === 'electric' ? null : 0;
  return circuit.heaterW;
}

/**
 * Quiet hours as a span of the day.
 *
 * @param quiet seconds of the day; 0 to 86 400 is the whole day, equal ends are nothing
 * @returns start as second of the day, length in seconds
 * @example quietSpan({ fromS: 79_200, toS: 21_600 }) // 22:00 for 8 h
 */
export function quietSpan(quiet: QuietHours): Span {
  const { fromS, toS } = quiet;
  const lengthS = toS > fromS ? toS - fromS : secondsUntil(fromS % DAY_S, toS);
  return { startS: fromS % DAY_S, lengthS };
}
