import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type {
  LoggerProblem,
  ReadLoggerOptions,
  UnreadableCell,
} from '#shared/refrigeration/logger/logger-file';
import { readingLanguage } from '../../ui/words/reading-language';
import { logNote } from './log-notes';

/** What a logger's file was odd about, in sentences, and the other ways in which it can be read. */
@Component({
  selector: 'app-logger-notes',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ul class="notes">
      @for (note of notes(); track note.key + $index) {
        <li [class.asks]="note.offers.length > 0">
          <p>{{ note.key | transloco: note.params }}</p>
          @if (note.cells.length > 0) {
            <ul>
              @for (cell of note.cells; track $index) {
                <li>{{ 'work.log_cell' | transloco: paramsOf(cell) }}</li>
              }
            </ul>
          }
          @for (offer of note.offers; track offer.key) {
            <button type="button" (click)="readAgain.emit(offer.options)">{{ offer.key | transloco }}</button>
          }
        </li>
      }
    </ul>
  `,
  styleUrl: './logger-notes.scss',
})
export class LoggerNotes {
  readonly problems = input.required<readonly LoggerProblem[]>();
  /** Somebody said how the file is to be read. */
  readonly readAgain = output<ReadLoggerOptions>();

  private readonly language = readingLanguage();
  protected readonly notes = computed(() =>
    this.problems().map((problem) => logNote(problem, this.language())),
  );

  protected paramsOf({ row, heading, text }: UnreadableCell): Record<string, string | number> {
    return { row, heading: heading, text: text };
  }
}
