import { resolveSection } from '../../commands/projects/resolve-section';
import type { Database } from '../client';
import { contacts, projectContractors, projects, sectionLayers, sections } from '../schema/projects';
import { demoId, demoMadeAt } from './demo-id';
import { type DemoOrganisation, demoOrganisations, demoPerson } from './demo-people';

interface DemoProject {
  number: string;
  title: string;
  lettingOn: string;
  facts: Record<string, number | string>;
  contractors: DemoOrganisation[];
  edition: string;
  layers: { ruleSet: string; edition: string }[];
}

const agencyId = demoOrganisations.agency.id;
const ruleSet = 'cvra-412';

export const demoProjects: DemoProject[] = [
  {
    number: 'CV-2031',
    title: 'Hollin Ridge Road, resurfacing',
    lettingOn: '2026-01-14',
    facts: { designTraffic: 12 },
    contractors: ['brightwater', 'kestrel'],
    edition: '2026',
    layers: [{ ruleSet: 'cvra-s-07', edition: '2026' }],
  },
  {
    number: 'CV-2034',
    title: 'Quarry Road realignment',
    lettingOn: '2026-01-28',
    facts: {},
    contractors: ['brightwater', 'tollhouse', 'kestrel'],
    edition: '2026',
    layers: [],
  },
  {
    number: 'CV-2019',
    title: 'Station Quarter streets',
    lettingOn: '2025-09-10',
    facts: {},
    contractors: ['brightwater', 'tollhouse', 'kestrel'],
    edition: '2024',
    layers: [],
  },
  {
    number: 'CV-2022',
    title: 'Weir Street and Mill Bank',
    lettingOn: '2026-01-07',
    facts: {},
    contractors: ['brightwater', 'tollhouse'],
    edition: '2026',
    layers: [],
  },
  {
    number: 'CV-2027',
    title: 'Ferrow Lane bridge deck',
    lettingOn: '2026-01-21',
    facts: {},
    contractors: ['tollhouse', 'kestrel'],
    edition: '2026',
    layers: [],
  },
];

export function demoProjectId(number: string): string {
  return demoId(`project/${number}`);
}

export function demoSectionId(number: string): string {
  return demoId(`section/${number}`);
}

export async function seedProjects(tx: Database): Promise<void> {
  for (const project of demoProjects) await seedProject(tx, project);
}

async function seedProject(tx: Database, project: DemoProject): Promise<void> {
  const { number, title, lettingOn, facts, contractors, edition, layers } = project;
  const id = demoProjectId(number);
  await tx.insert(projects).values({ id, agencyId, number, title, lettingOn, facts, createdAt: demoMadeAt });
  await tx
    .insert(projectContractors)
    .values(contractors.map((name) => ({ projectId: id, contractorId: demoOrganisations[name].id })));
  await tx.insert(contacts).values({
    id: demoId(`contact/${number}`),
    projectId: id,
    position: 0,
    name: 'R. Sandoval',
    function: 'resident engineer',
    email: 'r.sandoval@carrow-valley.example',
  });
  const choice = { base: { ruleSet, edition }, layers };
  const now = () => demoMadeAt;
  const resolved = await resolveSection(tx, { now }, { agencyId, choice });
  const sectionId = demoSectionId(number);
  await tx.insert(sections).values({
    id: sectionId,
    projectId: id,
    agencyId,
    position: 0,
    baseEditionId: resolved.base.id,
    resolvedHash: resolved.hash,
    confirmedById: demoPerson('Tamsin Brook').id,
    confirmedAt: demoMadeAt,
  });
  if (resolved.layers.length === 0) return;
  await tx
    .insert(sectionLayers)
    .values(resolved.layers.map((layer, position) => ({ sectionId, position, editionId: layer.id })));
}
