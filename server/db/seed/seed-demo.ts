import { eq } from 'drizzle-orm';
import type { Deps } from '../../deps';
import { organisations } from '../schema/people';
import { demoOrganisations } from './demo-people';
import { seedOrganisations } from './seed-organisations';
import { seedProjects } from './seed-projects';
import { seedRuleSets } from './seed-rule-sets';
import { seedSubmittals } from './seed-submittals';
import { writeDemoWorkbooks } from './write-demo-workbooks';

/** Makes the demo where it is missing: all rows or none, the same ones each time. */
export async function seedDemo(deps: Deps): Promise<{ seeded: boolean }> {
  await writeDemoWorkbooks(deps.settings.dataDirectory, deps.now());
  const [present] = await deps.db
    .select({ id: organisations.id })
    .from(organisations)
    .where(eq(organisations.id, demoOrganisations.agency.id))
    .limit(1);
  if (present) return { seeded: false };
  await deps.db.transaction(async (tx) => {
    await seedOrganisations(tx);
    await seedRuleSets(tx);
    await seedProjects(tx);
    await seedSubmittals({ ...deps, db: tx });
  });
  deps.wake.mail();
  return { seeded: true };
}
