import { canonicalText } from '#rules/engine/canonical-text';
import type { CheckContext } from '#rules/record';
import type { RevisionState } from '#shared/contracts/submittals';
import { formatDate } from '#shared/format/dates';

export interface CheckAge {
  kind: 'pre-check' | 'check of record';
  state: RevisionState;
  /** The date that was used as the date of submission, and today's, both in the agency's zone. */
  submittedOn: string;
  today: string;
  /** Of the check, and of the section as it stands now. */
  resolvedHash: string;
  sectionHash: string;
  /** What the project stated then, and what it states now. */
  judgedWith: ProjectFacts;
  project: ProjectFacts;
  stored: string | null;
}

type ProjectFacts = Pick<CheckContext, 'lettingOn' | 'facts'>;

/** Why a check no longer describes its revision, or null. What has been returned or withdrawn is not measured anew. */
export function checkStale(check: CheckAge): string | null {
  if (check.state === 'returned' || check.state === 'withdrawn') return null;
  if (check.resolvedHash !== check.sectionHash) {
    return "The section's edition or layers have changed since this check.";
  }
  if (factsText(check.judgedWith) !== factsText(check.project)) {
    return 'The letting date or the facts of the project have changed since this check.';
  }
  if (check.kind === 'pre-check' && check.submittedOn !== check.today) {
    return `This check took ${formatDate(check.submittedOn)} as the day of submission; today it is ${formatDate(check.today)} at the agency.`;
  }
  return check.stored;
}

function factsText({ lettingOn, facts }: ProjectFacts): string {
  return canonicalText({ lettingOn, facts });
}
