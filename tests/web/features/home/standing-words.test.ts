import { describe, expect, it } from 'vitest';
import type { RevisionListItem } from '#shared/contracts/submittals';
import { nextCounts } from '../../../../web/features/home/lib/next-counts';
import { standingOf } from '../../../../web/features/home/lib/standing-words';

const summary = {
  pass: 20,
  fail: 0,
  notShown: 1,
  undecided: 1,
  notApplicable: 4,
  borderline: 0,
  doesNotAddUp: 0,
  recommended: 'revise and resubmit' as const,
};

function aRevision(given: Partial<RevisionListItem>): RevisionListItem {
  return {
    number: 2,
    state: 'draft',
    disposition: null,
    submittedAt: null,
    returnedAt: null,
    dueOn: null,
    workingDaysTaken: null,
    summary,
    changes: null,
    ...given,
  };
}

const day = () => '12 Mar';
const words = (revision: RevisionListItem, doubts = 0) => {
  const { strong, rest } = standingOf({ revision, doubts }, day);
  return `${strong}${rest}`;
};

describe('where a mix stands', () => {
  it('says of a draft that it is not yet submitted', () => {
    expect(words(aRevision({}))).toBe('not yet submitted');
  });

  it('counts the doubts of a draft', () => {
    expect(words(aRevision({}), 2)).toBe('not yet submitted, 2 doubts');
  });

  it('says of a draft without findings that it is not yet checked', () => {
    expect(words(aRevision({ summary: null }))).toBe('not yet checked');
  });

  it('names the disposition of a return with its day', () => {
    const returned = { state: 'returned' as const, returnedAt: '2026-03-12T10:00:00.000Z' };
    expect(words(aRevision({ ...returned, disposition: 'approved as noted' }))).toBe(
      'approved as noted, 12 Mar',
    );
    expect(words(aRevision({ ...returned, disposition: 'revise and resubmit' }))).toBe(
      'returned, revise and resubmit, 12 Mar',
    );
  });
});

describe('what a mix needs next', () => {
  it('counts acts by what they ask, without those that ask nothing', () => {
    expect(nextCounts(aRevision({})).map((count) => count.words)).toEqual(['1 to send', '1 to settle']);
  });

  it('counts nothing while the agency has it or once it is approved', () => {
    expect(nextCounts(aRevision({ state: 'in review' }))).toEqual([]);
    expect(nextCounts(aRevision({ state: 'returned', disposition: 'approved as noted' }))).toEqual([]);
  });
});
