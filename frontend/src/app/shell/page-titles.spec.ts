import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Title } from '@angular/platform-browser';
import { provideRouter, Router, TitleStrategy, type Routes } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { TranslocoService } from '@jsverse/transloco';
import { beforeEach, describe, expect, it } from '@jest/globals';
import type { Language } from '#shared/checklist/text';
import { APP_ROUTES } from '../app.routes';
import { withWords } from '../ui/words/with-words.fixture';
import { LanguageChoice } from './language-choice';
import { PageTitles } from './page-titles';

@Component({ selector: 'app-blank', changeDetection: ChangeDetectionStrategy.OnPush, template: '' })
class Blank {}

describe('PageTitles', () => {
  const language = signal<Language>('en');
  let harness: RouterTestingHarness;
  const title = (): string => {
    TestBed.tick();
    return TestBed.inject(Title).getTitle();
  };

  beforeEach(async () => {
    language.set('en');
    TestBed.configureTestingModule({
      imports: [withWords()],
      providers: [
        provideRouter([
          { path: 'work', title: 'shell.pageWork', component: Blank },
          { path: 'work/:id', title: 'shell.pageWork', component: Blank },
        ]),
        { provide: TitleStrategy, useExisting: PageTitles },
        { provide: LanguageChoice, useValue: { language } },
      ],
    });
    harness = await RouterTestingHarness.create('/work');
  });

  it('are words of the route, in the language of the screens', () => {
    expect(title()).toBe('My circuits · Firstcold');
    TestBed.inject(TranslocoService).setActiveLang('es');
    language.set('es');
    expect(title()).toBe('Mis circuitos · Firstcold');
  });

  it('stay what a page says while it only moves from place to place', async () => {
    await harness.navigateByUrl('/work/7?at=a');
    TestBed.inject(PageTitles).set('A12 · 1. Superheat');
    expect(title()).toBe('A12 · 1. Superheat · Firstcold');
    await TestBed.inject(Router).navigateByUrl('/work/7?at=b');
    expect(title()).toBe('A12 · 1. Superheat · Firstcold');
  });

  it('are no longer what the page before said', async () => {
    await harness.navigateByUrl('/work/7?at=a');
    TestBed.inject(PageTitles).set('A12 · 1. Superheat');
    await harness.navigateByUrl('/work/8');
    expect(title()).toBe('My circuits · Firstcold');
  });
});

describe('the routes', () => {
  /** Paths of all pages that have no title, neither their own nor that of a route above them. */
  function untitled(routes: Routes, above: string, isTitled: boolean): string[] {
    return routes
      .filter(({ redirectTo }) => redirectTo === undefined)
      .flatMap((route) => {
        const has = isTitled || route.title !== undefined;
        const path = `${above}/${route.path ?? ''}`;
        if (route.children) return untitled(route.children, path, has);
        return has ? [] : [path];
      });
  }

  it('all have a title', () => {
    expect(untitled(APP_ROUTES, '', false)).toEqual([]);
  });
});
