import { Injectable } from '@angular/core';
import type { Me } from '#shared/contracts/session';
import type { DeviceId, PersonId } from '#shared/plant/ids';

const ME = 'firstcold.me';
const deviceKey = (personId: PersonId): string => `firstcold.device.${personId}`;

/** A phone's device, with the highest count that the server had of it when it was registered. */
export interface RememberedDevice {
  readonly deviceId: DeviceId;
  readonly lastCount: number;
}

/**
 * What this browser keeps about people between visits: who was last here, so that a phone starts without a network, and
 * which device it is to each of them. No credential is kept here; that is a cookie which scripts can't read.
 */
@Injectable({ providedIn: 'root' })
export class Remembered {
  /** @returns `null` when nobody was here, or what is stored is from another time and can't be read */
  me(): Me | null {
    const stored = readJson(ME);
    return isMe(stored) ? stored : null;
  }

  keepMe(me: Me | null): void {
    write(ME, me);
  }

  device(personId: PersonId): RememberedDevice | null {
    const stored = readJson(deviceKey(personId));
    if (typeof stored !== 'object' || stored === null || !('deviceId' in stored) || !('lastCount' in stored))
      return null;
    const { deviceId, lastCount } = stored;
    if (typeof deviceId !== 'string' || typeof lastCount !== 'number') return null;
    return { deviceId: deviceId as DeviceId, lastCount };
  }

  keepDevice(personId: PersonId, device: RememberedDevice): void {
    write(deviceKey(personId), device);
  }
}

function readJson(key: string): unknown {
  const text = localStorage.getItem(key);
  if (text === null) return null;
  try {
    return JSON.parse(text);
  } catch (error) {
    // Only a text that isn't JSON: somebody else wrote it, and it is as good as absent.
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}

function write(key: string, value: unknown): void {
  if (value === null) localStorage.removeItem(key);
  else localStorage.setItem(key, JSON.stringify(value));
}

/** Looked at by hand, so that no schema has to load before the first page; the server's answer is checked by one. */
function isMe(stored: unknown): stored is Me {
  if (typeof stored !== 'object' || stored === null) return false;
  const { id, name, companyRole, memberships } = stored as Partial<Record<keyof Me, unknown>>;
  return [id, name, companyRole].every((text) => typeof text === 'string') && Array.isArray(memberships);
}
