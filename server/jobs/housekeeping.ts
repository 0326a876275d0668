import { lt, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { sessions, verifications } from '../db/schema/people';
import { idempotencyKeys, rateLimits } from '../db/schema/work';
import type { Deps } from '../deps';

const everyMs = 60 * 60 * 1000;
/** A key is worth something as long as a client may still repeat its request. */
const keyHours = 48;

export interface Housekeeping {
  start(): void;
  stop(): Promise<void>;
}

/** Removes what has expired and nobody asks for. Every server may do it: removing twice is removing once. */
export function createHousekeeping(deps: Pick<Deps, 'db' | 'now' | 'log'>): Housekeeping {
  let timer: NodeJS.Timeout | undefined;
  let running: Promise<void> = Promise.resolve();
  const run = () => {
    running = removeExpired(deps.db, deps.now()).catch((error) =>
      deps.log.warn({ err: error }, 'housekeeping failed'),
    );
  };
  return {
    start() {
      timer = setInterval(run, everyMs);
      run();
    },
    async stop() {
      clearInterval(timer);
      await running;
    },
  };
}

export async function removeExpired(db: Database, now: Date): Promise<void> {
  await db.delete(sessions).where(lt(sessions.expiresAt, now));
  await db.delete(verifications).where(lt(verifications.expiresAt, now));
  await db.delete(rateLimits).where(lt(rateLimits.expire, now.getTime()));
  const keysBefore = new Date(now.getTime() - keyHours * 3600 * 1000);
  await db
    .delete(idempotencyKeys)
    // One that is still being answered may be the only trace of an act.
    .where(sql`${idempotencyKeys.createdAt} < ${keysBefore} and ${idempotencyKeys.status} is not null`);
}
