import type { OrganisationKind, Role } from '#shared/contracts/roles';

/** Who acts, for which of their organisations. */
export interface Actor {
  personId: string;
  organisationId: string;
  kind: OrganisationKind;
  roles: readonly Role[];
}

export function hasRole(actor: Pick<Actor, 'roles'>, ...anyOf: Role[]): boolean {
  return anyOf.some((role) => actor.roles.includes(role));
}

/** Laboratory staff and quality managers put submittals together; administrators as such do not. */
export function preparesSubmittals(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'contractor' && hasRole(actor, 'quality manager', 'laboratory');
}

export function reviews(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'reviewer');
}

export function signs(actor: Pick<Actor, 'kind' | 'roles'>): boolean {
  return actor.kind === 'agency' && hasRole(actor, 'signing engineer');
}
