import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import { signaturePath, type Signature } from '#shared/checklist/signature';

/** A signature that was given, as lines at any size, over the printed name. */
@Component({
  selector: 'app-signature-view',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <figure *transloco="let t; prefix: 'ui'">
      @if (signature().typed) {
        <span class="typed">{{ signature().printedName }}</span>
      } @else {
        <svg
          role="img"
          [attr.aria-label]="t('signature_of', { name: signature().printedName })"
          [attr.viewBox]="'0 0 ' + signature().width + ' ' + signature().height"
        >
          <path [attr.d]="path()" />
        </svg>
      }
      <figcaption>
        {{ signature().printedName }}
        @if (signature().typed) {
          <small>({{ t('signature_typed') }})</small>
        }
      </figcaption>
    </figure>
  `,
  styles: `
    figure {
      max-width: 20rem;
      margin: 0;
    }
    svg {
      display: block;
      width: 100%;
      max-height: 120px;
      overflow: visible;
    }
    path {
      fill: none;
      stroke: var(--app-ink);
      stroke-width: 2;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
    .typed {
      display: block;
      padding: var(--app-space-2) 0;
      font-size: var(--app-size-3);
      font-style: italic;
    }
    figcaption {
      border-top: 1px solid var(--app-rule);
      color: var(--app-ink-soft);
    }
  `,
})
export class SignatureView {
  readonly signature = input.required<Signature>();

  protected readonly path = computed(() => signaturePath(this.signature()));
}
