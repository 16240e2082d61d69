import type { Response } from 'express';
import type { Logger } from 'pino';
import { may } from '#shared/access/may';
import type { Person } from '#shared/access/roles';
import type { LiveEvent } from '#shared/contracts/events';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import type { Context, Transactions } from '../database/transactions';
import type { LiveEventRow, LiveEventsRepository } from './live-events.repository';

const POLL_MS = 400;
const OVERLAP_S = 5;
/** A little more than the longest that a client waits before it comes back. */
const BREAK_S = 75;
const KEEP_ALIVE_MS = 20_000;
const MOST_STREAMS = 12;
const MAX_STREAM_MS = 15 * 60_000;

interface Listener {
  readonly person: Person;
  readonly response: Response;
}

/**
 * Server-sent events. Every server reads the events of the last seconds from the database while somebody listens, so a
 * change made through one server shows on screens that another one serves.
 */
export class LiveEventsService {
  private readonly listeners = new Set<Listener>();
  private readonly seen = new Map<string, number>();
  private timer: NodeJS.Timeout | null = null;
  private polling = false;

  constructor(
    private readonly transactions: Transactions,
    private readonly events: LiveEventsRepository,
    private readonly logger: Logger,
  ) {}

  async announce(context: Context, companyId: string, event: LiveEvent): Promise<void> {
    await this.events.insert(context, companyId, event);
    context.afterCommit.push(() => void this.poll());
  }

  /** Keeps the response open and sends what the person may see. It ends by itself, so that rights are asked anew. */
  async listen(person: Person, response: Response, isAgain = false): Promise<void> {
    response.writeHead(200, {
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      Connection: 'keep-alive',
      'X-Accel-Buffering': 'no',
    });
    response.write('retry: 2000\n\n');
    this.makeRoom(person);
    let isGone = false;
    response.once('close', () => {
      isGone = true;
    });
    const listener: Listener = { person, response };
    if (this.listeners.size === 0) await this.remember();
    // The browser went away meanwhile: its 'close' won't come again.
    if (isGone) return;
    this.listeners.add(listener);
    if (isAgain) await this.sayAgain(listener);
    this.timer ??= setInterval(() => void this.poll(), POLL_MS);
    const keepAlive = setInterval(() => response.write(': here\n\n'), KEEP_ALIVE_MS);
    const end = setTimeout(() => response.end(), MAX_STREAM_MS);
    response.on('close', () => {
      clearInterval(keepAlive);
      clearTimeout(end);
      this.listeners.delete(listener);
      if (this.listeners.size === 0) this.stop();
    });
  }

  /** A person has a few tabs, not hundreds of streams: the oldest gives way. */
  private makeRoom(person: Person): void {
    const own = [...this.listeners].filter((listener) => listener.person.id === person.id);
    if (own.length >= MOST_STREAMS) own[0]?.response.end();
  }

  /** Ends all streams: a server that shuts down must not wait for them. */
  close(): void {
    for (const { response } of this.listeners) response.end();
    this.stop();
  }

  private stop(): void {
    if (this.timer) clearInterval(this.timer);
    this.timer = null;
  }

  /** To whoever comes back after a break: all of the last moments, twice rather than never. */
  private async sayAgain(listener: Listener): Promise<void> {
    for (const row of await this.events.findRecent(this.transactions.outside, BREAK_S)) sendTo(listener, row);
  }

  /** What happened before the first listener came is not news. */
  private async remember(): Promise<void> {
    this.seen.clear();
    for (const row of await this.events.findRecent(this.transactions.outside, OVERLAP_S))
      this.seen.set(row.id, Date.now());
  }

  private async poll(): Promise<void> {
    if (this.polling || this.listeners.size === 0) return;
    this.polling = true;
    try {
      const rows = await this.events.findRecent(this.transactions.outside, OVERLAP_S);
      for (const row of rows) if (!this.seen.has(row.id)) this.send(row);
      this.forget();
    } catch (error) {
      // The database is away: the next poll tries again.
      this.logger.warn({ err: error }, 'could not read live events');
    } finally {
      this.polling = false;
    }
  }

  private send(row: LiveEventRow): void {
    this.seen.set(row.id, Date.now());
    for (const listener of this.listeners) sendTo(listener, row);
  }

  private forget(): void {
    const limit = Date.now() - 4 * OVERLAP_S * 1000;
    for (const [id, at] of this.seen) if (at < limit) this.seen.delete(id);
  }
}

/** Writes an event to whoever may see its opening. */
function sendTo({ person, response }: Listener, row: LiveEventRow): void {
  const subject = { companyId: row.companyId as CompanyId, openingId: row.openingId as OpeningId };
  if (may(person, 'opening.read', subject)) response.write(`event: change\ndata: ${row.content}\n\n`);
}
