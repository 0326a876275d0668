import type { Summary } from '#rules/engine/finding';
import type { RevisionListItem } from '#shared/contracts/submittals';
import type { revisions } from '../db/schema/submittals';

type Row = Pick<
  typeof revisions.$inferSelect,
  'number' | 'state' | 'disposition' | 'submittedAt' | 'returnedAt' | 'dueOn' | 'workingDaysTaken' | 'changes'
>;

export function presentRevisionItem(revision: Row, summary: Summary | null): RevisionListItem {
  return {
    number: revision.number,
    state: revision.state,
    disposition: revision.disposition,
    submittedAt: revision.submittedAt?.toISOString() ?? null,
    returnedAt: revision.returnedAt?.toISOString() ?? null,
    dueOn: revision.dueOn,
    workingDaysTaken: revision.workingDaysTaken,
    summary,
    changes: revision.changes,
  };
}
