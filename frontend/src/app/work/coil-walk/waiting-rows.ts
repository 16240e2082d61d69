import { DEFAULT_WAIT_S } from '#shared/checklist/kinds/superheat';
import type { Text } from '#shared/checklist/text';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import type { KeptDraft } from '../steps/draft-keeper';
import { isBlank, keptSuperheat, type TypedSuperheat } from '../steps/superheat-typed';
import { valveWait, type ValveWait } from './valve-wait';

/** A valve that was turned on this phone and isn't read yet. */
export interface TurnedValve {
  readonly sequenceId: SequenceId;
  readonly stepKey: string;
  /** Of the circuit. */
  readonly code: string;
  readonly title: Text;
  readonly typed: TypedSuperheat;
  readonly waitS: number;
}

export interface WaitingRow extends TurnedValve {
  readonly wait: ValveWait;
}

/** The turned valve behind a draft; `null` for any other draft, and one whose circuit isn't on this phone. */
export function turnedValve(draft: KeptDraft, detail: SequenceDetail | null): TurnedValve | null {
  const typed = keptSuperheat(draft.typed);
  const step = detail?.stepList.steps.find(({ key }) => key === draft.stepKey);
  if (!typed || typed.turns.length === 0 || !detail || step?.kind !== 'superheat') return null;
  return {
    sequenceId: draft.sequenceId,
    stepKey: draft.stepKey,
    code: detail.specification.circuit.code,
    title: step.title,
    typed,
    waitS: step.waitS ?? DEFAULT_WAIT_S,
  };
}

/** The valves that wait or wait to be read, those first that are ready soonest. One that was read after its wait is none. */
export function waitingRows(valves: readonly TurnedValve[], nowMs: number): readonly WaitingRow[] {
  return valves
    .flatMap((valve) => {
      const wait = valveWait(valve.typed.turns, nowMs, valve.waitS);
      return wait && (!wait.isOver || isBlank(valve.typed.asLeft)) ? [{ ...valve, wait }] : [];
    })
    .toSorted((a, b) => a.wait.remainingS - b.wait.remainingS);
}
