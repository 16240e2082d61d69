import { toSi } from '../../units/convert';
import { second, type Second } from '../../units/quantity';
import { fahrenheitDifference } from '../readings.fixture';
import type { TurnDirection, ValveTurn } from './valve-log';

export const minutes = (value: number): Second => second(toSi(value, 'min'));

/** A turn as a fitter would note it: minutes and °F; null where nothing was read. */
export const turn = (
  turns: number,
  direction: TurnDirection,
  atMinutes = 0,
  before: number | null = null,
  after: number | null = null,
): ValveTurn => ({
  turns,
  direction,
  at: minutes(atMinutes),
  superheatBefore: before === null ? null : fahrenheitDifference(before),
  superheatAfter: after === null ? null : fahrenheitDifference(after),
});
