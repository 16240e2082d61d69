import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Caution } from '#shared/checklist/text';
import { TextOf } from '../text-of';

/** A danger of the step at hand: a hatched edge, the hazard's name first, then the sentence. */
@Component({
  selector: 'app-caution',
  imports: [TranslocoDirective, TextOf],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p *transloco="let t; prefix: 'ui'" role="note">
      <strong>{{ t('hazard_' + caution().hazard) }}.</strong> {{ caution().text | appText }}
    </p>
  `,
  styles: `
    :host {
      display: block;
    }
    p {
      position: relative;
      margin: 0;
      padding: var(--app-space-3) var(--app-space-4) var(--app-space-3) calc(var(--app-space-4) + 12px);
      background: color-mix(in srgb, var(--app-ochre) 8%, var(--app-sheet));
      color: var(--app-ink);
    }
    p::before {
      position: absolute;
      inset: 0 auto 0 0;
      width: 12px;
      background: repeating-linear-gradient(-45deg, var(--app-ochre) 0 4px, var(--app-sheet) 4px 8px);
      content: '';
    }
    strong {
      color: var(--app-ochre);
    }
  `,
})
export class CautionNote {
  readonly caution = input.required<Caution>();
}
