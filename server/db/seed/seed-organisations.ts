import { hashPassword } from '../../auth/password-hash';
import { newOrganisation } from '../../commands/organisation/new-organisation';
import type { Database } from '../client';
import { rolesToColumn } from '../roles-column';
import {
  accounts,
  agencyContractors,
  demoSignIns,
  laboratories,
  members,
  organisations,
  people,
} from '../schema/people';
import { demoId, demoMadeAt } from './demo-id';
import { type DemoOrganisation, demoOrganisations, demoPassword, demoPeople } from './demo-people';

const contractors = ['brightwater', 'tollhouse', 'kestrel'] as const;

export const demoLaboratories = {
  agency: { id: demoId('laboratory/carrow-valley'), name: 'Carrow Valley Materials Laboratory' },
  brightwater: { id: demoId('laboratory/brightwater'), name: 'Brightwater Central' },
  tollhouse: { id: demoId('laboratory/tollhouse'), name: 'Tollhouse Yard Laboratory' },
  kestrel: { id: demoId('laboratory/kestrel-dale'), name: 'Kestrel Dale Laboratory' },
} as const satisfies Record<DemoOrganisation, { id: string; name: string }>;

export async function seedOrganisations(tx: Database): Promise<void> {
  await tx.insert(organisations).values([
    {
      ...newOrganisation({
        ...demoOrganisations.agency,
        kind: 'agency',
        timeZone: 'Europe/London',
        reviewWorkingDays: 10,
        createdAt: demoMadeAt,
      }),
      letterhead: {
        department: 'Materials and Pavements',
        address: '14 Weir Street, Carrow',
        telephone: '',
        email: 'materials@carrow-valley.example',
        closing: '',
      },
    },
    ...contractors.map((name) =>
      newOrganisation({ ...demoOrganisations[name], kind: 'contractor', createdAt: demoMadeAt }),
    ),
  ]);
  await tx.insert(agencyContractors).values(
    contractors.map((name) => ({
      id: demoId(`agency-contractor/${name}`),
      agencyId: demoOrganisations.agency.id,
      contractorId: demoOrganisations[name].id,
      createdAt: demoMadeAt,
    })),
  );
  await tx.insert(laboratories).values(
    Object.entries(demoLaboratories).map(([name, laboratory]) => ({
      ...laboratory,
      organisationId: demoOrganisations[name as DemoOrganisation].id,
      createdAt: demoMadeAt,
    })),
  );
  await seedPeople(tx);
}

async function seedPeople(tx: Database): Promise<void> {
  const times = { createdAt: demoMadeAt, updatedAt: demoMadeAt };
  // One hash for all: the password is shown on the sign-in page anyway, and argon2 is slow by design.
  const password = await hashPassword(demoPassword);
  await tx
    .insert(people)
    .values(demoPeople.map(({ id, name, email }) => ({ id, name, email, emailVerified: true, ...times })));
  await tx.insert(accounts).values(
    demoPeople.map(({ id }) => ({
      id: demoId(`account/${id}`),
      personId: id,
      accountId: id,
      providerId: 'credential',
      password,
      ...times,
    })),
  );
  await tx.insert(members).values(
    demoPeople.map(({ id, organisation, roles }) => ({
      id: demoId(`member/${id}`),
      organisationId: demoOrganisations[organisation].id,
      personId: id,
      role: rolesToColumn(roles),
      createdAt: demoMadeAt,
    })),
  );
  await tx
    .insert(demoSignIns)
    .values(demoPeople.map(({ id }, position) => ({ personId: id, position, password: demoPassword })));
}
