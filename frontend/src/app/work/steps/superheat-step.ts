import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { TextOf } from '../../ui/text-of';
import { LiveJudgement } from './live-judgement';
import { ObservationBoxes } from './observation-boxes';
import { StepDraft } from './step-draft';
import { liveObservation } from './superheat-live';
import {
  isBlank,
  startSuperheat,
  superheatAnswerOf,
  superheatLacks,
  type TypedObservation,
} from './superheat-typed';
import { WantedLimits } from './wanted-limits';

const LOOKS = ['asFound', 'asLeft'] as const;
type Look = (typeof LOOKS)[number];

/** Superheat of one coil, before and after the valve was touched. Saturation is worked out, never looked up by hand. */
@Component({
  selector: 'app-superheat-step',
  imports: [LiveJudgement, ObservationBoxes, TextOf, TranslocoPipe, WantedLimits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './superheat-step.html',
  styleUrl: './segments.scss',
})
export class SuperheatStep {
  protected readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('superheat');
  protected readonly facts = this.draft.current.facts;
  protected readonly typed = this.draft.form(startSuperheat(this.draft.previousOf('superheat')));
  protected readonly looks = LOOKS;
  // Whoever comes back after the valve settled goes on at the as-left.
  protected readonly look = signal<Look>(isBlank(this.typed().asFound) ? 'asFound' : 'asLeft');
  protected readonly observation = computed(() => this.typed()[this.look()]);
  protected readonly judgement = computed(() =>
    liveObservation(this.observation(), this.step, this.facts, this.draft.unitSystem),
  );
  protected readonly lacksAsFound = computed(
    () => this.look() === 'asLeft' && !isBlank(this.typed().asLeft) && isBlank(this.typed().asFound),
  );

  constructor() {
    effect(() => {
      const typed = this.typed();
      this.draft.propose(superheatAnswerOf(typed, this.draft.unitSystem), superheatLacks(typed));
    });
  }

  protected change(observation: TypedObservation): void {
    this.typed.set({ ...this.typed(), [this.look()]: observation });
  }

  /** The valve was left alone: what was found is what is left. */
  protected takeOverAsFound(): void {
    this.typed.set({ ...this.typed(), asLeft: this.typed().asFound });
    this.look.set('asLeft');
  }

  protected isFilled(look: Look): boolean {
    return !isBlank(this.typed()[look]);
  }
}
