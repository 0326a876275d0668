import type { Pool } from 'mysql2/promise';
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible';
import { Problem } from '../problem';

const windows = {
  /** Wrong passwords for one address of mail from one network address. */
  signIn: { points: 10, seconds: 15 * 60 },
  /** Wrong passwords from one network address, whatever the names. */
  signInByAddress: { points: 60, seconds: 15 * 60 },
  /** Links that are mailed to somebody who is not signed in. */
  resetByEmail: { points: 5, seconds: 60 * 60 },
  openByAddress: { points: 300, seconds: 15 * 60 },
  /** Writes of one person. */
  writes: { points: 600, seconds: 5 * 60 },
} as const;

export type LimitName = keyof typeof windows;

export interface RateLimits {
  /** Counts one use; throws `too-many-requests` once the window is full. */
  use(name: LimitName, key: string): Promise<void>;
  /** Throws when the window is full already, without counting. */
  check(name: LimitName, key: string): Promise<void>;
  /** Forgets the uses of a key: the right password was given. */
  forget(name: LimitName, key: string): Promise<void>;
}

/** Counted in the database, so that servers behind one balancer share the count. */
export function createRateLimits(pool: Pool, database: string): RateLimits {
  const limiters = new Map(
    Object.entries(windows).map(([name, { points, seconds }]) => [
      name,
      new RateLimiterMySQL({
        storeClient: pool.pool,
        storeType: 'pool',
        dbName: database,
        tableName: 'rate_limits',
        tableCreated: true,
        keyPrefix: name,
        points,
        duration: seconds,
        // A timer of its own would outlive a closed pool; housekeeping clears old rows.
        clearExpiredByTimeout: false,
      }),
    ]),
  );
  const limiterOf = (name: LimitName) => limiters.get(name)!;
  return {
    use: (name, key) => limiterOf(name).consume(key.slice(0, 200)).then(nothing, refuse),
    check: async (name, key) => {
      const used = await limiterOf(name).get(key.slice(0, 200));
      if (used !== null && used.consumedPoints >= windows[name].points) refuse(used);
    },
    forget: (name, key) => limiterOf(name).delete(key.slice(0, 200)).then(nothing),
  };
}

function nothing(): void {}

function refuse(reason: unknown): never {
  if (!(reason instanceof RateLimiterRes)) throw reason;
  const retryAfterSeconds = Math.max(1, Math.ceil(reason.msBeforeNext / 1000));
  throw new Problem('too-many-requests', {
    detail: `Too many requests. Try again in ${retryAfterSeconds} seconds.`,
    retryAfterSeconds,
  });
}
