import type { SuperheatAnswer, SuperheatObservation, SuperheatPair } from '#shared/checklist/kinds/superheat';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import type { Lacking } from './lacking';
import { typedOrNull } from './typed-text';

/** Two boxes of one pair, as texts. */
export interface TypedPair {
  readonly pressure: string;
  readonly temperature: string;
}

/** An observation in the making. All boxes are kept, so that switching the valve and back loses nothing. */
export interface TypedObservation {
  readonly valve: 'steady' | 'hunting';
  readonly pair: TypedPair;
  readonly low: TypedPair;
  readonly high: TypedPair;
}

export interface TypedSuperheat {
  readonly asFound: TypedObservation;
  readonly asLeft: TypedObservation;
}

const EMPTY_PAIR: TypedPair = { pressure: '', temperature: '' };
const EMPTY: TypedObservation = { valve: 'steady', pair: EMPTY_PAIR, low: EMPTY_PAIR, high: EMPTY_PAIR };

/** A form with nothing typed, or with what was recorded before. Texts stay in the unit they were typed in. */
export function startSuperheat(previous: SuperheatAnswer | null): TypedSuperheat {
  return {
    asFound: previous?.asFound ? startObservation(previous.asFound) : EMPTY,
    asLeft: previous ? startObservation(previous.asLeft) : EMPTY,
  };
}

function startObservation(observation: SuperheatObservation): TypedObservation {
  if (observation.valve === 'steady') return { ...EMPTY, pair: textsOf(observation.pair) };
  return { ...EMPTY, valve: 'hunting', low: textsOf(observation.low), high: textsOf(observation.high) };
}

const textsOf = (pair: SuperheatPair): TypedPair => ({
  pressure: pair.pressure.text,
  temperature: pair.temperature.text,
});

/** A pair with the opening's units, or `null` while a box is empty. */
export function pairOf(typed: TypedPair, system: UnitSystem): SuperheatPair | null {
  const pressure = typedOrNull(typed.pressure, displayUnit('gaugePressure', system));
  const temperature = typedOrNull(typed.temperature, displayUnit('temperature', system));
  return pressure && temperature ? { pressure, temperature } : null;
}

/** Whether nothing was typed in the boxes that the valve's behaviour asks for. */
export function isBlank(typed: TypedObservation): boolean {
  const pairs = typed.valve === 'steady' ? [typed.pair] : [typed.low, typed.high];
  return pairs.every((pair) => pair.pressure.trim() === '' && pair.temperature.trim() === '');
}

export function observationOf(typed: TypedObservation, system: UnitSystem): SuperheatObservation | null {
  if (typed.valve === 'steady') {
    const pair = pairOf(typed.pair, system);
    return pair && { valve: 'steady', pair };
  }
  const low = pairOf(typed.low, system);
  const high = pairOf(typed.high, system);
  return low && high && { valve: 'hunting', low, high };
}

/** What still has to be typed before there is an answer; `null` when nothing has. */
export function superheatLacks(typed: TypedSuperheat): Lacking | null {
  if (isBlank(typed.asLeft)) return lackOf(typed.asFound, 'asFound') ?? 'asLeft';
  return lackOf(typed.asFound, 'asFound') ?? lackOf(typed.asLeft, 'asLeft');
}

function lackOf(typed: TypedObservation, look: 'asFound' | 'asLeft'): Lacking | null {
  if (isBlank(typed)) return null;
  const pairs = typed.valve === 'steady' ? [typed.pair] : [typed.low, typed.high];
  const isEmpty = (text: string): boolean => typedOrNull(text, 'degF') === null;
  if (pairs.some((pair) => isEmpty(pair.pressure))) return `${look}Pressure`;
  return pairs.some((pair) => isEmpty(pair.temperature)) ? `${look}Temperature` : null;
}

/**
 * The answer that the boxes make.
 *
 * @returns `null` while the as-left isn't complete, or an as-found was begun and isn't complete
 */
export function superheatAnswerOf(typed: TypedSuperheat, system: UnitSystem): SuperheatAnswer | null {
  const asLeft = observationOf(typed.asLeft, system);
  if (!asLeft) return null;
  if (isBlank(typed.asFound)) return { kind: 'superheat', asFound: null, asLeft };
  const asFound = observationOf(typed.asFound, system);
  return asFound && { kind: 'superheat', asFound, asLeft };
}
