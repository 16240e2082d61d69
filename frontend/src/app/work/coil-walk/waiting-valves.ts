import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, effect, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import { SequenceCache } from '../../offline/sequence-cache';
import { Session } from '../../session/session';
import { TextOf } from '../../ui/text-of';
import { readingLanguage } from '../../ui/words/reading-language';
import { DraftKeeper } from '../steps/draft-keeper';
import { countdownText } from './clock-text';
import { ticking } from './phone-clock';
import { turnedValve, waitingRows, type TurnedValve, type WaitingRow } from './waiting-rows';

const keyOf = ({ sequenceId, stepKey }: WaitingRow): string => `${sequenceId} ${stepKey}`;

/** The valves that settle meanwhile, of all circuits that are worked on with this phone. Nothing where there is none. */
@Component({
  selector: 'app-waiting-valves',
  imports: [RouterLink, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (rows().length > 0) {
      <section>
        <h2>{{ 'work.waitingValves' | transloco }}</h2>
        @for (row of rows(); track row.sequenceId + row.stepKey) {
          <a [routerLink]="['/work', row.sequenceId]" [queryParams]="{ at: row.stepKey }">
            <span class="code figures">{{ row.code }}</span>
            <span>{{ row.title | appText }}</span>
            @if (row.wait.isOver) {
              <span class="over">{{ 'work.waitOver' | transloco }}</span>
            } @else {
              <span class="figures left">{{ left(row) }}</span>
            }
          </a>
        }
      </section>
    }
  `,
  styles: `
    section {
      margin-top: var(--app-space-4);
      padding-left: var(--app-space-3);
      border-left: 8px solid;
      border-image: var(--app-hatch) 8;
    }
    h2 {
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
      font-weight: 500;
    }
    a {
      display: grid;
      grid-template-columns: auto 1fr auto;
      align-items: center;
      gap: var(--app-space-3);
      min-height: var(--app-target);
      border-bottom: 1px solid var(--app-rule-thin);
      color: var(--app-ink);
      text-decoration: none;
    }
    .code {
      font-size: var(--app-size-3);
    }
    .left {
      color: var(--app-ochre);
      font-size: var(--app-size-3);
    }
    .over {
      max-width: 9rem;
      color: var(--app-copper);
      font-weight: 600;
      text-align: right;
    }
  `,
})
export class WaitingValves {
  private readonly drafts = inject(DraftKeeper);
  private readonly cache = inject(SequenceCache);
  private readonly me = inject(Session).me;
  private readonly announcer = inject(LiveAnnouncer);
  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  private readonly now = ticking();
  private readonly valves = signal<readonly TurnedValve[]>([]);
  protected readonly rows = computed(() => waitingRows(this.valves(), this.now()));
  private running: ReadonlySet<string> = new Set();

  constructor() {
    void this.read();
    effect(() => this.tellSettled(this.rows()));
  }

  protected left({ wait }: WaitingRow): string {
    return countdownText(wait.remainingS);
  }

  /** Drafts name their circuit by its id only; code and titles come from what this phone keeps of it. */
  private async read(): Promise<void> {
    const me = this.me();
    if (!me) return;
    const valves = await Promise.all(
      this.drafts
        .all()
        .map(async (draft) =>
          turnedValve(draft, (await this.cache.sequence(me.id, draft.sequenceId))?.detail ?? null),
        ),
    );
    this.valves.set(valves.filter((valve) => valve !== null));
  }

  private tellSettled(rows: readonly WaitingRow[]): void {
    for (const row of rows.filter((one) => one.wait.isOver && this.running.has(keyOf(one)))) {
      const coil = `${row.code}, ${row.title[this.language()]}`;
      void this.announcer.announce(this.words.translate('work.coilSettled', { coil }, this.language()));
    }
    this.running = new Set(rows.filter(({ wait }) => !wait.isOver).map(keyOf));
  }
}
