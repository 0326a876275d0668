import { createHash } from 'node:crypto';
import { isNull } from 'drizzle-orm';
import { organisations, setUpLinks } from '../db/schema/people';
import type { Deps } from '../deps';

/**
 * The link that makes the first agency, or null where there is an organisation already. Each start makes
 * a new one and ends those before it: the link is known only to who saw the start.
 */
export async function makeSetUpLink(deps: Deps): Promise<string | null> {
  const token = deps.newToken();
  const made = await deps.db.transaction(async (tx) => {
    const [any] = await tx.select({ id: organisations.id }).from(organisations).limit(1);
    if (any) return false;
    await tx.delete(setUpLinks).where(isNull(setUpLinks.usedAt));
    await tx
      .insert(setUpLinks)
      .values({ id: deps.newId(), tokenHash: hashToken(token), createdAt: deps.now() });
    return true;
  });
  return made ? `${deps.settings.publicUrl}/set-up/${token}` : null;
}

/** Links are kept as hashes: a copy of the database opens none of them. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
