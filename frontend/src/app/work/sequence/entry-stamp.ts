import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { FoldEntry } from '#shared/sequences/fold';
import { DateTimeOf } from '../../ui/date-time-of';
import { lateArrival } from './late-arrival';
import { isUnsent } from './local-view';

/** Who recorded an entry and when, on the store's clock; where it is; and that it came late, if it did. */
@Component({
  selector: 'app-entry-stamp',
  imports: [DateTimeOf, MatIconModule, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let at = entry().body.deviceTime;
    <p>
      @if (withPlace()) {
        <mat-icon [svgIcon]="isLocal() ? 'waiting' : 'sent'" />
        {{ (isLocal() ? 'work.onThisPhone' : 'work.onTheServer') | transloco }} ·
      }
      {{ name() }} ·
      <time class="figures" [attr.datetime]="at">{{ at | appDateTime: timeZone() }}</time>
    </p>
    @if (late(); as arrived) {
      <p>
        {{ 'work.arrivedLater' | transloco }}
        <time class="figures" [attr.datetime]="arrived">{{ arrived | appDateTime: timeZone() }}</time>
      </p>
    }
  `,
  styles: `
    :host {
      display: block;
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
    mat-icon {
      width: 18px;
      height: 18px;
      margin-right: var(--app-space-1);
      vertical-align: -4px;
    }
  `,
})
export class EntryStamp {
  readonly entry = input.required<FoldEntry>();
  readonly name = input.required<string>();
  readonly timeZone = input.required<string>();
  /** Whether it says that the entry is on this phone or on the server. */
  readonly withPlace = input(false);

  protected readonly isLocal = computed(() => isUnsent(this.entry()));
  protected readonly late = computed(() => lateArrival(this.entry()));
}
