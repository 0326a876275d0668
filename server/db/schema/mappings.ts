import { index, int, mysqlTable, varchar } from 'drizzle-orm/mysql-core';
import { limits } from '#shared/limits';
import { id, instant, reference, version } from '../columns';
import { laboratories, organisations, people } from './people';

/** Long enough for a sample of forty hashes with a prefix. */
export const fingerprintCharacters = 480;

/** A layout of a laboratory's workbooks; how it is read is said by its versions. */
export const mappings = mysqlTable(
  'mappings',
  {
    id: id('id').primaryKey(),
    organisationId: id('organisation_id').notNull(),
    laboratoryId: id('laboratory_id').notNull(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    /** Of its newest version. */
    fingerprint: varchar('fingerprint', { length: fingerprintCharacters }).notNull(),
    /** Of its newest version. */
    number: int('number').notNull(),
    /** From then on it is not applied by itself. */
    retiredAt: instant('retired_at'),
    createdById: id('created_by_id').notNull(),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    index('mappings_laboratory').on(table.laboratoryId),
    reference('mappings_organisation_fk', table.organisationId, organisations.id),
    reference('mappings_laboratory_fk', table.laboratoryId, laboratories.id),
    reference('mappings_created_by_fk', table.createdById, people.id),
  ],
);
