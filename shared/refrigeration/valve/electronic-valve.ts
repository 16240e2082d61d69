import { toSi } from '../../units/convert';
import {
  kelvin,
  subtractTemperatures,
  type Kelvin,
  type KelvinDifference,
  type PascalGauge,
} from '../../units/quantity';
import { findRefrigerant } from '../saturation/refrigerants';
import type { Working, WorkingLine } from '../working';

/** What was looked at on an electronic valve and its driver. Readings that weren't taken are null. */
export interface ElectronicValveInputs {
  /** As chosen in the driver. */
  readonly driverRefrigerant: string;
  /** As the schedule and the label say. */
  readonly circuitRefrigerant: string;
  /** The driver's pressure at the same moment and place as the gauge's. */
  readonly transducerReading: PascalGauge | null;
  readonly gaugeReading: PascalGauge | null;
  /** By how much the two may differ, in pascals: the gauge's accuracy, with the transducer's where it is known. */
  readonly gaugeAccuracyPa: number;
  /** The driver's coil outlet sensor in stirred crushed ice and water. */
  readonly iceBathReading: Kelvin | null;
  readonly sensorAccuracy: KelvinDifference;
  /** Opening that the driver shows while the coil runs steadily, 0 to 100 %. */
  readonly openPercent: number | null;
  /** Middle of the stroke; 30 to 80 % when left out. */
  readonly minOpenPercent?: number;
  readonly maxOpenPercent?: number;
}

/**
 * `refrigerant`: the driver works with the circuit's. `transducer`: it agrees with the gauge. `sensor`: it reads 0 °C in
 * ice. `stroke`: the valve sits in the middle of its stroke.
 */
export type ElectronicValveCheck = 'refrigerant' | 'transducer' | 'sensor' | 'stroke';

export interface ElectronicValveFinding {
  readonly check: ElectronicValveCheck;
  /** `notJudged`: it wasn't read. A figure that is no number is `outside`. */
  readonly outcome: 'within' | 'outside' | 'notJudged';
  readonly working: Working;
}

/** Common practice, no source. */
const MIDDLE_OF_STROKE = { minPercent: 30, maxPercent: 80 } as const;

/** Conversion noise only. */
const NOISE = 1e-9;

const COMMON_PRACTICE = 'common practice';

const finding = (
  check: ElectronicValveCheck,
  passes: boolean | null,
  source: string,
  lines: readonly WorkingLine[],
): ElectronicValveFinding => ({
  check,
  outcome: passes === null ? 'notJudged' : passes ? 'within' : 'outside',
  working: { formula: `electronicValve.${check}`, source, lines },
});

const plain = (name: string): string => name.toUpperCase().replace(/[^A-Z0-9]/g, '');

/** Known refrigerants are compared by what they are, others by their letters and digits alone; never by likeness. */
function isSameRefrigerant(a: string, b: string): boolean | null {
  if (plain(a) === '' || plain(b) === '') return null;
  const known = findRefrigerant(a);
  return known !== undefined || findRefrigerant(b) !== undefined
    ? known === findRefrigerant(b)
    : plain(a) === plain(b);
}

function judgeTransducer(inputs: ElectronicValveInputs): ElectronicValveFinding {
  const { transducerReading, gaugeReading, gaugeAccuracyPa } = inputs;
  if (transducerReading === null || gaugeReading === null)
    return finding('transducer', null, COMMON_PRACTICE, []);
  const difference = transducerReading - gaugeReading;
  return finding('transducer', Math.abs(difference) <= gaugeAccuracyPa * (1 + NOISE), COMMON_PRACTICE, [
    { label: 'transducerReading', value: transducerReading, unit: 'Pag' },
    { label: 'gaugeReading', value: gaugeReading, unit: 'Pag' },
    { label: 'gaugeAccuracy', value: gaugeAccuracyPa, unit: 'Pa_diff' },
    { label: 'difference', value: difference, unit: 'Pa_diff' },
  ]);
}

function judgeSensor({ iceBathReading, sensorAccuracy }: ElectronicValveInputs): ElectronicValveFinding {
  const source = 'ice point: 0 °C, ice and water at atmospheric pressure';
  if (iceBathReading === null) return finding('sensor', null, source, []);
  const difference = subtractTemperatures(iceBathReading, kelvin(toSi(0, 'degC')));
  return finding('sensor', Math.abs(difference) <= sensorAccuracy + NOISE, source, [
    { label: 'iceBathReading', value: iceBathReading, unit: 'K' },
    { label: 'sensorAccuracy', value: sensorAccuracy, unit: 'K_diff' },
    { label: 'difference', value: difference, unit: 'K_diff' },
  ]);
}

function judgeStroke(inputs: ElectronicValveInputs): ElectronicValveFinding {
  const { openPercent } = inputs;
  const { minOpenPercent = MIDDLE_OF_STROKE.minPercent, maxOpenPercent = MIDDLE_OF_STROKE.maxPercent } =
    inputs;
  if (openPercent === null) return finding('stroke', null, COMMON_PRACTICE, []);
  const isPossible = openPercent >= 0 && openPercent <= 100;
  const passes = isPossible && openPercent >= minOpenPercent && openPercent <= maxOpenPercent;
  return finding('stroke', passes, COMMON_PRACTICE, [
    { label: 'minOpen', value: toSi(minOpenPercent, 'percent'), unit: 'fraction' },
    { label: 'maxOpen', value: toSi(maxOpenPercent, 'percent'), unit: 'fraction' },
    { label: 'open', value: toSi(openPercent, 'percent'), unit: 'fraction' },
  ]);
}

/**
 * Judges what decides whether an electronic valve and its driver can be trusted: nothing is turned on such a valve.
 *
 * @param inputs pressures in pascals (gauge), temperatures in kelvin, openings in per cent
 * @returns one finding for each of refrigerant, transducer, sensor and stroke, in this order, each with its working
 * @source the checks and the middle of the stroke: common practice, no source; ice point: by definition
 * @example judgeElectronicValve({ driverRefrigerant: 'R404A', circuitRefrigerant: 'R-448A', … })[0].outcome // 'outside'
 */
export function judgeElectronicValve(inputs: ElectronicValveInputs): ElectronicValveFinding[] {
  const { driverRefrigerant, circuitRefrigerant } = inputs;
  return [
    finding('refrigerant', isSameRefrigerant(driverRefrigerant, circuitRefrigerant), COMMON_PRACTICE, []),
    judgeTransducer(inputs),
    judgeSensor(inputs),
    judgeStroke(inputs),
  ];
}
