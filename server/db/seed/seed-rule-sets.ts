import {
  isShippedDraft,
  publishStartingPoints,
  type Shipped,
  shippedSets,
} from '../../commands/rule-sets/publish-starting-points';
import type { Database } from '../client';
import { editionDrafts } from '../schema/rule-sets';
import { demoId, demoMadeAt } from './demo-id';
import { demoOrganisations, demoPerson } from './demo-people';

const agencyId = demoOrganisations.agency.id;

export function demoEditionId(ruleSet: string, edition: string): string {
  return demoId(`edition/${ruleSet}/${edition}`);
}

/** The shipped editions: published ones as published by two rule authors, the draft as one's work. */
export async function seedRuleSets(tx: Database): Promise<void> {
  await publishStartingPoints(tx, {
    agencyId,
    agencyName: demoOrganisations.agency.name,
    idOf: demoId,
    publishedById: demoPerson('Tamsin Brook').id,
    secondAuthorId: demoPerson('Joaquim Vale').id,
    publishedAt: publishedBefore,
  });
  for (const each of shippedSets().filter(isShippedDraft)) await keepDraft(tx, each);
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
    startingPoint: true,
    basedOnId: demoEditionId(parsed.id, '2026'),
    createdById: demoPerson('Tamsin Brook').id,
    createdAt: demoMadeAt,
    updatedAt: demoMadeAt,
  });
}

/** Six weeks before the first day, at noon: notice for those who build by it. */
function publishedBefore(firstDay: string): Date {
  const first = new Date(`${firstDay}T12:00:00.000Z`);
  return new Date(first.getTime() - 42 * 24 * 3600 * 1000);
}
