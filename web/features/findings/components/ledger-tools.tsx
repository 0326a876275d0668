import { Link, useSearchParams } from 'react-router-dom';
import { getFindingsPdf, getFindingsWorkbook } from '#shared/contracts/checks';
import { hrefOf } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import type { LedgerOrder } from '../lib/ledger';
import { useLedger } from './ledger-context';

/** The order of the rows, and other sights of the same findings. */
export function LedgerTools({ order }: { order: LedgerOrder }) {
  const [search] = useSearchParams();
  const { params, check } = useLedger();
  const { submittalId, number } = params;
  const withOrder = (value: string | null) => {
    const next = new URLSearchParams(search);
    if (value === null) next.delete('order');
    else next.set('order', value);
    return { search: next.toString() };
  };
  return (
    <nav className="order-toggle" aria-label="Order and other sights">
      <Link to={withOrder(null)} aria-current={order === 'clause' ? 'true' : undefined} preventScrollReset>
        By clause
      </Link>
      <Link
        to={withOrder('what-to-do')}
        aria-current={order === 'what to do' ? 'true' : undefined}
        preventScrollReset
      >
        By what to do
      </Link>
      <span className="order-sights">
        {check.gradation ? <Link to={paths.gradation(submittalId, number)}>Gradation</Link> : null}
        {check.hasCreep ? <Link to={paths.creep(submittalId, number)}>Creep</Link> : null}
        {check.hasRoom ? <Link to={paths.room(submittalId, number)}>Room to move</Link> : null}
        <Link to={paths.reading(submittalId, number)}>How it was read</Link>
        <Link to={paths.checks(submittalId, number)}>Checks</Link>
        <a href={hrefOf(getFindingsPdf, { params })} download>
          Findings as PDF
        </a>
        <a href={hrefOf(getFindingsWorkbook, { params })} download>
          as a workbook
        </a>
      </span>
    </nav>
  );
}
