import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  effect,
  inject,
  Injector,
  input,
  resource,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { auditTime, filter } from 'rxjs';
import { LANGUAGES, type Language } from '#shared/checklist/text';
import type { OpeningId, PackageId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { lastRead } from '../ui/pages/last-read';
import { countedKey } from '../ui/words/counted';
import { readingLanguage } from '../ui/words/reading-language';
import { newestFirst, sizeText } from './package-facts';
import { PackageState } from './package-state';
import { PackagesApi } from './packages-api';

/** While a package is built, progress is read this often; events tell when it is done. */
const POLL_MS = 2000;

/** All handover packages of an opening, the newest on top; a lead issues the next one here. */
@Component({
  selector: 'app-packages-page',
  imports: [
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    PackageState,
    ProblemNote,
    RouterLink,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './packages-page.html',
  styleUrl: './packages-page.scss',
})
export class PackagesPage {
  readonly openingId = input.required<OpeningId>();

  private readonly api = inject(PackagesApi);
  private readonly session = inject(Session);
  private readonly reading = readingLanguage();
  private readonly document = inject(DOCUMENT);
  private readonly injector = inject(Injector);
  protected readonly online = inject(Connectivity).online;

  protected readonly languages = LANGUAGES;
  protected readonly list = resource({
    params: () => this.openingId(),
    loader: ({ params }) => this.api.packages(params),
  });
  protected readonly read = lastRead(this.list);
  protected readonly rows = computed(() =>
    newestFirst(this.read() ?? []).map((pack) => ({
      pack,
      size: pack.bytes === null ? null : sizeText(pack.bytes, this.reading()),
    })),
  );
  protected readonly isBuilding = computed(() => this.rows().some(({ pack }) => pack.state === 'building'));
  protected readonly mayIssue = computed(() => this.session.may('package.issue', this.openingId()));
  protected readonly language = signal<Language>(this.reading());
  /** The language of the version that the reader is asked to confirm; `null` while nothing is asked. */
  protected readonly asked = signal<Language | null>(null);
  protected readonly coverage = resource({
    params: () => (this.asked() === null ? undefined : this.openingId()),
    loader: ({ params }) => this.api.coverage(params),
  });
  protected readonly countedKey = countedKey;
  protected readonly isSending = signal(false);
  protected readonly problem = signal<unknown>(null);

  constructor() {
    inject(LiveEvents)
      .on('packageChanged')
      .pipe(
        filter((event) => event.openingId === this.openingId()),
        auditTime(500),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.list.reload());
    // Pushes out of Angular: a timer that runs only while there is progress to see.
    effect((onCleanup) => {
      if (!this.isBuilding()) return;
      const timer = setInterval(() => this.list.reload(), POLL_MS);
      onCleanup(() => clearInterval(timer));
    });
  }

  /** Asks first, with what the version will say: it can't be taken back. */
  protected ask(language: Language): void {
    this.asked.set(language);
    afterNextRender(() => this.document.getElementById('confirm-title')?.focus(), {
      injector: this.injector,
    });
  }

  /** Issues in the language asked for: a new version, or again what failed or was cancelled. */
  protected async issue(): Promise<void> {
    const language = this.asked();
    if (language === null) return;
    await this.change(() => this.api.issue(this.openingId(), language));
    this.asked.set(null);
  }

  protected cancel(packageId: PackageId): Promise<void> {
    return this.change(() => this.api.cancel(packageId));
  }

  protected chooseLanguage(value: string): void {
    this.language.set(LANGUAGES.find((language) => language === value) ?? 'en');
  }

  private async change(call: () => Promise<unknown>): Promise<void> {
    if (this.isSending()) return;
    this.isSending.set(true);
    this.problem.set(null);
    try {
      await call();
      this.list.reload();
    } catch (error) {
      this.problem.set(error);
    } finally {
      this.isSending.set(false);
    }
  }
}
