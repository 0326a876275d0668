import { boolean, date, index, int, mysqlTable, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { dispositionSchema } from '#rules/engine/finding';
import { readingResultSchema } from '#rules/reading/reading-result';
import { documentRecordSchema, mixRecordSchema, sourceSchema } from '#rules/record';
import { revisionStateSchema } from '#shared/contracts/submittals';
import { limits } from '#shared/limits';
import { choice, id, instant, json, reference, sha256, version } from '../columns';
import { files } from './files';
import { mappings } from './mappings';
import { laboratories, organisations, people } from './people';
import { projects, sections } from './projects';

const editionOfSectionSchema = z.strictObject({
  ruleSet: z.string(),
  edition: z.string(),
  title: z.string(),
});

/** The section as it stood when the revision was judged. */
export const sectionSnapshotSchema = z.strictObject({
  sectionId: z.string(),
  base: editionOfSectionSchema,
  layers: z.array(editionOfSectionSchema),
  resolvedHash: z.string(),
});

export const mappingDocumentSchema = z.record(z.string(), z.unknown());

export const submittals = mysqlTable(
  'submittals',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    projectId: id('project_id').notNull(),
    sectionId: id('section_id').notNull(),
    mixDesignation: varchar('mix_designation', { length: limits.mixDesignationCharacters }).notNull(),
    /**
     * The designation while the submittal is neither rejected nor withdrawn, else null: a unique index over
     * it lets the designation be used again.
     */
    activeDesignation: varchar('active_designation', { length: limits.mixDesignationCharacters }),
    latestNumber: int('latest_number').notNull(),
    /** Newest change that the agency may know of: drafts do not move it. Null until the first submission. */
    agencyUpdatedAt: instant('agency_updated_at'),
    /** The newest approval; a newer draft does not touch it. */
    standingRevision: int('standing_revision'),
    standingDisposition: choice('standing_disposition', dispositionSchema.options),
    standingOn: date('standing_on', { mode: 'string' }),
    createdById: id('created_by_id').notNull(),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('submittals_active_designation').on(
      table.contractorId,
      table.projectId,
      table.activeDesignation,
    ),
    index('submittals_agency_seen').on(table.agencyId, table.agencyUpdatedAt, table.id),
    index('submittals_contractor_updated').on(table.contractorId, table.updatedAt, table.id),
    index('submittals_project').on(table.projectId),
    index('submittals_section').on(table.sectionId),
    reference('submittals_agency_fk', table.agencyId, organisations.id),
    reference('submittals_contractor_fk', table.contractorId, organisations.id),
    reference('submittals_project_fk', table.projectId, projects.id),
    reference('submittals_section_fk', table.sectionId, sections.id),
    reference('submittals_created_by_fk', table.createdById, people.id),
  ],
);

export const revisions = mysqlTable(
  'revisions',
  {
    id: id('id').primaryKey(),
    submittalId: id('submittal_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    number: int('number').notNull(),
    state: choice('state', revisionStateSchema.options).notNull(),
    disposition: choice('disposition', dispositionSchema.options),
    /** Needed where the revision follows an approval. */
    reasonForRevision: varchar('reason_for_revision', { length: limits.reasonCharacters }),
    laboratoryId: id('laboratory_id').notNull(),
    section: json('section', sectionSnapshotSchema).notNull(),
    workbookFileId: id('workbook_file_id').notNull(),
    uploadedById: id('uploaded_by_id').notNull(),
    uploadedAt: instant('uploaded_at').notNull(),
    /** The laboratory's mapping that its workbook was read with, and which version of it; null where none was. */
    mappingId: id('mapping_id'),
    mappingNumber: int('mapping_number'),
    /** "12.5 mm dense-graded surface course · PG 64-22 · 12 million ESAL", from this revision's record. */
    description: varchar('description', { length: 300 }).notNull().default(''),
    doubtCount: int('doubt_count').notNull().default(0),
    /** "binder content 5.1 to 5.3 %; 14 readings changed" */
    changes: text('changes'),
    declaration: text('declaration'),
    submittedById: id('submitted_by_id'),
    submittedAt: instant('submitted_at'),
    /** Date of submission in the agency's zone: day 0 of the clock. */
    receivedOn: date('received_on', { mode: 'string' }),
    dueOn: date('due_on', { mode: 'string' }),
    takenById: id('taken_by_id'),
    takenAt: instant('taken_at'),
    returnedAt: instant('returned_at'),
    /** Working days from receipt to return, in the agency's zone. */
    workingDaysTaken: int('working_days_taken'),
    withdrawnAt: instant('withdrawn_at'),
    withdrawalReason: varchar('withdrawal_reason', { length: limits.reasonCharacters }),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('revisions_number').on(table.submittalId, table.number),
    index('revisions_agency_state').on(table.agencyId, table.state, table.dueOn),
    index('revisions_contractor_state').on(table.contractorId, table.state),
    index('revisions_taken_by').on(table.takenById),
    reference('revisions_submittal_fk', table.submittalId, submittals.id),
    reference('revisions_agency_fk', table.agencyId, organisations.id),
    reference('revisions_contractor_fk', table.contractorId, organisations.id),
    reference('revisions_laboratory_fk', table.laboratoryId, laboratories.id),
    reference('revisions_workbook_fk', table.workbookFileId, files.id),
    reference('revisions_uploaded_by_fk', table.uploadedById, people.id),
    reference('revisions_submitted_by_fk', table.submittedById, people.id),
    reference('revisions_taken_by_fk', table.takenById, people.id),
    reference('revisions_mapping_fk', table.mappingId, mappings.id),
  ],
);

/** Workbooks of a draft that a later upload replaced; the contractor alone sees them. */
export const replacedWorkbooks = mysqlTable(
  'replaced_workbooks',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    fileId: id('file_id').notNull(),
    replacedById: id('replaced_by_id').notNull(),
    replacedAt: instant('replaced_at').notNull(),
  },
  (table) => [
    index('replaced_workbooks_revision').on(table.revisionId),
    reference('replaced_workbooks_revision_fk', table.revisionId, revisions.id),
    reference('replaced_workbooks_file_fk', table.fileId, files.id),
    reference('replaced_workbooks_person_fk', table.replacedById, people.id),
  ],
);

/** The truth of a revision: the canonical record, and how the workbook was read into it. */
export const mixRecords = mysqlTable(
  'mix_records',
  {
    revisionId: id('revision_id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    record: json('record', mixRecordSchema).notNull(),
    recordHash: sha256('record_hash').notNull(),
    reading: json('reading', readingResultSchema).notNull(),
    mapping: json('mapping', mappingDocumentSchema).notNull(),
    mappingName: varchar('mapping_name', { length: 200 }).notNull(),
    readAt: instant('read_at').notNull(),
  },
  (table) => [reference('mix_records_revision_fk', table.revisionId, revisions.id)],
);

/** Searchable copy of a record's readings, written in the same transaction. */
export const readings = mysqlTable(
  'readings',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    position: int('position').notNull(),
    quantity: varchar('quantity', { length: 80 }).notNull(),
    /** In the quantity's canonical unit, shortest decimal form. */
    value: varchar('value', { length: 40 }),
    qualifier: varchar('qualifier', { length: 20 }),
    unit: varchar('unit', { length: 20 }).notNull(),
    trial: varchar('trial', { length: 60 }),
    specimen: varchar('specimen', { length: 60 }),
    /** Opening in mm. */
    sieveMm: varchar('sieve_mm', { length: 20 }),
    origin: varchar('origin', { length: 20 }).notNull(),
    sheet: varchar('sheet', { length: 120 }),
    cell: varchar('cell', { length: 20 }),
  },
  (table) => [
    uniqueIndex('readings_position').on(table.revisionId, table.position),
    index('readings_agency_quantity').on(table.agencyId, table.quantity),
    reference('readings_revision_fk', table.revisionId, revisions.id),
  ],
);

/** An answer to one doubt; holds while the cell's text is unchanged. */
export const answers = mysqlTable(
  'answers',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    sheet: varchar('sheet', { length: 120 }).notNull(),
    cell: varchar('cell', { length: 20 }).notNull(),
    text: text('text').notNull(),
    answer: varchar('answer', { length: 200 }).notNull(),
    personId: id('person_id').notNull(),
    at: instant('at').notNull(),
  },
  (table) => [
    uniqueIndex('answers_cell').on(table.revisionId, table.sheet, table.cell),
    reference('answers_revision_fk', table.revisionId, revisions.id),
    reference('answers_person_fk', table.personId, people.id),
  ],
);

/** An attribute that was asked on the reading page, kept as typed. */
export const typedAttributes = mysqlTable(
  'typed_attributes',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    name: varchar('name', { length: 120 }).notNull(),
    value: json('value', z.union([z.number(), z.string(), z.boolean()])).notNull(),
    personId: id('person_id').notNull(),
    /** Date in the agency's zone. */
    typedOn: date('typed_on', { mode: 'string' }).notNull(),
  },
  (table) => [
    uniqueIndex('typed_attributes_name').on(table.revisionId, table.name),
    reference('typed_attributes_revision_fk', table.revisionId, revisions.id),
    reference('typed_attributes_person_fk', table.personId, people.id),
  ],
);

/** A certificate or report; without a file it is stated, not enclosed. */
export const documents = mysqlTable(
  'documents',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    position: int('position').notNull(),
    type: varchar('type', { length: 80 }).notNull(),
    issuer: varchar('issuer', { length: 200 }),
    reference: varchar('reference', { length: 200 }),
    date: date('date', { mode: 'string' }),
    validTo: date('valid_to', { mode: 'string' }),
    source: json('source', sourceSchema.nullable()),
    /** As the workbook states it, so that reading again finds the row; null where it was added on the page. */
    stated: json('stated', documentRecordSchema.nullable()),
    added: boolean('added').notNull(),
    fileId: id('file_id'),
    version: version(),
  },
  (table) => [
    index('documents_revision').on(table.revisionId, table.position),
    reference('documents_revision_fk', table.revisionId, revisions.id),
    reference('documents_agency_fk', table.agencyId, organisations.id),
    reference('documents_contractor_fk', table.contractorId, organisations.id),
    reference('documents_file_fk', table.fileId, files.id),
  ],
);
