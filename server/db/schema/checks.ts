import {
  boolean,
  date,
  double,
  index,
  int,
  mysqlTable,
  text,
  uniqueIndex,
  varchar,
} from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { checkResultSchema, outcomeSchema, severitySchema, summarySchema } from '#rules/engine/finding';
import { noteKindSchema } from '#shared/contracts/notes';
import { organisationKindSchema } from '#shared/contracts/roles';
import { limits } from '#shared/limits';
import { choice, id, instant, json, reference, sha256, version } from '../columns';
import { organisations, people } from './people';
import { revisions, submittals } from './submittals';

const contextSchema = z.strictObject({
  submittedOn: z.string().nullable(),
  lettingOn: z.string().nullable(),
  facts: z.record(z.string(), z.union([z.number(), z.string(), z.boolean()])),
});

/** One run of the engine, sealed. A draft keeps one pre-check; checks of record are kept for ever. */
export const checks = mysqlTable(
  'checks',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    kind: choice('kind', ['pre-check', 'check of record']).notNull(),
    /** Counts up within the revision; the highest is the one that is shown. */
    number: int('number').notNull(),
    madeAt: instant('made_at').notNull(),
    madeById: id('made_by_id'),
    /** The date that was used as the date of submission. */
    submittedOn: date('submitted_on', { mode: 'string' }).notNull(),
    context: json('context', contextSchema).notNull(),
    recordHash: sha256('record_hash').notNull(),
    resolvedHash: sha256('resolved_hash').notNull(),
    engineVersion: varchar('engine_version', { length: 40 }).notNull(),
    seal: sha256('seal').notNull(),
    summary: json('summary', summarySchema).notNull(),
    /** The evidence document: findings with the sentences as shown, analysis, seal. */
    result: json('result', checkResultSchema).notNull(),
    /** Why it no longer describes the revision; null while it does. */
    stale: varchar('stale', { length: 300 }),
  },
  (table) => [
    uniqueIndex('checks_number').on(table.revisionId, table.number),
    index('checks_agency').on(table.agencyId, table.madeAt),
    reference('checks_revision_fk', table.revisionId, revisions.id),
    reference('checks_agency_fk', table.agencyId, organisations.id),
    reference('checks_contractor_fk', table.contractorId, organisations.id),
    reference('checks_made_by_fk', table.madeById, people.id),
  ],
);

/** Searchable copy of a check's findings, written in the same transaction. */
export const findings = mysqlTable(
  'findings',
  {
    id: id('id').primaryKey(),
    checkId: id('check_id').notNull(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    position: int('position').notNull(),
    rule: varchar('rule', { length: 120 }).notNull(),
    subject: varchar('subject', { length: 160 }).notNull(),
    clause: varchar('clause', { length: 60 }),
    severity: choice('severity', severitySchema.options).notNull(),
    outcome: choice('outcome', outcomeSchema.options).notNull(),
    borderline: boolean('borderline').notNull(),
    /** The judged value, after the rule's own rounding, in the finding's unit. */
    rounded: double('rounded'),
    margin: double('margin'),
  },
  (table) => [
    uniqueIndex('findings_position').on(table.checkId, table.position),
    index('findings_agency_rule').on(table.agencyId, table.rule, table.outcome),
    index('findings_revision').on(table.revisionId),
    reference('findings_check_fk', table.checkId, checks.id).onDelete('cascade'),
  ],
);

export const notes = mysqlTable(
  'notes',
  {
    id: id('id').primaryKey(),
    submittalId: id('submittal_id').notNull(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    /** The writer's organisation: an internal note stays inside it. */
    organisationId: id('organisation_id').notNull(),
    side: choice('side', organisationKindSchema.options).notNull(),
    kind: choice('kind', noteKindSchema.options).notNull(),
    /** `ruleId~subject`; null for a note on the whole submittal or on a cell. */
    finding: varchar('finding', { length: 300 }),
    sheet: varchar('sheet', { length: 120 }),
    cell: varchar('cell', { length: 20 }),
    text: varchar('text', { length: limits.noteCharacters }).notNull(),
    /** The note that a reply answers. */
    answersId: id('answers_id'),
    personId: id('person_id').notNull(),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    /** When the other side could first see it; from then on it does not change. */
    sentAt: instant('sent_at'),
    version: version(),
  },
  (table) => [
    index('notes_submittal').on(table.submittalId, table.createdAt),
    index('notes_revision').on(table.revisionId),
    reference('notes_submittal_fk', table.submittalId, submittals.id),
    reference('notes_revision_fk', table.revisionId, revisions.id),
    reference('notes_agency_fk', table.agencyId, organisations.id),
    reference('notes_contractor_fk', table.contractorId, organisations.id),
    reference('notes_organisation_fk', table.organisationId, organisations.id),
    reference('notes_person_fk', table.personId, people.id),
  ],
);

/** A reasoned acceptance of a failing finding, for one revision; the outcome stays fail. */
export const waivers = mysqlTable(
  'waivers',
  {
    id: id('id').primaryKey(),
    submittalId: id('submittal_id').notNull(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    finding: varchar('finding', { length: 300 }).notNull(),
    reason: varchar('reason', { length: limits.reasonCharacters }).notNull(),
    toBeReturned: boolean('to_be_returned').notNull(),
    personId: id('person_id').notNull(),
    createdAt: instant('created_at').notNull(),
    sentAt: instant('sent_at'),
    version: version(),
  },
  (table) => [
    uniqueIndex('waivers_finding').on(table.revisionId, table.finding),
    reference('waivers_submittal_fk', table.submittalId, submittals.id),
    reference('waivers_revision_fk', table.revisionId, revisions.id),
    reference('waivers_agency_fk', table.agencyId, organisations.id),
    reference('waivers_contractor_fk', table.contractorId, organisations.id),
    reference('waivers_person_fk', table.personId, people.id),
  ],
);

/** What a replay found to differ: outcomes of one finding under the old and the draft edition. */
export const replayFindings = mysqlTable(
  'replay_findings',
  {
    id: id('id').primaryKey(),
    replayId: id('replay_id').notNull(),
    agencyId: id('agency_id').notNull(),
    revisionId: id('revision_id').notNull(),
    rule: varchar('rule', { length: 120 }).notNull(),
    subject: varchar('subject', { length: 160 }).notNull(),
    before: choice('outcome_before', outcomeSchema.options),
    after: choice('outcome_after', outcomeSchema.options),
    detail: text('detail'),
  },
  (table) => [
    index('replay_findings_replay').on(table.replayId, table.rule),
    reference('replay_findings_revision_fk', table.revisionId, revisions.id),
  ],
);
