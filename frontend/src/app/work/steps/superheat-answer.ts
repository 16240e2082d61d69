import type {
  SuperheatAnswer,
  SuperheatObservation,
  SuperheatPair,
  ValveTurn,
} from '#shared/checklist/kinds/superheat';
import type { UnitId } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readSince } from '../coil-walk/clock-text';
import { inOrder } from '../coil-walk/valve-wait';
import type { Lacking } from './lacking';
import {
  isBlank,
  isBlankPair,
  pairsOf,
  type TypedInstruments,
  type TypedObservation,
  type TypedPair,
  type TypedReading,
  type TypedSuperheat,
} from './superheat-typed';
import { typedOrNull } from './typed-text';

/** What of a form says how its readings were taken: the same for as found and as left. */
export type ReadHow = Pick<TypedSuperheat, 'takenAt' | 'lineDrop' | 'instruments'>;

/** A pair with the opening's units, or `null` while a box is empty. */
export function pairOf(typed: TypedPair, system: UnitSystem): SuperheatPair | null {
  const pressure = typedOrNull(typed.pressure, displayUnit('gaugePressure', system));
  const temperature = typedOrNull(typed.temperature, displayUnit('temperature', system));
  return pressure && temperature ? { pressure, temperature } : null;
}

/** The observation that the boxes make; `null` while one of them is empty. */
export function observationOf(typed: TypedObservation, system: UnitSystem): SuperheatObservation | null {
  if (typed.valve === 'steady') {
    const pair = pairOf(typed.pair, system);
    return pair && { valve: 'steady', pair };
  }
  if (typed.valve === 'hunting') {
    const low = pairOf(typed.low, system);
    const high = pairOf(typed.high, system);
    return low && high && { valve: 'hunting', low, high };
  }
  if (typed.valve === 'log') return typed.log && { valve: 'log', ...typed.log };
  return seriesOf(typed.readings, system);
}

function seriesOf(rows: readonly TypedReading[], system: UnitSystem): SuperheatObservation | null {
  // "Read now" makes a row; one that nothing was typed into isn't a reading yet.
  const typed = rows.filter((row) => !isBlankPair(row));
  const readings = typed.flatMap((row) => {
    const pair = pairOf(row, system);
    const atS = readSince(row.since);
    return pair && atS !== null ? [{ atS, ...pair }] : [];
  });
  if (readings.length === 0 || readings.length < typed.length) return null;
  const ordered = readings.toSorted((a, b) => a.atS - b.atS);
  const firstS = ordered[0]?.atS ?? 0;
  return { valve: 'series', readings: ordered.map((reading) => ({ ...reading, atS: reading.atS - firstS })) };
}

/** What still has to be typed before there is an answer; `null` when nothing has. */
export function superheatLacks(typed: TypedSuperheat): Lacking | null {
  const found = lackOf(typed.asFound, 'asFound');
  if (isBlank(typed.asLeft)) return found ?? (typed.asLeft.valve === 'log' ? 'log' : 'asLeft');
  const left = found ?? lackOf(typed.asLeft, 'asLeft');
  if (left !== null) return left;
  const isLineDropMissing = typed.takenAt === 'elsewhere' && typedOrNull(typed.lineDrop, 'psi_diff') === null;
  return isLineDropMissing ? 'lineDrop' : null;
}

function lackOf(typed: TypedObservation, look: 'asFound' | 'asLeft'): Lacking | null {
  if (isBlank(typed)) return null;
  const pairs =
    typed.valve === 'series' ? pairsOf(typed).filter((pair) => !isBlankPair(pair)) : pairsOf(typed);
  const isEmpty = (text: string): boolean => typedOrNull(text, 'degF') === null;
  if (pairs.some((pair) => isEmpty(pair.pressure))) return `${look}Pressure`;
  if (pairs.some((pair) => isEmpty(pair.temperature))) return `${look}Temperature`;
  const isTimeless = typed.readings.some((row) => !isBlankPair(row) && readSince(row.since) === null);
  return typed.valve === 'series' && isTimeless ? 'seriesTime' : null;
}

/** What a barometer shows: not the unit in which absolute pressures are shown otherwise. */
export const BAROMETER_UNIT: Readonly<Record<UnitSystem, UnitId>> = { us: 'inHg', si: 'kPaa' };

type HowRead = Pick<SuperheatAnswer, 'takenAt' | 'lineDrop' | 'instruments'>;

/** How the readings were taken, as an answer says it. A plain gauge of unknown accuracy is no news and left out. */
export function howRead({ takenAt, lineDrop, instruments }: ReadHow, system: UnitSystem): HowRead {
  const drop =
    takenAt === 'elsewhere' ? typedOrNull(lineDrop, displayUnit('pressureDifference', system)) : null;
  return {
    takenAt,
    ...(takenAt === 'elsewhere' ? { lineDrop: drop } : {}),
    ...instrumentsOf(instruments, system),
  };
}

function instrumentsOf(typed: TypedInstruments, system: UnitSystem): Pick<SuperheatAnswer, 'instruments'> {
  const pressureAccuracy = typedOrNull(typed.pressureAccuracy, displayUnit('pressureDifference', system));
  const temperatureAccuracy = typedOrNull(
    typed.temperatureAccuracy,
    displayUnit('temperatureDifference', system),
  );
  const barometer = typedOrNull(typed.barometer ?? '', BAROMETER_UNIT[system]);
  if (typed.gauge === 'vented' && !pressureAccuracy && !temperatureAccuracy && !barometer) return {};
  return {
    instruments: {
      gauge: typed.gauge,
      pressureAccuracy,
      temperatureAccuracy,
      ...(barometer ? { barometer } : {}),
    },
  };
}

/** How long after the last turn the as-left was read. */
function waitedOf(
  turns: readonly ValveTurn[],
  leftAtMs: number | undefined,
): Pick<SuperheatAnswer, 'waitedS'> {
  const last = turns.at(-1);
  if (!last || leftAtMs === undefined) return {};
  return { waitedS: Math.max(0, Math.round((leftAtMs - Date.parse(last.at)) / 1000)) };
}

/**
 * The answer that the form makes.
 *
 * @returns `null` while the as-left isn't complete, or an as-found was begun and isn't complete
 */
export function superheatAnswerOf(typed: TypedSuperheat, system: UnitSystem): SuperheatAnswer | null {
  if (superheatLacks(typed) !== null) return null;
  const asLeft = observationOf(typed.asLeft, system);
  const asFound = isBlank(typed.asFound) ? null : observationOf(typed.asFound, system);
  if (!asLeft) return null;
  const { clockwise, conditions } = typed;
  const turns = inOrder(typed.turns).map(({ turns: size, direction, at }) => ({
    turns: size,
    direction,
    at,
  }));
  return {
    kind: 'superheat',
    asFound,
    asLeft,
    ...howRead(typed, system),
    ...(turns.length > 0 ? { turns, ...waitedOf(turns, typed.leftAtMs) } : {}),
    ...(turns.length > 0 || clockwise ? { clockwise } : {}),
    conditions: [...conditions],
  };
}
