import { and, asc, countDistinct, eq, inArray, ne, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Actor } from '../../policies/actor';
import type { Database } from '../client';
import { organisations, people } from '../schema/people';
import { contacts, projectContractors, projects, sectionLayers, sections } from '../schema/projects';
import { editions } from '../schema/rule-sets';
import { revisions, submittals } from '../schema/submittals';

type Reader = Pick<Actor, 'kind' | 'organisationId'>;

const agency = { id: organisations.id, name: organisations.name, timeZone: organisations.timeZone };

/** Projects that an organisation may see: an agency its own, a contractor those it works on. */
export async function listProjectRows(db: Database, reader: Reader, projectId?: string) {
  const wanted = projectId === undefined ? undefined : eq(projects.id, projectId);
  if (reader.kind === 'agency') {
    return db
      .select({ project: projects, agency })
      .from(projects)
      .innerJoin(organisations, eq(organisations.id, projects.agencyId))
      .where(and(eq(projects.agencyId, reader.organisationId), wanted))
      .orderBy(asc(projects.number), asc(projects.id));
  }
  return db
    .select({ project: projects, agency })
    .from(projects)
    .innerJoin(organisations, eq(organisations.id, projects.agencyId))
    .innerJoin(projectContractors, eq(projectContractors.projectId, projects.id))
    .where(and(eq(projectContractors.contractorId, reader.organisationId), wanted))
    .orderBy(asc(projects.number), asc(projects.id));
}

export type ProjectRow = Awaited<ReturnType<typeof listProjectRows>>[number];

export async function findProjectRow(
  db: Database,
  reader: Reader,
  projectId: string,
): Promise<ProjectRow | null> {
  const [row] = await listProjectRows(db, reader, projectId);
  return row ?? null;
}

/** Contractors by project. A contractor sees itself alone. */
export async function contractorsOfProjects(db: Database, reader: Reader, projectIds: string[]) {
  if (projectIds.length === 0) return [];
  const own: SQL | undefined =
    reader.kind === 'contractor' ? eq(projectContractors.contractorId, reader.organisationId) : undefined;
  return db
    .select({
      projectId: projectContractors.projectId,
      id: organisations.id,
      name: organisations.name,
    })
    .from(projectContractors)
    .innerJoin(organisations, eq(organisations.id, projectContractors.contractorId))
    .where(and(inArray(projectContractors.projectId, projectIds), own))
    .orderBy(asc(organisations.name), asc(organisations.id));
}

export async function contactsOfProject(db: Database, projectId: string) {
  return db
    .select({ name: contacts.name, function: contacts.function, email: contacts.email })
    .from(contacts)
    .where(eq(contacts.projectId, projectId))
    .orderBy(asc(contacts.position));
}

const confirmer = alias(people, 'confirmer');

/** Sections in their order, each with its layers in theirs. */
export async function sectionsOfProjects(db: Database, projectIds: string[]) {
  if (projectIds.length === 0) return [];
  const rows = await db
    .select({ section: sections, base: namedEdition, confirmedBy: confirmer.name })
    .from(sections)
    .innerJoin(editions, eq(editions.id, sections.baseEditionId))
    .leftJoin(confirmer, eq(confirmer.id, sections.confirmedById))
    .where(inArray(sections.projectId, projectIds))
    .orderBy(asc(sections.position), asc(sections.id));
  const ids = rows.map(({ section }) => section.id);
  if (ids.length === 0) return [];
  const layers = await db
    .select({ sectionId: sectionLayers.sectionId, layer: namedEdition })
    .from(sectionLayers)
    .innerJoin(editions, eq(editions.id, sectionLayers.editionId))
    .where(inArray(sectionLayers.sectionId, ids))
    .orderBy(asc(sectionLayers.position));
  return rows.map((row) => ({
    ...row,
    layers: layers.filter(({ sectionId }) => sectionId === row.section.id).map(({ layer }) => layer),
  }));
}

const namedEdition = {
  ruleSetKey: editions.ruleSetKey,
  edition: editions.edition,
  title: editions.title,
};

export type SectionRow = Awaited<ReturnType<typeof sectionsOfProjects>>[number];

/** Submittals by project that the reader may see: the agency sees none that is a draft only. */
export async function countMixes(db: Database, reader: Reader, projectIds: string[]) {
  if (projectIds.length === 0) return [];
  const visible =
    reader.kind === 'agency'
      ? and(eq(submittals.agencyId, reader.organisationId), ne(revisions.state, 'draft'))
      : eq(submittals.contractorId, reader.organisationId);
  return db
    .select({ projectId: submittals.projectId, total: countDistinct(submittals.id) })
    .from(submittals)
    .innerJoin(revisions, eq(revisions.submittalId, submittals.id))
    .where(and(inArray(submittals.projectId, projectIds), visible))
    .groupBy(submittals.projectId);
}
