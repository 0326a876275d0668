import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import type { EditionComparison } from '#rules/authoring/compare-editions';
import { isLayer, type Layer, type RuleSet } from '#rules/rule-sets/schema';
import { cautions } from '#shared/cautions';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { PlainPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { SelectField } from '../../../components/ui/select-field';
import { paths } from '../../../lib/paths';
import { type EditionName, useEditionDocument } from '../../../lib/queries/edition-document-query';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { comparedEditions } from '../lib/compared-editions';
import { Differences } from './differences';
import '../compare.css';

/** What an edition says otherwise than another of the same rule set: in sentences, old struck, new bold. */
export function ComparePage() {
  const { ruleSetId = '', edition = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const others = useOthers(ruleSetId, edition);
  const other = search.get('with') ?? others[0]?.edition ?? null;
  const title = `What edition ${edition} says otherwise than ${other ?? 'another'}`;
  usePageTitle(title);
  const after = useDocument({ ruleSet: ruleSetId, edition });
  const before = useDocument(other === null ? null : { ruleSet: ruleSetId, edition: other });
  const comparison = useMemo(
    () => (before && after ? comparedEditions(before, after) : null),
    [before, after],
  );
  return (
    <PlainPage>
      <PageHead
        kicker={<Link to={paths.ruleSet(ruleSetId, edition)}>{ruleSetId}</Link>}
        title={`Edition ${edition}`}
        rest={other === null ? null : `against ${other}`}
        lede={comparison ? summaryOf(comparison) : null}
      >
        <div className="compare-tools">
          {others.length > 1 ? (
            <SelectField
              label="Against edition"
              choices={others.map((each) => ({ value: each.edition, label: each.edition, help: each.state }))}
              value={other}
              onChange={(next) => setSearch({ with: next }, { replace: true })}
            />
          ) : null}
          <Button kind="text" onPress={() => window.print()}>
            Print the summary
          </Button>
        </div>
      </PageHead>
      {other === null ? (
        <EmptyState title="There is no other edition to hold it against.">
          <Link to={paths.ruleSet(ruleSetId, edition)}>Read the edition</Link>
        </EmptyState>
      ) : comparison ? (
        <Differences comparison={comparison} />
      ) : before?.document === null || after?.document === null ? (
        <EmptyState title="One of the two editions cannot be read by this version of the product.">
          <Link to={paths.ruleSet(ruleSetId, edition)}>Read the edition</Link>
        </EmptyState>
      ) : (
        <LoadingBars what="Reading both editions" />
      )}
      <RunningFoot texts={[cautions.contract]} />
    </PlainPage>
  );
}

function useOthers(ruleSetId: string, edition: string) {
  const { ruleSets } = useSuspenseQuery(ruleSetsQuery()).data;
  const own = ruleSets.find(({ id }) => id === ruleSetId)?.editions ?? [];
  return own
    .filter((each) => each.ruleSet === ruleSetId && each.edition !== edition)
    .toSorted((a, b) => (b.from ?? '9999').localeCompare(a.from ?? '9999'));
}

interface Loaded {
  document: RuleSet | Layer;
  base: RuleSet | Layer | null;
}

/** A layer is read over the base that it names. Null until both are here. */
function useDocument(name: EditionName | null): Loaded | null {
  const document = useEditionDocument(name)?.parsed ?? null;
  const layerOf = document !== null && isLayer(document) ? document.layerOf : null;
  const base =
    useEditionDocument(layerOf && { ruleSet: layerOf.id, edition: layerOf.edition })?.parsed ?? null;
  return useMemo(
    () => (document === null || (layerOf !== null && base === null) ? null : { document, base }),
    [document, layerOf, base],
  );
}

function summaryOf({ rules, tables, unchanged }: EditionComparison): string {
  const count = (kind: string) => rules.filter((rule) => rule.kind === kind).length;
  return [
    `${countInFigures(count('changed'), 'rule')} changed`,
    `${count('added')} added`,
    `${count('removed')} removed`,
    `${unchanged} the same`,
    `${countInFigures(tables.length, 'table')} differ${tables.length === 1 ? 's' : ''}`,
  ].join(', ');
}
