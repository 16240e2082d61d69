import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import { DateTimeOf } from '../ui/date-time-of';

/** A gap between recording and arriving beyond which it is worth saying that the phone was offline. */
const WORTH_SAYING_MS = 5 * 60_000;

/** Who recorded an entry and when, on the phone's clock, and when it arrived where that was much later. */
@Component({
  selector: 'app-entry-line',
  imports: [DateTimeOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p *transloco="let t; prefix: 'reviews'">
      <span class="who">{{ author() }}</span>
      <time [attr.datetime]="entry().body.deviceTime">
        {{ entry().body.deviceTime | appDateTime: sequence().timeZone }}
      </time>
      @if (arrivedLater(); as at) {
        <span>{{ t('arrived') }} {{ at | appDateTime: sequence().timeZone }}</span>
      }
    </p>
  `,
  styles: `
    p {
      display: flex;
      flex-wrap: wrap;
      gap: 0 var(--app-space-3);
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
    .who {
      color: var(--app-ink);
      font-weight: 500;
    }
  `,
})
export class EntryLine {
  readonly entry = input.required<FoldEntry>();
  readonly sequence = input.required<SequenceDetail>();

  protected readonly author = computed(
    () => this.sequence().people.find(({ id }) => id === this.entry().body.authorId)?.name ?? '–',
  );
  protected readonly arrivedLater = computed(() => {
    const stored = this.sequence().entries.find(({ body }) => body.id === this.entry().body.id);
    if (!stored) return null;
    const gap = Date.parse(stored.server.receivedAt) - Date.parse(stored.body.deviceTime);
    return gap > WORTH_SAYING_MS ? stored.server.receivedAt : null;
  });
}
