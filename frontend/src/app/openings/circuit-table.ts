import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import type { CircuitRow } from '#shared/contracts/openings';
import { nextJoint } from '../ui/copper-line/next-joint';
import { OutcomeMark } from '../ui/outcome-mark/outcome-mark';
import { StateMark } from '../ui/state-mark/state-mark';
import { Unbroken } from '../ui/words/unbroken';

/**
 * The ruled table of circuits. One Tab stop for all check boxes: arrows, Home and End move, Space selects, with Shift a
 * range, Ctrl or Command with A all that is shown.
 */
@Component({
  selector: 'app-circuit-table',
  imports: [OutcomeMark, RouterLink, StateMark, TranslocoDirective, Unbroken],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './circuit-table.html',
  styleUrl: './circuit-table.scss',
})
export class CircuitTable {
  readonly rows = input.required<readonly CircuitRow[]>();
  readonly selected = input.required<ReadonlySet<string>>();
  readonly selectable = input.required<boolean>();
  readonly toggled = output<{ id: string; isRange: boolean }>();
  readonly toggledAll = output<void>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly focused = signal(0);
  protected readonly tabStop = computed(() => Math.min(this.focused(), this.rows().length - 1));
  protected readonly selectedHere = computed(
    () => this.rows().filter(({ circuitId }) => this.selected().has(circuitId)).length,
  );

  protected press(event: KeyboardEvent, index: number): void {
    if (event.key.toLowerCase() === 'a' && (event.ctrlKey || event.metaKey)) {
      event.preventDefault();
      this.toggledAll.emit();
      return;
    }
    const next = nextJoint(event.key, index, this.rows().length);
    const row = this.rows()[next ?? -1];
    if (next === null || !row) return;
    event.preventDefault();
    this.focused.set(next);
    this.host.nativeElement.querySelectorAll<HTMLElement>('tbody input')[next]?.focus();
    if (event.shiftKey && !this.selected().has(row.circuitId))
      this.toggled.emit({ id: row.circuitId, isRange: true });
  }

  protected click(event: MouseEvent, index: number, id: string): void {
    this.focused.set(index);
    this.toggled.emit({ id, isRange: event.shiftKey });
  }
}
