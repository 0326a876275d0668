import type { Session } from '#shared/contracts/session';
import { type Actor, hasRole, preparesSubmittals } from './actor';
import { writesRules } from './draft-abilities';

type Abilities = Session['abilities'];

/** What the navigation offers; each route checks again for itself. */
export function sessionAbilities(
  actor: Pick<Actor, 'kind' | 'roles'> | null,
  { mailIsCaught }: { mailIsCaught: boolean },
): Abilities {
  return {
    seeQueue: actor !== null && seesQueue(actor),
    upload: actor !== null && preparesSubmittals(actor),
    managePeople: actor !== null && managesPeople(actor),
    manageProjects: actor !== null && managesProjects(actor),
    manageOrganisation: actor !== null && managesOrganisation(actor),
    confirmSections: actor !== null && confirmsSections(actor),
    writeRules: actor !== null && writesRules(actor),
    seeCaughtMail: actor !== null && mailIsCaught,
  };
}

export function seesQueue(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'reviewer', 'signing engineer', 'administrator');
}

export function managesPeople(actor: Pick<Actor, 'roles'>): boolean {
  return hasRole(actor, 'administrator');
}

export function managesOrganisation(actor: Pick<Actor, 'roles'>): boolean {
  return hasRole(actor, 'administrator');
}

/** Projects and the contractors on them are the agency's. */
export function managesProjects(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'administrator');
}

export function confirmsSections(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'rule author', 'administrator');
}

/** How a laboratory's workbooks are read is its own and the quality manager's to say. */
export function changesMappings(actor: Pick<Actor, 'roles'>): boolean {
  return hasRole(actor, 'laboratory', 'quality manager');
}

/** A laboratory is a record of its organisation, kept by those who work with it. */
export function keepsLaboratories(actor: Pick<Actor, 'roles'>): boolean {
  return hasRole(actor, 'administrator', 'laboratory', 'quality manager');
}
