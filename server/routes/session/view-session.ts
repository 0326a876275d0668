import type { Session } from '#shared/contracts/session';
import { membershipsOf } from '../../db/queries/memberships';
import type { Deps } from '../../deps';
import type { SignedInPerson } from '../../middleware/authenticate';
import { presentSession } from '../../presenters/present-session';

interface SignedIn {
  person: SignedInPerson;
  activeOrganisationId: string | null;
}

/** Who is signed in, for which organisation, and what the navigation offers them. */
export async function viewSession(
  { db, now, settings }: Deps,
  { person, activeOrganisationId }: SignedIn,
): Promise<Session> {
  return presentSession({
    person,
    activeOrganisationId,
    memberships: await membershipsOf(db, person.id),
    now: now(),
    mailIsCaught: settings.smtpUrl === null,
  });
}
