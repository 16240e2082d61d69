import type { SuperheatCondition } from '#shared/checklist/kinds/superheat';
import type { DeviceId } from '#shared/plant/ids';
import type { FoldEntry } from '#shared/sequences/fold';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';

/** The conditions are about the circuit; after half an hour a defrost may have come (common practice, no source). */
const CONDITIONS_HOLD_MS = 30 * 60_000;

const superheatOf = (entry: FoldEntry | null) => {
  const content = entry?.body.content;
  return content?.kind === 'answer' && content.answer.kind === 'superheat' ? content.answer : null;
};

/**
 * The conditions that were said to be met at the last superheat of the circuit, when this phone recorded it within the last
 * half hour: its own clock tells. None otherwise: somebody has to look.
 */
export function conditionsBefore(
  whole: SequenceView | null,
  deviceId: DeviceId | null,
  nowMs: number,
): readonly SuperheatCondition[] {
  const own = (whole?.steps ?? [])
    .flatMap((step) => step.history)
    .filter((entry) => entry.body.deviceId === deviceId && superheatOf(entry));
  const last = own.reduce<FoldEntry | null>(
    (latest, entry) => (latest && latest.body.deviceTime >= entry.body.deviceTime ? latest : entry),
    null,
  );
  const sinceMs = last ? nowMs - Date.parse(last.body.deviceTime) : NaN;
  return sinceMs >= 0 && sinceMs <= CONDITIONS_HOLD_MS ? (superheatOf(last)?.conditions ?? []) : [];
}

/** Whether an earlier entry of the step has the as-found already: it can't be read a second time. */
export const hadAsFound = (view: StepView | null): boolean =>
  (view?.history ?? []).some((entry) => superheatOf(entry)?.asFound);
