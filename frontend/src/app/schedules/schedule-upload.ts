import { computed, inject, Injectable, signal, type OnDestroy } from '@angular/core';
import type { Subscription } from 'rxjs';
import type { ScheduleImport, ScheduleProblem } from '#shared/contracts/schedules';
import type { OpeningId } from '#shared/plant/ids';
import { fileFault, refusedRows } from './schedule-file';
import { SchedulesApi } from './schedules-api';

/** Where the import of one file stands. `sent` is null while the server reads what it has. */
export type UploadState =
  | { readonly kind: 'choosing' }
  | { readonly kind: 'unfit'; readonly fault: 'tooLarge' | 'empty' | 'notCsv' }
  | { readonly kind: 'sending'; readonly isImport: boolean; readonly sent: number | null }
  | { readonly kind: 'checked'; readonly read: ScheduleImport }
  | { readonly kind: 'imported'; readonly read: ScheduleImport }
  | { readonly kind: 'refused'; readonly rows: readonly ScheduleProblem[] }
  | { readonly kind: 'failed'; readonly error: unknown; readonly isImport: boolean };

/** One schedule on its way in: first only checked, then, on request, stored. Provided by the page that shows it. */
@Injectable()
export class ScheduleUpload implements OnDestroy {
  private readonly api = inject(SchedulesApi);
  private readonly current = signal<UploadState>({ kind: 'choosing' });
  private readonly chosen = signal<File | null>(null);
  private running: Subscription | null = null;

  readonly state = this.current.asReadonly();
  readonly file = this.chosen.asReadonly();
  readonly isBusy = computed(() => this.current().kind === 'sending');

  /** Takes a file and has it checked; nothing is stored by that. */
  check(openingId: OpeningId, file: File): void {
    this.stop();
    this.chosen.set(file);
    const fault = fileFault(file);
    if (fault) this.current.set({ kind: 'unfit', fault });
    else this.send(openingId, file, false);
  }

  /** Stores the file that was checked. */
  import(openingId: OpeningId): void {
    const file = this.chosen();
    if (file && !this.isBusy()) this.send(openingId, file, true);
  }

  /** Does again what failed. */
  retry(openingId: OpeningId): void {
    const state = this.current();
    const file = this.chosen();
    if (state.kind === 'failed' && file) this.send(openingId, file, state.isImport);
  }

  /** Stops what is under way; the file stays chosen, so that it can be checked again. */
  stop(): void {
    this.running?.unsubscribe();
    this.running = null;
    if (this.isBusy()) this.current.set({ kind: 'choosing' });
  }

  ngOnDestroy(): void {
    this.running?.unsubscribe();
  }

  private send(openingId: OpeningId, file: File, isImport: boolean): void {
    this.current.set({ kind: 'sending', isImport, sent: 0 });
    this.running = this.api.upload(openingId, file, isImport).subscribe({
      next: (step) =>
        this.current.set(
          'read' in step
            ? { kind: isImport ? 'imported' : 'checked', read: step.read }
            : { kind: 'sending', isImport, sent: step.sent },
        ),
      error: (error: unknown) => {
        const rows = refusedRows(error);
        this.current.set(rows.length > 0 ? { kind: 'refused', rows } : { kind: 'failed', error, isImport });
      },
    });
  }
}
