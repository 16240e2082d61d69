import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { SequenceFacts } from '#shared/checklist/facts';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { PairBoxes } from './pair-boxes';
import type { TypedObservation } from './superheat-typed';

const VALVES = ['steady', 'hunting'] as const;

/**
 * One look at a coil, the only one on the page at a time: its radio buttons keep one name, because buttons that change
 * theirs lose which of them is checked. Whether the valve holds still, and the pair or two that this takes.
 */
@Component({
  selector: 'app-observation-boxes',
  imports: [PairBoxes, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset class="valve">
      <legend class="heard-only">{{ 'work.valve' | transloco }}</legend>
      <div>
        @for (valve of valves; track valve) {
          <label>
            <input
              type="radio"
              name="valve"
              [checked]="observation().valve === valve"
              (change)="change({ valve })"
            />
            <span>{{ 'work.valve_' + valve | transloco }}</span>
          </label>
        }
      </div>
    </fieldset>
    @if (observation().valve === 'steady') {
      <app-pair-boxes
        [step]="step()"
        [facts]="facts()"
        [pair]="observation().pair"
        (pairChange)="change({ pair: $event })"
      />
    } @else {
      <app-pair-boxes
        [heading]="'work.atLowest' | transloco"
        [step]="step()"
        [facts]="facts()"
        [pair]="observation().low"
        (pairChange)="change({ low: $event })"
      />
      <app-pair-boxes
        [heading]="'work.atHighest' | transloco"
        [step]="step()"
        [facts]="facts()"
        [pair]="observation().high"
        (pairChange)="change({ high: $event })"
      />
    }
  `,
  styleUrl: './segments.scss',
})
export class ObservationBoxes {
  readonly step = input.required<SuperheatStep>();
  readonly facts = input.required<SequenceFacts>();
  readonly observation = model.required<TypedObservation>();

  protected readonly valves = VALVES;

  protected change(change: Partial<TypedObservation>): void {
    this.observation.set({ ...this.observation(), ...change });
  }
}
