import { HttpClient, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import { firstValueFrom } from 'rxjs';
import { PasswordAgain } from './password-again';
import { Session } from './session';
import { quietly } from './session-context';
import { sessionInterceptor } from './session-interceptor';

const NOT_SIGNED_IN = [{ code: 'notSignedIn' }, { status: 401, statusText: 'Unauthorized' }] as const;

describe('sessionInterceptor', () => {
  const signInAgain = jest.fn<() => Promise<boolean>>();
  const sessionOver = jest.fn();

  beforeEach(() => {
    jest.resetAllMocks();
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([sessionInterceptor])),
        provideHttpClientTesting(),
        { provide: PasswordAgain, useValue: { signInAgain } },
        { provide: Session, useValue: { sessionOver } },
      ],
    });
  });

  it('makes the call again after the person signed in above the page', async () => {
    signInAgain.mockResolvedValue(true);
    const http = TestBed.inject(HttpTestingController);
    const answer = firstValueFrom(TestBed.inject(HttpClient).post('/api/openings', { name: 'typed' }));
    http.expectOne('/api/openings').flush(...NOT_SIGNED_IN);
    await Promise.resolve();
    await Promise.resolve();
    const again = http.expectOne('/api/openings');
    expect(again.request.body).toEqual({ name: 'typed' });
    again.flush({ id: 1 });
    expect(await answer).toEqual({ id: 1 });
  });

  it('fails as it did when the person turns back', async () => {
    signInAgain.mockResolvedValue(false);
    const answer = firstValueFrom(TestBed.inject(HttpClient).get('/api/openings'));
    TestBed.inject(HttpTestingController)
      .expectOne('/api/openings')
      .flush(...NOT_SIGNED_IN);
    await expect(answer).rejects.toMatchObject({ status: 401 });
  });

  it('never disturbs anybody for a call of the outbox', async () => {
    const answer = firstValueFrom(TestBed.inject(HttpClient).get('/api/entries', { context: quietly() }));
    TestBed.inject(HttpTestingController)
      .expectOne('/api/entries')
      .flush(...NOT_SIGNED_IN);
    await expect(answer).rejects.toMatchObject({ status: 401 });
    expect(signInAgain).not.toHaveBeenCalled();
    expect(sessionOver).not.toHaveBeenCalled();
  });
});
