import type { Summary } from '#rules/engine/finding';
import type { RevisionListItem } from '#shared/contracts/submittals';

export interface NextCount {
  outcome: 'fail' | 'not shown' | 'undecided';
  /** "1 to send" */
  words: string;
}

/** What a revision in the contractor's hands still needs, as marks and counts; empty where words say it better. */
export function nextCounts(
  revision: Pick<RevisionListItem, 'state' | 'disposition' | 'summary'>,
): NextCount[] {
  const own =
    revision.state === 'draft' ||
    (revision.state === 'returned' && revision.disposition === 'revise and resubmit');
  return own && revision.summary ? countsOf(revision.summary) : [];
}

function countsOf(summary: Summary): NextCount[] {
  const counts = [
    { outcome: 'fail' as const, count: summary.fail, act: 'to put right' },
    { outcome: 'not shown' as const, count: summary.notShown, act: 'to send' },
    { outcome: 'undecided' as const, count: summary.undecided, act: 'to settle' },
  ];
  return counts
    .filter(({ count }) => count > 0)
    .map(({ outcome, count, act }) => ({ outcome, words: `${count} ${act}` }));
}
