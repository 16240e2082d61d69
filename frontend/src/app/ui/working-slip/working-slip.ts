import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Judgement } from '#shared/checklist/judgement';
import type { UnitSystem } from '#shared/units/unit-system';
import { JudgedOf } from '../words/judged-words';
import { readingLanguage } from '../words/reading-language';
import { shortSource, workingLines } from './working-text';

/** The torn-edge slip under a result: how it was worked out, line by line with units, and the formula's source. */
@Component({
  selector: 'app-working-slip',
  imports: [JudgedOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'ui'">
      @if (slips().length > 0) {
        <details [open]="open()">
          <summary>{{ t('working') }}</summary>
          @for (slip of slips(); track $index) {
            <section class="slip">
              <p class="formula">{{ slip.formula | appJudged: 'formula' }}</p>
              <dl>
                @for (line of slip.lines; track $index) {
                  <div [class.result]="$last">
                    <dt>{{ line.label | appJudged: 'figure' }}</dt>
                    <dd>{{ line.text }}</dd>
                  </div>
                }
              </dl>
              @if (slip.isLastOfSource) {
                <p class="source">{{ t('source') }}: {{ slip.short }}</p>
                @if (slip.short !== slip.source) {
                  <details class="source">
                    <summary>{{ t('sourceInFull') }}</summary>
                    <p>{{ slip.source }}</p>
                  </details>
                }
              }
            </section>
          }
        </details>
      }
    </ng-container>
  `,
  styleUrl: './working-slip.scss',
})
export class WorkingSlip {
  readonly working = input.required<Judgement['working']>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly open = input(false);

  private readonly language = readingLanguage();

  protected readonly slips = computed(() =>
    this.working().map((working, index, all) => ({
      formula: working.formula,
      source: working.source,
      short: shortSource(working.source),
      // Several pairs of one reading share their source, and it is long: it stands under the last of them.
      isLastOfSource: all[index + 1]?.source !== working.source,
      lines: workingLines(working, this.unitSystem(), this.language()),
    })),
  );
}
