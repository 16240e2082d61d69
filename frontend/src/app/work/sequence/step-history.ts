import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Step } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import type { UnitSystem } from '#shared/units/unit-system';
import { AnswerView, type PhotoUrl } from '../../ui/answer-view/answer-view';
import { EntryStamp } from './entry-stamp';
import { SequenceStore } from './sequence-store';

/** What was recorded on a step before: nothing is ever replaced, only superseded. */
@Component({
  selector: 'app-step-history',
  imports: [AnswerView, EntryStamp, MatIconModule, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (earlier().length > 0) {
      <details>
        <summary>
          <mat-icon svgIcon="history" />{{ 'work.earlierEntries' | transloco: { count: earlier().length } }}
        </summary>
        @for (entry of earlier(); track entry.body.id) {
          <article>
            @if (isStale() && $first) {
              <p class="stale">{{ 'work.stale' | transloco }}</p>
            }
            <app-entry-stamp
              [entry]="entry"
              [name]="store.nameOf(entry.body.authorId)"
              [timeZone]="timeZone()"
            />
            <app-answer-view
              [step]="step()"
              [entry]="entry"
              [unitSystem]="unitSystem()"
              [photoUrl]="photoUrl()"
              [timeZone]="timeZone()"
              (openPhoto)="openPhoto.emit({ entry, index: $event })"
            />
          </article>
        }
      </details>
    }
  `,
  styles: `
    summary {
      display: flex;
      align-items: center;
      gap: var(--app-space-2);
      min-height: var(--app-target);
      color: var(--app-ink-soft);
      cursor: pointer;
    }
    .stale {
      color: var(--app-plum);
      font-weight: 500;
    }
    article {
      padding: var(--app-space-3) 0;
      border-top: 1px solid var(--app-rule-thin);
    }
  `,
})
export class StepHistory {
  readonly step = input.required<Step>();
  readonly history = input.required<readonly FoldEntry[]>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly timeZone = input.required<string>();
  readonly photoUrl = input.required<PhotoUrl>();
  /** Whether the last entry belongs to the history too, because the step is being asked anew. */
  readonly withLast = input(false);
  /** Whether the last entry was read before a valve, regulator or set point was changed. */
  readonly isStale = input(false);

  /** A photo of an earlier entry that is asked for at full size. */
  readonly openPhoto = output<{ readonly entry: FoldEntry; readonly index: number }>();

  protected readonly store = inject(SequenceStore);
  /** Newest first; without the last one where the sheet shows that itself. */
  protected readonly earlier = computed(() =>
    this.history()
      .slice(0, this.withLast() ? undefined : -1)
      .reverse(),
  );
}
