import { resolvedEditionHash } from '#rules/engine/seal';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import type { Database } from '../../db/client';
import { type EditionRow, editionDocument, listEditions } from '../../db/queries/editions';
import { findResolvedEdition } from '../../db/resolved-edition';

/**
 * The resolved edition of a hash that a workbook carries, where the agency's own published documents make it. The
 * hash alone proves nothing: another agency's edition is as unknown here as one that was never published.
 */
export async function ownResolvedEdition(
  db: Database,
  { agencyId, hash }: { agencyId: string; hash: string },
): Promise<ResolvedEdition | null> {
  const named = await findResolvedEdition(db, hash);
  if (named === null) return null;
  const published = await listEditions(db, agencyId);
  const documents: (RuleSet | Layer)[] = [];
  for (const { id, edition } of [named, ...named.layers]) {
    const row = published.find((each) => each.ruleSetKey === id && each.edition === edition);
    const document = row === undefined ? null : await publishedDocument(db, agencyId, row);
    if (document === null) return null;
    documents.push(document);
  }
  const [base, ...layers] = documents;
  if (base === undefined) return null;
  const resolution = resolveEdition(base, layers);
  return resolution.ok && resolvedEditionHash(resolution.edition) === hash ? resolution.edition : null;
}

/** A published document of the agency; null where this engine no longer understands it. */
export async function publishedDocument(db: Database, agencyId: string, { id }: Pick<EditionRow, 'id'>) {
  const parsed = parseRuleSet(await editionDocument(db, { agencyId, editionId: id }));
  return parsed.ok ? parsed.ruleSet : null;
}
