import type { Deps } from '../../deps';
import { seedOrganisations } from './seed-organisations';
import { seedProjects } from './seed-projects';
import { seedRuleSets } from './seed-rule-sets';
import { seedSubmittals } from './seed-submittals';

/** All rows of the demo, in the caller's transaction. */
export async function seedRows(deps: Deps): Promise<void> {
  await seedOrganisations(deps.db);
  await seedRuleSets(deps.db);
  await seedProjects(deps.db);
  await seedSubmittals(deps);
}
