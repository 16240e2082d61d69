import { convert } from '../units/convert';
import {
  kelvin,
  pascalGauge,
  subtractTemperatures,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';
import { UNITS, type UnitId } from '../units/unit';
import { toAbsolute } from './gauge-pressure';
import {
  plausibleLineTemperature,
  plausibleSuctionPressure,
  type Doubt,
  type DoubtKind,
} from './plausibility';
import type { SaturationTable } from './saturation/saturation-table';
import { dewTemperature } from './saturation/saturation-curve';

/** The two numbers of a superheat reading as they were typed. */
export interface TypedSuperheatInputs {
  readonly table: SaturationTable;
  readonly atmosphere: PascalAbsolute;
  readonly pressureTyped: number;
  /** A unit of gauge or absolute pressure. */
  readonly pressureUnit: UnitId;
  readonly temperatureTyped: number;
  /** A unit of temperature. */
  readonly temperatureUnit: UnitId;
}

/** A closed range of superheats in kelvin. */
interface SuperheatRange {
  readonly fromK: number;
  readonly toK: number;
}

// From experience, no publication. Possible: flooded to starved. Usual: nobody is asked anything. Convincing: what the
// numbers must give in the other reading before a mistake is suspected.
const POSSIBLE: SuperheatRange = { fromK: -6, toK: 40 };
const USUAL: SuperheatRange = { fromK: -3, toK: 20 };
const CONVINCING: SuperheatRange = { fromK: 1, toK: 12 };

function gaugeOf(typed: TypedSuperheatInputs): PascalGauge {
  const { pressureTyped, pressureUnit, atmosphere } = typed;
  if (UNITS[pressureUnit].dimension === 'absolutePressure') {
    return pascalGauge(convert(pressureTyped, pressureUnit, 'Pa') - atmosphere);
  }
  return pascalGauge(convert(pressureTyped, pressureUnit, 'Pag'));
}

const lineOf = (typed: TypedSuperheatInputs) =>
  kelvin(convert(typed.temperatureTyped, typed.temperatureUnit, 'K'));

/** Doubts about each number by itself. */
const singleDoubts = (typed: TypedSuperheatInputs): Doubt[] =>
  [
    plausibleSuctionPressure(typed.table, gaugeOf(typed), typed.atmosphere),
    plausibleLineTemperature(lineOf(typed)),
  ].filter((doubt) => doubt !== null);

/** Whether the numbers give a superheat in the range; never where there is no dew temperature. */
function gives(typed: TypedSuperheatInputs, range: SuperheatRange): boolean {
  const dew = dewTemperature(typed.table, toAbsolute(gaugeOf(typed), typed.atmosphere));
  if (!dew.ok) return false;
  const superheat = subtractTemperatures(lineOf(typed), dew.temperature);
  return superheat >= range.fromK && superheat <= range.toK;
}

const isConvincing = (typed: TypedSuperheatInputs): boolean =>
  singleDoubts(typed).length === 0 && gives(typed, CONVINCING);

/** Other readings of the same two numbers, each with the mistake that it would reveal. */
function otherReadings(typed: TypedSuperheatInputs): readonly (readonly [DoubtKind, TypedSuperheatInputs])[] {
  const { pressureTyped, temperatureTyped, temperatureUnit } = typed;
  const swapped = { ...typed, pressureTyped: temperatureTyped, temperatureTyped: pressureTyped };
  const readings: [DoubtKind, TypedSuperheatInputs][] = [['swapped', swapped]];
  if (temperatureUnit === 'degF')
    readings.push(['celsiusInFahrenheit', { ...typed, temperatureUnit: 'degC' }]);
  if (temperatureUnit === 'degC')
    readings.push(['fahrenheitInCelsius', { ...typed, temperatureUnit: 'degF' }]);
  return readings;
}

/**
 * What is odd about the two numbers of a superheat reading, before it is worked out. Built for few false alarms: a usual
 * superheat of plausible numbers raises nothing, and a mistake is only named when undoing it gives a convincing reading.
 *
 * @param typed the numbers as typed with their units
 * @returns refusals first; empty when nothing is odd. A named mistake replaces the general `notPlausible`
 * @throws {UnitMismatch} when a unit is no pressure or no temperature, which is a mistake in code
 * @range asked: superheat outside −6 to 40 K, or outside −3 to 20 K where another reading gives 1 to 12 K
 * @source experience, no publication
 * @example doubtSuperheatInputs({ …, pressureTyped: -14, temperatureTyped: 16 }) // R-404A, psig and °F: swapped
 */
export function doubtSuperheatInputs(typed: TypedSuperheatInputs): Doubt[] {
  const singles = singleDoubts(typed);
  if (singles.some((doubt) => doubt.kind === 'notFinite')) return singles;
  if (singles.length === 0 && gives(typed, USUAL)) return [];
  const refusals = singles.filter((doubt) => doubt.severity === 'refuse');
  const mistakes = otherReadings(typed)
    .filter(([, reading]) => isConvincing(reading))
    .map(([kind]): Doubt => ({ kind, severity: 'ask', about: kind === 'swapped' ? 'both' : 'temperature' }));
  if (mistakes.length > 0) return [...refusals, ...mistakes];
  if (singles.length > 0) return [...refusals, ...singles.filter((doubt) => doubt.severity === 'ask')];
  return gives(typed, POSSIBLE) ? [] : [{ kind: 'notPlausible', severity: 'ask', about: 'both' }];
}
