import { createHash } from 'node:crypto';
import type { Pool } from 'mysql2';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import { DomainFailure } from '#shared/failures/failure';
import { plainEmail } from './plain-email';
import { managerOf, type Context } from '../database/transactions';

const WINDOW_S = 900;

/** Slows down guessing: per address of a person from one place, and per place. Kept in MariaDB for all servers. */
export class SignInLimit {
  private readonly perAccount: RateLimiterMySQL;
  private readonly perPlace: RateLimiterMySQL;

  /** @param pool a callback pool: the library refuses a promise pool */
  constructor(pool: Pool, database: string) {
    const shared = {
      storeClient: pool,
      storeType: 'pool',
      dbName: database,
      tableName: 'sign_in_limit',
      tableCreated: true,
      duration: WINDOW_S,
      // Its own timer would outlive the server; expired rows go with the other sweeping.
      clearExpiredByTimeout: false,
    };
    this.perAccount = new RateLimiterMySQL({ ...shared, keyPrefix: 'account', points: 8 });
    this.perPlace = new RateLimiterMySQL({ ...shared, keyPrefix: 'place', points: 60 });
  }

  /**
   * Counts a try before the password is looked at, so that many at once can't slip through between looking and counting.
   *
   * @throws {DomainFailure} tooManyTries, with the seconds to wait
   */
  async begin(email: string, place: string): Promise<void> {
    await Promise.all([spend(this.perAccount, accountKey(email, place)), spend(this.perPlace, place)]);
  }

  /** Gives the try back: it was the right password. */
  async forgive(email: string, place: string): Promise<void> {
    await Promise.all([this.perAccount.delete(accountKey(email, place)), this.perPlace.reward(place)]);
  }

  /** Removes what has run out. */
  async sweep(context: Context): Promise<void> {
    await managerOf(context).query('DELETE FROM sign_in_limit WHERE expire < ? LIMIT 5000', [Date.now()]);
  }
}

async function spend(limiter: RateLimiterMySQL, key: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    // The library rejects with its result once the points are spent.
    if (error instanceof RateLimiterRes) throw tooMany(error);
    throw error;
  }
}

function accountKey(email: string, place: string): string {
  return createHash('sha256')
    .update(`${plainEmail(email)}\n${place}`)
    .digest('hex')
    .slice(0, 40);
}

function tooMany(state: RateLimiterRes): DomainFailure {
  const waitS = Math.ceil(state.msBeforeNext / 1000);
  return new DomainFailure('tooManyTries', `Too many tries. Wait ${Math.ceil(waitS / 60)} minutes.`, [], {
    waitS,
  });
}
