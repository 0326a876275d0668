import { and, eq } from 'drizzle-orm';
import type { Project } from '#shared/contracts/projects';
import type { Database } from '../../db/client';
import { listEditions } from '../../db/queries/editions';
import { sectionsOfProjects } from '../../db/queries/projects';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { projects } from '../../db/schema/projects';
import type { Actor } from '../../policies/actor';
import { publishedDocument } from './own-edition';
import { understandFacts } from './understand-facts';

/** A project's sections judge what it states; before it has any, whichever edition of the agency may become one. */
export async function factsOfProject(
  tx: Database,
  actor: Actor,
  { facts, projectId }: Stated,
): Promise<Project['facts']> {
  const sections = projectId === null ? [] : await sectionsOfProjects(tx, actor, [projectId]);
  if (sections.length > 0) {
    const hashes = sections.map(({ section }) => section.resolvedHash);
    const editions = await Promise.all(hashes.map((hash) => loadResolvedEdition(tx, hash)));
    return understandFacts(facts, { editions, by: 'every' });
  }
  const { organisationId } = actor;
  const published = (await listEditions(tx, organisationId)).filter(({ layerOfKey }) => layerOfKey === null);
  const documents = await Promise.all(published.map((each) => publishedDocument(tx, organisationId, each)));
  const editions = documents.flatMap((each) => (each !== null && 'attributes' in each ? [each] : []));
  return understandFacts(facts, { editions: [...editions, { attributes: [] }], by: 'some' });
}

interface Stated {
  facts: Project['facts'];
  projectId: string | null;
}

/** What a project stated before it had a section is judged by it too: in its words, or refused with every fault. */
export async function judgeFactsAnew(tx: Database, actor: Actor, projectId: string): Promise<void> {
  const own = and(eq(projects.id, projectId), eq(projects.agencyId, actor.organisationId));
  const [row] = await tx.select({ facts: projects.facts }).from(projects).where(own);
  if (row === undefined) return;
  const facts = await factsOfProject(tx, actor, { facts: row.facts, projectId });
  await tx.update(projects).set({ facts }).where(own);
}
