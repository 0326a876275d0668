import { hashPassword } from '../../auth/password-hash';
import type { Database } from '../../db/client';
import { accounts, people } from '../../db/schema/people';
import type { Deps } from '../../deps';

interface NewPerson {
  name: string;
  email: string;
  password: string;
}

/** A person with a password. The link that led here went to the address, so the address is theirs. */
export async function createPerson(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { name, email, password }: NewPerson,
): Promise<string> {
  const id = newId();
  const times = { createdAt: now(), updatedAt: now() };
  await tx.insert(people).values({ id, name, email: email.toLowerCase(), emailVerified: true, ...times });
  await tx.insert(accounts).values({
    id: newId(),
    personId: id,
    accountId: id,
    providerId: 'credential',
    password: await hashPassword(password),
    ...times,
  });
  return id;
}
