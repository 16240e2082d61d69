import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { StepList } from '#shared/checklist/step';
import type { SequenceView } from '#shared/sequences/sequence-view';
import { JointFigure } from '../../ui/joint/joint-figure';
import { OutcomeMark } from '../../ui/outcome-mark/outcome-mark';
import { TextOf } from '../../ui/text-of';
import { isUnsent } from './local-view';
import { jointOf } from './step-order';

/** All steps at a glance, by section; any of them is one tap away. */
@Component({
  selector: 'app-step-overview',
  imports: [JointFigure, OutcomeMark, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './step-overview.html',
  styleUrl: './step-overview.scss',
})
export class StepOverview {
  readonly view = input.required<SequenceView>();
  readonly stepList = input.required<StepList>();
  readonly currentKey = input<string | null>(null);
  readonly pick = output<string>();

  protected readonly sections = computed(() =>
    this.stepList()
      .sections.map((section) => ({
        section,
        rows: this.view()
          .steps.filter(({ step }) => step.section === section.key)
          .map((step) => ({
            ...step,
            joint: jointOf(step, '').state,
            isLocal: !!step.current && isUnsent(step.current),
          })),
      }))
      .filter(({ rows }) => rows.length > 0),
  );
}
