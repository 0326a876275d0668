import { eq } from 'drizzle-orm';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { caughtMails } from '../db/schema/work';
import type { Deps } from '../deps';

export interface MailCatcher {
  url: string;
  close(): Promise<void>;
}

/** A real mail server on loopback that keeps what it is given; in development and demo only. */
export async function startMailCatcher(
  deps: Pick<Deps, 'db' | 'now' | 'newId' | 'log'>,
): Promise<MailCatcher> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    size: 60 * 1024 * 1024,
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        const recipients = session.envelope.rcptTo.map(({ address }) => address);
        keep(deps, Buffer.concat(parts), recipients).then(() => done(), done);
      });
    },
  });
  server.on('error', (error) => deps.log.warn({ err: error }, 'mail catcher'));
  const port = await new Promise<number>((resolve, reject) => {
    server.once('error', reject);
    const listener = server.listen(0, '127.0.0.1', () => {
      const address = listener.address();
      if (typeof address === 'object' && address) resolve(address.port);
      else reject(new Error('The mail catcher has no port.'));
    });
  });
  return {
    url: `smtp://127.0.0.1:${port}?ignoreTLS=true`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/** A mail that comes again under its Message-ID is the same mail. */
async function keep(
  { db, now, newId }: Pick<Deps, 'db' | 'now' | 'newId'>,
  source: Buffer,
  recipients: string[],
): Promise<void> {
  const parsed = await simpleParser(source);
  const messageId = parsed.messageId ?? '';
  const [known] = await db
    .select({ id: caughtMails.id })
    .from(caughtMails)
    .where(eq(caughtMails.messageId, messageId))
    .limit(1);
  if (known) return;
  await db.insert(caughtMails).values({
    id: newId(),
    caughtAt: now(),
    messageId,
    sender: parsed.from?.value[0]?.address ?? '',
    recipients,
    subject: (parsed.subject ?? '').slice(0, 300),
    attachments: parsed.attachments.length,
    source,
  });
}
