import { and, asc, eq } from 'drizzle-orm';
import type { Database } from '../db/client';
import { outbox, outboxAttachments } from '../db/schema/work';
import type { Deps } from '../deps';
import type { MailContent } from './templates/mail-content';

export interface NewMail {
  /** The organisation in whose name it is sent; null for mail of the product itself. */
  organisationId: string | null;
  kind: string;
  /** What it is about: `return` and its id. */
  subject: { kind: string; id: string };
  /** Mails of one submittal answer its first one, so that mail programs show them as a thread. */
  submittalId?: string;
  recipients: { name: string; email: string }[];
  copies?: { name: string; email: string }[];
  content: MailContent;
  /** Stored files that go with it, in order. */
  fileIds?: string[];
}

/** Writes the mail in the caller's transaction; wake the sender after the commit. */
export async function enqueueMail(
  db: Database,
  deps: Pick<Deps, 'now' | 'newId' | 'settings'>,
  mail: NewMail,
): Promise<string> {
  const id = deps.newId();
  const now = deps.now();
  await db.insert(outbox).values({
    id,
    organisationId: mail.organisationId,
    kind: mail.kind,
    messageId: `<${id}@${mailDomain(deps.settings.mailFrom)}>`,
    inReplyTo: mail.submittalId ? await firstMessageOf(db, mail.submittalId) : null,
    subjectKind: mail.subject.kind,
    subjectId: mail.subject.id,
    submittalId: mail.submittalId ?? null,
    recipients: mail.recipients,
    copies: mail.copies ?? [],
    subject: mail.content.subject.slice(0, 300),
    text: mail.content.text,
    html: mail.content.html,
    state: 'waiting',
    nextAttemptAt: now,
    createdAt: now,
  });
  const attachments = (mail.fileIds ?? []).map((fileId, position) => ({ outboxId: id, position, fileId }));
  if (attachments.length > 0) await db.insert(outboxAttachments).values(attachments);
  return id;
}

async function firstMessageOf(db: Database, submittalId: string): Promise<string | null> {
  const [first] = await db
    .select({ messageId: outbox.messageId })
    .from(outbox)
    .where(and(eq(outbox.submittalId, submittalId)))
    .orderBy(asc(outbox.createdAt), asc(outbox.id))
    .limit(1);
  return first?.messageId ?? null;
}

/** `Clauseway <mail@cvra.example>` → `cvra.example` */
function mailDomain(from: string): string {
  const domain = /@([A-Za-z0-9.-]+)/.exec(from)?.[1];
  return domain ?? 'localhost.example';
}
