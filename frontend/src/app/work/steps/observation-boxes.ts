import { ChangeDetectionStrategy, Component, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { SequenceFacts } from '#shared/checklist/facts';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { PairBoxes } from './pair-boxes';
import type { ReadHow } from './superheat-answer';
import { SuperheatLog } from './superheat-log';
import { SuperheatSeries } from './superheat-series';
import type { TypedObservation } from './superheat-typed';

const VALVES = ['steady', 'hunting', 'series', 'log'] as const;

/**
 * One look at a coil, the only one on the page at a time: its radio buttons keep one name, because buttons that change
 * theirs lose which of them is checked. Whether the valve holds still, and the pair, the two, the series or the logger's
 * file that this takes.
 */
@Component({
  selector: 'app-observation-boxes',
  imports: [PairBoxes, SuperheatLog, SuperheatSeries, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset class="valve narrow">
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
    @switch (observation().valve) {
      @case ('steady') {
        <app-pair-boxes
          [step]="step()"
          [facts]="facts()"
          [how]="how()"
          [pair]="observation().pair"
          (pairChange)="change({ pair: $event })"
        />
      }
      @case ('hunting') {
        <app-pair-boxes
          [heading]="'work.atLowest' | transloco"
          [step]="step()"
          [facts]="facts()"
          [how]="how()"
          [pair]="observation().low"
          (pairChange)="change({ low: $event })"
        />
        <app-pair-boxes
          [heading]="'work.atHighest' | transloco"
          [step]="step()"
          [facts]="facts()"
          [how]="how()"
          [pair]="observation().high"
          (pairChange)="change({ high: $event })"
        />
      }
      @case ('series') {
        <app-superheat-series [step]="step()" [facts]="facts()" [how]="how()" [(observation)]="observation" />
      }
      @case ('log') {
        <app-superheat-log [log]="observation().log" (logChange)="change({ log: $event })" />
      }
    }
  `,
  styleUrl: './segments.scss',
})
export class ObservationBoxes {
  readonly step = input.required<SuperheatStep>();
  readonly facts = input.required<SequenceFacts>();
  readonly how = input.required<ReadHow>();
  readonly observation = model.required<TypedObservation>();

  protected readonly valves = VALVES;

  protected change(change: Partial<TypedObservation>): void {
    this.observation.set({ ...this.observation(), ...change });
  }
}
