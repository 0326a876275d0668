import { eq } from 'drizzle-orm';
import type { Pool } from 'mysql2/promise';
import type { Logger } from 'pino';
import { createAuth } from './auth/create-auth';
import { connectionOptions, type Database } from './db/client';
import { demoSignIns } from './db/schema/people';
import { writeAudit } from './db/write-audit';
import { type Deps, newId, newToken, type Wake } from './deps';
import type { Settings } from './env';
import { enqueueMail } from './mail/enqueue-mail';
import { passwordResetMail } from './mail/templates/account-mails';
import { createRateLimits } from './middleware/rate-limits';
import type { WorkbookPool } from './workbook/pool';

interface DepsOptions {
  settings: Settings;
  connection: { db: Database; pool: Pool };
  log: Logger;
  pool: WorkbookPool;
  wake: Wake;
  now?: () => Date;
}

export function createDeps({
  settings,
  connection,
  log,
  pool,
  wake,
  now = () => new Date(),
}: DepsOptions): Deps {
  const { db } = connection;
  const basics = { db, now, newId, newToken, log, settings, pool, wake };
  return {
    ...basics,
    rateLimits: createRateLimits(connection.pool, connectionOptions(settings.databaseUrl).database ?? ''),
    auth: createAuth({
      db,
      log,
      newId,
      secret: settings.sessionSecret,
      publicUrl: settings.publicUrl,
      async sendPasswordReset(person, token) {
        await enqueueMail(db, basics, {
          organisationId: null,
          kind: 'password reset',
          subject: { kind: 'person', id: person.id },
          recipients: [{ name: person.name, email: person.email }],
          content: passwordResetMail({
            name: person.name,
            address: `${settings.publicUrl}/new-password/${token}`,
          }),
        });
        wake.mail();
      },
      async afterPasswordReset(personId) {
        await db.transaction(async (tx) => {
          // The sign-in page must not show a password that no longer holds.
          await tx.delete(demoSignIns).where(eq(demoSignIns.personId, personId));
          const subject = { kind: 'person', id: personId };
          await writeAudit(tx, basics, { actor: null, act: 'password reset', subject, requestId: null });
        });
      },
    }),
  };
}
