import { boolean, date, index, int, mysqlTable, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { limits } from '#shared/limits';
import { choice, id, instant, json, reference, sha256, version } from '../columns';
import { organisations, people } from './people';

/** A rule set as a document. Its own schema is applied by whoever judges with it: a draft may be unfinished. */
const ruleSetDocumentSchema = z.record(z.string(), z.unknown());

export const ruleSets = mysqlTable(
  'rule_sets',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    /** The rule set's own id, `cvra-412`. */
    key: varchar('rule_set_key', { length: 80 }).notNull(),
    title: varchar('title', { length: 200 }).notNull(),
    createdAt: instant('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('rule_sets_key').on(table.agencyId, table.key),
    reference('rule_sets_agency_fk', table.agencyId, organisations.id),
  ],
);

/** An edition being written, its cases with it. Publishing copies it into `editions`. */
export const editionDrafts = mysqlTable(
  'edition_drafts',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    ruleSetId: id('rule_set_id').notNull(),
    edition: varchar('edition', { length: 40 }).notNull(),
    state: choice('state', ['draft', 'in review', 'published']).notNull(),
    document: json('document', ruleSetDocumentSchema).notNull(),
    /** The published edition that it started from. */
    basedOnId: id('based_on_id'),
    /** Made from a shipped starting point, or from an edition that is one still. */
    startingPoint: boolean('starting_point').notNull().default(false),
    /** Who asked for the review; null while it is being written. */
    sentById: id('sent_by_id'),
    sentAt: instant('sent_at'),
    createdById: id('created_by_id').notNull(),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('edition_drafts_edition').on(table.ruleSetId, table.edition),
    index('edition_drafts_agency').on(table.agencyId),
    reference('edition_drafts_agency_fk', table.agencyId, organisations.id),
    reference('edition_drafts_rule_set_fk', table.ruleSetId, ruleSets.id),
    reference('edition_drafts_based_on_fk', table.basedOnId, editions.id),
    reference('edition_drafts_created_by_fk', table.createdById, people.id),
    reference('edition_drafts_sent_by_fk', table.sentById, people.id),
  ],
);

/** Append-only: a published edition never changes; what happens to it later is an event. */
export const editions = mysqlTable(
  'editions',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    ruleSetId: id('rule_set_id').notNull(),
    ruleSetKey: varchar('rule_set_key', { length: 80 }).notNull(),
    edition: varchar('edition', { length: 40 }).notNull(),
    title: varchar('title', { length: 200 }).notNull(),
    document: json('document', ruleSetDocumentSchema).notNull(),
    /** Of the document in canonical form. */
    hash: sha256('hash').notNull(),
    effectiveFrom: date('effective_from', { mode: 'string' }).notNull(),
    /** Null: until the next published edition's first day. */
    effectiveTo: date('effective_to', { mode: 'string' }),
    /** The edition that a layer sits over; null for a base edition. */
    layerOfKey: varchar('layer_of_key', { length: 80 }),
    layerOfEdition: varchar('layer_of_edition', { length: 40 }),
    ruleCount: int('rule_count').notNull(),
    /** A shipped starting point, to be checked against the agency's current specification. */
    startingPoint: boolean('starting_point').notNull(),
    publishedAt: instant('published_at').notNull(),
    publishedById: id('published_by_id').notNull(),
    /** The second rule author, without whom nothing is published; null for a starting point, which nobody reviewed. */
    secondAuthorId: id('second_author_id'),
  },
  (table) => [
    uniqueIndex('editions_edition').on(table.agencyId, table.ruleSetKey, table.edition),
    index('editions_rule_set').on(table.ruleSetId, table.effectiveFrom),
    reference('editions_agency_fk', table.agencyId, organisations.id),
    reference('editions_rule_set_fk', table.ruleSetId, ruleSets.id),
    reference('editions_published_by_fk', table.publishedById, people.id),
    reference('editions_second_author_fk', table.secondAuthorId, people.id),
  ],
);

/** Append-only. */
export const editionEvents = mysqlTable(
  'edition_events',
  {
    id: id('id').primaryKey(),
    editionId: id('edition_id').notNull(),
    agencyId: id('agency_id').notNull(),
    kind: choice('kind', ['published', 'withdrawn']).notNull(),
    at: instant('at').notNull(),
    personId: id('person_id').notNull(),
    reason: text('reason'),
  },
  (table) => [
    index('edition_events_edition').on(table.editionId, table.at),
    reference('edition_events_edition_fk', table.editionId, editions.id),
    reference('edition_events_agency_fk', table.agencyId, organisations.id),
    reference('edition_events_person_fk', table.personId, people.id),
  ],
);

/** An edition with its layers applied, kept once by its hash for every check that names it. */
export const resolvedEditions = mysqlTable('resolved_editions', {
  hash: sha256('hash').primaryKey(),
  document: json('document', ruleSetDocumentSchema).notNull(),
  createdAt: instant('created_at').notNull(),
});

export const draftComments = mysqlTable(
  'draft_comments',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    draftId: id('draft_id').notNull(),
    /** The rule that it is about; null for the draft as a whole. */
    rule: varchar('rule', { length: 120 }),
    text: varchar('text', { length: limits.noteCharacters }).notNull(),
    personId: id('person_id').notNull(),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    index('draft_comments_draft').on(table.draftId, table.createdAt),
    reference('draft_comments_agency_fk', table.agencyId, organisations.id),
    reference('draft_comments_draft_fk', table.draftId, editionDrafts.id).onDelete('cascade'),
    reference('draft_comments_person_fk', table.personId, people.id),
  ],
);

/** A draft edition run over past submittals. */
export const replays = mysqlTable(
  'replays',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    /** Counts up within the agency; part of the address. */
    number: int('number').notNull(),
    draftId: id('draft_id').notNull(),
    jobId: id('job_id'),
    resolvedHash: sha256('resolved_hash').notNull(),
    summary: json('summary', z.record(z.string(), z.unknown())),
    createdById: id('created_by_id').notNull(),
    createdAt: instant('created_at').notNull(),
    finishedAt: instant('finished_at'),
  },
  (table) => [
    uniqueIndex('replays_number').on(table.agencyId, table.number),
    reference('replays_agency_fk', table.agencyId, organisations.id),
    reference('replays_draft_fk', table.draftId, editionDrafts.id),
    reference('replays_created_by_fk', table.createdById, people.id),
  ],
);
