import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  ErrorHandler,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Subscription } from 'rxjs';
import type { ReadLoggerOptions } from '#shared/refrigeration/logger/logger-file';
import { readingLanguage } from '../../ui/words/reading-language';
import { firstChoices, pickedLog, type ColumnChoices, type PickedLog, type WantedColumn } from './log-choice';
import { logTime } from './log-notes';
import type { LogReading, LogRefusal } from './log-reading';
import { LoggerColumns } from './logger-columns';
import { LoggerNotes } from './logger-notes';
import { LoggerReader } from './logger-reader';

/** The file that was chosen last, and what was said about how to read it. */
interface ChosenFile {
  readonly file: File;
  readonly options: ReadLoggerOptions;
}

/** `failed`: by a mistake of ours. */
type Refused = ChosenFile & { readonly reason: LogRefusal | 'failed' };

type ReadFile = ChosenFile & { readonly reading: Extract<LogReading, { ok: true }> };

const ELAPSED_UNITS = ['s', 'min', 'h'] as const;

/**
 * Takes columns out of a data logger's file: chooses it, reads it beside the page, says what is odd about it, asks what
 * the file doesn't say, and lets a person choose the columns.
 *
 * `picked` follows every change: the log once all wanted columns and their units are chosen, `null` while one isn't. A file
 * that can't be read, or whose reading is cancelled, changes nothing: the one before stays.
 *
 * @example <app-logger-picker [wanted]="[{ key: 'air', label: 'Air', dimension: 'temperature' }]" (picked)="take($event)" />
 */
@Component({
  selector: 'app-logger-picker',
  imports: [LoggerColumns, LoggerNotes, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './logger-picker.html',
  styleUrl: './logger-picker.scss',
})
export class LoggerPicker {
  /** What is to be taken from the log. May change its words, not its keys, while the picker is shown. */
  readonly wanted = input.required<readonly WantedColumn[]>();
  /** Whether a log was taken before, which another one would replace: only the button's words change. */
  readonly hasBefore = input(false);
  readonly picked = output<PickedLog | null>();

  private readonly reader = inject(LoggerReader);
  private readonly errors = inject(ErrorHandler);
  private readonly language = readingLanguage();
  private running: Subscription | undefined;
  protected readonly elapsedUnits = ELAPSED_UNITS;
  /** The file that is being read, and how far it is. */
  protected readonly underWay = signal<(ChosenFile & { readonly share: number }) | null>(null);
  protected readonly refused = signal<Refused | null>(null);
  protected readonly read = signal<ReadFile | null>(null);
  protected readonly choices = signal<ColumnChoices>({});
  protected readonly log = computed(() => this.read()?.reading.log ?? null);

  constructor() {
    inject(DestroyRef).onDestroy(() => this.running?.unsubscribe());
  }

  protected choose(box: HTMLInputElement): void {
    const file = box.files?.[0];
    // Empty again, so that the same file can be chosen twice.
    box.value = '';
    if (file) this.start({ file, options: {} });
  }

  protected cancel(): void {
    this.running?.unsubscribe();
    this.underWay.set(null);
  }

  /** Reads the file once more, knowing more about it. */
  protected readAgain({ file, options }: ChosenFile, more: ReadLoggerOptions): void {
    this.start({ file, options: { ...options, ...more } });
  }

  protected change(choices: ColumnChoices): void {
    this.choices.set(choices);
    this.tell();
  }

  protected summaryOf(one: ReadFile): Record<string, string | number> {
    const { rows, times, startText } = one.reading.log;
    const lasted = logTime(times.at(-1) ?? 0, this.language());
    return { name: this.nameOf(one), rows, lasted, start: startText };
  }

  protected nameOf({ file }: ChosenFile): string {
    return file.name;
  }

  private start(chosen: ChosenFile): void {
    this.cancel();
    this.refused.set(null);
    this.underWay.set({ ...chosen, share: 0 });
    this.running = this.reader.read(chosen.file, chosen.options).subscribe({
      next: (stage) => {
        if (stage.kind === 'reading') this.underWay.set({ ...chosen, share: stage.share });
        else this.finish(chosen, stage.reading);
      },
      error: (error: unknown) => {
        this.underWay.set(null);
        this.refused.set({ ...chosen, reason: 'failed' });
        this.errors.handleError(error);
      },
    });
  }

  private finish(chosen: ChosenFile, reading: LogReading): void {
    this.underWay.set(null);
    if (!reading.ok) return this.refused.set({ ...chosen, reason: reading.reason });
    const isSameFile = this.read()?.file === chosen.file;
    this.read.set({ ...chosen, reading });
    // Read in another way, its columns are the same: what was chosen stays.
    if (!isSameFile) this.choices.set(firstChoices(reading.log, this.wanted()));
    this.tell();
  }

  private tell(): void {
    const read = this.read();
    if (read) this.picked.emit(pickedLog(read.reading, this.wanted(), this.choices()));
  }
}
