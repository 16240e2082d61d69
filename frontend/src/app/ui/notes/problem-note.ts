import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { TranslocoDirective } from '@jsverse/transloco';
import { isWorthRetrying, problemCodeOf, problemOf } from '../problem-of';
import { placeWords } from './place-words';

/** Why something didn't work, in a sentence, and the way to try again where that can help. */
@Component({
  selector: 'app-problem',
  imports: [MatButton, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div *transloco="let t; prefix: 'ui'" role="alert">
      <p>{{ t('failure_' + code()) }}</p>
      @if (places().length > 0) {
        <ul>
          @for (place of places(); track $index) {
            <li>{{ t(place.key, place.params) }}</li>
          }
        </ul>
      }
      @if (canRetry()) {
        <button matButton="outlined" type="button" (click)="retry.emit()">{{ t('tryAgain') }}</button>
      }
      @if (requestId(); as id) {
        <small>{{ t('requestId', { id }) }}</small>
      }
    </div>
  `,
  styles: `
    div {
      margin: var(--app-space-3) 0;
      padding: var(--app-space-3) var(--app-space-4);
      border-left: 6px double var(--app-plum);
      background: color-mix(in srgb, var(--app-plum) 7%, var(--app-sheet));
      color: var(--app-ink);
    }
    p,
    ul {
      margin: 0 0 var(--app-space-2);
    }
    p:last-child {
      margin: 0;
    }
    small {
      display: block;
      margin-top: var(--app-space-2);
      color: var(--app-ink-soft);
      font-family: var(--app-font-figures);
    }
  `,
})
export class ProblemNote {
  /** What a call ended with: an HTTP error response or any other error. */
  readonly problem = input.required<unknown>();
  /** Off where trying again is done by the form itself. */
  readonly retryable = input(true);
  readonly retry = output<void>();

  protected readonly code = computed(() => problemCodeOf(this.problem()));
  protected readonly places = computed(() =>
    (problemOf(this.problem())?.places ?? []).map(({ path }) => placeWords(path)),
  );
  protected readonly canRetry = computed(() => this.retryable() && isWorthRetrying(this.code()));
  /** Only for what a person can't put right: they may have to tell somebody which request it was. */
  protected readonly requestId = computed(() =>
    this.code() === 'bug' ? (problemOf(this.problem())?.requestId ?? null) : null,
  );
}
