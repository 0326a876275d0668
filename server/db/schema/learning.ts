import { index, int, mysqlTable, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { correctionSchema } from '#rules/reading/correction';
import { mappingSchema } from '#rules/reading/mapping';
import { readingSchema } from '#rules/record';
import { id, instant, json, reference } from '../columns';
import { files } from './files';
import { fingerprintCharacters, mappings } from './mappings';
import { organisations, people } from './people';
import { revisions } from './submittals';

/** Every version of a mapping, for ever: a check says with which its workbook was read. */
export const mappingVersions = mysqlTable(
  'mapping_versions',
  {
    id: id('id').primaryKey(),
    mappingId: id('mapping_id').notNull(),
    organisationId: id('organisation_id').notNull(),
    number: int('number').notNull(),
    document: json('document', mappingSchema).notNull(),
    fingerprint: varchar('fingerprint', { length: fingerprintCharacters }).notNull(),
    /** "Learned from BW-125-S4 r1.xlsx", "Imported" */
    origin: varchar('origin', { length: 300 }).notNull(),
    /** The revision whose corrections it learned, with the rules that they come to; null where it was imported. */
    revisionId: id('revision_id'),
    learned: json('learned', z.array(z.string())).notNull(),
    personId: id('person_id').notNull(),
    at: instant('at').notNull(),
  },
  (table) => [
    uniqueIndex('mapping_versions_number').on(table.mappingId, table.number),
    index('mapping_versions_revision').on(table.revisionId),
    reference('mapping_versions_mapping_fk', table.mappingId, mappings.id),
    reference('mapping_versions_organisation_fk', table.organisationId, organisations.id),
    reference('mapping_versions_revision_fk', table.revisionId, revisions.id),
    reference('mapping_versions_person_fk', table.personId, people.id),
  ],
);

const correctedSchema = z.strictObject({ kind: z.literal('correction'), correction: correctionSchema });
const typedSchema = z.strictObject({ kind: z.literal('typed'), reading: readingSchema });
const takenBackSchema = z.strictObject({ kind: z.literal('taken back') });

export const readingActSchema = z.discriminatedUnion('kind', [correctedSchema, typedSchema, takenBackSchema]);

/** What people did to the reading of a draft. Nothing of it is ever changed; taking back is an act of its own. */
export const readingActs = mysqlTable(
  'reading_acts',
  {
    id: id('id').primaryKey(),
    revisionId: id('revision_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    /** The workbook that a correction speaks of; null for what was typed, which outlives it. */
    fileId: id('file_id'),
    act: json('act', readingActSchema).notNull(),
    /** The act that this one takes back. */
    takesBackId: id('takes_back_id'),
    personId: id('person_id').notNull(),
    at: instant('at').notNull(),
  },
  (table) => [
    index('reading_acts_revision').on(table.revisionId, table.id),
    uniqueIndex('reading_acts_taken_back').on(table.takesBackId),
    reference('reading_acts_revision_fk', table.revisionId, revisions.id),
    reference('reading_acts_contractor_fk', table.contractorId, organisations.id),
    reference('reading_acts_file_fk', table.fileId, files.id),
    reference('reading_acts_takes_back_fk', table.takesBackId, table.id),
    reference('reading_acts_person_fk', table.personId, people.id),
  ],
);
