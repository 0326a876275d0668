import { Link } from 'react-router-dom';
import { Button } from '../../../components/ui/button';
import { Mark } from '../../../components/ui/mark';
import { paths } from '../../../lib/paths';
import { foldedNotApplicableLine, foldedPassLine } from '../lib/folded-line';
import type { LedgerGroup as Group, LedgerRow as Row } from '../lib/ledger';
import { useLedger } from './ledger-context';
import { LedgerRow } from './ledger-row';

export function LedgerGroup({ group }: { group: Group }) {
  const { unfolded, check } = useLedger();
  const isUnfolded = unfolded.has(group.id);
  const shown = isUnfolded ? inOrder(group, check.findings) : group.rows;
  return (
    <>
      <tbody>
        <tr className="ledger-group">
          <td>{group.section}</td>
          <td colSpan={6}>
            <h2>{group.title}</h2>
            {group.about ? <span className="group-tally">{group.about}</span> : null}
          </td>
        </tr>
      </tbody>
      {shown.map((row) => (
        <LedgerRow key={row.key} row={row} />
      ))}
      {group.folded.length > 0 ? <FoldLine group={group} isUnfolded={isUnfolded} /> : null}
    </>
  );
}

function FoldLine({ group, isUnfolded }: { group: Group; isUnfolded: boolean }) {
  const { setUnfolded, params } = useLedger();
  const { folded } = group;
  const applies = folded[0]?.finding.outcome !== 'not applicable';
  const hasGradation = applies && folded.some(({ finding }) => finding.kind === 'gradation');
  const count = group.rows.length > 0 ? `${folded.length} more` : String(folded.length);
  return (
    <tbody>
      <tr className="ledger-fold">
        <td className="whitespace-nowrap">
          <Mark name={applies ? 'pass' : 'na'} />
          {count}
        </td>
        <td colSpan={6}>
          {isUnfolded ? null : <>{applies ? foldedPassLine(folded) : foldedNotApplicableLine(folded)} </>}
          <Button kind="inline" onPress={() => setUnfolded(group.id, !isUnfolded)} aria-expanded={isUnfolded}>
            {isUnfolded ? 'Fold' : 'Unfold'}
          </Button>
          {hasGradation ? (
            <span className="fold-chart">
              {', '}
              <Link to={paths.gradation(params.submittalId, params.number)}>gradation chart</Link>
            </span>
          ) : null}
        </td>
      </tr>
    </tbody>
  );
}

/** Unfolded rows go back to their own places among the rest. */
function inOrder(group: Group, findings: readonly Row['finding'][]): Row[] {
  const place = new Map(findings.map((finding, index) => [finding, index]));
  return [...group.rows, ...group.folded].sort(
    (one, other) => (place.get(one.finding) ?? 0) - (place.get(other.finding) ?? 0),
  );
}
