import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';

/** Leads to a cell of the sheet beside it; a block by its first cell. */
export function CellLink({ params, sheet, cell }: { params: RevisionParams; sheet: string; cell: string }) {
  const first = cell.split(':')[0] ?? cell;
  return (
    <Link
      to={paths.reading(params.submittalId, params.number, { sheet, cell: first })}
      replace
      preventScrollReset
    >
      {`${sheet} ${cell}`.trim()}
    </Link>
  );
}
