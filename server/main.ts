import { randomUUID } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import type { Logger } from 'pino';
import { z } from 'zod';
import { createApp } from './app';
import { makeSetUpLink } from './commands/make-set-up-link';
import { createDeps } from './create-deps';
import { checkDatabase } from './db/check-database';
import { connect } from './db/client';
import { listDemoPeople } from './db/queries/demo-sign-ins';
import { demoWorkbookFolder, demoWorkbooksAreWritten } from './db/seed/demo-workbook-folder';
import type { Deps, Wake } from './deps';
import { parseSettings, type Settings, SettingsError } from './env';
import { createHousekeeping } from './jobs/housekeeping';
import { jobHandlers } from './jobs/job-handlers';
import { createJobRunner } from './jobs/job-runner';
import { listen } from './listen';
import './lend-digest';
import { createLog } from './log';
import { createOutboxSender } from './mail/outbox-sender';
import { createMailTransport } from './mail/transport';
import { prepareDatabase } from './prepare-database';
import { createWorkbookPool } from './workbook/pool';

z.config({ jitless: true });

const stops: (() => Promise<unknown>)[] = [];
let stopping = false;

main().catch(async (error: unknown) => {
  const detail = error instanceof Error ? error.message : String(error);
  process.stderr.write(`${error instanceof SettingsError ? detail : (error as Error)?.stack}\n`);
  process.send?.({ kind: 'refused', detail });
  await runStops();
  process.exit(1);
});

async function main(): Promise<void> {
  const settings = parseSettings(process.env);
  const log = createLog(settings.logLevel);
  stopWhenAsked(log);
  const owner = randomUUID();
  await databaseIsUp();
  await prepareDatabase(settings, owner);
  const connection = connect(settings.databaseUrl);
  stops.push(connection.close);
  await checkDatabase(connection.pool, log);
  const pool = createWorkbookPool();
  stops.push(pool.close);
  const listeners: Wake = { jobs: nothing, mail: nothing };
  const wake: Wake = { jobs: () => listeners.jobs(), mail: () => listeners.mail() };
  const deps = createDeps({ settings, connection, log, pool, wake });
  if (settings.seedDemo) await seed(deps);
  Object.assign(listeners, await startWork(deps, owner));
  const url = await serve(deps);
  const setUpLink = await makeSetUpLink(deps);
  if (setUpLink)
    log.warn({ setUpLink }, 'no organisation yet: this link makes the agency and its administrator');
  log.info({ url }, 'ready');
  process.send?.({
    kind: 'ready',
    url,
    setUpLink,
    demoPeople: await listDemoPeople(deps.db),
    demoWorkbooks: demoWorkbooksOf(settings),
  });
}

/** The launcher starts us beside the private database, so that loading and its start overlap, and says when it is up. */
async function databaseIsUp(): Promise<void> {
  if (process.env.CLAUSEWAY_DATABASE_STARTS !== 'yes') return;
  await new Promise<void>((resolve) => {
    process.on('message', (message) => {
      if (message === 'database is up') resolve();
    });
  });
}

/** Loaded only where it is wanted: the demo brings its workbooks along. */
async function seed(deps: Deps): Promise<void> {
  const { seedDemo } = await import('./db/seed/seed-demo');
  await seedDemo(deps);
}

async function startWork(deps: Deps, owner: string) {
  const { settings } = deps;
  const catcher = settings.smtpUrl === null ? await catchMail(deps) : null;
  if (catcher) stops.push(catcher.close);
  const transport = createMailTransport(settings.smtpUrl ?? catcher?.url ?? '');
  const sender = createOutboxSender({ deps, transport, owner });
  stops.push(sender.stop);
  sender.start();
  const runner = createJobRunner({ deps, handlers: jobHandlers, owner });
  stops.push(runner.stop);
  runner.start();
  const housekeeping = createHousekeeping(deps);
  stops.push(housekeeping.stop);
  housekeeping.start();
  return { jobs: runner.wake, mail: sender.wake };
}

/** A mail server is part of development and demo only. */
async function catchMail(deps: Deps) {
  const { startMailCatcher } = await import('./mail/mail-catcher');
  return startMailCatcher(deps);
}

async function serve(deps: Deps): Promise<string> {
  const { settings } = deps;
  const app = createApp({ deps, webDirectory: path.resolve('dist/web') });
  const { close } = await listen(app, { host: settings.host, port: settings.port });
  stops.push(close);
  return settings.publicUrl;
}

function demoWorkbooksOf({ seedDemo, dataDirectory }: Settings): string | null {
  return seedDemo && demoWorkbooksAreWritten(dataDirectory) ? demoWorkbookFolder(dataDirectory) : null;
}

/** A signal, or the launcher's end of the channel closing because it was killed. */
function stopWhenAsked(log: Logger): void {
  const stop = async (why: string) => {
    if (stopping) return;
    stopping = true;
    log.info({ why }, 'stopping');
    await runStops();
    process.exit(0);
  };
  process.on('SIGTERM', () => void stop('SIGTERM'));
  process.on('SIGINT', () => void stop('SIGINT'));
  process.on('disconnect', () => {
    stops.unshift(stopOrphanedDatabase);
    void stop('the launcher is gone');
  });
}

function nothing(): void {}

/** Its launcher was killed before it could: the private database would outlive everybody. */
async function stopOrphanedDatabase(): Promise<void> {
  const pidFile = process.env.CLAUSEWAY_DATABASE_PID_FILE;
  if (!pidFile || !existsSync(pidFile)) return;
  process.kill(Number(readFileSync(pidFile, 'utf8')), 'SIGTERM');
}

/** In reverse: no new requests first, the database last. */
async function runStops(): Promise<void> {
  while (stops.length > 0) await stops.pop()?.();
}
