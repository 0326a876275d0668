import { and, eq } from 'drizzle-orm';
import type { Organisation } from '#shared/contracts/organisation';
import { findOrganisation, type OrganisationRow } from '../../db/queries/organisations';
import { organisations } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectVersion, expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { presentOrganisation } from '../../presenters/present-organisation';
import { Problem } from '../../problem';
import { isTimeZone } from './new-organisation';

interface Change {
  actor: Actor;
  version: number;
  fields: Pick<Organisation, 'name' | 'timeZone' | 'reviewWorkingDays' | 'waiverPolicy' | 'letterhead'>;
  requestId: string;
}

/** Clocks that run keep their due dates: those were told to people. */
export async function changeOrganisation(deps: Deps, change: Change): Promise<OrganisationRow> {
  const { actor, version, fields, requestId } = change;
  if (!isTimeZone(fields.timeZone)) {
    const detail = `${fields.timeZone} is not the name of a time zone, such as Europe/London.`;
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/timeZone', detail }] });
  }
  return deps.db.transaction(async (tx) => {
    const present = await findOrganisation(tx, actor.organisationId);
    if (!present) throw new Problem('not-found');
    expectVersion(version, presentOrganisation(present, actor));
    const result = await tx
      .update(organisations)
      .set({ ...fields, version: version + 1 })
      .where(and(eq(organisations.id, actor.organisationId), eq(organisations.version, version)));
    expectWritten(result);
    await writeAudit(tx, deps, {
      actor,
      act: 'organisation changed',
      subject: { kind: 'organisation', id: actor.organisationId },
      detail: { timeZone: fields.timeZone, waiverPolicy: fields.waiverPolicy },
      requestId,
    });
    return { ...present, ...fields, version: version + 1 };
  });
}
