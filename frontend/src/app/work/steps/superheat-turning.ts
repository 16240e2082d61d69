import { DEFAULT_WAIT_S, type SuperheatStep, type ValveTurn } from '#shared/checklist/kinds/superheat';
import { valveWait } from '../coil-walk/valve-wait';
import { EMPTY_OBSERVATION, isBlank, type TypedSuperheat } from './superheat-typed';

/**
 * The form after a turn of the valve. A reading that stood in the boxes for as left was made before it: it moves beside
 * the turn, and the boxes are empty for the next.
 *
 * @param newestK superheat of the newest reading in kelvin; kept with the turn where it had settled
 * @param nowMs the phone's clock
 */
export function withTurn(
  typed: TypedSuperheat,
  turn: Omit<ValveTurn, 'at'>,
  newestK: number | null,
  step: SuperheatStep,
  nowMs: number,
): TypedSuperheat {
  const isSettled = valveWait(typed.turns, nowMs, step.waitS ?? DEFAULT_WAIT_S)?.isOver ?? true;
  const { asLeft } = typed;
  const isRead = !isBlank(asLeft);
  return {
    ...typed,
    turns: [
      ...typed.turns,
      {
        ...turn,
        at: new Date(nowMs).toISOString(),
        beforeK: isSettled ? newestK : null,
        readBefore: isRead ? asLeft : null,
      },
    ],
    asLeft: isRead ? { ...EMPTY_OBSERVATION, valve: asLeft.valve } : asLeft,
  };
}

/** The form without its last turn; what was read before it stands again, unless something was read since. */
export function withoutLastTurn(typed: TypedSuperheat): TypedSuperheat {
  const last = typed.turns.at(-1);
  const isRestored = isBlank(typed.asLeft) && last?.readBefore;
  return {
    ...typed,
    turns: typed.turns.slice(0, -1),
    asLeft: isRestored ? isRestored : typed.asLeft,
  };
}
