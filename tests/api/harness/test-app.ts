import type { Express } from 'express';
import request from 'supertest';
import { createApp } from '#server/app';
import { createDeps } from '#server/create-deps';
import type { Deps } from '#server/deps';
import { parseSettings, type Settings } from '#server/env';
import { createLog } from '#server/log';
import { createWorkbookPool, type WorkbookPool } from '#server/workbook/pool';
import { createTestDatabase, type TestDatabase } from './test-database';

export const origin = 'http://clauseway.example';

export interface TestApp {
  app: Express;
  deps: Deps;
  database: TestDatabase;
  /** What the application's clock says; move it with `set`. */
  clock: { now: Date; set(instant: string): void };
  /** How often jobs and mail were woken. */
  woken: { jobs: number; mail: number };
  close(): Promise<void>;
}

/** The product's app on a database of its own; nothing of ours is replaced but the clock. */
export async function startTestApp(overrides: Partial<Settings> = {}): Promise<TestApp> {
  const database = await createTestDatabase();
  const clock = {
    now: new Date('2026-03-09T09:00:00.000Z'),
    set(instant: string) {
      clock.now = new Date(instant);
    },
  };
  const woken = { jobs: 0, mail: 0 };
  const count = (what: 'jobs' | 'mail') => {
    woken[what] += 1;
  };
  const settings: Settings = {
    ...parseSettings({
      DATABASE_URL: database.applicationUrl,
      SESSION_SECRET: 'a secret of the tests, long enough for it',
      PUBLIC_URL: origin,
      MAIL_FROM: 'Clauseway <mail@clauseway.example>',
    }),
    smtpUrl: null,
    logLevel: 'silent',
    ...overrides,
  };
  const pool = lazyPool();
  const deps = createDeps({
    settings,
    connection: database.connection,
    log: createLog(settings.logLevel),
    pool,
    now: () => clock.now,
    wake: { jobs: () => count('jobs'), mail: () => count('mail') },
  });
  return {
    app: createApp({ deps }),
    deps,
    database,
    clock,
    woken,
    async close() {
      await pool.close();
      await database.drop();
    },
  };
}

/** Workers start with the first workbook: most tests upload none. */
function lazyPool(): WorkbookPool {
  let pool: WorkbookPool | null = null;
  return {
    decode(task) {
      pool ??= createWorkbookPool({ threads: 1 });
      return pool.decode(task);
    },
    async close() {
      await pool?.close();
    },
  };
}

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** Counted over all browsers: before anybody signs in, their keys are told apart by nothing else. */
let keys = 0;

/** Somebody with a browser: cookies are kept, and writes name the product's own page as their origin. */
export function browser(app: Express) {
  const agent = request.agent(app);
  const send = (method: Method, path: string) => {
    const sending = agent[method](path);
    if (method === 'get') return sending;
    keys += 1;
    return sending.set('Origin', origin).set('Idempotency-Key', `key-${keys}-${path}`.slice(0, 100));
  };
  return {
    get: (path: string) => send('get', path),
    post: (path: string) => send('post', path),
    put: (path: string) => send('put', path),
    patch: (path: string) => send('patch', path),
    delete: (path: string) => send('delete', path),
  };
}

export type Browser = ReturnType<typeof browser>;
