import type { Organisation } from '#shared/contracts/organisation';
import type { OrganisationRow } from '../db/queries/organisations';
import type { Actor } from '../policies/actor';
import { managesOrganisation } from '../policies/session-abilities';

export function presentOrganisation(row: OrganisationRow, actor: Actor): Organisation {
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    timeZone: row.timeZone,
    reviewWorkingDays: row.reviewWorkingDays,
    waiverPolicy: row.waiverPolicy,
    letterhead: row.letterhead,
    version: row.version,
    abilities: { change: managesOrganisation(actor) },
  };
}
