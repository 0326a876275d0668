import type { Letterhead } from '#shared/contracts/organisation';
import type { OrganisationKind } from '#shared/contracts/roles';
import type { organisations } from '../../db/schema/people';

interface Founding {
  id: string;
  name: string;
  kind: OrganisationKind;
  timeZone?: string;
  reviewWorkingDays?: number;
  letterhead?: Letterhead;
  createdAt: Date;
}

export const emptyLetterhead: Letterhead = {
  department: '',
  address: '',
  telephone: '',
  email: '',
  closing: '',
};

/** The row of a new organisation. Zone, clock and waivers mean something for an agency only. */
export function newOrganisation(founding: Founding): typeof organisations.$inferInsert {
  const { timeZone = 'UTC', reviewWorkingDays = 10, letterhead = emptyLetterhead, ...facts } = founding;
  const words = facts.name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, 100);
  return {
    ...facts,
    // The sign-in library wants a unique one; the id makes it so, and nobody reads it.
    slug: `${words}-${facts.id}`,
    timeZone,
    reviewWorkingDays,
    waiverPolicy: 'advisory',
    letterhead,
  };
}

export function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en-GB', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}
