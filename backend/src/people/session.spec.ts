import { afterAll, beforeAll, beforeEach, describe, expect, it } from '@jest/globals';
import request from 'supertest';
import { PASSWORD, TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { makeStore, type TestStore } from '../testing/test-store';

describe('POST /api/session', () => {
  let server: TestServer;
  let store: TestStore;

  beforeAll(async () => {
    server = await startTestServer();
    store = await makeStore(server, 'cold');
  }, 60_000);
  afterAll(() => server.close());
  beforeEach(() => server.sql('DELETE FROM sign_in_limit'));

  const cookies = (response: { headers: Record<string, unknown> }) =>
    [response.headers['set-cookie'] ?? []].flat().map(String);
  const cookie = (response: { headers: Record<string, unknown> }, name: string) =>
    cookies(response).find((line) => line.startsWith(`${name}=`));
  const code = (response: { text: string }) => (JSON.parse(response.text) as { code: string }).code;

  it('begins a session whose cookie no script and no other site gets at', async () => {
    const client = new TestClient(server);
    const response = await client.signIn(store.people.lead.email);
    expect(response.status).toBe(200);
    expect(response.body).toMatchObject({ id: store.people.lead.id, companyRole: 'lead' });
    expect(cookie(response, 'firstcold_session')).toMatch(/HttpOnly/);
    expect(cookie(response, 'firstcold_session')).toMatch(/SameSite=Strict/);
    expect((await client.get('/api/session')).body.me.id).toBe(store.people.lead.id);
  });

  it('takes the address in any case', async () => {
    const response = await new TestClient(server).signIn(store.people.lead.email.toUpperCase());
    expect(response.status).toBe(200);
  });

  it('gives the session a new id, so that one planted before is worth nothing', async () => {
    const client = new TestClient(server);
    const first =
      cookie(await client.signIn(store.people.lead.email), 'firstcold_session')?.split(';')[0] ?? '';
    const second = cookie(await client.signIn(store.people.lead2.email), 'firstcold_session')?.split(';')[0];
    expect(second).not.toBe(first);
    const planted = await request(server.server).get('/api/session').set('Cookie', first);
    expect(planted.body).toEqual({ me: null });
  });

  it('says the same to an unknown address as to a wrong password', async () => {
    const [unknown, wrong] = [
      await new TestClient(server).signIn('nobody@cold.example'),
      await new TestClient(server).signIn(store.people.lead.email, 'not the password'),
    ];
    const told = (response: { text: string }) => ({ ...JSON.parse(response.text), requestId: '' });
    expect(wrong.status).toBe(401);
    expect(told(unknown)).toEqual(told(wrong));
    expect(cookie(wrong, 'firstcold_session')).toBeUndefined();
  });

  it('lets nobody in who is no longer active, and ends a session that is under way', async () => {
    const client = new TestClient(server);
    await client.signIn(store.people.lead2.email);
    await server.sql('UPDATE person SET is_active = 0 WHERE id = ?', [store.people.lead2.id]);
    try {
      expect((await client.get('/api/openings')).status).toBe(401);
      expect((await new TestClient(server).signIn(store.people.lead2.email)).status).toBe(401);
    } finally {
      await server.sql('UPDATE person SET is_active = 1 WHERE id = ?', [store.people.lead2.id]);
    }
  });

  it('refuses even the right password after eight wrong ones, and says how long', async () => {
    const client = new TestClient(server);
    for (let tries = 0; tries < 8; tries += 1) {
      expect((await client.signIn(store.people.lead.email, `wrong ${tries}`)).status).toBe(401);
    }
    const refused = await client.signIn(store.people.lead.email);
    expect(refused.status).toBe(429);
    const problem = JSON.parse(refused.text) as { code: string; facts: { waitS: number } };
    expect(problem.code).toBe('tooManyTries');
    expect(problem.facts.waitS).toBeGreaterThan(800);
    // Others at the same place are not shut out with them.
    expect((await client.signIn(store.people.admin.email)).status).toBe(200);
  });

  it('lets no more guesses through when they come all at once', async () => {
    const client = new TestClient(server);
    await client.token();
    const guesses = Array.from({ length: 30 }, (_, index) =>
      client.signIn(store.people.lead.email, `w${index}`),
    );
    const statuses = (await Promise.all(guesses)).map((response) => response.status);
    expect(statuses.filter((status) => status === 401).length).toBeLessThanOrEqual(8);
    expect(new Set(statuses)).toEqual(new Set([401, 429]));
  });

  it('forgets wrong tries once the password was right', async () => {
    const client = new TestClient(server);
    for (let round = 0; round < 2; round += 1) {
      for (let tries = 0; tries < 6; tries += 1) await client.signIn(store.people.lead.email, 'wrong');
      expect((await client.signIn(store.people.lead.email)).status).toBe(200);
    }
  });

  it('keeps no password that anybody could read', async () => {
    const rows = await server.sql<{ password_hash: string }>('SELECT password_hash FROM person');
    for (const row of rows) expect(row.password_hash).toMatch(/^\$argon2id\$/);
    expect(new Set(rows.map((row) => row.password_hash)).size).toBe(rows.length);
  });

  it('is ended by signing out', async () => {
    const client = new TestClient(server);
    const begun =
      cookie(await client.signIn(store.people.lead.email), 'firstcold_session')?.split(';')[0] ?? '';
    expect((await client.send('delete', '/api/session')).status).toBe(204);
    expect((await client.get('/api/session')).body).toEqual({ me: null });
    const kept = await request(server.server).get('/api/session').set('Cookie', begun);
    expect(kept.body).toEqual({ me: null });
  });

  it('wants the password itself when it is asked for again', async () => {
    const client = new TestClient(server);
    await client.signIn(store.people.lead.email);
    const wrong = await client.send('post', '/api/session/password', { password: 'wrong' });
    expect([wrong.status, code(wrong)]).toEqual([401, 'wrongCredentials']);
    expect((await client.send('post', '/api/session/password', { password: PASSWORD })).status).toBe(204);
  });

  it('needs the token of our own page', async () => {
    const response = await request(server.server)
      .post('/api/session')
      .send({ email: store.people.lead.email, password: PASSWORD });
    expect([response.status, code(response)]).toEqual([403, 'requestForged']);
  });

  describe('and a device credential', () => {
    /** The credential's cookie as the browser would send it. */
    async function register(client: TestClient, known: string | null = null) {
      const response = await client.send('post', '/api/devices', { deviceId: known, label: 'phone' });
      const line = cookie(response, 'firstcold_device') ?? '';
      return { line, credential: line.split(';')[0] ?? '', deviceId: response.body.deviceId as string };
    }
    const circuitsWith = (credential: string) =>
      request(server.server).get('/api/my/circuits').set('Cookie', credential);

    it('reads the person’s circuits without a session, and nothing else', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const { line, credential } = await register(client);
      expect(line).toMatch(/HttpOnly/);
      expect(line).toMatch(/SameSite=Strict/);
      expect(line).toMatch(/Path=\/api/);
      expect((await circuitsWith(credential)).status).toBe(200);
      const openings = await request(server.server).get('/api/openings').set('Cookie', credential);
      expect(openings.status).toBe(401);
    });

    it('is no good with another secret, after it was revoked, or after it ran out', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const { credential, deviceId } = await register(client);
      expect((await circuitsWith(`firstcold_device=${deviceId}.AAAA`)).status).toBe(401);
      expect((await circuitsWith(`firstcold_device=${deviceId}`)).status).toBe(401);
      await server.sql('UPDATE device SET expires_at = UTC_TIMESTAMP(3) WHERE id = ?', [deviceId]);
      expect((await circuitsWith(credential)).status).toBe(401);
      await server.sql(
        'UPDATE device SET expires_at = UTC_TIMESTAMP(3) + INTERVAL 1 DAY, revoked_at = UTC_TIMESTAMP(3) WHERE id = ?',
        [deviceId],
      );
      expect((await circuitsWith(credential)).status).toBe(401);
    });

    it('keeps a secret that is still good when the phone comes back: an answer may be lost', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const first = await register(client);
      const second = await register(client, first.deviceId);
      expect(second.deviceId).toBe(first.deviceId);
      expect(second.credential).toBe(first.credential);
      expect((await circuitsWith(first.credential)).status).toBe(200);
    });

    it('is the same device with a new secret where the old one has run out', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const first = await register(client);
      await server.sql('UPDATE device SET expires_at = UTC_TIMESTAMP(3) WHERE id = ?', [first.deviceId]);
      const second = await register(client, first.deviceId);
      expect(second.deviceId).toBe(first.deviceId);
      expect((await circuitsWith(first.credential)).status).toBe(401);
      expect((await circuitsWith(second.credential)).status).toBe(200);
    });

    it('is another device for another person on the same phone', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const first = await register(client);
      const signedIn = await client.signIn(store.people.lead.email);
      expect(cookie(signedIn, 'firstcold_device')).toMatch(/^firstcold_device=;/);
      const second = await register(client, first.deviceId);
      expect(second.deviceId).not.toBe(first.deviceId);
    });

    it('ends with signing out, even where a copy of it was kept', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const { credential, deviceId } = await register(client);
      expect((await client.send('delete', '/api/session')).status).toBe(204);
      expect((await circuitsWith(credential)).status).toBe(401);
      await client.signIn(store.people.installer.email);
      expect((await register(client, deviceId)).deviceId).toBe(deviceId);
    });

    it('is kept as a hash only', async () => {
      const client = new TestClient(server);
      await client.signIn(store.people.installer.email);
      const { credential } = await register(client);
      const secret = credential.split('.')[1] ?? '?';
      const rows = await server.sql('SELECT * FROM device');
      expect(JSON.stringify(rows)).not.toContain(secret);
    });
  });
});
