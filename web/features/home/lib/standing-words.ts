import type { SubmittalListItem } from '#shared/contracts/submittals';
import { countInFigures } from '#shared/format/numbers';

export interface Standing {
  /** The part that is set in strong type. */
  strong: string;
  rest: string;
}

/** Where a mix stands, in a few words: "**returned**, revise and resubmit". */
export function standingOf(
  item: Pick<SubmittalListItem, 'revision' | 'doubts'>,
  shortDate: (instant: string) => string,
): Standing {
  const { revision } = item;
  switch (revision.state) {
    case 'draft':
      return draftStanding(item);
    case 'submitted':
      return { strong: '', rest: on('submitted', revision.submittedAt, shortDate) };
    case 'in review':
      return { strong: '', rest: on('in review, submitted', revision.submittedAt, shortDate) };
    case 'withdrawn':
      return { strong: '', rest: 'withdrawn' };
    case 'returned':
      return returnedStanding(item, shortDate);
  }
}

function draftStanding({ revision, doubts }: Pick<SubmittalListItem, 'revision' | 'doubts'>): Standing {
  if (revision.summary === null) return { strong: '', rest: 'not yet checked' };
  if (doubts > 0) return { strong: 'not yet submitted', rest: `, ${countInFigures(doubts, 'doubt')}` };
  return { strong: 'not yet submitted', rest: '' };
}

function returnedStanding(
  { revision }: Pick<SubmittalListItem, 'revision'>,
  shortDate: (instant: string) => string,
): Standing {
  const day = revision.returnedAt ? `, ${shortDate(revision.returnedAt)}` : '';
  const approved = revision.disposition === 'approved' || revision.disposition === 'approved as noted';
  if (approved) return { strong: revision.disposition ?? '', rest: day };
  return { strong: 'returned', rest: `, ${revision.disposition ?? ''}${day}` };
}

function on(words: string, instant: string | null, shortDate: (instant: string) => string): string {
  return instant ? `${words} ${shortDate(instant)}` : words;
}
