import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { FirstIcon } from '../ui/first-icon/first-icon';
import { OutboxStart } from './outbox-start';
import { PersonPanel } from './person-panel';

/** The end of the bar: what still waits on this phone, who is here. Comes right after the first paint. */
@Component({
  selector: 'app-bar-end',
  imports: [FirstIcon, PersonPanel, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (outbox.waiting() > 0) {
      <span class="mark" [attr.title]="'shell.waitingHint' | transloco">
        <app-first-icon name="waiting" /><span class="figures">{{ outbox.waiting() }}</span>
        <span class="heard-only">{{ 'shell.waitingHint' | transloco }}</span>
      </span>
    }
    <app-person-panel />
  `,
  styles: `
    :host {
      display: flex;
      align-items: center;
      gap: var(--app-space-2);
    }
    .mark {
      display: inline-flex;
      align-items: center;
      gap: var(--app-space-1);
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
  `,
})
export class BarEnd {
  protected readonly outbox = inject(OutboxStart);
}
