import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';

/** An address that leads nowhere. */
@Component({
  selector: 'app-not-found-page',
  imports: [RouterLink, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <section>
      <h1>{{ 'shell.notFoundTitle' | transloco }}</h1>
      <p>{{ 'shell.notFoundHint' | transloco }}</p>
      <a routerLink="/">{{ 'shell.toStart' | transloco }}</a>
    </section>
  `,
  styles: `
    section {
      display: grid;
      gap: var(--app-space-3);
      max-width: 560px;
      margin: var(--app-space-6) auto;
      padding: 0 var(--app-space-4);
    }
  `,
})
export class NotFoundPage {}
