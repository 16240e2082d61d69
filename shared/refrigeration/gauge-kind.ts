import {
  pascalAbsolute,
  pascalGauge,
  subtractTemperatures,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from './gauge-pressure';
import { sourceOf } from './saturation-reading';
import { dewTemperature, type SaturationFailure } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';
import type { Working } from './working';

/**
 * What a gauge reads against. `vented`: the atmosphere around it. `sealed`: the atmosphere enclosed when it was made,
 * usually sea level's. `absolute`: a vacuum. `taredAtPowerUp`: the atmosphere in which it was last switched on and zeroed.
 */
export type GaugeKind = 'vented' | 'sealed' | 'absolute' | 'taredAtPowerUp';

/** A reading and what must be known about its gauge. */
export interface GaugeReading {
  readonly kind: GaugeKind;
  /** What the gauge shows, in pascals; of an absolute gauge above a vacuum, of the others above what they read against. */
  readonly readingPa: number;
  /** Where the gauge is read now. */
  readonly atmosphere: PascalAbsolute;
  /** Of a sealed gauge, what is enclosed; of a tared one, where it was zeroed. Left out: sea level, and here. */
  readonly zeroedAt?: PascalAbsolute;
}

export type GaugeKindResult =
  | { readonly ok: true; readonly pressure: PascalAbsolute; readonly zero: PascalAbsolute }
  | { readonly ok: false; readonly reason: 'notFinite' | 'deeperThanVacuum' };

/** The pressure at which the gauge shows zero. */
function zeroOf({ kind, atmosphere, zeroedAt }: GaugeReading): PascalAbsolute {
  if (kind === 'absolute') return pascalAbsolute(0);
  if (kind === 'sealed') return zeroedAt ?? SEA_LEVEL_ATMOSPHERE;
  if (kind === 'taredAtPowerUp') return zeroedAt ?? atmosphere;
  return atmosphere;
}

/**
 * The absolute pressure behind a reading, by the kind of its gauge.
 *
 * @param reading in pascals with the gauge's kind and the atmospheres
 * @returns absolute pressure and the zero it was counted from, in pascals, or the reason why there is none
 * @range readings above a perfect vacuum
 * @source ways of referencing gauges: common practice, no source
 * @example toAbsoluteByGauge({ kind: 'sealed', readingPa: 10 psi, atmosphere: at 5280 ft }) // 24.696 psia, not 22.100
 */
export function toAbsoluteByGauge(reading: GaugeReading): GaugeKindResult {
  const zero = zeroOf(reading);
  const pressure = toAbsolute(pascalGauge(reading.readingPa), zero);
  if (!Number.isFinite(pressure) || !Number.isFinite(zero)) return { ok: false, reason: 'notFinite' };
  return pressure <= 0 ? { ok: false, reason: 'deeperThanVacuum' } : { ok: true, pressure, zero };
}

/** Why a digital gauge's own saturation temperature is not ours. `samePressure`: both rest on the same pressure. */
export type GaugeDifferenceCause = 'assumesSeaLevel' | 'sealedGauge' | 'samePressure';

export type GaugeDifferenceResult =
  | {
      readonly ok: true;
      /** The gauge's dew temperature minus ours: positive where it reads warm and its superheat is too low. */
      readonly difference: KelvinDifference;
      readonly cause: GaugeDifferenceCause;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: SaturationFailure | 'deeperThanVacuum' };

/** Two pressures closer than this are the same; far below any gauge. */
const SAME_PA = 1;

/** What the gauge's own electronics take for the pressure: its zero where that is built in, else sea level's atmosphere. */
function shownBy(reading: GaugeReading): PascalAbsolute {
  const isBuiltIn = reading.kind === 'sealed' || reading.kind === 'absolute';
  return toAbsolute(pascalGauge(reading.readingPa), isBuiltIn ? zeroOf(reading) : SEA_LEVEL_ATMOSPHERE);
}

/** What the reading means here: a sealed gauge's as it would be taken down, as if it were a vented one. */
function takenHere(reading: GaugeReading): PascalAbsolute {
  const zero = reading.kind === 'sealed' ? reading.atmosphere : zeroOf(reading);
  return toAbsolute(pascalGauge(reading.readingPa), zero);
}

function causeOf({ kind }: GaugeReading, shown: PascalAbsolute, ours: PascalAbsolute): GaugeDifferenceCause {
  if (Math.abs(shown - ours) < SAME_PA) return 'samePressure';
  return kind === 'sealed' ? 'sealedGauge' : 'assumesSeaLevel';
}

/**
 * By how much the dew temperature on a digital gauge differs from ours for the very same reading. Ours adds the local
 * atmosphere; such a gauge usually adds sea level's. With `assumesSeaLevel` ours is right. With `sealedGauge` the gauge
 * is right, and its reading has to go through `toAbsoluteByGauge` first.
 *
 * @param table of the refrigerant
 * @param reading in pascals with the gauge's kind and the atmospheres
 * @returns the gauge's dew temperature minus ours in kelvin, with its cause and working, or the reason why there is none
 * @range where `dewTemperature` answers for both pressures
 * @source the table's `source` and `reference`; that digital gauges assume sea level is common practice, no source
 * @example gaugeTemperatureDifference(R_448A, { vented, 10 psig, at 5280 ft }) // +4.5 °F, assumesSeaLevel
 */
export function gaugeTemperatureDifference(
  table: SaturationTable,
  reading: GaugeReading,
): GaugeDifferenceResult {
  const truth = toAbsoluteByGauge(reading);
  if (!truth.ok) return truth;
  const shown = shownBy(reading);
  const ours = takenHere(reading);
  const compared = compareDew(table, shown, ours);
  if (!compared.ok) return compared;
  const { difference, a: gaugeDew, b: ourDew } = compared;
  const working: Working = {
    formula: 'gaugeTemperatureDifference',
    source: sourceOf(table),
    lines: [
      { label: 'reading', value: reading.readingPa, unit: reading.kind === 'absolute' ? 'Pa' : 'Pag' },
      { label: 'atmosphere', value: reading.atmosphere, unit: 'Pa' },
      { label: 'gaugePressureAbsolute', value: shown, unit: 'Pa' },
      { label: 'ourPressureAbsolute', value: ours, unit: 'Pa' },
      { label: 'gaugeDewTemperature', value: gaugeDew, unit: 'K' },
      { label: 'ourDewTemperature', value: ourDew, unit: 'K' },
      { label: 'difference', value: difference, unit: 'K_diff' },
    ],
  };
  return { ok: true, difference, cause: causeOf(reading, shown, ours), working };
}

type ComparedDew =
  | { readonly ok: true; readonly difference: KelvinDifference; readonly a: Kelvin; readonly b: Kelvin }
  | { readonly ok: false; readonly reason: SaturationFailure };

function compareDew(table: SaturationTable, a: PascalAbsolute, b: PascalAbsolute): ComparedDew {
  const dewA = dewTemperature(table, a);
  if (!dewA.ok) return dewA;
  const dewB = dewTemperature(table, b);
  if (!dewB.ok) return dewB;
  const difference = subtractTemperatures(dewA.temperature, dewB.temperature);
  return { ok: true, difference, a: dewA.temperature, b: dewB.temperature };
}

export type ElevationShiftResult =
  | { readonly ok: true; readonly shift: KelvinDifference; readonly working: Working }
  | { readonly ok: false; readonly reason: SaturationFailure };

/**
 * What the same needle means here: the dew temperature at this atmosphere minus that at sea level.
 *
 * @param table of the refrigerant
 * @param gaugePressure on a gauge that reads against the atmosphere around it, in pascals
 * @param atmosphere here, absolute, in pascals
 * @returns shift in kelvin with its working, negative above sea level; or the reason why there is none
 * @range where `dewTemperature` answers for both pressures
 * @source the table's `source` and `reference`
 * @example elevationShift(R_448A, 10 psig, at 5280 ft) // −4.5 °F
 */
export function elevationShift(
  table: SaturationTable,
  gaugePressure: PascalGauge,
  atmosphere: PascalAbsolute,
): ElevationShiftResult {
  const here = toAbsolute(gaugePressure, atmosphere);
  const atSeaLevel = toAbsolute(gaugePressure, SEA_LEVEL_ATMOSPHERE);
  const compared = compareDew(table, here, atSeaLevel);
  if (!compared.ok) return compared;
  const { difference, a: dewHere, b: dewAtSeaLevel } = compared;
  const working: Working = {
    formula: 'elevationShift',
    source: sourceOf(table),
    lines: [
      { label: 'gaugePressure', value: gaugePressure, unit: 'Pag' },
      { label: 'atmosphere', value: atmosphere, unit: 'Pa' },
      { label: 'dewTemperatureHere', value: dewHere, unit: 'K' },
      { label: 'dewTemperatureAtSeaLevel', value: dewAtSeaLevel, unit: 'K' },
      { label: 'shift', value: difference, unit: 'K_diff' },
    ],
  };
  return { ok: true, shift: difference, working };
}
