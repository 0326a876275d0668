import { type Session, sessionSchema } from '#shared/contracts/session';

/** A reviewer of the agency. */
export function aSession(overrides: Partial<Session> = {}): Session {
  const membership = {
    organisationId: '0192f0a0-0000-7000-8000-000000000004',
    organisationName: 'Carrow Valley Roads Authority',
    kind: 'agency' as const,
    roles: ['reviewer' as const],
  };
  return sessionSchema.parse({
    person: {
      id: '0192f0a0-0000-7000-8000-000000000006',
      name: 'Ines Tordoff',
      email: 'ines.tordoff@cvra.example',
    },
    active: membership,
    memberships: [membership],
    today: '2026-03-12',
    timeZone: 'Europe/London',
    abilities: {
      seeQueue: true,
      upload: false,
      managePeople: false,
      manageProjects: false,
      manageOrganisation: false,
      confirmSections: false,
      writeRules: false,
      seeCaughtMail: false,
    },
    ...overrides,
  } satisfies Session);
}
