import { date, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';
import { z } from 'zod';
import { limits } from '#shared/limits';
import { id, instant, json, reference, sha256, version } from '../columns';
import { organisations, people } from './people';
import { editions } from './rule-sets';

export const factsSchema = z.record(z.string(), z.union([z.number(), z.string(), z.boolean()]));

export const projects = mysqlTable(
  'projects',
  {
    id: id('id').primaryKey(),
    agencyId: id('agency_id').notNull(),
    /** The contract's number. */
    number: varchar('number', { length: limits.projectNumberCharacters }).notNull(),
    title: varchar('title', { length: limits.nameCharacters }).notNull(),
    lettingOn: date('letting_on', { mode: 'string' }),
    /** Attributes that the project states, used where a mix record has none. */
    facts: json('facts', factsSchema).notNull(),
    createdAt: instant('created_at').notNull(),
    version: version(),
  },
  (table) => [
    uniqueIndex('projects_number').on(table.agencyId, table.number),
    reference('projects_agency_fk', table.agencyId, organisations.id),
  ],
);

export const projectContractors = mysqlTable(
  'project_contractors',
  {
    projectId: id('project_id').notNull(),
    contractorId: id('contractor_id').notNull(),
  },
  (table) => [
    primaryKey({ name: 'project_contractors_pk', columns: [table.projectId, table.contractorId] }),
    index('project_contractors_contractor').on(table.contractorId),
    reference('project_contractors_project_fk', table.projectId, projects.id),
    reference('project_contractors_contractor_fk', table.contractorId, organisations.id),
  ],
);

export const contacts = mysqlTable(
  'contacts',
  {
    id: id('id').primaryKey(),
    projectId: id('project_id').notNull(),
    position: int('position').notNull(),
    name: varchar('name', { length: limits.nameCharacters }).notNull(),
    /** "resident engineer" */
    function: varchar('function', { length: limits.nameCharacters }).notNull(),
    email: varchar('email', { length: limits.emailCharacters }).notNull(),
  },
  (table) => [
    index('contacts_project').on(table.projectId, table.position),
    reference('contacts_project_fk', table.projectId, projects.id),
  ],
);

/** One edition with its ordered layers, under which submittals are judged. It never moves by itself. */
export const sections = mysqlTable(
  'sections',
  {
    id: id('id').primaryKey(),
    projectId: id('project_id').notNull(),
    agencyId: id('agency_id').notNull(),
    position: int('position').notNull(),
    baseEditionId: id('base_edition_id').notNull(),
    /** Of the edition with its layers applied. */
    resolvedHash: sha256('resolved_hash').notNull(),
    confirmedById: id('confirmed_by_id'),
    confirmedAt: instant('confirmed_at'),
    version: version(),
  },
  (table) => [
    index('sections_project').on(table.projectId, table.position),
    index('sections_base_edition').on(table.baseEditionId),
    reference('sections_project_fk', table.projectId, projects.id),
    reference('sections_agency_fk', table.agencyId, organisations.id),
    reference('sections_base_edition_fk', table.baseEditionId, editions.id),
    reference('sections_confirmed_by_fk', table.confirmedById, people.id),
  ],
);

export const sectionLayers = mysqlTable(
  'section_layers',
  {
    sectionId: id('section_id').notNull(),
    position: int('position').notNull(),
    editionId: id('edition_id').notNull(),
  },
  (table) => [
    primaryKey({ name: 'section_layers_pk', columns: [table.sectionId, table.position] }),
    index('section_layers_edition').on(table.editionId),
    reference('section_layers_section_fk', table.sectionId, sections.id),
    reference('section_layers_edition_fk', table.editionId, editions.id),
  ],
);
