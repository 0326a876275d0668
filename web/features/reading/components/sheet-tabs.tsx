import { Link } from 'react-router-dom';
import type { ReadingView } from '#shared/contracts/readings';
import { countInFigures } from '#shared/format/numbers';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';

/** The workbook's own sheets; hidden ones are read too, and said to be hidden. */
export function SheetTabs({
  params,
  sheets,
  current,
}: {
  params: RevisionParams;
  sheets: ReadingView['sheets'];
  current: string;
}) {
  return (
    <nav className="sheet-tabs" aria-label="Sheets of the workbook">
      {sheets.map((sheet) => (
        <Link
          key={sheet.name}
          to={paths.reading(params.submittalId, params.number, { sheet: sheet.name, cell: 'A1' })}
          replace
          preventScrollReset
          aria-current={sheet.name === current ? 'true' : undefined}
        >
          {sheet.hidden ? <i>{sheet.name || 'the file'} (hidden)</i> : sheet.name || 'the file'}
          {sheet.doubts > 0 ? <span className="tab-doubts">{doubtWords(sheet.doubts)}</span> : null}
        </Link>
      ))}
    </nav>
  );
}

function doubtWords(count: number): string {
  return countInFigures(count, 'doubt');
}
