import type { Pool } from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { tooMany } from '../problem.ts';

/**
 * Counts misses in PostgreSQL, so that several servers agree.
 * Never blocks longer than the window, and never a whole account for one address.
 */
export class Throttle {
  private readonly limiters: Record<'addressAndAccount' | 'address' | 'account' | 'mail', RateLimiterPostgres>;

  constructor(pool: Pool) {
    const make = (keyPrefix: string, points: number, minutes: number) =>
      new RateLimiterPostgres({ storeClient: pool, tableName: 'throttle', tableCreated: true, keyPrefix, points, duration: minutes * 60 });
    this.limiters = {
      addressAndAccount: make('both', 10, 15),
      address: make('address', 50, 60),
      account: make('account', 100, 24 * 60),
      mail: make('mail', 5, 60),
    };
  }

  /** @throws Problem 429 with Retry-After when the key has used up its tries */
  async refuseIfSpent(kind: keyof Throttle['limiters'], key: string): Promise<void> {
    const state = await this.limiters[kind].get(key);
    if (state && state.remainingPoints <= 0 && state.consumedPoints >= this.limiters[kind].points) throw tooMany(seconds(state));
  }

  /** Counts one miss. */
  async miss(kind: keyof Throttle['limiters'], key: string): Promise<void> {
    await this.limiters[kind].penalty(key);
  }

  /** Takes one try. @throws Problem 429 when none is left */
  async take(kind: keyof Throttle['limiters'], key: string): Promise<void> {
    try {
      await this.limiters[kind].consume(key);
    } catch (spent) {
      if (spent instanceof RateLimiterRes) throw tooMany(seconds(spent));
      throw spent;
    }
  }

  async forget(kind: keyof Throttle['limiters'], key: string): Promise<void> {
    await this.limiters[kind].delete(key);
  }
}

/** At most fifteen minutes, whatever the window. */
function seconds(state: RateLimiterRes): number {
  return Math.min(900, Math.max(1, Math.ceil(state.msBeforeNext / 1000)));
}
