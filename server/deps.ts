import { randomBytes } from 'node:crypto';
import type { Logger } from 'pino';
import { v7 } from 'uuid';
import type { Auth } from './auth/create-auth';
import type { Database } from './db/client';
import type { Settings } from './env';
import type { RateLimits } from './middleware/rate-limits';
import type { WorkbookPool } from './workbook/pool';

/** What routes, commands and jobs work with. Tests pass their own clock and ids. */
export interface Deps {
  db: Database;
  now(): Date;
  /** UUIDv7. */
  newId(): string;
  /** 256 random bits for links. */
  newToken(): string;
  log: Logger;
  settings: Settings;
  auth: Auth;
  pool: WorkbookPool;
  rateLimits: RateLimits;
  /** Call after writing a job or a mail. Inside an idempotent act it waits for the commit by itself. */
  wake: Wake;
}

export interface Wake {
  jobs(): void;
  mail(): void;
}

export function newId(): string {
  return v7();
}

export function newToken(): string {
  return randomBytes(32).toString('base64url');
}
