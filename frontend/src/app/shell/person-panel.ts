import {
  ChangeDetectionStrategy,
  Component,
  inject,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { Router } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { httpFailure } from '../session/problem-code';
import { Session } from '../session/session';
import { FirstIcon } from '../ui/first-icon/first-icon';
import { LanguageChoice, SCREEN_LANGUAGES } from './language-choice';
import { LookChoice, LOOKS } from './look-choice';
import { OutboxStart } from './outbox-start';

/** Who is here, the language, the look, and the way out: a native popover, so nothing heavy loads for it. */
@Component({
  selector: 'app-person-panel',
  imports: [FirstIcon, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './person-panel.html',
  styleUrl: './person-panel.scss',
})
export class PersonPanel {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly panel = viewChild.required<ElementRef<HTMLElement>>('panel');
  protected readonly outbox = inject(OutboxStart);
  protected readonly languageChoice = inject(LanguageChoice);
  protected readonly lookChoice = inject(LookChoice);
  protected readonly me = this.session.me;
  protected readonly languages = SCREEN_LANGUAGES;
  protected readonly looks = LOOKS;
  protected readonly couldNotSignOut = signal(false);

  protected async signOut(): Promise<void> {
    this.couldNotSignOut.set(false);
    try {
      await this.session.signOut();
      this.panel().nativeElement.hidePopover();
      await this.router.navigateByUrl('/sign-in');
    } catch (error) {
      // Without a network the server would still hold the session open: say so instead of pretending.
      if (!httpFailure(error)) throw error;
      this.couldNotSignOut.set(true);
    }
  }
}
