import type { Judgement } from '#shared/checklist/judgement';
import { DEFAULT_WAIT_S, type SuperheatStep } from '#shared/checklist/kinds/superheat';
import { valveHint, type ValveHint, type ValveHintCode } from '#shared/refrigeration/valve/valve-hint';
import type { TurnDirection, ValveLog } from '#shared/refrigeration/valve/valve-log';
import type { TurnSize } from '#shared/refrigeration/valve/turn-size';
import { kelvinDifference, second } from '#shared/units/quantity';
import { inOrder, valveWait } from '../coil-walk/valve-wait';
import { figureOf } from './superheat-live';
import { isBlank, type TypedSuperheat, type TypedTurn } from './superheat-typed';

/** Whose reading is the newest: what there is to say about the valve is said of that one. */
export type Newest = 'asFound' | 'asLeft' | null;

/** What was read before a turn says nothing after it: then there is no newest until the as-left is read. */
export function newestLook(typed: TypedSuperheat): Newest {
  if (!isBlank(typed.asLeft)) return 'asLeft';
  return typed.turns.length === 0 && !isBlank(typed.asFound) ? 'asFound' : null;
}

/** The superheat of a judgement that isn't a slip, in kelvin. */
export function readSuperheatK(judgement: Judgement | null): number | null {
  if (judgement?.doubts.some(({ severity }) => severity === 'refuse')) return null;
  return figureOf(judgement, 'superheat');
}

/**
 * The turns as the valve's log, each with the settled superheat before it and after it: what stands before the next turn,
 * and after the last what is read now, once the wait is over.
 */
export function valveLog(turns: readonly TypedTurn[], nowK: number | null): ValveLog {
  const ordered = inOrder(turns);
  return ordered.map((turn, index) => {
    const afterK = index + 1 < ordered.length ? (ordered[index + 1]?.beforeK ?? null) : nowK;
    return {
      turns: turn.turns,
      direction: turn.direction,
      at: second(Date.parse(turn.at) / 1000),
      superheatBefore: turn.beforeK === null ? null : kelvinDifference(turn.beforeK),
      superheatAfter: afterK === null ? null : kelvinDifference(afterK),
    };
  });
}

/**
 * What to say about the valve: the hint's own codes, and two of readings with a swing. `liquidAtLowest`: the mean is above
 * zero, the lowest isn't. `huntsInBand`: the mean is right, but the valve swings by more than a settled one does.
 */
export type HintCode = ValveHintCode | 'liquidAtLowest' | 'huntsInBand';

export interface HintWords {
  readonly code: HintCode;
  readonly direction: TurnDirection | null;
  readonly size: TurnSize | null;
  /** Whether it is a danger to the compressor. */
  readonly isCaution: boolean;
}

/**
 * The hint on the newest reading.
 *
 * @param judgement of that reading
 * @param nowMs the phone's clock
 * @returns `null` while nothing can be said: no reading, a slip, or a series that shows the valve unsettled
 */
export function hintOf(
  judgement: Judgement | null,
  typed: TypedSuperheat,
  step: SuperheatStep,
  nowMs: number,
): HintWords | null {
  const superheatK = readSuperheatK(judgement);
  if (judgement === null || superheatK === null) return null;
  const waitS = step.waitS ?? DEFAULT_WAIT_S;
  const isSettled = valveWait(typed.turns, nowMs, waitS)?.isOver ?? true;
  const errorK = figureOf(judgement, 'superheatUncertainty');
  const hint = valveHint({
    band: { low: kelvinDifference(step.band.lowK), high: kelvinDifference(step.band.highK) },
    superheat: kelvinDifference(superheatK),
    clockwiseDoes: typed.clockwise,
    log: valveLog(typed.turns, isSettled ? superheatK : null),
    now: second(nowMs / 1000),
    wait: second(waitS),
    ...(errorK === null ? {} : { uncertainty: kelvinDifference(errorK) }),
  });
  return hint.ok ? wordsOf(hint, judgement) : null;
}

/** A swing larger than this is hunting: common practice, no source. */
const HUNTS_ABOVE_K = 2;

const swingK = (judgement: Judgement): number =>
  (figureOf(judgement, 'superheatHigh') ?? 0) - (figureOf(judgement, 'superheatLow') ?? 0);

function wordsOf({ code, direction, size }: ValveHint, judgement: Judgement): HintWords | null {
  if (code === 'liquid') return { code, direction, size, isCaution: true };
  if (judgement.doubts.some(({ kind }) => kind === 'liquidRisk'))
    return { code: 'liquidAtLowest', direction: null, size: null, isCaution: true };
  // The judgement itself says "watch it longer"; a turn now would only stir what hasn't come to rest.
  if (code !== 'wait' && judgement.doubts.some(({ kind }) => kind === 'notSettled')) return null;
  if ((code === 'leave' || code === 'withinError') && swingK(judgement) > HUNTS_ABOVE_K)
    return { code: 'huntsInBand', direction: null, size: null, isCaution: false };
  return { code, direction, size, isCaution: false };
}
