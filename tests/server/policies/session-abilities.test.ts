import { describe, expect, it } from 'vitest';
import { keepsLaboratories, sessionAbilities } from '#server/policies/session-abilities';
import { type OrganisationKind, type Role, rolesOf } from '#shared/contracts/roles';

/** Who is offered what, by side and role; a role that is not named is not offered it. */
const offered: Record<string, Record<OrganisationKind, Role[]>> = {
  seeQueue: { agency: ['reviewer', 'signing engineer', 'administrator'], contractor: [] },
  upload: { agency: [], contractor: ['quality manager', 'laboratory'] },
  managePeople: { agency: ['administrator'], contractor: ['administrator'] },
  manageProjects: { agency: ['administrator'], contractor: [] },
  manageOrganisation: { agency: ['administrator'], contractor: ['administrator'] },
  confirmSections: { agency: ['rule author', 'administrator'], contractor: [] },
};

const sides = ['agency', 'contractor'] as const;
const rows = sides.flatMap((kind) =>
  rolesOf(kind).flatMap((role) =>
    Object.entries(offered).map(([ability, who]) => ({
      kind,
      role,
      ability,
      expected: who[kind].includes(role),
    })),
  ),
);

describe('what the navigation offers', () => {
  it.each(rows)('$kind $role: $ability is $expected', ({ kind, role, ability, expected }) => {
    const abilities = sessionAbilities({ kind, roles: [role] }, { mailIsCaught: false });
    expect(abilities[ability as keyof typeof abilities]).toBe(expected);
  });

  it('adds up over the roles of one person', () => {
    const roles: Role[] = ['laboratory', 'administrator'];
    const abilities = sessionAbilities({ kind: 'contractor', roles }, { mailIsCaught: true });
    expect(abilities).toMatchObject({ upload: true, managePeople: true, seeCaughtMail: true });
  });

  it('is nothing before an organisation is chosen', () => {
    const abilities = sessionAbilities(null, { mailIsCaught: true });
    expect(Object.values(abilities).every((offer) => offer === false)).toBe(true);
  });
});

it.each([
  ['administrator', true],
  ['laboratory', true],
  ['quality manager', true],
  ['reviewer', false],
  ['signing engineer', false],
  ['rule author', false],
] as const)('%s keeps laboratories: %s', (role, expected) => {
  expect(keepsLaboratories({ roles: [role] })).toBe(expected);
});
