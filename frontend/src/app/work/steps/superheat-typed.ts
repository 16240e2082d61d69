import type {
  SuperheatAnswer,
  SuperheatCondition,
  SuperheatObservation,
  SuperheatPair,
  ValveTurn,
} from '#shared/checklist/kinds/superheat';
import { sinceText } from '../coil-walk/clock-text';

/** Two boxes of one pair, as texts. */
export interface TypedPair {
  readonly pressure: string;
  readonly temperature: string;
}

/** One row of a series: the pair, and how long after the first it was read ("4:30"). */
export interface TypedReading extends TypedPair {
  readonly since: string;
}

export type ValveMode = SuperheatObservation['valve'];

/** A logger's file as it was taken; the file itself is gone when the page closes. */
export type TakenLog = Omit<SuperheatObservation & { valve: 'log' }, 'valve'>;

/** An observation in the making. All boxes are kept, so that switching the valve and back loses nothing. */
export interface TypedObservation {
  readonly valve: ValveMode;
  readonly pair: TypedPair;
  readonly low: TypedPair;
  readonly high: TypedPair;
  readonly readings: readonly TypedReading[];
  /** The phone's clock at the first reading of the series; `null` before it, or when the series came from a record. */
  readonly seriesFrom: string | null;
  readonly log: TakenLog | null;
}

/** A turn in the making. What was read before it is kept beside it: after the turn it is no as-left any more. */
export interface TypedTurn extends ValveTurn {
  /** The superheat before the turn in kelvin, where it had settled. */
  readonly beforeK: number | null;
  readonly readBefore: TypedObservation | null;
}

export interface TypedInstruments {
  readonly gauge: NonNullable<SuperheatAnswer['instruments']>['gauge'];
  readonly pressureAccuracy: string;
  readonly temperatureAccuracy: string;
  /** The station pressure that somebody read here today; the phone doesn't remember it. */
  readonly barometer?: string;
}

export interface TypedSuperheat {
  readonly asFound: TypedObservation;
  readonly asLeft: TypedObservation;
  readonly turns: readonly TypedTurn[];
  readonly clockwise: NonNullable<SuperheatAnswer['clockwise']> | null;
  readonly conditions: readonly SuperheatCondition[];
  readonly takenAt: NonNullable<SuperheatAnswer['takenAt']>;
  readonly lineDrop: string;
  readonly instruments: TypedInstruments;
  /** When the as-left was typed last, by the phone's clock. */
  readonly leftAtMs?: number;
}

const EMPTY_PAIR: TypedPair = { pressure: '', temperature: '' };
export const EMPTY_OBSERVATION: TypedObservation = {
  valve: 'steady',
  pair: EMPTY_PAIR,
  low: EMPTY_PAIR,
  high: EMPTY_PAIR,
  readings: [],
  seriesFrom: null,
  log: null,
};
export const NO_INSTRUMENTS: TypedInstruments = {
  gauge: 'vented',
  pressureAccuracy: '',
  temperatureAccuracy: '',
};

/** What a form without an answer starts from: what this phone knows already. */
export interface KnownBefore {
  readonly instruments: TypedInstruments;
  readonly conditions: readonly SuperheatCondition[];
}
const NOTHING_KNOWN: KnownBefore = { instruments: NO_INSTRUMENTS, conditions: [] };

/** A form with nothing typed, or with what was recorded before. Texts stay in the unit they were typed in. */
export function startSuperheat(
  previous: SuperheatAnswer | null,
  known: KnownBefore = NOTHING_KNOWN,
): TypedSuperheat {
  return {
    asFound: previous?.asFound ? startObservation(previous.asFound) : EMPTY_OBSERVATION,
    asLeft: previous ? startObservation(previous.asLeft) : EMPTY_OBSERVATION,
    turns: (previous?.turns ?? []).map((turn) => ({ ...turn, beforeK: null, readBefore: null })),
    clockwise: previous?.clockwise ?? null,
    conditions: previous ? (previous.conditions ?? []) : known.conditions,
    takenAt: previous?.takenAt ?? 'coilOutlet',
    lineDrop: previous?.lineDrop?.text ?? '',
    instruments: previous ? startInstruments(previous) : known.instruments,
  };
}

function startInstruments({ instruments }: SuperheatAnswer): TypedInstruments {
  if (!instruments) return NO_INSTRUMENTS;
  return {
    gauge: instruments.gauge,
    pressureAccuracy: instruments.pressureAccuracy?.text ?? '',
    temperatureAccuracy: instruments.temperatureAccuracy?.text ?? '',
    ...(instruments.barometer ? { barometer: instruments.barometer.text } : {}),
  };
}

function startObservation(observation: SuperheatObservation): TypedObservation {
  const { valve } = observation;
  if (valve === 'steady') return { ...EMPTY_OBSERVATION, pair: textsOf(observation.pair) };
  if (valve === 'hunting')
    return { ...EMPTY_OBSERVATION, valve, low: textsOf(observation.low), high: textsOf(observation.high) };
  if (valve === 'series') {
    const readings = observation.readings.map((reading) => ({
      ...textsOf(reading),
      since: sinceText(reading.atS),
    }));
    return { ...EMPTY_OBSERVATION, valve, readings };
  }
  const { file, atS, pressurePag, temperatureK } = observation;
  return { ...EMPTY_OBSERVATION, valve, log: { file, atS, pressurePag, temperatureK } };
}

const textsOf = (pair: SuperheatPair): TypedPair => ({
  pressure: pair.pressure.text,
  temperature: pair.temperature.text,
});

/** Whether nothing was typed in the two boxes. */
export const isBlankPair = (pair: TypedPair): boolean =>
  pair.pressure.trim() === '' && pair.temperature.trim() === '';

/** The pairs that the valve's behaviour asks for; none of a logger's file. */
export function pairsOf(typed: TypedObservation): readonly TypedPair[] {
  if (typed.valve === 'steady') return [typed.pair];
  if (typed.valve === 'hunting') return [typed.low, typed.high];
  return typed.valve === 'series' ? typed.readings : [];
}

/** Whether nothing was typed in the boxes that the valve's behaviour asks for. */
export function isBlank(typed: TypedObservation): boolean {
  return typed.valve === 'log' ? typed.log === null : pairsOf(typed).every(isBlankPair);
}

/** A draft as it was kept by this browser, or `null` when it is none of this kind and version. */
export function keptSuperheat(kept: unknown): TypedSuperheat | null {
  if (typeof kept !== 'object' || kept === null) return null;
  const fresh = startSuperheat(null);
  return Object.keys(fresh).every((key) => key in kept) && Array.isArray((kept as TypedSuperheat).turns)
    ? (kept as TypedSuperheat)
    : null;
}
