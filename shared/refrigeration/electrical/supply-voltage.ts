import type { Volt } from '../../units/quantity';
import { voltageUnbalance } from '../voltage-unbalance';
import type { Working, WorkingLine } from '../working';

export interface SupplyVoltageInputs {
  readonly nameplateVoltage: Volt;
  /** Line to line: one voltage on one phase, three on three phases. */
  readonly voltages: readonly [Volt] | readonly [Volt, Volt, Volt];
  /** How far a voltage may be from the nameplate's, as a fraction of it; `NAMEPLATE_TOLERANCE` when left out. */
  readonly voltageTolerance?: number;
  /** Greatest unbalance, as a fraction; `DEFAULT_GREATEST_UNBALANCE` when left out. */
  readonly greatestUnbalance?: number;
}

/** What is wrong with a supply, as keys that screens translate. `lost`: a line without voltage. */
export type SupplyProblem = 'lost' | 'low' | 'high' | 'unbalanced';

export type SupplyVoltageResult =
  | {
      readonly ok: true;
      readonly outcome: 'within' | 'outside';
      /** (measured − nameplate) ÷ nameplate of each voltage, in the order given. */
      readonly deviations: readonly number[];
      /** As a fraction; null on one phase, and when a line is lost. */
      readonly unbalance: number | null;
      /** Each at most once, worst first; empty when within. */
      readonly problems: readonly SupplyProblem[];
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: 'notFinite' | 'notPositive' | 'limitNotAFraction' };

/** NEMA MG 1, 12.44: a motor runs at ±10 % of its nameplate voltage. */
export const NAMEPLATE_TOLERANCE = 0.1;

/** The limit of many compressor makers. NEMA MG 1 starts derating at 1 % and forbids more than 5 %. */
export const DEFAULT_GREATEST_UNBALANCE = 0.02;

/** Wide enough for conversion noise, far too narrow for any voltmeter. */
const NOISE = 1e-9;

type Refusal = Extract<SupplyVoltageResult, { ok: false }>['reason'];

function refusalOf(
  { nameplateVoltage, voltages }: SupplyVoltageInputs,
  limits: readonly number[],
): Refusal | null {
  if (![nameplateVoltage, ...voltages, ...limits].every(Number.isFinite)) return 'notFinite';
  if (nameplateVoltage <= 0 || voltages.some((voltage) => voltage < 0)) return 'notPositive';
  return limits.some((limit) => limit < 0 || limit >= 1) ? 'limitNotAFraction' : null;
}

interface SupplyFigures {
  readonly voltageTolerance: number;
  readonly greatestUnbalance: number;
  readonly deviations: readonly number[];
  readonly unbalance: number | null;
}

function problemsOf(figures: SupplyFigures): readonly SupplyProblem[] {
  const { voltageTolerance, greatestUnbalance, deviations, unbalance } = figures;
  const found: readonly (readonly [SupplyProblem, boolean])[] = [
    ['lost', deviations.some((deviation) => deviation <= -1)],
    ['low', deviations.some((deviation) => deviation > -1 && deviation < -voltageTolerance - NOISE)],
    ['high', deviations.some((deviation) => deviation > voltageTolerance + NOISE)],
    ['unbalanced', unbalance !== null && unbalance > greatestUnbalance + NOISE],
  ];
  return found.flatMap(([problem, holds]) => (holds ? [problem] : []));
}

function workingOf(inputs: SupplyVoltageInputs, figures: SupplyFigures): Working {
  return {
    formula: 'supplyVoltage',
    source: 'NEMA MG 1: voltage within its tolerance of the nameplate; unbalance from the average',
    lines: [
      { label: 'nameplateVoltage', value: inputs.nameplateVoltage, unit: 'V' },
      ...inputs.voltages.map((voltage, line): WorkingLine => ({
        label: `voltage${line + 1}`,
        value: voltage,
        unit: 'V',
      })),
      { label: 'voltageTolerance', value: figures.voltageTolerance, unit: 'fraction' },
      ...figures.deviations.map((deviation, line): WorkingLine => ({
        label: `deviation${line + 1}`,
        value: deviation,
        unit: 'fraction',
      })),
      ...(figures.unbalance === null
        ? []
        : [
            { label: 'greatestUnbalance', value: figures.greatestUnbalance, unit: 'fraction' as const },
            { label: 'unbalance', value: figures.unbalance, unit: 'fraction' as const },
          ]),
    ],
  };
}

/**
 * Judges a supply against the nameplate: every voltage within its tolerance, and three of them near enough to each other.
 *
 * @param inputs volts, line to line; limits as fractions
 * @returns outcome, what is wrong, figures and working, or the reason why there is none. A limit itself passes
 * @source NEMA MG 1, 12.44 (voltage) and its definition of unbalance, see `voltageUnbalance`; 2 %: many makers
 * @example judgeSupplyVoltage({ nameplateVoltage: volt(460), voltages: [460 V, 467 V, 450 V] }) // within, 1.96 %
 */
export function judgeSupplyVoltage(inputs: SupplyVoltageInputs): SupplyVoltageResult {
  const { nameplateVoltage, voltages } = inputs;
  const { voltageTolerance = NAMEPLATE_TOLERANCE, greatestUnbalance = DEFAULT_GREATEST_UNBALANCE } = inputs;
  const refusal = refusalOf(inputs, [voltageTolerance, greatestUnbalance]);
  if (refusal !== null) return { ok: false, reason: refusal };
  const deviations = voltages.map((voltage) => (voltage - nameplateVoltage) / nameplateVoltage);
  const unbalance = voltages.length === 3 ? (voltageUnbalance(voltages) ?? null) : null;
  const figures = { voltageTolerance, greatestUnbalance, deviations, unbalance };
  const problems = problemsOf(figures);
  return {
    ok: true,
    outcome: problems.length === 0 ? 'within' : 'outside',
    deviations,
    unbalance,
    problems,
    working: workingOf(inputs, figures),
  };
}
