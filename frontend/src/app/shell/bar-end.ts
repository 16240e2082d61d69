import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import { Connectivity } from '../offline/connectivity';
import { OutboxStart } from './outbox-start';
import { PersonPanel } from './person-panel';

/** The end of the bar: no network, what still waits on this phone, who is here. Comes right after the first paint. */
@Component({
  selector: 'app-bar-end',
  imports: [MatIconModule, PersonPanel, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (!online()) {
      <span class="mark offline" [attr.title]="'shell.offlineHint' | transloco">
        <mat-icon svgIcon="offline" /><span class="mark-word">{{ 'shell.offline' | transloco }}</span>
      </span>
    }
    @if (outbox.waiting() > 0) {
      <span class="mark" [attr.title]="'shell.waitingHint' | transloco">
        <mat-icon svgIcon="waiting" /><span class="figures">{{ outbox.waiting() }}</span>
        <span class="heard-only">{{ 'shell.waitingHint' | transloco }}</span>
      </span>
    }
    <app-person-panel />
  `,
  styles: `
    :host {
      display: flex;
      align-items: center;
      gap: var(--app-space-3);
    }
    .mark {
      display: inline-flex;
      align-items: center;
      gap: var(--app-space-1);
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
    .offline {
      color: var(--app-ochre);
    }
    @media (max-width: 599px) {
      .mark-word {
        position: absolute;
        width: 1px;
        height: 1px;
        overflow: hidden;
        clip-path: inset(50%);
      }
    }
  `,
})
export class BarEnd {
  protected readonly online = inject(Connectivity).online;
  protected readonly outbox = inject(OutboxStart);
}
