import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { SuperheatAnswer } from '#shared/checklist/kinds/superheat';
import { DateTimeOf } from '../date-time-of';
import { readingLanguage } from '../words/reading-language';
import { superheatLines, type SuperheatLine } from './superheat-lines';

/** What belongs to a superheat beyond its pairs: series, turns of the valve, conditions, where and with what it was read. */
@Component({
  selector: 'app-superheat-extras',
  imports: [DateTimeOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <dl *transloco="let t; prefix: 'ui'">
      @for (line of lines(); track $index) {
        <div>
          <dt>{{ t(line.label, line.labelValues ?? {}) }}</dt>
          <dd>
            {{ line.text }}
            @for (key of line.keys ?? []; track key) {
              {{ t(key, valuesOf(line)) }}
            }
            @if (line.at) {
              <small>{{ line.at | appDateTime: timeZone() }}</small>
            }
          </dd>
        </div>
      }
    </dl>
  `,
  styles: `
    dl {
      max-width: 34rem;
      margin: 0 0 var(--app-space-3);
    }
    div {
      display: flex;
      flex-wrap: wrap;
      justify-content: space-between;
      gap: 0 var(--app-space-4);
      padding: var(--app-space-1) 0;
      border-bottom: 1px solid color-mix(in srgb, var(--app-rule) 40%, transparent);
    }
    dd {
      margin: 0 0 0 auto;
      text-align: right;
    }
    small {
      display: block;
      color: var(--app-ink-soft);
    }
  `,
})
export class SuperheatExtras {
  readonly answer = input.required<SuperheatAnswer>();
  /** The store's, where it is known; else the reader's own. */
  readonly timeZone = input<string>();

  private readonly language = readingLanguage();
  protected readonly lines = computed(() => superheatLines(this.answer(), this.language()));

  protected valuesOf({ values = {} }: SuperheatLine): Record<string, string | number> {
    return Object.fromEntries(
      Object.entries(values).map(([name, value]) => [name, typeof value === 'string' ? value : value]),
    );
  }
}
