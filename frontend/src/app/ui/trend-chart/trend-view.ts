import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { TrendAnswer, TrendStep } from '#shared/checklist/kinds/trend';
import type { UnitSystem } from '#shared/units/unit-system';
import { TextOf } from '../text-of';
import { TrendChart } from './trend-chart';

/** A log that is or was recorded: of which file and column it is, and its line. */
@Component({
  selector: 'app-trend-view',
  imports: [TextOf, TranslocoDirective, TrendChart],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'ui'">
      <p class="file">{{ answer().file.name }}</p>
      <p class="facts">
        <span>{{ t('trend_rows', { kept: answer().atS.length, rows: answer().file.rows }) }}</span>
        @if (answer().column !== '') {
          <span>{{ t('trend_column', { column: column() }) }}</span>
        }
        <span>{{ t('trend_start', { start: start() }) }}</span>
      </p>
    </ng-container>
    <app-trend-chart
      [step]="step()"
      [answer]="answer()"
      [unitSystem]="unitSystem()"
      [label]="step().title | appText"
    />
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: var(--app-space-1);
      margin-bottom: var(--app-space-3);
    }
    .file {
      font-family: var(--app-font-figures);
      overflow-wrap: anywhere;
    }
    .facts {
      display: flex;
      flex-wrap: wrap;
      gap: 0 var(--app-space-4);
      margin-bottom: var(--app-space-2);
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
      overflow-wrap: anywhere;
    }
  `,
})
export class TrendView {
  readonly step = input.required<TrendStep>();
  readonly answer = input.required<TrendAnswer>();
  readonly unitSystem = input.required<UnitSystem>();

  protected readonly column = computed(() => this.answer().column);
  protected readonly start = computed(() => this.answer().startText);
}
