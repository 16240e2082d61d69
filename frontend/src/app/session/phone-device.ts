import { inject, Injectable, signal } from '@angular/core';
import type { DeviceId, PersonId } from '#shared/plant/ids';
import { httpFailure } from './problem-code';
import { Remembered } from './remembered';
import { SessionApi } from './session-api';

/**
 * Which device this browser is to the person who is here. Two people on one phone are two devices, each with a count of
 * its own. The server gives the id and a cookie that outlives the session.
 */
@Injectable({ providedIn: 'root' })
export class PhoneDevice {
  private readonly api = inject(SessionApi);
  private readonly remembered = inject(Remembered);
  private readonly id = signal<DeviceId | null>(null);
  private readonly counted = signal(0);

  readonly deviceId = this.id.asReadonly();
  /** The highest count that the server has of this device, as far as this browser was told. */
  readonly lastCount = this.counted.asReadonly();

  /** Takes up what is remembered for a person; `null` when nobody is here. */
  restore(personId: PersonId | null): void {
    const device = personId ? this.remembered.device(personId) : null;
    this.id.set(device?.deviceId ?? null);
    this.counted.set(device?.lastCount ?? 0);
  }

  /** Registers with the server. One that can't be reached leaves what is remembered, and is asked at the next start. */
  async register(personId: PersonId): Promise<void> {
    this.restore(personId);
    try {
      const device = await this.api.registerDevice(this.id(), deviceLabel());
      this.remembered.keepDevice(personId, device);
      this.restore(personId);
    } catch (error) {
      // Signing in must not fail because of this: recording says so when there is no device yet.
      if (!httpFailure(error)) throw error;
    }
  }
}

/** A name under which a person recognises the device in a list, such as "Android, phone". */
function deviceLabel(): string {
  const agent = navigator.userAgent;
  const system = ['Android', 'iPhone', 'iPad', 'Windows', 'Mac OS', 'Linux'].find((name) =>
    agent.includes(name),
  );
  return `${system ?? 'Browser'}${/Mobi/.test(agent) ? ', phone' : ''}`;
}
