import { eq } from 'drizzle-orm';
import type { Deps } from '../../deps';
import { organisations } from '../schema/people';
import { demoOrganisations } from './demo-people';
import { demoWorkbooksAreWritten } from './demo-workbook-folder';

/**
 * Makes the demo where it is missing: all rows or none, the same ones each time. Whatever makes them is loaded only
 * then, because every start passes here.
 */
export async function seedDemo(deps: Deps): Promise<{ seeded: boolean }> {
  const { dataDirectory } = deps.settings;
  if (!demoWorkbooksAreWritten(dataDirectory)) {
    const { writeDemoWorkbooks } = await import('./write-demo-workbooks');
    await writeDemoWorkbooks(dataDirectory, deps.now());
  }
  const [present] = await deps.db
    .select({ id: organisations.id })
    .from(organisations)
    .where(eq(organisations.id, demoOrganisations.agency.id))
    .limit(1);
  if (present) return { seeded: false };
  const { seedRows } = await import('./seed-rows');
  await deps.db.transaction((tx) => seedRows({ ...deps, db: tx }));
  deps.wake.mail();
  return { seeded: true };
}
