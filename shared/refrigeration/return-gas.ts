import {
  kelvinDifference,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';
import type { SaturationFailure } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';
import { superheat } from './superheat';
import { judgeSuperheat } from './superheat-band';
import type { Working, WorkingLine } from './working';

/** What a compressor stands; the maker's figures where there are any. Null: not limited. */
export interface ReturnGasLimits {
  readonly superheatLow: KelvinDifference;
  readonly superheatHigh: KelvinDifference | null;
  readonly returnGasHigh: Kelvin | null;
  readonly dischargeHigh: Kelvin | null;
}

export interface ReturnGasInputs {
  readonly table: SaturationTable;
  /** At the compressor's suction service valve. */
  readonly suctionPressure: PascalGauge;
  readonly atmosphere: PascalAbsolute;
  /** On the suction line, about a foot before the compressor. */
  readonly returnGasTemperature: Kelvin;
  /** On the discharge line; null when nobody measured it. */
  readonly dischargeTemperature: Kelvin | null;
  readonly limits: ReturnGasLimits;
}

/** Which limits aren't kept, as keys that screens translate. */
export type ReturnGasBreach = 'superheatLow' | 'superheatHigh' | 'returnGasHigh' | 'dischargeHigh';

export type ReturnGasResult =
  | {
      readonly ok: true;
      readonly outcome: 'within' | 'outside';
      /** `low` goes before `high` when both are broken: liquid ruins a compressor sooner than heat. */
      readonly side: 'low' | 'high' | null;
      readonly consequence: 'liquidFloodback' | 'hotDischarge' | null;
      /** Every broken limit, the low one first. */
      readonly breaches: readonly ReturnGasBreach[];
      /** False when the discharge is limited and wasn't measured: then nothing is said about it. */
      readonly dischargeJudged: boolean;
      readonly superheat: KelvinDifference;
      /** Dew temperature at the suction pressure. */
      readonly saturation: Kelvin;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: SaturationFailure | 'belowAbsoluteZero' | 'limitsContradict' };

/**
 * Least superheat at a compressor when its maker gives none: 10 K, which is a difference of 18 °F and never 50 °F.
 * Common for R-744 boosters, from memory. Makers read: at least 20 °F (a maker of condensing units), 5 to 30 K (a maker
 * of scroll compressors).
 */
export const DEFAULT_RETURN_GAS_SUPERHEAT_LOW = kelvinDifference(10);

/** Wide enough for conversion noise, far too narrow for any thermometer. */
const NOISE_K = 1e-9;

type Refusal = Extract<ReturnGasResult, { ok: false }>['reason'];

function refusalOf({ dischargeTemperature, limits }: ReturnGasInputs): Refusal | null {
  const { superheatLow, superheatHigh, returnGasHigh, dischargeHigh } = limits;
  const temperatures = [dischargeTemperature, returnGasHigh, dischargeHigh].filter((value) => value !== null);
  if (![superheatLow, superheatHigh ?? superheatLow, ...temperatures].every(Number.isFinite))
    return 'notFinite';
  if (temperatures.some((temperature) => temperature <= 0)) return 'belowAbsoluteZero';
  return superheatHigh !== null && superheatHigh < superheatLow ? 'limitsContradict' : null;
}

const isAbove = (temperature: Kelvin | null, limit: Kelvin | null): boolean =>
  temperature !== null && limit !== null && temperature > limit + NOISE_K;

function breachesOf(inputs: ReturnGasInputs, value: KelvinDifference): readonly ReturnGasBreach[] {
  const { limits, returnGasTemperature, dischargeTemperature } = inputs;
  const high = limits.superheatHigh ?? kelvinDifference(Infinity);
  const { side } = judgeSuperheat(value, { low: limits.superheatLow, high });
  const found: readonly (readonly [ReturnGasBreach, boolean])[] = [
    ['superheatLow', side === 'low'],
    ['superheatHigh', side === 'high'],
    ['returnGasHigh', isAbove(returnGasTemperature, limits.returnGasHigh)],
    ['dischargeHigh', isAbove(dischargeTemperature, limits.dischargeHigh)],
  ];
  return found.flatMap(([breach, holds]) => (holds ? [breach] : []));
}

type Side = 'low' | 'high' | null;

function sideOf(breaches: readonly ReturnGasBreach[]): Side {
  if (breaches.length === 0) return null;
  return breaches.includes('superheatLow') ? 'low' : 'high';
}

const CONSEQUENCES = { low: 'liquidFloodback', high: 'hotDischarge' } as const;

function limitLines(inputs: ReturnGasInputs): readonly WorkingLine[] {
  const { limits, dischargeTemperature } = inputs;
  const candidates: readonly (readonly [string, number | null, 'K' | 'K_diff'])[] = [
    ['dischargeTemperature', dischargeTemperature, 'K'],
    ['dischargeHigh', limits.dischargeHigh, 'K'],
    ['returnGasHigh', limits.returnGasHigh, 'K'],
    ['superheatLow', limits.superheatLow, 'K_diff'],
    ['superheatHigh', limits.superheatHigh, 'K_diff'],
  ];
  return candidates.flatMap(([label, value, unit]) => (value === null ? [] : [{ label, value, unit }]));
}

/** The superheat's own working, its line named for where it was read, with the limits before the result. */
function workingOf(inputs: ReturnGasInputs, ofSuperheat: Working): Working {
  const lines = ofSuperheat.lines.map((line) =>
    line.label === 'lineTemperature' ? { ...line, label: 'returnGasTemperature' } : line,
  );
  return {
    formula: 'returnGasSuperheat',
    source: ofSuperheat.source,
    lines: [...lines.slice(0, -1), ...limitLines(inputs), ...lines.slice(-1)],
  };
}

/**
 * Judges the gas that comes back to a compressor. Too little superheat lets liquid in; too much, or gas too warm, makes
 * the discharge too hot for the oil. Another check than the superheat at a coil: both are needed.
 *
 * @param inputs pressures in pascals, temperatures in kelvin, superheats as differences in kelvin
 * @returns outcome, side, consequence and figures with their working, or the reason why there is none. A limit itself
 *   passes, but zero superheat never does, whatever the limit
 * @range as `superheat`
 * @source `superheat`; limits: the compressor maker's, else `DEFAULT_RETURN_GAS_SUPERHEAT_LOW`
 * @example judgeReturnGas({ R-744, 200 psig, 1 atm, −5 °F, null, { superheatLow: 10 K, … } }) // outside, low, floodback
 */
export function judgeReturnGas(inputs: ReturnGasInputs): ReturnGasResult {
  const { table, suctionPressure, atmosphere, returnGasTemperature } = inputs;
  const refusal = refusalOf(inputs);
  if (refusal !== null) return { ok: false, reason: refusal };
  const read = superheat({ table, suctionPressure, atmosphere, lineTemperature: returnGasTemperature });
  if (!read.ok) return read;
  const breaches = breachesOf(inputs, read.superheat);
  const side = sideOf(breaches);
  return {
    ok: true,
    outcome: side === null ? 'within' : 'outside',
    side,
    consequence: side === null ? null : CONSEQUENCES[side],
    breaches,
    dischargeJudged: inputs.limits.dischargeHigh === null || inputs.dischargeTemperature !== null,
    superheat: read.superheat,
    saturation: read.saturation,
    working: workingOf(inputs, read.working),
  };
}
