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
    this.own.set(null);
    this.key.set(this.buildTitle(snapshot) ?? null);
  }

  /** A title that isn't a key, until the next navigation. */
  set(title: string): void {
    this.own.set(title);
  }
}
