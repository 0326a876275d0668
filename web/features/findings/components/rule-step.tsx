import { Link } from 'react-router-dom';
import { type Finding, findingKey } from '#rules/engine/finding';
import { slug } from '#shared/format/finding-key';
import { RichText } from '../../../components/ui/rich-text';
import { paths } from '../../../lib/paths';
import { wordsOfName } from '../lib/evidence-words';
import { useLedger } from './ledger-context';

type LimitOrigin = NonNullable<NonNullable<Finding['limit']>['from']>;

/** The rule in general terms, the table and row that gave this mix its limit, and what a layer displaced. */
export function RuleStep({ finding }: { finding: Finding }) {
  const { check } = useLedger();
  const { base, layers } = check.section;
  const address = paths.ruleSet(
    base.ruleSet,
    base.edition,
    layers.map((layer) => `${layer.ruleSet}@${layer.edition}`),
  );
  const from = finding.limit?.from ?? null;
  return (
    <>
      <dt>{finding.clause === null ? 'Check' : 'Rule'}</dt>
      <dd>
        <RichText>{finding.ruleSentence}</RichText>{' '}
        {finding.clause === null ? null : (
          <Link to={`${address}#rule-${slug(finding.rule)}`}>Rule {finding.clause}</Link>
        )}
        {finding.source ? <span className="origin"> {finding.source}</span> : null}
      </dd>
      {from === null || finding.limit === null ? null : (
        <WhyThisLimit
          from={from}
          words={check.explanations[findingKey(finding)]?.whyThisLimit ?? null}
          tableAddress={from.table === null ? null : `${address}#table-${slug(from.table)}`}
        />
      )}
    </>
  );
}

/** In the engine's words; an older check keeps the table, the row and what was displaced. */
function WhyThisLimit({
  from,
  words,
  tableAddress,
}: {
  from: LimitOrigin;
  words: string | null;
  tableAddress: string | null;
}) {
  const said = words ?? originWords(from);
  if (said === '') return null;
  return (
    <>
      <dt>Why this limit</dt>
      <dd>
        {said} {tableAddress ? <Link to={tableAddress}>See the table</Link> : null}
      </dd>
    </>
  );
}

function originWords({ row, table, tableTitle, displaced }: LimitOrigin): string {
  const keys = Object.entries(row ?? {}).map(([name, value]) => `${wordsOfName(name)} ${value}`);
  const place =
    table === null
      ? ''
      : `${tableTitle ?? table} gives the limit${keys.length > 0 ? ` for ${keys.join(', ')}` : ''}.`;
  return [place, ...displaced.map(({ text, document }) => `In place of ${text} of ${document}.`)]
    .filter((part) => part !== '')
    .join(' ');
}
