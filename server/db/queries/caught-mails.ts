import { desc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { caughtMails } from '../schema/work';

export async function listCaughtMails(db: Database) {
  return db
    .select({
      id: caughtMails.id,
      caughtAt: caughtMails.caughtAt,
      sender: caughtMails.sender,
      recipients: caughtMails.recipients,
      subject: caughtMails.subject,
      attachments: caughtMails.attachments,
    })
    .from(caughtMails)
    .orderBy(desc(caughtMails.caughtAt), desc(caughtMails.id))
    .limit(200);
}

export type CaughtMailRow = Awaited<ReturnType<typeof listCaughtMails>>[number];

export async function findCaughtMail(db: Database, id: string) {
  const [row] = await db.select().from(caughtMails).where(eq(caughtMails.id, id)).limit(1);
  return row ?? null;
}
