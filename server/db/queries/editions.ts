import { and, asc, eq } from 'drizzle-orm';
import type { EditionReference } from '#shared/contracts/projects';
import type { Database } from '../client';
import { editionEvents, editions } from '../schema/rule-sets';

const listed = {
  id: editions.id,
  ruleSetId: editions.ruleSetId,
  ruleSetKey: editions.ruleSetKey,
  edition: editions.edition,
  title: editions.title,
  effectiveFrom: editions.effectiveFrom,
  effectiveTo: editions.effectiveTo,
  layerOfKey: editions.layerOfKey,
  layerOfEdition: editions.layerOfEdition,
  ruleCount: editions.ruleCount,
  startingPoint: editions.startingPoint,
};

/** Published editions of an agency, layers among them, without their documents; withdrawn ones are marked. */
export async function listEditions(db: Database, agencyId: string) {
  const rows = await db
    .select(listed)
    .from(editions)
    .where(eq(editions.agencyId, agencyId))
    .orderBy(asc(editions.ruleSetKey), asc(editions.effectiveFrom), asc(editions.edition));
  const withdrawals = await db
    .select({ editionId: editionEvents.editionId })
    .from(editionEvents)
    .where(and(eq(editionEvents.agencyId, agencyId), eq(editionEvents.kind, 'withdrawn')));
  const withdrawn = new Set(withdrawals.map(({ editionId }) => editionId));
  return rows.map((row) => ({ ...row, withdrawn: withdrawn.has(row.id) }));
}

export type EditionRow = Awaited<ReturnType<typeof listEditions>>[number];

export async function editionDocument(
  db: Database,
  { agencyId, editionId }: { agencyId: string; editionId: string },
): Promise<Record<string, unknown> | null> {
  const [row] = await db
    .select({ document: editions.document })
    .from(editions)
    .where(and(eq(editions.id, editionId), eq(editions.agencyId, agencyId)))
    .limit(1);
  return row?.document ?? null;
}

export function editionReference(
  row: Pick<EditionRow, 'ruleSetKey' | 'edition' | 'title'>,
): EditionReference {
  return { ruleSet: row.ruleSetKey, edition: row.edition, title: row.title };
}
