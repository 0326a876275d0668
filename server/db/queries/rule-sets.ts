import { and, eq, ne } from 'drizzle-orm';
import { z } from 'zod';
import type { Database } from '../client';
import { organisations } from '../schema/people';
import { projectContractors, projects, sectionLayers, sections } from '../schema/projects';
import { editionDrafts, editions, ruleSets } from '../schema/rule-sets';
import { type EditionRow, listEditions } from './editions';
import type { Reader } from './reader';

/** A published edition or, for its agency, one that is being written. */
export interface ListedEdition extends Omit<EditionRow, 'effectiveFrom'> {
  effectiveFrom: string | null;
  /** Null for published ones, whose state follows from dates. */
  draftState: 'draft' | 'in review' | null;
  /** Of a draft; a published one's is read when it is wanted. */
  document: Record<string, unknown> | null;
}

export interface AgencyRuleSets {
  agency: { id: string; name: string; timeZone: string };
  editions: ListedEdition[];
}

/** An agency sees its own editions and drafts; a contractor those that sections of its projects name. */
export async function visibleRuleSets(db: Database, reader: Reader): Promise<AgencyRuleSets[]> {
  if (reader.kind === 'contractor') return ruleSetsOfProjects(db, reader.organisationId);
  const [agency] = await db
    .select(agencyFields)
    .from(organisations)
    .where(eq(organisations.id, reader.organisationId));
  return agency === undefined ? [] : [{ agency, editions: await listAgencyEditions(db, agency.id) }];
}

export async function listAgencyEditions(db: Database, agencyId: string): Promise<ListedEdition[]> {
  const published = await listEditions(db, agencyId);
  const drafts = await db
    .select({ draft: editionDrafts, key: ruleSets.key })
    .from(editionDrafts)
    .innerJoin(ruleSets, eq(ruleSets.id, editionDrafts.ruleSetId))
    .where(and(eq(editionDrafts.agencyId, agencyId), ne(editionDrafts.state, 'published')));
  return [
    ...published.map((row) => ({ ...row, draftState: null, document: null })),
    ...drafts.map(({ draft, key }) => {
      const head = draftHeadSchema.parse(draft.document);
      return {
        id: draft.id,
        ruleSetId: draft.ruleSetId,
        ruleSetKey: key,
        edition: draft.edition,
        title: head.title,
        effectiveFrom: head.effective.from,
        effectiveTo: head.effective.to,
        layerOfKey: head.layerOf?.id ?? null,
        layerOfEdition: head.layerOf?.edition ?? null,
        ruleCount: head.rules.length,
        startingPoint: false,
        withdrawn: false,
        // The query leaves published ones out; their edition stands in the list by itself.
        draftState: draft.state === 'in review' ? ('in review' as const) : ('draft' as const),
        document: draft.document,
      };
    }),
  ];
}

const agencyFields = { id: organisations.id, name: organisations.name, timeZone: organisations.timeZone };

/** What a list shows of a draft; it may be unfinished otherwise. */
const draftHeadSchema = z.looseObject({
  title: z.string(),
  effective: z.object({ from: z.string().nullable().default(null), to: z.string().nullable().default(null) }),
  layerOf: z.object({ id: z.string(), edition: z.string() }).nullable().default(null),
  rules: z.array(z.unknown()).default([]),
});

async function ruleSetsOfProjects(db: Database, contractorId: string): Promise<AgencyRuleSets[]> {
  const bases = await db
    .selectDistinct({ editionId: sections.baseEditionId, agency: agencyFields })
    .from(projectContractors)
    .innerJoin(projects, eq(projects.id, projectContractors.projectId))
    .innerJoin(organisations, eq(organisations.id, projects.agencyId))
    .innerJoin(sections, eq(sections.projectId, projects.id))
    .where(eq(projectContractors.contractorId, contractorId));
  const layers = await db
    .selectDistinct({ editionId: sectionLayers.editionId })
    .from(projectContractors)
    .innerJoin(sections, eq(sections.projectId, projectContractors.projectId))
    .innerJoin(sectionLayers, eq(sectionLayers.sectionId, sections.id))
    .innerJoin(editions, eq(editions.id, sectionLayers.editionId))
    .where(eq(projectContractors.contractorId, contractorId));
  const named = new Set([...bases, ...layers].map(({ editionId }) => editionId));
  const agencies = new Map(bases.map(({ agency }) => [agency.id, agency]));
  return Promise.all(
    [...agencies.values()].map(async (agency) => ({
      agency,
      editions: (await listEditions(db, agency.id))
        .filter(({ id }) => named.has(id))
        .map((row) => ({ ...row, draftState: null, document: null })),
    })),
  );
}
