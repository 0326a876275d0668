import { and, eq, ne, type SQL } from 'drizzle-orm';
import type { OrganisationKind } from '#shared/contracts/roles';
import { revisions, submittals } from '../schema/submittals';

/** The organisation that asks. Every query of submittals is filtered by it. */
export interface Reader {
  organisationId: string;
  kind: OrganisationKind;
}

export function submittalsOf(reader: Reader): SQL | undefined {
  return reader.kind === 'agency'
    ? eq(submittals.agencyId, reader.organisationId)
    : eq(submittals.contractorId, reader.organisationId);
}

/** A draft is its contractor's alone. */
export function revisionsOf(reader: Reader): SQL | undefined {
  return reader.kind === 'agency'
    ? and(eq(revisions.agencyId, reader.organisationId), ne(revisions.state, 'draft'))
    : eq(revisions.contractorId, reader.organisationId);
}
