import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  output,
} from '@angular/core';
import { TranslocoService } from '@jsverse/transloco';
import type { StepView } from '#shared/sequences/sequence-view';
import { CopperLine } from '../../ui/copper-line/copper-line';
import { readingLanguage } from '../../ui/words/reading-language';
import { jointOf, markOf } from './step-order';

/**
 * The steps as a copper line that scrolls sideways on a phone, the current one in its middle. Above a joint stands a tick
 * where the value lies outside, and a hollow one where the step doesn't apply: those are done, but not like the others.
 */
@Component({
  selector: 'app-step-line',
  imports: [CopperLine],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="marks" aria-hidden="true">
      @for (mark of marks(); track $index) {
        <span [class]="mark ?? ''"></span>
      }
    </div>
    <app-copper-line
      size="medium"
      of="steps"
      [label]="label()"
      [joints]="joints()"
      [pickable]="true"
      [current]="current()"
      (pick)="pick.emit($event)"
    />
  `,
  styleUrl: './step-line.scss',
})
export class StepLine {
  readonly steps = input.required<readonly StepView[]>();
  readonly label = input.required<string>();
  readonly current = input<number | null>(null);
  /** Index of the step. */
  readonly pick = output<number>();

  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  protected readonly marks = computed(() => this.steps().map(markOf));
  protected readonly joints = computed(() =>
    this.steps().map((view) => {
      const title = view.step.title[this.language()];
      const mark = markOf(view);
      return jointOf(view, mark ? `${title}, ${this.words.translate(`ui.outcome_${mark}`)}` : title);
    }),
  );

  constructor() {
    afterRenderEffect(() => {
      const current = this.current();
      this.joints();
      const host = this.host.nativeElement;
      const joint = current === null ? null : host.querySelectorAll<HTMLElement>('li')[current];
      if (!joint) return;
      const from = joint.getBoundingClientRect().left - host.getBoundingClientRect().left + host.scrollLeft;
      host.scrollLeft = from - (host.clientWidth - joint.offsetWidth) / 2;
    });
  }
}
