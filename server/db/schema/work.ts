import {
  bigint,
  boolean,
  index,
  int,
  mediumtext,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { limits } from '#shared/limits';
import { choice, id, instant, json, longBlob, reference, sha256, version } from '../columns';
import { files } from './files';
import { organisations, people } from './people';

export const mailAddressSchema = z.strictObject({ name: z.string(), email: z.string() });
export const jobStates = ['waiting', 'running', 'done', 'failed', 'cancelled'] as const;

export const jobProblemSchema = z.strictObject({
  slug: z.string(),
  detail: z.string(),
  fix: z.string(),
  href: z.string().nullable(),
});

/** Long work. Claimed by `owner` until `lease_until`, by the database's clock. */
export const jobs = mysqlTable(
  'jobs',
  {
    id: id('id').primaryKey(),
    /** The organisation that may see and cancel it. */
    organisationId: id('organisation_id').notNull(),
    kind: varchar('kind', { length: 40 }).notNull(),
    state: choice('state', jobStates).notNull(),
    /** What it is about, `revision` and its id: the page of that object watches it. */
    subjectKind: varchar('subject_kind', { length: 40 }).notNull(),
    subjectId: id('subject_id').notNull(),
    payload: json('payload', z.record(z.string(), z.unknown())).notNull(),
    /** Where a resumed run goes on; null at the start. */
    resumeFrom: json('resume_from', z.unknown()),
    progress: varchar('progress', { length: 300 }).notNull().default(''),
    done: int('done').notNull().default(0),
    total: int('total').notNull().default(0),
    problem: json('problem', jobProblemSchema),
    attempts: int('attempts').notNull().default(0),
    cancelRequested: boolean('cancel_requested').notNull().default(false),
    owner: id('owner'),
    leaseUntil: instant('lease_until'),
    createdById: id('created_by_id'),
    createdAt: instant('created_at').notNull(),
    finishedAt: instant('finished_at'),
    /** Counts what a canceller has to know of: that it is to be cancelled, and that it has ended. */
    version: version(),
  },
  (table) => [
    index('jobs_state').on(table.state, table.leaseUntil),
    index('jobs_subject').on(table.subjectKind, table.subjectId, table.createdAt),
    reference('jobs_organisation_fk', table.organisationId, organisations.id),
    reference('jobs_created_by_fk', table.createdById, people.id),
  ],
);

/** Mail to be sent, written in the transaction of the act that causes it. */
export const outbox = mysqlTable(
  'outbox',
  {
    id: id('id').primaryKey(),
    /** The organisation in whose name it is sent; null for mail of the product itself. */
    organisationId: id('organisation_id'),
    kind: varchar('kind', { length: 40 }).notNull(),
    /** Made once; a repeated sending is recognised by it. */
    messageId: varchar('message_id', { length: 255 }).notNull(),
    inReplyTo: varchar('in_reply_to', { length: 255 }),
    /** What it is about, `return` and its id. */
    subjectKind: varchar('subject_kind', { length: 40 }).notNull(),
    subjectId: id('subject_id').notNull(),
    /** Mails of one submittal hang together; null for all others. */
    submittalId: id('submittal_id'),
    recipients: json('recipients', z.array(mailAddressSchema)).notNull(),
    copies: json('copies', z.array(mailAddressSchema)).notNull(),
    subject: varchar('subject', { length: 300 }).notNull(),
    text: mediumtext('text').notNull(),
    html: mediumtext('html').notNull(),
    state: choice('state', ['waiting', 'sent', 'failed']).notNull(),
    attempts: int('attempts').notNull().default(0),
    nextAttemptAt: instant('next_attempt_at').notNull(),
    lastProblem: text('last_problem'),
    owner: id('owner'),
    leaseUntil: instant('lease_until'),
    createdAt: instant('created_at').notNull(),
    sentAt: instant('sent_at'),
  },
  (table) => [
    uniqueIndex('outbox_message_id').on(table.messageId),
    index('outbox_state').on(table.state, table.nextAttemptAt),
    index('outbox_subject').on(table.subjectKind, table.subjectId),
    index('outbox_submittal').on(table.submittalId, table.createdAt),
    reference('outbox_organisation_fk', table.organisationId, organisations.id),
  ],
);

/** Files that go with a mail: the stored bytes, so that a retry sends the same. */
export const outboxAttachments = mysqlTable(
  'outbox_attachments',
  {
    outboxId: id('outbox_id').notNull(),
    position: int('position').notNull(),
    fileId: id('file_id').notNull(),
  },
  (table) => [
    primaryKey({ name: 'outbox_attachments_pk', columns: [table.outboxId, table.position] }),
    reference('outbox_attachments_outbox_fk', table.outboxId, outbox.id).onDelete('cascade'),
    reference('outbox_attachments_file_fk', table.fileId, files.id),
  ],
);

/** The answer to an act that must not happen twice. */
export const idempotencyKeys = mysqlTable(
  'idempotency_keys',
  {
    id: id('id').primaryKey(),
    /** Whose key it is; for acts that are open to anybody, nobody's id, so neither refers to a row. */
    personId: id('person_id').notNull(),
    organisationId: id('organisation_id').notNull(),
    /** Hash of the header, so that any spelling compares exactly. */
    key: sha256('idempotency_key').notNull(),
    /** Of method, address, version and body. */
    requestHash: sha256('request_hash').notNull(),
    /** Null while the first request is being answered. */
    status: int('status'),
    response: json('response', z.unknown()),
    owner: id('owner'),
    leaseUntil: instant('lease_until'),
    createdAt: instant('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('idempotency_keys_key').on(table.personId, table.organisationId, table.key),
    index('idempotency_keys_created').on(table.createdAt),
  ],
);

/** Columns as the rate limiter's store expects them. */
export const rateLimits = mysqlTable('rate_limits', {
  key: varchar('key', { length: 255 }).primaryKey(),
  points: int('points').notNull().default(0),
  /** Milliseconds since 1970. */
  expire: bigint('expire', { mode: 'number', unsigned: true }),
});

/** Mail that the loopback server caught; filled in development and demo only. */
export const caughtMails = mysqlTable(
  'caught_mails',
  {
    id: id('id').primaryKey(),
    caughtAt: instant('caught_at').notNull(),
    messageId: varchar('message_id', { length: 255 }).notNull(),
    sender: varchar('sender', { length: limits.emailCharacters }).notNull(),
    recipients: json('recipients', z.array(z.string())).notNull(),
    subject: varchar('subject', { length: 300 }).notNull(),
    attachments: int('attachments').notNull(),
    /** The message as it came over the wire. */
    source: longBlob('source').notNull(),
  },
  (table) => [index('caught_mails_at').on(table.caughtAt), index('caught_mails_message').on(table.messageId)],
);
