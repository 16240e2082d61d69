import { HttpErrorResponse } from '@angular/common/http';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import type { Me } from '#shared/contracts/session';
import { withWords } from '../ui/words/with-words.fixture';
import { safeTarget } from './safe-target';
import { Session } from './session';
import { SignInPage } from './sign-in-page';

const ME = { companyRole: 'installer', memberships: [] } as unknown as Me;

describe('SignInPage', () => {
  const signIn = jest.fn<(email: string, password: string) => Promise<Me>>();

  beforeEach(() => {
    signIn.mockReset();
    TestBed.configureTestingModule({
      imports: [SignInPage, withWords()],
      providers: [provideRouter([]), { provide: Session, useValue: { me: signal(null), signIn } }],
    });
  });

  async function fill(email: string, password: string) {
    const fixture = TestBed.createComponent(SignInPage);
    fixture.componentRef.setInput('then', '/work/7');
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    document.body.replaceChildren(page);
    for (const [name, value] of Object.entries({ email, password })) {
      const box = page.querySelector<HTMLInputElement>(`input[name=${name}]`)!;
      box.value = value;
      box.dispatchEvent(new Event('input'));
    }
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
    return page;
  }

  it('signs in and goes on to where the person wanted to go', async () => {
    signIn.mockResolvedValue(ME);
    const navigate = jest.spyOn(TestBed.inject(Router), 'navigateByUrl').mockResolvedValue(true);
    await fill(' dana@example.com ', 'right');
    expect(signIn).toHaveBeenCalledWith('dana@example.com', 'right');
    expect(navigate).toHaveBeenCalledWith('/work/7', { replaceUrl: true });
  });

  it.each([
    [401, 'wrongCredentials', 'don’t match'],
    [429, 'tooManyTries', 'Too many tries'],
    [0, null, 'No network'],
    [500, null, 'can’t answer'],
  ])('says in words why status %d did not sign in', async (status, code, words) => {
    signIn.mockRejectedValue(new HttpErrorResponse({ status, error: { code } }));
    const page = await fill('dana@example.com', 'wrong');
    expect(page.querySelector('.problem')?.textContent).toContain(words);
  });

  it('asks nobody while a box is empty', async () => {
    await fill('dana@example.com', '');
    expect(signIn).not.toHaveBeenCalled();
  });

  it.each([
    ['', '', 'email', 'Enter an email address, such as name@example.com.'],
    ['dana', 'right', 'email', 'Enter an email address, such as name@example.com.'],
    ['dana@example.com', '', 'password', 'Enter your password.'],
  ])(
    'leads from %j and %j to the first box that lacks something, and says what',
    async (email, password, name, words) => {
      const page = await fill(email, password);
      const box = page.querySelector<HTMLInputElement>(`input[name=${name}]`)!;
      expect(document.activeElement).toBe(box);
      expect(box.getAttribute('aria-invalid')).toBe('true');
      const described = page.querySelector(`[id="${box.getAttribute('aria-describedby')}"]`);
      expect(described?.textContent).toBe(words);
      expect(signIn).not.toHaveBeenCalled();
    },
  );

  it('says nothing about boxes that nobody filled in yet', async () => {
    const fixture = TestBed.createComponent(SignInPage);
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.querySelector('.wrong')).toBeNull();
    expect(page.querySelector('[aria-invalid=true]')).toBeNull();
  });

  it('names each box, and shows the password when asked', async () => {
    const page = await fill('', '');
    for (const [name, words] of [
      ['email', 'Email'],
      ['password', 'Password'],
    ]) {
      const box = page.querySelector<HTMLInputElement>(`input[name=${name}]`)!;
      expect([...box.labels!].map((label) => label.textContent)).toEqual([words]);
    }
    const box = page.querySelector<HTMLInputElement>('input[name=password]')!;
    expect(box.type).toBe('password');
    const show = page.querySelector<HTMLButtonElement>('button[aria-pressed]')!;
    show.click();
    await new Promise((done) => setTimeout(done, 20));
    expect(box.type).toBe('text');
    expect(show.getAttribute('aria-pressed')).toBe('true');
  });

  it('sends a password once, and keeps the keyboard on the button meanwhile', async () => {
    signIn.mockReturnValue(new Promise(() => undefined));
    const page = await fill('dana@example.com', 'right');
    const go = page.querySelector<HTMLButtonElement>('button[type=submit]')!;
    go.focus();
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    expect(signIn).toHaveBeenCalledTimes(1);
    expect(go.getAttribute('aria-disabled')).toBe('true');
    expect(document.activeElement).toBe(go);
  });

  it('lets password managers and pasting work', async () => {
    const page = await fill('', '');
    expect(page.querySelector('input[name=email]')?.getAttribute('autocomplete')).toBe('username');
    expect(page.querySelector('input[name=password]')?.getAttribute('autocomplete')).toBe('current-password');
  });
});

describe('safeTarget', () => {
  it('takes an address of this application', () => {
    expect(safeTarget('/work/7?at=overview')).toBe('/work/7?at=overview');
  });

  it.each([undefined, '', 'https://example.com', '//example.com', '/\\example.com', '/sign-in?then=/work'])(
    'refuses %p',
    (target) => {
      expect(safeTarget(target)).toBeNull();
    },
  );
});
