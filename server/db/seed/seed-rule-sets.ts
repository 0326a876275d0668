import { hashOf } from '#rules/engine/seal';
import { isLayer, type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import type { Database } from '../client';
import { cases, editionDrafts, editionEvents, editions, ruleSets } from '../schema/rule-sets';
import { demoId, demoMadeAt } from './demo-id';
import { demoOrganisations, demoPerson } from './demo-people';

const agencyId = demoOrganisations.agency.id;

export function demoEditionId(ruleSet: string, edition: string): string {
  return demoId(`edition/${ruleSet}/${edition}`);
}

interface Shipped {
  file: string;
  document: Record<string, unknown>;
  parsed: RuleSet | Layer;
}

/** The shipped editions: published ones as published by two rule authors, the draft as one's work. */
export async function seedRuleSets(tx: Database): Promise<void> {
  const shipped = shippedRuleSets.map(parse);
  const names = new Map(shipped.map(({ parsed }) => [parsed.id, parsed.title]));
  await tx.insert(ruleSets).values(
    [...names].map(([key, title]) => ({
      id: demoId(`rule-set/${key}`),
      agencyId,
      key,
      title,
      createdAt: demoMadeAt,
    })),
  );
  for (const each of shipped.filter((one) => !isDraft(one))) await publish(tx, each);
  for (const each of shipped.filter(isDraft)) await keepDraft(tx, each);
}

async function publish(tx: Database, { document, parsed }: Shipped): Promise<void> {
  const id = demoEditionId(parsed.id, parsed.edition);
  const publishedAt = publishedBefore(parsed.effective.from);
  const publishedById = demoPerson('Tamsin Brook').id;
  await tx.insert(editions).values({
    id,
    agencyId,
    ruleSetId: demoId(`rule-set/${parsed.id}`),
    ruleSetKey: parsed.id,
    edition: parsed.edition,
    title: parsed.title,
    document,
    hash: hashOf(document),
    effectiveFrom: parsed.effective.from ?? '2024-01-01',
    effectiveTo: parsed.effective.to,
    layerOfKey: isLayer(parsed) ? parsed.layerOf.id : null,
    layerOfEdition: isLayer(parsed) ? parsed.layerOf.edition : null,
    ruleCount: isLayer(parsed) ? parsed.add.rules.length + parsed.replace.rules.length : parsed.rules.length,
    startingPoint: true,
    publishedAt,
    publishedById,
    secondAuthorId: demoPerson('Joaquim Vale').id,
  });
  await tx.insert(editionEvents).values({
    id: demoId(`edition-event/${id}`),
    editionId: id,
    agencyId,
    kind: 'published',
    at: publishedAt,
    personId: publishedById,
  });
}

async function keepDraft(tx: Database, { document, parsed }: Shipped): Promise<void> {
  const draftId = demoId(`draft/${parsed.id}/${parsed.edition}`);
  await tx.insert(editionDrafts).values({
    id: draftId,
    agencyId,
    ruleSetId: demoId(`rule-set/${parsed.id}`),
    edition: parsed.edition,
    state: 'draft',
    document,
    basedOnId: demoEditionId(parsed.id, '2026'),
    createdById: demoPerson('Tamsin Brook').id,
    createdAt: demoMadeAt,
    updatedAt: demoMadeAt,
  });
  const proofs = parsed.cases ?? [];
  if (proofs.length === 0) return;
  await tx.insert(cases).values(
    proofs.map((proof) => ({
      id: demoId(`case/${draftId}/${proof.id}`),
      agencyId,
      draftId,
      key: proof.id,
      title: proof.title,
      record: proof.record,
      context: { ...proof.context },
      expected: proof.expected.map((finding) => ({ ...finding })),
    })),
  );
}

/** Six weeks before the first day, at noon: notice for those who build by it. */
function publishedBefore(from: string | null): Date {
  const first = new Date(`${from ?? '2024-01-01'}T12:00:00.000Z`);
  return new Date(first.getTime() - 42 * 24 * 3600 * 1000);
}

function isDraft({ file }: Pick<Shipped, 'file'>): boolean {
  return file.includes('draft');
}

function parse({ file, document }: (typeof shippedRuleSets)[number]): Shipped {
  const parsed = parseRuleSet(document);
  if (!parsed.ok) throw new Error(`${file}: ${parsed.problems.map(({ detail }) => detail).join(' ')}`);
  return { file, document: { ...(document as object) }, parsed: parsed.ruleSet };
}
