import type { Role } from '#shared/contracts/roles';
import { demoId } from './demo-id';

/** Invented, all of them. */
export const demoPassword = 'carrow valley demo';

export const demoOrganisations = {
  agency: { id: demoId('organisation/carrow-valley'), name: 'Carrow Valley Roads Authority' },
  brightwater: { id: demoId('organisation/brightwater'), name: 'Brightwater Paving' },
  tollhouse: { id: demoId('organisation/tollhouse'), name: 'Tollhouse Asphalt' },
  kestrel: { id: demoId('organisation/kestrel-dale'), name: 'Kestrel Dale Surfacing' },
} as const;

export type DemoOrganisation = keyof typeof demoOrganisations;

export interface DemoPersonSeed {
  id: string;
  name: string;
  email: string;
  organisation: DemoOrganisation;
  roles: Role[];
}

const domains: Record<DemoOrganisation, string> = {
  agency: 'carrow-valley.example',
  brightwater: 'brightwater.example',
  tollhouse: 'tollhouse.example',
  kestrel: 'kestrel-dale.example',
};

/** In the order in which the sign-in page lists them. */
export const demoPeople: DemoPersonSeed[] = [
  person('Dele Fairweather', 'brightwater', ['quality manager']),
  person('Sorcha Lund', 'brightwater', ['laboratory']),
  person('Gil Ansah', 'brightwater', ['administrator']),
  person('Ines Tordoff', 'agency', ['reviewer']),
  person('Patience Adeyinka', 'agency', ['reviewer']),
  person('Mairi Halloran', 'agency', ['signing engineer']),
  person('Tamsin Brook', 'agency', ['rule author']),
  person('Joaquim Vale', 'agency', ['rule author']),
  person('Rhona Pike', 'agency', ['laboratory']),
  person('Edda Marsh', 'agency', ['administrator']),
  person('Bram Ostler', 'tollhouse', ['quality manager', 'administrator']),
  person('Nia Corrie', 'tollhouse', ['laboratory']),
  person('Leda Farrow', 'kestrel', ['quality manager', 'administrator']),
  person('Tove Hallam', 'kestrel', ['laboratory']),
];

export function demoPerson(name: string): DemoPersonSeed {
  const found = demoPeople.find((each) => each.name === name);
  if (!found) throw new Error(`The demo has nobody called ${name}.`);
  return found;
}

function person(name: string, organisation: DemoOrganisation, roles: Role[]): DemoPersonSeed {
  const email = `${name.toLowerCase().replace(' ', '.')}@${domains[organisation]}`;
  return { id: demoId(`person/${email}`), name, email, organisation, roles };
}
