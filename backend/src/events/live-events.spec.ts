import { EventEmitter } from 'node:events';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from '@jest/globals';
import type { Response } from 'express';
import { pino } from 'pino';
import type { Person } from '#shared/access/roles';
import type { LiveEvent } from '#shared/contracts/events';
import { Transactions } from '../database/transactions';
import { startTestServer, type TestServer } from '../testing/test-server';
import { makeStore, type TestStore } from '../testing/test-store';
import { until } from '../testing/until';
import { LiveEventsRepository } from './live-events.repository';
import { LiveEventsService } from './live-events.service';

/** A response that stays open and keeps what is written to it. */
class OpenResponse extends EventEmitter {
  readonly written: string[] = [];
  writeHead(): this {
    return this;
  }
  write(text: string): boolean {
    this.written.push(text);
    return true;
  }
  end(): void {
    this.emit('close');
  }
  get events(): LiveEvent[] {
    return this.written
      .filter((text) => text.startsWith('event: change\n'))
      .map((text) => JSON.parse(/^data: (.+)$/m.exec(text)?.[1] ?? '') as LiveEvent);
  }
}

describe('LiveEventsService', () => {
  let server: TestServer;
  let ours: TestStore;
  let theirs: TestStore;
  let here: LiveEventsService;
  let there: LiveEventsService;
  let transactions: Transactions;
  const open: OpenResponse[] = [];

  beforeAll(async () => {
    server = await startTestServer();
    ours = await makeStore(server, 'ours');
    theirs = await makeStore(server, 'theirs');
  }, 60_000);
  afterAll(() => server.close());
  beforeEach(async () => {
    await server.sql('DELETE FROM live_event');
    transactions = new Transactions(server.dataSource);
    const service = () =>
      new LiveEventsService(transactions, new LiveEventsRepository(), pino({ level: 'silent' }));
    here = service();
    there = service();
  });
  afterEach(() => {
    for (const response of open.splice(0)) response.end();
    here.close();
    there.close();
  });

  const person = (store: TestStore, role: keyof TestStore['people']): Promise<Person> =>
    server.services.register.find(store.people[role].id);

  async function listen(service: LiveEventsService, listener: Person): Promise<OpenResponse> {
    const response = new OpenResponse();
    open.push(response);
    await service.listen(listener, response as unknown as Response);
    return response;
  }

  const announce = (service: LiveEventsService, store: TestStore) =>
    transactions.run((context) =>
      service.announce(context, store.companyId, { kind: 'scheduleChanged', openingId: store.openingId }),
    );

  it('tells a listener at one server what was announced through another', async () => {
    const lead = await listen(here, await person(ours, 'lead'));
    await announce(there, ours);
    await until(async () => lead.events.length > 0, 5000);
    expect(lead.events).toEqual([{ kind: 'scheduleChanged', openingId: ours.openingId }]);
  });

  it('tells each thing once, however often it looks', async () => {
    const lead = await listen(here, await person(ours, 'lead'));
    await announce(there, ours);
    await announce(here, ours);
    await until(async () => lead.events.length >= 2, 5000);
    await new Promise((resolve) => setTimeout(resolve, 1300));
    expect(lead.events).toHaveLength(2);
  });

  it('tells a stranger nothing', async () => {
    const stranger = await listen(here, await person(theirs, 'admin'));
    const contractor = await listen(here, await person(ours, 'contractor'));
    await announce(there, ours);
    await until(async () => contractor.events.length > 0, 5000);
    expect(stranger.events).toEqual([]);
  });

  it('tells nothing of what did not happen', async () => {
    const lead = await listen(here, await person(ours, 'lead'));
    const failing = transactions.run(async (context) => {
      await there.announce(context, ours.companyId, { kind: 'scheduleChanged', openingId: ours.openingId });
      throw new Error('rolled back');
    });
    await expect(failing).rejects.toThrow('rolled back');
    await announce(there, ours);
    await until(async () => lead.events.length > 0, 5000);
    expect(lead.events).toHaveLength(1);
  });

  it('takes what happened before anybody listened for no news', async () => {
    await announce(there, ours);
    const lead = await listen(here, await person(ours, 'lead'));
    await announce(there, ours);
    await until(async () => lead.events.length > 0, 5000);
    await new Promise((resolve) => setTimeout(resolve, 600));
    expect(lead.events).toHaveLength(1);
  });

  it('looks no more once the last listener has gone', async () => {
    const lead = await listen(here, await person(ours, 'lead'));
    lead.end();
    await announce(there, ours);
    await new Promise((resolve) => setTimeout(resolve, 900));
    expect(lead.events).toEqual([]);
    expect(Reflect.get(here, 'timer')).toBeNull();
  });

  it('forgets a listener that went away while it was being let in', async () => {
    const response = new OpenResponse();
    const letIn = here.listen(await person(ours, 'lead'), response as unknown as Response);
    response.end();
    await letIn;
    expect((Reflect.get(here, 'listeners') as Set<unknown>).size).toBe(0);
    expect(Reflect.get(here, 'timer')).toBeNull();
  });

  it('ends all streams when the server shuts down', async () => {
    const lead = await listen(here, await person(ours, 'lead'));
    let ended = false;
    lead.once('close', () => (ended = true));
    here.close();
    expect(ended).toBe(true);
  });
});
