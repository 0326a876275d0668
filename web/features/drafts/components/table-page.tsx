import { Link, useParams } from 'react-router-dom';
import { partsOf } from '#rules/authoring/document-parts';
import { EmptyState } from '../../../components/ui/empty-state';
import { PageHead } from '../../../components/ui/page-head';
import { paths } from '../../../lib/paths';
import { usePageTitle } from '../../../lib/use-page-title';
import { DraftComments } from './draft-comments';
import { DraftFrame } from './draft-frame';
import { useDraftInHand } from './draft-layout';
import { DraftRemarks } from './draft-remarks';
import { SavedLine } from './saved-line';
import { TableEditor } from './table-editor';

/** One limit table of a draft. */
export function TablePage() {
  const { tableId = '' } = useParams();
  const { editing, rules } = useDraftInHand();
  const { draft, document } = editing;
  const parts = partsOf(document);
  const part = ['tables', 'add.tables', 'replace.tables']
    .map((list) => `${list}/${tableId}`)
    .find((each) => parts.has(each));
  const table = part === undefined ? null : (parts.get(part) as Record<string, unknown>);
  const title = String(table?.title ?? tableId);
  usePageTitle(`${title}, draft ${draft.edition}`);
  return (
    <DraftFrame
      editing={editing}
      rules={rules}
      aside={<DraftComments draftId={draft.id} rule={null} mayWrite={draft.abilities.comment} />}
    >
      <PageHead
        kicker={<Link to={paths.draft(draft.ruleSet, draft.id)}>Draft {draft.edition}</Link>}
        title={title}
      >
        <SavedLine editing={editing} />
      </PageHead>
      {part === undefined || table === null ? (
        <EmptyState title="The draft has no such table.">
          <Link to={paths.draft(draft.ruleSet, draft.id)}>See its tables</Link>
        </EmptyState>
      ) : (
        <TableEditor key={part} part={part} table={table} />
      )}
      <DraftRemarks only={`tables/${tableId}`} />
    </DraftFrame>
  );
}
