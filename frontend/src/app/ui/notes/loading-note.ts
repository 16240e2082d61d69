import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';

/** Something is on its way. Shows itself after a moment only, so that a quick answer doesn't flicker. */
@Component({
  selector: 'app-loading',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p *transloco="let t; prefix: 'ui'" role="status">
      <svg width="64" height="12" aria-hidden="true" focusable="false">
        <path class="pipe" d="M0 6H64" />
        <path class="flow" d="M0 6H64" />
      </svg>
      {{ text() || t('loading') }}
    </p>
  `,
  styles: `
    p {
      display: flex;
      align-items: center;
      gap: var(--app-space-3);
      margin: 0;
      padding: var(--app-space-5) 0;
      color: var(--app-ink-soft);
      animation: appear 1ms 250ms both;
    }
    path {
      stroke-width: 4;
    }
    .pipe {
      stroke: var(--app-rule);
      stroke-opacity: 0.4;
    }
    .flow {
      stroke: var(--app-copper-line);
      stroke-dasharray: 16 48;
      animation: flow 1.2s linear infinite;
    }
    @keyframes appear {
      from {
        opacity: 0;
      }
    }
    @keyframes flow {
      from {
        stroke-dashoffset: 64;
      }
    }
    @media (prefers-reduced-motion: reduce) {
      .flow {
        animation: none;
      }
    }
  `,
})
export class LoadingNote {
  readonly text = input('');
}
