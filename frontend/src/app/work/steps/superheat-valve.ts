import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { ValveTurn } from '#shared/checklist/kinds/superheat';
import type { UnitSystem } from '#shared/units/unit-system';
import { QuantityOf } from '../../ui/quantity-of';
import { readingLanguage } from '../../ui/words/reading-language';
import { timeOfDay } from '../coil-walk/clock-text';
import type { TypedSuperheat } from './superheat-typed';
import { readTurns, TURN_SIZES, turnArrow, turnSign } from './turn-text';

const DIRECTIONS = ['counterclockwise', 'clockwise'] as const;
const SHEET_SAYS = ['raisesSuperheat', 'lowersSuperheat', null] as const;
const MOST_TURNS = 50;

/** The valve's log: a turn is two taps and one to say that it was made, which starts the wait. */
@Component({
  selector: 'app-superheat-valve',
  imports: [MatIconModule, QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './superheat-valve.html',
  styleUrls: ['./segments.scss', './superheat-valve.scss'],
})
export class SuperheatValve {
  readonly typed = input.required<TypedSuperheat>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly turned = output<Omit<ValveTurn, 'at'>>();
  readonly takenBack = output<void>();
  readonly sheetSaid = output<TypedSuperheat['clockwise']>();

  private readonly language = readingLanguage();
  protected readonly sizes = TURN_SIZES;
  protected readonly directions = DIRECTIONS;
  protected readonly sheetSays = SHEET_SAYS;
  protected readonly arrow = turnArrow;
  /** Nothing is chosen beforehand: a turn in the log is one that a hand made. */
  protected readonly size = signal<number | 'other' | null>(null);
  protected readonly other = signal('');
  protected readonly direction = signal<ValveTurn['direction'] | null>(null);
  protected readonly turns = computed(() => {
    const size = this.size();
    return size === 'other' ? readTurns(this.other()) : size;
  });
  protected readonly canTurn = computed(
    () => this.turns() !== null && this.direction() !== null && this.typed().turns.length < MOST_TURNS,
  );

  protected turn(): void {
    const turns = this.turns();
    const direction = this.direction();
    if (turns === null || direction === null) return;
    this.turned.emit({ turns, direction });
    this.size.set(null);
    this.other.set('');
    this.direction.set(null);
  }

  protected takeOther(event: Event): void {
    this.other.set((event.target as HTMLInputElement).value);
  }

  protected sign(turns: number): string {
    return turnSign(turns, this.language());
  }

  protected time(at: string): string {
    return timeOfDay(at, this.language());
  }
}
