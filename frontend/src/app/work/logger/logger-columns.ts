import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { LoggerFile } from '#shared/refrigeration/logger/logger-file';
import { UNITS, type UnitId } from '#shared/units/unit';
import { columnOptions, LOGGED_UNITS, type ColumnChoices, type WantedColumn } from './log-choice';

/** Which of a log's columns is which quantity, and in what unit where the heading names none. */
@Component({
  selector: 'app-logger-columns',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './logger-columns.html',
  styleUrl: './logger-columns.scss',
})
export class LoggerColumns {
  readonly log = input.required<LoggerFile>();
  readonly wanted = input.required<readonly WantedColumn[]>();
  readonly choices = model.required<ColumnChoices>();

  protected readonly boxes = computed(() =>
    this.wanted().map((wanted) => {
      const { index, unit } = this.choices()[wanted.key] ?? { index: null, unit: null };
      const column = index === null ? undefined : this.log().columns[index];
      return {
        ...wanted,
        index,
        unit,
        options: columnOptions(this.log(), wanted.dimension),
        heading: column?.heading ?? '',
        units: column?.unit === null ? LOGGED_UNITS[wanted.dimension] : [],
      };
    }),
  );

  protected symbolOf(unit: UnitId): string {
    return UNITS[unit].symbol;
  }

  protected chooseColumn(key: string, value: string): void {
    const index = value === '' ? null : Number(value);
    // The unit belonged to the column before.
    this.choices.set({ ...this.choices(), [key]: { index, unit: null } });
  }

  protected chooseUnit(key: string, value: string, units: readonly UnitId[]): void {
    const index = this.choices()[key]?.index ?? null;
    const unit = units.find((one) => one === value) ?? null;
    this.choices.set({ ...this.choices(), [key]: { index, unit } });
  }
}
