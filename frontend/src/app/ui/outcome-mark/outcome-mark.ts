import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import { drawOutcome, type MarkedOutcome } from './outcome-drawing';

/** How an entry was judged: shape, colour and word. Without the visible word it is still read aloud. */
@Component({
  selector: 'app-outcome-mark',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'ui'">
      <svg width="20" height="20" viewBox="0 0 20 20" aria-hidden="true" focusable="false">
        <path class="solid" [attr.d]="drawing().solid" />
        <path class="stroke" [attr.d]="drawing().stroke" />
      </svg>
      <span [class.heard-only]="!withWord()">{{ t(word()) }}</span>
    </ng-container>
  `,
  styles: `
    :host {
      position: relative;
      display: inline-flex;
      align-items: center;
      gap: var(--app-space-1);
      vertical-align: middle;
      color: var(--app-ink);
      white-space: nowrap;
    }
    :host(.within) {
      color: var(--app-copper);
    }
    :host(.outside) {
      color: var(--app-plum);
      font-weight: 600;
    }
    :host(.notApplicable) {
      color: var(--app-ink-soft);
    }
    :host(.waiting) {
      color: var(--app-ochre);
    }
    svg {
      flex: none;
    }
    .solid {
      fill: currentColor;
    }
    .stroke {
      fill: none;
      stroke: currentColor;
      stroke-width: 2.5;
      stroke-linecap: round;
    }
  `,
  host: { '[class]': 'outcome()' },
})
export class OutcomeMark {
  readonly outcome = input.required<MarkedOutcome>();
  readonly side = input<'low' | 'high' | null>(null);
  readonly withWord = input(true);

  protected readonly drawing = computed(() => drawOutcome(this.outcome(), this.side()));
  protected readonly word = computed(() => {
    const side = this.side();
    return this.outcome() === 'outside' && side ? `outcome_outside_${side}` : `outcome_${this.outcome()}`;
  });
}
