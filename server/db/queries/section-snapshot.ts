import { and, asc, eq } from 'drizzle-orm';
import type { z } from 'zod';
import type { Database } from '../client';
import { sectionLayers, sections } from '../schema/projects';
import { editions } from '../schema/rule-sets';
import type { sectionSnapshotSchema } from '../schema/submittals';

export type SectionSnapshot = z.infer<typeof sectionSnapshotSchema>;

const named = { ruleSet: editions.ruleSetKey, edition: editions.edition, title: editions.title };

/** A section of a project as it stands now; null where the project has none of that id, or it is not confirmed. */
export async function snapshotOfSection(
  db: Database,
  { projectId, sectionId }: { projectId: string; sectionId: string },
): Promise<SectionSnapshot | null> {
  const [section] = await db
    .select({
      base: named,
      resolvedHash: sections.resolvedHash,
      confirmedAt: sections.confirmedAt,
    })
    .from(sections)
    .innerJoin(editions, eq(editions.id, sections.baseEditionId))
    .where(and(eq(sections.id, sectionId), eq(sections.projectId, projectId)));
  if (section === undefined || section.confirmedAt === null) return null;
  const layers = await db
    .select(named)
    .from(sectionLayers)
    .innerJoin(editions, eq(editions.id, sectionLayers.editionId))
    .where(eq(sectionLayers.sectionId, sectionId))
    .orderBy(asc(sectionLayers.position));
  return { sectionId, base: section.base, layers, resolvedHash: section.resolvedHash };
}
