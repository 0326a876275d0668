import { and, eq, isNull } from 'drizzle-orm';
import { anyOrganisation } from '../db/queries/organisations';
import { members, organisations, setUpLinks } from '../db/schema/people';
import { writeAudit } from '../db/write-audit';
import type { Deps } from '../deps';
import { Problem } from '../problem';
import { hashToken } from './make-set-up-link';
import { isTimeZone, newOrganisation } from './organisation/new-organisation';
import { createPerson } from './people/create-person';
import { publishStartingPoints } from './rule-sets/publish-starting-points';

interface SetUp {
  token: string;
  agencyName: string;
  timeZone: string;
  reviewWorkingDays: number;
  name: string;
  email: string;
  password: string;
  requestId: string;
}

/** True while the link has not been used and there is still no organisation. */
export async function setUpLinkHolds(deps: Pick<Deps, 'db'>, token: string): Promise<boolean> {
  const [link] = await deps.db
    .select({ id: setUpLinks.id })
    .from(setUpLinks)
    .where(and(eq(setUpLinks.tokenHash, hashToken(token)), isNull(setUpLinks.usedAt)))
    .limit(1);
  return link !== undefined && !(await anyOrganisation(deps.db));
}

/** Uses the link up and makes the agency with its administrator, all or nothing. */
export async function setUpAgency(deps: Deps, setUp: SetUp): Promise<void> {
  if (!isTimeZone(setUp.timeZone)) {
    const detail = `${setUp.timeZone} is not the name of a time zone, such as Europe/London.`;
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/timeZone', detail }] });
  }
  await deps.db.transaction(async (tx) => {
    const [used] = await tx
      .update(setUpLinks)
      .set({ usedAt: deps.now() })
      .where(and(eq(setUpLinks.tokenHash, hashToken(setUp.token)), isNull(setUpLinks.usedAt)));
    if (used.affectedRows !== 1 || (await anyOrganisation(tx))) throw new Problem('link-used');
    const organisationId = deps.newId();
    await tx.insert(organisations).values(
      newOrganisation({
        id: organisationId,
        name: setUp.agencyName,
        kind: 'agency',
        timeZone: setUp.timeZone,
        reviewWorkingDays: setUp.reviewWorkingDays,
        createdAt: deps.now(),
      }),
    );
    const personId = await createPerson(tx, deps, setUp);
    await tx.insert(members).values({
      id: deps.newId(),
      organisationId,
      personId,
      role: 'administrator',
      createdAt: deps.now(),
    });
    await publishStartingPoints(tx, {
      agencyId: organisationId,
      agencyName: setUp.agencyName,
      idOf: () => deps.newId(),
      publishedById: personId,
      secondAuthorId: null,
      publishedAt: () => deps.now(),
    });
    await writeAudit(tx, deps, {
      actor: { organisationId, personId },
      act: 'agency set up',
      subject: { kind: 'organisation', id: organisationId },
      requestId: setUp.requestId,
    });
  });
}
