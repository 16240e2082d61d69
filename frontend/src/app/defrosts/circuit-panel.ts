import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { TranslocoDirective } from '@jsverse/transloco';
import type { DefrostDetails, PlannedCircuit, ScheduledDefrost } from '#shared/contracts/defrost-plans';
import { clockText } from '#shared/contracts/defrost-words';
import { DAY_S } from '#shared/refrigeration/defrost/day-circle';
import { formatQuantity } from '#shared/units/format';
import type { UnitId } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from '../ui/words/reading-language';
import { LARGE_STEP_S, SMALL_STEP_S } from './chart-keys';
import { NumberField } from './number-field';

export interface FieldFault {
  readonly field: string;
  readonly isFaulty: boolean;
}

/** One circuit: its chosen defrost to be moved, and what the schedule doesn't say to be given by hand. */
@Component({
  selector: 'app-circuit-panel',
  imports: [MatButton, NumberField, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './circuit-panel.html',
  styleUrl: './circuit-panel.scss',
})
export class CircuitPanel {
  readonly scheduled = input.required<ScheduledDefrost>();
  readonly planned = input.required<PlannedCircuit>();
  readonly details = input.required<DefrostDetails>();
  /** Second of the day of the chosen defrost; `null` when only the circuit is chosen. */
  readonly startS = input<number | null>(null);
  readonly unitSystem = input.required<UnitSystem>();
  readonly isEditable = input(false);
  /** Names given to other circuits, to be chosen again. */
  readonly boxes = input<readonly string[]>([]);
  readonly curtains = input<readonly string[]>([]);
  readonly move = output<number>();
  readonly keep = output<boolean>();
  readonly changed = output<Partial<DefrostDetails>>();
  readonly fault = output<FieldFault>();
  readonly closed = output();

  private readonly language = readingLanguage();
  protected readonly steps = [-LARGE_STEP_S, -SMALL_STEP_S, SMALL_STEP_S, LARGE_STEP_S];
  protected readonly daySeconds = DAY_S;
  protected readonly loadUnit = computed((): UnitId => displayUnit('heatFlow', this.unitSystem()));
  protected readonly isKept = computed(() => this.planned().fixedStartsS.includes(this.startS() ?? -1));
  protected readonly times = computed(() => {
    const startS = this.startS();
    if (startS === null) return null;
    const { durationS, dripS } = this.planned();
    const to = (seconds: number): string => clockText((startS + seconds) % DAY_S);
    return { from: clockText(startS), to: to(durationS), dripTo: dripS > 0 ? to(durationS + dripS) : null };
  });

  protected shown(value: number | null, unit: UnitId): string | null {
    return value === null ? null : formatQuantity(value, unit, this.language());
  }

  protected stepText(stepS: number): string {
    return `${stepS < 0 ? '−' : '+'}${Math.abs(stepS) / 60}`;
  }

  protected name(field: 'box' | 'airCurtain', text: string): void {
    const name = text.trim().slice(0, 60);
    this.changed.emit({ [field]: name === '' ? null : name });
  }

  protected note(field: string, isFaulty: boolean): void {
    this.fault.emit({ field: `${this.scheduled().id} ${field}`, isFaulty });
  }
}
