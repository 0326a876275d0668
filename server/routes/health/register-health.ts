import { sql } from 'drizzle-orm';
import type { Express } from 'express';
import type { Deps } from '../../deps';
import { Problem } from '../../problem';

/** `health`: the process answers. `ready`: it can do its work, so that a balancer may send people to it. */
export function registerHealth(app: Express, deps: Deps): void {
  app.get('/api/health', (_request, response) => void response.json({ status: 'up' }));
  app.get('/api/ready', async (_request, response) => {
    try {
      await deps.db.execute(sql`select 1 from ${sql.identifier('__drizzle_migrations')} limit 1`);
    } catch (error) {
      deps.log.warn({ err: error }, 'not ready');
      throw new Problem('not-ready', { detail: 'The database does not answer, or is not migrated.' });
    }
    response.json({ status: 'ready' });
  });
}
