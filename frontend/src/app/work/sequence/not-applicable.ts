import {
  ChangeDetectionStrategy,
  Component,
  input,
  model,
  output,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';

const SHORTEST_REASON = 3;

/** The way out of a step that doesn't apply to this circuit. It takes a reason; a lead reads it. */
@Component({
  selector: 'app-not-applicable',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details #details [open]="isOpen()" (toggle)="noteToggle($event)">
      <summary>{{ 'work.doesNotApply' | transloco }}</summary>
      <label>
        <span>{{ 'work.reasonWhy' | transloco }}</span>
        <textarea rows="2" maxlength="500" [value]="reason()" (input)="take($event)"></textarea>
      </label>
      <button type="button" [disabled]="isBusy() || reason().trim().length < shortest" (click)="record()">
        {{ 'work.recordNotApplicable' | transloco }}
      </button>
    </details>
  `,
  styles: `
    summary {
      display: flex;
      align-items: center;
      min-height: var(--app-target);
      color: var(--app-ink-soft);
      text-decoration: underline;
      text-underline-offset: 0.2em;
      cursor: pointer;
    }
    label span {
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
    textarea {
      width: 100%;
      padding: var(--app-space-3);
      background: var(--app-sheet);
      border: 1px solid var(--app-rule);
      border-radius: var(--app-corner);
    }
    button {
      min-height: var(--app-target);
      margin-top: var(--app-space-2);
      padding: 0 var(--app-space-4);
      background: none;
      border: 1px solid var(--app-rule);
      border-radius: var(--app-corner);
      cursor: pointer;
    }
    button:disabled {
      color: var(--app-ink-soft);
      cursor: default;
    }
  `,
})
export class NotApplicable {
  readonly isBusy = input(false);
  /** Whether its box is open: the step's own action then makes room. */
  readonly isOpen = model(false);
  readonly recordReason = output<string>();

  protected readonly shortest = SHORTEST_REASON;
  protected readonly reason = signal('');
  private readonly details = viewChild.required<ElementRef<HTMLDetailsElement>>('details');

  protected take(event: Event): void {
    this.reason.set((event.target as HTMLTextAreaElement).value);
  }

  protected noteToggle(event: Event): void {
    const { open } = event.target as HTMLDetailsElement;
    this.isOpen.set(open);
    // Opened at the foot of a step it would lie behind the bar.
    if (open) this.details().nativeElement.scrollIntoView({ block: 'center', behavior: 'smooth' });
  }

  protected record(): void {
    this.recordReason.emit(this.reason().trim());
  }
}
