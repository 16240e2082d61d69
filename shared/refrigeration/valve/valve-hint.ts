import { kelvinDifference, type KelvinDifference, type Second } from '../../units/quantity';
import { judgeSuperheat, type SuperheatBand } from '../superheat-band';
import { standingOf } from '../uncertainty/standing';
import type { Working, WorkingLine } from '../working';
import { turnSize, type TurnSize } from './turn-size';
import {
  isAgainstSheet,
  netTurns,
  settling,
  type ClockwiseEffect,
  type TurnDirection,
  type ValveLog,
} from './valve-log';

/**
 * What to do with a valve next. `liquid`: superheat at or below zero, raise it now. `wait`: not settled since the last
 * turn. `leave`: within the band. `responseAgainstSheet`: the last turn did the opposite of what the sheet says, look again
 * before turning on. `withinError`: outside the band by no more than the instruments' error, which
 * doesn't reach down to zero: don't chase it. `close`:
 * close gently, which raises the superheat. `open`: open gently, which lowers it.
 */
export type ValveHintCode =
  'liquid' | 'wait' | 'leave' | 'responseAgainstSheet' | 'withinError' | 'close' | 'open';

export interface ValveHintInputs {
  /** As the fixture's specification allows. */
  readonly band: SuperheatBand;
  /** Mean of the swing where the valve hunts. */
  readonly superheat: KelvinDifference;
  /** From the valve's own sheet; null when nobody has read it. */
  readonly clockwiseDoes: ClockwiseEffect | null;
  readonly log: ValveLog;
  /** On the log's clock. */
  readonly now: Second;
  /** As the valve's or the case's sheet asks. */
  readonly wait: Second;
  /** Of the superheat, see `superheatUncertainty`; left out it counts as zero. */
  readonly uncertainty?: KelvinDifference;
}

export interface ValveHint {
  readonly ok: true;
  readonly code: ValveHintCode;
  /** What the superheat needs; null when nothing is to be turned. */
  readonly effect: 'raise' | 'lower' | null;
  /** Which way to turn; null when nothing is to be turned, the sheet isn't known, or the valve's answer contradicts it. */
  readonly direction: TurnDirection | null;
  readonly size: TurnSize | null;
  /** Where the size comes from. */
  readonly sizedBy: 'observed' | 'commonPractice' | null;
  /** What is left to wait; zero when settled. */
  readonly remaining: Second;
  readonly working: Working;
}

export type ValveHintResult =
  | ValveHint
  | { readonly ok: false; readonly reason: 'notFinite' | 'bandSwapped' | 'notATurn' | 'outOfOrder' };

function codeOf(inputs: ValveHintInputs, uncertainty: KelvinDifference): ValveHintCode {
  const { band, superheat, clockwiseDoes, log, now, wait } = inputs;
  const { outcome, side, liquidRisk } = judgeSuperheat(superheat, band);
  if (liquidRisk) return 'liquid';
  if (!settling(log, now, wait).settled) return 'wait';
  if (outcome === 'within') return 'leave';
  if (isAgainstSheet(log, clockwiseDoes)) return 'responseAgainstSheet';
  // Where the error reaches down to zero there may be liquid: that is worth a turn.
  const mayBeLiquid = side === 'low' && superheat <= uncertainty;
  if (!mayBeLiquid && standingOf(superheat, band, uncertainty) === 'outsideWithinError') return 'withinError';
  return side === 'low' ? 'close' : 'open';
}

const EFFECTS: Readonly<Partial<Record<ValveHintCode, 'raise' | 'lower'>>> = {
  liquid: 'raise',
  close: 'raise',
  open: 'lower',
};

function directionOf(
  effect: 'raise' | 'lower' | null,
  { clockwiseDoes, log }: ValveHintInputs,
): TurnDirection | null {
  if (effect === null || clockwiseDoes === null || isAgainstSheet(log, clockwiseDoes)) return null;
  return (effect === 'raise') === (clockwiseDoes === 'raisesSuperheat') ? 'clockwise' : 'counterclockwise';
}

function findFault({ band, superheat, log, now, wait, uncertainty = kelvinDifference(0) }: ValveHintInputs) {
  if (![band.low, band.high, superheat, now, wait].every(Number.isFinite)) return 'notFinite';
  if (!Number.isFinite(uncertainty) || uncertainty < 0) return 'notFinite';
  if (band.low > band.high) return 'bandSwapped';
  const turned = netTurns(log);
  return turned.ok ? null : turned.reason;
}

/**
 * What to do with a thermostatic valve next. A hint, never an instruction: which way to turn is only said when the valve's
 * own sheet says what clockwise does, since makers differ, and never when the valve's answer contradicts that sheet.
 *
 * Order: liquid comes before the wait; the wait before anything else; a superheat within its band is left alone.
 *
 * @param inputs band, superheat and uncertainty in kelvin, the log, the clock and the wait in seconds
 * @returns the hint with its working, or why there is none: a figure that is no number, a band with its edges swapped, a
 *   log with an entry that is no turn or out of order
 * @source at most half a turn at a time, then wait: a case maker's installation manual; sizes see `turnSize`
 * @example valveHint({ band 6 to 8 °F, superheat 12 °F, clockwiseDoes: 'raisesSuperheat', log: [], … })
 *   // open, lower, counterclockwise, quarter turn by common practice
 */
export function valveHint(inputs: ValveHintInputs): ValveHintResult {
  const fault = findFault(inputs);
  if (fault !== null) return { ok: false, reason: fault };
  const { band, superheat, log, now, wait, uncertainty = kelvinDifference(0) } = inputs;
  const code = codeOf(inputs, uncertainty);
  const effect = EFFECTS[code] ?? null;
  const sized = effect === null ? null : turnSize(inputs, code === 'liquid');
  const { remaining, sinceLastTurn } = settling(log, now, wait);
  const lines: WorkingLine[] = [
    { label: 'bandLow', value: band.low, unit: 'K_diff' },
    { label: 'bandHigh', value: band.high, unit: 'K_diff' },
    { label: 'uncertainty', value: uncertainty, unit: 'K_diff' },
    ...(sinceLastTurn === null ? [] : [{ label: 'sinceLastTurn', value: sinceLastTurn, unit: 's' } as const]),
    ...(sized === null ? [] : sized.lines),
    { label: 'superheat', value: superheat, unit: 'K_diff' },
  ];
  return {
    ok: true,
    code,
    effect,
    direction: directionOf(effect, inputs),
    size: sized?.size ?? null,
    sizedBy: sized?.sizedBy ?? null,
    remaining,
    working: {
      formula: `valveHint.${code}`,
      source: 'common practice; the valve’s own sheet for the direction',
      lines,
    },
  };
}
