import type { NoteKind } from '#shared/contracts/notes';
import type { OrganisationKind } from '#shared/contracts/roles';
import type { RevisionState } from '#shared/contracts/submittals';

export interface NoteFacts {
  organisationId: string;
  side: OrganisationKind;
  kind: NoteKind;
  writtenAt: Date;
  /** State of the revision that the note hangs on. */
  revisionState: RevisionState;
}

export interface RevisionSpan {
  submittedAt: Date | null;
  /** When it left the agency's hands: returned or withdrawn. */
  leftAt: Date | null;
}

/**
 * Internal notes stay with their writer's organisation. What an agency means to return is seen once the return is
 * sent. A contractor's reply is seen with the next submission, or at once while the agency has the submittal.
 */
export function seesNote(
  reader: { organisationId: string; kind: OrganisationKind },
  note: NoteFacts,
  revisions: readonly RevisionSpan[],
): boolean {
  if (note.organisationId === reader.organisationId) return true;
  if (note.kind === 'internal') return false;
  if (note.side === 'agency') return note.kind === 'to be returned' && note.revisionState === 'returned';
  return note.kind === 'reply' && revisions.some((revision) => carried(note.writtenAt, revision));
}

/** A waiver marked to be returned reaches the contractor with the return, any other never. */
export function seesWaiver(
  reader: { kind: OrganisationKind },
  waiver: { toBeReturned: boolean; revisionState: RevisionState },
): boolean {
  return reader.kind === 'agency' || (waiver.toBeReturned && waiver.revisionState === 'returned');
}

function carried(writtenAt: Date, { submittedAt, leftAt }: RevisionSpan): boolean {
  if (submittedAt === null) return false;
  if (submittedAt >= writtenAt) return true;
  return leftAt === null || writtenAt < leftAt;
}
