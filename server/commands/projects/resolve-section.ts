import { resolvedEditionHash } from '#rules/engine/seal';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { type Layer, parseRuleSet, type RuleSet } from '#rules/rule-sets/schema';
import type { Database } from '../../db/client';
import { type EditionRow, editionDocument, listEditions } from '../../db/queries/editions';
import { resolvedEditions } from '../../db/schema/rule-sets';
import type { Deps } from '../../deps';
import { Problem } from '../../problem';

export interface SectionChoice {
  base: { ruleSet: string; edition: string };
  layers: { ruleSet: string; edition: string }[];
}

interface Resolved {
  base: EditionRow;
  layers: EditionRow[];
  hash: string;
}

/** Finds the published editions of a choice, applies the layers and keeps the result under its hash. */
export async function resolveSection(
  tx: Database,
  deps: Pick<Deps, 'now'>,
  { agencyId, choice }: { agencyId: string; choice: SectionChoice },
): Promise<Resolved> {
  const published = await listEditions(tx, agencyId);
  const base = publishedEdition(published, choice.base, '/base');
  const layers = choice.layers.map((layer, index) => publishedEdition(published, layer, `/layers/${index}`));
  const documents = await Promise.all(
    [base, ...layers].map(({ id }) => editionDocument(tx, { agencyId, editionId: id })),
  );
  const [baseRuleSet, ...layerRuleSets] = documents.map(usable);
  if (!baseRuleSet) throw new Problem('internal');
  const resolution = resolveEdition(baseRuleSet, layerRuleSets);
  if (!resolution.ok) {
    throw new Problem('rule-set-refused', {
      detail: resolution.problems[0]?.detail ?? 'The editions do not fit together.',
      errors: resolution.problems,
    });
  }
  const hash = await keepResolvedEdition(tx, deps, resolution.edition);
  return { base, layers, hash };
}

export async function keepResolvedEdition(
  tx: Database,
  { now }: Pick<Deps, 'now'>,
  edition: ResolvedEdition,
): Promise<string> {
  const hash = resolvedEditionHash(edition);
  const document: Record<string, unknown> = { ...edition };
  await tx.insert(resolvedEditions).ignore().values({ hash, document, createdAt: now() });
  return hash;
}

function publishedEdition(
  published: EditionRow[],
  { ruleSet, edition }: SectionChoice['base'],
  pointer: string,
): EditionRow {
  const found = published.find(
    (each) => each.ruleSetKey === ruleSet && each.edition === edition && !each.withdrawn,
  );
  if (found) return found;
  const detail = `There is no published edition ${edition} of ${ruleSet}.`;
  throw new Problem('invalid-input', { detail, errors: [{ pointer, detail }] });
}

/** What was published was checked then; an engine that no longer understands it must say so. */
function usable(document: Record<string, unknown> | null): RuleSet | Layer {
  const parsed = parseRuleSet(document);
  if (parsed.ok) return parsed.ruleSet;
  throw new Problem('rule-set-refused', {
    detail: parsed.problems[0]?.detail ?? 'The edition cannot be used.',
    errors: parsed.problems,
  });
}
