import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { CheckHead } from '#shared/contracts/checks';
import type { CheckHeadRow } from '../db/queries/checks';

/** The edition is the one that judged then, whatever the section holds now. */
export function presentCheckHead(
  { resolvedHash: _, madeAt, summary, ...head }: CheckHeadRow,
  { id, edition, title, layers }: Pick<ResolvedEdition, 'id' | 'edition' | 'title' | 'layers'>,
): CheckHead {
  return {
    ...head,
    madeAt: madeAt.toISOString(),
    base: { ruleSet: id, edition, title },
    layers: layers.map((layer) => ({ ruleSet: layer.id, edition: layer.edition, title: layer.title })),
    recommended: summary.recommended,
  };
}
