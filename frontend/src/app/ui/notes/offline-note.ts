import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';

/** There is no network: what is shown may be old, and what needs the office can't be done now. */
@Component({
  selector: 'app-offline-note',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<p *transloco="let t; prefix: 'ui'" role="status">{{ t('offline') }}</p>`,
  styles: `
    p {
      margin: 0 0 var(--app-space-3);
      padding: var(--app-space-2) var(--app-space-4);
      border: 1px dashed var(--app-ochre);
      color: var(--app-ochre);
    }
  `,
})
export class OfflineNote {}
