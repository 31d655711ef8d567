import type { Pool } from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { tooMany } from '../problem.ts';

export type ThrottleKind = 'addressAndAccount' | 'address' | 'account' | 'trickle' | 'mail';

/**
 * Counts tries in PostgreSQL, so that several servers agree. A try is taken before the work and
 * given back when it was a good one: a hundred at once count as a hundred.
 */
export class Throttle {
  private readonly limiters: Record<ThrottleKind, RateLimiterPostgres>;

  constructor(pool: Pool) {
    const make = (keyPrefix: string, points: number, minutes: number) =>
      new RateLimiterPostgres({ storeClient: pool, tableName: 'throttle', tableCreated: true, keyPrefix, points, duration: minutes * 60 });
    this.limiters = {
      addressAndAccount: make('both', 10, 15),
      address: make('address', 50, 60),
      account: make('account', 100, 24 * 60),
      /** What is left to unknown devices of an account that others tried a hundred times. */
      trickle: make('trickle', 1, 1),
      mail: make('mail', 5, 60),
    };
  }

  /** Takes one try. @throws Problem 429 with Retry-After when none is left */
  async take(kind: ThrottleKind, key: string): Promise<void> {
    try {
      await this.limiters[kind].consume(key);
    } catch (spent) {
      if (spent instanceof RateLimiterRes) throw tooMany(seconds(spent));
      throw spent;
    }
  }

  /** Takes one try at an account; a known device always has one, an unknown one at least one a minute. */
  async takeAccount(account: string, isKnownDevice: boolean): Promise<void> {
    if (isKnownDevice) return;
    try {
      await this.limiters.account.consume(account);
    } catch (spent) {
      if (!(spent instanceof RateLimiterRes)) throw spent;
      await this.take('trickle', account);
    }
  }

  /** A good try does not count. */
  async giveBack(kind: ThrottleKind, key: string): Promise<void> {
    await this.limiters[kind].reward(key);
  }

  async forget(kind: ThrottleKind, key: string): Promise<void> {
    await this.limiters[kind].delete(key);
  }
}

/** At most fifteen minutes, whatever the window. */
function seconds(state: RateLimiterRes): number {
  return Math.min(900, Math.max(1, Math.ceil(state.msBeforeNext / 1000)));
}
