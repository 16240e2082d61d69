import type { Step, StepList } from '../checklist/step';
import type { FoldEntry } from './fold';
import { foldEntries, missingSteps } from './fold';
import type { Remark } from './entry';
import type { FoldState, StepFold } from './fold-state';

/** One step with all that was ever recorded on it, oldest first. */
export interface StepView {
  readonly step: Step;
  readonly fold: StepFold | null;
  readonly history: readonly FoldEntry[];
  readonly current: FoldEntry | null;
  /**
   * Why it is asked again; `null` when it isn't. `stale`: a valve, regulator or set point was changed after the reading.
   * `changed`: the schedule or checklist asks otherwise now. `signedBefore`: something was recorded after the signature.
   */
  readonly again: 'remark' | 'changed' | 'signedBefore' | 'stale' | null;
  /** The lead's remark that reopened it; `null` when it isn't asked again. */
  readonly remark: (Remark & { readonly entry: FoldEntry }) | null;
}

export interface SequenceView {
  readonly fold: FoldState;
  readonly steps: readonly StepView[];
  readonly missing: readonly Step[];
  readonly doneCount: number;
  readonly outsideCount: number;
  /** Entries on steps that the template no longer asks for: kept and shown, never dropped. */
  readonly noLongerAsked: readonly FoldEntry[];
  readonly late: readonly FoldEntry[];
  readonly reviews: readonly FoldEntry[];
}

/** Whether a step needs nothing more: answered so that it counts, no override standing, not asked again. */
export function isDone(fold: StepFold | null | undefined): boolean {
  return !!fold && fold.counts && !fold.overrideStanding && fold.reopenedBy === null;
}

/** Everything that a screen or the package shows of one sequence, from its entries in order of position. */
export function viewSequence(stepList: StepList, entries: readonly FoldEntry[]): SequenceView {
  const fold = foldEntries(entries, stepList.steps);
  const byKey = new Map<string, FoldEntry[]>();
  for (const entry of entries) {
    const { content } = entry.body;
    if (
      (content.kind === 'answer' || content.kind === 'notApplicable') &&
      entry.server.standing === 'inOrder'
    ) {
      byKey.set(content.stepKey, [...(byKey.get(content.stepKey) ?? []), entry]);
    }
  }
  const byId = new Map(entries.map((entry) => [entry.body.id, entry]));
  // A step without an answer has no state of its own: while the sequence is sent back, the last remarks are for it too.
  const sentBack =
    fold.state === 'sentBack'
      ? entries.findLast(
          ({ body: { content } }) => content.kind === 'review' && content.verdict === 'sentBack',
        )
      : undefined;
  const steps = stepList.steps.map((step): StepView => {
    const stepFold = fold.steps[step.key] ?? null;
    const history = byKey.get(step.key) ?? [];
    const reopening = stepFold?.reopenedBy ? byId.get(stepFold.reopenedBy) : stepFold ? undefined : sentBack;
    return {
      step,
      fold: stepFold,
      history,
      current: history.at(-1) ?? null,
      again: stepFold?.reopenedBy ? reasonOf(step, reopening) : null,
      remark: remarkOn(step.key, reopening),
    };
  });
  const asked = new Set(stepList.steps.map((step) => step.key));
  return {
    fold,
    steps,
    missing: missingSteps(fold, stepList.steps),
    doneCount: steps.filter((view) => isDone(view.fold)).length,
    outsideCount: steps.filter((view) => view.fold?.outcome === 'outside').length,
    noLongerAsked: [...byKey].filter(([key]) => !asked.has(key)).flatMap(([, list]) => list),
    late: entries.filter((entry) => entry.server.standing === 'late'),
    reviews: entries.filter((entry) => entry.body.content.kind === 'review'),
  };
}

function reasonOf(step: Step, by: FoldEntry | undefined): StepView['again'] {
  if (by?.body.content.kind === 'review') return 'remark';
  if (by?.body.content.kind === 'expansion') return 'changed';
  return step.kind === 'signature' ? 'signedBefore' : 'stale';
}

function remarkOn(stepKey: string, entry: FoldEntry | undefined): StepView['remark'] {
  if (entry?.body.content.kind !== 'review') return null;
  const remark = entry.body.content.remarks.find((candidate) => candidate.stepKey === stepKey);
  return remark ? { ...remark, entry } : null;
}
