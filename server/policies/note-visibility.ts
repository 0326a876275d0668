import type { NoteKind } from '#shared/contracts/notes';
import type { OrganisationKind } from '#shared/contracts/roles';

export interface NoteFacts {
  organisationId: string;
  kind: NoteKind;
  /** When it went to the other side: with the return, with a submission, or at once; null until then. */
  sentAt: Date | null;
}

/** Internal notes stay with their writer's organisation; any other is seen by the other side once it is sent. */
export function seesNote(reader: { organisationId: string }, note: NoteFacts): boolean {
  if (note.organisationId === reader.organisationId) return true;
  return note.kind !== 'internal' && note.sentAt !== null;
}

/** A waiver marked to be returned reaches the contractor with the return, any other never. */
export function seesWaiver(
  reader: { kind: OrganisationKind },
  waiver: { toBeReturned: boolean; sentAt: Date | null },
): boolean {
  return reader.kind === 'agency' || (waiver.toBeReturned && waiver.sentAt !== null);
}
