import { effect, inject, Injectable, signal } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { TitleStrategy, type RouterStateSnapshot } from '@angular/router';
import { TranslocoService } from '@jsverse/transloco';
import { LanguageChoice } from './language-choice';

/**
 * Page titles: a route's `title` is a key of the words; a page that knows better (a circuit's code) says so with `set`.
 */
@Injectable({ providedIn: 'root' })
export class PageTitles extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly words = inject(TranslocoService);
  private readonly choice = inject(LanguageChoice);
  private readonly key = signal<string | null>(null);
  private readonly own = signal<string | null>(null);
  private path = '';

  constructor() {
    super();
    effect(() => {
      this.choice.language();
      const key = this.key();
      const page = this.own() ?? (key ? this.words.translate<string>(key) : null);
      this.title.setTitle(page ? `${page} · Firstcold` : 'Firstcold');
    });
  }

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const path = snapshot.url.replace(/[?#].*$/, '');
    // Another place on the same page: the page knows its own title, and says so when that changes with the place.
    if (path !== this.path) this.own.set(null);
    this.path = path;
    this.key.set(this.buildTitle(snapshot) ?? null);
  }

  /** A title that isn't a key, until another page opens. The page says it anew in another language. */
  set(title: string): void {
    this.own.set(title);
  }
}
