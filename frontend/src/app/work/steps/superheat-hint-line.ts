import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { TranslocoService } from '@jsverse/transloco';
import { readingLanguage } from '../../ui/words/reading-language';
import type { HintWords } from './superheat-hint';

/** What to do with the valve next, in one sentence. Which way is only said when the valve's own sheet says it. */
@Component({
  selector: 'app-superheat-hint-line',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<p [class.caution]="hint().isCaution" role="note">{{ sentence() }}</p>`,
  styles: `
    :host {
      display: block;
    }
    p {
      padding: var(--app-space-2) var(--app-space-3);
      background: var(--app-sheet);
      border-left: 4px solid var(--app-copper-line);
      font-weight: 500;
    }
    .caution {
      border-left: 8px solid;
      border-image: var(--app-hatch) 8;
      font-weight: 600;
    }
  `,
})
export class SuperheatHintLine {
  readonly hint = input.required<HintWords>();

  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();

  protected readonly sentence = computed(() => {
    const { code, size, direction } = this.hint();
    const say = (key: string, values: Record<string, string> = {}): string =>
      this.words.translate(key, values, this.language());
    return say(`work.hint_${code}`, {
      size: size === null ? '' : say(`work.turnSize_${size}`),
      way: say(`work.way_${direction ?? 'unknown'}`),
    });
  });
}
