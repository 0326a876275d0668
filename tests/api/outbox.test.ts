import { eq, sql } from 'drizzle-orm';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { caughtMails, outbox } from '#server/db/schema/work';
import { enqueueMail, type NewMail } from '#server/mail/enqueue-mail';
import { startMailCatcher } from '#server/mail/mail-catcher';
import { claimMail, createOutboxSender } from '#server/mail/outbox-sender';
import { mailContent } from '#server/mail/templates/mail-content';
import { createMailTransport } from '#server/mail/transport';
import { startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
const open: (() => Promise<unknown>)[] = [];

beforeAll(async () => {
  test = await startTestApp();
});

afterEach(async () => {
  while (open.length > 0) await open.pop()?.();
  await test.deps.db.delete(outbox);
  test.clock.set('2026-03-09T09:00:00.000Z');
});

afterAll(() => test.close());

async function aMail(changes: Partial<NewMail> = {}): Promise<string> {
  return enqueueMail(test.deps.db, test.deps, {
    organisationId: null,
    kind: 'test',
    subject: { kind: 'person', id: test.deps.newId() },
    recipients: [{ name: 'Dele Fairweather', email: 'dele@brightwater.example' }],
    content: mailContent({ subject: 'A subject', paragraphs: ['First.', 'Second.'] }),
    ...changes,
  });
}

async function rowOf(id: string) {
  const [row] = await test.deps.db.select().from(outbox).where(eq(outbox.id, id));
  if (!row) throw new Error('no such mail');
  return row;
}

function senderTo(url: string, owner = test.deps.newId()) {
  const sender = createOutboxSender({ deps: test.deps, transport: createMailTransport(url), owner });
  open.push(sender.stop);
  return sender;
}

/** A mail server that refuses its first deliveries. */
async function refusingServer(refusals: number) {
  const received: string[] = [];
  let left = refusals;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    onData(stream, _session, done) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        received.push(Buffer.concat(parts).toString());
        left -= 1;
        done(left >= 0 ? new Error('Mailbox busy') : null);
      });
    },
  });
  const port = await new Promise<number>((resolve) => {
    const listener = server.listen(0, '127.0.0.1', () => {
      const address = listener.address();
      resolve(typeof address === 'object' && address ? address.port : 0);
    });
  });
  open.push(() => new Promise<void>((resolve) => server.close(() => resolve())));
  return { url: `smtp://127.0.0.1:${port}?ignoreTLS=true`, received };
}

describe('the outbox', () => {
  it('sends text and HTML parts over SMTP and marks the row', async () => {
    const server = await refusingServer(0);
    const id = await aMail();
    expect(await senderTo(server.url).sendDue()).toBe(1);
    expect(await rowOf(id)).toMatchObject({ state: 'sent', attempts: 1, lastProblem: null, owner: null });
    const mail = await simpleParser(server.received[0] ?? '');
    expect(mail.messageId).toBe((await rowOf(id)).messageId);
    expect(mail.subject).toBe('A subject');
    expect(mail.text).toContain('First.');
    expect(mail.html).toContain('<p>Second.</p>');
  });

  it('tries again with growing waits, under one Message-ID for ever', async () => {
    const server = await refusingServer(2);
    const id = await aMail();
    const sender = senderTo(server.url);
    await sender.sendDue();
    expect(await rowOf(id)).toMatchObject({ state: 'waiting', attempts: 1 });
    expect((await rowOf(id)).lastProblem).toContain('Mailbox busy');
    expect(await sender.sendDue()).toBe(0);
    test.clock.set('2026-03-09T09:00:29.999Z');
    expect(await sender.sendDue()).toBe(0);
    test.clock.set('2026-03-09T09:00:30.000Z');
    expect(await sender.sendDue()).toBe(1);
    test.clock.set('2026-03-09T09:02:30.000Z');
    expect(await sender.sendDue()).toBe(1);
    expect(await rowOf(id)).toMatchObject({ state: 'sent', attempts: 3 });
    const ids = await Promise.all(
      server.received.map(async (source) => (await simpleParser(source)).messageId),
    );
    expect(new Set(ids)).toEqual(new Set([(await rowOf(id)).messageId]));
  });

  it('gives up after about a day and keeps the last problem', async () => {
    const id = await aMail();
    const sender = senderTo('smtp://127.0.0.1:9');
    for (let attempt = 0; attempt < 12; attempt += 1) {
      await sender.sendDue();
      test.clock.now = (await rowOf(id)).nextAttemptAt;
    }
    expect(await rowOf(id)).toMatchObject({ state: 'failed', attempts: 12 });
    expect((await rowOf(id)).lastProblem).not.toBeNull();
  });

  it('is claimed by one of several senders', async () => {
    const id = await aMail();
    const claims = await Promise.all(
      Array.from({ length: 6 }, () =>
        claimMail(test.deps.db, { owner: test.deps.newId(), now: test.deps.now() }),
      ),
    );
    expect(claims.filter((claim) => claim !== null).map((claim) => claim.id)).toEqual([id]);
  });

  it('is taken over from a sender that died with it', async () => {
    const id = await aMail();
    const claim = () => claimMail(test.deps.db, { owner: test.deps.newId(), now: test.deps.now() });
    expect((await claim())?.id).toBe(id);
    expect(await claim()).toBeNull();
    await test.deps.db.update(outbox).set({ leaseUntil: sql`utc_timestamp(3) - interval 1 second` });
    expect((await claim())?.id).toBe(id);
  });

  it('threads the mails of one submittal on its first one', async () => {
    const submittalId = test.deps.newId();
    const first = await rowOf(await aMail({ submittalId }));
    test.clock.set('2026-03-10T09:00:00.000Z');
    const second = await rowOf(await aMail({ submittalId }));
    test.clock.set('2026-03-11T09:00:00.000Z');
    const third = await rowOf(await aMail({ submittalId }));
    const other = await rowOf(await aMail({ submittalId: test.deps.newId() }));
    expect(first.inReplyTo).toBeNull();
    expect([second.inReplyTo, third.inReplyTo]).toEqual([first.messageId, first.messageId]);
    expect(other.inReplyTo).toBeNull();
    const server = await refusingServer(0);
    await senderTo(server.url).sendDue();
    const parsed = await Promise.all(server.received.map((source) => simpleParser(source)));
    const answer = parsed.find((mail) => mail.messageId === second.messageId);
    expect(answer?.inReplyTo).toBe(first.messageId);
  });

  it('does not let a subject carry headers of its own', async () => {
    const server = await refusingServer(0);
    const content = mailContent({ subject: 'A\r\nBcc: spy@elsewhere.example', paragraphs: ['x'] });
    await aMail({ content });
    await senderTo(server.url).sendDue();
    const mail = await simpleParser(server.received[0] ?? '');
    expect(mail.bcc).toBeUndefined();
    expect(mail.headers.get('bcc')).toBeUndefined();
  });
});

describe('the mail catcher', () => {
  it('keeps what is sent to it, once for a Message-ID', async () => {
    const catcher = await startMailCatcher(test.deps);
    open.push(catcher.close);
    const id = await aMail();
    const sender = senderTo(catcher.url);
    await sender.sendDue();
    await test.deps.db.update(outbox).set({ state: 'waiting' }).where(eq(outbox.id, id));
    await sender.sendDue();
    const caught = await test.deps.db.select().from(caughtMails);
    expect(caught.map(({ messageId, recipients }) => ({ messageId, recipients }))).toEqual([
      { messageId: (await rowOf(id)).messageId, recipients: ['dele@brightwater.example'] },
    ]);
  });
});
