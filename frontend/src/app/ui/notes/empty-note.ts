import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Nothing here yet: says what to do next; the action that does it is projected into it. */
@Component({
  selector: 'app-empty',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <svg width="120" height="24" aria-hidden="true" focusable="false">
      <path d="M0 12H50M70 12H120" />
      <circle cx="60" cy="12" r="9" />
    </svg>
    <h2>{{ title() }}</h2>
    @if (hint()) {
      <p>{{ hint() }}</p>
    }
    <ng-content />
  `,
  styles: `
    :host {
      display: block;
      padding: var(--app-space-6) var(--app-space-4);
      border: 1px dashed var(--app-rule);
      text-align: center;
    }
    path,
    circle {
      fill: none;
      stroke: var(--app-rule);
      stroke-width: 3;
    }
    h2 {
      margin: var(--app-space-3) 0 var(--app-space-2);
      font-size: var(--app-size-3);
      font-weight: 500;
    }
    p {
      max-width: 40rem;
      margin: 0 auto var(--app-space-4);
      color: var(--app-ink-soft);
    }
  `,
})
export class EmptyNote {
  readonly title = input.required<string>();
  readonly hint = input('');
}
