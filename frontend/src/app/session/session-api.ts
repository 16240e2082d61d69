import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { deviceResponseSchema, Me } from '#shared/contracts/session';
import type { Language } from '#shared/checklist/text';
import type * as z from 'zod/mini';
import { firstValueFrom } from 'rxjs';
import { quietly } from './session-context';

export type DeviceRegistration = z.infer<typeof deviceResponseSchema>;

// The contract is loaded with the first answer: checking it is needed early, but not for the first paint.
const contract = () => import('#shared/contracts/session');

/** The calls about who is signed in. Each resolves to checked data or rejects with the HTTP error. */
@Injectable({ providedIn: 'root' })
export class SessionApi {
  private readonly http = inject(HttpClient);

  /** Who is signed in; `null` when nobody is. */
  async read(): Promise<Me | null> {
    const get = this.http.get<{ me?: unknown } | null>('/api/session', { context: quietly() });
    const answer = await firstValueFrom(get);
    // Nobody is here: that needs no contract, and the sign-in page is what comes next.
    if (answer?.me === null) return null;
    return (await contract()).sessionSchema.parse(answer).me;
  }

  async signIn(email: string, password: string): Promise<Me> {
    const body = { email, password };
    const answer = await firstValueFrom(this.http.post('/api/session', body, { context: quietly() }));
    return (await contract()).meSchema.parse(answer);
  }

  async signOut(): Promise<void> {
    await firstValueFrom(this.http.delete('/api/session', { context: quietly() }));
  }

  async confirmPassword(password: string): Promise<void> {
    await firstValueFrom(this.http.post('/api/session/password', { password }, { context: quietly() }));
  }

  async chooseLanguage(language: Language): Promise<void> {
    await firstValueFrom(this.http.put('/api/session/language', { language }, { context: quietly() }));
  }

  /** Makes this browser a device of the person, or takes up the one it already is. */
  async registerDevice(deviceId: string | null, label: string): Promise<DeviceRegistration> {
    const answer = await firstValueFrom(
      this.http.post('/api/devices', { deviceId, label }, { context: quietly() }),
    );
    return (await contract()).deviceResponseSchema.parse(answer);
  }
}
