import { and, asc, eq } from 'drizzle-orm';
import type { z } from 'zod';
import type { Database } from '../client';
import { projects, sectionLayers, sections } from '../schema/projects';
import { editions } from '../schema/rule-sets';
import type { sectionSnapshotSchema } from '../schema/submittals';
import { projectsOf, type Reader } from './reader';

export type SectionSnapshot = z.infer<typeof sectionSnapshotSchema>;

const named = { ruleSet: editions.ruleSetKey, edition: editions.edition, title: editions.title };

/** A section of a project as it stands now; null where the project has none of that id, or it is not confirmed. */
export async function snapshotOfSection(
  db: Database,
  reader: Reader,
  { projectId, sectionId }: { projectId: string; sectionId: string },
): Promise<SectionSnapshot | null> {
  const [section] = await db
    .select({
      base: named,
      resolvedHash: sections.resolvedHash,
      confirmedAt: sections.confirmedAt,
    })
    .from(sections)
    .innerJoin(projects, eq(projects.id, sections.projectId))
    .innerJoin(editions, eq(editions.id, sections.baseEditionId))
    .where(and(eq(sections.id, sectionId), eq(sections.projectId, projectId), projectsOf(reader)));
  if (section === undefined || section.confirmedAt === null) return null;
  const layers = await db
    .select(named)
    .from(sectionLayers)
    .innerJoin(sections, eq(sections.id, sectionLayers.sectionId))
    .innerJoin(projects, eq(projects.id, sections.projectId))
    .innerJoin(editions, eq(editions.id, sectionLayers.editionId))
    .where(and(eq(sectionLayers.sectionId, sectionId), projectsOf(reader)))
    .orderBy(asc(sectionLayers.position));
  return { sectionId, base: section.base, layers, resolvedHash: section.resolvedHash };
}
