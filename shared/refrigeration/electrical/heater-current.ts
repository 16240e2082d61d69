import { ampere, watt, type Ampere, type Volt, type Watt } from '../../units/quantity';
import type { Working } from '../working';
import { heaterFault, type HeaterFault } from './heater-fault';
import { heaterWorking } from './heater-working';

export type HeaterSupply = 'onePhase' | 'threePhase';

/** What the nameplate says. A nameplate current without a voltage can't follow the voltage measured. */
export type HeaterRating =
  | { readonly kind: 'power'; readonly power: Watt; readonly voltage: Volt }
  | { readonly kind: 'current'; readonly current: Ampere; readonly voltage: Volt | null };

export interface HeaterCurrentInputs {
  readonly supply: HeaterSupply;
  readonly rating: HeaterRating;
  /** At the heater while it heats; line to line on three phases. */
  readonly measuredVoltage: Volt;
  /** One current on one phase, three on three phases. */
  readonly legs: readonly Ampere[];
  /** How far a leg may be from the expected current, as a fraction of it; `DEFAULT_HEATER_TOLERANCE` when left out. */
  readonly tolerance?: number;
}

export interface HeaterLeg {
  readonly current: Ampere;
  /** (measured − expected) ÷ expected: −1 when nothing flows. */
  readonly deviation: number;
  readonly outcome: 'within' | 'outside';
}

export type HeaterRefusal =
  'notFinite' | 'notPositive' | 'negativeCurrent' | 'wrongNumberOfLegs' | 'toleranceNotAFraction';

export type HeaterCurrentResult =
  | {
      readonly ok: true;
      readonly outcome: 'within' | 'outside';
      /** In each line, at the measured voltage. */
      readonly expected: Ampere;
      /** Of the whole heater, at the measured voltage. */
      readonly expectedPower: Watt;
      readonly legs: readonly HeaterLeg[];
      /** Largest deviation of a leg from the legs' average, as a fraction of it; null on one phase or without current. */
      readonly imbalance: number | null;
      /** Null when no leg is dead and no pattern is clear. */
      readonly fault: HeaterFault | null;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: HeaterRefusal };

/** A tenth either way: common practice, no source. */
export const DEFAULT_HEATER_TOLERANCE = 0.1;

/** Wide enough for conversion noise, far too narrow for any clamp meter. */
const NOISE = 1e-9;

function refusalOf(inputs: HeaterCurrentInputs, tolerance: number): HeaterRefusal | null {
  const { supply, rating, measuredVoltage, legs } = inputs;
  const rated = rating.kind === 'power' ? rating.power : rating.current;
  const positive = [rated, rating.voltage ?? measuredVoltage, measuredVoltage];
  if (![...positive, ...legs, tolerance].every(Number.isFinite)) return 'notFinite';
  if (positive.some((value) => value <= 0)) return 'notPositive';
  if (legs.length !== (supply === 'onePhase' ? 1 : 3)) return 'wrongNumberOfLegs';
  if (legs.some((current) => current < 0)) return 'negativeCurrent';
  return tolerance < 0 || tolerance >= 1 ? 'toleranceNotAFraction' : null;
}

const phaseFactor = (supply: HeaterSupply): number => (supply === 'onePhase' ? 1 : Math.sqrt(3));

/**
 * The current in each line of a resistance heater at the voltage that it really gets. Its resistance stays, so the power
 * follows the square of the voltage and the current the voltage.
 *
 * @param supply one phase (I = P ÷ V) or three balanced ones (I = P ÷ (√3·V))
 * @param rating nameplate watts at volts, or amperes at volts
 * @param voltage at the heater in volts, line to line on three phases
 * @returns amperes in each line; NaN when something isn't a number, the caller checks
 * @source Ohm's law
 * @example expectedHeaterCurrent('threePhase', { kind: 'power', power: 6 kW, voltage: 208 V }, volt(208)) // 16.65 A
 */
export function expectedHeaterCurrent(supply: HeaterSupply, rating: HeaterRating, voltage: Volt): Ampere {
  if (rating.kind === 'current') return ampere(rating.current * (voltage / (rating.voltage ?? voltage)));
  const ratedCurrent = rating.power / (phaseFactor(supply) * rating.voltage);
  return ampere(ratedCurrent * (voltage / rating.voltage));
}

function imbalanceOf(legs: readonly Ampere[]): number | null {
  const average = legs.reduce((sum, current) => sum + current, 0) / legs.length;
  if (legs.length < 2 || average <= 0) return null;
  return Math.max(...legs.map((current) => Math.abs(current - average))) / average;
}

/**
 * Judges the measured currents of a defrost heater, leg by leg, against its nameplate at the voltage it gets.
 *
 * @param inputs watts, volts, amperes; tolerance as a fraction
 * @returns outcome (within when every leg is), figures and working, or the reason why there is none
 * @range resistance heaters whose resistance hardly changes with temperature; three phases loaded equally
 * @source Ohm's law; tolerance: the template's, else common practice; patterns: see `heaterFault`
 * @example judgeHeaterCurrent({ threePhase, 6 kW at 208 V, measured 208 V, legs 16.6 0 16.7 A }) // outside, legOpen
 */
export function judgeHeaterCurrent(inputs: HeaterCurrentInputs): HeaterCurrentResult {
  const { supply, rating, measuredVoltage, tolerance = DEFAULT_HEATER_TOLERANCE } = inputs;
  const refusal = refusalOf(inputs, tolerance);
  if (refusal !== null) return { ok: false, reason: refusal };
  const expected = expectedHeaterCurrent(supply, rating, measuredVoltage);
  const expectedPower = watt(expected * measuredVoltage * phaseFactor(supply));
  const legs = inputs.legs.map((current): HeaterLeg => {
    const deviation = (current - expected) / expected;
    return {
      current,
      deviation,
      outcome: Math.abs(deviation) <= tolerance + NOISE ? 'within' : 'outside',
    };
  });
  return {
    ok: true,
    outcome: legs.every((leg) => leg.outcome === 'within') ? 'within' : 'outside',
    expected,
    expectedPower,
    legs,
    imbalance: imbalanceOf(inputs.legs),
    fault: heaterFault(inputs.legs.map((current) => current / expected)),
    working: heaterWorking({ inputs, tolerance, expected, expectedPower, legs }),
  };
}
