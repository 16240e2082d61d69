import type { ValveTurn } from '#shared/checklist/kinds/superheat';
import { DEFAULT_WAIT_S } from '#shared/checklist/kinds/superheat';
import { settling, type ValveLog } from '#shared/refrigeration/valve/valve-log';
import { second } from '#shared/units/quantity';

/** The wait after the last turn of one valve. */
export interface ValveWait {
  /** When the valve was turned last, as ISO text. */
  readonly turnedAt: string;
  readonly remainingS: number;
  readonly isOver: boolean;
}

/** Oldest first, as the log of a valve goes. */
export const inOrder = <T extends ValveTurn>(turns: readonly T[]): readonly T[] =>
  turns.toSorted((a, b) => Date.parse(a.at) - Date.parse(b.at));

/**
 * What is left of the wait since the last turn. Worked out from the stamp, never counted: a locked phone and a closed page
 * change nothing.
 *
 * @param nowMs the phone's clock
 * @param waitS as the step asks; left out: `DEFAULT_WAIT_S`
 * @returns `null` for a valve that wasn't turned
 */
export function valveWait(
  turns: readonly ValveTurn[],
  nowMs: number,
  waitS: number = DEFAULT_WAIT_S,
): ValveWait | null {
  const last = inOrder(turns).at(-1);
  if (!last) return null;
  const log: ValveLog = [
    {
      turns: last.turns,
      direction: last.direction,
      at: second(Date.parse(last.at) / 1000),
      superheatBefore: null,
      superheatAfter: null,
    },
  ];
  const { settled, remaining } = settling(log, second(nowMs / 1000), second(waitS));
  return { turnedAt: last.at, remainingS: remaining, isOver: settled };
}
