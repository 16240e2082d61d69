import { afterEach, beforeEach, describe, expect, it, jest } from '@jest/globals';
import { HealthService } from './health.service';

const up = async (): Promise<void> => undefined;

describe('HealthService', () => {
  beforeEach(() => void jest.useFakeTimers());
  afterEach(() => void jest.useRealTimers());

  it('is up when every part answers', async () => {
    const state = await new HealthService({ database: up, files: up, mail: up }).check();
    expect(state).toMatchObject({ up: true, parts: { mail: { up: true, reason: null } } });
  });

  it('is down with the reason of the part that is, and says that the others are up', async () => {
    const mail = () => Promise.reject(new TypeError('connect ECONNREFUSED'));
    const state = await new HealthService({ database: up, files: up, mail }).check();
    expect(state.up).toBe(false);
    expect(state.parts.mail).toEqual({ up: false, reason: 'connect ECONNREFUSED' });
    expect(state.parts.database.up).toBe(true);
  });

  it('does not wait for a part that never answers', async () => {
    const never = () => new Promise<void>(() => undefined);
    const asked = new HealthService({ database: never, files: up, mail: up }).check();
    await jest.advanceTimersByTimeAsync(3_000);
    expect((await asked).parts.database).toEqual({ up: false, reason: 'No answer in 3 seconds' });
  });
});
