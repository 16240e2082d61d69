import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Step } from '#shared/checklist/step';
import type { SequenceId } from '#shared/plant/ids';
import { TextOf } from '../../ui/text-of';
import { readingLanguage } from '../../ui/words/reading-language';
import { GuidanceMemory } from './guidance-memory';

/**
 * What to do and what is dangerous about it, short enough on a phone that the boxes to fill stay in sight: two lines and
 * one, whole on a tap. Whoever opens the instructions on one step of a circuit finds them open on the others.
 */
@Component({
  selector: 'app-step-guidance',
  imports: [TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './step-guidance.html',
  styleUrl: './step-guidance.scss',
})
export class StepGuidance {
  readonly sequenceId = input.required<SequenceId>();
  readonly step = input.required<Step>();

  private readonly memory = inject(GuidanceMemory);
  private readonly language = readingLanguage();
  private readonly text = viewChild<ElementRef<HTMLElement>>('instructionText');
  protected readonly isOpen = linkedSignal(() => this.memory.isOpen(this.sequenceId()));
  protected readonly isCautionOpen = signal(false);
  /** Whether the instruction has more than what its two lines show. */
  protected readonly isLong = signal(false);
  private readonly shown = computed(() => this.step().instruction?.[this.language()] ?? '');

  constructor() {
    afterRenderEffect(() => {
      this.shown();
      const element = this.text()?.nativeElement;
      if (element && !this.isOpen()) this.isLong.set(element.scrollHeight > element.clientHeight + 1);
    });
  }

  protected toggle(): void {
    this.isOpen.update((isOpen) => !isOpen);
    this.memory.keep(this.sequenceId(), this.isOpen());
  }

  protected toggleCaution(): void {
    this.isCautionOpen.update((isOpen) => !isOpen);
  }
}
