import { computed, effect, inject, Injectable, signal, type WritableSignal } from '@angular/core';
import type { SequenceFacts } from '#shared/checklist/facts';
import { judge } from '#shared/checklist/judge';
import type { Text } from '#shared/checklist/text';
import type { Answer, AnswerOf, Step, StepKind, StepOf } from '#shared/checklist/step';
import { Bug } from '#shared/failures/failure';
import type { SequenceId } from '#shared/plant/ids';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import type { UnitSystem } from '#shared/units/unit-system';
import { DraftKeeper } from './draft-keeper';
import type { Lacking } from './lacking';

export interface OpenStep {
  readonly sequenceId: SequenceId;
  readonly step: Step;
  readonly facts: SequenceFacts;
  /** The answer that counts now, when it is about to be corrected. */
  readonly previous: Answer | null;
  /** Whether an override was set here and waits to be put back. */
  readonly isStanding: boolean;
  /** Records what was proposed; for a step with a button of its own. */
  readonly record: () => void;
  readonly personName: string;
  /** Hashes of the photos that the server can show. */
  readonly arrivedPhotos: ReadonlySet<string>;
  /** Titles of the other steps of the circuit that pictures stand on, by the pictures' hashes. */
  readonly photosElsewhere: ReadonlyMap<string, Text>;
  /** The step as it stands, with what was recorded on it before. */
  readonly view: StepView;
  /** The whole sequence as this phone sees it; `null` before it was read. */
  readonly whole: SequenceView | null;
}

/**
 * The answer in the making: provided by the step's sheet, filled by the component of the step's kind. It is judged while
 * it is typed, by the code that the server judges with.
 */
@Injectable()
export class StepDraft {
  private readonly keeper = inject(DraftKeeper);
  private readonly opened = signal<OpenStep | null>(null);
  private readonly typed = signal<{ form: WritableSignal<unknown>; initial: unknown } | null>(null);
  private readonly made = signal<Answer | null>(null);
  private readonly missing = signal<Lacking | null>(null);
  private readonly unsettled = signal(false);

  /** Whether the answer is about to be recorded before its valve had its wait: allowed, and asked about first. */
  readonly isUnsettled = this.unsettled.asReadonly();
  readonly answer = this.made.asReadonly();
  /** What there has to be before there is an answer; `null` when there is one. */
  readonly lacking = computed(() => (this.made() ? null : this.missing()));
  readonly judgement = computed(() => {
    const answer = this.made();
    const open = this.opened();
    return answer && open ? judge(open.step, answer, open.facts) : null;
  });
  /** Why it can't be recorded as it is; empty when it can. */
  readonly refusals = computed(
    () => this.judgement()?.doubts.filter((doubt) => doubt.severity === 'refuse') ?? [],
  );

  constructor() {
    effect(() => {
      const open = this.opened();
      const typed = this.typed();
      const now = typed?.form();
      // A step that was only looked at leaves no draft: what others record on it meanwhile must show.
      if (open && typed && now !== typed.initial) this.keeper.keep(open.sequenceId, open.step.key, now);
    });
  }

  open(step: OpenStep): void {
    this.typed.set(null);
    this.made.set(null);
    this.missing.set(null);
    this.unsettled.set(false);
    this.opened.set(step);
  }

  /** @throws {Bug} before `open` */
  get current(): OpenStep {
    const open = this.opened();
    if (!open) throw new Bug('No step is open');
    return open;
  }

  get unitSystem(): UnitSystem {
    return this.current.facts.unitSystem;
  }

  /** The open step as one of the kind. @throws {Bug} when it is of another */
  stepOf<K extends StepKind>(kind: K): StepOf<K> {
    const { step } = this.current;
    if (step.kind !== kind) throw new Bug(`The step is a ${step.kind}, not a ${kind}`);
    return step as StepOf<K>;
  }

  /** The answer to be corrected, when it is of the kind. */
  previousOf<K extends StepKind>(kind: K): AnswerOf<K> | null {
    const { previous } = this.current;
    return previous?.kind === kind ? (previous as AnswerOf<K>) : null;
  }

  /** What is being typed, starting from what was typed before the page closed, else from `initial`. Kept as it changes. */
  form<T extends object>(initial: T): WritableSignal<T> {
    const { sequenceId, step } = this.current;
    const kept = this.keeper.read(sequenceId, step.key);
    const typed = signal<T>(isLike(initial, kept) ? kept : initial);
    this.typed.set({ form: typed as WritableSignal<unknown>, initial });
    return typed;
  }

  /** Says what the answer is now; `null` while there is none, and then what it lacks. */
  propose(answer: Answer | null, lacking: Lacking | null = null): void {
    this.made.set(answer);
    this.missing.set(lacking);
  }

  /** Says whether the valve still has to settle. */
  tellUnsettled(isUnsettled: boolean): void {
    this.unsettled.set(isUnsettled);
  }

  /** Forgets what was typed, after it was recorded. */
  forget(): void {
    const { sequenceId, step } = this.current;
    this.typed.set(null);
    this.keeper.forget(sequenceId, step.key);
  }
}

/** Whether a kept draft has the members of a fresh one: one of an older version of a step doesn't. */
function isLike<T extends object>(fresh: T, kept: unknown): kept is T {
  return typeof kept === 'object' && kept !== null && Object.keys(fresh).every((key) => key in kept);
}
