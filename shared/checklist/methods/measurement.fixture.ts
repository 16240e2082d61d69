import type { UnitId } from '../../units/unit';
import type { SequenceFacts } from '../facts';
import { judge } from '../judge';
import type { Judgement } from '../judgement';
import type { MeasurementAnswer, MeasurementBoxes } from '../kinds/measurement';
import { buildStep, SEA_LEVEL } from '../step.fixture';
import type { TypedValue } from '../typed-value';
import { METHOD_KEYS, type MethodKey } from './method-keys';

// Boxes as somebody fills them, for specs.

export type Typed = Readonly<Record<string, string>>;

/** '150 psig' as typed into a box whose unit is psig; '150' and the unit stand apart by a space. */
export function typedValue(text: string): TypedValue {
  const cut = text.lastIndexOf(' ');
  return { text: text.slice(0, cut), unit: text.slice(cut + 1) as UnitId };
}

/** Boxes: what begins with '=' is a word or a choice, everything else a quantity with its unit. */
export function boxesOf(typed: Typed): MeasurementBoxes {
  const [quantities, words]: [Record<string, TypedValue>, Record<string, string>] = [{}, {}];
  for (const [key, text] of Object.entries(typed)) {
    if (text.startsWith('=')) words[key] = text.slice(1);
    else quantities[key] = typedValue(text);
  }
  return { quantities, words };
}

/** What a step of one method asks and what was typed into it. */
export interface Measured {
  readonly method: MethodKey;
  readonly typed: Typed;
  readonly rows?: readonly Typed[];
  readonly criteria?: Readonly<Record<string, number | null>>;
  readonly facts?: Partial<SequenceFacts>;
}

export const answerOf = ({ method, typed, rows = [] }: Measured): MeasurementAnswer => ({
  kind: 'measurement',
  method,
  ...boxesOf(typed),
  rows: rows.map(boxesOf),
});

export function judgeAnswer(measured: Measured, answer: MeasurementAnswer): Judgement {
  const { method, criteria = {}, facts } = measured;
  return judge(buildStep('measurement', { method, criteria: { ...criteria } }), answer, {
    ...SEA_LEVEL,
    ...facts,
  });
}

export const judgeMeasured = (measured: Measured): Judgement => judgeAnswer(measured, answerOf(measured));

/** The same with some boxes changed; `null` leaves a box out. */
export function withBoxes(measured: Measured, change: Readonly<Record<string, string | null>>): Measured {
  const merged = Object.entries({ ...measured.typed, ...change });
  return {
    ...measured,
    typed: Object.fromEntries(merged.filter((entry): entry is [string, string] => entry[1] !== null)),
  };
}

export function figure(judgement: Judgement, label: string): number {
  const found = judgement.figures.find((candidate) => candidate.label === label);
  if (!found) throw new Error(`no figure ${label}`);
  return found.value;
}

export const doubtsOf = (judgement: Judgement): string[] =>
  judgement.doubts.map(({ severity, kind }) => `${severity} ${kind}`);

// SI values written out here, so that a spec doesn't trust what it tests (NIST SP 811, appendix B).
export const psi = (value: number): number => value * 6894.757293168;
export const micron = (value: number): number => (value * 101.325) / 760;
export const fahrenheitDegrees = (value: number): number => (value * 5) / 9;
export const fahrenheit = (value: number): number => ((value + 459.67) * 5) / 9;
export const pound = (value: number): number => value * 0.45359237;

/** One good answer of each method: within, nothing doubted. */
export const GOOD: { readonly [K in MethodKey]: Measured & { readonly method: K } } = {
  pressureTest: {
    method: 'pressureTest',
    typed: {
      startPressure: '300 psig',
      startTemperature: '80 degF',
      endPressure: '294.2 psig',
      endTemperature: '70 degF',
      held: '24 h',
      gaugeAccuracy: '0.5 psi_diff',
      temperatureAccuracy: '1 degF_diff',
    },
    criteria: { leastHold: 86_400, leastPressure: psi(300), allowedLoss: 0 },
  },
  evacuation: {
    method: 'evacuation',
    typed: { ambientTemperature: '70 degF' },
    rows: [
      { since: '0 min', pressure: '300 micron' },
      { since: '20 min', pressure: '380 micron' },
      { since: '40 min', pressure: '440 micron' },
      { since: '60 min', pressure: '480 micron' },
    ],
    criteria: {
      target: micron(300),
      hold: 3600,
      limit: micron(500),
      greatestRise: micron(300),
      leakAbove: micron(2000),
    },
  },
  supplyVoltage: {
    method: 'supplyVoltage',
    typed: { nameplate: '460 V', line12: '460 V', line23: '467 V', line31: '450 V' },
    criteria: { tolerance: 0.1, greatestUnbalance: 0.02 },
  },
  heaterCurrent: {
    method: 'heaterCurrent',
    typed: {
      supply: '=threePhase',
      platePower: '6 kW_el',
      plateVoltage: '208 V',
      voltage: '208 V',
      leg1: '16.6 A',
      leg2: '16.7 A',
      leg3: '16.5 A',
    },
    criteria: { tolerance: 0.1 },
  },
  returnGas: {
    method: 'returnGas',
    typed: { suctionPressure: '200 psig', returnGasTemperature: '2 degF', dischargeTemperature: '180 degF' },
    criteria: {
      superheatLow: 10,
      superheatHigh: 30,
      returnGasHigh: fahrenheit(65),
      dischargeHigh: fahrenheit(250),
    },
    facts: { refrigerant: 'R-744' },
  },
  subcooling: {
    method: 'subcooling',
    typed: { liquidPressure: '225 psig', lineTemperature: '86 degF' },
    criteria: { low: fahrenheitDegrees(5), high: fahrenheitDegrees(15) },
    facts: { refrigerant: 'R-404A' },
  },
  regulatorPressure: {
    method: 'regulatorPressure',
    typed: { pressure: '80 psig' },
    criteria: { dew: fahrenheit(50.8), room: 1 },
    facts: { refrigerant: 'R-407C' },
  },
  witnessedDefrost: {
    method: 'witnessedDefrost',
    typed: { took: '28 min', endTemperature: '51 degF' },
    criteria: { failSafe: 2160, terminationTemperature: fahrenheit(50), temperatureTolerance: 1 },
  },
  refrigerantCharge: {
    method: 'refrigerantCharge',
    typed: {},
    rows: [
      { cylinder: '=A-17', refrigerant: '=R-448A', direction: '=in', before: '120 lb', after: '15 lb' },
      { cylinder: '=B-02', refrigerant: '=R448A', direction: '=in', before: '110 lb', after: '60 lb' },
      { cylinder: '=C-09', refrigerant: '=R-448A', direction: '=out', before: '20 lb', after: '25 lb' },
    ],
    criteria: { least: pound(140), most: pound(160) },
  },
  electronicValve: {
    method: 'electronicValve',
    typed: {
      driverRefrigerant: '=R448A',
      transducer: '45.5 psig',
      gauge: '45 psig',
      iceBath: '32.3 degF',
      opening: '55 percent',
    },
    criteria: { pressureRoom: psi(1), sensorRoom: 0.5, leastOpening: 0.3, greatestOpening: 0.8 },
  },
};

export const GOOD_ANSWERS: readonly Measured[] = METHOD_KEYS.map((key) => GOOD[key]);
