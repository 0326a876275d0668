import { hashOf } from '#rules/engine/seal';
import { isLayer, type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import type { Database } from '../../db/client';
import { editionEvents, editions, ruleSets } from '../../db/schema/rule-sets';

export interface Shipped {
  file: string;
  document: Record<string, unknown>;
  parsed: RuleSet | Layer;
}

interface Publisher {
  agencyId: string;
  agencyName: string;
  /** An id for a thing by its name: stable in the demo, new elsewhere. */
  idOf(name: string): string;
  publishedById: string;
  /** Null where nobody but the product vouches for them. */
  secondAuthorId: string | null;
  publishedAt(firstDay: string): Date;
}

/**
 * The shipped editions as an agency's own, marked as starting points, so that a project can have a section on the first
 * day. They are shown as such wherever they are used until the agency publishes an edition of its own.
 */
export async function publishStartingPoints(tx: Database, publisher: Publisher): Promise<void> {
  const shipped = shippedSets().filter((each) => !isShippedDraft(each));
  const ids = new Map<string, string>();
  for (const { parsed } of shippedSets()) {
    if (ids.has(parsed.id)) continue;
    const id = publisher.idOf(`rule-set/${parsed.id}`);
    ids.set(parsed.id, id);
    const createdAt = publisher.publishedAt(firstDayOf(parsed));
    await tx
      .insert(ruleSets)
      .values({ id, agencyId: publisher.agencyId, key: parsed.id, title: parsed.title, createdAt });
  }
  for (const each of shipped)
    await publish(tx, publisher, { ...each, ruleSetId: ids.get(each.parsed.id) ?? '' });
}

async function publish(
  tx: Database,
  publisher: Publisher,
  { document, parsed, ruleSetId }: Shipped & { ruleSetId: string },
): Promise<void> {
  const id = publisher.idOf(`edition/${parsed.id}/${parsed.edition}`);
  const publishedAt = publisher.publishedAt(firstDayOf(parsed));
  const own = { ...document, agency: publisher.agencyName };
  await tx.insert(editions).values({
    id,
    agencyId: publisher.agencyId,
    ruleSetId,
    ruleSetKey: parsed.id,
    edition: parsed.edition,
    title: parsed.title,
    document: own,
    hash: hashOf(own),
    effectiveFrom: firstDayOf(parsed),
    effectiveTo: parsed.effective.to,
    layerOfKey: isLayer(parsed) ? parsed.layerOf.id : null,
    layerOfEdition: isLayer(parsed) ? parsed.layerOf.edition : null,
    ruleCount: isLayer(parsed) ? parsed.add.rules.length + parsed.replace.rules.length : parsed.rules.length,
    startingPoint: true,
    publishedAt,
    publishedById: publisher.publishedById,
    secondAuthorId: publisher.secondAuthorId,
  });
  await tx.insert(editionEvents).values({
    id: publisher.idOf(`edition-event/${id}`),
    editionId: id,
    agencyId: publisher.agencyId,
    kind: 'published',
    at: publishedAt,
    personId: publisher.publishedById,
  });
}

function firstDayOf(parsed: RuleSet | Layer): string {
  return parsed.effective.from ?? '2024-01-01';
}

export function isShippedDraft({ file }: Pick<Shipped, 'file'>): boolean {
  return file.includes('draft');
}

export function shippedSets(): Shipped[] {
  return shippedRuleSets.map(({ file, document }) => {
    const parsed = parseRuleSet(document);
    if (!parsed.ok) throw new Error(`${file}: ${parsed.problems.map(({ detail }) => detail).join(' ')}`);
    return { file, document: { ...(document as object) }, parsed: parsed.ruleSet };
  });
}
