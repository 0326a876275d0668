import type { Disposition } from '#rules/engine/finding';
import type { WaiverPolicy } from '#shared/contracts/roles';
import type { Revision, RevisionState } from '#shared/contracts/submittals';
import { type Actor, hasRole, preparesSubmittals, reviews, signs } from './actor';

export interface RevisionFacts {
  state: RevisionState;
  number: number;
  disposition: Disposition | null;
  reviewerId: string | null;
  /** False where a newer revision exists. */
  latest: boolean;
  hasCheck: boolean;
  /** True while its workbook is being read. */
  reading: boolean;
  /** Some revision of the submittal is approved, or approved as noted. */
  standingApproval: boolean;
  waiverPolicy: WaiverPolicy;
}

/** What a person may do with a revision that their organisation may see. */
export function revisionAbilities(actor: Actor, revision: RevisionFacts): Revision['abilities'] {
  const prepares = preparesSubmittals(actor);
  const answersFor = actor.kind === 'contractor' && hasRole(actor, 'quality manager');
  const draft = revision.state === 'draft';
  const withAgency = revision.state === 'submitted' || revision.state === 'in review';
  const inReview = revision.state === 'in review';
  const holds = reviews(actor) && inReview && revision.reviewerId === actor.personId;
  const decides = signs(actor) && inReview;
  const reviewerWaives = (severity: 'advisory' | 'required') =>
    holds &&
    (revision.waiverPolicy === 'all' || (revision.waiverPolicy === 'advisory' && severity === 'advisory'));
  return {
    answer: prepares && draft && !revision.reading && revision.hasCheck,
    replaceWorkbook: prepares && draft,
    submit: answersFor && draft && revision.hasCheck && !revision.reading,
    withdraw: answersFor && withAgency,
    startRevision: prepares && mayFollow(revision),
    revisionNeedsReason: revision.standingApproval,
    take: reviews(actor) && revision.state === 'submitted',
    giveBack: holds || decides,
    note: actor.kind === 'agency' ? !draft && (reviews(actor) || signs(actor)) : prepares,
    reply: answersFor && !draft && revision.state !== 'withdrawn',
    waiveAdvisory: reviewerWaives('advisory') || decides,
    waiveRequired: reviewerWaives('required') || decides,
    prepareReturn: holds || decides,
    sendReturn: decides,
    checkAgain:
      revision.hasCheck &&
      !revision.reading &&
      ((prepares && draft) || (withAgency && (reviews(actor) || signs(actor)))),
    seeReturn: revision.state === 'returned' || holds || decides,
  };
}

/**
 * A next revision follows the latest one once it came back, unless it was rejected. A withdrawn revision 0 ends its
 * submittal; a later one that was withdrawn leaves what stood before it, so the submittal goes on.
 */
export function mayFollow(
  revision: Pick<RevisionFacts, 'state' | 'number' | 'disposition' | 'latest'>,
): boolean {
  if (!revision.latest) return false;
  if (revision.state === 'returned') return revision.disposition !== 'rejected';
  return revision.state === 'withdrawn' && revision.number > 0;
}
