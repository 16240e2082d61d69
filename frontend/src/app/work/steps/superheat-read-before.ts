import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { FoldEntry } from '#shared/sequences/fold';
import type { UnitSystem } from '#shared/units/unit-system';
import { QuantityOf } from '../../ui/quantity-of';
import { typedInputs } from '../../ui/answer-view/answer-figures';
import { readingLanguage } from '../../ui/words/reading-language';
import { timeOfDay } from '../coil-walk/clock-text';
import { UNITS } from '#shared/units/unit';

/** What a coil read before something on its circuit was changed: to compare with, never to take over. */
@Component({
  selector: 'app-superheat-read-before',
  imports: [QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p>
      {{ 'work.readBefore' | transloco: { time: time() } }}
      <span class="figures">{{ superheatK() | appQuantity: 'temperatureDifference' : unitSystem() }}</span>
      @if (texts(); as texts) {
        &ngsp;<span class="soft figures">({{ texts }})</span>
      }
    </p>
  `,
  styles: `
    :host {
      display: block;
    }
    p {
      padding-left: var(--app-space-3);
      border-left: 4px solid var(--app-rule);
    }
    .soft {
      color: var(--app-ink-soft);
      font-size: var(--app-size-1);
    }
  `,
})
export class SuperheatReadBefore {
  readonly entry = input.required<FoldEntry>();
  readonly unitSystem = input.required<UnitSystem>();

  private readonly language = readingLanguage();
  protected readonly time = computed(() => timeOfDay(this.entry().body.deviceTime, this.language()));
  protected readonly superheatK = computed(() => {
    const { content } = this.entry().body;
    const figures =
      this.entry().server.judgement?.figures ?? (content.kind === 'answer' ? content.workedOut.figures : []);
    return figures.find(({ label }) => label === 'superheat')?.value ?? null;
  });
  /** What stood in the boxes of a steady or hunting valve as left. */
  protected readonly texts = computed(() =>
    typedInputs(this.entry().body.content)
      .filter(({ label }) => label.includes('Left'))
      .map(({ typed }) => `${typed.text}\u00a0${UNITS[typed.unit].symbol}`)
      .join(' · '),
  );
}
