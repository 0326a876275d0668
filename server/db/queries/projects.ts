import { and, asc, countDistinct, eq, inArray } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Database } from '../client';
import { organisations, people } from '../schema/people';
import { contacts, projectContractors, projects, sectionLayers, sections } from '../schema/projects';
import { editions } from '../schema/rule-sets';
import { revisions, submittals } from '../schema/submittals';
import { projectsOf, type Reader, revisionsOf } from './reader';

const agency = { id: organisations.id, name: organisations.name, timeZone: organisations.timeZone };

/** Projects that an organisation may see, or the one that is wanted. */
export async function listProjectRows(db: Database, reader: Reader, projectId?: string) {
  return db
    .select({ project: projects, agency })
    .from(projects)
    .innerJoin(organisations, eq(organisations.id, projects.agencyId))
    .where(and(projectsOf(reader), projectId === undefined ? undefined : eq(projects.id, projectId)))
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
  const own =
    reader.kind === 'contractor' ? eq(projectContractors.contractorId, reader.organisationId) : undefined;
  return db
    .select({
      projectId: projectContractors.projectId,
      id: organisations.id,
      name: organisations.name,
    })
    .from(projectContractors)
    .innerJoin(projects, eq(projects.id, projectContractors.projectId))
    .innerJoin(organisations, eq(organisations.id, projectContractors.contractorId))
    .where(and(inArray(projectContractors.projectId, projectIds), projectsOf(reader), own))
    .orderBy(asc(organisations.name), asc(organisations.id));
}

export function contactsOfProject(db: Database, reader: Reader, projectId: string) {
  return db
    .select({ name: contacts.name, function: contacts.function, email: contacts.email })
    .from(contacts)
    .innerJoin(projects, eq(projects.id, contacts.projectId))
    .where(and(eq(contacts.projectId, projectId), projectsOf(reader)))
    .orderBy(asc(contacts.position));
}

const confirmer = alias(people, 'confirmer');

/** Sections in their order, each with its layers in theirs. */
export async function sectionsOfProjects(db: Database, reader: Reader, projectIds: string[]) {
  if (projectIds.length === 0) return [];
  const rows = await db
    .select({ section: sections, base: namedEdition, confirmedBy: confirmer.name })
    .from(sections)
    .innerJoin(projects, eq(projects.id, sections.projectId))
    .innerJoin(editions, eq(editions.id, sections.baseEditionId))
    .leftJoin(confirmer, eq(confirmer.id, sections.confirmedById))
    .where(and(inArray(sections.projectId, projectIds), projectsOf(reader)))
    .orderBy(asc(sections.position), asc(sections.id));
  const ids = rows.map(({ section }) => section.id);
  if (ids.length === 0) return [];
  const layers = await db
    .select({ sectionId: sectionLayers.sectionId, layer: namedEdition })
    .from(sectionLayers)
    .innerJoin(sections, eq(sections.id, sectionLayers.sectionId))
    .innerJoin(projects, eq(projects.id, sections.projectId))
    .innerJoin(editions, eq(editions.id, sectionLayers.editionId))
    .where(and(inArray(sectionLayers.sectionId, ids), projectsOf(reader)))
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
  startingPoint: editions.startingPoint,
};

export type SectionRow = Awaited<ReturnType<typeof sectionsOfProjects>>[number];

/** Submittals by project that the reader may see: the agency sees none that is a draft only. */
export async function countSubmittals(db: Database, reader: Reader, projectIds: string[]) {
  if (projectIds.length === 0) return [];
  return db
    .select({ projectId: submittals.projectId, total: countDistinct(submittals.id) })
    .from(submittals)
    .innerJoin(revisions, eq(revisions.submittalId, submittals.id))
    .where(and(inArray(submittals.projectId, projectIds), revisionsOf(reader)))
    .groupBy(submittals.projectId);
}
