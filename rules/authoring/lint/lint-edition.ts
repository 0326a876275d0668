import type { ResolvedEdition } from '../../rule-sets/resolve';
import { lintCases } from './lint-cases';
import { lintConditions } from './lint-conditions';
import { lintLimits } from './lint-limits';
import { lintSources } from './lint-sources';
import { lintTables } from './lint-tables';
import type { LintRemark } from './remark';

/**
 * Everything that a rule author should look at before an edition is published, errors first. Of a layer only what it
 * brings itself: the base was looked at when it was published.
 */
export function lintEdition(edition: ResolvedEdition, { own }: { own?: string } = {}): LintRemark[] {
  const remarks = [
    ...lintConditions(edition),
    ...lintLimits(edition),
    ...lintTables(edition),
    ...lintSources(edition),
    ...lintCases(edition),
  ];
  const kept = own === undefined ? remarks : remarks.filter(({ part }) => isOf(part, edition, own));
  return kept.toSorted((a, b) => Number(a.level === 'warning') - Number(b.level === 'warning'));
}

/** Whether the document of that name supplied the part; quantities and cases of layers are the layer's own. */
function isOf(part: string, edition: ResolvedEdition, document: string): boolean {
  const [list = '', name = ''] = part.split(/\/(.*)/s);
  const entries: { name: string; supplied: { document: string } }[] =
    list === 'rules'
      ? edition.rules.map(({ id, supplied }) => ({ name: id, supplied }))
      : list === 'tables'
        ? edition.tables.map(({ id, supplied }) => ({ name: id, supplied }))
        : list === 'attributes'
          ? edition.attributes.map((each) => each)
          : [];
  const found = entries.find((each) => each.name === name);
  return found === undefined || found.supplied.document === document;
}
