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
import { TranslocoDirective } from '@jsverse/transloco';
import type { JointSize, JointState } from '../joint/joint-drawing';
import { JointFigure } from '../joint/joint-figure';
import { countStates } from './line-summary';
import { nextJoint } from './next-joint';

/** What one joint of a line stands for: a step, a circuit or a system. */
export interface LineJoint {
  readonly label: string;
  readonly state: JointState;
}

/** What a joint's state is called where a joint is a step: a step is done, only a circuit is approved. */
const STEP_WORDS: Readonly<Record<JointState, string>> = {
  open: 'stepOpen',
  underWay: 'stepNotYet',
  submitted: 'stepNotYet',
  sentBack: 'stepAgain',
  approved: 'stepDone',
  noSequence: 'stepOpen',
};

/**
 * A run of copper pipe with one joint for each step or circuit; it wraps into several runs where there is little room.
 * One Tab stop: arrows, Home and End move along the line, Enter picks a joint. As `small`, or with `pickable` off, it is
 * a picture with one text alternative.
 */
@Component({
  selector: 'app-copper-line',
  imports: [TranslocoDirective, JointFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './copper-line.html',
  styleUrl: './copper-line.scss',
  host: { '[class]': 'size()' },
})
export class CopperLine {
  readonly joints = input.required<readonly LineJoint[]>();
  readonly size = input<JointSize>('medium');
  readonly label = input.required<string>();
  /** Whether joints can be picked; left out, all lines but small ones can. */
  readonly pickable = input<boolean>();
  /** What one joint stands for, which decides how its state is called. */
  readonly of = input<'circuits' | 'steps'>('circuits');
  /** Index of the joint that the screen is at, if any. */
  readonly current = input<number | null>(null);
  readonly pick = output<number>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly focused = signal<number | null>(null);

  protected readonly isPickable = computed(() => this.pickable() ?? this.size() !== 'small');
  protected readonly counts = computed(() => countStates(this.joints()));
  /** The joint that Tab reaches. */
  protected readonly tabStop = computed(() =>
    Math.min(this.focused() ?? this.current() ?? 0, Math.max(0, this.joints().length - 1)),
  );

  /** The text alternative of the picture: how many joints stand where. */
  protected summary(t: (key: string) => string): string {
    return this.counts()
      .map(({ state, count }) => `${count} ${t(this.wordOf(state)).toLowerCase()}`)
      .join(', ');
  }

  protected wordOf(state: JointState): string {
    return this.of() === 'steps' ? STEP_WORDS[state] : `state_${state}`;
  }

  protected move(event: KeyboardEvent, from: number): void {
    const next = nextJoint(event.key, from, this.joints().length);
    if (next === null) return;
    event.preventDefault();
    this.focused.set(next);
    this.host.nativeElement.querySelectorAll<HTMLElement>('button')[next]?.focus();
  }

  protected choose(index: number): void {
    this.focused.set(index);
    this.pick.emit(index);
  }
}
