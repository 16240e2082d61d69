import { isDone, type SequenceView, type StepView } from '#shared/sequences/sequence-view';
import type { LineJoint } from '../../ui/copper-line/copper-line';

/**
 * The step to go to on opening a circuit: one that a lead asks for again comes before one never done.
 *
 * @returns `null` when nothing required is open
 */
export function firstOpenStep(view: SequenceView): string | null {
  const reopened = view.steps.find((step) => step.fold && step.fold.reopenedBy !== null);
  const open = reopened ?? view.steps.find((step) => isMissing(step));
  return open?.step.key ?? null;
}

/**
 * The next step that needs something: any after the given one, then what is required from the start. A step that isn't
 * required is offered once on the way and nobody is led back to it.
 *
 * @returns `null` when none does
 */
export function nextOpenStep(view: SequenceView, afterKey: string): string | null {
  const from = view.steps.findIndex((step) => step.step.key === afterKey) + 1;
  const ahead = view.steps.slice(from).find((step) => !isDone(step.fold));
  const before = view.steps.slice(0, Math.max(0, from - 1));
  // Nobody signs while something is set by hand: to put that back comes first.
  const standing = before.find((step) => step.fold?.overrideStanding);
  if (ahead?.step.kind === 'signature' && standing) return standing.step.key;
  return (ahead ?? before.find((step) => isMissing(step)))?.step.key ?? null;
}

function isMissing(view: StepView): boolean {
  return !isDone(view.fold) && (view.step.required || view.fold?.overrideStanding === true);
}

/** A step as a joint of the copper line. */
export function jointOf(view: StepView, label: string): LineJoint {
  if (view.fold?.reopenedBy) return { label, state: 'sentBack' };
  if (isDone(view.fold)) return { label, state: 'approved' };
  return { label, state: view.fold ? 'underWay' : 'open' };
}

/** What a step's joint is marked with beside its state: done, but with a value outside, or without one. */
export function markOf(view: StepView): 'outside' | 'notApplicable' | null {
  const { fold } = view;
  if (!fold || fold.reopenedBy !== null || !fold.counts) return null;
  return fold.outcome === 'outside' || fold.outcome === 'notApplicable' ? fold.outcome : null;
}
