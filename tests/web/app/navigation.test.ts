import { describe, expect, it } from 'vitest';
import { aSession } from '#tests/builders/a-session';
import { navigationOf } from '../../../web/app/shell/navigation';

const noAbilities = {
  seeQueue: false,
  upload: false,
  managePeople: false,
  manageProjects: false,
  manageOrganisation: false,
  confirmSections: false,
  writeRules: false,
  seeCaughtMail: false,
};
const contractor = {
  organisationId: '0192f0a0-0000-7000-8000-000000000003',
  organisationName: 'Brightwater Paving',
  kind: 'contractor' as const,
  roles: ['quality manager' as const],
};
const labels = (session: Parameters<typeof navigationOf>[0]) =>
  navigationOf(session).map((item) => item.label);

describe('what the head offers', () => {
  it('begins with the queue for an agency and with home for a contractor', () => {
    expect(labels(aSession())[0]).toBe('Queue');
    expect(labels(aSession({ active: contractor, abilities: noAbilities }))[0]).toBe('Home');
  });

  it('holds only what the reader may open', () => {
    expect(labels(aSession({ abilities: noAbilities }))).toEqual(['Submittals', 'Projects', 'Rule sets']);
    const administrator = aSession({
      abilities: { ...noAbilities, managePeople: true, manageOrganisation: true },
    });
    expect(labels(administrator)).toEqual(['Submittals', 'Projects', 'Rule sets', 'People', 'Settings']);
  });

  it('is empty until an organisation is chosen', () => {
    expect(labels(aSession({ active: null }))).toEqual([]);
  });
});
