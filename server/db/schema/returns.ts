import { boolean, index, mysqlTable, text, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { dispositionSchema } from '#rules/engine/finding';
import { recipientSchema } from '#shared/contracts/returns';
import { limits } from '#shared/limits';
import { choice, id, instant, json, reference, version } from '../columns';
import { files } from './files';
import { organisations, people } from './people';
import { revisions, submittals } from './submittals';

/** The letter, its enclosures and the mail that carries them; one a revision. */
export const returns = mysqlTable(
  'returns',
  {
    id: id('id').primaryKey(),
    submittalId: id('submittal_id').notNull(),
    revisionId: id('revision_id').notNull(),
    agencyId: id('agency_id').notNull(),
    contractorId: id('contractor_id').notNull(),
    state: choice('state', ['draft', 'ready to sign', 'sent']).notNull(),
    disposition: choice('disposition', dispositionSchema.options).notNull(),
    /** Needed where the disposition differs from the recommended one. */
    reason: varchar('reason', { length: limits.reasonCharacters }).notNull(),
    textAbove: text('text_above').notNull(),
    textBelow: text('text_below').notNull(),
    recipients: json('recipients', z.array(recipientSchema)).notNull(),
    copies: json('copies', z.array(recipientSchema)).notNull(),
    /** Keys of the optional items that go with it. */
    included: json('included', z.array(z.string())).notNull(),
    findingsWorkbook: boolean('findings_workbook').notNull(),
    preparedById: id('prepared_by_id'),
    signingEngineerId: id('signing_engineer_id'),
    /** Everything that letter and workbook were made from. */
    frozen: json('frozen', z.record(z.string(), z.unknown())),
    letterFileId: id('letter_file_id'),
    workbookFileId: id('workbook_file_id'),
    decidedById: id('decided_by_id'),
    sentAt: instant('sent_at'),
    createdAt: instant('created_at').notNull(),
    savedAt: instant('saved_at'),
    version: version(),
  },
  (table) => [
    uniqueIndex('returns_revision').on(table.revisionId),
    index('returns_agency_state').on(table.agencyId, table.state),
    index('returns_submittal').on(table.submittalId),
    reference('returns_submittal_fk', table.submittalId, submittals.id),
    reference('returns_revision_fk', table.revisionId, revisions.id),
    reference('returns_agency_fk', table.agencyId, organisations.id),
    reference('returns_contractor_fk', table.contractorId, organisations.id),
    reference('returns_prepared_by_fk', table.preparedById, people.id),
    reference('returns_signing_engineer_fk', table.signingEngineerId, people.id),
    reference('returns_decided_by_fk', table.decidedById, people.id),
    reference('returns_letter_fk', table.letterFileId, files.id),
    reference('returns_workbook_fk', table.workbookFileId, files.id),
  ],
);
