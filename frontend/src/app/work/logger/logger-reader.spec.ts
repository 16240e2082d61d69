import { afterEach, beforeEach, describe, expect, it, jest } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { lastValueFrom, toArray, type Observable } from 'rxjs';
import { fileOf } from './log-file.fixture';
import type { LogOrder, LogStage } from './log-reading';
import { LoggerReader } from './logger-reader';

// The file itself names its own address, which only an ES module can.
jest.mock('./start-worker', () => ({ startLoggerWorker: () => worker.start() }));

const GOOD = fileOf('Time (s),Air (°F)\n0,50\n10,41');
const DONE: LogStage = { kind: 'done', reading: { ok: false, reason: 'tooShort' } };

interface FakeWorker {
  orders: LogOrder[];
  ended: number;
  canStart: boolean;
  onmessage(event: { data: LogStage }): void;
  onerror(event: { message: string }): void;
  postMessage(order: LogOrder): void;
  terminate(): void;
  start(): FakeWorker;
}

/** A worker that answers when the spec says so. */
const worker: FakeWorker = {
  orders: [],
  ended: 0,
  canStart: true,
  onmessage: () => undefined,
  onerror: () => undefined,
  postMessage(order) {
    this.orders.push(order);
  },
  terminate() {
    this.ended += 1;
  },
  start() {
    if (!this.canStart) throw new Error('no network');
    return this;
  },
};

const read = (): Observable<LogStage> => TestBed.inject(LoggerReader).read(GOOD, { elapsedUnit: 'min' });
const settle = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 5));
const withWorkers = (): void => {
  Object.assign(globalThis, { Worker: class {} });
};

beforeEach(() => {
  Object.assign(worker, { orders: [], ended: 0, canStart: true });
});
afterEach(() => {
  delete (globalThis as { Worker?: unknown }).Worker;
});

describe('LoggerReader', () => {
  it('reads on the page where there are no workers', async () => {
    const stages = await lastValueFrom(read().pipe(toArray()));
    expect(stages.at(-1)).toMatchObject({ kind: 'done', reading: { ok: true, file: { rows: 2 } } });
    expect(stages[0]?.kind).toBe('reading');
  });

  it('gives the worker its order, passes on what it says, and ends it', async () => {
    withWorkers();
    const heard: LogStage[] = [];
    let isDone = false;
    read().subscribe({ next: (stage) => heard.push(stage), complete: () => (isDone = true) });
    await settle();
    expect(worker.orders).toEqual([{ file: GOOD, options: { elapsedUnit: 'min' } }]);
    worker.onmessage({ data: { kind: 'reading', share: 0.5 } });
    worker.onmessage({ data: DONE });
    expect(heard).toEqual([{ kind: 'reading', share: 0.5 }, DONE]);
    expect([isDone, worker.ended]).toEqual([true, 1]);
  });

  it('ends the worker when nobody listens any more', async () => {
    withWorkers();
    const listening = read().subscribe();
    await settle();
    listening.unsubscribe();
    expect(worker.ended).toBe(1);
  });

  it.each(['its page part', 'its own file'])('reads on the page when %s can not be loaded', async (part) => {
    withWorkers();
    worker.canStart = part !== 'its page part';
    const stages = lastValueFrom(read().pipe(toArray()));
    await settle();
    if (worker.canStart) worker.onerror({ message: '' });
    expect((await stages).at(-1)).toMatchObject({ kind: 'done', reading: { ok: true } });
  });

  it('reports a worker that fails later', async () => {
    withWorkers();
    const told: unknown[] = [];
    read().subscribe({ error: (error: unknown) => told.push(error) });
    await settle();
    worker.onmessage({ data: { kind: 'reading', share: 0.5 } });
    worker.onerror({ message: 'ours' });
    expect(told).toEqual([new Error('ours')]);
    expect(worker.ended).toBe(1);
  });
});
