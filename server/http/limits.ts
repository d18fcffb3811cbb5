import type { Request } from 'express';
import type pg from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { tooManyRequests } from './app-error';

interface Allowance {
  readonly tries: number;
  readonly seconds: number;
}

const QUARTER_HOUR_SECONDS = 900;
const HOUR_SECONDS = 3600;

/** How often one account or one network address may do what costs others something. */
export const STANDARD_ALLOWANCES = {
  signInByEmail: { tries: 10, seconds: QUARTER_HOUR_SECONDS },
  signInByAddress: { tries: 50, seconds: QUARTER_HOUR_SECONDS },
  /** Sign-up and password reset: each sends an e-mail to somebody. */
  mailByEmail: { tries: 4, seconds: HOUR_SECONDS },
  mailByAddress: { tries: 20, seconds: HOUR_SECONDS },
  tokenByAddress: { tries: 30, seconds: QUARTER_HOUR_SECONDS },
  uploadByAccount: { tries: 600, seconds: HOUR_SECONDS },
  wrongTokenByAddress: { tries: 30, seconds: QUARTER_HOUR_SECONDS },
  requestByToken: { tries: 2000, seconds: QUARTER_HOUR_SECONDS },
} as const satisfies Record<string, Allowance>;

export type LimitName = keyof typeof STANDARD_ALLOWANCES;
export type Allowances = Readonly<Record<LimitName, Allowance>>;

/** Counts tries in PostgreSQL, so that all web processes count together. */
export class Limits {
  readonly #limiters: ReadonlyMap<string, RateLimiterPostgres>;

  constructor(pool: pg.Pool, allowances: Allowances) {
    const limiterOf = ([name, { tries, seconds }]: [string, Allowance]) => {
      const limiter = new RateLimiterPostgres({
        storeClient: pool,
        tableName: 'rate_limits',
        tableCreated: true,
        keyPrefix: name,
        points: tries,
        duration: seconds,
      });
      return [name, limiter] as const;
    };
    this.#limiters = new Map(Object.entries(allowances).map(limiterOf));
  }

  /** Counts one try, or throws 429. */
  async take(name: LimitName, key: string): Promise<void> {
    try {
      await this.#limiter(name).consume(key);
    } catch (error) {
      // consume() rejects with a result when the allowance is used up, else with what went wrong.
      if (!(error instanceof RateLimiterRes)) throw error;
      throw tooManyRequests(Math.ceil(error.msBeforeNext / 1000));
    }
  }

  async forget(name: LimitName, key: string): Promise<void> {
    await this.#limiter(name).delete(key);
  }

  #limiter(name: LimitName): RateLimiterPostgres {
    const limiter = this.#limiters.get(name);
    if (!limiter) throw new Error(`There is no limit called ${name}`);
    return limiter;
  }
}

/** The network address that asks: the key of the limits that end in `ByAddress`. */
export function addressOf(req: Request): string {
  return req.ip ?? 'unknown';
}
