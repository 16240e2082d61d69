import { uuidv7 } from 'uuidv7';
import type { LiveEvent } from '#shared/contracts/events';
import { managerOf, type Context } from '../database/transactions';

export interface LiveEventRow {
  readonly id: string;
  readonly companyId: string;
  readonly openingId: string;
  readonly content: string;
}

export class LiveEventsRepository {
  /** Written in the transaction of what it tells of, so that nobody hears of what did not happen. */
  async insert(context: Context, companyId: string, event: LiveEvent): Promise<void> {
    await managerOf(context).query(
      'INSERT INTO live_event (id, company_id, opening_id, content, created_at) VALUES (?, ?, ?, ?, UTC_TIMESTAMP(3))',
      [uuidv7(), companyId, event.openingId, JSON.stringify(event)],
    );
  }

  /** All of the last seconds: rows become visible out of order, so the reader overlaps and drops what it has seen. */
  async findRecent(context: Context, seconds: number): Promise<LiveEventRow[]> {
    return managerOf(context).query(
      `SELECT id, company_id AS companyId, opening_id AS openingId, content FROM live_event
        WHERE created_at >= UTC_TIMESTAMP(3) - INTERVAL ? SECOND ORDER BY created_at LIMIT 5000`,
      [seconds],
    );
  }

  async sweep(context: Context): Promise<void> {
    await managerOf(context).query(
      'DELETE FROM live_event WHERE created_at < UTC_TIMESTAMP(3) - INTERVAL 1 HOUR LIMIT 5000',
    );
  }
}
