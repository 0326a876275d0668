import { Link } from 'react-router-dom';
import type { Finding } from '#rules/engine/finding';
import { slug } from '#shared/format/finding-key';
import { RichText } from '../../../components/ui/rich-text';
import { paths } from '../../../lib/paths';
import { wordsOfName } from '../lib/evidence-words';
import { useLedger } from './ledger-context';

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
        {from?.table ? (
          <>
            {rowWords(from.row)}
            <Link to={`${address}#table-${slug(from.table)}`}>{from.tableTitle ?? from.table}</Link> gives the
            limit.{' '}
          </>
        ) : null}
        {finding.clause === null ? null : (
          <Link to={`${address}#rule-${slug(finding.rule)}`}>Rule {finding.clause}</Link>
        )}
        {from?.displaced.map((each) => (
          <span key={`${each.document}${each.text}`} className="mute">
            {' '}
            In place of {each.text} of {each.document}.
          </span>
        ))}
        {finding.source ? <span className="origin"> {finding.source}</span> : null}
      </dd>
    </>
  );
}

function rowWords(row: Record<string, string> | null): string {
  const keys = Object.entries(row ?? {});
  if (keys.length === 0) return '';
  return `For ${keys.map(([name, value]) => `${wordsOfName(name)} ${value}`).join(', ')} `;
}
