import { and, asc, eq, isNull, lte, or, type SQL, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { files } from '../db/schema/files';
import { outbox, outboxAttachments } from '../db/schema/work';
import type { Deps } from '../deps';
import type { MailTransport } from './transport';

export type OutboxRow = typeof outbox.$inferSelect;

interface SenderOptions {
  deps: Pick<Deps, 'db' | 'now' | 'log' | 'settings'>;
  transport: MailTransport;
  /** Names this sender in the leases. */
  owner: string;
  pollMs?: number;
}

export interface OutboxSender {
  start(): void;
  wake(): void;
  /** Sends what is due now; tests call it in place of waiting. */
  sendDue(): Promise<number>;
  stop(): Promise<void>;
}

const leaseSeconds = 120;
/** After the n-th failure: 30 s, 2 min, 8 min, 32 min, then about every two hours, for a day or so. */
const backOffSeconds = [30, 120, 480, 1920, 7200, 7200, 7200, 7200, 14_400, 14_400, 14_400];

/** Claims, sends, marks. A crash between sending and marking repeats the mail under the same Message-ID. */
export function createOutboxSender({ deps, transport, owner, pollMs = 5_000 }: SenderOptions): OutboxSender {
  let timer: NodeJS.Timeout | undefined;
  let stopped = false;
  let sending: Promise<number> | null = null;
  let again = false;

  async function sendDue(): Promise<number> {
    let count = 0;
    while (!stopped) {
      const mail = await claimMail(deps.db, { owner, now: deps.now() });
      if (!mail) return count;
      await sendOne({ deps, transport, owner }, mail);
      count += 1;
    }
    return count;
  }

  function wake(): void {
    if (stopped) return;
    if (sending) {
      again = true;
      return;
    }
    sending = sendDue();
    sending
      .catch((error) => deps.log.error({ err: error }, 'outbox could not be read'))
      .finally(() => {
        sending = null;
        if (again) {
          again = false;
          wake();
        }
      });
  }

  return {
    start() {
      timer = setInterval(wake, pollMs);
      wake();
    },
    wake,
    sendDue,
    async stop() {
      stopped = true;
      clearInterval(timer);
      await sending?.catch(() => undefined);
      transport.close();
    },
  };
}

const unheld = or(isNull(outbox.leaseUntil), sql`${outbox.leaseUntil} < utc_timestamp(3)`) as SQL;

export async function claimMail(
  db: Database,
  { owner, now }: { owner: string; now: Date },
): Promise<OutboxRow | null> {
  const due = and(eq(outbox.state, 'waiting'), lte(outbox.nextAttemptAt, now), unheld);
  const candidates = await db
    .select({ id: outbox.id })
    .from(outbox)
    .where(due)
    .orderBy(asc(outbox.nextAttemptAt), asc(outbox.id))
    .limit(5);
  for (const { id } of candidates) {
    const [result] = await db
      .update(outbox)
      .set({ owner, leaseUntil: sql`utc_timestamp(3) + interval ${leaseSeconds} second` })
      .where(and(eq(outbox.id, id), due));
    if (result.affectedRows !== 1) continue;
    const [row] = await db.select().from(outbox).where(eq(outbox.id, id)).limit(1);
    return row ?? null;
  }
  return null;
}

async function sendOne(
  { deps, transport, owner }: Pick<SenderOptions, 'deps' | 'transport' | 'owner'>,
  mail: OutboxRow,
): Promise<void> {
  const held = and(eq(outbox.id, mail.id), eq(outbox.owner, owner));
  const letGo = { owner: null, leaseUntil: null, attempts: mail.attempts + 1 };
  try {
    const attachments = await attachmentsOf(deps.db, mail.id);
    const refused = await transport.send({ mail, attachments, from: deps.settings.mailFrom });
    await deps.db
      .update(outbox)
      .set({
        ...letGo,
        state: 'sent',
        sentAt: deps.now(),
        lastProblem: refused.length > 0 ? `Refused by the mail server: ${refused.join(', ')}` : null,
      })
      .where(held);
  } catch (error) {
    const lastProblem = error instanceof Error ? error.message.slice(0, 1000) : String(error);
    deps.log.warn({ mail: mail.id, attempt: mail.attempts + 1, problem: lastProblem }, 'mail not sent');
    const wait = backOffSeconds[mail.attempts];
    await deps.db
      .update(outbox)
      .set(
        wait === undefined
          ? { ...letGo, state: 'failed', lastProblem }
          : { ...letGo, lastProblem, nextAttemptAt: new Date(deps.now().getTime() + wait * 1000) },
      )
      .where(held);
  }
}

export interface Attachment {
  fileName: string;
  mediaType: string;
  bytes: Buffer;
}

async function attachmentsOf(db: Database, outboxId: string): Promise<Attachment[]> {
  return db
    .select({ fileName: files.fileName, mediaType: files.mediaType, bytes: files.bytes })
    .from(outboxAttachments)
    .innerJoin(files, eq(files.id, outboxAttachments.fileId))
    .where(eq(outboxAttachments.outboxId, outboxId))
    .orderBy(asc(outboxAttachments.position));
}
