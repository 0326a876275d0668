import type { QueueItem } from '#shared/contracts/queue';
import type { RevisionState } from '#shared/contracts/submittals';
import { endOfWeek } from '#shared/working-days';

/** Where a revision stands in the queue; null where it does not belong there. */
export function queueGroup(
  revision: { state: RevisionState; disposition: string | null; dueOn: string | null },
  today: string,
): QueueItem['group'] | null {
  switch (revision.state) {
    case 'submitted':
    case 'in review':
      return byDueDate(revision.dueOn, today);
    case 'returned':
      return revision.disposition === 'revise and resubmit' ? 'with the contractor' : null;
    case 'draft':
    case 'withdrawn':
      return null;
  }
}

function byDueDate(dueOn: string | null, today: string): QueueItem['group'] {
  if (dueOn === null) return 'next week and after';
  if (dueOn < today) return 'late';
  return dueOn <= endOfWeek(today) ? 'due this week' : 'next week and after';
}
