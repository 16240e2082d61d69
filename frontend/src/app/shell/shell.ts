import { ChangeDetectionStrategy, Component, computed, DOCUMENT, inject } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { AppErrors } from './app-errors';
import { BarEnd } from './bar-end';
import { navigationFor } from './navigation';

/** The bar above every page: where one is, where one may go, who one is, and whether there is a network. */
@Component({
  selector: 'app-shell',
  imports: [BarEnd, RouterLink, RouterLinkActive, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  host: { '[class.offline]': '!online()' },
})
export class Shell {
  private readonly document = inject(DOCUMENT);
  private readonly session = inject(Session);
  protected readonly errors = inject(AppErrors);
  protected readonly online = inject(Connectivity).online;
  protected readonly me = this.session.me;
  protected readonly links = computed(() => navigationFor(this.me(), this.session.isSignedIn()));
  protected readonly needsSignIn = computed(() => this.session.standing() === 'phoneOnly');

  /** A plain fragment link would make the router navigate away from pages that live below the root. */
  protected skipToPage(event: Event): void {
    event.preventDefault();
    this.document.getElementById('page')?.focus();
  }
}
