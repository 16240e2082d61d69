import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  resource,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { auditTime, filter } from 'rxjs';
import type { Signature } from '#shared/checklist/signature';
import type { HandoverPackage } from '#shared/contracts/packages';
import type { PackageId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { PasswordAgain } from '../session/password-again';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { DateTimeOf } from '../ui/date-time-of';
import { ClosedJoint } from '../ui/joint/closed-joint';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { lastRead } from '../ui/pages/last-read';
import { withPassword } from '../ui/pages/with-password';
import { problemCodeOf } from '../ui/problem-of';
import { SignatureBox } from '../ui/signature/signature-box';
import { SignatureView } from '../ui/signature/signature-view';
import { countedKey } from '../ui/words/counted';
import { readingLanguage } from '../ui/words/reading-language';
import { fileNameOf, grouped, sizeText } from './package-facts';
import { PackageState } from './package-state';
import { PackagesApi } from './packages-api';

/** While the package is built, progress is read this often; an event tells when it is done. */
const POLL_MS = 2000;

/** One handover package: what it is, the document, how to check it, and the contractor's acceptance. */
@Component({
  selector: 'app-package-page',
  imports: [
    ClosedJoint,
    DateTimeOf,
    LoadingNote,
    MatButton,
    OfflineNote,
    PackageState,
    ProblemNote,
    RouterLink,
    SignatureBox,
    SignatureView,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './package-page.html',
  styleUrl: './package-page.scss',
})
export class PackagePage {
  readonly packageId = input.required<PackageId>();

  private readonly api = inject(PackagesApi);
  private readonly session = inject(Session);
  private readonly passwordAgain = inject(PasswordAgain);
  private readonly language = readingLanguage();
  protected readonly online = inject(Connectivity).online;

  protected readonly detail = resource({
    params: () => this.packageId(),
    loader: ({ params }) => this.api.package(params),
  });
  protected readonly fingerprint = resource({ loader: () => this.api.fingerprint() });
  protected readonly pack = lastRead<HandoverPackage>(this.detail);
  protected readonly documentUrl = computed(() => this.api.documentUrl(this.packageId()));
  protected readonly fileName = computed(() => {
    const pack = this.pack();
    return pack ? fileNameOf(pack) : '';
  });
  protected readonly size = computed(() => {
    const bytes = this.pack()?.bytes ?? null;
    return bytes === null ? '' : sizeText(bytes, this.language());
  });
  protected readonly hash = computed(() => grouped(this.pack()?.sha256 ?? ''));
  protected readonly key = computed(() =>
    this.fingerprint.hasValue() ? grouped(this.fingerprint.value()) : null,
  );
  protected readonly missing = computed(() => {
    const pack = this.pack();
    return pack ? pack.circuitsTotal - pack.circuitsApproved : 0;
  });
  protected readonly isPartial = computed(() => this.missing() > 0);
  protected readonly countedKey = countedKey;
  protected readonly canAccept = computed(() => {
    const pack = this.pack();
    return pack?.state === 'issued' && !pack.acceptance && this.session.may('package.accept', pack.openingId);
  });
  protected readonly printedName = computed(() => this.session.me()?.name ?? '');
  protected readonly signature = signal<Signature | null>(null);
  protected readonly isSending = signal(false);
  protected readonly problem = signal<unknown>(null);

  constructor() {
    inject(LiveEvents)
      .on('packageChanged')
      .pipe(
        filter((event) => event.packageId === this.packageId()),
        auditTime(500),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.detail.reload());
    // Pushes out of Angular: a timer that runs only while there is progress to see.
    effect((onCleanup) => {
      if (this.pack()?.state !== 'building') return;
      const timer = setInterval(() => this.detail.reload(), POLL_MS);
      onCleanup(() => clearInterval(timer));
    });
  }

  /** Signs for exactly the document whose hash stands on the screen. */
  protected async accept(): Promise<void> {
    const signature = this.signature();
    const sha256 = this.pack()?.sha256;
    if (!signature || !sha256 || this.isSending()) return;
    this.isSending.set(true);
    this.problem.set(null);
    try {
      await withPassword(
        () => this.api.accept(this.packageId(), sha256, signature),
        () => this.passwordAgain.ask(),
      );
      this.signature.set(null);
      this.detail.reload();
    } catch (error) {
      this.problem.set(error);
      if (['changedMeanwhile', 'alreadyThere', 'wrongState'].includes(problemCodeOf(error)))
        this.detail.reload();
    } finally {
      this.isSending.set(false);
    }
  }
}
