import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { METHODS } from '#shared/checklist/methods/methods';
import { TextOf } from '../../ui/text-of';
import { LiveJudgement } from './live-judgement';
import { MeasurementBoxesForm } from './measurement-boxes';
import { emptyBoxes, measurementAnswerOf, startMeasurement, type TypedBoxes } from './measurement-typed';
import { StepDraft } from './step-draft';

/**
 * Several values that a named method works out together: its boxes come from the method's own declaration, so that a
 * new method needs no screen of its own. Judged while it is typed.
 */
@Component({
  selector: 'app-measurement-step',
  imports: [LiveJudgement, MeasurementBoxesForm, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './measurement-step.html',
  styleUrl: './measurement-step.scss',
})
export class MeasurementStep {
  protected readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('measurement');
  protected readonly method = METHODS[this.step.method];
  protected readonly typed = this.draft.form(
    startMeasurement(this.method, this.draft.previousOf('measurement')),
  );
  protected readonly judgement = this.draft.judgement;
  constructor() {
    effect(() => {
      const answer = measurementAnswerOf(this.step.method, this.method, this.typed(), this.draft.unitSystem);
      this.draft.propose(answer, 'reading');
    });
  }

  protected change(boxes: TypedBoxes): void {
    this.typed.set({ ...this.typed(), boxes });
  }

  protected changeRow(index: number, boxes: TypedBoxes): void {
    this.typed.set({
      ...this.typed(),
      rows: this.typed().rows.map((row, at) => (at === index ? boxes : row)),
    });
  }

  protected addRow(): void {
    this.typed.set({ ...this.typed(), rows: [...this.typed().rows, emptyBoxes()] });
  }

  protected removeRow(index: number): void {
    this.typed.set({ ...this.typed(), rows: this.typed().rows.filter((_row, at) => at !== index) });
  }
}
