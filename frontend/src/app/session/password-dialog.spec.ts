import { HttpErrorResponse } from '@angular/common/http';
import { Injector, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import type { Me } from '#shared/contracts/session';
import { withWords } from '../ui/words/with-words.fixture';
import { openPasswordDialog } from './password-dialog';
import { Session } from './session';
import { SessionApi } from './session-api';

describe('the password dialog', () => {
  const confirmPassword = jest.fn<(password: string) => Promise<void>>();
  let answer: Promise<boolean>;
  const settle = (): Promise<unknown> => new Promise((done) => setTimeout(done, 30));
  const box = (): HTMLInputElement => document.querySelector<HTMLInputElement>('input[name=password]')!;

  async function give(password: string): Promise<void> {
    box().value = password;
    box().dispatchEvent(new Event('input'));
    document.querySelector('form')!.dispatchEvent(new Event('submit'));
    await settle();
  }

  beforeEach(async () => {
    document.body.replaceChildren();
    confirmPassword.mockReset();
    const me = signal({ email: 'dana@example.com' } as Me);
    TestBed.configureTestingModule({
      imports: [withWords()],
      providers: [
        { provide: Session, useValue: { me } },
        { provide: SessionApi, useValue: { confirmPassword } },
      ],
    });
    answer = openPasswordDialog(TestBed.inject(Injector), 'signature');
    await settle();
  });

  it('says what is missing and leads back to the box', async () => {
    await give('');
    expect(confirmPassword).not.toHaveBeenCalled();
    expect(document.querySelector('.wrong')?.textContent).toBe('Enter your password.');
    expect(document.activeElement).toBe(box());
  });

  it('stays open with the reason, and closes once the server took the password', async () => {
    const refused = new HttpErrorResponse({ status: 401, error: { code: 'wrongCredentials' } });
    confirmPassword.mockRejectedValueOnce(refused).mockResolvedValueOnce();
    await give('wrong');
    expect(document.querySelector('.problem')?.textContent).toContain('don’t match');
    await give('right');
    expect(confirmPassword.mock.calls).toEqual([['wrong'], ['right']]);
    expect(await answer).toBe(true);
  });
});
