import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Outcome } from '#rules/engine/finding';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { paths } from '../../../lib/paths';
import { asProblem } from '../../../lib/problem';
import { sheetQuery } from '../../../lib/queries/sheet-query';
import { excerptOf, rowsAround, rowsToAsk } from '../lib/excerpt';
import type { Tie } from '../lib/ties';
import { useLedger } from './ledger-context';
import { SheetExcerpt } from './sheet-excerpt';

/** Six rows of the sheet as uploaded, around the cell. */
export function SheetInPlace({ tie, ties, outcome }: { tie: Tie; ties: readonly Tie[]; outcome: Outcome }) {
  const { params, revision } = useLedger();
  const query = useQuery(sheetQuery({ ...params, sheet: tie.sheet, ...rowsToAsk(tie) }));
  return (
    <div className="sheet-in-place">
      {query.isPending ? <LoadingBars what="Opening the sheet." rows={6} /> : null}
      {query.isError ? <ProblemNotice problem={asProblem(query.error)} /> : null}
      {query.data ? (
        <SheetExcerpt
          excerpt={excerptOf({
            sheet: query.data.sheet,
            uses: query.data.uses,
            tie,
            ties,
            rows: rowsAround(query.data.sheet, tie, ties),
          })}
          cell={tie.cell}
          outcome={outcome}
        />
      ) : null}
      <p className="sheet-caption">
        {tie.sheet === '' ? null : (
          <>
            Sheet <b>{tie.sheet}</b> of{' '}
          </>
        )}
        {revision.workbook?.fileName ?? 'the workbook'}, as uploaded.{' '}
        <Link to={paths.reading(params.submittalId, params.number, { sheet: tie.sheet, cell: tie.cell })}>
          Open the sheet here
        </Link>
      </p>
    </div>
  );
}
