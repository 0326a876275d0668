import type { Summary } from '#rules/engine/finding';
import type { OrganisationKind } from '#shared/contracts/roles';
import type { RevisionState } from '#shared/contracts/submittals';
import { formatDate } from '#shared/format/dates';

export interface Standing {
  number: number;
  state: RevisionState;
  disposition: string | null;
  dueOn: string | null;
  doubts: number;
  summary: Summary | null;
  job: { state: string } | null;
}

/** What the reader would do next about a submittal, in words. */
export function nextWords(kind: OrganisationKind, standing: Standing): string {
  return kind === 'contractor' ? contractorsNext(standing) : agencysNext(standing);
}

function contractorsNext(standing: Standing): string {
  const { number, state, disposition, dueOn, doubts, summary, job } = standing;
  switch (state) {
    case 'draft':
      if (job?.state === 'failed') return 'Upload a workbook that can be read';
      if (job?.state === 'cancelled') return 'Upload the workbook again';
      if (summary === null) return 'The workbook is being read';
      if (doubts > 0) return `Say what ${doubts === 1 ? 'one cell means' : `${doubts} cells mean`}`;
      return toDo(summary) ?? `Submit revision ${number}`;
    case 'submitted':
    case 'in review':
      return dueOn === null ? 'Answer expected from the agency' : `Answer expected by ${formatDate(dueOn)}`;
    case 'returned':
      if (disposition === 'revise and resubmit')
        return (summary && toDo(summary)) ?? `Send revision ${number + 1}`;
      if (disposition === 'rejected') return 'A new submittal, if the mix is proposed again';
      return disposition === 'approved as noted' ? 'Nothing but to heed the notes' : 'Nothing';
    case 'withdrawn':
      return number === 0 ? 'Nothing' : `Send revision ${number + 1}`;
  }
}

function agencysNext({ number, state, disposition, dueOn }: Standing): string {
  switch (state) {
    case 'submitted':
      return 'Take for review';
    case 'in review':
      return dueOn === null ? 'Decide and return' : `Decide by ${formatDate(dueOn)}`;
    case 'returned':
      return disposition === 'revise and resubmit' ? `Revision ${number + 1} is awaited` : 'Nothing';
    case 'draft':
    case 'withdrawn':
      return 'Nothing';
  }
}

/** "2 to put right, 1 to send, 1 to settle", or null where all is well. */
function toDo({ fail, notShown, undecided }: Summary): string | null {
  const parts = [
    [fail, 'to put right'],
    [notShown, 'to send'],
    [undecided, 'to settle'],
  ].flatMap(([count, words]) => (count === 0 ? [] : [`${count} ${words}`]));
  return parts.length === 0 ? null : parts.join(', ');
}
