import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Signed and closed: the copper line comes to the name from both sides, and its two collars hold it. */
@Component({
  selector: 'app-closed-joint',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <span class="pipe"></span>
    <span class="sleeve">{{ name() }}</span>
    <span class="pipe"></span>
  `,
  styles: `
    :host {
      display: flex;
      align-items: center;
      max-width: 34rem;
    }
    .pipe {
      flex: 1 1 24px;
      min-width: 20px;
      height: 6px;
      background: var(--app-copper-line);
    }
    .sleeve {
      flex: 0 1 auto;
      padding: var(--app-space-2) var(--app-space-4);
      border: 3px solid var(--app-copper-line);
      border-inline: 6px solid var(--app-copper);
      border-radius: 3px;
      color: var(--app-ink);
      font-size: var(--app-size-3);
      font-weight: 600;
      line-height: 1.2;
      overflow-wrap: anywhere;
      text-align: center;
    }
  `,
})
export class ClosedJoint {
  readonly name = input.required<string>();
}
