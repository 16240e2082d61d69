import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { StepDraft } from './step-draft';

/** Free words. */
@Component({
  selector: 'app-note-step',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label>
      <span>{{ 'work.note' | transloco }}</span>
      <textarea rows="5" maxlength="4000" [value]="typed().text" (input)="take($event)"></textarea>
    </label>
  `,
  styleUrl: './words-box.scss',
})
export class NoteStep {
  private readonly draft = inject(StepDraft);
  protected readonly typed = this.draft.form({ text: this.draft.previousOf('note')?.text ?? '' });

  constructor() {
    effect(() => {
      const text = this.typed().text.trim();
      this.draft.propose(text === '' ? null : { kind: 'note', text }, 'words');
    });
  }

  protected take(event: Event): void {
    this.typed.set({ text: (event.target as HTMLTextAreaElement).value });
  }
}
